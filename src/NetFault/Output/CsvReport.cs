using System.Globalization;

namespace NetFault;

/// <summary>The every-bus result as CSV.</summary>
internal static class CsvReport
{
    /// <summary>RFC 4180 ends lines so, on every system.</summary>
    private const string LineEnd = "\r\n";

    public static void Write(TextWriter writer, FaultStudy study, IReadOnlyList<BusFault> faults, ReportOptions options)
    {
        var columns = ReportColumn.Of(study.Method, options).Where(column => column.Name.Length > 0).ToList();
        // All values first: a report that cannot be finished is not begun.
        var rows = faults.Select(fault => columns.Select(column => Cell(column.Value(fault))).ToArray()).ToList();
        if (options.CsvComments)
            WriteComments(writer, study);
        WriteRow(writer, columns.Select(column => column.Name));
        foreach (var row in rows)
            WriteRow(writer, row);
    }

    private static void WriteComments(TextWriter writer, FaultStudy study)
    {
        WriteComment(writer, study.Network.Title);
        WriteComment(writer, ReportTexts.MethodLine(study.Method));
        foreach (var group in ReportTexts.Group(study.Assumptions))
            WriteComment(writer, "Assumed: " + group);
        WriteComment(writer, ReportTexts.Caution);
    }

    /// <summary>Writes one comment line; nothing for null.</summary>
    public static void WriteComment(TextWriter writer, string? text)
    {
        if (text is not null)
            writer.Write("# " + text.Replace('\r', ' ').Replace('\n', ' ') + LineEnd);
    }

    /// <summary>Writes one row.</summary>
    public static void WriteRow(TextWriter writer, IEnumerable<string> cells) =>
        writer.Write(string.Join(",", cells.Select(Quoted)) + LineEnd);

    /// <summary>A value as a file has it.</summary>
    public static string Cell(object? value) => value switch
    {
        null => string.Empty,
        double number => RoundTrip.Text(number),
        bool truth => truth ? "true" : "false",
        _ => Convert.ToString(value, CultureInfo.InvariantCulture) ?? string.Empty,
    };

    private static string Quoted(string cell) =>
        cell.IndexOfAny([',', '"', '\r', '\n']) < 0 && !cell.StartsWith("#", StringComparison.Ordinal)
            ? cell
            : "\"" + cell.Replace("\"", "\"\"") + "\"";
}
