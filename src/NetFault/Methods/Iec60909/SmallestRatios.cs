using System.Numerics;

namespace NetFault;

/// <summary>The R/X of the branches and sources in each connected part of a circuit, machines with R_Gf (IEC 60909-0:2016, 8.1.2, method (a)).</summary>
internal sealed class SmallestRatios
{
    private readonly Dictionary<int, (double Smallest, double Largest)> _withMotors = [];
    private readonly Dictionary<int, (double Smallest, double Largest)> _withoutMotors = [];
    private readonly int[] _islandOfNode;

    public SmallestRatios(Circuit circuit, Iec60909Sources sources)
    {
        _islandOfNode = Islands.OfNodes(circuit);
        for (var i = 0; i < circuit.Branches.Length; i++)
        {
            Add(_withMotors, circuit.Branches[i].From, circuit.BranchImpedances[i]);
            Add(_withoutMotors, circuit.Branches[i].From, circuit.BranchImpedances[i]);
        }
        foreach (var source in circuit.Sources)
        {
            Add(_withMotors, source.Node, sources.Impedance(source.Element, Iec60909.PeakAtRatedFrequency, log: null));
            Add(_withoutMotors, source.Node, sources.Impedance(
                source.Element, Iec60909.PeakAtRatedFrequency with { Instant = FaultInstant.SteadyState }, log: null));
        }
    }

    /// <summary>The smallest R/X in a node's part as X/R.</summary>
    public ReactanceRatio At(int node, bool withMotors) =>
        ReactanceRatio.Of((withMotors ? _withMotors : _withoutMotors)[_islandOfNode[node]].Smallest, 1.0);

    /// <summary>Whether every branch and source in a node's part has R/X below a limit.</summary>
    public bool AllBelow(int node, double limit, bool withMotors) =>
        (withMotors ? _withMotors : _withoutMotors)[_islandOfNode[node]].Largest < limit;

    /// <summary>
    /// Legs and capacitors of negative reactance are no branches that a ratio could be read from; a branch without any has an infinite one.
    /// </summary>
    private void Add(Dictionary<int, (double Smallest, double Largest)> ratios, int node, Complex? impedance)
    {
        if (impedance is not { Imaginary: >= 0.0 } z)
            return;
        var ratio = z.Imaginary > 0.0 ? z.Real / z.Imaginary : double.PositiveInfinity;
        ratios[_islandOfNode[node]] = ratios.TryGetValue(_islandOfNode[node], out var known)
            ? (Math.Min(known.Smallest, ratio), Math.Max(known.Largest, ratio))
            : (ratio, ratio);
    }
}

/// <summary>The connected parts of a circuit.</summary>
internal static class Islands
{
    /// <summary>The part of each node, as the network numbers them.</summary>
    public static int[] OfNodes(Circuit circuit)
    {
        var topology = circuit.Network.Topology;
        var island = new int[circuit.NodeCount];
        for (var bus = 0; bus < circuit.NodeOfBus.Length; bus++)
        {
            if (circuit.NodeOfBus[bus] >= 0)
                island[circuit.NodeOfBus[bus]] = topology.IslandOfNode(topology.NodeOfBus[bus]);
        }
        return island;
    }
}
