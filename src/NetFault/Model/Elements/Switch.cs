namespace NetFault;

/// <summary>
/// A switch, disconnector or switch-disconnector, by its ratings (IEC 62271-102, IEC 62271-103, IEC 60947-3): it carries short-circuit
/// currents and may close onto them, but does not interrupt them.
/// </summary>
public sealed record Switch : TerminalDevice
{
    /// <summary>
    /// Rated short-circuit making current Ima (Icm of IEC 60947-3) in kA, the highest instantaneous value onto which it may be closed,
    /// greater than 0; null where it is not known or where it has none, as most disconnectors.
    /// </summary>
    public double? ShortCircuitMakingCurrentKa { get; init; }

    /// <summary>Rated peak withstand current Ip in kA, an instantaneous value, greater than 0; null where it is not known.</summary>
    public double? PeakWithstandCurrentKa { get; init; }

    /// <summary>
    /// Rated short-time withstand current Ik (Icw of IEC 60947-3) in kA, RMS, greater than 0; null where it is not known.
    /// </summary>
    public double? ShortTimeWithstandCurrentKa { get; init; }

    /// <summary>
    /// Rated duration of short circuit tk in seconds, for which the short-time withstand current may flow, 0.01 to 10; null where it is not
    /// known.
    /// </summary>
    public double? ShortTimeDurationSeconds { get; init; }

    /// <inheritdoc/>
    public override string Section => "switches";

    internal override void Check(ElementCheck check)
    {
        CheckPlace(check);
        check.Positive("short_circuit_making_current_ka", ShortCircuitMakingCurrentKa);
        check.Withstand(PeakWithstandCurrentKa, ShortTimeWithstandCurrentKa, ShortTimeDurationSeconds);
    }
}
