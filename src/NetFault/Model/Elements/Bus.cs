namespace NetFault;

/// <summary>A busbar or connection point at which short circuits are calculated.</summary>
public sealed record Bus : NetworkElement
{
    /// <summary>The nominal line-to-line voltage Un in kV, greater than 0.</summary>
    public required double NominalKv { get; init; }

    /// <summary>The voltage tolerance of a low-voltage system in percent, 6 or 10 (IEC 60909-0 table 1); buses up to 1 kV only.</summary>
    public double? LowVoltageTolerancePercent { get; init; }

    /// <inheritdoc/>
    public override string Section => "buses";

    internal override ElementRole Role => ElementRole.Bus;

    internal override void Check(ElementCheck check)
    {
        check.Positive("nominal_kv", NominalKv);
        if (LowVoltageTolerancePercent is not { } tolerance)
            return;
        const string key = "low_voltage_tolerance_percent";
        if (tolerance is not (6.0 or 10.0))
            check.Say(key, Problems.NotOneOf(tolerance, "6 or 10"));
        else if (NominalKv > 1.0)
            check.Say(key, Problems.ToleranceAboveLowVoltage(NominalKv));
    }
}
