using System.Numerics;
using NetFault.Tests.Support;

namespace NetFault.Tests.Methods;

/// <summary>What the current over time refuses, holds or assumes, and how it says so.</summary>
public class CurrentOverTimeRefusalTests
{
    private static readonly MachineDecrement Exact = new() { AcComponentRule = AcComponentRule.Exact, DcDecayRule = DcDecayRule.Exact };

    [Fact]
    public void A_time_beyond_the_horizon_is_refused_by_name_of_the_option()
    {
        var fault = new FaultStudy(Machine(), new MachineDecrement()).At("T");
        var ask = () => fault.SymmetricalRmsKa(1.5);
        ask.Should().Throw<ArgumentOutOfRangeException>().WithMessage("*HorizonSeconds*");
        fault.DcComponentKa(1.5).Should().BeGreaterThan(0, "X/R needs no horizon");
    }

    [Theory]
    [InlineData(0.001)]
    [InlineData(11)]
    [InlineData(double.NaN)]
    public void An_impossible_horizon_is_refused(double seconds)
    {
        var make = () => new MachineDecrement { HorizonSeconds = seconds };
        make.Should().Throw<ArgumentOutOfRangeException>();
    }

    [Theory]
    [InlineData(0)]
    [InlineData(1e-12)]
    [InlineData(0.1)]
    public void An_error_limit_that_cannot_be_kept_or_means_nothing_is_refused(double limit)
    {
        var make = () => new MachineDecrement { DecayErrorLimit = limit };
        make.Should().Throw<ArgumentOutOfRangeException>();
    }

    [Fact]
    public void A_horizon_too_long_for_the_frequency_is_refused_with_the_longest_that_is_not()
    {
        var ask = () => new FaultStudy(Machine(frequencyHz: 400), Exact with { HorizonSeconds = 10 }).At("T").SymmetricalRmsKa(0.1);
        ask.Should().Throw<CurrentOverTimeException>().WithMessage("*1.51 s*");
    }

    [Fact]
    public void A_series_capacitor_is_refused_with_exact_components_and_not_in_the_quasi_static_network()
    {
        var network = new NetworkBuilder { FrequencyHz = 50 }.Add(
            new Bus { Id = "A", NominalKv = 110 }, new Bus { Id = "B", NominalKv = 110 }, new Bus { Id = "C", NominalKv = 110 },
            new NetworkFeeder { Id = "U", Bus = "A", ShortCircuitMva = new MaxMin(3000), XOverR = 10 },
            new Line { Id = "L", From = "A", To = "B", Ohm = new Impedance(2, 20) },
            new SeriesCapacitor { Id = "K", From = "B", To = "C", ReactanceOhm = 8, VoltageLimited = false }).Build();
        var ask = () => new FaultStudy(network, Exact).At("C").DcComponentKa(0.05);
        ask.Should().Throw<CurrentOverTimeException>().Where(one => one.ElementIds.Single() == "K");
        var fault = new FaultStudy(network, new MachineDecrement()).At("C");
        fault.SymmetricalRmsKa(0.5).Should().BeApproximately(fault.InitialSymmetricalKa, 1e-9, "nothing decays");
    }

    [Fact]
    public void A_negative_leg_between_larger_reactances_is_no_matter()
    {
        // A star of lines with one negative leg is the same as its series paths: U behind 3 + 17 − 2 ohm feeds C alone.
        var star = LegsOf(-2);
        var straight = LegsOf(-2, merged: true);
        foreach (var t in new[] { 0.001, 0.02, 0.3 })
        {
            DcAt(star, t).Should().BeApproximately(DcAt(straight, t), 2e-6);
        }

        static double DcAt(Network network, double t) => new FaultStudy(network, Exact).At("C").DcComponentKa(t);
    }

    [Fact]
    public void A_negative_reactance_that_makes_the_network_unstable_is_refused_by_its_name()
    {
        var ask = () => new FaultStudy(LegsOf(-60), Exact).At("B").SymmetricalRmsKa(0.05);
        ask.Should().Throw<CurrentOverTimeException>().Where(one => one.ElementIds.Single() == "L2").WithMessage("*grow*");
    }

    [Fact]
    public void A_time_constant_too_short_to_tell_the_components_apart_is_held_and_said()
    {
        var study = new FaultStudy(Machine(subtransient: 0.004), Exact);
        study.Assumptions.Should().ContainSingle().Which.Text.Should().Contain("4 ms is too short").And.Contain("held");
        // What decays with T″d is held: √(AC) at 0.1 s has 1/X″d − 1/X′d in it still.
        var ratedKa = 25 / (Math.Sqrt(3) * 10);
        var expected = ratedKa * (1 / 0.12 - 1 / 0.2 + (1 / 0.2 - 1 / 1.8) * Math.Exp(-0.1 / 0.9) + 1 / 1.8);
        new FaultStudy(Machine(subtransient: 0.004), new MachineDecrement()).At("T").SymmetricalRmsKa(0.1).Should().BeApproximately(expected, 1e-7);
    }

    [Fact]
    public void A_missing_time_constant_holds_its_share_and_is_said()
    {
        var network = Machine(subtransient: null);
        new FaultStudy(network, new MachineDecrement()).Assumptions.Should().ContainSingle()
            .Which.Should().Be(new Assumption("synchronous_machines", "G", "time_constant_s.subtransient",
                "T″d is not given; what it decays is held at x″d over time"));
    }

    [Fact]
    public void A_fault_through_a_large_resistance_is_exact_too()
    {
        // 1 ohm behind j1: i = E/|R + jX| at once; e^(−ω·t·R/X) with R/X = 1 that of the whole path.
        var network = Plants.OneFeeder(0.0);
        var study = new FaultStudy(network, Exact);
        var ownOhm = study.At("Q").ImpedanceOhm!.Value.Imaginary;
        var fault = study.At("Q", new Complex(20 * ownOhm, 0));
        var expected = fault.InitialSymmetricalKa;
        fault.SymmetricalRmsKa(0.02).Should().BeApproximately(expected, 1e-6 * expected);
        fault.DcComponentKa(0.001).Should().BeApproximately(
            Math.Sqrt(2) * expected * Math.Exp(-2 * Math.PI * 50 * 0.001 * 20), 2e-6 * expected);
        study.FlowsAtTime("Q", 0.02, new Complex(20 * ownOhm, 0)).FaultCurrentKa.Magnitude.Should().BeApproximately(expected, 1e-6 * expected);
    }

    [Fact]
    public void Standards_give_no_waveform_and_say_where_to_find_one()
    {
        var machine = Machine();
        var study = new FaultStudy(machine.With(machine.SynchronousMachines[0] with { RatedPowerFactor = 0.8 }), new Iec60909());
        var fault = study.At("T");
        fault.WorstPeak.Should().BeNull();
        fault.Invoking(one => one.InstantaneousKa(0.01, 0)).Should().Throw<NotSupportedException>().WithMessage("*MachineDecrement*");
        study.Invoking(one => one.FlowsAtTime("T", 0.01)).Should().Throw<NotSupportedException>().WithMessage("*MachineDecrement*");
        study.Invoking(one => one.CompareDcRules(0.01)).Should().Throw<NotSupportedException>();
    }

    [Fact]
    public void Solving_ahead_tells_of_its_steps_can_be_stopped_and_taken_up_again()
    {
        var study = new FaultStudy(Machine(), Exact);
        using var stop = new CancellationTokenSource();
        var steps = new Steps();
        stop.Cancel();
        study.Invoking(one => one.SolveOverTime(steps, stop.Token)).Should().Throw<OperationCanceledException>();
        study.SolveOverTime(steps);
        steps.Seen.Should().NotBeEmpty();
        steps.Seen[steps.Seen.Count - 1].Done.Should().Be(steps.Seen[0].Total);
        study.EveryBus()[0].SymmetricalRmsKa(0.05).Should().BeGreaterThan(0);
    }

    [Fact]
    public void The_three_phases_add_to_nothing_and_the_worst_is_one_of_them()
    {
        var fault = new FaultStudy(TwoSources.Make(), Exact).At("BUS");
        foreach (var t in new[] { 0.0, 0.004, 0.0073, 0.05 })
        {
            var phases = new[] { 20.0, -100.0, 140.0 }.Select(angle => fault.InstantaneousKa(t, angle)).ToList();
            phases.Sum().Should().BeApproximately(0, 1e-9);
            var worst = fault.WorstPhaseKa(t, 20);
            phases.Should().Contain(one => Math.Abs(one - worst) < 1e-9);
            Math.Abs(worst).Should().BeApproximately(phases.Max(Math.Abs), 1e-9);
        }
        var peak = fault.WorstPeak!;
        Math.Abs(fault.WorstPhaseKa(peak.Seconds, peak.ClosingAngleDegrees + 120)).Should().BeApproximately(peak.Ka, 1e-5);
    }

    [Fact]
    public void Flows_of_a_time_say_how_they_were_found()
    {
        var flows = new FaultStudy(Machine(), Exact).FlowsAtTime("T", 0.06);
        (flows.Seconds, flows.Instant, flows.AcComponentRule).Should().Be((0.06, null, AcComponentRule.Exact));
        flows.Source("G").IntoBusKa.Magnitude.Should().BeApproximately(new FaultStudy(Machine(), Exact).At("T").SymmetricalRmsKa(0.06), 1e-9);
    }

    [Fact]
    public void De_energised_buses_have_no_current_at_any_time()
    {
        var network = Machine().With(new Bus { Id = "DARK", NominalKv = 10 });
        var study = new FaultStudy(network, Exact);
        var fault = study.At("DARK");
        fault.SymmetricalRmsKa(0.1).Should().Be(0);
        fault.WorstPeak.Should().BeNull();
        study.FlowsAtTime("DARK", 0.1).FaultCurrentKa.Should().Be(Complex.Zero);
        study.CompareDcRules(0.05).Buses.Select(one => one.BusId).Should().Equal("T");
    }

    private static Network Machine(double? subtransient = 0.03, double frequencyHz = 50) => Plants.OneGenerator(
        new MachineReactances(0.12, 0.2, 1.8), 0, new MachineTimeConstants(subtransient, 0.9), frequencyHz);

    private static Network LegsOf(double negativeOhm, bool merged = false)
    {
        var builder = new NetworkBuilder { FrequencyHz = 50 }.Add(
            new Bus { Id = "A", NominalKv = 110 }, new Bus { Id = "B", NominalKv = 110 }, new Bus { Id = "C", NominalKv = 110 },
            new NetworkFeeder { Id = "U", Bus = "A", ShortCircuitMva = new MaxMin(4000), XOverR = 10 });
        if (merged)
            builder.Add(new Line { Id = "L", From = "A", To = "C", Ohm = new Impedance(1.7, 17 + negativeOhm) }, new BusCoupler { Id = "J", From = "B", To = "C", Closed = true });
        else
            builder.Add(new Line { Id = "L1", From = "A", To = "B", Ohm = new Impedance(1.5, 17) }, new Line { Id = "L2", From = "B", To = "C", Ohm = new Impedance(0.2, negativeOhm) });
        return builder.Build();
    }

    private sealed class Steps : IProgress<StudyProgress>
    {
        public List<StudyProgress> Seen { get; } = [];

        public void Report(StudyProgress value) => Seen.Add(value);
    }
}
