using System.Numerics;

namespace NetFault;

/// <summary>
/// What sources behind full-size converters add to the fault current (IEC 60909-0:2016, 7.1 and 11): (1/Zk)·Σ Zkj·IskPFj, with absolute
/// values. One solve for each node with converters gives Zkj at every bus.
/// </summary>
internal sealed class ConverterCurrents
{
    private readonly StudyNetworks _networks;
    private readonly bool _maximum;
    private readonly Lazy<double[]?> _initial;
    private readonly Lazy<double[]?> _steady;

    public ConverterCurrents(StudyNetworks networks, ShortCircuitCase which)
    {
        _networks = networks;
        _maximum = which == ShortCircuitCase.Maximum;
        _initial = new(() => Sum(Iec60909.Initial, FaultInstant.Initial));
        _steady = new(() => Sum(Iec60909.WithoutMotors, FaultInstant.SteadyState));
    }

    /// <summary>Σ |Zkj|·Ij per unit at a node, with the currents of an instant, in the network of that instant or in that without motors.</summary>
    /// <param name="node">k.</param>
    /// <param name="instant">The instant.</param>
    /// <param name="variant">The network.</param>
    /// <param name="inside">The power station unit inside which the node lies, or null.</param>
    public double At(int node, FaultInstant instant, NetworkVariant variant, InsideUnit? inside)
    {
        var table = (instant == FaultInstant.Initial ? _initial : _steady).Value;
        if (table is null)
            return 0.0;
        if (inside is null && variant.Instant == instant)
            return table[node];
        var column = _networks.Of(variant).Column(node, out _);
        return Injections(instant).Sum(injection =>
        {
            var at = _networks.Circuit.Sources[injection.Source].Node;
            return Complex.Abs(column[at] + (inside?.Change(variant, node, at) ?? Complex.Zero)) * injection.CurrentPu;
        });
    }

    /// <summary>Notes what is assumed of a source because it does not say it.</summary>
    public static void Log(FullConverterSource source, ShortCircuitCase which, AssumptionLog? log)
    {
        if (which == ShortCircuitCase.Minimum && source.SteadyStateKa?.Min is null)
            log?.Add(source, "steady_state_ka.min", "left out in the minimum case: no smallest current is given");
        else if (which == ShortCircuitCase.Maximum && source.SteadyStateKa is null)
            log?.Add(source, "steady_state_ka", "the source current is kept for the steady state");
    }

    /// <summary>The currents of their own that sources feed at an instant, per unit at their buses.</summary>
    public IReadOnlyList<(int Source, double CurrentPu)> Injections(FaultInstant instant)
    {
        var network = _networks.Circuit.Network;
        var injections = new List<(int Source, double CurrentPu)>();
        for (var i = 0; i < _networks.Circuit.Sources.Length; i++)
        {
            var element = _networks.Circuit.Sources[i].Element;
            var currentKa = CurrentKa(network.Elements[element], instant);
            if (currentKa > 0.0)
                injections.Add((i, currentKa / PerUnit.BaseKa(network.Buses[network.Topology.TerminalBus(element, 0)].NominalKv, network.BaseMva)));
        }
        return injections;
    }

    /// <summary>In the minimum case only what is there at the least counts.</summary>
    private double CurrentKa(NetworkElement source, FaultInstant instant) => (source, instant) switch
    {
        (FullConverterSource converter, FaultInstant.Initial) => _maximum ? converter.SourceCurrentKa : Least(converter.SteadyStateKa),
        (FullConverterSource converter, _) => _maximum ? converter.SteadyStateKa?.Max ?? converter.SourceCurrentKa : Least(converter.SteadyStateKa),
        (DoublyFedGenerator generator, FaultInstant.SteadyState) => _maximum ? generator.SteadyStateKa?.Max ?? 0.0 : Least(generator.SteadyStateKa),
        _ => 0.0,
    };

    private static double Least(MaxMin? steadyState) => steadyState?.Min ?? 0.0;

    private double[]? Sum(NetworkVariant variant, FaultInstant instant)
    {
        var perNode = Injections(instant)
            .GroupBy(injection => _networks.Circuit.Sources[injection.Source].Node, injection => injection.CurrentPu)
            .ToDictionary(group => group.Key, group => group.Sum());
        return perNode.Count == 0 ? null : Sum(_networks.Of(variant), perNode);
    }

    private double[] Sum(SolvedNetwork solved, Dictionary<int, double> perNode)
    {
        var total = new double[_networks.Circuit.NodeCount];
        foreach (var pair in perNode)
        {
            var column = solved.Column(pair.Key, out _);
            for (var k = 0; k < total.Length; k++)
                total[k] += Complex.Abs(column[k]) * pair.Value;
        }
        return total;
    }
}
