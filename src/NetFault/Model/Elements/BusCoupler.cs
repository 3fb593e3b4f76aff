namespace NetFault;

/// <summary>A switch between two buses, without impedance. Closed, it makes one node of them.</summary>
public sealed record BusCoupler : NetworkElement
{
    /// <summary>The id of the bus on one side.</summary>
    public required string From { get; init; }

    /// <summary>The id of the bus on the other side.</summary>
    public required string To { get; init; }

    /// <summary>Whether the coupler is closed.</summary>
    public required bool Closed { get; init; }

    /// <inheritdoc/>
    public override string Section => "bus_couplers";

    internal override ElementRole Role => Closed ? ElementRole.Joint : ElementRole.Gap;

    internal override IReadOnlyList<string?> Terminals => [From, To];

    internal override void Check(ElementCheck check)
    {
        check.BusReference("from", From);
        check.BusReference("to", To);
        check.DifferentBuses("from", From, "to", To);
        check.SameNominalVoltage(From, To, perUnit: false);
        if (Closed && InService)
            check.SameTolerance(From, To);
    }
}
