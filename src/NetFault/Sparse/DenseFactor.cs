using System.Numerics;

namespace NetFault.Sparse;

/// <summary>A small dense LU with partial pivoting that says where it broke down.</summary>
internal sealed class DenseFactor
{
    private readonly int order;
    private readonly Complex[] a;       // by rows; L below the diagonal, U on and above
    private readonly int[] rowAt;
    private readonly double[] rowScale;

    /// <param name="a">By rows; overwritten.</param>
    /// <param name="order">Number of rows.</param>
    /// <param name="tolerance">A pivot below this share of its row's largest entry, at least 1, counts as zero.</param>
    public DenseFactor(Complex[] a, int order, double tolerance)
    {
        this.a = a;
        this.order = order;
        rowAt = new int[order];
        rowScale = new double[order];
        for (int r = 0; r < order; r++)
        {
            rowAt[r] = r;
            rowScale[r] = ScaleOf(r);
        }

        for (int k = 0; k < order && SingularRow < 0; k++)
        {
            Pivot(k, tolerance);
        }
    }

    /// <summary>The row left without a pivot, −1 if the matrix is regular.</summary>
    public int SingularRow { get; private set; } = -1;

    /// <summary>The size of that row's pivot relative to the row.</summary>
    public double RelativePivot { get; private set; }

    /// <summary>Solves in place.</summary>
    public void Solve(Complex[] x)
    {
        Complex[] y = new Complex[order];
        for (int i = 0; i < order; i++)
        {
            Complex sum = x[rowAt[i]];
            for (int j = 0; j < i; j++)
            {
                sum -= a[i * order + j] * y[j];
            }

            y[i] = sum;
        }

        for (int i = order - 1; i >= 0; i--)
        {
            Complex sum = y[i];
            for (int j = i + 1; j < order; j++)
            {
                sum -= a[i * order + j] * y[j];
            }

            y[i] = sum / a[i * order + i];
        }

        y.CopyTo(x, 0);
    }

    private double ScaleOf(int row)
    {
        double scale = 1;
        for (int j = 0; j < order; j++)
        {
            scale = Math.Max(scale, ComplexKernel.Size(a[row * order + j]));
        }

        return scale;
    }

    private void Pivot(int k, double tolerance)
    {
        int best = k;
        for (int i = k + 1; i < order; i++)
        {
            best = Share(i, k) > Share(best, k) ? i : best;
        }

        if (!(Share(best, k) > tolerance))
        {
            SingularRow = rowAt[best];
            RelativePivot = Share(best, k);
            return;
        }

        SwapRows(k, best);
        for (int i = k + 1; i < order; i++)
        {
            Complex factor = a[i * order + k] / a[k * order + k];
            a[i * order + k] = factor;
            for (int j = k + 1; j < order; j++)
            {
                a[i * order + j] -= factor * a[k * order + j];
            }
        }
    }

    private double Share(int row, int column) => ComplexKernel.Size(a[row * order + column]) / rowScale[rowAt[row]];

    private void SwapRows(int r, int s)
    {
        for (int j = 0; j < order && r != s; j++)
        {
            (a[r * order + j], a[s * order + j]) = (a[s * order + j], a[r * order + j]);
        }

        (rowAt[r], rowAt[s]) = (rowAt[s], rowAt[r]);
    }
}
