using System.Text;

namespace NetFault;

/// <summary>Gathers the keys of one element and writes them on one line, or, where that is too long, each on its own.</summary>
internal sealed class FieldWriter
{
    private const int LongestLine = 120;

    private readonly List<string> _fields = [];

    public void Number(string key, double? value)
    {
        if (value is { } number)
            Add(key, YamlScalar.Number(number));
    }

    public void Reference(string key, string? id)
    {
        if (id is not null)
            Add(key, YamlScalar.Text(id));
    }

    public void Text(string key, string? text) => Reference(key, text);

    public void Word(string key, string word) => Add(key, word);

    public void Flag(string key, bool? value)
    {
        if (value is { } flag)
            Add(key, flag ? "true" : "false");
    }

    /// <summary>A mapping of those numbers that are there; nothing where none is.</summary>
    public void Group(string key, params (string Key, double? Value)[] numbers)
    {
        var given = numbers.Where(one => one.Value.HasValue).Select(one => $"{one.Key}: {YamlScalar.Number(one.Value.GetValueOrDefault())}");
        var text = string.Join(", ", given);
        if (text.Length > 0)
            Add(key, "{" + text + "}");
    }

    public void Impedance(string key, Impedance? value)
    {
        if (value is { } z)
            Group(key, ("r", z.R), ("x", z.X));
    }

    public void MaxMin(string key, MaxMin? value)
    {
        if (value is not { } pair)
            return;
        if (pair.Min is null)
            Number(key, pair.Max);
        else
            Group(key, ("max", pair.Max), ("min", pair.Min));
    }

    /// <summary>Where a device stands: at its bus, towards an element.</summary>
    public void Terminal(TerminalDevice device)
    {
        Reference("bus", device.Bus);
        Reference("feeds", device.Feeds);
        Reference("feeds_section", device.FeedsSection);
    }

    public void Withstand(double? peakKa, double? shortTimeKa, double? durationSeconds)
    {
        Number("peak_withstand_current_ka", peakKa);
        Number("short_time_withstand_current_ka", shortTimeKa);
        Number("short_time_duration_s", durationSeconds);
    }

    public void Windings(string key, WindingValues value) => Group(key, ("hv", value.Hv), ("mv", value.Mv), ("lv", value.Lv));

    public void WindingPairs(string key, WindingPairValues value) =>
        Group(key, ("hv_mv", value.HvMv), ("hv_lv", value.HvLv), ("mv_lv", value.MvLv));

    /// <summary>Writes what was gathered as an element, and begins the next.</summary>
    public void Flush(string id, StringBuilder text)
    {
        var line = $"  {YamlScalar.Text(id)}: {{{string.Join(", ", _fields)}}}";
        if (line.Length <= LongestLine)
            text.Append(line).Append('\n');
        else
            AppendBlock(id, text);
        _fields.Clear();
    }

    private void AppendBlock(string id, StringBuilder text)
    {
        text.Append("  ").Append(YamlScalar.Text(id)).Append(":\n");
        foreach (var field in _fields)
            text.Append("    ").Append(field).Append('\n');
    }

    private void Add(string key, string value) => _fields.Add(key + ": " + value);
}
