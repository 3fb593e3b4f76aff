using CsCheck;
using NetFault.Tests.Support;

namespace NetFault.Tests.ByIec60909;

/// <summary>Oracles: the single-bus result of the same fault, and Kirchhoff's current law.</summary>
public class FlowAgreementTests
{
    [Theory]
    [InlineData(ShortCircuitCase.Maximum, false)]
    [InlineData(ShortCircuitCase.Maximum, true)]
    [InlineData(ShortCircuitCase.Minimum, false)]
    public void The_flows_of_a_fault_carry_its_initial_current_and_sum_to_zero_at_every_bus(ShortCircuitCase which, bool leaveOut) =>
        RandomNetworks.Cases(30).Sample((seed, buses) =>
        {
            var network = IecRandomNetworks.Make(seed, buses, equalRatios: seed % 2 == 0);
            network = network.With(new FullConverterSource
            {
                Id = "park", Bus = network.Buses[seed % network.Buses.Count].Id, SourceCurrentKa = 0.2, SteadyStateKa = new MaxMin(0.15, 0.1),
            });
            var study = new FaultStudy(network, new Iec60909 { Case = which, LeaveOutSmallMotors = leaveOut });
            foreach (var bus in network.Buses)
            {
                var fault = study.At(bus.Id);
                var flows = study.FlowsAt(bus.Id);
                flows.FaultCurrentKa.Magnitude.Should().BeApproximately(fault.InitialSymmetricalKa, 1e-9 * fault.InitialSymmetricalKa + 1e-300, bus.Id);
                if (flows.Couplers.All(one => one.FromToKa.HasValue))
                    Kirchhoff.AssertAtEveryBus(study, flows);
                if (fault.IsEnergised)
                    flows.Voltage(bus.Id).PerUnit.Magnitude.Should().BeLessThan(1e-9, bus.Id);
            }
        }, iter: 30);

    [Fact]
    public void The_flows_of_the_steady_state_carry_its_current_where_no_factor_is_given() =>
        RandomNetworks.Cases(30).Sample((seed, buses) =>
        {
            var network = IecRandomNetworks.Make(seed, buses, equalRatios: true);
            var study = new FaultStudy(network, new Iec60909());
            foreach (var bus in network.Buses)
            {
                var expected = study.At(bus.Id).SteadyStateKa!.Value;
                study.FlowsAt(bus.Id, FaultInstant.SteadyState).FaultCurrentKa.Magnitude.Should().BeApproximately(expected, 1e-9 * expected + 1e-300, bus.Id);
            }
        }, iter: 30);
}
