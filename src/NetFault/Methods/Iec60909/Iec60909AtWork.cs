using System.Numerics;

namespace NetFault;

/// <summary>IEC 60909-0 at work on one study: what the currents at all buses share, each part made when it is first needed.</summary>
internal sealed class Iec60909AtWork : CurrentsOfMethod
{
    private readonly Lazy<CircuitGraph> _graph;
    private readonly Lazy<double[]> _levels;
    private readonly Lazy<bool> _levelsAgree;
    private readonly Lazy<bool[]> _radial;
    private readonly Lazy<bool[]> _radialWithoutMotors;
    private readonly Lazy<SmallestRatios> _smallest;
    private readonly Lazy<SmallMotors> _motors;
    private readonly Lazy<int[]> _islands;
    private readonly Lazy<Dictionary<int, List<SynchronousMachine>>> _machines;

    public Iec60909AtWork(Iec60909 method, StudyNetworks networks)
    {
        Method = method;
        Networks = networks;
        var units = new PowerStationUnits(Circuit.Network, method.Case);
        Sources = new Iec60909Sources(Circuit.Network, units, method.Case);
        _graph = new(() => new CircuitGraph(Circuit));
        _levels = new(() => _graph.Value.Levels());
        _levelsAgree = new(() => _graph.Value.Agrees(_levels.Value));
        _radial = new(() => RadialNodes.Of(Circuit, _graph.Value, source => Feeds(source, Iec60909.Initial)));
        _radialWithoutMotors = new(() => RadialNodes.Of(Circuit, _graph.Value, source => Feeds(source, Iec60909.WithoutMotors)));
        _smallest = new(() => new SmallestRatios(Circuit, Sources));
        _motors = new(() => new SmallMotors(Circuit));
        _islands = new(() => Islands.OfNodes(Circuit));
        _machines = new(GatherMachines);
        Inside = new InsideUnits(networks, units, Sources, _graph);
        Partial = new PartialCurrents(this);
        Converters = new ConverterCurrents(networks, method.Case);
    }

    /// <summary>The method's options.</summary>
    public Iec60909 Method { get; }

    /// <summary>The study's networks.</summary>
    public StudyNetworks Networks { get; }

    /// <summary>The circuit.</summary>
    public Circuit Circuit => Networks.Circuit;

    /// <summary>The impedances of the sources.</summary>
    public Iec60909Sources Sources { get; }

    /// <summary>The nodes between machines and unit transformers.</summary>
    public InsideUnits Inside { get; }

    /// <summary>The machines' shares of the fault currents.</summary>
    public PartialCurrents Partial { get; }

    /// <summary>What full-size converters add.</summary>
    public ConverterCurrents Converters { get; }

    /// <summary>The smallest R/X around each node, for method (a).</summary>
    public SmallestRatios Smallest => _smallest.Value;

    public override FaultCurrents At(StudyContext context, int bus, in SeenImpedances seen) =>
        new Iec60909Currents(this, context, context.Network.Buses[bus], seen);

    public override SolvedNetwork? NetworkSeenFrom(int node, NetworkVariant variant, bool forTransformer = false) => forTransformer
        ? Inside.Of(node)?.SolvedForTransformer(Method, variant)
        : Inside.Of(node)?.Solved(Method, variant);

    public override FlowBasis FlowsAt(StudyContext context, int bus, FaultInstant instant)
    {
        var at = context.Network.Buses[bus];
        var node = Circuit.NodeOfBus[bus];
        var driving = DrivingVoltagePu(node, at);
        var variant = Method.NetworkAt(instant);
        // The option first: without it nobody needs the network without motors here.
        if (Method.LeaveOutSmallMotors && LeavesMotorsOut(node, driving, Seen(Iec60909.WithoutMotors, node)))
            variant = Iec60909.WithoutMotors;
        var network = Inside.Of(node)?.Solved(Method, variant) ?? Networks.Of(variant);
        return FlowBasis.Of(network, driving, Converters.Injections(instant));
    }

    /// <summary>c at a bus, or c·UrG/Un at a machine's terminals inside a power station unit.</summary>
    public double DrivingVoltagePu(int node, Bus bus) => Inside.DrivingVoltagePu(node, bus, Method.Case) ?? Method.DrivingVoltagePu(bus);

    /// <summary>Whether the motors are left out as small for a fault that sees this impedance without them.</summary>
    public bool LeavesMotorsOut(int node, double drivingVoltagePu, Complex withoutMotorsPu) =>
        Method.LeaveOutSmallMotors && _motors.Value.AreSmall(node, drivingVoltagePu, drivingVoltagePu / Complex.Abs(withoutMotorsPu));

    /// <summary>Whether each source feeds a node by a way of its own.</summary>
    public bool IsRadial(int node, bool withMotors) => (withMotors ? _radial : _radialWithoutMotors).Value[node];

    private bool Feeds(CircuitSource source, NetworkVariant variant) =>
        Circuit.Network.Elements[source.Element] is FullConverterSource || Sources.Impedance(source.Element, variant, log: null).HasValue;

    /// <summary>The synchronous machines in a node's connected part.</summary>
    public List<SynchronousMachine> MachinesAround(int node) =>
        _machines.Value.TryGetValue(_islands.Value[node], out var machines) ? machines : [];

    private Dictionary<int, List<SynchronousMachine>> GatherMachines() => Circuit.Sources
        .Where(source => Circuit.Network.Elements[source.Element] is SynchronousMachine)
        .GroupBy(source => _islands.Value[source.Node], source => (SynchronousMachine)Circuit.Network.Elements[source.Element])
        .ToDictionary(group => group.Key, group => group.ToList());

    /// <summary>
    /// What a machine's current is at a radially fed fault: over the current at the machine, per unit. Where all ratios agree that is the ratio
    /// between; where transformers with unequal taps are parallel it is found from the branches at the fault.
    /// </summary>
    public Complex Transfer(Iec60909Currents fault, in PartialCurrent share, NetworkVariant variant)
    {
        var source = Circuit.Sources[share.Source].Node;
        if (_levelsAgree.Value || source == fault.Node || Inside.Of(fault.Node) is not null)
            return _levels.Value[source] / _levels.Value[fault.Node];
        var solved = Networks.Of(variant);
        var column = solved.Column(fault.Node, out _);
        var part = _graph.Value.Reached(source, (_, node) => node != fault.Node);
        var current = Complex.Zero;
        for (var end = _graph.Value.Start(fault.Node); end < _graph.Value.End(fault.Node); end++)
        {
            if (part.Contains(_graph.Value.Neighbour(fault.Node, end)))
                current += IntoNode(fault.Node, _graph.Value.Branch(end), column, solved.Values);
        }
        return current / (column[source] / share.Impedance);
    }

    /// <summary>The current that a branch brings to a node with a fault of one per unit.</summary>
    private Complex IntoNode(int node, int index, Complex[] column, AdmittanceValues values)
    {
        var branch = Circuit.Branches[index];
        var through = values.Branches[index] * (branch.FromRatio * column[branch.From] - branch.ToRatio * column[branch.To]);
        return branch.From == node ? branch.FromRatio * through : -branch.ToRatio * through;
    }

    /// <summary>Zkk in a network that is not among the method's standing ones, with the fault's own impedance.</summary>
    public Complex Seen(NetworkVariant variant, in SeenImpedances seen) =>
        seen.Through?.Impedance(variant) ?? Seen(variant, seen.Node) + variant.OfFault(seen.FaultPu);

    private Complex Seen(NetworkVariant variant, int node) =>
        Corrected(variant, node, Networks.Of(variant).DrivingPoints.Impedances[node]);

    /// <summary>An impedance with the factors for faults inside a power station unit, where the node is in one.</summary>
    public Complex Corrected(NetworkVariant variant, int node, Complex z) => Inside.Of(node) is { } unit ? unit.Corrected(variant, node, z) : z;
}
