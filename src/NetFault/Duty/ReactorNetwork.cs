namespace NetFault;

/// <summary>A network with a series reactor between a bus and one of the elements at it.</summary>
internal sealed class ReactorNetwork
{
    private readonly Network _network;
    private readonly NetworkElement _place;
    private readonly string _bus;
    private readonly string _newBus;

    public ReactorNetwork(Network network, NetworkElement place, string bus)
    {
        _network = network;
        _place = place;
        _bus = bus;
        _newBus = Unused(network.Buses.Select(one => one.Id), $"{place.Id} behind reactor");
        ReactorId = Unused(network.SeriesReactors.Select(one => one.Id), $"reactor at {place.Id}");
    }

    /// <summary>The reactor's id.</summary>
    public string ReactorId { get; }

    /// <summary>The network with a reactor of a reactance in ohm.</summary>
    /// <exception cref="InvalidNetworkException">The element cannot stand behind a reactor.</exception>
    public Network With(double ohm)
    {
        var changed = new List<NetworkElement>
        {
            _network.Find<Bus>(_bus) with { Id = _newBus, Note = null },
            MovedTerminal.Of(_place, _bus, _newBus),
            new SeriesReactor { Id = ReactorId, From = _bus, To = _newBus, Ohm = new Impedance(0.0, ohm) },
        };
        changed.AddRange(_network.CircuitBreakers.Where(IsTowardsPlace).Select(one => one with { Feeds = ReactorId, FeedsSection = "series_reactors" }));
        changed.AddRange(_network.Switches.Where(IsTowardsPlace).Select(one => one with { Feeds = ReactorId, FeedsSection = "series_reactors" }));
        changed.AddRange(_network.Fuses.Where(IsTowardsPlace).Select(one => one with { Feeds = ReactorId, FeedsSection = "series_reactors" }));
        return _network.With([.. changed]);
    }

    private bool IsTowardsPlace(TerminalDevice device) =>
        device.Bus == _bus && _network.ElementBehind(device) is var fed && fed.Section == _place.Section && fed.Id == _place.Id;

    private static string Unused(IEnumerable<string> ids, string wanted)
    {
        var taken = new HashSet<string>(ids, StringComparer.Ordinal);
        var id = wanted;
        for (var i = 2; taken.Contains(id); i++)
            id = FormattableString.Invariant($"{wanted} {i}");
        return id;
    }
}
