namespace NetFault;

/// <summary>
/// A network before it is checked: what a builder or a reader has gathered. Ids may be declared without an element, where the reader could
/// not make one, so that references to them are not reported as dangling.
/// </summary>
internal sealed class NetworkDraft
{
    private readonly Dictionary<string, SectionDraft> _sections = new(StringComparer.Ordinal);
    private readonly List<NetworkElement> _elements = [];
    private SectionDraft _buses;

    /// <summary>The section of the last element: elements of a section come one after the other.</summary>
    private SectionDraft _last;

    public NetworkDraft()
    {
        _buses = _last = SectionOf("buses");
    }

    public string? Title { get; set; }

    public double FrequencyHz { get; set; } = double.NaN;

    public double BaseMva { get; set; } = 100;

    public IReadOnlyList<NetworkElement> Elements => _elements;

    public IReadOnlyCollection<string> BusIds => _buses.ById.Keys;

    /// <summary>Adds an element; false where its section has the id already.</summary>
    public bool Add(NetworkElement element)
    {
        var section = _last.Name == element.Section ? _last : _last = SectionOf(element.Section);
        if (section.ById.ContainsKey(element.Id))
            return false;
        section.ById.Add(element.Id, element);
        section.Elements.Add(element);
        _elements.Add(element);
        return true;
    }

    /// <summary>Notes that an id stands in a section; false where it stood there already.</summary>
    public bool Declare(string section, string id)
    {
        var ids = SectionOf(section).ById;
        if (ids.ContainsKey(id))
            return false;
        ids.Add(id, null);
        return true;
    }

    /// <summary>Makes room for as many elements of a section.</summary>
    public void Expect(string section, int count)
    {
        if (_sections.TryGetValue(section, out var known) && known.ById.Count > 0)
            return;
        var expected = new SectionDraft(section, count);
        _sections[section] = expected;
        if (section == _buses.Name)
            _buses = expected;
        _last = expected;
        _elements.Capacity = Math.Max(_elements.Capacity, _elements.Count + count);
    }

    /// <summary>The one string for an id of a bus that is here already: many elements name the same one.</summary>
    public string SameText(string busId) => _buses.ById.TryGetValue(busId, out var bus) && bus is not null ? bus.Id : busId;

    public bool HasBus(string? id) => id is not null && _buses.ById.ContainsKey(id);

    public Bus? FindBus(string? id) => id is not null && _buses.ById.TryGetValue(id, out var bus) ? (Bus?)bus : null;

    /// <summary>The element of a section with an id, or null. Changes nothing, so that a network may be asked from many threads.</summary>
    public NetworkElement? Find(string section, string id) =>
        _sections.TryGetValue(section, out var known) && known.ById.TryGetValue(id, out var element) ? element : null;

    public bool Declares(string section, string id) => _sections.TryGetValue(section, out var known) && known.ById.ContainsKey(id);

    public IReadOnlyCollection<string> IdsOf(string section) => _sections.TryGetValue(section, out var known) ? known.ById.Keys : [];

    /// <summary>The elements of a section in the order in which they were added.</summary>
    public IReadOnlyList<T> Of<T>(string section) where T : NetworkElement =>
        _sections.TryGetValue(section, out var known) ? Array.AsReadOnly(Array.ConvertAll(known.Elements.ToArray(), one => (T)one)) : [];

    private SectionDraft SectionOf(string name)
    {
        if (!_sections.TryGetValue(name, out var section))
            _sections.Add(name, section = new SectionDraft(name));
        return section;
    }

    private sealed class SectionDraft
    {
        public SectionDraft(string name, int capacity = 0)
        {
            Name = name;
            ById = new Dictionary<string, NetworkElement?>(capacity, StringComparer.Ordinal);
            Elements = new List<NetworkElement>(capacity);
        }

        public string Name { get; }

        public Dictionary<string, NetworkElement?> ById { get; }

        public List<NetworkElement> Elements { get; }
    }
}
