using YamlDotNet.Core;
using YamlDotNet.Core.Events;

namespace NetFault;

/// <summary>
/// Holds the keys and values of one mapping of the file, an element or the head of the file, and reports the keys that are unknown or stand
/// twice. One reader is filled again and again, so that reading allocates little beside the parser.
/// </summary>
internal sealed class ElementReader
{
    private readonly EventReader _events;
    private readonly ProblemList _problems;
    private readonly List<FieldGroup> _groups = [];
    private readonly List<(int Parent, string Key)> _mistyped = [];
    private Field[] _fields = new Field[16];
    private int _groupsInUse;

    public ElementReader(EventReader events, ProblemList problems)
    {
        _events = events;
        _problems = problems;
        Root = new FieldGroup(this);
    }

    public int Count { get; private set; }

    public string? Section { get; private set; }

    public string? Id { get; private set; }

    /// <summary>Offset and length of the id, or of whatever stands for the mapping as a whole.</summary>
    public (int Offset, int Length) Place { get; private set; }

    /// <summary>The keys about which something has been reported, with dots; null where there is nothing.</summary>
    public HashSet<string>? Reported { get; private set; }

    /// <summary>False where the text ends early: then nothing is missed.</summary>
    public bool IsComplete { get; set; } = true;

    /// <summary>The values, asked for by key.</summary>
    public FieldGroup Root { get; }

    /// <summary>Begins a new mapping without values.</summary>
    public void Start(string? section, string? id, int offset, int length)
    {
        (Section, Id, Place) = (section, id, (offset, length));
        (Count, _groupsInUse, Reported) = (0, 0, null);
        _mistyped.Clear();
        Root.Start(-1, null, isGiven: true);
    }

    /// <summary>Reads the whole mapping that the current event starts.</summary>
    public void Fill(KeySet keys)
    {
        FillMapping(keys, -1);
        ExcuseMistyped();
    }

    /// <summary>Notes that a key is probably there under a mistyped name.</summary>
    public void Mistyped(int parent, string key) => _mistyped.Add((parent, key));

    /// <summary>Takes keys that are not there, but were mistyped, as reported.</summary>
    public void ExcuseMistyped()
    {
        foreach (var (parent, key) in _mistyped)
        {
            if (Find(parent, key) < 0)
                (Reported ??= []).Add(Path(parent, key));
        }
    }

    /// <summary>Reads the value that follows the current event, a known key, and reports the key where it stands twice.</summary>
    public void Append(KnownKey known, int parent)
    {
        var key = _events.Current;
        var first = Find(parent, known.Name);
        if (first >= 0)
        {
            ReportRepeated(known.Name, parent, first, key);
            _events.Next();
            _events.SkipValue();
            return;
        }
        if (Count == _fields.Length)
            Array.Resize(ref _fields, 2 * Count);
        var index = Count++;
        ref var field = ref _fields[index];
        field.Key = known.Name;
        field.Parent = parent;
        field.KeyOffset = EventReader.Offset(key);
        field.KeyLength = EventReader.Length(key);
        field.Kind = ReadValue(ref field);
        if (field.Kind != FieldKind.Mapping)
            return;
        if (known.Nested is not null)
            FillMapping(known.Nested, index);
        else
            _events.SkipValue();
    }

    /// <summary>The position of a key's field; −1 where the key does not stand.</summary>
    public int Find(int parent, string key)
    {
        for (var i = 0; i < Count; i++)
        {
            if (_fields[i].Parent == parent && _fields[i].Key == key)
                return i;
        }
        return -1;
    }

    public ref readonly Field this[int index] => ref _fields[index];

    /// <summary>A group of the fields below one of them; groups are used again for the next element.</summary>
    public FieldGroup GroupBelow(int parent, string name, bool isGiven)
    {
        if (_groupsInUse == _groups.Count)
            _groups.Add(new FieldGroup(this));
        var group = _groups[_groupsInUse++];
        group.Start(parent, name, isGiven);
        return group;
    }

    /// <summary>Reports a problem of a value; at its key where it has none.</summary>
    /// <returns>The problem with its place; null where the value was reported before.</returns>
    public Diagnostic? Report(int index, Problem problem)
    {
        ref var field = ref _fields[index];
        var path = Path(field.Parent, field.Key);
        (Reported ??= []).Add(path);
        if (field.Kind == FieldKind.Refused)
            return null;
        var (offset, length) = PlaceOf(index);
        return _problems.Add(problem.At(Section, Id, path), offset, length);
    }

    /// <summary>Offset and length of a single value; of the key where there is more or less than that.</summary>
    public (int Offset, int Length) PlaceOf(int index)
    {
        ref var field = ref _fields[index];
        return field.Kind is FieldKind.Plain or FieldKind.Quoted ? (field.Offset, field.Length) : (field.KeyOffset, field.KeyLength);
    }

    /// <summary>Reports a key that is not there, at the id or at the mapping it is missing from.</summary>
    public void ReportMissing(int parent, string key)
    {
        var path = Path(parent, key);
        if (!IsComplete || Reported?.Contains(path) == true)
            return;
        (Reported ??= []).Add(path);
        var (offset, length) = parent < 0 ? Place : (_fields[parent].KeyOffset, _fields[parent].KeyLength);
        _problems.Add(FileProblems.MissingKey().At(Section, Id, path), offset, length);
    }

    /// <summary>Notes all values' places in the table of the whole file.</summary>
    public void Remember(PlaceTable places)
    {
        for (var i = 0; i < Count; i++)
        {
            var (offset, length) = PlaceOf(i);
            places.AddValue(_fields[i].Key, _fields[i].Parent, offset, length);
        }
    }

    private string Path(int parent, string key) => parent < 0 ? key : _fields[parent].Key + "." + key;

    private void FillMapping(KeySet keys, int parent)
    {
        while (_events.Next() is not MappingEnd)
        {
            if (_events.Current is Scalar key)
            {
                if (keys.Find(key.Value) is { } known)
                    Append(known, parent);
                else
                    ReportUnknown(key, keys, parent);
                continue;
            }
            _events.PassKeyWithoutText(Section, Id);
        }
    }

    private void ReportUnknown(Scalar key, KeySet keys, int parent)
    {
        var (offset, length) = (EventReader.Offset(key), EventReader.Length(key));
        if (key.Value == "<<")
        {
            if (_events.Next() is not AnchorAlias)
                _problems.Add(FileProblems.Alias().At(Section, Id, null), offset, length);
        }
        else
        {
            var nearest = NearestNames.Find(key.Value, keys.Names, 1);
            if (nearest.Count > 0)
                Mistyped(parent, nearest[0]);
            var problem = FileProblems.UnknownKey(key.Value, NearestNames.Suggestion(key.Value, keys.Names), string.Join(", ", keys.Names));
            _problems.Add(problem.At(Section, Id, Problems.Shown(Path(parent, key.Value))), offset, length);
            _events.Next();
        }
        _events.SkipValue();
    }

    private void ReportRepeated(string name, int parent, int first, ParsingEvent key)
    {
        var related = _problems.Source.Locate(_fields[first].KeyOffset, _fields[first].KeyLength);
        _problems.Add(
            FileProblems.RepeatedKey().At(Section, Id, Path(parent, name)), EventReader.Offset(key), EventReader.Length(key), related);
    }

    /// <summary>Reads the value's first event.</summary>
    private FieldKind ReadValue(ref Field field)
    {
        var value = _events.Next();
        field.Offset = EventReader.Offset(value);
        field.Length = EventReader.Length(value);
        field.Text = value is Scalar scalar ? scalar.Value : string.Empty;
        if (value is SequenceStart)
            _events.SkipValue();
        return KindOf(value);
    }

    /// <summary>The kind of value that an event starts.</summary>
    public static FieldKind KindOf(ParsingEvent value) => value switch
    {
        Scalar { Style: ScalarStyle.Plain } scalar => scalar.Value.Length == 0 ? FieldKind.Blank : FieldKind.Plain,
        Scalar => FieldKind.Quoted,
        MappingStart => FieldKind.Mapping,
        SequenceStart => FieldKind.List,
        _ => FieldKind.Refused,
    };
}
