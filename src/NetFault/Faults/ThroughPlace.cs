namespace NetFault;

/// <summary>One end of an element at a node: a source, or the from or to end of a branch.</summary>
/// <param name="Index">Its place among the circuit's sources or branches.</param>
/// <param name="Kind">Which of these.</param>
internal readonly record struct ElementEnd(int Index, ElementEndKind Kind);

/// <summary>What an <see cref="ElementEnd"/> is.</summary>
internal enum ElementEndKind : byte
{
    /// <summary>A source.</summary>
    Source,

    /// <summary>The from end of a branch.</summary>
    From,

    /// <summary>The to end of a branch.</summary>
    To,
}

/// <summary>
/// Where a device stands: what comes to a fault at its bus through the ends beyond it flows through the device, and for a fault just beyond it all
/// the rest does.
/// </summary>
/// <param name="Bus">The device's bus.</param>
/// <param name="Node">The bus's node in the circuit.</param>
/// <param name="Beyond">The ends beyond the device.</param>
/// <param name="IsInRing">
/// Whether it stands at a coupler in a ring of couplers, in which the current divides by impedances that nobody gave: then nothing is beyond.
/// </param>
internal sealed record ThroughPlace(int Bus, int Node, IReadOnlyList<ElementEnd> Beyond, bool IsInRing);

/// <summary>Finds the places of devices in a circuit.</summary>
internal sealed class ThroughPlaces
{
    private readonly Circuit _circuit;
    private readonly NetworkTopology _topology;
    private readonly Dictionary<(string Section, string Id), int> _elementAt = [];
    private readonly Dictionary<int, List<(int Element, ElementEnd End)>> _endsAt = [];     // by bus
    private readonly Dictionary<int, List<(int Element, int Other)>> _jointsAt = [];        // by bus

    public ThroughPlaces(Circuit circuit)
    {
        _circuit = circuit;
        _topology = circuit.Network.Topology;
        for (var i = 0; i < circuit.Network.ConductingCount; i++)
        {
            var element = circuit.Network.Elements[i];
            _elementAt[(element.Section, element.Id)] = i;
            if (element.Role == ElementRole.Joint && _topology.IsActive(i))
                AddJoint(i);
        }
        for (var i = 0; i < circuit.Sources.Length; i++)
            Add(circuit.Sources[i].Element, 0, new ElementEnd(i, ElementEndKind.Source));
        for (var i = 0; i < circuit.Branches.Length; i++)
        {
            Add(circuit.Branches[i].Element, circuit.Branches[i].FromTerminal, new ElementEnd(i, ElementEndKind.From));
            Add(circuit.Branches[i].Element, circuit.Branches[i].ToTerminal, new ElementEnd(i, ElementEndKind.To));
        }
    }

    /// <summary>The position of an element among all of the network.</summary>
    public int ElementAt(NetworkElement element) => _elementAt[(element.Section, element.Id)];

    /// <summary>The whole of a bus: nothing is beyond.</summary>
    public ThroughPlace OfBus(int bus) => new(bus, _circuit.NodeOfBus[bus], [], false);

    /// <summary>The place of a device at a bus towards an element; all is there and energised.</summary>
    public ThroughPlace Of(int bus, NetworkElement fed)
    {
        var element = ElementAt(fed);
        if (fed.Role != ElementRole.Joint)
            return new ThroughPlace(bus, _circuit.NodeOfBus[bus], EndsAt(bus).Where(one => one.Element == element).Select(one => one.End).ToList(), false);
        var far = _topology.TerminalBus(element, 0) == bus ? _topology.TerminalBus(element, 1) : _topology.TerminalBus(element, 0);
        return BusesBeyond(far, bus, element) is { } buses
            ? new ThroughPlace(bus, _circuit.NodeOfBus[bus], buses.SelectMany(EndsAt).Select(one => one.End).ToList(), false)
            : new ThroughPlace(bus, _circuit.NodeOfBus[bus], [], true);
    }

    /// <summary>The buses that a bus reaches by joints without this one; null where the bus on the near side is among them: a ring.</summary>
    private HashSet<int>? BusesBeyond(int far, int near, int joint)
    {
        var reached = new HashSet<int> { far };
        var open = new Stack<int>([far]);
        while (open.Count > 0)
        {
            foreach (var (element, other) in _jointsAt[open.Pop()])
            {
                if (element == joint || !reached.Add(other))
                    continue;
                if (other == near)
                    return null;
                open.Push(other);
            }
        }
        return reached;
    }

    private List<(int Element, ElementEnd End)> EndsAt(int bus) => _endsAt.TryGetValue(bus, out var ends) ? ends : [];

    private void AddJoint(int element)
    {
        int from = _topology.TerminalBus(element, 0), to = _topology.TerminalBus(element, 1);
        ListOf(_jointsAt, from).Add((element, to));
        ListOf(_jointsAt, to).Add((element, from));
    }

    private void Add(int element, int terminal, ElementEnd end) => ListOf(_endsAt, _topology.TerminalBus(element, terminal)).Add((element, end));

    private static List<T> ListOf<T>(Dictionary<int, List<T>> lists, int key)
    {
        if (!lists.TryGetValue(key, out var list))
            lists.Add(key, list = []);
        return list;
    }
}
