using System.Numerics;

namespace NetFault;

/// <summary>An asynchronous motor, or a group, at its locked-rotor impedance (IEC 60909-0, 6.10).</summary>
internal static class AsynchronousMotorCircuit
{
    /// <summary>|ZM| = (IrM/ILR)·UrM²/SrM of the group, per unit on the bus's nominal voltage, with the R/X given or assumed by size.</summary>
    public static Complex ImpedancePu(AsynchronousMotor motor, double nominalKv, double baseMva, AssumptionLog? log)
    {
        if (motor.RatedKv is null)
            log?.Add(motor, "rated_kv", AssumptionTexts.RatedVoltageOfBus);
        var ratedKv = motor.RatedKv ?? nominalKv;
        var z = ratedKv * ratedKv / (motor.LockedRotorCurrentRatio * motor.RatedMvaOfOne * motor.Count);
        return PerUnit.FromROverX(z / PerUnit.BaseOhm(nominalKv, baseMva), ROverX(motor, ratedKv, log));
    }

    /// <summary>R/X by IEC 60909-0, 6.10: by the power a pole pair for medium voltage, one value for low-voltage groups with cables.</summary>
    private static double ROverX(AsynchronousMotor motor, double ratedKv, AssumptionLog? log)
    {
        if (motor.ROverX is { } given)
            return given;
        if (motor.XOverR is { } inverse)
            return 1.0 / inverse;
        var (ratio, reason) = RuleOf(motor, ratedKv);
        log?.Add(motor, "r_over_x", reason);
        return ratio;
    }

    private static (double Ratio, string Reason) RuleOf(AsynchronousMotor motor, double ratedKv)
    {
        if (ratedKv <= 1.0)
            return (0.42, "R/X = 0.42 assumed (IEC 60909-0: low-voltage motor groups with their cables)");
        if (motor.RatedKw < 1000.0 * (motor.PolePairs ?? 1))
            return (0.15, "R/X = 0.15 assumed (IEC 60909-0: medium voltage, below 1 MW a pole pair)");
        return motor.PolePairs is null
            ? (0.10, "R/X = 0.10 assumed (IEC 60909-0: medium voltage, 1 MW a pole pair or more; pole_pairs is not given, 1 assumed)")
            : (0.10, "R/X = 0.10 assumed (IEC 60909-0: medium voltage, 1 MW a pole pair or more)");
    }
}
