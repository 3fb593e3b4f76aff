namespace NetFault;

/// <summary>A mark beside a row of a table, with what it means.</summary>
/// <param name="Sign">The mark.</param>
/// <param name="Meaning">What it means, below the table.</param>
/// <param name="Holds">Whether it holds at a fault.</param>
internal sealed record ReportMark(string Sign, string Meaning, Func<BusFault, bool> Holds)
{
    /// <summary>The mark for assumed values; what was assumed is listed under it.</summary>
    public static readonly ReportMark Assumed =
        new("a", "rests on values that the network does not give:", fault => fault.Assumptions.Count > 0);

    /// <summary>All marks, in the order in which they stand.</summary>
    public static IReadOnlyList<ReportMark> All { get; } =
    [
        new("d", "de-energised, no path to a source", fault => !fault.IsEnergised),
        new("u", "no X/R at this bus; the DC component is taken as undamped, an upper bound", fault => fault.DcDecayRule == DcDecayRule.Undamped),
        new("s", "fed by a machine on its own way without steady_state_factor; Ik keeps its initial current",
            fault => fault.Iec60909?.SteadyStateCurrentRule == SteadyStateCurrentRule.RadialFactorMissing),
        new("o", "small motors left out", fault => fault.Iec60909?.MotorsLeftOut == true),
        Assumed,
    ];

    /// <summary>The marks of a fault.</summary>
    public static string Of(BusFault fault) => string.Concat(All.Where(mark => mark.Holds(fault)).Select(mark => mark.Sign));
}
