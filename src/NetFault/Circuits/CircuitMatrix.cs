using System.Numerics;
using NetFault.Sparse;

namespace NetFault;

/// <summary>Where a circuit's branches stand in its admittance matrix, with the matrix's symbolic factor: made once for all its networks.</summary>
internal sealed class CircuitMatrix
{
    /// <summary>Below this share of the smallest branch impedance an impedance is rounding.</summary>
    private const double Resonance = 1e-12;

    private CircuitMatrix(Circuit circuit, int[] slotOfBranch, SymbolicFactor symbolic)
    {
        Circuit = circuit;
        SlotOfBranch = slotOfBranch;
        Symbolic = symbolic;
    }

    /// <summary>The circuit.</summary>
    public Circuit Circuit { get; }

    /// <summary>The slot of each branch in the matrix's pattern; −1 for a branch with both ends at one node.</summary>
    public int[] SlotOfBranch { get; }

    /// <summary>Ordering and pattern of the factor.</summary>
    public SymbolicFactor Symbolic { get; }

    /// <summary>Finds the places and analyses the pattern.</summary>
    public static CircuitMatrix Of(Circuit circuit)
    {
        var branches = circuit.Branches;
        int[] from = new int[branches.Length], to = new int[branches.Length], edge = new int[branches.Length];
        var edges = 0;
        for (var i = 0; i < branches.Length; i++)
        {
            if (branches[i].From == branches[i].To)
                continue;
            from[edges] = branches[i].From;
            to[edges] = branches[i].To;
            edge[edges++] = i;
        }
        var slotOfEdge = new int[edges];
        var pattern = SymmetricPattern.FromEdges(circuit.NodeCount, from.AsSpan(0, edges), to.AsSpan(0, edges), slotOfEdge);
        return new CircuitMatrix(circuit, Spread(slotOfEdge, edge, branches.Length), SymbolicFactor.Analyze(pattern));
    }

    /// <summary>Factors one network.</summary>
    /// <exception cref="SingularNetworkException">The matrix is singular to working precision.</exception>
    public LdlFactor Factor(AdmittanceValues values) => Guarded(() => Symbolic.Factor(values.Diagonal, values.OffDiagonal));

    /// <summary>Runs a step of the solver and says its refusal in the network's words.</summary>
    public T Guarded<T>(Func<T> step)
    {
        try
        {
            return step();
        }
        catch (SingularMatrixException singular)
        {
            throw new SingularNetworkException(BusesOf(singular.Node), Circuit.HasNegativeReactance, singular);
        }
    }

    /// <summary>
    /// Refuses a network that has no impedance seen from one of these nodes: reactances of opposite sign are in resonance there, so that Zkk
    /// is 0 but for rounding against the impedances of the branches at the node.
    /// </summary>
    /// <exception cref="SingularNetworkException">There is such a node.</exception>
    public void RefuseResonance(AdmittanceValues values, ReadOnlySpan<Complex> impedances, int firstNode = 0)
    {
        if (!Circuit.HasNegativeReactance)
            return;
        var largest = values.LargestAdmittances(Circuit);
        for (var i = 0; i < impedances.Length; i++)
        {
            if (Complex.Abs(impedances[i]) * largest[firstNode + i] < Resonance)
                throw new SingularNetworkException(BusesOf(firstNode + i), hasNegativeReactance: true, null);
        }
    }

    private IReadOnlyList<string> BusesOf(int node) =>
        Circuit.Network.Buses.Where((_, bus) => Circuit.NodeOfBus[bus] == node).Select(bus => bus.Id).ToList();

    private static int[] Spread(int[] slotOfEdge, int[] edge, int branches)
    {
        var slotOfBranch = new int[branches];
        for (var i = 0; i < branches; i++)
            slotOfBranch[i] = -1;
        for (var i = 0; i < slotOfEdge.Length; i++)
            slotOfBranch[edge[i]] = slotOfEdge[i];
        return slotOfBranch;
    }
}
