namespace NetFault;

/// <summary>The words of a duty report.</summary>
internal static class DutyTexts
{
    /// <summary>Ids shown in a line before the rest is counted.</summary>
    private const int ShownIds = 8;

    /// <summary>A duty's name for people.</summary>
    public static string Name(DutyKind kind) => kind switch
    {
        DutyKind.Making => "making",
        DutyKind.BreakingSymmetrical => "breaking, symmetrical",
        DutyKind.BreakingDcComponent => "breaking, DC component",
        DutyKind.BreakingAsymmetrical => "breaking, asymmetrical",
        DutyKind.GeneratorSourceSymmetrical => "generator source, symmetrical",
        DutyKind.GeneratorSourceDcComponent => "generator source, DC component",
        DutyKind.PeakWithstand => "peak withstand",
        _ => "thermal",
    };

    /// <summary>A verdict for people.</summary>
    public static string Verdict(Duty duty) => duty.Verdict switch
    {
        DutyVerdict.Fail => "FAIL",
        DutyVerdict.CannotSay => "cannot say",
        DutyVerdict.NoCurrent => "no current",
        _ => duty.IsMarginal ? "pass, marginal" : "pass",
    };

    /// <summary>A side for people.</summary>
    public static string Side(FaultSide? side) => side switch
    {
        FaultSide.AtBus => "at the bus",
        FaultSide.BeyondDevice => "beyond",
        _ => "",
    };

    /// <summary>How was judged, in one line.</summary>
    public static string OptionsLine(DutyOptions options) =>
        FormattableString.Invariant($"Margin: rated over required, less one; marginal below {options.MarginalPercent} %. ")
        + FormattableString.Invariant($"Thermal duty for {options.FaultDurationSeconds} s. ")
        + $"DC component judged {Criterion(options.DcCriterion)}. "
        + $"Low voltage by {(options.LowVoltageRating == LowVoltageBreakingRating.Ultimate ? "Icu" : "Ics")}.";

    private static string Criterion(DcCriterion criterion) => criterion switch
    {
        DcCriterion.ByCurrent => "in kA",
        DcCriterion.ByPercent => "in percent",
        _ => "by the total RMS current alone",
    };

    /// <summary>The verdicts counted.</summary>
    public static string Summary(DutyCheck check)
    {
        int Count(DutyVerdict verdict) => check.Count(verdict);
        var marginal = check.Devices.Count(one => one.IsMarginal);
        return FormattableString.Invariant($"{Count(DutyVerdict.Fail)} fail, {Count(DutyVerdict.CannotSay)} cannot say, ")
            + FormattableString.Invariant($"{Count(DutyVerdict.Pass)} pass ({marginal} marginal), {Count(DutyVerdict.NoCurrent)} without current.");
    }

    /// <summary>Ids in a line.</summary>
    public static string Ids(IReadOnlyList<string> ids) =>
        string.Join(", ", ids.Take(ShownIds)) + (ids.Count > ShownIds ? $" and {ids.Count - ShownIds} more" : "");
}
