namespace NetFault;

/// <summary>An element as it stands in the file, without references like <see cref="Field"/>.</summary>
internal readonly record struct ElementEntry(int Section, int IdOffset, int IdLength, FieldKind Kind, int FirstField, int EndField);

/// <summary>The elements of a file with all their fields.</summary>
internal sealed class ElementTable
{
    private readonly List<ElementEntry> _entries;
    private readonly Dictionary<int, string> _unlikeIds = [];
    private readonly Dictionary<int, HashSet<string>> _mistyped = [];
    private readonly int[] _counts = new int[AllSections.InOrder.Count];
    private readonly SourceText _source;

    /// <summary>The elements of each section by id, made when one is looked for.</summary>
    private readonly Dictionary<string, int>?[] _byId = new Dictionary<string, int>?[AllSections.InOrder.Count];

    public ElementTable(SourceText source)
    {
        _source = source;
        // An element takes about 70 characters in files that are full of buses and lines, and a key with its value about 15.
        _entries = new List<ElementEntry>(source.Text.Length / 64);
        Fields = new FieldTable(source.Text, Math.Max(16, source.Text.Length / 14));
    }

    public FieldTable Fields { get; }

    public int Count => _entries.Count;

    /// <summary>How many elements a section has.</summary>
    public int CountOf(int section) => _counts[section];

    public ElementEntry this[int element] => _entries[element];

    /// <summary>Adds an element whose fields have been added.</summary>
    public void Add(ElementEntry entry, string id, HashSet<string>? mistyped)
    {
        if (id.Length != entry.IdLength || string.CompareOrdinal(id, 0, _source.Text, entry.IdOffset, id.Length) != 0)
            _unlikeIds.Add(_entries.Count, id);
        if (mistyped is not null)
            _mistyped.Add(_entries.Count, mistyped);
        _counts[entry.Section]++;
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
        var index = AllSections.IndexOf(section);
        return (_byId[index] ??= IndexById(index)).TryGetValue(id, out var element) ? element : null;
    }

    /// <summary>The line of each element's id, counted from 1.</summary>
    public int[] Lines()
    {
        var lines = new int[_entries.Count];
        for (var i = 0; i < lines.Length; i++)
            lines[i] = _source.LineOf(_entries[i].IdOffset);
        return lines;
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

    private Dictionary<string, int> IndexById(int section)
    {
        var byId = new Dictionary<string, int>(StringComparer.Ordinal);
        for (var i = 0; i < Count; i++)
        {
            if (_entries[i].Section == section && IdOf(i) is var id && !byId.ContainsKey(id))
                byId.Add(id, i);
        }
        return byId;
    }
}
