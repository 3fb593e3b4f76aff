namespace NetFault;

/// <summary>What a file's text held: the draft of a network, where everything stands, and what has been reported about it.</summary>
internal sealed class GatheredFile
{
    private Dictionary<NetworkElement, IReadOnlyCollection<string>>? _reported;

    public GatheredFile(SourceText source)
    {
        Elements = new ElementTable(source);
    }

    public NetworkDraft Draft { get; } = new();

    public ElementTable Elements { get; }

    /// <summary>Elements whose id stands in their section already, with their place in the table.</summary>
    public List<(NetworkElement Element, int Place)> Duplicates { get; } = [];

    /// <summary>Where each key and section of the file's top level stands.</summary>
    public Dictionary<string, (int Offset, int Length)> TopLevel { get; } = new(StringComparer.Ordinal);

    /// <summary>Keys and sections of the top level about which something has been reported.</summary>
    public HashSet<string> ReportedTopLevel { get; } = new(StringComparer.Ordinal);

    /// <summary>That the file is of a format that is not read, so that nothing else can be said about it.</summary>
    public Diagnostic? OtherFormat { get; set; }

    /// <summary>Whether the file is a mapping at all.</summary>
    public bool HasRoot { get; set; }

    /// <summary>Whether it was read to its end, so that what was not found is not there.</summary>
    public bool IsComplete { get; set; }

    /// <summary>The keys of an element about which something has been reported; null where there is nothing.</summary>
    public IReadOnlyCollection<string>? ReportedKeys(NetworkElement element) =>
        _reported is not null && _reported.TryGetValue(element, out var keys) ? keys : null;

    public void AddReported(NetworkElement element, IReadOnlyCollection<string> keys) =>
        (_reported ??= new Dictionary<NetworkElement, IReadOnlyCollection<string>>(ByReference.Comparer)).Add(element, keys);

    /// <summary>Tells elements apart by what they are in memory: records are equal by value, and two may be.</summary>
    private sealed class ByReference : IEqualityComparer<NetworkElement>
    {
        public static readonly ByReference Comparer = new();

        public bool Equals(NetworkElement? one, NetworkElement? other) => ReferenceEquals(one, other);

        public int GetHashCode(NetworkElement element) => System.Runtime.CompilerServices.RuntimeHelpers.GetHashCode(element);
    }
}
