namespace NetFault;

/// <summary>The values of an element, or of a mapping within it, asked for by key: each bad or missing one is reported here.</summary>
internal sealed class FieldGroup : IFields
{
    private readonly ElementReader _reader;
    private int _parent;
    private bool _isGiven;

    public FieldGroup(ElementReader reader)
    {
        _reader = reader;
    }

    public string Id => _reader.Id ?? string.Empty;

    /// <summary>The key of this mapping; null for the element itself.</summary>
    public string? Name { get; private set; }

    public void Start(int parent, string? name, bool isGiven) => (_parent, Name, _isGiven) = (parent, name, isGiven);

    public double RequiredNumber(string key) => Required(key) ? Number(key) ?? double.NaN : double.NaN;

    public double? Number(string key) => Find(key) is var index and >= 0 ? NumberAt(index) : null;

    public int? RequiredWhole(string key) => Required(key) ? Whole(key) : null;

    public int? Whole(string key)
    {
        if (Find(key) is var index && index < 0)
            return null;
        ref readonly var field = ref _reader[index];
        if (field.Kind == FieldKind.Plain && StrictNumber.TryParseWhole(field.Text, out var value))
            return value;
        if (!double.IsNaN(NumberAt(index)))
            _reader.Report(index, FileProblems.NotWhole(field.Text));
        return null;
    }

    public string RequiredReference(string key) => Required(key) ? Reference(key) ?? string.Empty : string.Empty;

    public string? Reference(string key)
    {
        if (Find(key) is var index && index < 0)
            return null;
        ref readonly var field = ref _reader[index];
        if (field.Kind == FieldKind.Quoted || (field.Kind == FieldKind.Plain && field.Text != "~"))
            return field.Text;
        _reader.Report(index, WrongKind(in field, "an id"));
        return string.Empty;
    }

    public string? Text(string key)
    {
        if (Find(key) is var index && index < 0)
            return null;
        ref readonly var field = ref _reader[index];
        if (field.Kind == FieldKind.Quoted || (field.Kind == FieldKind.Plain && !NumberProblems.IsNull(field.Text)))
            return field.Text;
        _reader.Report(index, WrongKind(in field, "text"));
        return null;
    }

    public bool RequiredFlag(string key) => Required(key) && (Flag(key) ?? false);

    public bool? Flag(string key)
    {
        if (Find(key) is var index && index < 0)
            return null;
        ref readonly var field = ref _reader[index];
        if (field is { Kind: FieldKind.Plain, Text: "true" or "false" })
            return field.Text == "true";
        _reader.Report(index, NotAFlag(in field));
        return null;
    }

    public int? Choice(string key, params string[] words)
    {
        if (Find(key) is var index && index < 0)
            return null;
        ref readonly var field = ref _reader[index];
        if (field.Kind is not (FieldKind.Plain or FieldKind.Quoted) || NumberProblems.IsNull(field.Text))
        {
            _reader.Report(index, WrongKind(in field, "one of " + string.Join(", ", words)));
            return null;
        }
        var choice = Array.IndexOf(words, field.Text);
        if (choice >= 0)
            return choice;
        _reader.Report(index, FileProblems.NotAChoice(field.Text, string.Join(", ", words), NearestNames.Suggestion(field.Text, words)));
        return null;
    }

    public IFields Group(string key, bool required, out bool given)
    {
        var index = required && !Required(key) ? -1 : Find(key);
        given = index >= 0;
        if (!given)
            return _reader.GroupBelow(-1, key, isGiven: false);
        ref readonly var field = ref _reader[index];
        if (field.Kind == FieldKind.Mapping)
            return _reader.GroupBelow(index, key, isGiven: true);
        _reader.Report(index, WrongKindOfGroup(in field, key));
        return _reader.GroupBelow(-1, key, isGiven: false);
    }

    public IFields NumberOrGroup(string key, out double? number, out bool given)
    {
        var index = Find(key);
        given = index >= 0;
        number = null;
        if (given && _reader[index].Kind == FieldKind.Mapping)
            return _reader.GroupBelow(index, key, isGiven: true);
        if (given)
            number = NumberAt(index);
        return _reader.GroupBelow(-1, key, isGiven: false);
    }

    private int Find(string key) => _isGiven ? _reader.Find(_parent, key) : -1;

    /// <summary>Whether a required key stands; reports it where it does not.</summary>
    private bool Required(string key)
    {
        if (Find(key) >= 0)
            return true;
        if (_isGiven)
            _reader.ReportMissing(_parent, key);
        return false;
    }

    private double NumberAt(int index)
    {
        ref readonly var field = ref _reader[index];
        if (field.Kind == FieldKind.Plain && StrictNumber.TryParse(field.Text, out var value))
        {
            if (StrictNumber.IsInRange(field.Text, value))
                return value;
            _reader.Report(index, FileProblems.OutOfRange(field.Text));
        }
        else
        {
            _reader.Report(index, field.Kind switch
            {
                FieldKind.Plain => NumberProblems.Explain(field.Text),
                FieldKind.Quoted => FileProblems.QuotedNumber(field.Text),
                _ => WrongKind(in field, "a number"),
            });
        }
        return double.NaN;
    }

    /// <summary>The problem of a value of another kind than the single one that is needed.</summary>
    private static Problem WrongKind(in Field field, string needed) => field.Kind switch
    {
        FieldKind.Blank => FileProblems.Blank(needed),
        FieldKind.Plain => FileProblems.Null(field.Text, needed),
        _ => FileProblems.ValueNeeded(FileProblems.KindName(field.Kind), needed),
    };

    private static Problem WrongKindOfGroup(in Field field, string key)
    {
        var shape = $"{key}: {{...}}";
        return field.Kind == FieldKind.Blank
            ? FileProblems.Blank("a mapping")
            : FileProblems.MappingNeeded(FileProblems.KindName(field.Kind), shape);
    }

    private static Problem NotAFlag(in Field field)
    {
        if (field.Kind is not (FieldKind.Plain or FieldKind.Quoted) || NumberProblems.IsNull(field.Text))
            return WrongKind(in field, "true or false");
        var remedy = field.Text.ToUpperInvariant() switch
        {
            "YES" or "ON" or "Y" or "TRUE" => "write true",
            "NO" or "OFF" or "N" or "FALSE" => "write false",
            _ => null,
        };
        return FileProblems.NotTrueOrFalse(field.Text, remedy);
    }
}
