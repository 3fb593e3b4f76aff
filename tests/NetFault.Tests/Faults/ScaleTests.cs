using System.Numerics;
using NetFault.Tests.Support;

namespace NetFault.Tests.Faults;

/// <summary>Networks of 100,000 buses: no recursion, bounded memory. Oracles: a chain's closed form, and neighbouring laws of a grid.</summary>
public class ScaleTests
{
    private const int Buses = 100_000;

    [Fact]
    public void A_radial_feeder_of_100000_buses_has_the_impedance_of_its_length_at_every_bus()
    {
        var builder = new NetworkBuilder { FrequencyHz = 50 }.Add(
            new NetworkFeeder { Id = "Q", Bus = "B0", ShortCircuitMva = new MaxMin(500), ROverX = 0.1 });
        builder.Add([.. Enumerable.Range(0, Buses).Select(i => new Bus { Id = $"B{i}", NominalKv = 20 })]);
        builder.Add([.. Enumerable.Range(1, Buses - 1).Select(i =>
            new Line { Id = $"L{i}", From = $"B{i - 1}", To = $"B{i}", Ohm = new Impedance(0.001, 0.002) })]);
        var faults = new FaultStudy(builder.Build(), new MachineDecrement()).EveryBus();
        var source = Complex.FromPolarCoordinates(400.0 / 500, Math.Atan(10));
        for (var i = 0; i < Buses; i += 997)
        {
            var expected = source + i * new Complex(0.001, 0.002);
            (faults[i].ImpedanceOhm!.Value - expected).Magnitude.Should().BeLessThan(1e-9 * expected.Magnitude);
        }
    }

    [Fact]
    public void A_meshed_grid_of_100000_buses_is_solved_and_agrees_with_single_bus_solutions()
    {
        var network = Grids.Meshed(400, 250);
        var study = new FaultStudy(network, new MachineDecrement { Instants = FaultInstants.InitialOnly });
        var flows = study.FlowsAt(network.Buses[Buses / 2].Id);
        var faults = study.EveryBus();
        faults.Should().HaveCount(Buses);
        faults[Buses / 2].InitialSymmetricalKa.Should().BeApproximately(flows.FaultCurrentKa.Magnitude, 1e-9 * flows.FaultCurrentKa.Magnitude);
        faults.Max(fault => fault.SolutionResidual).Should().BeLessThan(1e-10);
    }

    [Fact]
    public void Many_threads_may_ask_one_study_at_once()
    {
        var network = Grids.Meshed(30, 30);
        var expected = new FaultStudy(network, new MachineDecrement()).EveryBus();
        var study = new FaultStudy(network, new MachineDecrement { XOverRRule = XOverRRule.ComplexImpedance });
        Parallel.For(0, 400, new ParallelOptions { MaxDegreeOfParallelism = 8 }, i =>
        {
            var bus = i * 37 % expected.Count;
            if (i % 50 == 0)
                study.EveryBus()[bus].PeakKa.Should().Be(expected[bus].PeakKa);
            var one = study.At(network.Buses[bus].Id);
            one.InitialSymmetricalKa.Should().BeApproximately(expected[bus].InitialSymmetricalKa, 1e-10 * expected[bus].InitialSymmetricalKa);
            study.FlowsAt(network.Buses[bus].Id).FaultCurrentKa.Magnitude
                .Should().BeApproximately(expected[bus].InitialSymmetricalKa, 1e-10 * expected[bus].InitialSymmetricalKa);
        });
    }

    [Fact]
    public void A_cancelled_study_stops()
    {
        using var source = new CancellationTokenSource();
        source.Cancel();
        var run = () => new FaultStudy(Grids.Meshed(10, 10), new MachineDecrement()).EveryBus(null, source.Token);
        run.Should().Throw<OperationCanceledException>();
    }

    [Fact]
    public void Progress_is_told_step_by_step_up_to_the_end()
    {
        var seen = new System.Collections.Concurrent.ConcurrentBag<StudyProgress>();
        var method = new MachineDecrement { XOverRRule = XOverRRule.SeparateNetworks };
        new FaultStudy(Grids.Meshed(10, 10), method).EveryBus(new Direct(seen.Add));
        seen.Should().HaveCount(6).And.Contain(one => one.Done == one.Total);
    }

    private sealed class Direct(Action<StudyProgress> report) : IProgress<StudyProgress>
    {
        public void Report(StudyProgress value) => report(value);
    }
}
