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
        TextTable.Append(text, rows, headingRows: 2);
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
}
