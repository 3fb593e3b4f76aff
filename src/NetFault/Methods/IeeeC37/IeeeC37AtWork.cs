namespace NetFault;

/// <summary>IEEE Std C37.010 at work on one study: what the currents at all buses share, each part made when it is first needed.</summary>
internal sealed class IeeeC37AtWork : CurrentsOfMethod
{
    private readonly Lazy<bool[]> _isHeldAtThirtyCycles;
    private readonly Lazy<CircuitGraph> _graph;

    public IeeeC37AtWork(IeeeC37 method, StudyNetworks networks)
    {
        Method = method;
        Networks = networks;
        Injected = new InjectedCurrents(networks);
        _isHeldAtThirtyCycles = new(() => IeeeC37Sources.NodesHeldAtThirtyCycles(Circuit));
        _graph = new(() => new CircuitGraph(Circuit));
    }

    /// <summary>The method's options.</summary>
    public IeeeC37 Method { get; }

    /// <summary>The study's networks.</summary>
    public StudyNetworks Networks { get; }

    /// <summary>The circuit.</summary>
    public Circuit Circuit => Networks.Circuit;

    /// <summary>What sources with a current of their own add.</summary>
    public InjectedCurrents Injected { get; }

    /// <summary>The circuit as a graph.</summary>
    public CircuitGraph Graph => _graph.Value;

    public override FaultCurrents At(StudyContext context, int bus, in SeenImpedances seen) =>
        new IeeeC37Currents(this, context, context.Network.Buses[bus], seen);

    public override FlowBasis FlowsAt(StudyContext context, int bus, FaultInstant instant)
    {
        var network = Networks.At(instant);
        return instant == FaultInstant.SteadyState && !IsHeldAtThirtyCycles(Circuit.NodeOfBus[bus])
            ? FlowBasis.Of(network, 0.0)
            : FlowBasis.Of(network, Method.PrefaultVoltagePu, Injected.Of(instant));
    }

    /// <summary>Whether a feeder or a generator holds a node's voltage in the 30-cycle network.</summary>
    public bool IsHeldAtThirtyCycles(int node) => _isHeldAtThirtyCycles.Value[node];
}
