using System.Numerics;

namespace NetFault.Sparse;

/// <summary>
/// The large entries of single columns of Z = A⁻¹: those with |Z_ki| above a share of |Z_kk|. Back substitution comes down the
/// elimination tree from the root; a subtree is left out where a bound on all entries in it, from the entries above it, is below the
/// share. The bound: x_j = −Σ L_kj·x_k over ancestors k of j, so |x_j| ≤ s_j·max|x_k| with s_j = Σ|L_kj|, and so on downwards. Nothing above
/// the share is missed.
/// </summary>
internal sealed class PrunedColumns
{
    private readonly LdlFactor _factor;
    private readonly double[] _magnitude;   // |Z_jj| by place
    private readonly double[] _reach;       // largest |x_d|/|Z_dd| in the subtree of j for max|x_k| = 1 above it, by place
    private readonly int[] _firstChild;     // by place, −1 without
    private readonly int[] _nextSibling;

    private PrunedColumns(LdlFactor factor, ReadOnlySpan<Complex> inverseDiagonal)
    {
        var symbolic = factor.Symbolic;
        _factor = factor;
        _magnitude = new double[factor.Order];
        for (var node = 0; node < inverseDiagonal.Length; node++)
            _magnitude[symbolic.PlaceOf[node]] = Complex.Abs(inverseDiagonal[node]);
        (_firstChild, _nextSibling) = Children(symbolic.Parent);
        _reach = FindReach();
    }

    /// <summary>Prepares the bounds: O(entries of L).</summary>
    /// <param name="factor">The factor of A.</param>
    /// <param name="inverseDiagonal">Z_kk by node.</param>
    public static PrunedColumns Of(LdlFactor factor, ReadOnlySpan<Complex> inverseDiagonal) => new(factor, inverseDiagonal);

    /// <summary>Finds the entries of column i with |Z_ki| above a share of |Z_kk|.</summary>
    /// <param name="node">i, in original numbering.</param>
    /// <param name="share">The share, above 0.</param>
    /// <param name="found">Out: k and Z_ki are added.</param>
    /// <param name="scratch">The calling thread's own.</param>
    public void Find(int node, double share, List<(int Node, Complex Value)> found, Scratch scratch)
    {
        if (_factor.Correction is not null)
        {
            FindInWhole(node, share, found, scratch);
            return;
        }
        var place = _factor.Symbolic.PlaceOf[node];
        SolvePath(place, scratch);
        for (var i = scratch.Path.Count - 1; i >= 0; i--)
        {
            var j = scratch.Path[i];
            Report(j, share, found, scratch);
            Descend(j, i > 0 ? scratch.Path[i - 1] : EliminationTree.None, share, found, scratch);
        }
        foreach (var visited in scratch.Touched)
            scratch.X[visited] = Complex.Zero;
        scratch.Touched.Clear();
        scratch.Path.Clear();
    }

    /// <summary>With shifted pivots the factor alone does not give Z: the whole column is solved.</summary>
    private void FindInWhole(int node, double share, List<(int Node, Complex Value)> found, Scratch scratch)
    {
        var column = new Complex[_factor.Order];
        _factor.SolveUnit(node, column, scratch.Solve.Value);
        for (var k = 0; k < column.Length; k++)
        {
            if (Complex.Abs(column[k]) > share * _magnitude[_factor.Symbolic.PlaceOf[k]])
                found.Add((k, column[k]));
        }
    }

    /// <summary>The path from a place to its root: forward substitution up it, then x = D⁻¹·y − Lᵀ·x down it.</summary>
    private void SolvePath(int place, Scratch scratch)
    {
        var x = scratch.X;
        x[place] = Complex.One;
        for (var j = place; j != EliminationTree.None; j = _factor.Symbolic.Parent[j])
        {
            scratch.Path.Add(j);
            scratch.Touched.Add(j);
            for (var p = _factor.Symbolic.ColumnStart[j]; p < _factor.Symbolic.ColumnStart[j + 1]; p++)
                x[_factor.Symbolic.RowIndex[p]] -= ComplexKernel.Multiply(_factor.Lower[p], x[j]);
        }
        for (var i = scratch.Path.Count - 1; i >= 0; i--)
        {
            var j = scratch.Path[i];
            x[j] = ComplexKernel.Multiply(x[j], _factor.InversePivot[j]) + Substitute(j, x, out _);
        }
    }

    /// <summary>Goes down all subtrees of a place but the one on the path, as far as entries above the share can be in them.</summary>
    private void Descend(int from, int onPath, double share, List<(int Node, Complex Value)> found, Scratch scratch)
    {
        PushChildren(from, onPath, scratch);
        while (scratch.Stack.Count > 0)
        {
            var j = scratch.Stack.Pop();
            var value = Substitute(j, scratch.X, out var above);
            if (above * _reach[j] <= share)
                continue;
            scratch.X[j] = value;
            scratch.Touched.Add(j);
            Report(j, share, found, scratch);
            PushChildren(j, EliminationTree.None, scratch);
        }
    }

    private void PushChildren(int place, int except, Scratch scratch)
    {
        for (var child = _firstChild[place]; child != EliminationTree.None; child = _nextSibling[child])
        {
            if (child != except)
                scratch.Stack.Push(child);
        }
    }

    /// <summary>−Σ L_kj·x_k, and the largest |x_k| in it.</summary>
    private Complex Substitute(int j, Complex[] x, out double above)
    {
        var sum = Complex.Zero;
        above = 0.0;
        for (var p = _factor.Symbolic.ColumnStart[j]; p < _factor.Symbolic.ColumnStart[j + 1]; p++)
        {
            var xk = x[_factor.Symbolic.RowIndex[p]];
            sum -= ComplexKernel.Multiply(_factor.Lower[p], xk);
            above = Math.Max(above, xk.Real * xk.Real + xk.Imaginary * xk.Imaginary);
        }
        above = Math.Sqrt(above);
        return sum;
    }

    private void Report(int place, double share, List<(int Node, Complex Value)> found, Scratch scratch)
    {
        if (Complex.Abs(scratch.X[place]) > share * _magnitude[place])
            found.Add((_factor.Symbolic.NodeAt[place], scratch.X[place]));
    }

    /// <summary>Children come before parents in the elimination order, so one pass upwards gathers each subtree's reach.</summary>
    private double[] FindReach()
    {
        var symbolic = _factor.Symbolic;
        var reach = new double[_factor.Order];
        var below = new double[_factor.Order];
        for (var j = 0; j < reach.Length; j++)
        {
            var sum = 0.0;
            for (var p = symbolic.ColumnStart[j]; p < symbolic.ColumnStart[j + 1]; p++)
                sum += Complex.Abs(_factor.Lower[p]);
            // A whisker more than the sum, for the rounding of the substitution itself.
            sum *= 1.0 + 1e-12;
            reach[j] = Math.Max(sum / _magnitude[j], Math.Max(1.0, sum) * below[j]);
            if (symbolic.Parent[j] is var parent and not EliminationTree.None)
                below[parent] = Math.Max(below[parent], reach[j]);
        }
        return reach;
    }

    private static (int[] FirstChild, int[] NextSibling) Children(int[] parent)
    {
        int[] first = new int[parent.Length], next = new int[parent.Length];
        for (var j = 0; j < parent.Length; j++)
            first[j] = EliminationTree.None;
        for (var j = 0; j < parent.Length; j++)
        {
            if (parent[j] == EliminationTree.None)
                continue;
            next[j] = first[parent[j]];
            first[parent[j]] = j;
        }
        return (first, next);
    }

    /// <summary>What one thread needs for its columns.</summary>
    internal sealed class Scratch
    {
        public Scratch(int order)
        {
            X = new Complex[order];
            Solve = new Lazy<SolveScratch>(() => new SolveScratch(order));
        }

        /// <summary>Entries of the column, by place; zero between calls.</summary>
        public Complex[] X { get; }

        /// <summary>Places from the column's own up to the root.</summary>
        public List<int> Path { get; } = [];

        /// <summary>Places with an entry in <see cref="X"/>.</summary>
        public List<int> Touched { get; } = [];

        /// <summary>Places still to look at.</summary>
        public Stack<int> Stack { get; } = new();

        /// <summary>For whole columns.</summary>
        public Lazy<SolveScratch> Solve { get; }
    }
}
