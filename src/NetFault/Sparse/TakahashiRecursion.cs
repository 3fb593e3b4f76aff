using System.Numerics;

namespace NetFault.Sparse;

/// <summary>
/// From the last column to the first, with R the rows of column j of L: Z_Rj = −Z_RR·L_Rj and Z_jj = 1/d_j − L_Rjᵀ·Z_Rj. All of Z_RR lies
/// on the pattern of L, because R is a clique of the filled graph.
/// </summary>
internal static unsafe class TakahashiRecursion
{
    /// <param name="factor">The factors.</param>
    /// <param name="below">Out: Z below the diagonal, on the pattern of L.</param>
    /// <param name="diagonal">Out: the diagonal of Z, in original numbering.</param>
    public static void Run(LdlFactor factor, Complex[] below, Complex[] diagonal)
    {
        SymbolicFactor symbolic = factor.Symbolic;
        int n = symbolic.Order;
        Complex[] work = new Complex[3 * n];
        fixed (int* columns = symbolic.ColumnStart, rows = symbolic.RowIndex)
        fixed (Complex* l = factor.Lower, z = below, inversePivot = factor.InversePivot, w = work)
        {
            Complex* onDiagonal = w + 2 * n;
            var step = new Step(columns, rows, l, z, onDiagonal, w, w + n);
            for (int j = n - 1; j >= 0; j--)
            {
                step.Column(j);
                onDiagonal[j] = step.Diagonal(j, inversePivot[j]);
            }
        }

        int[] nodeAt = symbolic.NodeAt;
        for (int j = 0; j < n; j++)
        {
            diagonal[nodeAt[j]] = work[2 * n + j];
        }
    }

    private readonly ref struct Step
    {
        private readonly int* columns;
        private readonly int* rows;
        private readonly Complex* l;
        private readonly Complex* z;
        private readonly Complex* onDiagonal;
        private readonly Complex* vector;   // L_Rj spread out; zero outside R between columns
        private readonly Complex* product;  // Z_RR·L_Rj, spread out; anything outside R

        public Step(int* columns, int* rows, Complex* l, Complex* z, Complex* onDiagonal, Complex* vector, Complex* product)
        {
            this.columns = columns;
            this.rows = rows;
            this.l = l;
            this.z = z;
            this.onDiagonal = onDiagonal;
            this.vector = vector;
            this.product = product;
        }

        public void Column(int j)
        {
            int begin = columns[j], end = columns[j + 1];
            for (int p = begin; p < end; p++)
            {
                vector[rows[p]] = l[p];
                product[rows[p]] = Complex.Zero;
            }

            for (int p = begin; p < end; p++)
            {
                int r = rows[p], q = columns[r];
                Complex sum = ComplexKernel.AddProductAndDot(product, vector, rows + q, z + q, columns[r + 1] - q, l[p]);
                product[r] += sum + ComplexKernel.Multiply(onDiagonal[r], l[p]);
            }

            for (int p = begin; p < end; p++)
            {
                vector[rows[p]] = Complex.Zero;
                z[p] = -product[rows[p]];
            }
        }

        public Complex Diagonal(int j, Complex inversePivot)
        {
            double re = inversePivot.Real, im = inversePivot.Imaginary;
            for (int p = columns[j], end = columns[j + 1]; p < end; p++)
            {
                Complex term = ComplexKernel.Multiply(l[p], z[p]);
                re -= term.Real;
                im -= term.Imaginary;
            }

            return new Complex(re, im);
        }
    }
}
