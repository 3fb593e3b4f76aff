using System.Numerics;
using CsCheck;
using NetFault.Tests.Support;

namespace NetFault.Tests.Methods;

/// <summary>The oracle of the current over time, checked by closed forms, a circuit simulation, and its own definition.</summary>
public class DecayOracleTests
{
    private static readonly double GeneratorKa = 25 / (Math.Sqrt(3) * 10);

    [Theory]
    [InlineData(0.0)]
    [InlineData(0.004)]
    [InlineData(0.05)]
    [InlineData(0.7)]
    [InlineData(12.0)]
    public void One_machine_without_resistance_has_the_closed_form(double t)
    {
        var network = Plants.OneGenerator(new MachineReactances(0.14, 0.23, 1.9), 0, new MachineTimeConstants(0.028, 0.85));
        var expected = 1 / 1.9 + (1 / 0.23 - 1 / 1.9) * Math.Exp(-t / 0.85) + (1 / 0.14 - 1 / 0.23) * Math.Exp(-t / 0.028);
        var oracle = new DecayOracle(network, "T", DecayMode.QuasiStatic);
        oracle.AcKa(t).Should().BeCloseTo(new Complex(0, -expected * GeneratorKa));
        oracle.DcEnvelopeKa(t).Should().Be(0);
    }

    [Fact]
    public void A_machine_without_a_time_constant_keeps_that_part()
    {
        var network = Plants.OneGenerator(new MachineReactances(0.14, 0.23, 1.9), 0, new MachineTimeConstants(Subtransient: 0.028));
        var oracle = new DecayOracle(network, "T", DecayMode.QuasiStatic);
        oracle.AcRmsKa(9).Should().BeApproximately(GeneratorKa / 0.23, 1e-12);
        oracle.AcRmsKa(0).Should().BeApproximately(GeneratorKa / 0.14, 1e-12);
    }

    [Fact]
    public void A_motor_at_its_terminals_decays_with_its_own_time_constant()
    {
        // A fault at their bus parts the feeder and the motors: its current is the sum of the two, of the same R/X here.
        var network = Plants.OneFeeder(0.1).With(new AsynchronousMotor
        {
            Id = "M", Bus = "Q", RatedKw = 2000, RatedKv = 20, RatedPowerFactor = 0.88, Efficiency = 0.95, LockedRotorCurrentRatio = 6,
            ROverX = 0.1, Count = 3, RatedSlipPercent = 0.8,
        });
        var motorsKa = 3 * 6 * 2 / (0.88 * 0.95) / (Math.Sqrt(3) * 20);
        var seconds = 1 / 6.0 / Math.Sqrt(1.01) / (2 * Math.PI * 50 * 0.008);
        var oracle = new DecayOracle(network, "Q", DecayMode.QuasiStatic);
        oracle.AcRmsKa(0.06).Should().BeApproximately(10 + motorsKa * Math.Exp(-0.06 / seconds), 1e-10);
        var motors = oracle.AcIntoBusKa("asynchronous_motors", "M", "Q", 0.06).Magnitude;
        motors.Should().BeApproximately(motorsKa * Math.Exp(-0.06 / seconds), 1e-11);
    }

    [Theory]
    [InlineData(0.0)]
    [InlineData(0.003)]
    [InlineData(0.04)]
    public void A_radial_circuit_of_resistance_and_reactance_has_the_closed_form(double t)
    {
        // i = √2·I·[sin(ωt + α − φ) − sin(α − φ)·e^(−ωt·R/X)].
        const double ratio = 0.08, omega = 2 * Math.PI * 60;
        var oracle = new DecayOracle(Plants.OneFeeder(ratio, 60), "Q", DecayMode.Exact);
        var phi = Math.Atan(1 / ratio);
        foreach (var degrees in new[] { 0.0, 35, 90, 200 })
        {
            var alpha = degrees * Math.PI / 180;
            var expected = Math.Sqrt(2) * 10 * (Math.Sin(omega * t + alpha - phi) - Math.Sin(alpha - phi) * Math.Exp(-omega * t * ratio));
            oracle.InstantaneousKa(t, degrees).Should().BeApproximately(expected, 1e-12);
        }
        oracle.DcEnvelopeKa(t).Should().BeApproximately(Math.Sqrt(2) * 10 * Math.Exp(-omega * t * ratio), 1e-12);
    }

    [Fact]
    public void Two_sources_of_different_X_over_R_have_the_simulated_currents_at_the_common_bus()
    {
        var oracle = new DecayOracle(TwoSources.Make(), "BUS", DecayMode.Exact);
        oracle.AcRmsKa(0.02).Should().BeApproximately(TwoSources.AcAtBusKa, 5.1e-8);
        foreach (var (seconds, ka) in TwoSources.DcAtBus)
            oracle.DcEnvelopeKa(seconds).Should().BeApproximately(ka, 5.1e-8);
        var peak = oracle.WorstPeak();
        peak.Ka.Should().BeApproximately(TwoSources.PeakAtBusKa, 5.1e-8);
        peak.Seconds.Should().BeApproximately(TwoSources.PeakAtBusSeconds, 5.1e-7);
        Math.Abs(oracle.InstantaneousKa(peak.Seconds, peak.ClosingAngleDegrees)).Should().BeApproximately(peak.Ka, 1e-9);
    }

    [Fact]
    public void Two_sources_of_different_X_over_R_have_the_simulated_currents_at_the_generator()
    {
        var oracle = new DecayOracle(TwoSources.Make(), "GT", DecayMode.Exact);
        oracle.AcRmsKa(0.02).Should().BeApproximately(TwoSources.AcAtGeneratorKa, 5.1e-8);
        foreach (var (seconds, ka) in TwoSources.DcAtGenerator)
            oracle.DcEnvelopeKa(seconds).Should().BeApproximately(ka, 5.1e-8);
        oracle.WorstPeak().Ka.Should().BeApproximately(TwoSources.PeakAtGeneratorKa, 5.1e-8);
    }

    [Fact]
    public void The_initial_current_is_that_of_a_dense_inverse_in_ohm() =>
        RandomNetworks.Cases(30).Sample((seed, buses) =>
        {
            var network = RandomNetworks.Make(seed, buses);
            var dense = new DenseOracle(network);
            foreach (var bus in network.Buses.Where(bus => dense.ImpedanceOhm.ContainsKey(bus.Id)))
            {
                var expected = dense.CurrentKa(bus.Id);
                new DecayOracle(network, bus.Id, DecayMode.QuasiStatic).AcRmsKa(0).Should().BeApproximately(expected, 1e-9 * expected);
            }
        }, iter: 20);

    [Fact]
    public void Poles_and_residues_of_a_generated_plant_are_those_of_the_fault_currents_transform() =>
        RandomDecayPlants.Cases(30, 12).Sample((seed, buses, machines) =>
        {
            var network = RandomDecayPlants.Make(seed, buses, machines);
            var random = new Random(seed);
            AssertTransform(new DecayOracle(network, Any(network, random), DecayMode.Exact), random);
            AssertTransform(new DecayOracle(network, Any(network, random), DecayMode.QuasiStatic), random);
        }, iter: 20);

    [Fact]
    public void A_plant_of_60_buses_and_20_machines_is_solved_to_ten_digits()
    {
        var network = RandomDecayPlants.Make(4, 60, 20);
        var random = new Random(4);
        AssertTransform(new DecayOracle(network, Any(network, random), DecayMode.Exact), random);
    }

    [Fact]
    public void Currents_of_sources_and_branches_sum_to_zero_at_every_bus_at_any_time()
    {
        var network = RandomDecayPlants.Make(11, 20, 6);
        var faulted = network.Buses[12].Id;
        var oracle = new DecayOracle(network, faulted, DecayMode.Exact);
        var sources = network.SynchronousMachines.Concat<ShuntElement>(network.NetworkFeeders).Concat(network.AsynchronousMotors);
        var inflow = sources.Where(one => one.Bus == "E0")
            .Aggregate(Complex.Zero, (sum, one) => sum + oracle.AcIntoBusKa(one.Section, one.Id, "E0", 0.08));
        var outflow = network.Lines.Select(one => (one.Section, one.Id))
            .Concat(network.SeriesReactors.Select(one => (one.Section, one.Id)))
            .Concat(network.Transformers.Select(one => (one.Section, one.Id)))
            .Concat(network.ThreeWindingTransformers.Select(one => (one.Section, one.Id)))
            .Aggregate(Complex.Zero, (sum, one) => sum + oracle.AcIntoBranchKa(one.Section, one.Id, "E0", 0.08));
        network.BusCouplers.Where(one => one.From == "E0" || one.To == "E0").Should().BeEmpty();
        inflow.Should().BeCloseTo(outflow, 1e-10);
        inflow.Magnitude.Should().BeGreaterThan(1e-3);
    }

    private static string Any(Network network, Random random) => network.Buses[random.Next(network.Buses.Count)].Id;

    /// <summary>
    /// i(0) = 0 where there is inductance; Σ r/(p − z) against a dense inverse at p, at random places right of all poles.
    /// </summary>
    private static void AssertTransform(DecayOracle oracle, Random random)
    {
        var largest = oracle.Residues.Max(residue => residue.Magnitude);
        if (oracle.Poles.Any(pole => pole.Imaginary < -oracle.Omega / 2))
            oracle.Residues.Aggregate(Complex.Zero, (sum, r) => sum + r).Magnitude.Should().BeLessThan(1e-11 * largest);
        for (var i = 0; i < 10; i++)
        {
            var p = oracle.Omega * new Complex(Math.Pow(10, -3 * random.NextDouble()), 3 * random.NextDouble() - 2);
            oracle.Transform(p).Should().BeCloseTo(oracle.DirectTransform(p), 1e-11);
        }
        oracle.Gap.Should().BeGreaterThan(0.2);
    }
}
