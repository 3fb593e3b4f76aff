using System.Diagnostics;
using System.Numerics;

namespace NetFault.Sparse;

/// <summary>
/// The factors L·D·Lᵀ of P·A·Pᵀ, where A may differ from the matrix that was given in a few shifted pivots; solves correct for those by
/// the Sherman–Morrison–Woodbury identity. Immutable: solves from many threads at once need only a scratch each.
/// </summary>
internal sealed unsafe class LdlFactor
{
    private readonly Complex[] lower;
    private readonly Complex[] inversePivot;
    private readonly WoodburyCorrection? correction;

    internal LdlFactor(SymbolicFactor symbolic, Complex[] lower, Complex[] inversePivot, PivotShift[] shifts, double growth)
    {
        Symbolic = symbolic;
        this.lower = lower;
        this.inversePivot = inversePivot;
        Growth = growth;
        Shifts = shifts;
        correction = shifts.Length == 0 ? null : new WoodburyCorrection(this, shifts);
    }

    /// <summary>The symbolic part, shared with other factors.</summary>
    public SymbolicFactor Symbolic { get; }

    /// <summary>Number of rows.</summary>
    public int Order => Symbolic.Order;

    /// <summary>Number of pivots that had to be shifted; 0 for a passive network of one sign of reactance.</summary>
    public int ShiftedPivots => Shifts.Length;

    /// <summary>Largest entry met during elimination over the largest entry of A; digits lost to growth are its logarithm.</summary>
    public double Growth { get; }

    /// <summary>The pivots that were shifted.</summary>
    internal PivotShift[] Shifts { get; }

    /// <summary>L below its unit diagonal, on <see cref="SymbolicFactor.RowIndex"/>.</summary>
    internal Complex[] Lower => lower;

    /// <summary>1/D.</summary>
    internal Complex[] InversePivot => inversePivot;

    /// <summary>The correction for the shifted pivots, if there are any.</summary>
    internal WoodburyCorrection? Correction => correction;

    /// <summary>Solves A·x = b.</summary>
    /// <param name="x">b in, x out, in original numbering.</param>
    /// <param name="scratch">The calling thread's own.</param>
    public void Solve(Span<Complex> x, SolveScratch scratch)
    {
        Debug.Assert(x.Length == Order);
        Complex[] y = scratch.Permuted;
        int[] nodeAt = Symbolic.NodeAt;
        for (int k = 0; k < nodeAt.Length; k++)
        {
            y[k] = x[nodeAt[k]];
        }

        SolvePermuted(y);
        correction?.Apply(this, y, scratch.Correction);
        for (int k = 0; k < nodeAt.Length; k++)
        {
            x[nodeAt[k]] = y[k];
        }
    }

    /// <summary>One column of A⁻¹: the response to one unit at a node. Cheaper than <see cref="Solve"/> by the sparse right-hand side.</summary>
    /// <param name="node">Original numbering.</param>
    /// <param name="x">Out, in original numbering; what was in it is overwritten.</param>
    /// <param name="scratch">The calling thread's own.</param>
    public void SolveUnit(int node, Span<Complex> x, SolveScratch scratch)
    {
        Complex[] y = scratch.Permuted;
        Array.Clear(y, 0, y.Length);
        int place = Symbolic.PlaceOf[node];
        y[place] = Complex.One;
        SolvePermutedFrom(place, y);
        correction?.Apply(this, y, scratch.Correction);
        int[] nodeAt = Symbolic.NodeAt;
        for (int k = 0; k < nodeAt.Length; k++)
        {
            x[nodeAt[k]] = y[k];
        }
    }

    /// <summary>
    /// Solves with iterative refinement in working precision (N. J. Higham, Accuracy and Stability of Numerical Algorithms, 2nd ed.,
    /// chapter 12), until the backward error is at rounding level or no longer falls.
    /// </summary>
    /// <param name="diagonal">The values that were factored.</param>
    /// <param name="offDiagonal">Likewise, by slot.</param>
    /// <param name="x">b in, x out, in original numbering.</param>
    /// <param name="scratch">The calling thread's own.</param>
    /// <returns>The normwise backward error ‖b − A·x‖∞ / (‖A‖∞·‖x‖∞ + ‖b‖∞).</returns>
    public double SolveRefined(
        ReadOnlySpan<Complex> diagonal, ReadOnlySpan<Complex> offDiagonal, Span<Complex> x, SolveScratch scratch) =>
        new Refinement(this, diagonal, offDiagonal, scratch).Solve(x);

    /// <summary>Solves L·D·Lᵀ·y = y in elimination order, without correction for shifts.</summary>
    internal void SolvePermuted(Complex[] y)
    {
        int n = Order;
        fixed (int* columns = Symbolic.ColumnStart, rows = Symbolic.RowIndex)
        fixed (Complex* l = lower, v = y)
        {
            for (int j = 0; j < n; j++)
            {
                int p = columns[j];
                ComplexKernel.SubtractProduct(v, rows + p, l + p, columns[j + 1] - p, v[j]);
            }
        }

        SolveUpper(y);
    }

    /// <summary>The same when only y[place] is not zero: L⁻¹ reaches no further than the path from there to the root.</summary>
    internal void SolvePermutedFrom(int place, Complex[] y)
    {
        int[] parent = Symbolic.Parent;
        fixed (int* columns = Symbolic.ColumnStart, rows = Symbolic.RowIndex)
        fixed (Complex* l = lower, v = y)
        {
            for (int j = place; j != EliminationTree.None; j = parent[j])
            {
                int p = columns[j];
                ComplexKernel.SubtractProduct(v, rows + p, l + p, columns[j + 1] - p, v[j]);
            }
        }

        SolveUpper(y);
    }

    private void SolveUpper(Complex[] y)
    {
        fixed (int* columns = Symbolic.ColumnStart, rows = Symbolic.RowIndex)
        fixed (Complex* l = lower, v = y, d = inversePivot)
        {
            for (int j = Order - 1; j >= 0; j--)
            {
                int p = columns[j];
                v[j] = ComplexKernel.Multiply(v[j], d[j]) - ComplexKernel.Dot(v, rows + p, l + p, columns[j + 1] - p);
            }
        }
    }
}
