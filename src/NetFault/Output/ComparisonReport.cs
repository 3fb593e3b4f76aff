using System.Globalization;
using System.Text;

namespace NetFault;

/// <summary>A comparison of the rules for the DC component as text and as CSV.</summary>
internal static class ComparisonReport
{
    public static string Render(DcRuleComparison comparison)
    {
        var text = new StringBuilder();
        text.Append(FormattableString.Invariant($"DC component at {comparison.Seconds} s and peak, by rules for X/R, against the exact ones\n\n"));
        if (comparison.Buses.Count == 0)
            return text.Append("No bus is energised.\n").ToString();
        var rules = comparison.Buses[0].Rules.Select(rule => rule.Rule).ToList();
        var rows = new List<string[]> { Heading(rules, "i_dc", "ip", "Below"), Heading(rules, "kA", "kA", "", "%") };
        rows.AddRange(comparison.Buses.Select(Row));
        TextTable.Append(text, rows, headingRows: 2);
        text.Append("\ni_dc %: above the exact one, in percent of √2·I″k. ip %: above the exact peak. Below 0 is the unsafe side; the last column names the rules whose DC component is below.\n");
        for (var i = 0; i < rules.Count; i++)
            text.Append(FormattableString.Invariant($"{Letter(i)}: X/R of {ReportTexts.RuleName(rules[i])}\n"));
        foreach (var summary in comparison.Summaries)
            text.Append(Line(summary));
        return text.Append('\n').Append(ReportTexts.Caution).Append('\n').ToString();
    }

    /// <summary>CSV, one row for each bus and rule (RFC 4180).</summary>
    public static void Write(TextWriter writer, DcRuleComparison comparison)
    {
        CsvReport.WriteRow(writer,
        [
            "bus_id", "seconds", "initial_symmetrical_ka", "exact_dc_component_ka", "exact_peak_ka", "x_over_r_rule", "x_over_r", "dc_component_ka",
            "dc_difference_percent", "peak_ka", "peak_difference_percent", "is_on_unsafe_side",
        ]);
        foreach (var bus in comparison.Buses)
        {
            foreach (var rule in bus.Rules)
            {
                CsvReport.WriteRow(writer, new object?[]
                {
                    bus.BusId, comparison.Seconds, bus.InitialSymmetricalKa, bus.ExactDcComponentKa, bus.ExactPeakKa,
                    ReportColumn.Snake(rule.Rule.ToString()), rule.XOverR, rule.DcComponentKa, rule.DifferencePercent, rule.PeakKa,
                    rule.PeakDifferencePercent, rule.IsOnUnsafeSide,
                }.Select(CsvReport.Cell));
            }
        }
    }

    private static string[] Heading(IReadOnlyList<XOverRRule> rules, string dc, string peak, string below, string? unit = null) =>
    [
        unit is null ? "Bus" : "", unit is null ? "I″k" : "kA", dc, peak,
        .. rules.Select((_, i) => unit ?? $"{dc} {Letter(i)}"), .. rules.Select((_, i) => unit ?? $"{peak} {Letter(i)}"), below,
    ];

    private static string[] Row(BusDcComparison bus) =>
    [
        bus.BusId, Number(bus.InitialSymmetricalKa), Number(bus.ExactDcComponentKa), Number(bus.ExactPeakKa),
        .. bus.Rules.Select(rule => Percent(rule.DifferencePercent)), .. bus.Rules.Select(rule => Percent(rule.PeakDifferencePercent)),
        string.Concat(bus.Rules.Select((rule, i) => rule.IsOnUnsafeSide ? Letter(i) : "")),
    ];

    private static string Line(DcRuleSummary summary) => FormattableString.Invariant(
        $"{ReportTexts.RuleName(summary.Rule)}: i_dc from {Percent(summary.LowestPercent)} % at {summary.LowestBusId} to {Percent(summary.HighestPercent)} % at {summary.HighestBusId}, below the exact one at {summary.UnsafeBuses} buses; ip down to {Percent(summary.LowestPeakPercent)} % at {summary.LowestPeakBusId}\n");

    private static string Letter(int rule) => ((char)('a' + rule)).ToString();

    private static string Number(double value) => value.ToString("0.000", CultureInfo.InvariantCulture);

    private static string Percent(double value) => value.ToString("+0.0;-0.0;0.0", CultureInfo.InvariantCulture);
}
