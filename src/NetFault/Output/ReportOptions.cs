namespace NetFault;

/// <summary>What a report shows beside the fixed columns. Immutable.</summary>
public sealed record ReportOptions
{
    private readonly IReadOnlyList<double> _instantsSeconds = [0.05, 0.1];
    private readonly double _thermalDurationSeconds = 1.0;

    /// <summary>
    /// The times after the beginning of the fault, in seconds, at which DC component and asymmetrical RMS are given: commonly those of contact
    /// parting. One that is given twice counts once. Default 0.05 s and 0.1 s.
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">A time is negative or not finite.</exception>
    public IReadOnlyList<double> InstantsSeconds
    {
        get => _instantsSeconds;
        init => _instantsSeconds = Array.AsReadOnly(
            Guard.NotNull(value, nameof(InstantsSeconds)).Select(one => Guard.NotNegative(one, nameof(InstantsSeconds))).Distinct().ToArray());
    }

    /// <summary>
    /// The duration Tk of the short circuit in seconds for the thermal equivalent current, above 0. Default 1 s. Methods that give no such
    /// current leave it out.
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">Not a finite number above 0.</exception>
    public double ThermalDurationSeconds
    {
        get => _thermalDurationSeconds;
        init => _thermalDurationSeconds = Guard.Positive(value, nameof(ThermalDurationSeconds));
    }

    /// <summary>
    /// Whether a CSV file begins with lines behind <c>#</c> that say network, method, assumptions and caution. Default true; without them
    /// the file is plain RFC 4180.
    /// </summary>
    public bool CsvComments { get; init; } = true;
}
