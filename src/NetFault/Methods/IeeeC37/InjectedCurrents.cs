using System.Collections.Concurrent;
using System.Numerics;

namespace NetFault;

/// <summary>
/// What sources that feed a current of their own add to a fault's current: (1/Zk)·Σ|Zkj|·Ij, with absolute values. IEEE Std C37.010 has no
/// such sources; this is the rule of IEC 60909-0:2016, an upper bound of their part. One solve for each node with such sources.
/// </summary>
internal sealed class InjectedCurrents
{
    private readonly StudyNetworks _networks;
    private readonly ConcurrentDictionary<NetworkVariant, Lazy<double[]?>> _tables = new();

    public InjectedCurrents(StudyNetworks networks) => _networks = networks;

    /// <summary>Notes how a source behind a full-size converter is taken.</summary>
    public static void Log(FullConverterSource source, AssumptionLog? log)
    {
        log?.Add(source, "source_current_ka",
            "IEEE C37.010 has no current sources; the current is added in phase at the fault (IEC 60909-0), "
            + "in the first-cycle and interrupting networks");
        LogSteadyState(source, source.SteadyStateKa, log);
    }

    /// <summary>Notes that a source is left out of the 30-cycle network.</summary>
    public static void LogSteadyState(NetworkElement source, MaxMin? steadyStateKa, AssumptionLog? log)
    {
        if (steadyStateKa?.Min is null)
            log?.Add(source, "steady_state_ka.min", "left out of the 30-cycle network: no smallest current is given");
    }

    /// <summary>The currents that sources feed in the network of an instant, per unit at their buses.</summary>
    public IReadOnlyList<(int Source, double CurrentPu)> Of(FaultInstant instant)
    {
        var network = _networks.Circuit.Network;
        var injections = new List<(int Source, double CurrentPu)>();
        for (var i = 0; i < _networks.Circuit.Sources.Length; i++)
        {
            var element = _networks.Circuit.Sources[i].Element;
            var currentKa = CurrentKa(network.Elements[element], instant);
            var kv = network.Buses[network.Topology.TerminalBus(element, 0)].NominalKv;
            if (currentKa > 0.0)
                injections.Add((i, currentKa / PerUnit.BaseKa(kv, network.BaseMva)));
        }
        return injections;
    }

    /// <summary>Σ|Zkj|·Ij per unit at a node in a network.</summary>
    public double At(int node, NetworkVariant variant) =>
        _tables.GetOrAdd(variant, one => new Lazy<double[]?>(() => Table(one))).Value is { } table ? table[node] : 0.0;

    /// <summary>At 30 cycles the smallest steady-state current: that network is for relays, which must pick up.</summary>
    private static double CurrentKa(NetworkElement source, FaultInstant instant) => (source, instant) switch
    {
        (FullConverterSource converter, FaultInstant.SteadyState) => converter.SteadyStateKa?.Min ?? 0.0,
        (FullConverterSource converter, _) => converter.SourceCurrentKa,
        (DoublyFedGenerator generator, FaultInstant.SteadyState) => generator.SteadyStateKa?.Min ?? 0.0,
        _ => 0.0,
    };

    private double[]? Table(NetworkVariant variant)
    {
        var injections = Of(variant.Instant);
        if (injections.Count == 0)
            return null;
        var total = new double[_networks.Circuit.NodeCount];
        foreach (var atNode in injections.GroupBy(one => _networks.Circuit.Sources[one.Source].Node, one => one.CurrentPu))
        {
            var column = _networks.Of(variant).Column(atNode.Key, out _);
            var current = atNode.Sum();
            for (var k = 0; k < total.Length; k++)
                total[k] += Complex.Abs(column[k]) * current;
        }
        return total;
    }
}
