namespace NetFault;

/// <summary>Which duties a device has, and what is said beside them.</summary>
internal static class DutyRules
{
    /// <summary>All duties of a device from the currents through it.</summary>
    public static DeviceDuty Judge(
        StudyContext context, DutyOptions options, RatedDevice device, DeviceCurrents currents, IEnumerable<string> remarks)
    {
        var sheet = new DutySheet(context, options, device, currents);
        foreach (var remark in remarks)
            sheet.Remark(remark);
        SayStandards(device, sheet);
        SayConverters(sheet);
        switch (device)
        {
            case CircuitBreaker breaker:
                OfBreaker(breaker, sheet);
                break;
            case Switch one:
                if (one.ShortCircuitMakingCurrentKa is { } making)
                    sheet.Judge(DutyKind.Making, making, "", sheet.Both, side => side.PeakKa, "peak against the rated short-circuit making current");
                WithstandDuties.Of(one.PeakWithstandCurrentKa, one.ShortTimeWithstandCurrentKa, one.ShortTimeDurationSeconds, sheet);
                break;
            case Busbar one:
                WithstandDuties.Of(one.PeakWithstandCurrentKa, one.ShortTimeWithstandCurrentKa, one.ShortTimeDurationSeconds, sheet);
                break;
            case Fuse fuse:
                LowVoltageDuties.OfFuse(fuse, sheet);
                break;
        }
        return sheet.Finished();
    }

    /// <summary>The duty under which a device stands that has no current.</summary>
    public static DutyKind FirstOf(RatedDevice device) => device switch
    {
        CircuitBreaker => DutyKind.Making,
        Fuse => DutyKind.BreakingSymmetrical,
        _ => DutyKind.PeakWithstand,
    };

    private static void OfBreaker(CircuitBreaker breaker, DutySheet sheet)
    {
        switch (breaker.Standard)
        {
            case CircuitBreakerStandard.Iec62271_100:
                HighVoltageDuties.Iec(breaker, sheet);
                break;
            case CircuitBreakerStandard.IeeeC37_04:
                HighVoltageDuties.Ieee(breaker, sheet);
                break;
            case CircuitBreakerStandard.IecIeee62271_37_013:
                HighVoltageDuties.Generator(breaker, sheet);
                break;
            case CircuitBreakerStandard.Iec60947_2:
                LowVoltageDuties.Iec(breaker, sheet);
                break;
            default:
                LowVoltageDuties.Ieee(breaker, sheet);
                break;
        }
    }

    /// <summary>Ratings of one standard against currents by another are comparable, kA against kA; that they are mixed is said.</summary>
    private static void SayStandards(RatedDevice device, DutySheet sheet)
    {
        if (device is not CircuitBreaker breaker)
            return;
        var isIec = breaker.Standard is CircuitBreakerStandard.Iec62271_100 or CircuitBreakerStandard.Iec60947_2;
        var isIeee = breaker.Standard is CircuitBreakerStandard.IeeeC37_04 or CircuitBreakerStandard.IeeeC37_13;
        var name = CircuitBreakerKeys.Name(breaker.Standard);
        if ((isIec && sheet.Context.Method is IeeeC37) || (isIeee && sheet.Context.Method is Iec60909))
            sheet.Remark($"standards mixed: rated by {name}, currents by {sheet.Context.Method.Name}");
        else if (sheet.Context.Method is MachineDecrement)
            sheet.Remark($"rated by {name}, currents by machine decrement, which is the method of no standard");
    }

    private static void SayConverters(DutySheet sheet)
    {
        if (sheet.Device is not Busbar && sheet.Context.Method is not MachineDecrement && sheet.Context.Network.FullConverterSources.Count > 0)
            sheet.Remark("what full-size converters add to the fault is taken whole on either side of the device");
    }
}
