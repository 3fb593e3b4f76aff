using System.Numerics;

namespace NetFault;

/// <summary>The R/X of the branches and sources in each connected part of a circuit, machines with R_Gf (IEC 60909-0:2016, 8.1.2, method (a)).</summary>
internal sealed class SmallestRatios
{
    private readonly Dictionary<int, (double Smallest, double Largest)> _byIsland = [];
    private readonly int[] _islandOfNode;

    public SmallestRatios(Circuit circuit, Iec60909Sources sources)
    {
        _islandOfNode = Islands.OfNodes(circuit);
        for (var i = 0; i < circuit.Branches.Length; i++)
            Add(circuit.Branches[i].From, circuit.BranchImpedances[i]);
        foreach (var source in circuit.Sources)
        {
            if (sources.Impedance(source.Element, Iec60909.PeakAtRatedFrequency, log: null) is { } z)
                Add(source.Node, z);
        }
    }

    /// <summary>The smallest R/X in a node's part as X/R.</summary>
    public ReactanceRatio At(int node) => ReactanceRatio.Of(_byIsland[_islandOfNode[node]].Smallest, 1.0);

    /// <summary>Whether every branch and source in a node's part has R/X below a limit.</summary>
    public bool AllBelow(int node, double limit) => _byIsland[_islandOfNode[node]].Largest < limit;

    /// <summary>Legs and capacitors without positive reactance are no branches that a ratio could be read from.</summary>
    private void Add(int node, Complex z)
    {
        if (z.Imaginary <= 0.0)
            return;
        var ratio = z.Real / z.Imaginary;
        _byIsland[_islandOfNode[node]] = _byIsland.TryGetValue(_islandOfNode[node], out var known)
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
