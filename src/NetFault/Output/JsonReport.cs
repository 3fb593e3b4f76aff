using System.Text.Encodings.Web;
using System.Text.Json;

namespace NetFault;

/// <summary>The every-bus result as JSON.</summary>
internal static class JsonReport
{
    /// <summary>Symbols such as I″k stay readable; the text is JSON, not part of a web page.</summary>
    private static readonly JsonWriterOptions Layout = new() { Indented = true, Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    public static void Write(Stream stream, FaultStudy study, IReadOnlyList<BusFault> faults, ReportOptions options)
    {
        var columns = ReportColumn.Of(study.Method, options).Where(column => column.Name.Length > 0).ToList();
        // All values first: a report that cannot be finished is not begun.
        var rows = faults.Select(fault => columns.Select(column => column.Value(fault)).ToArray()).ToList();
        using var json = new Utf8JsonWriter(stream, Layout);
        json.WriteStartObject();
        json.WriteString("title", study.Network.Title);
        json.WriteNumber("frequency_hz", study.Network.FrequencyHz);
        json.WriteString("method", study.Method.Name);
        json.WriteString("method_rules", ReportTexts.MethodLine(study.Method));
        json.WriteString("caution", ReportTexts.Caution);
        WriteAssumptions(json, study);
        WriteWarnings(json, study.Network);
        WriteRows(json, columns, rows);
        json.WriteEndObject();
    }

    /// <summary>Writes what the study assumed.</summary>
    public static void WriteAssumptions(Utf8JsonWriter json, FaultStudy study)
    {
        json.WriteStartArray("assumptions");
        foreach (var group in ReportTexts.Group(study.Assumptions))
        {
            json.WriteStartObject();
            json.WriteString("section", group.Section);
            json.WriteString("key", group.Key);
            json.WriteString("text", group.Text);
            json.WriteStartArray("element_ids");
            foreach (var id in group.ElementIds)
                json.WriteStringValue(id);
            json.WriteEndArray();
            json.WriteEndObject();
        }
        json.WriteEndArray();
    }

    private static void WriteWarnings(Utf8JsonWriter json, Network network)
    {
        json.WriteStartArray("warnings");
        foreach (var warning in network.Warnings)
        {
            json.WriteStartObject();
            json.WriteString("id", warning.Id);
            json.WriteString("section", warning.Section);
            json.WriteString("element_id", warning.ElementId);
            json.WriteString("key", warning.Key);
            json.WriteString("message", warning.Message);
            json.WriteEndObject();
        }
        json.WriteEndArray();
    }

    private static void WriteRows(Utf8JsonWriter json, IReadOnlyList<ReportColumn> columns, List<object?[]> rows)
    {
        json.WriteStartArray("buses");
        foreach (var row in rows)
        {
            json.WriteStartObject();
            for (var i = 0; i < row.Length; i++)
                WriteValue(json, columns[i].Name, row[i]);
            json.WriteEndObject();
        }
        json.WriteEndArray();
    }

    /// <summary>Writes a value of any kind.</summary>
    public static void WriteValue(Utf8JsonWriter json, string name, object? value)
    {
        switch (value)
        {
            case null:
                json.WriteNull(name);
                break;
            case double number:
                json.WriteNumber(name, number);
                break;
            case int number:
                json.WriteNumber(name, number);
                break;
            case bool truth:
                json.WriteBoolean(name, truth);
                break;
            default:
                json.WriteString(name, value.ToString());
                break;
        }
    }
}
