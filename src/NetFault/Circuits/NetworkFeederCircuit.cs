using System.Numerics;

namespace NetFault;

/// <summary>A network feeder in the positive-sequence circuit (IEC 60909-0, 6.2, without the voltage factor: that is the method's).</summary>
internal static class NetworkFeederCircuit
{
    /// <summary>Impedance Un²/S″kQ per unit on the bus's nominal voltage, of the maximum case.</summary>
    public static Complex ImpedancePu(NetworkFeeder feeder, double nominalKv, double baseMva)
    {
        var mva = feeder.ShortCircuitMva is { } power
            ? power.Max
            : PerUnit.Sqrt3 * nominalKv * feeder.ShortCircuitKa.GetValueOrDefault().Max;
        return PerUnit.FromROverX(baseMva / mva, feeder.ROverX ?? 1.0 / feeder.XOverR.GetValueOrDefault());
    }
}
