namespace NetFault;

/// <summary>
/// A network before it is checked: what a builder or a reader has gathered. Ids may be declared without an element, where the reader could
/// not make one, so that references to them are not reported as dangling.
/// </summary>
internal sealed class NetworkDraft
{
    private readonly Dictionary<string, Dictionary<string, NetworkElement?>> _sections = new(StringComparer.Ordinal);
    private readonly List<NetworkElement> _elements = [];
    private readonly Dictionary<string, NetworkElement?> _buses;

    public NetworkDraft()
    {
        _buses = SectionOf("buses");
    }

    public string? Title { get; set; }

    public double FrequencyHz { get; set; } = double.NaN;

    public double BaseMva { get; set; } = 100;

    public IReadOnlyList<NetworkElement> Elements => _elements;

    public IEnumerable<string> BusIds => _buses.Keys;

    /// <summary>Adds an element; false where its section has the id already.</summary>
    public bool Add(NetworkElement element)
    {
        if (!Declare(element.Section, element.Id))
            return false;
        SectionOf(element.Section)[element.Id] = element;
        _elements.Add(element);
        return true;
    }

    /// <summary>Notes that an id stands in a section; false where it stood there already.</summary>
    public bool Declare(string section, string id)
    {
        var ids = SectionOf(section);
        if (ids.ContainsKey(id))
            return false;
        ids.Add(id, null);
        return true;
    }

    public bool HasBus(string id) => _buses.ContainsKey(id);

    public Bus? FindBus(string id) => _buses.TryGetValue(id, out var bus) ? (Bus?)bus : null;

    public NetworkElement? Find(string section, string id) => SectionOf(section).TryGetValue(id, out var element) ? element : null;

    public bool Declares(string section, string id) => SectionOf(section).ContainsKey(id);

    public IEnumerable<string> IdsOf(string section) => SectionOf(section).Keys;

    private Dictionary<string, NetworkElement?> SectionOf(string name)
    {
        if (!_sections.TryGetValue(name, out var section))
            _sections.Add(name, section = new Dictionary<string, NetworkElement?>(StringComparer.Ordinal));
        return section;
    }
}
