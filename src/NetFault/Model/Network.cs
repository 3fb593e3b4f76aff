namespace NetFault;

/// <summary>
/// A checked network: what is installed, in engineering units. Immutable, and valid by construction: it comes from
/// <see cref="NetworkBuilder"/> or from a network file.
/// </summary>
public sealed class Network
{
    private readonly NetworkDraft _draft;

    internal Network(NetworkDraft draft)
    {
        _draft = draft;
        Title = draft.Title;
        FrequencyHz = draft.FrequencyHz;
        BaseMva = draft.BaseMva;
        Buses = draft.Of<Bus>("buses");
        NetworkFeeders = draft.Of<NetworkFeeder>("network_feeders");
        SynchronousMachines = draft.Of<SynchronousMachine>("synchronous_machines");
        AsynchronousMotors = draft.Of<AsynchronousMotor>("asynchronous_motors");
        ConverterFedDrives = draft.Of<ConverterFedDrive>("converter_fed_drives");
        FullConverterSources = draft.Of<FullConverterSource>("full_converter_sources");
        DoublyFedGenerators = draft.Of<DoublyFedGenerator>("doubly_fed_generators");
        Transformers = draft.Of<Transformer>("transformers");
        ThreeWindingTransformers = draft.Of<ThreeWindingTransformer>("three_winding_transformers");
        Lines = draft.Of<Line>("lines");
        SeriesReactors = draft.Of<SeriesReactor>("series_reactors");
        SeriesCapacitors = draft.Of<SeriesCapacitor>("series_capacitors");
        BusCouplers = draft.Of<BusCoupler>("bus_couplers");
        CircuitBreakers = draft.Of<CircuitBreaker>("circuit_breakers");
        Switches = draft.Of<Switch>("switches");
        Busbars = draft.Of<Busbar>("busbars");
        Fuses = draft.Of<Fuse>("fuses");
        Elements =
        [
            .. Buses, .. NetworkFeeders, .. SynchronousMachines, .. AsynchronousMotors,
            .. ConverterFedDrives, .. FullConverterSources, .. DoublyFedGenerators,
            .. Transformers, .. ThreeWindingTransformers, .. Lines, .. SeriesReactors, .. SeriesCapacitors, .. BusCouplers,
            .. CircuitBreakers, .. Switches, .. Busbars, .. Fuses,
        ];
        ConductingCount = Elements.Count - CircuitBreakers.Count - Switches.Count - Busbars.Count - Fuses.Count;
        Topology = new NetworkTopology(this);
    }

    /// <summary>A title for people; null where none was given.</summary>
    public string? Title { get; }

    /// <summary>The rated frequency in Hz.</summary>
    public double FrequencyHz { get; }

    /// <summary>The base power of per-unit values, in MVA.</summary>
    public double BaseMva { get; }

    /// <summary>All elements, section by section in the order of the network file's sections.</summary>
    public IReadOnlyList<NetworkElement> Elements { get; }

    /// <summary>The buses; results list them in this order.</summary>
    public IReadOnlyList<Bus> Buses { get; }

    /// <summary>The network feeders.</summary>
    public IReadOnlyList<NetworkFeeder> NetworkFeeders { get; }

    /// <summary>The synchronous machines.</summary>
    public IReadOnlyList<SynchronousMachine> SynchronousMachines { get; }

    /// <summary>The asynchronous motors.</summary>
    public IReadOnlyList<AsynchronousMotor> AsynchronousMotors { get; }

    /// <summary>The drives fed by static converters.</summary>
    public IReadOnlyList<ConverterFedDrive> ConverterFedDrives { get; }

    /// <summary>The sources behind full-size converters.</summary>
    public IReadOnlyList<FullConverterSource> FullConverterSources { get; }

    /// <summary>The doubly fed generators.</summary>
    public IReadOnlyList<DoublyFedGenerator> DoublyFedGenerators { get; }

    /// <summary>The two-winding transformers.</summary>
    public IReadOnlyList<Transformer> Transformers { get; }

    /// <summary>The three-winding transformers.</summary>
    public IReadOnlyList<ThreeWindingTransformer> ThreeWindingTransformers { get; }

    /// <summary>The lines and cables.</summary>
    public IReadOnlyList<Line> Lines { get; }

    /// <summary>The series reactors.</summary>
    public IReadOnlyList<SeriesReactor> SeriesReactors { get; }

    /// <summary>The series capacitors.</summary>
    public IReadOnlyList<SeriesCapacitor> SeriesCapacitors { get; }

    /// <summary>The bus couplers.</summary>
    public IReadOnlyList<BusCoupler> BusCouplers { get; }

    /// <summary>The circuit-breakers with their ratings.</summary>
    public IReadOnlyList<CircuitBreaker> CircuitBreakers { get; }

    /// <summary>The switches and disconnectors with their ratings.</summary>
    public IReadOnlyList<Switch> Switches { get; }

    /// <summary>The ratings of busbars.</summary>
    public IReadOnlyList<Busbar> Busbars { get; }

    /// <summary>The fuses with their ratings.</summary>
    public IReadOnlyList<Fuse> Fuses { get; }

    /// <summary>How many of the <see cref="Elements"/>, from the first, are in the graph; devices with ratings stand behind them.</summary>
    internal int ConductingCount { get; }

    /// <summary>What is odd but possible: buses without a source, unusual values. <see cref="NetworkBuilder.Build"/> fills it.</summary>
    public IReadOnlyList<Diagnostic> Warnings { get; internal set; } = [];

    /// <summary>The file the network was read from, with the line of each element in the order of the file; null without a file.</summary>
    internal (string File, int[] Lines)? Origin { get; set; }

    /// <summary>Where in its file an element stands.</summary>
    internal (string File, int Line)? PlaceOf(NetworkElement element)
    {
        if (Origin is not { } origin)
            return null;
        for (var i = 0; i < origin.Lines.Length; i++)
        {
            if (ReferenceEquals(_draft.Elements[i], element))
                return (origin.File, origin.Lines[i]);
        }
        return null;
    }

    /// <summary>The network as a graph.</summary>
    internal NetworkTopology Topology { get; }

    /// <summary>A copy in which the given elements stand in for those of the same section and id, and new ones are added.</summary>
    /// <exception cref="InvalidNetworkException">The network would not be valid; the exception lists every problem.</exception>
    public Network With(params NetworkElement[] elements) => ToBuilder().Set(elements).Build();

    /// <summary>A copy with one bus coupler closed or opened.</summary>
    /// <param name="id">The coupler's id.</param>
    /// <param name="closed">True closes it.</param>
    /// <exception cref="UnknownIdException">There is no such coupler; the exception names the nearest ids.</exception>
    /// <exception cref="ArgumentException">The coupler is out of service, so that its position makes no difference.</exception>
    public Network WithCoupler(string id, bool closed)
    {
        var coupler = Find<BusCoupler>(id);
        return coupler.InService
            ? With(coupler with { Closed = closed })
            : throw new ArgumentException($"coupler \"{id}\" is out of service: put it in service first", nameof(id));
    }

    /// <summary>A builder that holds this network's elements, for changed copies.</summary>
    public NetworkBuilder ToBuilder() =>
        new NetworkBuilder { Title = Title, FrequencyHz = FrequencyHz, BaseMva = BaseMva }.Add([.. Elements]);

    /// <summary>The element of a kind with an id, as in <c>network.Find&lt;Bus&gt;("MV-A")</c>.</summary>
    /// <typeparam name="T">The kind: <see cref="Bus"/>, <see cref="Line"/> and so on.</typeparam>
    /// <param name="id">The element's id.</param>
    /// <exception cref="UnknownIdException">There is none; the exception names the nearest ids.</exception>
    public T Find<T>(string id) where T : NetworkElement
    {
        Guard.NotNull(id);
        if (Elements[Topology.FirstOfKind<T>()] is not T { Section: var section })
            throw new UnknownIdException(typeof(T).Name, id, []);
        return _draft.Find(section, id) as T ?? throw new UnknownIdException(section, id, _draft.IdsOf(section));
    }

    /// <summary>The element that a device of this network connects with its bus: the branch, source or coupler that it feeds.</summary>
    /// <param name="device">A circuit-breaker, switch or fuse.</param>
    /// <exception cref="UnknownIdException">The device's <see cref="TerminalDevice.Feeds"/> names nothing at its bus in this network.</exception>
    public NetworkElement ElementBehind(TerminalDevice device)
    {
        Guard.NotNull(device);
        return FedElements.Named(_draft, device.Feeds, device.FeedsSection).FirstOrDefault(one => one?.Terminals.Contains(device.Bus) == true)
            ?? throw new UnknownIdException(device.FeedsSection ?? "the elements at bus " + device.Bus, device.Feeds,
                FedElements.IdsByBus(_draft).TryGetValue(device.Bus, out var ids) ? ids : []);
    }
}
