using System.Buffers;
using System.Diagnostics;
using System.Numerics;

namespace NetFault.Sparse;

/// <summary>
/// The entries of Z = A⁻¹ on the pattern of L, so the whole diagonal and every entry where A is not zero, at the order of work of the
/// factorisation: K. Takahashi, J. Fagan, M.-S. Chin, "Formation of a sparse bus impedance matrix and its application to short circuit
/// study", PICA 1973; A. M. Erisman, W. F. Tinney, "On computing certain elements of the inverse of a sparse matrix", CACM 18 (1975)
/// 177–179.
/// </summary>
internal sealed class SelectedInverse
{
    private readonly int[] positionOfSlot;
    private readonly Complex[] diagonal;
    private readonly Complex[] below;   // on the pattern of L

    private SelectedInverse(LdlFactor factor, Complex[] below)
    {
        positionOfSlot = factor.Symbolic.PositionOfSlot;
        diagonal = new Complex[factor.Order];
        this.below = below;
        TakahashiRecursion.Run(factor, below.AsSpan(0, factor.Lower.Length + 1), diagonal);
        if (factor.Correction is { } correction)
        {
            Correct(factor, correction);
        }
    }

    /// <summary>Z_kk for each node k, in original numbering.</summary>
    public ReadOnlySpan<Complex> Diagonal => diagonal;

    /// <summary>Z_ij for the two nodes that a slot of the pattern joins.</summary>
    public Complex OffDiagonal(int slot) => below[positionOfSlot[slot]];

    /// <summary>Works out the inverse on the pattern of L.</summary>
    public static SelectedInverse Of(LdlFactor factor) => new(factor, new Complex[factor.Lower.Length + 1]);

    /// <summary>The diagonal alone, in original numbering, without keeping the rest.</summary>
    public static void DiagonalOf(LdlFactor factor, Span<Complex> diagonal)
    {
        Debug.Assert(diagonal.Length == factor.Order);
        if (factor.Correction is not null)
        {
            Of(factor).Diagonal.CopyTo(diagonal);
            return;
        }

        using var below = new Scratch<Complex>(factor.Lower.Length + 1);
        TakahashiRecursion.Run(factor, below.Span, diagonal);
    }

    /// <summary>
    /// As <see cref="Of(LdlFactor)"/>, then checks Σ_j A_kj·Z_jk = 1 for each node and solves anew, with refinement, for those whose
    /// residual is not at rounding level.
    /// </summary>
    public static SelectedInverse Of(
        LdlFactor factor, ReadOnlySpan<Complex> diagonal, ReadOnlySpan<Complex> offDiagonal, out InverseHealth health)
    {
        SelectedInverse inverse = Of(factor);
        health = inverse.CheckAndMend(factor, diagonal, offDiagonal);
        return inverse;
    }

    /// <summary>The diagonal alone, checked and mended as by the overload of <c>Of</c> that does so, without keeping the rest.</summary>
    public static Complex[] CheckedDiagonalOf(
        LdlFactor factor, ReadOnlySpan<Complex> diagonal, ReadOnlySpan<Complex> offDiagonal, out InverseHealth health)
    {
        Complex[] lent = ArrayPool<Complex>.Shared.Rent(factor.Lower.Length + 1);
        try
        {
            var inverse = new SelectedInverse(factor, lent);
            health = inverse.CheckAndMend(factor, diagonal, offDiagonal);
            return inverse.diagonal;
        }
        finally
        {
            ArrayPool<Complex>.Shared.Return(lent);
        }
    }

    private InverseHealth CheckAndMend(LdlFactor factor, ReadOnlySpan<Complex> a, ReadOnlySpan<Complex> offDiagonal)
    {
        InverseHealth health = InverseHealth.Check(this, factor.Symbolic.Pattern, a, offDiagonal);
        if (health.Suspects.Length == 0)
        {
            return health;
        }

        SolveAnew(factor, a, offDiagonal, health.Suspects);
        return InverseHealth.Check(this, factor.Symbolic.Pattern, a, offDiagonal) with { Repaired = health.Suspects.Length };
    }

    /// <summary>
    /// The Woodbury term of each shifted pivot c: Z += w·vᵀ with w = A′⁻¹·e_c and v = A′⁻¹·E·Δ·(I − Z·Δ)⁻¹ row c, on the diagonal and the
    /// slots. Two solves a shift.
    /// </summary>
    private void Correct(LdlFactor factor, WoodburyCorrection correction)
    {
        int n = factor.Order;
        Complex[] w = new Complex[n], v = new Complex[n];
        for (int s = 0; s < correction.Count; s++)
        {
            Array.Clear(w, 0, n);
            w[correction.Place(s)] = Complex.One;
            factor.SolvePermutedFrom(correction.Place(s), w);
            Complex[] unit = new Complex[correction.Count];
            unit[s] = Complex.One;
            correction.SolveSmall(factor, unit, v);
            AddProduct(factor.Symbolic, w, v);
        }
    }

    private void AddProduct(SymbolicFactor symbolic, Complex[] w, Complex[] v)
    {
        SymmetricPattern pattern = symbolic.Pattern;
        int[] placeOf = symbolic.PlaceOf;
        for (int j = 0; j < pattern.Order; j++)
        {
            int place = placeOf[j];
            diagonal[j] += w[place] * v[place];
            for (int slot = pattern.ColumnStart[j]; slot < pattern.ColumnStart[j + 1]; slot++)
            {
                below[positionOfSlot[slot]] += w[placeOf[pattern.RowIndex[slot]]] * v[place];
            }
        }
    }

    /// <summary>Replaces a suspect node's entries by those of a refined solve for its column.</summary>
    private void SolveAnew(LdlFactor factor, ReadOnlySpan<Complex> a, ReadOnlySpan<Complex> offDiagonal, int[] suspects)
    {
        var scratch = new SolveScratch(factor.Order);
        var refinement = new Refinement(factor, a, offDiagonal, scratch);
        Complex[] x = new Complex[factor.Order];
        var columns = new Adjacency(factor.Symbolic.Pattern);
        foreach (int node in suspects)
        {
            Array.Clear(x, 0, x.Length);
            x[node] = Complex.One;
            double error = refinement.Solve(x);
            Debug.Assert(!double.IsNaN(error));
            diagonal[node] = x[node];
            for (int p = columns.Start[node]; p < columns.Start[node + 1]; p++)
            {
                below[positionOfSlot[columns.Slot[p]]] = x[columns.Neighbour[p]];
            }
        }
    }
}
