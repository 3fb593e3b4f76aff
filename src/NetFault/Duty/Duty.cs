namespace NetFault;

/// <summary>What a device must bear.</summary>
public enum DutyKind
{
    /// <summary>Closing onto the fault, or closing and latching: the peak.</summary>
    Making,

    /// <summary>
    /// Interrupting: the AC component at contact parting; with the multiplying factor where the standard has one for X/R (IEEE C37.010, low voltage,
    /// fuses).
    /// </summary>
    BreakingSymmetrical,

    /// <summary>Interrupting: the DC component at contact parting.</summary>
    BreakingDcComponent,

    /// <summary>Interrupting: the total RMS current at contact parting.</summary>
    BreakingAsymmetrical,

    /// <summary>Interrupting what comes from the generator: the AC component at contact parting (generator circuit-breakers).</summary>
    GeneratorSourceSymmetrical,

    /// <summary>Interrupting what comes from the generator: the DC component at contact parting (generator circuit-breakers).</summary>
    GeneratorSourceDcComponent,

    /// <summary>Carrying the peak while closed.</summary>
    PeakWithstand,

    /// <summary>Carrying the heat of the short circuit while closed.</summary>
    Thermal,
}

/// <summary>What a duty check finds.</summary>
public enum DutyVerdict
{
    /// <summary>The device can do what it must.</summary>
    Pass,

    /// <summary>It cannot.</summary>
    Fail,

    /// <summary>It cannot be said; the reason is given.</summary>
    CannotSay,

    /// <summary>There is no current to bear: de-energised or out of service.</summary>
    NoCurrent,
}

/// <summary>
/// One duty of one device: what it must bear, what it can, and how both were found. For study by qualified engineers; a verdict does not replace
/// licensed practice.
/// </summary>
/// <param name="Kind">Which duty.</param>
/// <param name="Verdict">The verdict.</param>
/// <param name="Required">What it must bear, in <paramref name="Unit"/>; null where that is not known.</param>
/// <param name="Rated">What it can bear, in <paramref name="Unit"/>; null where that is not known.</param>
/// <param name="Unit">The unit: <c>kA</c>, or <c>%</c> for a DC component in percent.</param>
/// <param name="Formula">How both were found, in words, with the standard.</param>
/// <param name="Reason">Why it cannot be said, or why there is no current; null otherwise.</param>
/// <param name="FaultBusId">The bus at or beside which the worst fault is; null where there is none.</param>
/// <param name="FaultSide">On which side of the device the worst fault is; null for a busbar, and where there is none.</param>
/// <param name="IsMarginal">Whether it passes with less than the margin of <see cref="DutyOptions.MarginalPercent"/>.</param>
public sealed record Duty(
    DutyKind Kind, DutyVerdict Verdict, double? Required, double? Rated, string Unit, string Formula, string? Reason, string? FaultBusId,
    FaultSide? FaultSide, bool IsMarginal)
{
    /// <summary>
    /// The margin in percent: rated over required, less one. 0 is just enough, −20 means that the rating is four fifths of what is needed; null where
    /// one of them is not known or nothing is required.
    /// </summary>
    public double? MarginPercent => Required > 0.0 && Rated.HasValue ? 100.0 * (Rated.Value / Required.Value - 1.0) : null;

    /// <summary>The duty in one line.</summary>
    public override string ToString() => Reason is not null
        ? $"{Kind}: {Verdict}, {Reason}"
        : FormattableString.Invariant($"{Kind}: {Verdict}, {Required:0.###} of {Rated:0.###} {Unit}, margin {MarginPercent:+0.0;-0.0;0.0} %");
}
