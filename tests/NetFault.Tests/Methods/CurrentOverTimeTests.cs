using CsCheck;
using NetFault.Tests.Support;

namespace NetFault.Tests.Methods;

/// <summary>
/// The current over time. Oracles: closed forms for one machine; <see cref="DecayOracle"/>, the eigenvalues of the state matrix, for
/// plants; a circuit simulation's printed digits for <see cref="TwoSources"/>.
/// </summary>
public class CurrentOverTimeTests
{
    private static readonly MachineDecrement QuasiStatic = new() { AcComponentRule = AcComponentRule.QuasiStatic };

    private static readonly MachineDecrement Exact = new() { AcComponentRule = AcComponentRule.Exact, DcDecayRule = DcDecayRule.Exact };

    private static readonly double GeneratorKa = 25 / (Math.Sqrt(3) * 10);

    [Theory]
    [InlineData(0.0)]
    [InlineData(0.001)]
    [InlineData(0.02)]
    [InlineData(0.1)]
    [InlineData(0.7)]
    [InlineData(10.0)]
    public void One_machine_at_its_terminals_decays_as_the_textbook_says(double t)
    {
        var network = Plants.OneGenerator(new MachineReactances(0.14, 0.23, 1.9), 0, new MachineTimeConstants(0.028, 0.85));
        var expected = 1 / 1.9 + (1 / 0.23 - 1 / 1.9) * Math.Exp(-t / 0.85) + (1 / 0.14 - 1 / 0.23) * Math.Exp(-t / 0.028);
        var fault = new FaultStudy(network, QuasiStatic with { HorizonSeconds = 10 }).At("T");
        fault.SymmetricalRmsKa(t).Should().BeApproximately(expected * GeneratorKa, 1e-9 * GeneratorKa / 0.14);
    }

    [Theory]
    [InlineData(0.01, 0.3)]
    [InlineData(0.05, 10.0)]
    public void One_machine_with_extreme_time_constants_decays_as_the_textbook_says(double subtransient, double transient)
    {
        var network = Plants.OneGenerator(new MachineReactances(0.1, 0.2, 2), 0, new MachineTimeConstants(subtransient, transient), 60);
        var fault = new FaultStudy(network, QuasiStatic with { HorizonSeconds = 5 }).EveryBus()[0];
        foreach (var t in new[] { 0.001, 0.01, 0.05, 0.2, 1, 5 })
        {
            var expected = 0.5 + 4.5 * Math.Exp(-t / transient) + 5 * Math.Exp(-t / subtransient);
            fault.SymmetricalRmsKa(t).Should().BeApproximately(expected * GeneratorKa, 1e-9 * 10 * GeneratorKa);
        }
    }

    [Fact]
    public void A_motor_beside_a_feeder_dies_out_with_its_own_time_constant()
    {
        var network = Plants.OneFeeder(0.1).With(new AsynchronousMotor
        {
            Id = "M", Bus = "Q", RatedKw = 2000, RatedKv = 20, RatedPowerFactor = 0.88, Efficiency = 0.95, LockedRotorCurrentRatio = 6,
            ROverX = 0.1, Count = 3, RatedSlipPercent = 0.8,
        });
        var motorsKa = 3 * 6 * 2 / (0.88 * 0.95) / (Math.Sqrt(3) * 20);
        var seconds = 1 / 6.0 / Math.Sqrt(1.01) / (2 * Math.PI * 50 * 0.008);
        var fault = new FaultStudy(network, QuasiStatic).At("Q");
        foreach (var t in new[] { 0.0, 0.005, 0.06, 0.3, 1 })
            fault.SymmetricalRmsKa(t).Should().BeApproximately(10 + motorsKa * Math.Exp(-t / seconds), 1e-7);
    }

    [Theory]
    [InlineData(0.01, 50)]
    [InlineData(0.3, 60)]
    [InlineData(5, 50)]
    public void A_radial_circuit_of_resistance_and_reactance_has_the_closed_form(double ratio, double frequencyHz)
    {
        // i = √2·I·[sin(ωt + α − φ) − sin(α − φ)·e^(−ωt·R/X)], the largest DC component that of α = φ ± 90°.
        var fault = new FaultStudy(Plants.OneFeeder(ratio, frequencyHz), Exact).At("Q");
        double phi = Math.Atan(1 / ratio), omega = 2 * Math.PI * frequencyHz;
        foreach (var t in new[] { 0.001, 0.0073, 0.02, 0.1, 0.5 })
        {
            var decayed = Math.Exp(-omega * t * ratio);
            fault.SymmetricalRmsKa(t).Should().BeApproximately(10, 1e-5);
            fault.DcComponentKa(t).Should().BeApproximately(Math.Sqrt(2) * 10 * decayed, 1e-5);
            fault.AsymmetricalRmsKa(t).Should().BeApproximately(10 * Math.Sqrt(1 + 2 * decayed * decayed), 2e-5);
            foreach (var degrees in new[] { 0.0, 35, 90, 200 })
            {
                var alpha = degrees * Math.PI / 180;
                var expected = Math.Sqrt(2) * 10 * (Math.Sin(omega * t + alpha - phi) - Math.Sin(alpha - phi) * decayed);
                fault.InstantaneousKa(t, degrees).Should().BeApproximately(expected, 2e-5);
            }
        }
    }

    [Fact]
    public void At_every_bus_of_a_generated_plant_the_quasi_static_AC_component_is_that_of_the_eigenvalues() =>
        RandomDecayPlants.Cases(40).Sample((seed, buses, machines) =>
        {
            var network = RandomDecayPlants.Make(seed, buses, machines);
            foreach (var fault in new FaultStudy(network, QuasiStatic with { HorizonSeconds = 5 }).EveryBus())
            {
                var oracle = new DecayOracle(network, fault.BusId, DecayMode.QuasiStatic);
                var most = 1e-8 * oracle.InitialKa;
                foreach (var t in new[] { 0, 0.001, 0.02, 0.1, 0.5, 5 })
                    fault.SymmetricalRmsKa(t).Should().BeApproximately(oracle.AcRmsKa(t), most, $"{fault.BusId} at {t} s");
            }
        }, iter: 6);

    [Fact]
    public void At_every_bus_of_a_generated_plant_the_exact_current_is_that_of_the_eigenvalues() =>
        RandomDecayPlants.Cases().Sample(
            (seed, buses, machines) => AssertExact(RandomDecayPlants.Make(seed, buses, machines), seed), iter: 2);

    [Fact]
    public void At_every_bus_of_a_plant_of_60_buses_and_20_machines_the_exact_current_is_that_of_the_eigenvalues() =>
        AssertExact(RandomDecayPlants.Make(2026, 60, 20), 2026);

    [Fact]
    public void The_worst_peak_is_the_largest_instantaneous_current_of_all_closing_angles() =>
        RandomDecayPlants.Cases(20, 6).Sample((seed, buses, machines) =>
        {
            var network = RandomDecayPlants.Make(seed, buses, machines);
            var bus = network.Buses[seed % buses].Id;
            var fault = new FaultStudy(network, Exact).At(bus);
            var oracle = new DecayOracle(network, bus, DecayMode.Exact);
            var (peak, expected) = (fault.WorstPeak!, oracle.WorstPeak());
            peak.Ka.Should().BeApproximately(expected.Ka, 3e-6 * oracle.InitialKa);
            // The top is flat, the more so the less DC there is in it: with a tenth of I″k an error of 3e-6 in the current moves it by up to
            // √(2·3e-6/0.1)/ω, 0.025 ms at 50 Hz.
            if (expected.Ka > 1.1 * Math.Sqrt(2) * oracle.AcRmsKa(expected.Seconds))
                peak.Seconds.Should().BeApproximately(expected.Seconds, 5e-5);
            var (t, angle) = (peak.Seconds, peak.ClosingAngleDegrees);
            Math.Abs(oracle.InstantaneousKa(t, angle)).Should().BeApproximately(expected.Ka, 1e-5 * oracle.InitialKa);
            Math.Abs(fault.InstantaneousKa(t, angle)).Should().BeApproximately(peak.Ka, 1e-9 * peak.Ka);
        }, iter: 15);

    [Fact]
    public void Two_sources_of_different_X_over_R_have_the_simulated_currents_at_the_common_bus()
    {
        var fault = new FaultStudy(TwoSources.Make(), Exact).At("BUS");
        var most = PrintedWithin(fault);
        fault.SymmetricalRmsKa(0.02).Should().BeApproximately(TwoSources.AcAtBusKa, most);
        fault.WorstPeak!.Ka.Should().BeApproximately(TwoSources.PeakAtBusKa, 2 * most);
        fault.WorstPeak!.Seconds.Should().BeApproximately(TwoSources.PeakAtBusSeconds, 2e-5);
        foreach (var (seconds, ka) in TwoSources.DcAtBus)
            fault.DcComponentKa(seconds).Should().BeApproximately(ka, most);
    }

    [Fact]
    public void Two_sources_of_different_X_over_R_have_the_simulated_currents_at_the_generator()
    {
        var fault = new FaultStudy(TwoSources.Make(), Exact).EveryBus().Single(one => one.BusId == "GT");
        var most = PrintedWithin(fault);
        fault.SymmetricalRmsKa(0.02).Should().BeApproximately(TwoSources.AcAtGeneratorKa, most);
        fault.WorstPeak!.Ka.Should().BeApproximately(TwoSources.PeakAtGeneratorKa, 2 * most);
        foreach (var (seconds, ka) in TwoSources.DcAtGenerator)
            fault.DcComponentKa(seconds).Should().BeApproximately(ka, most);
    }

    [Fact]
    public void A_single_bus_question_gives_the_same_as_the_every_bus_one()
    {
        var network = RandomDecayPlants.Make(77, 25, 8);
        foreach (var method in new[] { Exact, QuasiStatic })
        {
            var fresh = new FaultStudy(network, method);
            foreach (var fault in new FaultStudy(network, method).EveryBus())
                AssertSame(fresh.At(fault.BusId), fault);
        }
    }

    [Fact]
    public void A_bus_without_a_source_has_no_current_at_any_time()
    {
        var network = TwoSources.Make().With(new Bus { Id = "DARK", NominalKv = 13.8 });
        foreach (var fault in new[] { new FaultStudy(network, Exact).At("DARK"), new FaultStudy(network, Exact).EveryBus()[^1] })
        {
            fault.IsEnergised.Should().BeFalse();
            fault.SymmetricalRmsKa(0.05).Should().Be(0);
            fault.DcComponentKa(0.05).Should().Be(0);
            fault.AsymmetricalRmsKa(0.05).Should().Be(0);
            fault.InstantaneousKa(0.05, 30).Should().Be(0);
        }
    }

    [Fact]
    public void The_quasi_static_AC_component_begins_at_the_initial_current_and_ends_at_the_steady_state_one()
    {
        var network = RandomDecayPlants.Make(5, 12, 5);
        var quick = new MachineTimeConstants(0.03, 0.06);
        network = network.With([.. network.SynchronousMachines.Select(one => one with { TimeConstantSeconds = quick })]);
        foreach (var fault in new FaultStudy(network, QuasiStatic with { HorizonSeconds = 10 }).EveryBus())
        {
            fault.SymmetricalRmsKa(0).Should().BeApproximately(fault.InitialSymmetricalKa, 1e-8 * fault.InitialSymmetricalKa);
            // No mode of a machine is slower than its open-circuit time constant, here below 10·0.06 s: after 10 s less than 1e-7 is left.
            fault.SymmetricalRmsKa(10).Should().BeApproximately(fault.SteadyStateKa!.Value, 1e-6 * fault.InitialSymmetricalKa);
        }
    }

    /// <summary>AC and DC at every bus from 1 ms to 5 s to 1e-6 of I″k, and within the bound that the result states.</summary>
    private static void AssertExact(Network network, int seed)
    {
        var random = new Random(seed);
        foreach (var fault in new FaultStudy(network, Exact with { HorizonSeconds = 5 }).EveryBus())
        {
            var oracle = new DecayOracle(network, fault.BusId, DecayMode.Exact);
            var most = 1e-6 * oracle.InitialKa;
            var degrees = 360 * random.NextDouble();
            foreach (var t in new[] { 0.001, 0.003, 0.01, 0.03, 0.1, 0.4, 1.5, 5 })
            {
                var because = $"{fault.BusId} at {t} s";
                var stated = (fault.DecayErrorBound(t) + 1e-10) * oracle.InitialKa;
                double ac = oracle.AcRmsKa(t), dc = oracle.DcEnvelopeKa(t);
                fault.SymmetricalRmsKa(t).Should().BeApproximately(ac, Math.Min(most, stated), because);
                fault.DcComponentKa(t).Should().BeApproximately(dc, Math.Min(most, Math.Sqrt(2) * stated), because);
                fault.AsymmetricalRmsKa(t).Should().BeApproximately(Math.Sqrt(ac * ac + dc * dc), 2 * most, because);
                fault.InstantaneousKa(t, degrees).Should().BeApproximately(oracle.InstantaneousKa(t, degrees), 3 * most, because);
            }
        }
    }

    private static void AssertSame(BusFault one, BusFault other)
    {
        var most = 1e-9 * other.InitialSymmetricalKa;
        foreach (var t in new[] { 0.001, 0.01, 0.08, 0.9 })
        {
            one.SymmetricalRmsKa(t).Should().BeApproximately(other.SymmetricalRmsKa(t), most);
            one.DcComponentKa(t).Should().BeApproximately(other.DcComponentKa(t), most);
        }
        if (other.WorstPeak is not { } peak)
            return;
        one.WorstPeak!.Ka.Should().BeApproximately(peak.Ka, 2 * most);
        one.InstantaneousKa(0.02, 75).Should().BeApproximately(other.InstantaneousKa(0.02, 75), 2 * most);
    }

    /// <summary>Half a unit of the last printed digit, and the error that the result states, of a component with the factor √2.</summary>
    private static double PrintedWithin(BusFault fault)
    {
        Bound(fault).Should().BeLessThan(1e-5 * fault.InitialSymmetricalKa);
        return 5.1e-8 + Math.Sqrt(2) * Bound(fault);
    }

    /// <summary>The error that the result states, at the worst of some times.</summary>
    private static double Bound(BusFault fault) =>
        new[] { 0.005, 0.01, 0.02, 0.05, 0.1 }.Max(fault.DecayErrorBound) * fault.InitialSymmetricalKa;
}
