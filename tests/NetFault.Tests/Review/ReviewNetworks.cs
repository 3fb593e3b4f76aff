namespace NetFault.Tests.Review;

/// <summary>Small invented elements for the review's tests.</summary>
internal static class ReviewNetworks
{
    public static Bus Bus(string id, double kv, double? tolerance = null) =>
        new() { Id = id, NominalKv = kv, LowVoltageTolerancePercent = tolerance };

    /// <summary>A feeder; R/X = 0.1 unless given.</summary>
    public static NetworkFeeder Feeder(string bus, double mva, double rOverX = 0.1) =>
        new() { Id = "U-" + bus, Bus = bus, ShortCircuitMva = new MaxMin(mva), ROverX = rOverX };

    public static Line Line(string id, string from, string to, double r, double x) =>
        new() { Id = id, From = from, To = to, Ohm = new Impedance(r, x) };

    public static BusCoupler Coupler(string id, string from, string to) =>
        new() { Id = id, From = from, To = to, Closed = true };

    public static SynchronousMachine Generator(string id, string bus, double mva, double armatureResistancePu = 0.01) => new()
    {
        Id = id, Bus = bus, RatedMva = mva, RatedPowerFactor = 0.8,
        ReactancePu = new MachineReactances(0.2, 0.3, 1.8), ArmatureResistancePu = armatureResistancePu,
    };

    public static Network Build(params NetworkElement[] elements) =>
        new NetworkBuilder { FrequencyHz = 50 }.Add(elements).Build();
}
