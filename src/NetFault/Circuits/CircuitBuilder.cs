using System.Numerics;

namespace NetFault;

/// <summary>Builds the circuit of a network: its energised nodes, its branches with their impedances, the places of its sources.</summary>
internal sealed class CircuitBuilder
{
    private readonly Network _network;
    private readonly NetworkTopology _topology;
    private readonly BranchRules _rules;
    private readonly AssumptionLog? _log;
    private readonly int[] _nodeOfBus;
    private CircuitBranch[] _branches;
    private Complex[] _impedances;
    private readonly List<CircuitSource> _sources = [];
    private readonly int _nodeCount;
    private int _branchCount;

    private CircuitBuilder(Network network, BranchRules rules, AssumptionLog? log)
    {
        _network = network;
        _topology = network.Topology;
        _rules = rules;
        _log = log;
        _nodeOfBus = NumberEnergisedNodes(out _nodeCount);
        var most = network.Transformers.Count + 3 * network.ThreeWindingTransformers.Count + network.Lines.Count
            + network.SeriesReactors.Count + network.SeriesCapacitors.Count;
        _branches = new CircuitBranch[most];
        _impedances = new Complex[most];
    }

    /// <summary>The circuit of a network.</summary>
    /// <param name="network">The network.</param>
    /// <param name="rules">What the method changes about branch impedances.</param>
    /// <param name="log">Where assumed values are noted; null where nobody reads them.</param>
    public static Circuit Build(Network network, BranchRules rules, AssumptionLog? log)
    {
        var builder = new CircuitBuilder(network, rules, log);
        builder.AddBranches(network.Transformers, builder.AddTransformer);
        builder.AddBranches(network.ThreeWindingTransformers, builder.AddThreeWindingTransformer);
        builder.AddBranches(network.Lines, builder.AddLine);
        builder.AddBranches(network.SeriesReactors, builder.AddSeriesReactor);
        builder.AddBranches(network.SeriesCapacitors, builder.AddSeriesCapacitor);
        builder.AddSources(network.NetworkFeeders);
        builder.AddSources(network.SynchronousMachines);
        builder.AddSources(network.AsynchronousMotors);
        builder.AddSources(network.ConverterFedDrives);
        builder.AddSources(network.FullConverterSources);
        builder.AddSources(network.DoublyFedGenerators);
        Array.Resize(ref builder._branches, builder._branchCount);
        Array.Resize(ref builder._impedances, builder._branchCount);
        return new Circuit(network, builder._nodeOfBus, builder._nodeCount, builder._branches, builder._impedances, [.. builder._sources]);
    }

    private int[] NumberEnergisedNodes(out int count)
    {
        var circuitNode = new int[_topology.NodeCount];
        count = 0;
        for (var node = 0; node < circuitNode.Length; node++)
            circuitNode[node] = _topology.IsNodeEnergised(node) ? count++ : -1;
        var nodeOfBus = new int[_topology.NodeOfBus.Length];
        for (var bus = 0; bus < nodeOfBus.Length; bus++)
            nodeOfBus[bus] = circuitNode[_topology.NodeOfBus[bus]];
        return nodeOfBus;
    }

    private void AddBranches<T>(IReadOnlyList<T> elements, Action<T, int> add) where T : NetworkElement
    {
        var first = _topology.FirstOfKind<T>();
        for (var i = 0; i < elements.Count; i++)
        {
            if (_topology.IsActive(first + i) && IsEnergised(first + i))
                add(elements[i], first + i);
        }
    }

    private void AddSources<T>(IReadOnlyList<T> elements) where T : ShuntElement
    {
        var first = _topology.FirstOfKind<T>();
        for (var element = first; element < first + elements.Count; element++)
        {
            if (_topology.IsActive(element) && IsEnergised(element))
                _sources.Add(new CircuitSource(element, Node(element, 0)));
        }
    }

    private void AddTransformer(Transformer transformer, int element)
    {
        double hvKv = Kv(element, 0), lvKv = Kv(element, 1);
        AddSeries(element, 0, 1, TransformerCircuit.Ratio(transformer, hvKv, lvKv),
            _rules.Transformer(transformer, TransformerCircuit.SeriesPu(transformer, hvKv, _network.BaseMva)));
    }

    private void AddLine(Line line, int element) =>
        AddSeries(element, 0, 1, 1.0, _rules.Line(line, LineCircuit.SeriesPu(line, Kv(element, 0), _network.BaseMva), _log));

    private void AddSeriesReactor(SeriesReactor reactor, int element) =>
        AddSeries(element, 0, 1, 1.0, SeriesReactorCircuit.SeriesPu(reactor, Kv(element, 0), _network.BaseMva, _log));

    private void AddSeriesCapacitor(SeriesCapacitor capacitor, int element)
    {
        if (!capacitor.VoltageLimited)
            Add(element, 0, 1, 1.0, 1.0, BranchKind.Capacitor, SeriesCapacitorCircuit.SeriesPu(capacitor, Kv(element, 0), _network.BaseMva));
    }

    private void AddThreeWindingTransformer(ThreeWindingTransformer transformer, int element)
    {
        if (transformer.Hv is null)
            AddPair(transformer, element, 1, 2);
        else if (transformer.Mv is null)
            AddPair(transformer, element, 0, 2);
        else if (transformer.Lv is null)
            AddPair(transformer, element, 0, 1);
        else
            AddStar(transformer, element);
    }

    /// <summary>With one winding open, the other two are a transformer of two windings.</summary>
    private void AddPair(ThreeWindingTransformer transformer, int element, byte from, byte to)
    {
        var impedance = PairImpedance(transformer, element, from, to, referredTo: from);
        AddSeries(element, from, to, Ratio(transformer, element, from, to), impedance);
    }

    /// <summary>
    /// The star as the three branches of the equal delta, whose admittances stay finite when a leg is 0 (then there would be no star node);
    /// <see cref="NetworkAdmittances"/> makes them from the legs.
    /// </summary>
    private void AddStar(ThreeWindingTransformer transformer, int element)
    {
        Complex Pair(int one, int other) => PairImpedance(transformer, element, one, other, referredTo: 0);
        var legs = ThreeWindingTransformerCircuit.Legs(Pair(0, 1), Pair(0, 2), Pair(1, 2));
        double mvRatio = Ratio(transformer, element, 0, 1), lvRatio = Ratio(transformer, element, 0, 2);
        Add(element, 0, 1, 1.0, mvRatio, BranchKind.StarFirst, legs.Hv);
        Add(element, 0, 2, 1.0, lvRatio, BranchKind.StarNext, legs.Mv);
        Add(element, 1, 2, mvRatio, lvRatio, BranchKind.StarNext, legs.Lv);
    }

    private Complex PairImpedance(ThreeWindingTransformer transformer, int element, int one, int other, int referredTo)
    {
        var pair = ThreeWindingTransformerCircuit.PairOf(transformer, one, other);
        var lower = RatedKv(transformer, one) < RatedKv(transformer, other) ? one : other;
        return _rules.Windings(pair, _network.Buses[_topology.TerminalBus(element, lower)],
            pair.PerUnitOn(RatedKv(transformer, referredTo), Kv(element, referredTo), _network.BaseMva));
    }

    private double Ratio(ThreeWindingTransformer transformer, int element, int from, int to) =>
        RatedKv(transformer, from) / RatedKv(transformer, to) * (Kv(element, to) / Kv(element, from));

    private static double RatedKv(ThreeWindingTransformer transformer, int winding) =>
        ThreeWindingTransformerCircuit.Winding(transformer.RatedKv, winding);

    private void AddSeries(int element, byte from, byte to, double toRatio, Complex impedance) =>
        Add(element, from, to, 1.0, toRatio, BranchKind.Series, impedance);

    private void Add(int element, byte from, byte to, double fromRatio, double toRatio, BranchKind kind, Complex impedance)
    {
        _branches[_branchCount] = new CircuitBranch(element, Node(element, from), Node(element, to), from, to, fromRatio, toRatio, kind);
        _impedances[_branchCount++] = impedance;
    }

    private bool IsEnergised(int element) => _nodeOfBus[_topology.FirstBus(element)] >= 0;

    private int Node(int element, int terminal) => _nodeOfBus[_topology.TerminalBus(element, terminal)];

    private double Kv(int element, int terminal) => _network.Buses[_topology.TerminalBus(element, terminal)].NominalKv;
}
