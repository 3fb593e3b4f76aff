using System.Numerics;

namespace NetFault;

/// <summary>The assumptions of a study, gathered when somebody first asks: the numbers do not wait for texts.</summary>
internal sealed class StudyAssumptions
{
    private readonly Network _network;
    private readonly FaultMethod _method;
    private readonly Lazy<(IReadOnlyList<Assumption> All, Dictionary<int, IReadOnlyList<Assumption>> OfIsland)> _gathered;

    public StudyAssumptions(Network network, FaultMethod method)
    {
        _network = network;
        _method = method;
        _gathered = new(Gather);
    }

    /// <summary>All of them.</summary>
    public IReadOnlyList<Assumption> All => _gathered.Value.All;

    /// <summary>Those in the connected part of the network in which a bus lies.</summary>
    public IReadOnlyList<Assumption> OfBus(int bus) =>
        _gathered.Value.OfIsland.TryGetValue(IslandOfBus(bus), out var list) ? list : [];

    private (IReadOnlyList<Assumption> All, Dictionary<int, IReadOnlyList<Assumption>> OfIsland) Gather()
    {
        var log = new AssumptionLog();
        var circuit = CircuitBuilder.Build(_network, _method.BranchRules(_network), log);
        foreach (var variant in _method.Networks)
            _method.SourceImpedances(circuit, variant, log);
        _method.LogOverTime(circuit, log);
        if (_method.RatioRule == XOverRRule.SeparateNetworks)
            LogShares(circuit, log);
        var entries = log.Entries.Distinct().ToList();
        var ofIsland = entries
            .GroupBy(entry => IslandOfBus(FirstBus(entry.Element)))
            .ToDictionary(group => group.Key, group => (IReadOnlyList<Assumption>)group.Select(entry => entry.Assumption).ToList().AsReadOnly());
        return (entries.Select(entry => entry.Assumption).ToList().AsReadOnly(), ofIsland);
    }

    /// <summary>Elements without resistance, or without reactance, get a share of the other one in the separate networks.</summary>
    private void LogShares(Circuit circuit, AssumptionLog log)
    {
        for (var i = 0; i < circuit.Branches.Length; i++)
        {
            if (circuit.Branches[i].Kind == BranchKind.Series)
                LogShare(circuit.BranchImpedances[i], _network.Elements[circuit.Branches[i].Element], log);
            else if (circuit.Branches[i].Kind == BranchKind.StarFirst && NetworkAdmittances.StarHasNoResistance(circuit.BranchImpedances, i))
                LogShare(new(0.0, 1.0), _network.Elements[circuit.Branches[i].Element], log);
        }
        var sources = _method.SourceImpedances(circuit, _method.Networks[0], log: null);
        for (var i = 0; i < sources.Length; i++)
        {
            if (sources[i] is { } impedance)
                LogShare(impedance, _network.Elements[circuit.Sources[i].Element], log);
        }
    }

    private static void LogShare(Complex impedance, NetworkElement element, AssumptionLog log)
    {
        if (NetworkAdmittances.IsAssumed(impedance, ImpedancePart.Resistance))
            log.Add(element, "r", "no resistance; R = |X|/200 assumed in the network of the resistances alone");
        if (NetworkAdmittances.IsAssumed(impedance, ImpedancePart.Reactance))
            log.Add(element, "x", "no reactance; X = R/200 assumed in the network of the reactances alone");
    }

    private int FirstBus(NetworkElement element) =>
        _network.Topology.FindBus(element.Terminals.First(id => id is not null)!);

    private int IslandOfBus(int bus) => _network.Topology.IslandOfNode(_network.Topology.NodeOfBus[bus]);
}
