namespace NetFault;

/// <summary>A series capacitor in a line.</summary>
public sealed record SeriesCapacitor : NetworkElement
{
    /// <summary>The id of the bus at one end.</summary>
    public required string From { get; init; }

    /// <summary>The id of the bus at the other end.</summary>
    public required string To { get; init; }

    /// <summary>The magnitude of its reactance 1/(ωC) at rated frequency in ohm, greater than 0.</summary>
    public required double ReactanceOhm { get; init; }

    /// <summary>
    /// Whether a voltage-limiting device in parallel acts during a short circuit. Then the capacitor is left out of the calculation (IEC
    /// 60909-0): its two buses are one node.
    /// </summary>
    public required bool VoltageLimited { get; init; }

    /// <inheritdoc/>
    public override string Section => "series_capacitors";

    internal override ElementRole Role => VoltageLimited ? ElementRole.Joint : ElementRole.Branch;

    internal override IReadOnlyList<string?> Terminals => [From, To];

    internal override void Check(ElementCheck check)
    {
        check.BusReference("from", From);
        check.BusReference("to", To);
        check.DifferentBuses("from", From, "to", To);
        check.Positive("reactance_ohm", ReactanceOhm);
        check.SameNominalVoltage(From, To, perUnit: false);
    }
}
