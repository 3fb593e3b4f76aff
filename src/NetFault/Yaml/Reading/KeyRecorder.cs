namespace NetFault;

/// <summary>Fields without values: writes down which keys a section asks for.</summary>
internal sealed class KeyRecorder : IFields
{
    private readonly KeySet _keys = new();

    public string Id => string.Empty;

    /// <summary>The keys that a reading asks for.</summary>
    public static KeySet Record(Func<IFields, object> read)
    {
        var recorder = new KeyRecorder();
        read(recorder);
        return recorder._keys;
    }

    public double RequiredNumber(string key) => Add(key, KeyKind.Number, true, double.NaN);

    public double? Number(string key) => Add<double?>(key, KeyKind.Number, false, null);

    public int? RequiredWhole(string key) => Add<int?>(key, KeyKind.Whole, true, null);

    public int? Whole(string key) => Add<int?>(key, KeyKind.Whole, false, null);

    public string RequiredReference(string key) => Add(key, KeyKind.Id, true, string.Empty);

    public string? Reference(string key) => Add<string?>(key, KeyKind.Id, false, null);

    public string? Text(string key) => Add<string?>(key, KeyKind.Text, false, null);

    public bool RequiredFlag(string key) => Add(key, KeyKind.Flag, true, false);

    public bool? Flag(string key) => Add<bool?>(key, KeyKind.Flag, false, null);

    public int? RequiredChoice(string key, params string[] words) => Add<int?>(key, KeyKind.Choice, true, null);

    public int? Choice(string key, params string[] words) => Add<int?>(key, KeyKind.Choice, false, null);

    public IFields Group(string key, bool required, out bool given)
    {
        given = false;
        return Nested(key, KeyKind.Group, required);
    }

    public IFields NumberOrGroup(string key, out double? number, out bool given)
    {
        (number, given) = (null, false);
        return Nested(key, KeyKind.NumberOrGroup, required: false);
    }

    private KeyRecorder Nested(string key, KeyKind kind, bool required)
    {
        var nested = new KeyRecorder();
        _keys.Add(key, kind, required, nested._keys);
        return nested;
    }

    private T Add<T>(string key, KeyKind kind, bool required, T value)
    {
        _keys.Add(key, kind, required);
        return value;
    }
}
