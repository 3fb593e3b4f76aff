namespace NetFault;

/// <summary>What every report says beside its numbers.</summary>
internal static class ReportTexts
{
    /// <summary>The caution.</summary>
    public const string Caution =
        "For study by qualified engineers. Check against the applicable standards and local codes; "
        + "this does not replace licensed practice and is not for live switching decisions.";

    /// <summary>How the method treats AC and DC over time, in one line.</summary>
    public static string MethodLine(FaultMethod method) => method switch
    {
        Iec60909 => $"Method: {method.Name}; kappa by {RuleName(method.RatioRule)}; "
            + "DC component by equivalent frequency; AC component over time is Ib.",
        IeeeC37 => $"Method: {method.Name}; X/R by {RuleName(method.RatioRule)}; "
            + "first-cycle, interrupting (from 1.5 cycles) and 30-cycle networks; "
            + "remote multiplying factors, no AC decrement credited for local generators.",
        MachineDecrement decrement => $"Method: {method.Name}; X/R by {RuleName(method.RatioRule)}; "
            + $"DC component {DcRule(decrement.DcDecayRule)}; AC component {AcRule(decrement.AcComponentRule)}.",
        _ => $"Method: {method.Name}; X/R by {RuleName(method.RatioRule)}.",
    };

    private static string DcRule(DcDecayRule rule) => rule == DcDecayRule.Exact ? "exact" : "by X/R";

    private static string AcRule(AcComponentRule rule) => rule switch
    {
        AcComponentRule.HeldAtInitial => "held at I″k over time",
        AcComponentRule.Exact => "decaying with all machines, exact",
        _ => "decaying with all machines, reactances at rated frequency",
    };

    /// <summary>An X/R rule in words.</summary>
    public static string RuleName(XOverRRule rule) => rule switch
    {
        XOverRRule.SeparateNetworks => "separate R and X networks",
        XOverRRule.EquivalentFrequency => "the equivalent frequency, method (c)",
        XOverRRule.SmallestRatio => "the smallest R/X, method (a)",
        _ => "the complex impedance at the fault",
    };

    /// <summary>The assumptions, those alike together.</summary>
    public static IReadOnlyList<AssumptionGroup> Group(IEnumerable<Assumption> assumptions) =>
        assumptions
            .GroupBy(one => (one.Section, one.Key, one.Text))
            .Select(group => new AssumptionGroup(
                group.Key.Section, group.Key.Key, group.Key.Text, group.Select(one => one.ElementId).ToList()))
            .ToList();
}

/// <summary>One assumption that holds for several elements.</summary>
internal sealed record AssumptionGroup(string Section, string Key, string Text, IReadOnlyList<string> ElementIds)
{
    /// <summary>Ids shown in a line before the rest is counted.</summary>
    private const int ShownIds = 8;

    /// <summary>The group in one line.</summary>
    public override string ToString()
    {
        var rest = ElementIds.Count - ShownIds;
        var ids = string.Join(", ", ElementIds.Take(ShownIds)) + (rest > 0 ? $" and {rest} more" : "");
        return $"{Section} {ids}: {Text} ({Key})";
    }
}
