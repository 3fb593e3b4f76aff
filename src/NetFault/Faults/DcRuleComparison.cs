namespace NetFault;

/// <summary>
/// How far the usual rules for the DC component lie from the exact one, at every bus at one time: one X/R for a network of many time constants
/// is a rule of thumb, and where sources of different X/R meet it may lie on the unsafe side. Immutable.
/// </summary>
public sealed class DcRuleComparison
{
    internal DcRuleComparison(double seconds, IReadOnlyList<BusDcComparison> buses)
    {
        Seconds = seconds;
        Buses = buses;
        Summaries = buses.SelectMany(bus => bus.Rules.Select(rule => (bus.BusId, Rule: rule)))
            .GroupBy(one => one.Rule.Rule)
            .Select(group => DcRuleSummary.Of(group.Key, group.ToList()))
            .ToList().AsReadOnly();
    }

    /// <summary>The time after the beginning of the fault in seconds, such as that of contact parting.</summary>
    public double Seconds { get; }

    /// <summary>The energised buses, in the order of the network.</summary>
    public IReadOnlyList<BusDcComparison> Buses { get; }

    /// <summary>The worst of each rule over all buses.</summary>
    public IReadOnlyList<DcRuleSummary> Summaries { get; }
}

/// <summary>The rules at one bus.</summary>
/// <param name="BusId">The bus.</param>
/// <param name="InitialSymmetricalKa">I″k in kA.</param>
/// <param name="ExactDcComponentKa">The exact DC component at the time, of the worst closing angle, in kA.</param>
/// <param name="ExactPeakKa">The exact peak over time and closing angle, with the AC component decaying, in kA.</param>
/// <param name="Rules">Each rule's.</param>
public sealed record BusDcComparison(
    string BusId, double InitialSymmetricalKa, double ExactDcComponentKa, double ExactPeakKa, IReadOnlyList<DcRuleDifference> Rules)
{
    /// <summary>What one rule gives.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The rule is not among those compared.</exception>
    public DcRuleDifference By(XOverRRule rule) => Rules.FirstOrDefault(one => one.Rule == rule)
        ?? throw new ArgumentOutOfRangeException(nameof(rule), rule, "must be " + string.Join(" or ", Rules.Select(one => one.Rule)));
}

/// <summary>What one rule gives at one bus.</summary>
/// <param name="Rule">The rule for X/R.</param>
/// <param name="XOverR">
/// Its X/R; by <see cref="XOverRRule.EquivalentFrequency"/> that of the frequency for the time. Null where there is none, and the DC component is
/// taken as undamped.
/// </param>
/// <param name="DcComponentKa">√2·I″k·e^(−ωt/(X/R)) in kA.</param>
/// <param name="DifferencePercent">How much that is above the exact one, in percent of √2·I″k; negative where it is below: the unsafe side.</param>
/// <param name="PeakKa">The peak by the rule with the AC component held at I″k, in kA.</param>
/// <param name="PeakDifferencePercent">How much that is above the exact peak, in percent of it; negative on the unsafe side.</param>
public sealed record DcRuleDifference(
    XOverRRule Rule, double? XOverR, double DcComponentKa, double DifferencePercent, double PeakKa, double PeakDifferencePercent)
{
    /// <summary>Below this, in percent, a difference is rounding and quadrature.</summary>
    private const double Nothing = 1e-3;

    /// <summary>Whether the rule's DC component is below the exact one.</summary>
    public bool IsOnUnsafeSide => DifferencePercent < -Nothing;
}

/// <summary>The worst of one rule over all buses.</summary>
/// <param name="Rule">The rule for X/R.</param>
/// <param name="LowestPercent">The smallest difference of the DC component, in percent of √2·I″k; below 0 it is unsafe there.</param>
/// <param name="LowestBusId">The bus at which.</param>
/// <param name="HighestPercent">The largest difference.</param>
/// <param name="HighestBusId">The bus at which.</param>
/// <param name="UnsafeBuses">At how many buses the rule is below the exact DC component.</param>
/// <param name="LowestPeakPercent">The smallest difference of the peak, in percent of the exact one.</param>
/// <param name="LowestPeakBusId">The bus at which.</param>
public sealed record DcRuleSummary(
    XOverRRule Rule, double LowestPercent, string LowestBusId, double HighestPercent, string HighestBusId, int UnsafeBuses,
    double LowestPeakPercent, string LowestPeakBusId)
{
    internal static DcRuleSummary Of(XOverRRule rule, IReadOnlyList<(string BusId, DcRuleDifference Rule)> at)
    {
        var sorted = at.OrderBy(one => one.Rule.DifferencePercent).ToList();
        var (lowest, highest) = (sorted[0], sorted[sorted.Count - 1]);
        var peak = at.OrderBy(one => one.Rule.PeakDifferencePercent).First();
        return new DcRuleSummary(rule, lowest.Rule.DifferencePercent, lowest.BusId, highest.Rule.DifferencePercent, highest.BusId,
            at.Count(one => one.Rule.IsOnUnsafeSide), peak.Rule.PeakDifferencePercent, peak.BusId);
    }
}
