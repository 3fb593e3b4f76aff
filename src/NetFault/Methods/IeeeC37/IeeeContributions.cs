using System.Numerics;

namespace NetFault;

/// <summary>What a source is to a fault by IEEE Std C37.010.</summary>
public enum IeeeContributionKind
{
    /// <summary>A network feeder: no AC decay.</summary>
    Feeder,

    /// <summary>A generator or condenser through two or more transformations and an external reactance of at least 1.5 times x″d.</summary>
    RemoteGenerator,

    /// <summary>
    /// A generator or condenser through at most one transformation, or with an external reactance of less than 1.5 times x″d.
    /// </summary>
    LocalGenerator,

    /// <summary>A synchronous or asynchronous motor, or a drive that feeds back; its decay is in its multiplier.</summary>
    Motor,

    /// <summary>A doubly fed generator or a source behind a full-size converter; no decay is credited.</summary>
    Converter,
}

/// <summary>A source's contribution to the interrupting current of a fault.</summary>
/// <param name="Section">The source's section, such as <c>synchronous_machines</c>.</param>
/// <param name="Id">The source's id.</param>
/// <param name="BusId">Its bus.</param>
/// <param name="Kind">What it is to this fault.</param>
/// <param name="CurrentKa">
/// The magnitude of its current at its own bus in kA, by superposition without sources of their own current.
/// </param>
/// <param name="Share">Its share of the fault's current, by the part in phase with that; all shares add to 1.</param>
/// <param name="Transformations">The fewest transformations on a way from it to the fault.</param>
/// <param name="ExternalReactanceRatio">
/// The external over its own impedance: its current at its terminals over that in this fault, less 1. 1.5 is the same as 0.4 of the
/// current at its terminals. In meshed networks the impedance that the others' currents make larger. Infinite where it does not feed the
/// fault; 0 for sources of their own current.
/// </param>
public sealed record IeeeContribution(
    string Section, string Id, string BusId, IeeeContributionKind Kind, double CurrentKa, double Share, int Transformations,
    double ExternalReactanceRatio);

/// <summary>The contributions to one fault, from one column of the interrupting network's Zbus.</summary>
internal sealed class IeeeContributions
{
    /// <summary>C37.010: remote is an external reactance of at least 1.5 times x″d, behind more than one transformation.</summary>
    private const double RemoteFromRatio = 1.5;

    private readonly IeeeC37AtWork _work;
    private readonly Circuit _circuit;
    private readonly int[] _transformations;

    private IeeeContributions(IeeeC37AtWork work, IeeeC37Currents fault)
    {
        _work = work;
        _circuit = work.Circuit;
        _transformations = TransformationsFrom(fault.Node);
        All = Find(fault).AsReadOnly();
    }

    /// <summary>All of them, in the order of the circuit's sources.</summary>
    public IReadOnlyList<IeeeContribution> All { get; }

    /// <summary>The contributions to a fault.</summary>
    public static IeeeContributions Of(IeeeC37AtWork work, IeeeC37Currents fault) => new(work, fault);

    /// <summary>The share of a kind.</summary>
    public double ShareOf(IeeeContributionKind kind) => All.Where(one => one.Kind == kind).Sum(one => one.Share);

    private List<IeeeContribution> Find(IeeeC37Currents fault)
    {
        var network = _work.Networks.At(FaultInstant.Transient);
        var column = network.Column(fault.Node, out _);
        var seen = fault.Impedance(FaultInstant.Transient);
        // Per unit at each source, for a fault current of 1 through the impedance; off-nominal ratios leave a sum near 1, not 1.
        var own = new Complex[_circuit.Sources.Length];
        for (var i = 0; i < own.Length; i++)
            own[i] = network.Values.Sources[i] * column[_circuit.Sources[i].Node];
        var sum = own.Sum(one => one.Real);
        var injected = _work.Injected.Of(FaultInstant.Transient).ToDictionary(one => one.Source, one => one.CurrentPu);
        var driven = _work.Method.PrefaultVoltagePu / Complex.Abs(seen);
        var total = driven + injected.Sum(one => one.Value * AtFault(one.Key));
        var found = new List<IeeeContribution>();
        for (var i = 0; i < own.Length; i++)
        {
            if (injected.TryGetValue(i, out var current))
                found.Add(Contribution(i, current, current * AtFault(i) / total, 0.0));
            else if (own[i] != Complex.Zero)
            {
                var external = Complex.Abs(seen) / Voltage(i) - 1.0;
                found.Add(Contribution(i, Complex.Abs(own[i]) * driven, own[i].Real / sum * driven / total, external));
            }
        }
        return found;

        double Voltage(int source) => Complex.Abs(column[_circuit.Sources[source].Node]);
        double AtFault(int source) => Voltage(source) / Complex.Abs(seen);
    }

    private IeeeContribution Contribution(int source, double currentPu, double share, double externalRatio)
    {
        var (element, node) = (_circuit.Sources[source].Element, _circuit.Sources[source].Node);
        var network = _circuit.Network;
        var bus = network.Buses[network.Topology.TerminalBus(element, 0)];
        var kind = network.Elements[element] switch
        {
            NetworkFeeder => IeeeContributionKind.Feeder,
            SynchronousMachine { Service: not SynchronousService.Motor } => IsRemote(_transformations[node], externalRatio)
                ? IeeeContributionKind.RemoteGenerator
                : IeeeContributionKind.LocalGenerator,
            DoublyFedGenerator or FullConverterSource => IeeeContributionKind.Converter,
            _ => IeeeContributionKind.Motor,
        };
        return new IeeeContribution(
            network.Elements[element].Section, network.Elements[element].Id, bus.Id, kind,
            currentPu * PerUnit.BaseKa(bus.NominalKv, network.BaseMva), share, _transformations[node], Math.Max(0.0, externalRatio));
    }

    private static bool IsRemote(int transformations, double externalRatio) => transformations > 1 && externalRatio >= RemoteFromRatio;

    /// <summary>
    /// The fewest transformations from a node to each, −1 for nodes it is not connected with: a breadth-first search by transformers.
    /// </summary>
    private int[] TransformationsFrom(int from)
    {
        var count = new int[_circuit.NodeCount];
        for (var i = 0; i < count.Length; i++)
            count[i] = -1;
        var open = new Stack<int>([from]);
        for (var level = 0; open.Count > 0; level++)
        {
            var beyond = new Stack<int>();
            while (open.Count > 0)
                Reach(open.Pop(), level, count, open, beyond);
            open = beyond;
        }
        return count;
    }

    private void Reach(int node, int level, int[] count, Stack<int> open, Stack<int> beyond)
    {
        if (count[node] >= 0)
            return;
        count[node] = level;
        for (var end = _work.Graph.Start(node); end < _work.Graph.End(node); end++)
        {
            var element = _circuit.Branches[_work.Graph.Branch(end)].Element;
            var isTransformer = _circuit.Network.Elements[element] is Transformer or ThreeWindingTransformer;
            (isTransformer ? beyond : open).Push(_work.Graph.Neighbour(node, end));
        }
    }
}
