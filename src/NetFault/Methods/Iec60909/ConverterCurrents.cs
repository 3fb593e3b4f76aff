using System.Numerics;

namespace NetFault;

/// <summary>
/// What sources behind full-size converters add to the fault current (IEC 60909-0:2016, 7.1 and 11): (1/Zk)·Σ Zkj·IskPFj, with absolute
/// values. One solve for each node with converters gives Zkj at every bus.
/// </summary>
internal sealed class ConverterCurrents
{
    private readonly StudyNetworks _networks;
    private readonly Lazy<double[]?> _initial;
    private readonly Lazy<double[]?> _steady;

    public ConverterCurrents(StudyNetworks networks, ShortCircuitCase which)
    {
        _networks = networks;
        var maximum = which == ShortCircuitCase.Maximum;
        _initial = new(() => Sum(Iec60909.Initial, source => source is FullConverterSource one ? maximum ? one.SourceCurrentKa : Least(one.SteadyStateKa) : 0.0));
        _steady = new(() => Sum(Iec60909.WithoutMotors, source => maximum ? Most(source) : Least(SteadyState(source))));
    }

    /// <summary>Σ |Zkj|·IskPFj per unit at a node.</summary>
    public double Initial(int node) => _initial.Value?[node] ?? 0.0;

    /// <summary>Σ |Zkj|·IkPFj per unit at a node, in the network without motors.</summary>
    public double SteadyState(int node) => _steady.Value?[node] ?? 0.0;

    /// <summary>Notes what is assumed of a source because it does not say it.</summary>
    public static void Log(FullConverterSource source, ShortCircuitCase which, AssumptionLog? log)
    {
        if (which == ShortCircuitCase.Minimum && source.SteadyStateKa?.Min is null)
            log?.Add(source, "steady_state_ka.min", "left out in the minimum case: no smallest current is given");
        else if (which == ShortCircuitCase.Maximum && source.SteadyStateKa is null)
            log?.Add(source, "steady_state_ka", "the source current is kept for the steady state");
    }

    /// <summary>In the minimum case only what is there at the least counts.</summary>
    private static double Least(MaxMin? steadyState) => steadyState?.Min ?? 0.0;

    private static double Most(NetworkElement source) =>
        SteadyState(source)?.Max ?? (source is FullConverterSource converter ? converter.SourceCurrentKa : 0.0);

    /// <summary>The steady-state current of a source that gives one: full-size converters and doubly fed generators.</summary>
    private static MaxMin? SteadyState(NetworkElement source) => source switch
    {
        FullConverterSource converter => converter.SteadyStateKa,
        DoublyFedGenerator generator => generator.SteadyStateKa,
        _ => null,
    };

    private double[]? Sum(NetworkVariant variant, Func<NetworkElement, double> currentKa)
    {
        var network = _networks.Circuit.Network;
        var perNode = new Dictionary<int, double>();
        foreach (var source in _networks.Circuit.Sources)
        {
            var current = currentKa(network.Elements[source.Element]);
            if (current <= 0.0)
                continue;
            var bus = network.Buses[network.Topology.TerminalBus(source.Element, 0)];
            current /= PerUnit.BaseKa(bus.NominalKv, network.BaseMva);
            perNode[source.Node] = (perNode.TryGetValue(source.Node, out var sum) ? sum : 0.0) + current;
        }
        return perNode.Count == 0 ? null : Sum(_networks.Of(variant), perNode);
    }

    private double[] Sum(SolvedNetwork solved, Dictionary<int, double> perNode)
    {
        var total = new double[_networks.Circuit.NodeCount];
        foreach (var (node, current) in perNode.Select(pair => (pair.Key, pair.Value)))
        {
            var column = solved.Column(node, out _);
            for (var k = 0; k < total.Length; k++)
                total[k] += Complex.Abs(column[k]) * current;
        }
        return total;
    }
}
