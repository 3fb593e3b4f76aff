namespace NetFault.Tests.Duty;

/// <summary>Tiny invented networks of which every current is known by hand.</summary>
internal static class DutyNetworks
{
    /// <summary>Bus Q at 20 kV behind a feeder U of 10 kA, and the radial line F from it to bus L.</summary>
    public static Network Radial(double xOverR, double hertz = 50, double kv = 20, params NetworkElement[] more) =>
        new NetworkBuilder { FrequencyHz = hertz }.Add(
            new Bus { Id = "Q", NominalKv = kv },
            new Bus { Id = "L", NominalKv = kv },
            new NetworkFeeder { Id = "U", Bus = "Q", ShortCircuitKa = new MaxMin(10), XOverR = xOverR },
            new Line { Id = "F", From = "Q", To = "L", Ohm = new Impedance(0.1, 0.4) }).Add(more).Build();

    /// <summary>Breaker B at Q towards F.</summary>
    public static CircuitBreaker Breaker(CircuitBreakerStandard standard) => new() { Id = "B", Bus = "Q", Feeds = "F", Standard = standard };

    public static DeviceDuty Check(FaultMethod method, Network network, DutyOptions? options = null) =>
        DutyCheck.Of(new FaultStudy(network, method), options).Devices.Single();
}
