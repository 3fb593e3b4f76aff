using YamlDotNet.Core.Events;

namespace NetFault;

/// <summary>Reads the keys and values of a mapping into the table of fields, and reports the keys that are unknown or stand twice.</summary>
internal sealed class MappingReader
{
    private readonly EventReader _events;
    private readonly ProblemList _problems;
    private readonly List<(int Parent, string Key)> _mistyped = [];
    private string? _section;
    private string? _id;
    private KeySet _keys;
    private int _first;

    public MappingReader(EventReader events, ProblemList problems, FieldTable fields, KeySet keys)
    {
        _events = events;
        _problems = problems;
        Fields = fields;
        _keys = keys;
    }

    public FieldTable Fields { get; }

    /// <summary>Begins a new mapping.</summary>
    public void Start(Section section, string id)
    {
        (_section, _id, _keys, _first) = (section.Name, id, section.Keys, Fields.Count);
        _mistyped.Clear();
    }

    /// <summary>Reads the whole mapping that the current event starts.</summary>
    public void ReadAll() => ReadMapping(_keys, -1);

    /// <summary>Reads the value that follows the current event, a known key, and reports the key where it stands twice.</summary>
    public void ReadField(KnownKey known, int parent)
    {
        var key = _events.Current;
        var first = Fields.Find(_first, Fields.Count, parent, known.Index);
        var value = _events.Next();
        if (first >= 0)
        {
            ReportRepeated(PathOf(parent, known.Name), Fields[first], key);
            _events.SkipValue();
            return;
        }
        var index = Add(known, parent, key, value) - _first;
        if (value is MappingStart && known.Nested is not null)
            ReadMapping(known.Nested, index);
        else
            _events.SkipValue();
    }

    /// <summary>Notes that a key is probably there under a mistyped name.</summary>
    public void AddMistyped(int parent, string key) => _mistyped.Add((parent, key));

    /// <summary>The keys that are probably there under a mistyped name, with dots; null where there are none.</summary>
    public HashSet<string>? Mistyped()
    {
        if (_mistyped.Count == 0)
            return null;
        var paths = _mistyped.Where(one => !Stands(one.Parent, one.Key)).Select(one => PathOf(one.Parent, one.Key));
        return new HashSet<string>(paths, StringComparer.Ordinal);
    }

    private void ReadMapping(KeySet keys, int parent)
    {
        while (_events.Next() is not MappingEnd)
        {
            if (_events.Current is not Scalar key)
                _events.PassKeyWithoutText(_section, _id);
            else if (keys.Find(key.Value) is { } known)
                ReadField(known, parent);
            else
                ReportUnknown(key, keys, parent);
        }
    }

    private int Add(KnownKey known, int parent, ParsingEvent key, ParsingEvent value)
    {
        var field = new Field
        {
            Key = (sbyte)known.Index,
            Parent = (sbyte)parent,
            Kind = Field.KindOf(value),
            KeyOffset = EventReader.Offset(key),
            KeyLength = (byte)Math.Min(EventReader.Length(key), byte.MaxValue),
            Offset = EventReader.Offset(value),
            Length = EventReader.Length(value),
        };
        return Fields.Add(in field, value);
    }

    private bool Stands(int parent, string key) => Fields.Find(_first, Fields.Count, parent, KeysOf(parent).Find(key)!.Index) >= 0;

    private KeySet KeysOf(int parent) => parent < 0 ? _keys : _keys.Keys[Fields[_first + parent].Key].Nested!;

    private string PathOf(int parent, string key) => parent < 0 ? key : _keys.Keys[Fields[_first + parent].Key].Name + "." + key;

    private void ReportUnknown(Scalar key, KeySet keys, int parent)
    {
        var (offset, length) = (EventReader.Offset(key), EventReader.Length(key));
        if (key.Value == "<<")
            keys.Keys.ForEach(one => AddMistyped(parent, one.Name));
        if (_events.Next() is AnchorAlias && key.Value == "<<")
            return;
        var colon = key.Value.IndexOf(':');
        foreach (var meant in NearestNames.Find(colon < 0 ? key.Value : key.Value.Substring(0, colon), keys.Names, 1))
            AddMistyped(parent, meant);
        var problem = key.Value == "<<"
            ? FileProblems.Alias()
            : FileProblems.UnknownKey(key.Value, NearestNames.Suggestion(key.Value, keys.Names), string.Join(", ", keys.Names));
        _problems.Add(problem.At(_section, _id, Problems.Shown(PathOf(parent, key.Value))), offset, length);
        _events.SkipValue();
    }

    private void ReportRepeated(string path, in Field first, ParsingEvent key)
    {
        var related = _problems.Source.Locate(first.KeyOffset, first.KeyLength);
        _problems.Add(FileProblems.RepeatedKey().At(_section, _id, path), EventReader.Offset(key), EventReader.Length(key), related);
    }
}
