namespace NetFault;

/// <summary>The case for which short-circuit currents are calculated (IEC 60909-0).</summary>
public enum ShortCircuitCase
{
    /// <summary>The largest currents: for the rating of equipment.</summary>
    Maximum,

    /// <summary>The smallest currents: for the choice of fuses and the setting of protection.</summary>
    Minimum,
}

/// <summary>The voltage factor c of IEC 60909-0:2016, table 1.</summary>
internal static class VoltageFactor
{
    /// <summary>The tolerance that is taken for low-voltage buses that do not give one, in percent.</summary>
    public const double DefaultTolerancePercent = 10.0;

    /// <summary>c of a case at a bus.</summary>
    public static double Of(Bus bus, ShortCircuitCase which) => which == ShortCircuitCase.Maximum ? Max(bus) : Min(bus);

    /// <summary>cmax: 1.05 or 1.10 up to 1 kV by tolerance, 1.10 above.</summary>
    public static double Max(Bus bus) => IsLowVoltage(bus) && Tolerance(bus) < DefaultTolerancePercent ? 1.05 : 1.10;

    /// <summary>cmin: 0.95 or 0.90 up to 1 kV by tolerance, 1.00 above.</summary>
    public static double Min(Bus bus)
    {
        if (!IsLowVoltage(bus))
            return 1.00;
        return Tolerance(bus) < DefaultTolerancePercent ? 0.95 : 0.90;
    }

    /// <summary>Whether table 1 counts a bus as low voltage: up to 1 kV.</summary>
    public static bool IsLowVoltage(Bus bus) => bus.NominalKv <= 1.0;

    private static double Tolerance(Bus bus) => bus.LowVoltageTolerancePercent ?? DefaultTolerancePercent;
}
