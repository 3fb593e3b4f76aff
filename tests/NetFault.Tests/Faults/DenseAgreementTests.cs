using CsCheck;
using NetFault.Tests.Support;

namespace NetFault.Tests.Faults;

/// <summary>Oracle: Math.NET's dense inverse of a matrix assembled in ohm by <see cref="DenseOracle"/>.</summary>
public class DenseAgreementTests
{
    [Fact]
    public void Every_bus_of_a_generated_network_agrees_with_a_dense_inverse() =>
        RandomNetworks.Cases(60).Sample((seed, buses) => AssertAgreement(RandomNetworks.Make(seed, buses)), iter: 120);

    [Fact]
    public void Every_bus_of_a_network_with_series_compensation_agrees_with_a_dense_inverse() =>
        RandomNetworks.Cases(60).Sample((seed, buses) => AssertAgreement(RandomNetworks.Make(seed, buses, negativeReactances: true)), iter: 120);

    [Fact]
    public void A_network_of_500_buses_agrees_with_a_dense_inverse() => AssertAgreement(RandomNetworks.Make(20260, 500, negativeReactances: true));

    [Fact]
    public void Transient_and_steady_state_currents_agree_with_a_dense_inverse_without_motors() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = RandomNetworks.Make(seed, buses);
            var transient = new DenseOracle(network, withMotors: false, machine => machine.ReactancePu.Transient!.Value);
            var steady = new DenseOracle(network, withMotors: false, machine => machine.ReactancePu.Synchronous!.Value);
            foreach (var fault in new FaultStudy(network, new MachineDecrement()).EveryBus().Where(one => one.IsEnergised))
            {
                AssertClose(fault.TransientKa!.Value, transient.CurrentKa(fault.BusId));
                AssertClose(fault.SteadyStateKa!.Value, steady.CurrentKa(fault.BusId));
            }
        }, iter: 60);

    [Fact]
    public void A_single_bus_question_gives_the_same_as_the_every_bus_one() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = RandomNetworks.Make(seed, buses);
            var method = new MachineDecrement { XOverRRule = XOverRRule.SeparateNetworks };
            var all = new FaultStudy(network, method).EveryBus();
            var fresh = new FaultStudy(network, method);
            foreach (var fault in all)
            {
                var one = fresh.At(fault.BusId);
                AssertClose(one.InitialSymmetricalKa, fault.InitialSymmetricalKa);
                AssertClose(one.PeakKa, fault.PeakKa);
                AssertClose(one.SteadyStateKa!.Value, fault.SteadyStateKa!.Value);
            }
        }, iter: 40);

    private static void AssertAgreement(Network network)
    {
        var oracle = new DenseOracle(network);
        foreach (var fault in new FaultStudy(network, new MachineDecrement()).EveryBus())
        {
            fault.IsEnergised.Should().Be(oracle.ImpedanceOhm.ContainsKey(fault.BusId));
            if (!fault.IsEnergised)
            {
                fault.InitialSymmetricalKa.Should().Be(0);
                continue;
            }
            var expected = oracle.ImpedanceOhm[fault.BusId];
            (fault.ImpedanceOhm!.Value - expected).Magnitude.Should().BeLessThan(1e-9 * expected.Magnitude, fault.BusId);
            AssertClose(fault.InitialSymmetricalKa, oracle.CurrentKa(fault.BusId));
        }
    }

    private static void AssertClose(double actual, double expected) =>
        actual.Should().BeApproximately(expected, 1e-9 * Math.Abs(expected));
}
