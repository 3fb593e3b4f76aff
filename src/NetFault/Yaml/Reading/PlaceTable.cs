namespace NetFault;

/// <summary>
/// Where each element and each of its values stands, in flat arrays: written for every value, read only where the network's checks find
/// something.
/// </summary>
internal sealed class PlaceTable
{
    private readonly List<ElementPlace> _elements = [];
    private readonly List<ValuePlace> _values;
    private Dictionary<(string Section, string Id), int>? _byId;

    public PlaceTable(int textLength)
    {
        _values = new List<ValuePlace>(textLength / 12);
    }

    /// <summary>Begins the places of an element.</summary>
    /// <returns>The element's position in the table.</returns>
    public int AddElement(string section, string id, int offset, int length)
    {
        _elements.Add(new ElementPlace(section, id, offset, length, _values.Count));
        return _elements.Count - 1;
    }

    /// <summary>Adds a value of the last element.</summary>
    /// <param name="key">Its key.</param>
    /// <param name="parent">The position, within the element, of the mapping that holds the key; −1 for the element.</param>
    /// <param name="offset">Its offset.</param>
    /// <param name="length">Its length.</param>
    public void AddValue(string key, int parent, int offset, int length) => _values.Add(new ValuePlace(key, parent, offset, length));

    /// <summary>Where an element's id stands first, by section and id; null where it does not stand.</summary>
    public int? FindElement(string section, string id)
    {
        _byId ??= IndexById();
        return _byId.TryGetValue((section, id), out var element) ? element : null;
    }

    /// <summary>The offset and length of an element's id.</summary>
    public (int Offset, int Length) IdOf(int element) => (_elements[element].Offset, _elements[element].Length);

    /// <summary>The offset and length of a value; of the mapping around it, or of the element's id, where there is none.</summary>
    public (int Offset, int Length) ValueOf(int element, string? path)
    {
        if (path is null)
            return IdOf(element);
        var dot = path.IndexOf('.');
        var outer = FindValue(element, -1, dot < 0 ? path : path.Substring(0, dot));
        if (outer < 0)
            return IdOf(element);
        var inner = dot < 0 ? -1 : FindValue(element, outer - _elements[element].FirstValue, path.Substring(dot + 1));
        var place = _values[inner < 0 ? outer : inner];
        return (place.Offset, place.Length);
    }

    private int FindValue(int element, int parent, string key)
    {
        var end = element + 1 < _elements.Count ? _elements[element + 1].FirstValue : _values.Count;
        for (var i = _elements[element].FirstValue; i < end; i++)
        {
            if (_values[i].Parent == parent && _values[i].Key == key)
                return i;
        }
        return -1;
    }

    private Dictionary<(string Section, string Id), int> IndexById()
    {
        var byId = new Dictionary<(string Section, string Id), int>();
        for (var i = 0; i < _elements.Count; i++)
        {
            var key = (_elements[i].Section, _elements[i].Id);
            if (!byId.ContainsKey(key))
                byId.Add(key, i);
        }
        return byId;
    }

    private readonly record struct ElementPlace(string Section, string Id, int Offset, int Length, int FirstValue);

    private readonly record struct ValuePlace(string Key, int Parent, int Offset, int Length);
}
