using System.Numerics;

namespace NetFault.Sparse;

/// <summary>Products with a symmetric matrix that is stored as its diagonal and the slots below it.</summary>
internal static class SymmetricProduct
{
    /// <summary>y = A·x.</summary>
    public static void Multiply(
        SymmetricPattern pattern, ReadOnlySpan<Complex> diagonal, ReadOnlySpan<Complex> offDiagonal, ReadOnlySpan<Complex> x, Span<Complex> y)
    {
        int[] columnStart = pattern.ColumnStart, rowIndex = pattern.RowIndex;
        for (int i = 0; i < y.Length; i++)
        {
            y[i] = ComplexKernel.Multiply(diagonal[i], x[i]);
        }

        for (int j = 0; j < y.Length; j++)
        {
            for (int slot = columnStart[j]; slot < columnStart[j + 1]; slot++)
            {
                int i = rowIndex[slot];
                Complex a = offDiagonal[slot];
                y[i] += ComplexKernel.Multiply(a, x[j]);
                y[j] += ComplexKernel.Multiply(a, x[i]);
            }
        }
    }

    /// <summary>‖A‖∞ = ‖A‖₁, the largest sum of moduli over a row.</summary>
    public static double Norm(SymmetricPattern pattern, ReadOnlySpan<Complex> diagonal, ReadOnlySpan<Complex> offDiagonal)
    {
        int[] columnStart = pattern.ColumnStart, rowIndex = pattern.RowIndex;
        double[] sums = new double[pattern.Order];
        for (int j = 0; j < sums.Length; j++)
        {
            sums[j] += Complex.Abs(diagonal[j]);
            for (int slot = columnStart[j]; slot < columnStart[j + 1]; slot++)
            {
                double modulus = Complex.Abs(offDiagonal[slot]);
                sums[j] += modulus;
                sums[rowIndex[slot]] += modulus;
            }
        }

        double norm = 0;
        foreach (double sum in sums)
        {
            norm = Math.Max(norm, sum);
        }

        return norm;
    }
}
