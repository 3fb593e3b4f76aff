using System.Globalization;
using System.Text;

namespace NetFault;

/// <summary>The every-bus result as a table of text, for the terminal.</summary>
internal static class TableReport
{
    public static string Render(FaultStudy study, IReadOnlyList<BusFault> faults, ReportOptions options)
    {
        var text = new StringBuilder();
        AppendHeading(text, study);
        var columns = ReportColumn.Of(study.Method, options).Where(column => column.Symbol is not null).ToList();
        AppendGrid(text, columns, faults);
        AppendNotes(text, study, faults);
        text.Append('\n').Append(ReportTexts.Caution).Append('\n');
        return text.ToString();
    }

    private static void AppendHeading(StringBuilder text, FaultStudy study)
    {
        if (study.Network.Title is { } title)
            text.Append(title).Append('\n');
        text.Append(FormattableString.Invariant($"Three-phase short circuits at {study.Network.Buses.Count} buses, {study.Network.FrequencyHz} Hz\n"));
        text.Append(ReportTexts.MethodLine(study.Method)).Append("\n\n");
    }

    private static void AppendGrid(StringBuilder text, IReadOnlyList<ReportColumn> columns, IReadOnlyList<BusFault> faults)
    {
        var rows = new List<string[]>(faults.Count + 2)
        {
            columns.Select(column => column.Symbol!).ToArray(),
            columns.Select(column => column.Unit).ToArray(),
        };
        rows.AddRange(faults.Select(fault => columns.Select(column => column.Text(fault)).ToArray()));
        var widths = columns.Select((_, i) => rows.Max(row => Width(row[i]))).ToArray();
        for (var i = 0; i < rows.Count; i++)
        {
            AppendRow(text, rows[i], widths);
            if (i == 1)
                text.Append('-', widths.Sum() + 2 * (widths.Length - 1)).Append('\n');
        }
    }

    private static void AppendRow(StringBuilder text, string[] cells, int[] widths)
    {
        var line = new StringBuilder();
        for (var i = 0; i < cells.Length; i++)
        {
            var gap = widths[i] - Width(cells[i]);
            var leftAligned = i == 0 || i == cells.Length - 1;
            line.Append(i > 0 ? "  " : "");
            line.Append(' ', leftAligned ? 0 : gap).Append(cells[i]).Append(' ', leftAligned ? gap : 0);
        }
        text.Append(line.ToString().TrimEnd()).Append('\n');
    }

    private static void AppendNotes(StringBuilder text, FaultStudy study, IReadOnlyList<BusFault> faults)
    {
        var start = text.Length;
        foreach (var mark in ReportMark.All)
        {
            if (faults.Any(mark.Holds))
                text.Append(mark.Sign).Append(": ").Append(mark.Meaning).Append('\n');
        }
        var groups = ReportTexts.Group(study.Assumptions);
        foreach (var group in groups)
            text.Append("   ").Append(group).Append('\n');
        if (text.Length > start)
            text.Insert(start, "\n");
    }

    /// <summary>Columns a text takes on a terminal, counted in text elements, not in UTF-16 units.</summary>
    private static int Width(string text) => new StringInfo(text).LengthInTextElements;
}
