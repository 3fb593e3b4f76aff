namespace NetFault;

/// <summary>The values of an element, or of a mapping within it, asked for by key: each bad or missing one is reported here.</summary>
internal sealed class FieldGroup : IFields
{
    private readonly ElementFields _element;
    private KeySet _keys = KeySet.None;
    private int _parent;
    private int _asked;
    private string? _name;
    private bool _isGiven;

    public FieldGroup(ElementFields element)
    {
        _element = element;
    }

    public string Id => _element.Id ?? string.Empty;

    private FieldTable Table => _element.Table;

    /// <summary>Goes to another mapping.</summary>
    public void Start(KeySet keys, int parent, string? name, bool isGiven) =>
        (_keys, _parent, _name, _isGiven, _asked) = (keys, parent, name, isGiven, 0);

    public double RequiredNumber(string key) => FindRequired(key) is var index and >= 0 ? NumberAt(index, key) : double.NaN;

    public double? Number(string key) => Find(key) is var index and >= 0 ? NumberAt(index, key) : null;

    public int? RequiredWhole(string key) => FindRequired(key) is var index and >= 0 ? WholeAt(index, key) : null;

    public int? Whole(string key) => Find(key) is var index and >= 0 ? WholeAt(index, key) : null;

    public string RequiredReference(string key) => FindRequired(key) is var index and >= 0 ? ReferenceAt(index, key) : string.Empty;

    public string? Reference(string key) => Find(key) is var index and >= 0 ? ReferenceAt(index, key) : null;

    public string? Text(string key)
    {
        if (Find(key) is var index && index < 0)
            return null;
        if (IsText(index) && !IsNull(index))
            return Table.Text(index);
        Report(index, key, WrongKind(index, "text"));
        return null;
    }

    public bool RequiredFlag(string key) => FindRequired(key) is var index and >= 0 && (FlagAt(index, key) ?? false);

    public bool? Flag(string key) => Find(key) is var index and >= 0 ? FlagAt(index, key) : null;

    public int? RequiredChoice(string key, params string[] words) => FindRequired(key) is var index and >= 0 ? ChoiceAt(index, key, words) : null;

    public int? Choice(string key, params string[] words) => Find(key) is var index and >= 0 ? ChoiceAt(index, key, words) : null;

    public IFields Group(string key, bool required, out bool given)
    {
        var index = required ? FindRequired(key) : Find(key);
        given = index >= 0;
        if (given && Table[index].Kind != FieldKind.Mapping)
        {
            Report(index, key, WrongKindOfGroup(Table[index].Kind, key));
            index = -1;
        }
        return _element.GroupBelow(index, _keys.Find(key)!, index >= 0);
    }

    public IFields NumberOrGroup(string key, out double? number, out bool given)
    {
        var index = Find(key);
        given = index >= 0;
        number = null;
        var isGroup = given && Table[index].Kind == FieldKind.Mapping;
        if (given && !isGroup)
            number = NumberAt(index, key);
        return _element.GroupBelow(index, _keys.Find(key)!, isGroup);
    }

    /// <summary>The field of a key. Keys are mostly asked for in the order in which they were recorded.</summary>
    private int Find(string key)
    {
        if (!_isGiven)
            return -1;
        var keys = _keys.Keys;
        var index = _asked < keys.Count && ReferenceEquals(keys[_asked].Name, key) ? _asked : _keys.Find(key)!.Index;
        _asked = index + 1;
        return _element.Find(_parent, index);
    }

    /// <summary>The field of a required key; reports it where it does not stand.</summary>
    private int FindRequired(string key)
    {
        var index = Find(key);
        if (index < 0 && _isGiven)
            _element.ReportMissing(_parent, Path(key));
        return index;
    }

    private void Report(int index, string key, Problem problem) => _element.Report(index, Path(key), problem);

    private string Path(string key) => _name is null ? key : _name + "." + key;

    private double NumberAt(int index, string key)
    {
        var kind = Table[index].Kind;
        var text = Table.Span(index);
        if (kind == FieldKind.Plain && StrictNumber.TryParse(text, out var value))
        {
            if (StrictNumber.IsInRange(text, value))
                return value;
            Report(index, key, FileProblems.OutOfRange(text.ToString()));
            return double.NaN;
        }
        Report(index, key, kind switch
        {
            FieldKind.Plain => NumberProblems.Explain(text.ToString()),
            FieldKind.Quoted => FileProblems.QuotedNumber(text.ToString()),
            _ => WrongKind(index, "a number"),
        });
        return double.NaN;
    }

    private int? WholeAt(int index, string key)
    {
        if (double.IsNaN(NumberAt(index, key)))
            return null;
        if (StrictNumber.TryParseWhole(Table.Span(index), out var value))
            return value;
        Report(index, key, FileProblems.NotWhole(Table.Text(index)));
        return null;
    }

    private string ReferenceAt(int index, string key)
    {
        var text = Table.Text(index);
        if (Table[index].Kind == FieldKind.Quoted || (Table[index].Kind == FieldKind.Plain && text != "~"))
            return _element.SameText(text);
        Report(index, key, WrongKind(index, "an id"));
        return string.Empty;
    }

    private int? ChoiceAt(int index, string key, string[] words)
    {
        var text = Table.Text(index);
        var choice = IsText(index) ? Array.IndexOf(words, text) : -1;
        if (choice >= 0)
            return choice;
        var choices = string.Join(", ", words);
        Report(index, key, IsText(index) && !IsNull(index)
            ? FileProblems.NotAChoice(text, choices, NearestNames.Suggestion(text, words))
            : WrongKind(index, "one of " + choices));
        return null;
    }

    private bool? FlagAt(int index, string key)
    {
        var text = Table.Text(index);
        if (Table[index].Kind == FieldKind.Plain && text is "true" or "false")
            return text == "true";
        Report(index, key, IsText(index) && !IsNull(index) ? NotAFlag(text, Table[index].Kind == FieldKind.Quoted) : WrongKind(index, "true or false"));
        return null;
    }

    private bool IsText(int index) => Table[index].Kind is FieldKind.Plain or FieldKind.Quoted;

    private bool IsNull(int index) => Table[index].Kind == FieldKind.Plain && NumberProblems.IsNull(Table.Text(index));

    /// <summary>The problem of a value of another kind than the single one that is needed.</summary>
    private Problem WrongKind(int index, string needed) => Table[index].Kind switch
    {
        FieldKind.Blank => FileProblems.Blank(needed),
        FieldKind.Plain => FileProblems.Null(Table.Text(index), needed),
        var kind => FileProblems.ValueNeeded(FileProblems.KindName(kind), needed),
    };

    private static Problem WrongKindOfGroup(FieldKind kind, string key) => kind == FieldKind.Blank
        ? FileProblems.Blank("a mapping")
        : FileProblems.MappingNeeded(FileProblems.KindName(kind), key + ": {...}");

    private static Problem NotAFlag(string text, bool inQuotes)
    {
        var remedy = text.ToUpperInvariant() switch
        {
            "TRUE" or "FALSE" when inQuotes => $"write {text.ToLowerInvariant()} without quotes",
            "YES" or "ON" or "Y" or "TRUE" => "write true",
            "NO" or "OFF" or "N" or "FALSE" => "write false",
            _ => null,
        };
        return FileProblems.NotTrueOrFalse(text, remedy);
    }
}
