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
internal sealed record KnownKey(string Name, KeyKind Kind, bool Required, KeySet? Nested = null);

/// <summary>The keys that stand side by side in an element or in a mapping within it.</summary>
internal sealed class KeySet
{
    private readonly Dictionary<string, KnownKey> _byName = new(StringComparer.Ordinal);
    private readonly List<KnownKey> _keys = [];

    public IReadOnlyList<KnownKey> Keys => _keys;

    public IEnumerable<string> Names => _keys.Select(one => one.Name);

    public KnownKey? Find(string name) => _byName.TryGetValue(name, out var key) ? key : null;

    public void Add(KnownKey key)
    {
        _byName.Add(key.Name, key);
        _keys.Add(key);
    }
}
