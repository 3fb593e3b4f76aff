using YamlDotNet.Core.Events;

namespace NetFault;

/// <summary>The keys of a network file that stand beside its sections.</summary>
internal sealed class FileHeader
{
    /// <summary>The format that is read and written.</summary>
    public const int Format = 1;

    private static readonly KeySet Known = KeyRecorder.Record(fields => new Values(fields));

    private readonly ElementReader _reader;

    public FileHeader(EventReader events, ProblemList problems)
    {
        _reader = new ElementReader(events, problems);
    }

    /// <summary>The keys' names.</summary>
    public static IEnumerable<string> Names => Known.Names;

    /// <summary>The keys.</summary>
    public static IReadOnlyList<KnownKey> Keys => Known.Keys;

    public void Start(int offset) => _reader.Start(null, null, offset, 1);

    /// <summary>Reads the key's value; false where the key is none of these.</summary>
    public bool TryRead(Scalar key)
    {
        if (Known.Find(key.Value) is not { } known)
            return false;
        _reader.Append(known, -1);
        return true;
    }

    /// <summary>Notes that a key is probably there under a mistyped name.</summary>
    public void Mistyped(string key) => _reader.Mistyped(-1, key);

    /// <summary>Puts the values into the draft and their places into the table.</summary>
    public void Take(GatheredFile gathered)
    {
        _reader.IsComplete = gathered.IsComplete;
        for (var i = 0; i < _reader.Count; i++)
            gathered.TopLevel[_reader[i].Key] = _reader.PlaceOf(i);
        _reader.ExcuseMistyped();
        var values = new Values(_reader.Root);
        gathered.Draft.Title = values.Title;
        gathered.Draft.FrequencyHz = values.FrequencyHz;
        gathered.Draft.BaseMva = values.BaseMva ?? gathered.Draft.BaseMva;
        if (values.Format is { } format && format != Format)
            gathered.OtherFormat = _reader.Report(_reader.Find(-1, "netfault"), FileProblems.OtherFormat(format, Format));
        gathered.ReportedTopLevel.UnionWith(_reader.Reported ?? []);
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
