using System.Numerics;

namespace NetFault;

/// <summary>A network feeder in the positive-sequence circuit (IEC 60909-0, 6.2, without the voltage factor: that is the method's).</summary>
internal static class NetworkFeederCircuit
{
    /// <summary>Impedance Un²/S″kQ per unit on the bus's nominal voltage, of the maximum case.</summary>
    public static Complex MaximumPu(NetworkFeeder feeder, double nominalKv, double baseMva) => ImpedancePu(
        feeder, feeder.ShortCircuitMva?.Max ?? PerUnit.Sqrt3 * nominalKv * feeder.ShortCircuitKa.GetValueOrDefault().Max, baseMva);

    /// <summary>Impedance Un²/S″kQ per unit on the bus's nominal voltage.</summary>
    /// <param name="feeder">The feeder, for its R/X.</param>
    /// <param name="mva">S″kQ in MVA.</param>
    /// <param name="baseMva">Base power in MVA.</param>
    public static Complex ImpedancePu(NetworkFeeder feeder, double mva, double baseMva) =>
        PerUnit.FromROverX(baseMva / mva, feeder.ROverX ?? 1.0 / feeder.XOverR.GetValueOrDefault());
}
