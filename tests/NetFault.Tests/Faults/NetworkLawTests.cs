using System.Numerics;
using CsCheck;
using NetFault.Tests.Support;
using Matrix = MathNet.Numerics.LinearAlgebra.Matrix<System.Numerics.Complex>;

namespace NetFault.Tests.Faults;

/// <summary>Oracle: laws that hold for every linear network, whatever its data.</summary>
public class NetworkLawTests
{
    [Fact]
    public void Renumbering_the_buses_and_elements_changes_nothing() =>
        RandomNetworks.Cases(50).Sample((seed, buses) =>
        {
            var network = RandomNetworks.Make(seed, buses);
            var shuffled = new NetworkBuilder { FrequencyHz = network.FrequencyHz, BaseMva = network.BaseMva }
                .Add([.. network.Elements.OrderBy(one => Hash(one.Id, seed))]).Build();
            AssertSame(network, shuffled);
        }, iter: 60);

    [Fact]
    public void The_base_power_changes_nothing() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = RandomNetworks.Make(seed, buses);
            var builder = network.ToBuilder();
            builder.BaseMva *= 7.3;
            AssertSame(network, builder.Build());
        }, iter: 40);

    [Fact]
    public void Splitting_a_line_in_two_changes_nothing_elsewhere() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = RandomNetworks.Make(seed, buses);
            if (network.Lines.FirstOrDefault() is not { } line)
                return;
            var kv = network.Buses.First(bus => bus.Id == line.From).NominalKv;
            var split = network.With(
                new Bus { Id = "middle", NominalKv = kv },
                line with { To = "middle", LengthKm = line.LengthKm * 0.3 },
                line with { Id = "rest", From = "middle", LengthKm = line.LengthKm * 0.7 });
            AssertSame(network, split);
        }, iter: 60);

    [Fact]
    public void Closing_a_coupler_is_the_same_as_one_bus_in_place_of_two()
    {
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = RandomNetworks.Make(seed, buses);
            var kept = network.Buses[0];
            var apart = network.With(
                new Bus { Id = "second", NominalKv = kept.NominalKv },
                new BusCoupler { Id = "tie", From = kept.Id, To = "second", Closed = true },
                new SynchronousMachine
                {
                    Id = "at the second", Bus = "second", RatedMva = 20, ReactancePu = new MachineReactances(0.2), ArmatureResistancePu = 0.01,
                });
            var together = network.With(new SynchronousMachine
            {
                Id = "at the second", Bus = kept.Id, RatedMva = 20, ReactancePu = new MachineReactances(0.2), ArmatureResistancePu = 0.01,
            });
            AssertSame(together, apart);
            var faults = new FaultStudy(apart, new MachineDecrement()).EveryBus();
            faults.Single(one => one.BusId == "second").InitialSymmetricalKa
                .Should().Be(faults.Single(one => one.BusId == kept.Id).InitialSymmetricalKa);
        }, iter: 40);
    }

    [Fact]
    public void The_pre_fault_voltage_scales_every_current() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = RandomNetworks.Make(seed, buses);
            var flat = new FaultStudy(network, new MachineDecrement()).EveryBus();
            var raised = new FaultStudy(network, new MachineDecrement { PrefaultVoltagePu = 1.07 }).EveryBus();
            for (var i = 0; i < flat.Count; i++)
            {
                AssertClose(raised[i].InitialSymmetricalKa, 1.07 * flat[i].InitialSymmetricalKa);
                AssertClose(raised[i].PeakKa, 1.07 * flat[i].PeakKa);
                AssertClose(raised[i].SteadyStateKa!.Value, 1.07 * flat[i].SteadyStateKa!.Value);
            }
        }, iter: 30);

    [Fact]
    public void An_element_out_of_service_is_the_same_as_none() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = RandomNetworks.Make(seed, buses);
            var without = new NetworkBuilder { FrequencyHz = network.FrequencyHz, BaseMva = network.BaseMva }
                .Add([.. network.Elements.Where(one => one.InService || one is Bus)]).Build();
            AssertSame(network, without);
        }, iter: 40);

    [Fact]
    public void Another_source_never_lowers_a_current_in_a_network_of_reactances()
    {
        RandomNetworks.Cases(30).Sample((seed, buses) =>
        {
            var network = RandomNetworks.Make(seed, buses);
            var more = network.With(new NetworkFeeder { Id = "more", Bus = network.Buses[0].Id, ShortCircuitMva = new MaxMin(900), ROverX = 0 });
            var before = new FaultStudy(network, new MachineDecrement()).BusImpedanceMatrix();
            var at = new FaultStudy(network, new MachineDecrement()).EveryBus();
            var after = new FaultStudy(more, new MachineDecrement()).At(network.Buses[0].Id);
            before.RowCount.Should().BeGreaterThan(0);
            after.InitialSymmetricalKa.Should().BeGreaterThan(at[0].InitialSymmetricalKa);
        }, iter: 30);
    }

    [Fact]
    public void The_impedance_matrix_is_the_inverse_of_the_admittance_matrix() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var study = new FaultStudy(RandomNetworks.Make(seed, buses), new MachineDecrement());
            foreach (var instant in new[] { FaultInstant.Initial, FaultInstant.Transient, FaultInstant.SteadyState })
            {
                Matrix y = study.AdmittanceMatrix(instant), z = study.BusImpedanceMatrix(instant);
                var identity = Matrix.Build.DenseIdentity(y.RowCount);
                (y.Multiply(z) - identity).Enumerate().Max(Complex.Abs).Should().BeLessThan(1e-9);
                (z - z.Transpose()).Enumerate().Max(Complex.Abs).Should().BeLessThan(1e-10 * z.Enumerate().Max(Complex.Abs));
            }
        }, iter: 20);

    [Fact]
    public void The_condition_estimate_is_from_below_and_within_two_digits_of_a_dense_one() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var study = new FaultStudy(RandomNetworks.Make(seed, buses), new MachineDecrement());
            var y = Matrix.Build.DenseOfMatrix(study.AdmittanceMatrix());
            var dense = y.L1Norm() * y.Inverse().L1Norm();
            study.ConditionEstimate().Should().BeInRange(dense / 100, dense * (1 + 1e-9));
        }, iter: 20);

    private static void AssertSame(Network one, Network other)
    {
        var method = new MachineDecrement { XOverRRule = XOverRRule.SeparateNetworks };
        var byId = new FaultStudy(other, method).EveryBus().ToDictionary(fault => fault.BusId);
        foreach (var fault in new FaultStudy(one, method).EveryBus())
        {
            var twin = byId[fault.BusId];
            twin.IsEnergised.Should().Be(fault.IsEnergised);
            AssertClose(twin.InitialSymmetricalKa, fault.InitialSymmetricalKa);
            AssertClose(twin.SteadyStateKa!.Value, fault.SteadyStateKa!.Value);
            AssertClose(twin.XOverR ?? 0, fault.XOverR ?? 0);
        }
    }

    private static void AssertClose(double actual, double expected) =>
        actual.Should().BeApproximately(expected, 1e-9 * Math.Abs(expected) + 1e-300);

    private static int Hash(string id, int seed) => unchecked((id.Aggregate(seed, (hash, c) => hash * 31 + c) * 2654435) & 0xFFFFFF);
}
