namespace NetFault;

/// <summary>How a duty check judges. Immutable; the defaults are stated with each.</summary>
public sealed record DutyOptions
{
    private readonly double _marginalPercent = 5.0;
    private readonly double _faultDurationSeconds = 1.0;
    private readonly DcCriterion _dcCriterion;
    private readonly LowVoltageBreakingRating _lowVoltageRating;

    /// <summary>A duty that passes with less than this margin in percent is marked as marginal; not negative. Default 5.</summary>
    /// <exception cref="ArgumentOutOfRangeException">Negative or not finite.</exception>
    public double MarginalPercent
    {
        get => _marginalPercent;
        init => _marginalPercent = Guard.NotNegative(value, nameof(MarginalPercent));
    }

    /// <summary>
    /// The duration Tk of the short circuit in seconds for the thermal duties, above 0: until the slowest protection that is counted on has cleared
    /// it. Default 1 s, said to be assumed only where a rating is.
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">Not a finite number above 0.</exception>
    public double FaultDurationSeconds
    {
        get => _faultDurationSeconds;
        init => _faultDurationSeconds = Guard.Positive(value, nameof(FaultDurationSeconds));
    }

    /// <summary>How the DC component at contact separation is held against the rating. Default <see cref="DcCriterion.ByCurrent"/>.</summary>
    /// <exception cref="ArgumentOutOfRangeException">None of the three.</exception>
    public DcCriterion DcCriterion
    {
        get => _dcCriterion;
        init => _dcCriterion = Guard.OneOf(value, DcCriterion.ByCurrent, DcCriterion.ByPercent, DcCriterion.ByTotalCurrent);
    }

    /// <summary>Which breaking capacity of IEC 60947-2 counts. Default <see cref="LowVoltageBreakingRating.Ultimate"/>.</summary>
    /// <exception cref="ArgumentOutOfRangeException">None of the two.</exception>
    public LowVoltageBreakingRating LowVoltageRating
    {
        get => _lowVoltageRating;
        init => _lowVoltageRating = Guard.OneOf(value, LowVoltageBreakingRating.Ultimate, LowVoltageBreakingRating.Service);
    }
}

/// <summary>How the DC component at contact separation is held against the rating.</summary>
public enum DcCriterion
{
    /// <summary>
    /// In kA: i_dc against √2 times the rated breaking current times its DC share. A current smaller than the rated one may so have a larger share of
    /// DC, which the breaker has shown to bear in kA, though the words of IEC 62271-100 speak of percent; the result says where that is so.
    /// </summary>
    ByCurrent,

    /// <summary>In percent of the AC component's peak, as the words of IEC 62271-100 have it, whatever the current is.</summary>
    ByPercent,

    /// <summary>
    /// Not by itself: only the total RMS current counts, so that a smaller AC component makes up for a larger DC component. The mildest; ask the maker.
    /// Generator circuit-breakers keep the duty in kA.
    /// </summary>
    ByTotalCurrent,
}

/// <summary>A breaking capacity of IEC 60947-2.</summary>
public enum LowVoltageBreakingRating
{
    /// <summary>Icu: after it the breaker need not carry its rated current.</summary>
    Ultimate,

    /// <summary>Ics: after it the breaker goes on in service.</summary>
    Service,
}
