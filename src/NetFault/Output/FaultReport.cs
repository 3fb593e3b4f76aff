namespace NetFault;

/// <summary>
/// Writes an every-bus result: a table for reading, CSV and JSON for other programs. Every form names method and rules, lists the assumed
/// values and carries the caution; units stand in the column names.
/// </summary>
public static class FaultReport
{
    /// <summary>The result as a table of text.</summary>
    /// <param name="study">The study the faults come from.</param>
    /// <param name="faults">The faults, one row each.</param>
    /// <param name="options">What to show; null for the defaults.</param>
    /// <exception cref="ArgumentException">A fault is the result of another study.</exception>
    /// <exception cref="MethodDataException">The network lacks data that a column needs; nothing is written then.</exception>
    /// <exception cref="ArgumentNullException">Study or faults are null.</exception>
    public static string ToTable(FaultStudy study, IReadOnlyList<BusFault> faults, ReportOptions? options = null) =>
        TableReport.Render(Guard.NotNull(study), Of(study, faults), options ?? new ReportOptions());

    /// <summary>
    /// The result as CSV (RFC 4180), behind comment lines unless the options leave them out. Ids stand as they are: one that begins with an
    /// equals sign is a formula to some spreadsheets.
    /// </summary>
    /// <param name="writer">Where to write; it is left open.</param>
    /// <param name="study">The study the faults come from.</param>
    /// <param name="faults">The faults, one row each.</param>
    /// <param name="options">What to show; null for the defaults.</param>
    /// <exception cref="ArgumentException">A fault is the result of another study.</exception>
    /// <exception cref="MethodDataException">The network lacks data that a column needs; nothing is written then.</exception>
    /// <exception cref="ArgumentNullException">Writer, study or faults are null.</exception>
    public static void WriteCsv(TextWriter writer, FaultStudy study, IReadOnlyList<BusFault> faults, ReportOptions? options = null) =>
        CsvReport.Write(Guard.NotNull(writer), Guard.NotNull(study), Of(study, faults), options ?? new ReportOptions());

    /// <summary>The result as JSON (RFC 8259), UTF-8.</summary>
    /// <param name="stream">Where to write; it is left open.</param>
    /// <param name="study">The study the faults come from.</param>
    /// <param name="faults">The faults, one object each.</param>
    /// <param name="options">What to show; null for the defaults.</param>
    /// <exception cref="ArgumentException">A fault is the result of another study.</exception>
    /// <exception cref="MethodDataException">The network lacks data that a column needs; nothing is written then.</exception>
    /// <exception cref="ArgumentNullException">Stream, study or faults are null.</exception>
    public static void WriteJson(Stream stream, FaultStudy study, IReadOnlyList<BusFault> faults, ReportOptions? options = null) =>
        JsonReport.Write(Guard.NotNull(stream), Guard.NotNull(study), Of(study, faults), options ?? new ReportOptions());

    /// <summary>A comparison of the rules for the DC component as a table of text, with the worst of each rule below it.</summary>
    /// <param name="comparison">The comparison.</param>
    /// <exception cref="ArgumentNullException">The comparison is null.</exception>
    public static string ToTable(DcRuleComparison comparison) => ComparisonReport.Render(Guard.NotNull(comparison));

    /// <summary>A comparison of the rules for the DC component as CSV (RFC 4180), one row for each bus and rule.</summary>
    /// <param name="writer">Where to write; it is left open.</param>
    /// <param name="comparison">The comparison.</param>
    /// <exception cref="ArgumentNullException">Writer or comparison are null.</exception>
    public static void WriteCsv(TextWriter writer, DcRuleComparison comparison) =>
        ComparisonReport.Write(Guard.NotNull(writer), Guard.NotNull(comparison));

    /// <summary>The faults, if they are results of the study: a report is headed by the study's method.</summary>
    private static IReadOnlyList<BusFault> Of(FaultStudy study, IReadOnlyList<BusFault> faults) =>
        Guard.NotNull(faults).All(fault => Guard.NotNull(fault, nameof(faults)).IsOf(study.Context))
            ? faults
            : throw new ArgumentException("a fault is the result of another study", nameof(faults));
}
