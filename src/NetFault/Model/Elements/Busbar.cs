namespace NetFault;

/// <summary>What the busbars of a switchgear or controlgear assembly are rated for (IEC 62271-200, IEC 61439-1).</summary>
public sealed record Busbar : RatedDevice
{
    /// <summary>Rated peak withstand current Ip (Ipk of IEC 61439-1) in kA, an instantaneous value, greater than 0; null where it is not known.</summary>
    public double? PeakWithstandCurrentKa { get; init; }

    /// <summary>
    /// Rated short-time withstand current Ik (Icw of IEC 61439-1) in kA, RMS, greater than 0; null where it is not known.
    /// </summary>
    public double? ShortTimeWithstandCurrentKa { get; init; }

    /// <summary>
    /// Rated duration of short circuit tk in seconds, for which the short-time withstand current may flow, 0.01 to 10; null where it is not
    /// known.
    /// </summary>
    public double? ShortTimeDurationSeconds { get; init; }

    /// <inheritdoc/>
    public override string Section => "busbars";

    internal override void Check(ElementCheck check)
    {
        check.BusReference("bus", Bus);
        check.DeviceVoltage("rated_kv", RatedKv, Bus);
        check.Withstand(PeakWithstandCurrentKa, ShortTimeWithstandCurrentKa, ShortTimeDurationSeconds);
    }
}
