using CsCheck;
using NetFault.Tests.Support;
using static NetFault.Tests.Support.IecCases;

namespace NetFault.Tests.ByIec60909;

/// <summary>Oracle: laws that hold for every network by IEC 60909-0, whatever its data.</summary>
public class LawTests
{
    [Fact]
    public void No_peak_exceeds_twice_root_2_times_the_initial_current_by_any_method() =>
        RandomNetworks.Cases(30).Sample((seed, buses) =>
        {
            var network = IecRandomNetworks.Make(seed, buses, equalRatios: false);
            foreach (var rule in new[] { XOverRRule.SmallestRatio, XOverRRule.ComplexImpedance, XOverRRule.EquivalentFrequency })
            {
                foreach (var fault in Energised(network, new Iec60909 { XOverRRule = rule }))
                    (fault.PeakKa / Math.Sqrt(2) / fault.InitialSymmetricalKa).Should().BeInRange(1.02, 2 * (1 + 1e-12));
            }
        }, iter: 40);

    [Fact]
    public void No_breaking_current_exceeds_the_initial_one_at_any_delay() =>
        RandomNetworks.Cases(30).Sample((seed, buses) =>
        {
            foreach (var fault in Energised(IecRandomNetworks.Make(seed, buses, equalRatios: true), new Iec60909()))
            {
                foreach (var delay in new[] { 0.02, 0.05, 0.1, 0.25 })
                    fault.Iec60909!.BreakingKa(delay).Should().BeLessThanOrEqualTo(fault.InitialSymmetricalKa * (1 + 1e-12),
                        $"{fault.BusId} {delay} s");
            }
        }, iter: 40);

    [Fact]
    public void Without_machines_breaking_steady_state_and_initial_currents_are_one() =>
        RandomNetworks.Cases(30).Sample((seed, buses) =>
        {
            var whole = IecRandomNetworks.Make(seed, buses, equalRatios: false);
            var network = new NetworkBuilder { FrequencyHz = whole.FrequencyHz, BaseMva = whole.BaseMva }
                .Add([.. whole.Elements.Where(one => one is not ShuntElement or NetworkFeeder)]).Build();
            foreach (var fault in Energised(network, new Iec60909()))
            {
                fault.Iec60909!.BreakingKa(0.1).ShouldBe(fault.InitialSymmetricalKa);
                fault.SteadyStateKa!.Value.ShouldBe(fault.InitialSymmetricalKa);
                fault.Iec60909.BreakingCurrentRule.Should().Be(BreakingCurrentRule.FarFromMachines);
            }
        }, iter: 30);

    /// <summary>
    /// For feeders whose minimum is below their maximum by more than c changes between voltages (table 1: 1.22 to 1.10), and without series
    /// capacitors: c in ZQ would else move a resonance.
    /// </summary>
    [Fact]
    public void No_minimum_initial_current_exceeds_the_maximum_one() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = IecRandomNetworks.Make(seed, buses, equalRatios: false);
            network = network.With(
            [
                .. network.SeriesCapacitors.Select(one => one with { VoltageLimited = true }),
                .. network.NetworkFeeders.Select(one =>
                    one with { ShortCircuitMva = Weaker(one.ShortCircuitMva), ShortCircuitKa = Weaker(one.ShortCircuitKa) }),
            ]);
            var minimum = Energised(network, new Iec60909 { Case = ShortCircuitCase.Minimum }).ToDictionary(fault => fault.BusId);
            foreach (var fault in Energised(network, new Iec60909()))
                minimum[fault.BusId].InitialSymmetricalKa.Should().BeLessThanOrEqualTo(fault.InitialSymmetricalKa * (1 + 1e-12),
                    fault.BusId);
        }, iter: 40);

    [Fact]
    public void A_machine_moved_far_away_has_mu_towards_1()
    {
        var before = 0.0;
        foreach (var ohm in new[] { 1e-6, 0.1, 0.3, 0.8, 1.2, 3, 100 })
        {
            var fault = Of(Bus("A", 10), Bus("B", 10), Generator("A"), Feeder("B", 12), Line("A", "B", ohm / 10, ohm)).At("B");
            var kept = fault.Iec60909!.BreakingKa(0.1) / fault.InitialSymmetricalKa;
            kept.Should().BeGreaterThanOrEqualTo(before).And.BeLessThan(1 + 1e-12);
            before = kept;
        }
        before.ShouldBe(1);
    }

    [Fact]
    public void Results_at_every_bus_and_at_one_bus_are_the_same() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = IecRandomNetworks.Make(seed, buses, equalRatios: false, drives: false);
            foreach (var rule in new[] { XOverRRule.SmallestRatio, XOverRRule.ComplexImpedance, XOverRRule.EquivalentFrequency })
            {
                var method = new Iec60909 { XOverRRule = rule, LeaveOutSmallMotors = seed % 2 == 0 };
                var fresh = new FaultStudy(network, method);
                foreach (var fault in Energised(network, method))
                    AssertSame(fresh.At(fault.BusId), fault);
            }
        }, iter: 30);

    [Fact]
    public void Renumbering_the_buses_and_elements_changes_nothing() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = IecRandomNetworks.Make(seed, buses, equalRatios: true, drives: false);
            var shuffled = new NetworkBuilder { FrequencyHz = network.FrequencyHz, BaseMva = network.BaseMva }
                .Add([.. network.Elements.OrderBy(one => Hash(one.Id, seed))]).Build();
            AssertSame(network, shuffled);
        }, iter: 40);

    [Fact]
    public void Splitting_a_line_in_two_changes_nothing_elsewhere() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = IecRandomNetworks.Make(seed, buses, equalRatios: true, drives: false);
            if (network.Lines.FirstOrDefault(one => one.OhmPerKm.HasValue) is not { } line)
                return;
            AssertSame(network, network.With(
                Bus("middle", network.Find<Bus>(line.From).NominalKv), line with { To = "middle", LengthKm = line.LengthKm * 0.3 },
                line with { Id = "rest", From = "middle", LengthKm = line.LengthKm * 0.7 }));
        }, iter: 40);

    [Fact]
    public void The_base_power_changes_nothing() =>
        RandomNetworks.Cases(30).Sample((seed, buses) =>
        {
            var network = IecRandomNetworks.Make(seed, buses, equalRatios: true, drives: false);
            var builder = network.ToBuilder();
            builder.BaseMva *= 7.3;
            AssertSame(network, builder.Build());
        }, iter: 20);

    private static MaxMin? Weaker(MaxMin? value) => value is { } known ? new MaxMin(known.Max, 0.8 * known.Max) : null;

    private static IEnumerable<BusFault> Energised(Network network, Iec60909 method) =>
        new FaultStudy(network, method).EveryBus().Where(fault => fault.IsEnergised);

    private static void AssertSame(Network one, Network other)
    {
        var byId = new FaultStudy(other, new Iec60909()).EveryBus().ToDictionary(fault => fault.BusId);
        foreach (var fault in Energised(one, new Iec60909()))
            AssertSame(byId[fault.BusId], fault);
    }

    private static void AssertSame(BusFault one, BusFault other)
    {
        one.InitialSymmetricalKa.ShouldBe(other.InitialSymmetricalKa, other.BusId, 1e-9);
        one.PeakKa.ShouldBe(other.PeakKa, other.BusId, 1e-9);
        one.DcComponentKa(0.02).ShouldBe(other.DcComponentKa(0.02), other.BusId, 1e-8);
        one.Iec60909!.BreakingKa(0.1).ShouldBe(other.Iec60909!.BreakingKa(0.1), other.BusId, 1e-9);
        one.Iec60909.BreakingCurrentRule.Should().Be(other.Iec60909.BreakingCurrentRule);
        one.SteadyStateKa!.Value.ShouldBe(other.SteadyStateKa!.Value, other.BusId, 1e-9);
        one.Iec60909.ThermalEquivalentKa(1).ShouldBe(other.Iec60909.ThermalEquivalentKa(1), other.BusId, 1e-9);
    }

    private static int Hash(string id, int seed) => unchecked((id.Aggregate(seed, (hash, c) => hash * 31 + c) * 2654435) & 0xFFFFFF);
}
