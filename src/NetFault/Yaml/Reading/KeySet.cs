namespace NetFault;

/// <summary>What a key takes.</summary>
internal enum KeyKind
{
    /// <summary>A number.</summary>
    Number,

    /// <summary>A whole number.</summary>
    Whole,

    /// <summary>The id of another element.</summary>
    Id,

    /// <summary>Free text.</summary>
    Text,

    /// <summary>true or false.</summary>
    Flag,

    /// <summary>One of a few words.</summary>
    Choice,

    /// <summary>A mapping of further keys.</summary>
    Group,

    /// <summary>A number, or a mapping of further keys.</summary>
    NumberOrGroup,
}

/// <summary>A key that a section knows.</summary>
internal sealed record KnownKey(int Index, string Name, KeyKind Kind, bool Required, KeySet? Nested);

/// <summary>The keys that stand side by side in an element or in a mapping within it.</summary>
internal sealed class KeySet
{
    private readonly Dictionary<string, KnownKey> _byName = new(StringComparer.Ordinal);
    private readonly List<KnownKey> _keys = [];

    /// <summary>No keys at all.</summary>
    public static KeySet None { get; } = new();

    /// <summary>The keys in the order in which the section asks for them; each one's index is its position.</summary>
    public List<KnownKey> Keys => _keys;

    public IEnumerable<string> Names => _keys.Select(one => one.Name);

    public KnownKey? Find(string name) => _byName.TryGetValue(name, out var key) ? key : null;

    public void Add(string name, KeyKind kind, bool required, KeySet? nested = null)
    {
        var key = new KnownKey(_keys.Count, name, kind, required, nested);
        _byName.Add(name, key);
        _keys.Add(key);
    }
}
