using System.Numerics;
using CsCheck;
using NetFault.Tests.Support;

namespace NetFault.Tests.Duty;

/// <summary>
/// Oracle: the network with an explicit extra bus beyond the device, joined by a closed coupler that stands for the device, and the coupler's
/// current in the flows of a fault at either of its buses.
/// </summary>
public class ThroughCurrentTests
{
    public static TheoryData<string> Methods => new() { "decrement", "separate", "iec", "ieee", "e/x" };

    [Theory]
    [MemberData(nameof(Methods))]
    public void The_current_through_a_breaker_is_that_of_the_fault_moved_to_its_other_side_by_an_extra_bus(string name) =>
        RandomNetworks.Cases(30).Sample((seed, buses) =>
        {
            var network = name == "iec" ? WithoutConverters(IecRandomNetworks.Make(seed, buses, equalRatios: seed % 2 == 0)) : RandomNetworks.Make(seed, buses);
            AssertAll(network, MethodOf(name), seed);
        }, iter: 40);

    [Fact]
    public void Over_time_too()
    {
        var method = new MachineDecrement();
        RandomNetworks.Cases(12).Sample((seed, buses) =>
        {
            var network = RandomNetworks.Make(seed, buses);
            var study = new FaultStudy(network, method);
            if (!HasCurrentOverTime(study))
                return;
            foreach (var (bus, element) in Terminals(network).Where((_, i) => (i + seed) % 5 == 0))
            {
                if (!IsThere(network, bus, element))
                    continue;
                var cut = new FaultStudy(Cut(network, bus, element), method);
                var through = study.ThroughCurrents(Breaker(bus, element));
                foreach (var seconds in new[] { 0.0, 0.06 })
                {
                    var atBus = cut.FlowsAtTime(bus, seconds).Coupler("device").FromToKa;
                    var flows = cut.FlowsAtTime("beyond", seconds);
                    if (atBus is null || flows.Coupler("device").FromToKa is not { } beyond)
                        continue;
                    var tolerance = 1e-9 * flows.FaultCurrentKa.Magnitude + Rounding(cut, bus);
                    through.AtBus.SymmetricalRmsKa(seconds).Should().BeApproximately(atBus.Value.Magnitude, tolerance);
                    through.BeyondDevice.SymmetricalRmsKa(seconds).Should().BeApproximately(beyond.Magnitude, tolerance);
                }
            }
        }, iter: 15);
    }

    [Theory]
    [MemberData(nameof(Methods))]
    public void A_check_of_a_breaker_at_every_terminal_finds_the_larger_of_the_two_currents_of_each(string name) =>
        RandomNetworks.Cases(25).Sample((seed, buses) =>
        {
            var network = name == "iec" ? IecRandomNetworks.Make(seed, buses, equalRatios: true) : RandomNetworks.Make(seed, buses);
            var breakers = Terminals(network).Select((one, i) => Breaker(one.Bus, one.Element) with
            {
                Id = $"CB{i}", ShortCircuitBreakingCurrentKa = 40, MinimumOpeningTimeSeconds = 0.04,
            }).Where(one => network.Find<Bus>(one.Bus).NominalKv > 1).ToArray<NetworkElement>();
            var study = new FaultStudy(network.With(breakers), MethodOf(name));
            if (!HasCurrentOverTime(study))
                return;
            var check = DutyCheck.Of(study);
            check.Devices.Should().HaveCount(breakers.Length);
            foreach (var device in check.Devices.Where(one => one.Verdict != DutyVerdict.NoCurrent && !one.Remarks.Any(remark => remark.Contains("closed"))))
            {
                var currents = study.ThroughCurrents((CircuitBreaker)device.Device);
                var peak = Math.Max(currents.AtBus.PeakKa, currents.BeyondDevice.PeakKa);
                var required = device.Duties.Single(one => one.Kind == DutyKind.Making).Required!.Value;
                // Inside power station units the check takes the larger of two rules.
                required.Should().BeGreaterThanOrEqualTo(peak * (1 - 1e-6));
                if (name != "iec")
                    required.Should().BeApproximately(peak, 1e-6 * peak);
            }
        }, iter: 12);

    private static void AssertAll(Network network, FaultMethod method, int seed)
    {
        var study = new FaultStudy(network, method);
        var all = Terminals(network).Where((_, i) => (i + seed) % 3 == 0).ToList();
        var places = new ThroughPlaces(study.Context.Networks.Circuit);
        var there = all.Where(one => IsThere(network, one.Bus, one.Element)).ToList();
        // All at once by the selected inverse, each alone by a solve.
        var together = new ThroughStudy(study.Context, there.Select(one => places.Of(network.Topology.FindBus(one.Bus), one.Element)).ToList());
        for (var i = 0; i < there.Count; i++)
        {
            AssertOne(study, there[i].Bus, there[i].Element, together.Of(i));
            AssertOne(study, there[i].Bus, there[i].Element, study.ThroughCurrents(Breaker(there[i].Bus, there[i].Element)));
        }
    }

    private static void AssertOne(FaultStudy study, string bus, NetworkElement element, DeviceCurrents through)
    {
        var cut = new FaultStudy(Cut(study.Network, bus, element), study.Method);
        var atBus = cut.FlowsAt(bus);
        var beyond = cut.FlowsAt("beyond");
        if (atBus.Coupler("device").FromToKa is not { } contribution || beyond.Coupler("device").FromToKa is not { } rest)
        {
            through.BeyondDevice.IsWhole.Should().BeTrue();
            Close(through.BeyondDevice.InitialSymmetricalKa, beyond.FaultCurrentKa.Magnitude, cut, beyond);
            return;
        }
        Close(-through.AtBus.Share * atBus.FaultCurrentKa, contribution, cut, atBus);
        Close(through.BeyondDevice.Share * beyond.FaultCurrentKa, rest, cut, beyond);
        if (study.Method is MachineDecrement { XOverRRule: XOverRRule.ComplexImpedance })
            AssertRatio(through.BeyondDevice, rest, beyond);
        Close(through.AtBus.InitialSymmetricalKa, contribution.Magnitude, cut, atBus);
        Close(through.BeyondDevice.InitialSymmetricalKa, rest.Magnitude, cut, beyond);
    }

    /// <summary>X/R of the current is that of the impedance V/I through which the driving voltage would send it.</summary>
    private static void AssertRatio(ThroughCurrent through, Complex current, FaultFlows flows)
    {
        if (through.XOverR is { } ratio && ratio < 1e3 && through.Share.Magnitude > 1e-3)
            ratio.Should().BeApproximately(-current.Imaginary / current.Real, 1e-5 * ratio, flows.BusId);
    }

    /// <summary>Inductive currents do not jump: at the beginning the DC component of each branch is the AC component with the opposite sign.</summary>
    [Fact]
    public void The_exact_DC_component_through_a_breaker_begins_at_the_peak_of_the_AC_component()
    {
        var method = new MachineDecrement { AcComponentRule = AcComponentRule.Exact, DcDecayRule = DcDecayRule.Exact };
        RandomNetworks.Cases(10).Sample((seed, buses) =>
        {
            var network = RandomNetworks.Make(seed, buses);
            var study = new FaultStudy(network, method);
            if (!HasCurrentOverTime(study))
                return;
            foreach (var (bus, element) in Terminals(network).Where((one, i) => (i + seed) % 7 == 0 && IsThere(network, one.Bus, one.Element)))
            {
                var through = study.ThroughCurrents(Breaker(bus, element));
                foreach (var side in new[] { through.AtBus, through.BeyondDevice })
                {
                    side.DcComponentKa(0).Should().BeApproximately(
                        Math.Sqrt(2) * side.SymmetricalRmsKa(0), 1e-5 * study.At(bus).InitialSymmetricalKa, $"{bus} to {element.Id}");
                }
            }
        }, iter: 8);
    }

    private static void Close(Complex actual, Complex expected, FaultStudy cut, FaultFlows flows) =>
        (actual - expected).Magnitude.Should().BeLessThan(1e-9 * flows.FaultCurrentKa.Magnitude + Rounding(cut, flows.BusId));

    /// <summary>What rounding of a voltage behind the network's largest admittance makes of a branch current.</summary>
    private static double Rounding(FaultStudy study, string bus)
    {
        var admittance = study.AdmittanceMatrix().Diagonal().Select(Complex.Abs).DefaultIfEmpty().Max();
        return 1e-13 * admittance * study.Network.BaseMva / (Math.Sqrt(3) * study.Network.Find<Bus>(bus).NominalKv) + 1e-300;
    }

    /// <summary>Some generated networks have negative reactances in their star equivalents that the current over time is refused for.</summary>
    private static bool HasCurrentOverTime(FaultStudy study)
    {
        try
        {
            study.SolveOverTime();
            return true;
        }
        catch (CurrentOverTimeException)
        {
            return false;
        }
    }

    private static FaultMethod MethodOf(string name) => name switch
    {
        "decrement" => new MachineDecrement(),
        "separate" => new MachineDecrement { XOverRRule = XOverRRule.SeparateNetworks },
        "iec" => new Iec60909(),
        "ieee" => new IeeeC37(),
        _ => new IeeeC37 { CurrentRule = IeeeCurrentRule.EOverX },
    };

    private static IEnumerable<(string Bus, NetworkElement Element)> Terminals(Network network) =>
        network.Elements.Where(one => one is not RatedDevice).SelectMany(one => one.Terminals.OfType<string>(), (one, bus) => (bus, one));

    private static bool IsThere(Network network, string bus, NetworkElement element) =>
        element.InService && element is not BusCoupler { Closed: false }
        && element.Terminals.OfType<string>().All(one => network.Find<Bus>(one).InService) && network.Topology.IsEnergised(network.Topology.FindBus(bus));

    private static Network Cut(Network network, string bus, NetworkElement element) => network.With(
        network.Find<Bus>(bus) with { Id = "beyond" },
        MovedTerminal.Of(element, bus, "beyond"),
        new BusCoupler { Id = "device", From = bus, To = "beyond", Closed = true });

    private static CircuitBreaker Breaker(string bus, NetworkElement element) => new()
    {
        Id = "breaker", Bus = bus, Feeds = element.Id, FeedsSection = element.Section, Standard = CircuitBreakerStandard.Iec62271_100,
    };

    private static Network WithoutConverters(Network network) =>
        new NetworkBuilder { FrequencyHz = network.FrequencyHz, BaseMva = network.BaseMva }
            .Add([.. network.Elements.Where(one => one is not (FullConverterSource or DoublyFedGenerator))]).Build();
}
