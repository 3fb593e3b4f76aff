using System.Numerics;
using NetFault.Tests.Support;

namespace NetFault.Tests.Methods;

/// <summary>The AC currents of branches and sources during the fault, as phasors, against <see cref="DecayOracle"/>.</summary>
public class FlowsOverTimeTests
{
    [Theory]
    [InlineData(31, 14, 5)]
    [InlineData(32, 30, 10)]
    public void Quasi_static_flows_are_those_of_the_eigenvalues(int seed, int buses, int machines) => AssertFlows(
        RandomDecayPlants.Make(seed, buses, machines), new MachineDecrement { AcComponentRule = AcComponentRule.QuasiStatic },
        DecayMode.QuasiStatic, 1e-8);

    [Theory]
    [InlineData(33, 14, 5)]
    [InlineData(34, 30, 10)]
    public void Exact_flows_are_those_of_the_eigenvalues(int seed, int buses, int machines) => AssertFlows(
        RandomDecayPlants.Make(seed, buses, machines),
        new MachineDecrement { AcComponentRule = AcComponentRule.Exact, DcDecayRule = DcDecayRule.Exact }, DecayMode.Exact, 1e-6);

    [Fact]
    public void The_flows_sum_to_zero_at_every_bus_and_to_the_fault_current_at_the_faulted_one()
    {
        var network = RandomDecayPlants.Make(35, 18, 6);
        var study = new FaultStudy(network, new MachineDecrement { AcComponentRule = AcComponentRule.QuasiStatic });
        var flows = study.FlowsAtTime(network.Buses[7].Id, 0.06);
        Kirchhoff.AssertAtEveryBus(study, flows);
        flows.FaultCurrentKa.Magnitude.Should().BeApproximately(study.At(network.Buses[7].Id).SymmetricalRmsKa(0.06), 1e-8);
    }

    private static void AssertFlows(Network network, MachineDecrement method, DecayMode mode, double relative)
    {
        var study = new FaultStudy(network, method);
        foreach (var bus in network.Buses.Where((_, i) => i % 6 == 2))
        {
            var oracle = new DecayOracle(network, bus.Id, mode);
            foreach (var t in new[] { 0.002, 0.05, 0.3, 1 })
            {
                var flows = study.FlowsAtTime(bus.Id, t);
                var most = relative * oracle.InitialKa;
                AssertNear(flows.FaultCurrentKa, oracle.AcKa(t), most, bus.Id);
                // A current on another voltage level may be off by as many MVA.
                AssertSources(network, flows, oracle, t, most * bus.NominalKv);
                AssertBranches(network, flows, oracle, t, most * bus.NominalKv);
            }
        }
    }

    private static void AssertSources(Network network, FaultFlows flows, DecayOracle oracle, double t, double mostMva)
    {
        flows.Sources.Should().HaveCount(
            network.NetworkFeeders.Count + network.SynchronousMachines.Count + network.AsynchronousMotors.Count);
        foreach (var source in flows.Sources)
        {
            var expected = oracle.AcIntoBusKa(source.Section, source.Id, source.BusId, t);
            AssertNear(source.IntoBusKa, expected, mostMva / Kv(network, source.BusId), source.Id);
        }
    }

    /// <summary>Ends that couplers join are one to the oracle.</summary>
    private static void AssertBranches(Network network, FaultFlows flows, DecayOracle oracle, double t, double mostMva)
    {
        flows.Branches.Should().HaveCount(
            network.Lines.Count + network.SeriesReactors.Count + network.Transformers.Count + network.ThreeWindingTransformers.Count);
        foreach (var branch in flows.Branches)
        {
            foreach (var end in branch.Ends)
            {
                var actual = branch.Ends.Where(one => oracle.AreOneNode(one.BusId, end.BusId))
                    .Aggregate(Complex.Zero, (sum, one) => sum + one.IntoBranchKa);
                var expected = oracle.AcIntoBranchKa(branch.Section, branch.Id, end.BusId, t);
                AssertNear(actual, expected, mostMva / Kv(network, end.BusId), $"{branch.Section} {branch.Id} at {end.BusId}");
            }
        }
    }

    private static void AssertNear(Complex actual, Complex expected, double most, string because) =>
        (actual - expected).Magnitude.Should().BeLessThan(most, $"{because}: {actual} should be {expected}");

    private static double Kv(Network network, string bus) => network.Find<Bus>(bus).NominalKv;
}
