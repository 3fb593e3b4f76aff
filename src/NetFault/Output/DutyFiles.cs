using System.Text.Encodings.Web;
using System.Text.Json;

namespace NetFault;

/// <summary>A duty check as CSV and as JSON.</summary>
internal static class DutyFiles
{
    private static readonly JsonWriterOptions Layout = new() { Indented = true, Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    private static readonly string[] Columns =
    [
        "section", "device_id", "bus_id", "feeds", "standard", "device_verdict", "duty", "verdict", "is_marginal", "required", "rated", "unit",
        "margin_percent", "fault_bus_id", "fault_side", "reason", "formula", "assumed_ratings", "assumed_values", "remarks",
    ];

    public static void WriteCsv(TextWriter writer, DutyCheck check, ReportOptions options)
    {
        if (options.CsvComments)
        {
            CsvReport.WriteComment(writer, check.Study.Network.Title);
            CsvReport.WriteComment(writer, ReportTexts.MethodLine(check.Study.Method));
            CsvReport.WriteComment(writer, DutyTexts.OptionsLine(check.Options));
            foreach (var group in ReportTexts.Group(check.Devices.SelectMany(device => device.Assumptions).Concat(check.Study.Assumptions)))
                CsvReport.WriteComment(writer, "Assumed: " + group);
            CsvReport.WriteComment(writer, ReportTexts.Caution);
        }
        CsvReport.WriteRow(writer, Columns);
        foreach (var device in check.Devices)
        {
            foreach (var duty in device.Duties)
                CsvReport.WriteRow(writer, Cells(device, duty).Select(CsvReport.Cell));
        }
    }

    public static void WriteJson(Stream stream, DutyCheck check)
    {
        using var json = new Utf8JsonWriter(stream, Layout);
        json.WriteStartObject();
        json.WriteString("title", check.Study.Network.Title);
        json.WriteNumber("frequency_hz", check.Study.Network.FrequencyHz);
        json.WriteString("method", check.Study.Method.Name);
        json.WriteString("method_rules", ReportTexts.MethodLine(check.Study.Method));
        json.WriteString("judged_by", DutyTexts.OptionsLine(check.Options));
        json.WriteString("caution", ReportTexts.Caution);
        json.WriteNumber("failing", check.Count(DutyVerdict.Fail));
        JsonReport.WriteAssumptions(json, check.Study);
        json.WriteStartArray("devices");
        foreach (var device in check.Devices)
            WriteDevice(json, device);
        json.WriteEndArray();
        json.WriteEndObject();
    }

    private static object?[] Cells(DeviceDuty device, Duty duty) =>
    [
        device.Section, device.Id, device.BusId, device.Feeds, device.Standard, Snake(device.Verdict), Snake(duty.Kind), Snake(duty.Verdict),
        duty.IsMarginal, duty.Required, duty.Rated, duty.Unit, duty.MarginPercent, duty.FaultBusId, Side(duty), duty.Reason, duty.Formula,
        string.Join("; ", device.Assumptions.Select(one => $"{one.Key}: {one.Text}")), device.StudyAssumptions.Count, string.Join("; ", device.Remarks),
    ];

    private static void WriteDevice(Utf8JsonWriter json, DeviceDuty device)
    {
        json.WriteStartObject();
        json.WriteString("section", device.Section);
        json.WriteString("device_id", device.Id);
        json.WriteString("bus_id", device.BusId);
        json.WriteString("feeds", device.Feeds);
        json.WriteString("standard", device.Standard);
        json.WriteString("verdict", Snake(device.Verdict));
        json.WriteBoolean("is_marginal", device.IsMarginal);
        JsonReport.WriteValue(json, "margin_percent", device.MarginPercent);
        json.WriteStartArray("duties");
        foreach (var duty in device.Duties)
            WriteDuty(json, duty);
        json.WriteEndArray();
        json.WriteStartArray("assumed_ratings");
        foreach (var one in device.Assumptions)
            json.WriteStringValue($"{one.Key}: {one.Text}");
        json.WriteEndArray();
        json.WriteNumber("assumed_values", device.StudyAssumptions.Count);
        json.WriteStartArray("remarks");
        foreach (var remark in device.Remarks)
            json.WriteStringValue(remark);
        json.WriteEndArray();
        json.WriteEndObject();
    }

    private static void WriteDuty(Utf8JsonWriter json, Duty duty)
    {
        json.WriteStartObject();
        json.WriteString("duty", Snake(duty.Kind));
        json.WriteString("verdict", Snake(duty.Verdict));
        json.WriteBoolean("is_marginal", duty.IsMarginal);
        JsonReport.WriteValue(json, "required", duty.Required);
        JsonReport.WriteValue(json, "rated", duty.Rated);
        json.WriteString("unit", duty.Unit);
        JsonReport.WriteValue(json, "margin_percent", duty.MarginPercent);
        json.WriteString("fault_bus_id", duty.FaultBusId);
        json.WriteString("fault_side", Side(duty));
        json.WriteString("reason", duty.Reason);
        json.WriteString("formula", duty.Formula);
        json.WriteEndObject();
    }

    private static string? Side(Duty duty) => duty.FaultSide is { } side ? Snake(side) : null;

    private static string Snake<T>(T value) where T : struct, Enum => ReportColumn.Snake(value.ToString());
}
