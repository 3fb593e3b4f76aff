namespace NetFault;

/// <summary>
/// The fields of one element, or of the head of the file, for asking by key; reports values that are bad or missing. One is used again for
/// every element.
/// </summary>
internal sealed class ElementFields
{
    private readonly ProblemList _problems;
    private readonly List<FieldGroup> _groups = [];
    private (int Offset, int Length) _place;
    private int _first;
    private int _end;
    private int _groupsInUse;

    public ElementFields(ProblemList problems, FieldTable fields)
    {
        _problems = problems;
        Table = fields;
        Root = new FieldGroup(this);
    }

    public FieldTable Table { get; }

    public string? Section { get; private set; }

    public string? Id { get; private set; }

    /// <summary>The keys about which something has been reported, with dots; null where there is nothing.</summary>
    public HashSet<string>? Reported { get; private set; }

    /// <summary>Gives one string for texts that many elements hold.</summary>
    public Func<string, string> SameText { get; init; } = text => text;

    /// <summary>False where the text ends early: then nothing is missed.</summary>
    public bool IsComplete { get; set; } = true;

    /// <summary>The values, asked for by key.</summary>
    public FieldGroup Root { get; }

    /// <summary>Goes to another element.</summary>
    /// <param name="section">Its section; null for the head of the file.</param>
    /// <param name="id">Its id.</param>
    /// <param name="place">Where to report what it lacks.</param>
    /// <param name="keys">The keys that it may have.</param>
    /// <param name="range">Its fields in the table.</param>
    /// <param name="mistyped">Keys that it probably has under a mistyped name.</param>
    public void Start(
        string? section, string? id, (int Offset, int Length) place, KeySet keys, (int First, int End) range, HashSet<string>? mistyped)
    {
        (Section, Id, _place, Reported) = (section, id, place, mistyped);
        (_first, _end, _groupsInUse) = (range.First, range.End, 0);
        Root.Start(keys, -1, null, isGiven: true);
    }

    /// <summary>The position in the table of a key's field; −1 where the key does not stand.</summary>
    public int Find(int parent, int key) => Table.Find(_first, _end, parent < 0 ? -1 : parent - _first, key);

    /// <summary>A group of the fields below one of them; groups are used again for the next element.</summary>
    public FieldGroup GroupBelow(int parent, KnownKey key, bool isGiven)
    {
        if (_groupsInUse == _groups.Count)
            _groups.Add(new FieldGroup(this));
        var group = _groups[_groupsInUse++];
        group.Start(key.Nested!, parent, key.Name, isGiven);
        return group;
    }

    /// <summary>Reports a problem of a value; at its key where it has none.</summary>
    /// <returns>The problem with its place; null where the value was reported before.</returns>
    public Diagnostic? Report(int index, string path, Problem problem)
    {
        (Reported ??= []).Add(path);
        if (Table[index].Kind == FieldKind.Refused)
            return null;
        var (offset, length) = Table[index].Place;
        return _problems.Add(problem.At(Section, Id, path), offset, length);
    }

    /// <summary>Reports a key that is not there, at the id or at the mapping it is missing from.</summary>
    public void ReportMissing(int parent, string path)
    {
        if (!IsComplete || Reported?.Contains(path) == true)
            return;
        (Reported ??= []).Add(path);
        var (offset, length) = parent < 0 ? _place : Table[parent].Place;
        _problems.Add(FileProblems.MissingKey().At(Section, Id, path), offset, length);
    }
}
