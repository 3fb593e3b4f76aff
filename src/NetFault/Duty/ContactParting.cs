namespace NetFault;

/// <summary>When the contacts of a circuit-breaker part, from the beginning of the short circuit.</summary>
/// <param name="Seconds">The time with the relay time; null where it is not known.</param>
/// <param name="RatedSeconds">
/// The time at which the rated DC component is taken from a time constant: with half a cycle in place of a shorter relay time, as the rating is
/// defined. Null where it is not known.
/// </param>
internal readonly record struct ContactParting(double? Seconds, double? RatedSeconds)
{
    /// <summary>From opening and relay time, or the times in cycles of IEEE C37.04.</summary>
    public static ContactParting Of(CircuitBreaker breaker, DutySheet sheet)
    {
        var halfCycle = 0.5 / sheet.FrequencyHz;
        if (breaker.MinimumOpeningTimeSeconds is { } opening)
        {
            if (breaker.RelayTimeSeconds is null)
                sheet.Assume("relay_time_s", "half a cycle assumed, as the rated DC component is defined");
            var relay = breaker.RelayTimeSeconds ?? halfCycle;
            return new ContactParting(opening + relay, opening + Math.Max(relay, halfCycle));
        }
        if (breaker.ContactPartingTimeCycles is { } cycles)
            return new ContactParting(cycles / sheet.FrequencyHz, cycles / sheet.FrequencyHz);
        if (breaker.RatedInterruptingTimeCycles is not { } interrupting)
            return default;
        var usual = StandardRatings.ContactPartingCycles(interrupting);
        sheet.Assume("contact_parting_time_cycles", FormattableString.Invariant(
            $"{usual} cycles assumed, which IEEE C37.010 takes for a rated interrupting time of {interrupting} cycles"));
        return new ContactParting(usual / sheet.FrequencyHz, usual / sheet.FrequencyHz);
    }
}

/// <summary>The DC component that goes with a rated breaking current.</summary>
internal static class RatedDcComponent
{
    /// <summary>Its share of the AC component's peak at contact parting; null where the time is not known.</summary>
    /// <param name="breaker">The breaker.</param>
    /// <param name="parting">When its contacts part.</param>
    /// <param name="standardSeconds">The time constant that the standard takes where none is given.</param>
    /// <param name="sheet">Where that is noted.</param>
    public static double? Of(CircuitBreaker breaker, ContactParting parting, double standardSeconds, DutySheet sheet)
    {
        if (breaker.DcComponentPercent is { } percent)
            return percent / 100.0;
        return parting.RatedSeconds is { } seconds ? Math.Exp(-seconds / TimeConstant(breaker, standardSeconds, sheet)) : null;
    }

    /// <summary>The time constant of the rated breaking current.</summary>
    public static double TimeConstant(CircuitBreaker breaker, double standardSeconds, DutySheet sheet)
    {
        if (breaker.DcTimeConstantSeconds is null && breaker.DcComponentPercent is null)
        {
            sheet.Assume("dc_time_constant_s", FormattableString.Invariant(
                $"{1000.0 * standardSeconds:0} ms assumed, the standard value of {CircuitBreakerKeys.Name(breaker.Standard)}"));
        }
        return breaker.DcTimeConstantSeconds ?? standardSeconds;
    }
}
