namespace NetFault;

/// <summary>What closed equipment must carry: the peak, and the heat.</summary>
internal static class WithstandDuties
{
    /// <summary>
    /// A circuit-breaker above 1 kV: its making current stands for a peak withstand current that is not given, its breaking current for the
    /// short-time one.
    /// </summary>
    public static void OfBreaker(CircuitBreaker breaker, double? makingKa, DutySheet sheet)
    {
        if (breaker.PeakWithstandCurrentKa is null && makingKa.HasValue)
            sheet.Assume("peak_withstand_current_ka", "equal to the rated making current assumed (IEC 62271-1, IEEE C37.100.1)");
        Peak(breaker.PeakWithstandCurrentKa ?? makingKa, sheet);
        if (breaker.ShortTimeWithstandCurrentKa is null && breaker.ShortCircuitBreakingCurrentKa.HasValue)
            sheet.Assume("short_time_withstand_current_ka", "equal to the rated breaking current assumed");
        var standardSeconds = breaker.Standard == CircuitBreakerStandard.IeeeC37_04 ? 2.0 : 1.0;
        Thermal(breaker.ShortTimeWithstandCurrentKa ?? breaker.ShortCircuitBreakingCurrentKa, breaker.ShortTimeDurationSeconds, standardSeconds, sheet);
    }

    /// <summary>Switches and busbars: without a peak withstand current the standard's multiple of the short-time one.</summary>
    public static void Of(double? peakKa, double? shortTimeKa, double? durationSeconds, DutySheet sheet)
    {
        if (peakKa is null && shortTimeKa is { } rms)
        {
            var isLow = sheet.Context.Network.Find<Bus>(sheet.Device.Bus).NominalKv <= 1.0;
            var factor = isLow ? StandardRatings.LowVoltagePeakFactor(rms) : StandardRatings.MakingFactor(sheet.FrequencyHz);
            sheet.Assume("peak_withstand_current_ka", FormattableString.Invariant(
                $"{factor} times the short-time withstand current assumed ({(isLow ? "IEC 61439-1 table 7" : "IEC 62271-1")})"));
            peakKa = factor * rms;
        }
        Peak(peakKa, sheet);
        Thermal(shortTimeKa, durationSeconds, 1.0, sheet);
    }

    /// <summary>The peak against Ip.</summary>
    public static void Peak(double? ratedKa, DutySheet sheet) => sheet.Judge(
        DutyKind.PeakWithstand, ratedKa, "peak_withstand_current_ka", sheet.Both, side => side.PeakKa, "peak against the rated peak withstand current");

    /// <summary>
    /// Ith of the fault's duration Tk against Ik, and against Ik·√(tk/Tk) where the fault lasts longer than the rated duration; for a shorter fault no
    /// more than Ik is taken (IEC 60909-0, clause 12, IEC 60865-1).
    /// </summary>
    public static void Thermal(double? ratedKa, double? durationSeconds, double standardSeconds, DutySheet sheet)
    {
        if (ratedKa.HasValue && durationSeconds is null)
            sheet.Assume("short_time_duration_s", FormattableString.Invariant($"{standardSeconds} s assumed, the standard value"));
        double tk = durationSeconds ?? standardSeconds, fault = sheet.Options.FaultDurationSeconds;
        sheet.Judge(DutyKind.Thermal, ratedKa * Math.Sqrt(Math.Min(1.0, tk / fault)), "short_time_withstand_current_ka", sheet.Both,
            side => side.ThermalEquivalentKa(fault), FormattableString.Invariant(
                $"Ith of {fault} s against the short-time withstand current of {tk} s, times √(tk/Tk) for a longer fault (IEC 60865-1)"));
    }
}
