using System.Collections.Concurrent;
using System.Numerics;

namespace NetFault;

/// <summary>
/// The nodes between machine and unit transformer of power station units, and those that hang on them (auxiliaries). For faults there the
/// machine carries K_G,S instead of K_S, the unit transformer K_T,S, and the terminals are driven by c·UrG/√3 (IEC 60909-0:2016, 7.2: short
/// circuits inside a power station unit).
/// </summary>
internal sealed class InsideUnits
{
    private readonly StudyNetworks _networks;
    private readonly PowerStationUnits _units;
    private readonly Iec60909Sources _sources;
    private readonly Lazy<CircuitGraph> _graph;
    private readonly Lazy<Dictionary<int, InsideUnit>> _byNode;

    public InsideUnits(StudyNetworks networks, PowerStationUnits units, Iec60909Sources sources, Lazy<CircuitGraph> graph)
    {
        _networks = networks;
        _units = units;
        _sources = sources;
        _graph = graph;
        _byNode = new(FindNodes);
    }

    /// <summary>The unit inside which a node lies, or null.</summary>
    public InsideUnit? Of(int node) => _units.All.Count > 0 && _byNode.Value.TryGetValue(node, out var unit) ? unit : null;

    /// <summary>c·UrG/Un at a machine's terminals inside a unit; null elsewhere.</summary>
    public double? DrivingVoltagePu(int node, Bus bus, ShortCircuitCase which) =>
        Of(node) is { } unit && unit.Terminals == node
            ? VoltageFactor.Of(bus, which) * (unit.Unit.Machine.RatedKv ?? bus.NominalKv) / bus.NominalKv
            : null;

    private Dictionary<int, InsideUnit> FindNodes()
    {
        var byNode = new Dictionary<int, InsideUnit>();
        var circuit = _networks.Circuit;
        var branchOf = Enumerable.Range(0, circuit.Branches.Length)
            .Where(i => circuit.Network.Elements[circuit.Branches[i].Element] is Transformer one && _units.Of(one) is not null)
            .ToDictionary(i => ((Transformer)circuit.Network.Elements[circuit.Branches[i].Element]).Id);
        for (var i = 0; i < circuit.Sources.Length; i++)
        {
            if (circuit.Network.Elements[circuit.Sources[i].Element] is not SynchronousMachine machine || _units.Of(machine) is not { } unit)
                continue;
            if (!branchOf.TryGetValue(unit.Transformer.Id, out var branch))
                continue;
            var inside = new InsideUnit(_networks, _sources, unit, branch, i);
            foreach (var node in NodesOf(circuit.Sources[i].Node, branch))
                byNode[node] = inside;
        }
        return byNode;
    }

    /// <summary>
    /// All nodes that the terminals reach without the unit transformer; the terminals alone where these lead to the grid by another way or to
    /// another machine, for which the standard gives no factors.
    /// </summary>
    private HashSet<int> NodesOf(int terminals, int unitBranch)
    {
        var reached = _graph.Value.Reached(terminals, (branch, _) => branch != unitBranch);
        var holders = _networks.Circuit.Sources.Count(source => reached.Contains(source.Node)
            && _networks.Circuit.Network.Elements[source.Element].Role == ElementRole.Source);
        return holders == 1 ? reached : [terminals];
    }
}

/// <summary>One power station unit's inside: what its other factors change, as an update of rank two of the solved network.</summary>
internal sealed class InsideUnit
{
    private readonly StudyNetworks _networks;
    private readonly Iec60909Sources _sources;
    private readonly int _branch;
    private readonly ConcurrentDictionary<NetworkVariant, Lazy<RankTwoUpdate>> _updates = new();
    private readonly ConcurrentDictionary<NetworkVariant, Lazy<SolvedNetwork>> _solved = new();
    private readonly ConcurrentDictionary<NetworkVariant, Lazy<SolvedNetwork>> _solvedForTransformer = new();

    public InsideUnit(StudyNetworks networks, Iec60909Sources sources, PowerStationUnit unit, int branch, int source)
    {
        _networks = networks;
        _sources = sources;
        _branch = branch;
        Unit = unit;
        Source = source;
        Terminals = networks.Circuit.Sources[source].Node;
    }

    /// <summary>The unit.</summary>
    public PowerStationUnit Unit { get; }

    /// <summary>The machine's place among the circuit's sources.</summary>
    public int Source { get; }

    /// <summary>The node of the machine's terminals.</summary>
    public int Terminals { get; }

    /// <summary>What the machine's impedance is multiplied with for faults inside, as it stands in the circuit with K_S.</summary>
    public double MachineRatio => Unit.MachineInside / Unit.Factor;

    /// <summary>Zkk with the factors for faults inside.</summary>
    public Complex Corrected(NetworkVariant variant, int node, Complex z) => z + Update(variant).Change(node, node);

    /// <summary>What the factors for faults inside change about Zki.</summary>
    public Complex Change(NetworkVariant variant, int k, int i) => Update(variant).Change(k, i);

    /// <summary>The whole network with the factors for faults inside.</summary>
    public SolvedNetwork Solved(FaultMethod method, NetworkVariant variant) =>
        _solved.GetOrAdd(variant, one => new Lazy<SolvedNetwork>(() => Solve(method, one, Unit.TransformerInside))).Value;

    /// <summary>
    /// The same with the unit transformer uncorrected, by which the standard finds the part of the current that flows through it (7.2): it is larger.
    /// </summary>
    public SolvedNetwork SolvedForTransformer(FaultMethod method, NetworkVariant variant) =>
        _solvedForTransformer.GetOrAdd(variant, one => new Lazy<SolvedNetwork>(() => Solve(method, one, 1.0))).Value;

    private SolvedNetwork Solve(FaultMethod method, NetworkVariant variant, double transformerFactor)
    {
        var sources = method.SourceImpedances(_networks.Circuit, variant, log: null);
        var branches = (Complex[])_networks.Circuit.BranchImpedances.Clone();
        sources[Source] *= MachineRatio;
        branches[_branch] *= transformerFactor / Unit.Factor;
        return SolvedNetwork.Of(_networks.Matrix, sources, branches, variant);
    }

    private RankTwoUpdate Update(NetworkVariant variant) =>
        _updates.GetOrAdd(variant, one => new Lazy<RankTwoUpdate>(() => Make(one))).Value;

    private RankTwoUpdate Make(NetworkVariant variant)
    {
        var circuit = _networks.Circuit;
        var branch = circuit.Branches[_branch];
        var solved = _networks.Of(variant);
        var machine = _sources.Impedance(circuit.Sources[Source].Element, variant, log: null).GetValueOrDefault();
        var transformer = NetworkAdmittances.AtFrequency(circuit.BranchImpedances[_branch], branch.Kind, variant.FrequencyRatio);
        Complex[] from = solved.Column(branch.From, out _), to = solved.Column(branch.To, out _);
        return new RankTwoUpdate(
            branch, Terminals, from, to, (1.0 / MachineRatio - 1.0) / machine, (Unit.Factor / Unit.TransformerInside - 1.0) / transformer);
    }
}

/// <summary>
/// Zbus after the admittance of one source and of one branch at its node have changed: Z′ = Z − Z·U·(I + C·UᵀZ·U)⁻¹·C·UᵀZ (Sherman,
/// Morrison, Woodbury), with U = [e at the source, ta·e − tb·e of the branch].
/// </summary>
internal sealed class RankTwoUpdate
{
    private readonly Complex[] _source;
    private readonly Complex[] _branch;
    private readonly Complex _m11;
    private readonly Complex _m12;
    private readonly Complex _m22;

    public RankTwoUpdate(in CircuitBranch branch, int source, Complex[] from, Complex[] to, Complex sourceChange, Complex branchChange)
    {
        _source = source == branch.From ? from : to;
        _branch = new Complex[from.Length];
        for (var k = 0; k < from.Length; k++)
            _branch[k] = branch.FromRatio * from[k] - branch.ToRatio * to[k];
        Complex a11 = _source[source], a12 = _branch[source];
        var a22 = branch.FromRatio * _branch[branch.From] - branch.ToRatio * _branch[branch.To];
        var determinant = (1.0 + sourceChange * a11) * (1.0 + branchChange * a22) - sourceChange * a12 * branchChange * a12;
        _m11 = (1.0 + branchChange * a22) * sourceChange / determinant;
        _m12 = -sourceChange * a12 * branchChange / determinant;
        _m22 = (1.0 + sourceChange * a11) * branchChange / determinant;
    }

    /// <summary>Z′ki − Zki.</summary>
    public Complex Change(int k, int i) =>
        -(_source[k] * (_m11 * _source[i] + _m12 * _branch[i]) + _branch[k] * (_m12 * _source[i] + _m22 * _branch[i]));
}
