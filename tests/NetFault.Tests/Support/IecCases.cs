using System.Numerics;

namespace NetFault.Tests.Support;

/// <summary>Small invented networks for hand-checkable cases of IEC 60909-0, and shorthands for their elements.</summary>
internal static class IecCases
{
    public static readonly double Sqrt2 = Math.Sqrt(2);
    public static readonly double Sqrt3 = Math.Sqrt(3);

    public static Network Of(params NetworkElement[] elements) => new NetworkBuilder { FrequencyHz = 50 }.Add(elements).Build();

    public static Network Of60Hz(params NetworkElement[] elements) => new NetworkBuilder { FrequencyHz = 60 }.Add(elements).Build();

    public static Bus Bus(string id, double kv, double? tolerance = null) =>
        new() { Id = id, NominalKv = kv, LowVoltageTolerancePercent = tolerance };

    public static NetworkFeeder Feeder(string bus, double ka, double rOverX = 0.1, double? minKa = null) =>
        new() { Id = "Q" + bus, Bus = bus, ShortCircuitKa = new MaxMin(ka, minKa), ROverX = rOverX };

    public static Line Line(string from, string to, double r, double x) =>
        new() { Id = from + to, From = from, To = to, Ohm = new Impedance(r, x) };

    /// <summary>25 MVA, 10.5 kV, cos φ = 0.8, x″d = 0.14, Ra = 0.003 per unit.</summary>
    public static SynchronousMachine Generator(string bus) => new()
    {
        Id = "G" + bus, Bus = bus, RatedMva = 25, RatedKv = 10.5, RatedPowerFactor = 0.8, ReactancePu = new MachineReactances(0.14),
        ArmatureResistancePu = 0.003,
    };

    /// <summary>2 MW, 10 kV, cos φ = 0.88, η = 0.95, ILR/IrM = 5.5, two pole pairs.</summary>
    public static AsynchronousMotor Motor(string bus) => new()
    {
        Id = "M" + bus, Bus = bus, RatedKw = 2000, RatedKv = 10, RatedPowerFactor = 0.88, Efficiency = 0.95, LockedRotorCurrentRatio = 5.5,
        PolePairs = 2,
    };

    /// <summary>I″k in kA by hand.</summary>
    public static double Ka(double c, double kv, Complex ohm) => c * kv / (Sqrt3 * ohm.Magnitude);

    public static Complex Polar(double ohm, double rOverX) => Complex.FromPolarCoordinates(ohm, Math.Atan2(1, rOverX));

    public static BusFault At(this Network network, string bus, ShortCircuitCase which = ShortCircuitCase.Maximum) =>
        new FaultStudy(network, new Iec60909 { Case = which }).At(bus);

    /// <summary>The same result among those at every bus.</summary>
    public static BusFault AmongAll(this Network network, string bus, ShortCircuitCase which = ShortCircuitCase.Maximum) =>
        new FaultStudy(network, new Iec60909 { Case = which }).EveryBus().Single(fault => fault.BusId == bus);

    public static void ShouldBe(this double actual, double expected, string because = "", double relative = 1e-11) =>
        actual.Should().BeApproximately(expected, relative * Math.Abs(expected), because);
}
