using System.Numerics;
using NetFault.Sparse;

namespace NetFault.Benchmarks.Kernel;

/// <summary>A nodal admittance matrix to measure with.</summary>
internal sealed class GridMatrix
{
    public GridMatrix(string name, int order, IReadOnlyList<(int From, int To, Complex Admittance)> branches, Complex[] toGround)
    {
        Name = name;
        int[] from = [.. branches.Select(b => b.From)], to = [.. branches.Select(b => b.To)], slots = new int[branches.Count];
        Pattern = SymmetricPattern.FromEdges(order, from, to, slots);
        Diagonal = (Complex[])toGround.Clone();
        OffDiagonal = new Complex[Pattern.SlotCount];
        for (int e = 0; e < branches.Count; e++)
        {
            Diagonal[from[e]] += branches[e].Admittance;
            Diagonal[to[e]] += branches[e].Admittance;
            OffDiagonal[slots[e]] -= branches[e].Admittance;
        }
    }

    public string Name { get; }

    public SymmetricPattern Pattern { get; }

    public int Order => Pattern.Order;

    public Complex[] Diagonal { get; }

    public Complex[] OffDiagonal { get; }
}
