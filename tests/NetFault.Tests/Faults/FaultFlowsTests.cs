using System.Numerics;
using CsCheck;
using NetFault.Tests.Support;

namespace NetFault.Tests.Faults;

/// <summary>Oracles: Kirchhoff's current law, Ohm's law, a network with an explicit extra bus, and hand calculation.</summary>
public class FaultFlowsTests
{
    [Fact]
    public void At_every_bus_the_currents_sum_to_zero_but_for_the_fault() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = RandomNetworks.Make(seed, buses);
            var study = new FaultStudy(network, new MachineDecrement());
            var faulted = network.Buses[seed % network.Buses.Count].Id;
            var flows = study.FlowsAt(faulted, (FaultInstant)(seed % 3));
            if (flows.Couplers.Any(one => one.FromToKa is null))
                return;
            Kirchhoff.AssertAtEveryBus(study, flows);
        }, iter: 60);

    [Fact]
    public void The_fault_current_is_that_of_the_single_bus_question() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = RandomNetworks.Make(seed, buses);
            var study = new FaultStudy(network, new MachineDecrement());
            var bus = network.Buses[seed % network.Buses.Count];
            var through = new Complex(0.01, 0.02);
            var fault = study.At(bus.Id, through);
            var flows = study.FlowsAt(bus.Id, FaultInstant.Initial, through);
            flows.FaultCurrentKa.Magnitude.Should().BeApproximately(fault.InitialSymmetricalKa, 1e-9 * fault.InitialSymmetricalKa + 1e-300);
            if (fault.IsEnergised)
            {
                var acrossKv = flows.FaultCurrentKa.Magnitude * through.Magnitude * Math.Sqrt(3);
                flows.Voltage(bus.Id).LineToLineKv.Should().BeApproximately(acrossKv, 1e-9 * bus.NominalKv);
            }
        }, iter: 60);

    [Fact]
    public void A_line_current_is_the_voltage_across_it_over_its_impedance()
    {
        var network = Plants.TwoFeedersAndALine();
        var flows = new FaultStudy(network, new MachineDecrement()).FlowsAt("B");
        var acrossKv = (flows.Voltage("A").PerUnit - flows.Voltage("B").PerUnit) * 20 / Math.Sqrt(3);
        var expected = acrossKv / new Complex(0.4, 1.6);
        (flows.Branch("AB").FromBusKa("A") - expected).Magnitude.Should().BeLessThan(1e-12);
        (flows.Branch("AB").FromBusKa("B") + expected).Magnitude.Should().BeLessThan(1e-12);
    }

    [Fact]
    public void The_current_through_a_coupler_equals_that_of_the_fault_moved_behind_it_by_an_extra_bus()
    {
        // Bus A is cut in A and A2 by a coupler; the feeder stays at A. For a fault at A2 the coupler carries all that does not come from
        // A2's own side: the line to B hangs at A2, so the coupler carries the feeder's current alone.
        var network = Plants.TwoFeedersAndALine();
        var cut = network.With(
            new Bus { Id = "A2", NominalKv = 20 },
            new BusCoupler { Id = "breaker", From = "A", To = "A2", Closed = true },
            network.Lines[0] with { From = "A2" });
        var flows = new FaultStudy(cut, new MachineDecrement()).FlowsAt("A2");
        var whole = new FaultStudy(network, new MachineDecrement()).FlowsAt("A");
        (flows.Coupler("breaker").FromToKa!.Value - whole.Source("QA").IntoBusKa).Magnitude.Should().BeLessThan(1e-12);
        (flows.FaultCurrentKa - whole.FaultCurrentKa).Magnitude.Should().BeLessThan(1e-12);
    }

    [Fact]
    public void In_a_ring_of_couplers_no_current_is_claimed_and_beyond_it_each_is_known()
    {
        var network = Plants.TwoFeedersAndALine().With(
            new Bus { Id = "A2", NominalKv = 20 }, new Bus { Id = "A3", NominalKv = 20 }, new Bus { Id = "A4", NominalKv = 20 },
            new BusCoupler { Id = "1", From = "A", To = "A2", Closed = true },
            new BusCoupler { Id = "2", From = "A2", To = "A3", Closed = true },
            new BusCoupler { Id = "3", From = "A3", To = "A", Closed = true },
            new BusCoupler { Id = "4", From = "A3", To = "A4", Closed = true });
        var flows = new FaultStudy(network, new MachineDecrement()).FlowsAt("A4");
        flows.Couplers.Where(one => one.Id != "4").Should().OnlyContain(one => one.FromToKa == null);
        (flows.Coupler("4").FromToKa!.Value - flows.FaultCurrentKa).Magnitude.Should().BeLessThan(1e-12);
    }

    [Fact]
    public void A_fault_at_a_de_energised_bus_moves_nothing()
    {
        var network = Plants.TwoFeedersAndALine().With(new Bus { Id = "dead", NominalKv = 20 });
        var flows = new FaultStudy(network, new MachineDecrement()).FlowsAt("dead");
        flows.FaultCurrentKa.Should().Be(Complex.Zero);
        flows.Sources.Should().OnlyContain(one => one.IntoBusKa == Complex.Zero);
        flows.Voltage("dead").LineToLineKv.Should().Be(0);
        flows.Voltage("A").LineToLineKv.Should().Be(20);
    }

    [Fact]
    public void Unknown_names_are_answered_with_the_nearest()
    {
        var study = new FaultStudy(Plants.TwoFeedersAndALine(), new MachineDecrement());
        var bus = () => study.FlowsAt("a");
        bus.Should().Throw<UnknownIdException>().WithMessage("There is no \"a\" in buses. Did you mean \"A\"?");
        var branch = () => study.FlowsAt("A").Branch("AC");
        branch.Should().Throw<UnknownIdException>().Which.NearestIds.Should().Equal("AB");
    }
}
