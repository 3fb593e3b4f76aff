namespace NetFault;

/// <summary>An element as it stands in the file, without references like <see cref="Field"/>.</summary>
internal readonly record struct ElementEntry(int Section, int IdOffset, int IdLength, FieldKind Kind, int FirstField, int EndField);

/// <summary>The elements of a file with all their fields.</summary>
internal sealed class ElementTable
{
    private readonly List<ElementEntry> _entries = [];
    private readonly Dictionary<int, string> _unlikeIds = [];
    private readonly Dictionary<int, HashSet<string>> _mistyped = [];
    private readonly SourceText _source;
    private Dictionary<(int Section, string Id), int>? _byId;

    public ElementTable(SourceText source)
    {
        _source = source;
        Fields = new FieldTable(source.Text, Math.Max(16, source.Text.Length / 12));
    }

    public FieldTable Fields { get; }

    public int Count => _entries.Count;

    public ElementEntry this[int element] => _entries[element];

    /// <summary>Adds an element whose fields have been added.</summary>
    public void Add(ElementEntry entry, string id, HashSet<string>? mistyped)
    {
        if (id.Length != entry.IdLength || string.CompareOrdinal(id, 0, _source.Text, entry.IdOffset, id.Length) != 0)
            _unlikeIds.Add(_entries.Count, id);
        if (mistyped is not null)
            _mistyped.Add(_entries.Count, mistyped);
        _entries.Add(entry);
    }

    public string IdOf(int element) => _unlikeIds.Count > 0 && _unlikeIds.TryGetValue(element, out var id)
        ? id
        : _source.Text.Substring(_entries[element].IdOffset, _entries[element].IdLength);

    /// <summary>Keys that the element probably has under a mistyped name; null where there are none.</summary>
    public HashSet<string>? Mistyped(int element) => _mistyped.Count > 0 && _mistyped.TryGetValue(element, out var keys) ? keys : null;

    /// <summary>Where an element's id stands first, by section and id; null where it does not stand.</summary>
    public int? Find(string section, string id)
    {
        _byId ??= IndexById();
        return _byId.TryGetValue((AllSections.IndexOf(section), id), out var element) ? element : null;
    }

    /// <summary>The offset and length of an element's id.</summary>
    public (int Offset, int Length) PlaceOf(int element) => (_entries[element].IdOffset, _entries[element].IdLength);

    /// <summary>The offset and length of a value; of the mapping around it, or of the element's id, where there is none.</summary>
    public (int Offset, int Length) PlaceOf(int element, string? path)
    {
        if (path is null)
            return PlaceOf(element);
        var entry = _entries[element];
        var dot = path.IndexOf('.');
        var keys = AllSections.InOrder[entry.Section].Keys;
        var outer = Find(entry, -1, keys.Find(dot < 0 ? path : path.Substring(0, dot)));
        if (outer < 0)
            return PlaceOf(element);
        var nested = dot < 0 ? null : keys.Keys[Fields[outer].Key].Nested?.Find(path.Substring(dot + 1));
        var inner = Find(entry, outer - entry.FirstField, nested);
        return Fields[inner < 0 ? outer : inner].Place;
    }

    private int Find(ElementEntry entry, int parent, KnownKey? key) =>
        key is null ? -1 : Fields.Find(entry.FirstField, entry.EndField, parent, key.Index);

    private Dictionary<(int Section, string Id), int> IndexById()
    {
        var byId = new Dictionary<(int Section, string Id), int>();
        for (var i = 0; i < Count; i++)
        {
            var key = (_entries[i].Section, IdOf(i));
            if (!byId.ContainsKey(key))
                byId.Add(key, i);
        }
        return byId;
    }
}
