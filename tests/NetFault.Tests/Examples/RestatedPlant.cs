namespace NetFault.Tests.Examples;

/// <summary>
/// A network restated in the other forms of the same data, by hand: losses and X/R of transformers as resistive percent, feeder currents as
/// powers, armature resistances and the motors' R/X written out where the network leaves them to be assumed.
/// </summary>
internal static class RestatedPlant
{
    public static Network Of(Network network) => network.With(
    [
        .. network.Transformers.Select(one => one with { LoadLossKw = null, XOverR = null, ResistivePercent = ResistivePercent(one) }),
        .. network.NetworkFeeders.Select(one => Restated(one, network.Buses.Single(bus => bus.Id == one.Bus).NominalKv)),
        .. network.SynchronousMachines.Select(one => one with
        {
            ArmatureResistanceOhm = null, ArmatureResistancePu = ResistancePu(one, 2 * Math.PI * network.FrequencyHz),
        }),
        .. network.AsynchronousMotors.Select(one => one with { XOverR = null, ROverX = ROverX(one) }),
    ]);

    private static double ResistivePercent(Transformer one) => one.ResistivePercent
        ?? (one.LoadLossKw is { } kw
            ? kw / (1000 * one.RatedMva) * 100
            : one.ShortCircuitVoltagePercent * Math.Cos(Math.Atan(one.XOverR!.Value)));

    private static NetworkFeeder Restated(NetworkFeeder one, double kv) => one with
    {
        ShortCircuitMva = new MaxMin(one.ShortCircuitMva?.Max ?? Math.Sqrt(3) * kv * one.ShortCircuitKa!.Value.Max),
        ShortCircuitKa = null,
        XOverR = one.XOverR ?? 1 / one.ROverX!.Value,
        ROverX = null,
    };

    /// <summary>Given, or x2/(ω·Ta), or with Ta = 0.15 s, the common practice that the library says it assumes.</summary>
    private static double ResistancePu(SynchronousMachine one, double omega) => one.ArmatureResistancePu
        ?? one.ArmatureResistanceOhm * one.RatedMva / (one.RatedKv * one.RatedKv)
        ?? (one.TimeConstantSeconds.Armature is { } ta
            ? one.ReactancePu.Negative!.Value / (omega * ta)
            : one.ReactancePu.Subtransient / (omega * 0.15));

    /// <summary>IEC 60909-0, 6.10 (from memory): 0.10 at 1 MW and more a pole pair, 0.15 below, 0.42 for low-voltage groups.</summary>
    private static double ROverX(AsynchronousMotor one) => one.ROverX
        ?? 1 / one.XOverR
        ?? (one.RatedKv <= 1 ? 0.42 : one.RatedKw / one.PolePairs!.Value >= 1000 ? 0.10 : 0.15);
}
