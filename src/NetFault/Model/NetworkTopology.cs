namespace NetFault;

/// <summary>
/// The network as a graph, with every id resolved once: which buses a closed coupler makes one node, and which nodes hang together with
/// something that holds their voltage. An element counts where it and all its buses are in service. Devices with ratings are not in it.
/// </summary>
internal sealed class NetworkTopology
{
    /// <summary>Index of the first terminal of each element in <see cref="_terminalBus"/>; one longer than the elements.</summary>
    private readonly int[] _terminalStart;

    /// <summary>Bus index of each terminal, −1 for an open winding.</summary>
    private readonly int[] _terminalBus;

    private readonly bool[] _active;
    private readonly Dictionary<Type, int> _firstOfKind = [];
    private readonly Dictionary<string, int> _busIndex = new(StringComparer.Ordinal);
    private readonly int[] _islandOfNode;
    private readonly bool[] _islandHasSource;

    public NetworkTopology(Network network)
    {
        for (var bus = 0; bus < network.Buses.Count; bus++)
            _busIndex.Add(network.Buses[bus].Id, bus);
        (_terminalStart, _terminalBus) = ResolveTerminals(network.Elements, network.ConductingCount);
        _active = FindActive(network);
        NodeOfBus = JoinBuses(network, out var nodeCount);
        NodeCount = nodeCount;
        _islandOfNode = FindIslands(network, out var islandCount);
        _islandHasSource = FindSources(network, islandCount);
        BusesOfNode = GatherBuses();
    }

    /// <summary>How many nodes the buses form; the nodes are 0 to this less 1.</summary>
    public int NodeCount { get; }

    /// <summary>The node of each bus.</summary>
    public int[] NodeOfBus { get; }

    /// <summary>The buses of each node, in the order of the network.</summary>
    public IReadOnlyList<int>[] BusesOfNode { get; }

    /// <summary>Whether anything holds a voltage anywhere.</summary>
    public bool HasSource => Array.IndexOf(_islandHasSource, true) >= 0;

    /// <summary>The index of a bus, or −1.</summary>
    public int FindBus(string id) => _busIndex.TryGetValue(id, out var bus) ? bus : -1;

    /// <summary>Whether a bus has a path to a source.</summary>
    public bool IsEnergised(int bus) => IsNodeEnergised(NodeOfBus[bus]);

    /// <summary>Whether a node has a path to a source.</summary>
    public bool IsNodeEnergised(int node) => _islandHasSource[_islandOfNode[node]];

    /// <summary>The connected part of the network in which a node lies.</summary>
    public int IslandOfNode(int node) => _islandOfNode[node];

    /// <summary>The position of the first element of a kind among all elements.</summary>
    public int FirstOfKind<T>() where T : NetworkElement => _firstOfKind.TryGetValue(typeof(T), out var first) ? first : 0;

    /// <summary>Whether an element of the graph, by its position among all, and all its buses are in service.</summary>
    public bool IsActive(int element) => _active[element];

    /// <summary>The bus of an element's terminal; −1 for an open winding.</summary>
    public int TerminalBus(int element, int terminal) => _terminalBus[_terminalStart[element] + terminal];

    /// <summary>The node of an element's terminal; −1 for an open winding.</summary>
    public int TerminalNode(int element, int terminal)
    {
        var bus = TerminalBus(element, terminal);
        return bus < 0 ? -1 : NodeOfBus[bus];
    }

    /// <summary>The bus of an element's first terminal that is not open.</summary>
    public int FirstBus(int element)
    {
        var at = _terminalStart[element];
        while (_terminalBus[at] < 0)
            at++;
        return _terminalBus[at];
    }

    private (int[] Start, int[] Bus) ResolveTerminals(IReadOnlyList<NetworkElement> elements, int conducting)
    {
        var start = new int[conducting + 1];
        var bus = new List<int>(2 * conducting);
        for (var i = 0; i < elements.Count; i++)
        {
            if (!_firstOfKind.ContainsKey(elements[i].GetType()))
                _firstOfKind.Add(elements[i].GetType(), i);
            if (i >= conducting)
                continue;
            var terminals = elements[i].Terminals;
            for (var at = 0; at < terminals.Count; at++)
                bus.Add(terminals[at] is { } id ? _busIndex[id] : -1);
            start[i + 1] = bus.Count;
        }
        return (start, bus.ToArray());
    }

    private bool[] FindActive(Network network)
    {
        var active = new bool[network.ConductingCount];
        for (var i = 0; i < active.Length; i++)
        {
            active[i] = network.Elements[i].InService;
            for (var at = _terminalStart[i]; at < _terminalStart[i + 1]; at++)
                active[i] &= _terminalBus[at] < 0 || network.Buses[_terminalBus[at]].InService;
        }
        return active;
    }

    private int[] JoinBuses(Network network, out int nodeCount)
    {
        var sets = new DisjointSets(network.Buses.Count);
        Unite(network, sets, ElementRole.Joint, bus => bus);
        return sets.Number(out nodeCount);
    }

    private int[] FindIslands(Network network, out int islandCount)
    {
        var sets = new DisjointSets(NodeCount);
        Unite(network, sets, ElementRole.Branch, bus => NodeOfBus[bus]);
        return sets.Number(out islandCount);
    }

    private void Unite(Network network, DisjointSets sets, ElementRole role, Func<int, int> memberOfBus)
    {
        for (var i = 0; i < _active.Length; i++)
        {
            if (!_active[i] || network.Elements[i].Role != role)
                continue;
            var first = -1;
            for (var at = _terminalStart[i]; at < _terminalStart[i + 1]; at++)
            {
                if (_terminalBus[at] < 0)
                    continue;
                if (first < 0)
                    first = memberOfBus(_terminalBus[at]);
                else
                    sets.Unite(first, memberOfBus(_terminalBus[at]));
            }
        }
    }

    private bool[] FindSources(Network network, int islandCount)
    {
        var hasSource = new bool[islandCount];
        for (var i = 0; i < _active.Length; i++)
        {
            if (_active[i] && network.Elements[i].Role == ElementRole.Source)
                hasSource[_islandOfNode[TerminalNode(i, 0)]] = true;
        }
        return hasSource;
    }

    private IReadOnlyList<int>[] GatherBuses()
    {
        var buses = new List<int>[NodeCount];
        for (var bus = 0; bus < NodeOfBus.Length; bus++)
            (buses[NodeOfBus[bus]] ??= new List<int>(1)).Add(bus);
        return buses;
    }
}
