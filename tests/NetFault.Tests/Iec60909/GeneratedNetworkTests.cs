using CsCheck;
using NetFault.Tests.Support;

namespace NetFault.Tests.ByIec60909;

/// <summary>
/// Oracle: <see cref="IecOracle"/>, a second implementation of IEC 60909-0:2016 in ohm over dense inverses, on generated networks.
/// </summary>
public class GeneratedNetworkTests
{
    private static readonly double[] Delays = [0.02, 0.035, 0.05, 0.1, 0.18, 0.3];
    private static readonly double[] DcTimes = [0, 0.01, 0.03, 0.07, 0.15];

    [Theory]
    [InlineData(ShortCircuitCase.Maximum)]
    [InlineData(ShortCircuitCase.Minimum)]
    public void Initial_peak_and_direct_currents_agree_with_dense_inverses_at_each_frequency(ShortCircuitCase which) =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = IecRandomNetworks.Make(seed, buses, equalRatios: seed % 2 == 0);
            ForEachBus(network, which, (fault, oracle, way) =>
            {
                AssertClose(fault.InitialSymmetricalKa, oracle.InitialKa(fault.BusId), $"I\u2033k {way} {fault.BusId}");
                AssertClose(fault.PeakKa, oracle.PeakKa(fault.BusId), $"ip {way} {fault.BusId}");
                foreach (var t in DcTimes)
                    AssertDcClose(fault, oracle.DcKa(fault.BusId, t), $"i_dc({t}) {way} {fault.BusId}", t);
            });
        }, iter: 60);

    [Theory]
    [InlineData(ShortCircuitCase.Maximum)]
    [InlineData(ShortCircuitCase.Minimum)]
    public void Breaking_currents_agree_with_all_machines_shares_by_superposition(ShortCircuitCase which) =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = IecRandomNetworks.Make(seed, buses, equalRatios: true, drives: false);
            ForEachBus(network, which, (fault, oracle, way) =>
            {
                var rule = !oracle.IsNearMachines(fault.BusId) ? BreakingCurrentRule.FarFromMachines
                    : oracle.IsRadial(fault.BusId) ? BreakingCurrentRule.Radial : BreakingCurrentRule.Meshed;
                fault.Iec60909!.BreakingCurrentRule.Should().Be(rule, $"{way} {fault.BusId}");
                foreach (var t in Delays)
                    AssertClose(fault.Iec60909!.BreakingKa(t), oracle.BreakingKa(fault.BusId, t), $"Ib({t}) {rule} {way} {fault.BusId}");
            });
        }, iter: 60);

    /// <summary>
    /// Drives do not contribute to Ib (6.11). At one bus this is exact; at every bus a drive with less than 1/1000 of the voltage change
    /// may be left in.
    /// </summary>
    [Fact]
    public void Converter_fed_drives_are_taken_out_of_breaking_currents() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = IecRandomNetworks.Make(seed, buses, equalRatios: true);
            ForEachBus(network, ShortCircuitCase.Maximum, (fault, oracle, way) =>
            {
                var expected = oracle.BreakingKa(fault.BusId, 0.1);
                if (way == "at one bus")
                    AssertClose(fault.Iec60909!.BreakingKa(0.1), expected, fault.BusId);
                else
                    fault.Iec60909!.BreakingKa(0.1).Should().BeInRange(expected * (1 - 1e-9), expected * (1 + 1e-3), fault.BusId);
            });
        }, iter: 40);

    [Theory]
    [InlineData(ShortCircuitCase.Maximum)]
    [InlineData(ShortCircuitCase.Minimum)]
    public void Radial_steady_state_currents_are_the_sum_of_factors_times_rated_currents(ShortCircuitCase which) =>
        RandomNetworks.Cases(20).Sample((seed, buses) =>
        {
            var network = IecRandomNetworks.Make(seed, buses, equalRatios: true, drives: false);
            network = network.With(
            [
                .. network.SynchronousMachines.Select(one => one with { SteadyStateFactor = new MaxMin(2.5 + one.RatedMva / 100, 0.4) }),
                .. network.AsynchronousMotors.Select(one => one with { InService = false }),
                .. network.DoublyFedGenerators.Select(one => one with { InService = false }),
            ]);
            ForEachBus(network, which, (fault, oracle, way) =>
            {
                if (fault.Iec60909!.SteadyStateCurrentRule == SteadyStateCurrentRule.WithoutMotors)
                    return;
                var expected = oracle.RadialSteadyKa(
                    fault.BusId, one => which == ShortCircuitCase.Maximum ? 2.5 + one.RatedMva / 100 : 0.4);
                AssertClose(fault.SteadyStateKa!.Value, expected, $"Ik {way} {fault.BusId}");
            });
        }, iter: 60);

    [Fact]
    public void Meshed_breaking_currents_agree_where_ratios_in_loops_differ() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = IecRandomNetworks.Make(seed, buses, equalRatios: false, drives: false);
            ForEachBus(network, ShortCircuitCase.Maximum, (fault, oracle, way) =>
            {
                if (!oracle.IsRadial(fault.BusId))
                    AssertClose(fault.Iec60909!.BreakingKa(0.1), oracle.MeshedBreakingKa(fault.BusId, 0.1), $"Ib {way} {fault.BusId}");
            });
        }, iter: 60);

    [Fact]
    public void Steady_state_currents_without_factors_are_the_initial_ones_without_motors() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
            ForEachBus(IecRandomNetworks.Make(seed, buses, equalRatios: false), ShortCircuitCase.Maximum, (fault, oracle, way) =>
                AssertClose(fault.SteadyStateKa!.Value, oracle.SteadyWithoutMotorsKa(fault.BusId), $"Ik {way} {fault.BusId}")), iter: 40);

    [Fact]
    public void Methods_a_and_b_agree_with_branch_ratios_and_a_dense_inverse_at_rated_frequency() =>
        RandomNetworks.Cases(30).Sample((seed, buses) =>
        {
            var network = IecRandomNetworks.Make(seed, buses, equalRatios: false);
            var oracle = new IecOracle(network);
            foreach (var fault in Energised(new FaultStudy(network, new Iec60909 { XOverRRule = XOverRRule.SmallestRatio }).EveryBus()))
                AssertClose(fault.Iec60909!.Kappa, oracle.KappaA(fault.BusId), "(a) " + fault.BusId);
            foreach (var fault in Energised(new FaultStudy(network, new Iec60909 { XOverRRule = XOverRRule.ComplexImpedance }).EveryBus()))
                AssertClose(fault.Iec60909!.Kappa, oracle.KappaB(fault.BusId), "(b) " + fault.BusId);
        }, iter: 40);

    /// <summary>The keys of the network file that this method needs survive writing and reading.</summary>
    [Fact]
    public void A_network_written_and_read_again_gives_the_same_currents() =>
        RandomNetworks.Cases(20).Sample((seed, buses) =>
        {
            var network = IecRandomNetworks.Make(seed, buses, equalRatios: true);
            var read = NetworkFile.Parse(NetworkFile.ToText(network));
            foreach (var which in new[] { ShortCircuitCase.Maximum, ShortCircuitCase.Minimum })
            {
                var again = new FaultStudy(read, new Iec60909 { Case = which }).EveryBus().ToDictionary(fault => fault.BusId);
                foreach (var fault in Energised(new FaultStudy(network, new Iec60909 { Case = which }).EveryBus()))
                {
                    AssertClose(again[fault.BusId].PeakKa, fault.PeakKa, fault.BusId);
                    AssertClose(again[fault.BusId].Iec60909!.BreakingKa(0.1), fault.Iec60909!.BreakingKa(0.1), fault.BusId);
                    AssertClose(again[fault.BusId].SteadyStateKa!.Value, fault.SteadyStateKa!.Value, fault.BusId);
                }
            }
        }, iter: 20);

    /// <summary>Large enough that most machines' shares at most buses are pruned away.</summary>
    [Fact]
    public void Breaking_currents_of_a_network_of_150_buses_agree_at_every_bus()
    {
        var network = IecRandomNetworks.Make(20263, 150, equalRatios: true, drives: false);
        var oracle = new IecOracle(network);
        foreach (var fault in Energised(new FaultStudy(network, new Iec60909()).EveryBus()))
            AssertClose(fault.Iec60909!.BreakingKa(0.1), oracle.BreakingKa(fault.BusId, 0.1), fault.BusId);
    }

    /// <summary>Results at every bus take only the large shares, those at one bus take all.</summary>
    [Fact]
    public void Breaking_currents_of_a_grid_of_1200_buses_are_the_same_at_every_bus_and_at_one()
    {
        var grid = Grids.Meshed(24, 50);
        var builder = grid.ToBuilder().Set([.. grid.SynchronousMachines.Select(one => one with { RatedPowerFactor = 0.85 })]);
        for (var i = 3; i < 1200; i += 10)
        {
            builder.Add(
                new Bus { Id = $"M{i}", NominalKv = 10 },
                new Transformer
                {
                    Id = $"T{i}", Hv = $"B{i}", Lv = $"M{i}", RatedMva = 25, RatedHvKv = 110, RatedLvKv = 10.5,
                    ShortCircuitVoltagePercent = 11,
                    ResistivePercent = 0.6,
                },
                IecCases.Motor($"M{i}") with { Count = 5 });
        }
        var network = builder.Build();
        var study = new FaultStudy(network, new Iec60909());
        foreach (var fault in new FaultStudy(network, new Iec60909()).EveryBus())
            AssertClose(fault.Iec60909!.BreakingKa(0.1), study.At(fault.BusId).Iec60909!.BreakingKa(0.1), fault.BusId);
    }

    /// <summary>Results at every bus and at one bus come by different ways inside the library.</summary>
    private static void ForEachBus(Network network, ShortCircuitCase which, Action<BusFault, IecOracle, string> check)
    {
        var method = new Iec60909 { Case = which };
        var oracle = new IecOracle(network, which);
        foreach (var fault in new FaultStudy(network, method).EveryBus())
            fault.IsEnergised.Should().Be(oracle.IsEnergised(fault.BusId));
        foreach (var fault in Energised(new FaultStudy(network, method).EveryBus()))
            check(fault, oracle, "at every bus");
        var study = new FaultStudy(network, method);
        foreach (var bus in network.Buses.Where(bus => oracle.IsEnergised(bus.Id)))
            check(study.At(bus.Id), oracle, "at one bus");
    }

    private static IEnumerable<BusFault> Energised(IEnumerable<BusFault> faults) => faults.Where(fault => fault.IsEnergised);

    /// <summary>The exponent ω·t·R/X multiplies the relative error of R/X.</summary>
    private static void AssertDcClose(BusFault fault, double expected, string what, double t)
    {
        var exponent = Math.Max(1, Math.Log(Math.Sqrt(2) * fault.InitialSymmetricalKa / expected));
        fault.DcComponentKa(t).Should().BeApproximately(expected, 1e-9 * exponent * expected, what);
    }

    private static void AssertClose(double actual, double expected, string what) =>
        actual.Should().BeApproximately(expected, 1e-9 * Math.Abs(expected), what);
}
