namespace NetFault;

/// <summary>A fuse, by its ratings (IEC 60282-1, IEC 60269-1, IEEE C37.40 series).</summary>
public sealed record Fuse : TerminalDevice
{
    /// <summary>
    /// The largest prospective current that it interrupts in kA, RMS of the AC component, greater than 0: the rated maximum breaking
    /// current I1 of IEC 60282-1, the rated breaking capacity of IEC 60269-1. Null where it is not known.
    /// </summary>
    public double? BreakingCapacityKa { get; init; }

    /// <summary>
    /// The power factor of the circuit in which the breaking capacity was tested, above 0 and at most 1 (IEC 60269-1, IEC 60282-1); this or
    /// <see cref="TestXOverR"/>. Null where it is not known.
    /// </summary>
    public double? TestPowerFactor { get; init; }

    /// <summary>
    /// The ratio X/R of the circuit in which the breaking capacity was tested, greater than 0 (IEEE C37.41); this or
    /// <see cref="TestPowerFactor"/>. Null where it is not known.
    /// </summary>
    public double? TestXOverR { get; init; }

    /// <inheritdoc/>
    public override string Section => "fuses";

    internal override void Check(ElementCheck check)
    {
        CheckPlace(check);
        check.Positive("breaking_capacity_ka", BreakingCapacityKa);
        check.AtMostOne(("test_power_factor", TestPowerFactor.HasValue), ("test_x_over_r", TestXOverR.HasValue));
        check.AboveZeroUpToOne("test_power_factor", TestPowerFactor);
        check.Positive("test_x_over_r", TestXOverR);
    }
}
