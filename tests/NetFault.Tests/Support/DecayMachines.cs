using System.Numerics;

namespace NetFault.Tests.Support;

/// <summary>
/// Synchronous machines and asynchronous motors as branches of <see cref="DecayOracle"/>, after section 6.1 of the design.
/// </summary>
internal static class DecayMachines
{
    /// <summary>Slip of a motor that gives none, in percent.</summary>
    private const double AssumedSlipPercent = 1;

    /// <summary>
    /// 1/X(p) = 1/x″d − (1/x′d − 1/xd)/(1 + pT′d) − (1/x″d − 1/x′d)/(1 + pT″d); where a time constant is not known, its part stays.
    /// </summary>
    public static DecayBranch Synchronous(
        SynchronousMachine one, IReadOnlyList<DecayEnd> ends, double nominalKv, double baseMva, double omega)
    {
        var ratedOhm = Math.Pow(one.RatedKv ?? nominalKv, 2) / one.RatedMva;
        var toBase = ratedOhm * baseMva / (nominalKv * nominalKv);
        var first = one.ReactancePu.Subtransient;
        var second = one.ReactancePu.Transient ?? first;
        var third = one.ReactancePu.Synchronous ?? second;
        var r = one.ArmatureResistancePu
            ?? one.ArmatureResistanceOhm / ratedOhm
            ?? (one.TimeConstantSeconds.Armature is { } seconds
                ? (one.ReactancePu.Negative ?? first) / (omega * seconds)
                : first / (omega * 0.15));
        return new DecayBranch(one.Section, one.Id, ends, r * toBase, first * toBase)
        {
            Terms = new[] { (second, third, one.TimeConstantSeconds.Transient), (first, second, one.TimeConstantSeconds.Subtransient) }
                .Where(term => term.Item3.HasValue && term.Item1 < term.Item2)
                .Select(term => new DecayTerm((1 / term.Item1 - 1 / term.Item2) / toBase, term.Item3!.Value)).ToList(),
        };
    }

    /// <summary>The locked-rotor impedance times (1 + pT)/(pT), T = x/(ω·r2) with both on the motor's own rating.</summary>
    public static DecayBranch Asynchronous(
        AsynchronousMotor one, IReadOnlyList<DecayEnd> ends, double nominalKv, double baseMva, double omega)
    {
        var kv = one.RatedKv ?? nominalKv;
        var own = Complex.FromPolarCoordinates(1 / one.LockedRotorCurrentRatio, Math.Atan2(1, ROverX(one, kv)));
        var mva = one.RatedKw / 1000 / one.RatedPowerFactor / one.Efficiency * one.Count;
        var toBase = kv * kv / mva * baseMva / (nominalKv * nominalKv);
        return new DecayBranch(one.Section, one.Id, ends, own.Real * toBase, own.Imaginary * toBase)
        {
            MotorSeconds = own.Imaginary / (omega * (one.RatedSlipPercent ?? AssumedSlipPercent) / 100),
        };
    }

    /// <summary>R/X given, or IEC 60909-0's by size (from memory): 0.42 up to 1 kV, 0.10 from 1 MW a pole pair, else 0.15.</summary>
    private static double ROverX(AsynchronousMotor one, double kv) =>
        one.ROverX ?? 1 / one.XOverR ?? (kv <= 1 ? 0.42 : one.RatedKw / (one.PolePairs ?? 1) >= 1000 ? 0.10 : 0.15);
}
