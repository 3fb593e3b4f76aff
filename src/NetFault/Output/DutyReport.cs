namespace NetFault;

/// <summary>
/// Writes a duty check: a table for reading, CSV and JSON for other programs, the worst device first. Every form names method and rules, lists what was
/// assumed and carries the caution.
/// </summary>
public static class DutyReport
{
    /// <summary>
    /// The check as a table of text: each device with its worst duty, and each further duty that fails, is marginal or cannot be said.
    /// </summary>
    /// <param name="check">The check.</param>
    /// <exception cref="ArgumentNullException">The check is null.</exception>
    public static string ToTable(DutyCheck check) => DutyTable.Render(Guard.NotNull(check));

    /// <summary>The check as CSV (RFC 4180), one row for each duty of each device, behind comment lines unless the options leave them out.</summary>
    /// <param name="writer">Where to write; it is left open.</param>
    /// <param name="check">The check.</param>
    /// <param name="options">Whether comment lines are written; null for the defaults.</param>
    /// <exception cref="ArgumentNullException">Writer or check are null.</exception>
    public static void WriteCsv(TextWriter writer, DutyCheck check, ReportOptions? options = null) =>
        DutyFiles.WriteCsv(Guard.NotNull(writer), Guard.NotNull(check), options ?? new ReportOptions());

    /// <summary>The check as JSON (RFC 8259), UTF-8: one object for each device, with its duties in it.</summary>
    /// <param name="stream">Where to write; it is left open.</param>
    /// <param name="check">The check.</param>
    /// <exception cref="ArgumentNullException">Stream or check are null.</exception>
    public static void WriteJson(Stream stream, DutyCheck check) => DutyFiles.WriteJson(Guard.NotNull(stream), Guard.NotNull(check));
}
