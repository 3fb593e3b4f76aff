using YamlDotNet.Core.Events;

namespace NetFault;

/// <summary>The keys of a network file that stand beside its sections.</summary>
internal sealed class FileHeader
{
    /// <summary>The format that is read and written.</summary>
    public const int Format = 1;

    private static readonly KeySet Known = KeyRecorder.Record(fields => new Values(fields));

    private readonly ProblemList _problems;
    private readonly MappingReader _mapping;
    private int _start;

    public FileHeader(EventReader events, ProblemList problems)
    {
        _problems = problems;
        _mapping = new MappingReader(events, problems, new FieldTable(problems.Source.Text, Known.Keys.Count), Known);
    }

    /// <summary>The keys.</summary>
    public static KeySet Keys => Known;

    public void Start(int offset) => _start = offset;

    /// <summary>Reads the key's value; false where the key is none of these.</summary>
    public bool TryRead(Scalar key)
    {
        if (Known.Find(key.Value) is not { } known)
            return false;
        _mapping.ReadField(known, -1);
        return true;
    }

    /// <summary>Notes that a key is probably there under a mistyped name.</summary>
    public void AddMistyped(string key) => _mapping.AddMistyped(-1, key);

    /// <summary>Puts the values into the draft.</summary>
    public void Take(GatheredFile gathered)
    {
        using var table = _mapping.Fields;
        for (var i = 0; i < table.Count; i++)
            gathered.TopLevel[Known.Keys[table[i].Key].Name] = table[i].Place;
        var fields = new ElementFields(_problems, table) { IsComplete = gathered.IsComplete };
        fields.Start(null, null, (_start, 1), Known, (0, table.Count), _mapping.Mistyped());
        var values = new Values(fields.Root);
        gathered.Draft.Title = values.Title;
        gathered.Draft.FrequencyHz = values.FrequencyHz;
        gathered.Draft.BaseMva = values.BaseMva ?? gathered.Draft.BaseMva;
        if (values.Format is { } format && format != Format)
            gathered.OtherFormat = fields.Report(fields.Find(-1, 0), "netfault", FileProblems.OtherFormat(format, Format));
        gathered.ReportedTopLevel.UnionWith(fields.Reported ?? []);
    }

    /// <summary>The values, asked for in one place.</summary>
    private sealed class Values
    {
        public Values(IFields fields)
        {
            Format = fields.RequiredWhole("netfault");
            Title = fields.Text("title");
            FrequencyHz = fields.RequiredNumber("frequency_hz");
            BaseMva = fields.Number("base_mva");
        }

        public int? Format { get; }

        public string? Title { get; }

        public double FrequencyHz { get; }

        public double? BaseMva { get; }
    }
}
