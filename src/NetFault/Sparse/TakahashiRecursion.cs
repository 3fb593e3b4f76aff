using System.Numerics;

namespace NetFault.Sparse;

/// <summary>
/// From the last column to the first, with R the rows of column j of L: Z_Rj = −Z_RR·L_Rj and Z_jj = 1/d_j − L_Rjᵀ·Z_Rj. All of Z_RR is
/// known, because R is a clique of the filled graph: it stands in the dense front of the parent supernode, from where it is gathered
/// into the front of j's own.
/// </summary>
internal static unsafe class TakahashiRecursion
{
    /// <param name="factor">The factors.</param>
    /// <param name="below">Out: Z below the diagonal, on the pattern of L.</param>
    /// <param name="diagonal">Out: the diagonal of Z, in original numbering.</param>
    public static void Run(LdlFactor factor, Span<Complex> below, Span<Complex> diagonal)
    {
        SymbolicFactor symbolic = factor.Symbolic;
        Supernodes supernodes = symbolic.Supernodes;
        using var fronts = new Scratch<Complex>(checked((int)supernodes.FrontSpace + 1));
        using var local = new Scratch<int>(symbolic.Order + 1);
        fixed (int* columns = symbolic.ColumnStart, rows = symbolic.RowIndex, first = supernodes.First, place = local,
            nodeAt = symbolic.NodeAt)
        fixed (Complex* l = factor.Lower, z = below, inversePivot = factor.InversePivot, f = fronts, zd = diagonal)
        {
            var step = new Step(columns, rows, first, place, nodeAt, l, inversePivot, z, zd);
            for (int s = supernodes.Count - 1; s >= 0; s--)
            {
                int parent = supernodes.Parent[s];
                Complex* front = f + supernodes.FrontStart[s];
                if (parent >= 0)
                {
                    step.Gather(s, front, parent, f + supernodes.FrontStart[parent]);
                }

                step.Columns(s, front);
            }
        }
    }

    /// <summary>A front holds its lower triangle by columns, in a square: the entry (row b, column a ≤ b) at a·size + b.</summary>
    private readonly ref struct Step
    {
        private readonly int* columns;
        private readonly int* rows;
        private readonly int* first;
        private readonly int* local;
        private readonly int* nodeAt;
        private readonly Complex* l;
        private readonly Complex* inversePivot;
        private readonly Complex* z;
        private readonly Complex* diagonal;

        public Step(int* columns, int* rows, int* first, int* local, int* nodeAt, Complex* l, Complex* inversePivot, Complex* z,
            Complex* diagonal)
        {
            this.columns = columns;
            this.rows = rows;
            this.first = first;
            this.local = local;
            this.nodeAt = nodeAt;
            this.l = l;
            this.inversePivot = inversePivot;
            this.z = z;
            this.diagonal = diagonal;
        }

        /// <summary>Copies Z_RR out of the parent's front, for R the rows below the supernode's last column.</summary>
        public void Gather(int s, Complex* front, int parent, Complex* parentFront)
        {
            int last = first[s + 1] - 1, count = columns[last + 1] - columns[last], own = first[s + 1] - first[s], size = own + count;
            Locate(rows + columns[last], count, parent);
            int parentSize = columns[first[parent] + 1] - columns[first[parent]] + 1;
            for (int a = 0; a < count; a++)
            {
                Complex* from = parentFront + (long)local[a] * parentSize, to = front + (long)(own + a) * size + own;
                for (int b = a; b < count; b++)
                {
                    to[b] = from[local[b]];
                }
            }
        }

        /// <summary>The places of some rows in the front of a supernode that has them all; both are ascending.</summary>
        private void Locate(int* wanted, int count, int supernode)
        {
            int column = first[supernode], end = first[supernode + 1], own = end - column, t = 0;
            for (; t < count && wanted[t] < end; t++)
            {
                local[t] = wanted[t] - column;
            }

            int* belowOwn = rows + columns[end - 1];
            for (int q = 0; t < count; t++)
            {
                while (belowOwn[q] != wanted[t])
                {
                    q++;
                }

                local[t] = own + q++;
            }
        }

        /// <summary>The supernode's own columns, last first, each from the part of the front behind it.</summary>
        public void Columns(int s, Complex* front)
        {
            int begin = first[s], size = columns[begin + 1] - columns[begin] + 1;
            for (int j = first[s + 1] - 1; j >= begin; j--)
            {
                int a = j - begin, count = size - a - 1;
                Complex* entries = l + columns[j], result = z + columns[j], column = front + (long)a * size + a;
                Complex pivot = inversePivot[j];
                if (count > 0)
                {
                    ComplexKernel.SymmetricProduct(column + size + 1, size, entries, result, count);
                    pivot -= ComplexKernel.NegateAndDot(result, entries, count);
                    new Span<Complex>(result, count).CopyTo(new Span<Complex>(column + 1, count));
                }

                column[0] = pivot;
                diagonal[nodeAt[j]] = pivot;
            }
        }
    }
}
