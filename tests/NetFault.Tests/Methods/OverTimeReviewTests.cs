using NetFault.Tests.Support;

namespace NetFault.Tests.Methods;

/// <summary>
/// Places where poles of the current over time lie off the beaten track: the stated bound against the error itself, the difference from
/// <see cref="DecayOracle"/>.
/// </summary>
public class OverTimeReviewTests
{
    /// <summary>Rounding of the oracle, relative to I″k.</summary>
    private const double Rounding = 1e-10;

    private static readonly double[] Times = [0, 0.001, 0.01, 0.03, 0.1, 0.29, 0.36, 1, 2, 3.7, 7, 10];

    [Theory]
    [InlineData(0.03, 50)]
    [InlineData(0.1, 50)]
    [InlineData(0.1, 60)]
    public void The_bound_holds_for_a_machine_of_large_resistance_at_its_terminals(double armatureResistancePu, double frequencyHz)
    {
        var network = Plants.OneGenerator(
            new MachineReactances(0.14, 0.22, 1.8), armatureResistancePu, new MachineTimeConstants(0.012, 0.8), frequencyHz);
        AssertWithinBound(network, "T", QuasiStatic(5));
        AssertWithinBound(network, "T", Exact(0.36, 1e-5));
    }

    [Theory]
    [InlineData(-0.1)]
    [InlineData(-0.4)]
    public void The_bound_holds_for_a_machine_behind_a_negative_reactance(double ohm)
    {
        // A machine of 0.56 ohm: what is left of its reactance makes it decay faster than with T″d.
        var network = Plants.OneGenerator(new MachineReactances(0.14, 0.22, 1.8), 0, new MachineTimeConstants(0.03, 0.8))
            .With(new Bus { Id = "F", NominalKv = 10 }, new Line { Id = "N", From = "T", To = "F", Ohm = new Impedance(0, ohm) });
        AssertWithinBound(network, "F", QuasiStatic(1));
        AssertWithinBound(network, "F", Exact(0.3, 1e-3));
    }

    [Fact]
    public void The_bound_holds_for_motors_on_a_generator_of_their_size()
    {
        // Left to themselves they excite each other: slower than either the generator on open circuit or motors behind its xd.
        var network = new NetworkBuilder { FrequencyHz = 50 }.Add(
            new Bus { Id = "T", NominalKv = 10 }, new Bus { Id = "LV", NominalKv = 0.4 },
            new SynchronousMachine
            {
                Id = "G", Bus = "T", RatedMva = 12, ReactancePu = new MachineReactances(0.15, 0.24, 2), ArmatureResistancePu = 0,
                TimeConstantSeconds = new MachineTimeConstants(0.02, 0.08),
            },
            new AsynchronousMotor
            {
                Id = "M", Bus = "T", RatedKw = 3000, RatedPowerFactor = 0.88, Efficiency = 0.95, LockedRotorCurrentRatio = 6, ROverX = 0.01,
                RatedSlipPercent = 0.4,
            },
            new Transformer
            {
                Id = "TR", Hv = "T", Lv = "LV", RatedMva = 0.03, RatedHvKv = 10, RatedLvKv = 0.4, ShortCircuitVoltagePercent = 6, XOverR = 100,
            }).Build();
        foreach (var power in new[] { 3000.0, 6000, 9000 })
        {
            var plant = network.With(network.AsynchronousMotors[0] with { RatedKw = power });
            AssertWithinBound(plant, "LV", QuasiStatic(10));
            AssertWithinBound(plant, "LV", Exact(10, 1e-3));
        }
    }

    private static MachineDecrement QuasiStatic(double horizon) => new() { HorizonSeconds = horizon };

    private static MachineDecrement Exact(double horizon, double limit) => new()
    {
        AcComponentRule = AcComponentRule.Exact, DcDecayRule = DcDecayRule.Exact, HorizonSeconds = horizon, DecayErrorLimit = limit,
    };

    private static void AssertWithinBound(Network network, string bus, MachineDecrement method)
    {
        var exact = method.DcDecayRule == DcDecayRule.Exact;
        var fault = new FaultStudy(network, method).At(bus);
        var oracle = new DecayOracle(network, bus, exact ? DecayMode.Exact : DecayMode.QuasiStatic);
        foreach (var t in Times.Where(t => t <= method.HorizonSeconds))
        {
            var most = (fault.DecayErrorBound(t) + Rounding) * oracle.InitialKa;
            fault.SymmetricalRmsKa(t).Should().BeApproximately(oracle.AcRmsKa(t), most, $"AC at {t} s");
            if (exact)
                (fault.DcComponentKa(t) / Math.Sqrt(2)).Should().BeApproximately(oracle.DcEnvelopeKa(t) / Math.Sqrt(2), most, $"DC at {t} s");
        }
    }
}
