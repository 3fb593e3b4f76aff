using System.Numerics;

namespace NetFault.Sparse;

/// <summary>How well a selected inverse satisfies A·Z = I where that can be checked at the cost of reading A: on the diagonal.</summary>
/// <param name="WorstResidual">max over k of |Σ_j A_kj·Z_jk − 1|.</param>
/// <param name="WorstNode">Its node, in original numbering; −1 for a matrix without rows.</param>
/// <param name="Suspects">Nodes whose residual is more than rounding explains.</param>
/// <param name="WorstRounding">
/// max over k of ε·Σ_j |A_kj·Z_jk|: how far rounding in the entries of A alone may move Z_kk, relative. Large where a small entry is lost beside a
/// large one on the diagonal, which no residual shows.
/// </param>
/// <param name="Repaired">Nodes that were solved anew by refinement before this check.</param>
internal sealed record InverseHealth(double WorstResidual, int WorstNode, int[] Suspects, double WorstRounding, int Repaired = 0)
{
    /// <summary>Residuals below this are good whatever the sum's terms are.</summary>
    private const double Threshold = 1e-11;

    /// <summary>Rounding of a sum is this times the size of its terms; 64 units leave room for the error in Z itself.</summary>
    private const double Rounding = 64 * 2.2e-16;

    /// <summary>O(entries of A): every Z_jk with A_kj ≠ 0 is at hand.</summary>
    public static InverseHealth Check(
        SelectedInverse inverse, SymmetricPattern pattern, ReadOnlySpan<Complex> diagonal, ReadOnlySpan<Complex> offDiagonal)
    {
        int n = pattern.Order;
        using var sums = new Scratch<Complex>(n);
        using var sizes = new Scratch<double>(n);
        Span<Complex> sum = sums.Span;
        Span<double> size = sizes.Span;
        sum.Clear();
        size.Clear();
        for (int j = 0; j < n; j++)
        {
            Add(sum, size, j, ComplexKernel.Multiply(diagonal[j], inverse.Diagonal[j]) - Complex.One);
            for (int slot = pattern.ColumnStart[j]; slot < pattern.ColumnStart[j + 1]; slot++)
            {
                Complex term = ComplexKernel.Multiply(offDiagonal[slot], inverse.OffDiagonal(slot));
                Add(sum, size, j, term);
                Add(sum, size, pattern.RowIndex[slot], term);
            }
        }

        return Judge(sum, size);
    }

    private static void Add(Span<Complex> sum, Span<double> size, int k, Complex term)
    {
        sum[k] += term;
        size[k] += ComplexKernel.Size(term);
    }

    private static InverseHealth Judge(ReadOnlySpan<Complex> sum, ReadOnlySpan<double> size)
    {
        double worst = -1;
        int worstNode = -1;
        double largest = 0;
        List<int> suspects = [];
        for (int k = 0; k < sum.Length; k++)
        {
            double residual = Complex.Abs(sum[k]);
            largest = Math.Max(largest, size[k]);
            if (!(residual <= worst))
            {
                worst = double.IsNaN(residual) ? double.PositiveInfinity : residual;
                worstNode = k;
            }

            if (!(residual <= Math.Max(Threshold, Rounding * (1 + size[k]))))
            {
                suspects.Add(k);
            }
        }

        return new InverseHealth(Math.Max(worst, 0), worstNode, [.. suspects], 2.2e-16 * largest);
    }
}
