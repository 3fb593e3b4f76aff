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
    private readonly Lazy<double[]?> _steadyMax;
    private readonly Lazy<double[]?> _steadyMin;

    public ConverterCurrents(StudyNetworks networks)
    {
        _networks = networks;
        _initial = new(() => Sum(Iec60909.Initial, source => source.SourceCurrentKa));
        _steadyMax = new(() => Sum(Iec60909.WithoutMotors, source => source.SteadyStateKa?.Max ?? source.SourceCurrentKa));
        _steadyMin = new(() => Sum(Iec60909.WithoutMotors, source => source.SteadyStateKa?.Min ?? source.SteadyStateKa?.Max ?? source.SourceCurrentKa));
    }

    /// <summary>Σ |Zkj|·IskPFj per unit at a node.</summary>
    public double Initial(int node) => _initial.Value?[node] ?? 0.0;

    /// <summary>Σ |Zkj|·IkPFj per unit at a node, in the network without motors.</summary>
    public double SteadyState(int node, ShortCircuitCase which) =>
        (which == ShortCircuitCase.Maximum ? _steadyMax : _steadyMin).Value?[node] ?? 0.0;

    private double[]? Sum(NetworkVariant variant, Func<FullConverterSource, double> currentKa)
    {
        var network = _networks.Circuit.Network;
        var perNode = new Dictionary<int, double>();
        foreach (var source in _networks.Circuit.Sources)
        {
            if (network.Elements[source.Element] is not FullConverterSource converter)
                continue;
            var bus = network.Buses[network.Topology.TerminalBus(source.Element, 0)];
            var current = currentKa(converter) / PerUnit.BaseKa(bus.NominalKv, network.BaseMva);
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
