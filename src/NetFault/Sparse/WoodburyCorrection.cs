using System.Numerics;

namespace NetFault.Sparse;

/// <summary>
/// Turns solves with A′ = A + Σ δ·e·eᵀ, whose pivots were shifted, into solves with A (Sherman, Morrison 1950; Woodbury 1950):
/// A⁻¹ = A′⁻¹ + A′⁻¹·E·Δ·(I − Z·Δ)⁻¹·Eᵀ·A′⁻¹ with Z = Eᵀ·A′⁻¹·E. If I − Z·Δ is singular, so is A.
/// </summary>
internal sealed class WoodburyCorrection
{
    /// <summary>The bound on the pivots' errors is of first order, and leaves out those of the entries beside them.</summary>
    private const double SafetyFactor = 8;

    private readonly int[] places;
    private readonly Complex[] amounts;
    private readonly DenseFactor small;

    /// <exception cref="SingularMatrixException">A is singular to working precision.</exception>
    public WoodburyCorrection(LdlFactor factor, PivotShift[] shifts)
    {
        int m = shifts.Length;
        double tolerance = 16 * 2.2e-16;
        places = new int[m];
        amounts = new Complex[m];
        for (int c = 0; c < m; c++)
        {
            places[c] = shifts[c].Place;
            amounts[c] = shifts[c].Amount;
            tolerance = Math.Max(tolerance, SafetyFactor * shifts[c].Uncertainty);
        }

        small = new DenseFactor(SmallMatrix(factor), m, tolerance);
        if (small.SingularRow >= 0)
        {
            throw new SingularMatrixException(factor.Symbolic.NodeAt[places[small.SingularRow]], small.RelativePivot);
        }
    }

    /// <summary>Number of shifted pivots.</summary>
    public int Count => places.Length;

    /// <summary>The place of a shift.</summary>
    public int Place(int shift) => places[shift];

    /// <summary>Turns y = A′⁻¹·b into A⁻¹·b, in elimination order.</summary>
    public void Apply(LdlFactor factor, Complex[] y, Complex[] work)
    {
        int m = places.Length;
        Complex[] c = new Complex[m];
        for (int s = 0; s < m; s++)
        {
            c[s] = y[places[s]];
        }

        SolveSmall(factor, c, work);
        for (int k = 0; k < y.Length; k++)
        {
            y[k] += work[k];
        }
    }

    /// <summary>work = A′⁻¹·E·Δ·(I − Z·Δ)⁻¹·c.</summary>
    public void SolveSmall(LdlFactor factor, Complex[] c, Complex[] work)
    {
        small.Solve(c);
        Array.Clear(work, 0, work.Length);
        for (int s = 0; s < places.Length; s++)
        {
            work[places[s]] = amounts[s] * c[s];
        }

        factor.SolvePermuted(work);
    }

    /// <summary>I − Z·Δ, by rows.</summary>
    private Complex[] SmallMatrix(LdlFactor factor)
    {
        int m = places.Length;
        Complex[] matrix = new Complex[m * m];
        Complex[] column = new Complex[factor.Order];
        for (int c = 0; c < m; c++)
        {
            Array.Clear(column, 0, column.Length);
            column[places[c]] = Complex.One;
            factor.SolvePermutedFrom(places[c], column);
            for (int r = 0; r < m; r++)
            {
                matrix[r * m + c] = (r == c ? Complex.One : Complex.Zero) - column[places[r]] * amounts[c];
            }
        }

        return matrix;
    }
}
