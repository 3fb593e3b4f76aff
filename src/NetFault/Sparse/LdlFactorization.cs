using System.Numerics;

namespace NetFault.Sparse;

/// <summary>
/// Left-looking L·D·Lᵀ of a complex symmetric matrix, one column at a time, without interchanges. When column j's turn comes, the columns
/// that reach row j are in a list; the column is gathered into a full vector, updated and put back.
/// </summary>
internal sealed unsafe class LdlFactorization
{
    /// <summary>
    /// A pivot below this share of the largest entry of its column is shifted. In a passive network of resistances and reactances of one
    /// sign the pivot is never smaller than its column's entries, so only opposite reactances come here. Growth stays below 1/this.
    /// </summary>
    private const double GrowthTolerance = 1e-2;

    /// <summary>A pivot below this share of what it was summed from is shifted: it consists mostly of rounding.</summary>
    private const double CancellationTolerance = 1e-10;

    /// <summary>A pivot below this multiple of the rounding error it may carry is shifted: fewer than three of its digits are known.</summary>
    private const double ErrorTolerance = 1e3;

    private const double UnitRoundoff = 1.1e-16;
    private const int None = -1;

    private readonly SymbolicFactor symbolic;
    private readonly Complex[] lower;
    private readonly Complex[] inversePivot;
    private readonly List<PivotShift> shifts = [];
    private double largest;     // largest entry of any Schur complement's pivot column
    private double largestOfA;

    private LdlFactorization(SymbolicFactor symbolic)
    {
        this.symbolic = symbolic;
        lower = new Complex[symbolic.FactorEntries];
        inversePivot = new Complex[symbolic.Order];
    }

    /// <summary>Factors the matrix with the given values.</summary>
    /// <exception cref="SingularMatrixException">Singular to working precision, or a value is not finite.</exception>
    public static LdlFactor Run(SymbolicFactor symbolic, ReadOnlySpan<Complex> diagonal, ReadOnlySpan<Complex> offDiagonal)
    {
        var work = new LdlFactorization(symbolic);
        work.Scatter(diagonal, offDiagonal);
        work.Eliminate();
        double growth = work.largest / Math.Max(work.largestOfA, double.Epsilon);
        return new LdlFactor(symbolic, work.lower, work.inversePivot, [.. work.shifts], growth);
    }

    /// <summary>Puts the values of A where L and D will be.</summary>
    private void Scatter(ReadOnlySpan<Complex> diagonal, ReadOnlySpan<Complex> offDiagonal)
    {
        int[] position = symbolic.PositionOfSlot, nodeAt = symbolic.NodeAt;
        double max = 0;
        for (int slot = 0; slot < position.Length; slot++)
        {
            Complex value = offDiagonal[slot];
            max = Math.Max(max, ComplexKernel.Size(value));
            lower[position[slot]] = value;
        }

        for (int j = 0; j < nodeAt.Length; j++)
        {
            Complex value = diagonal[nodeAt[j]];
            max = Math.Max(max, ComplexKernel.Size(value));
            inversePivot[j] = value;
        }

        largestOfA = max;
    }

    private void Eliminate()
    {
        int n = symbolic.Order;
        using var links = new Scratch<int>(3 * n + 1);
        using var full = new Scratch<Complex>(2 * n + 1);
        using var errors = new Scratch<double>(n + 1);
        links.Span.Slice(0, n).Fill(None);
        fixed (int* head = links, columns = symbolic.ColumnStart, rows = symbolic.RowIndex)
        fixed (Complex* work = full, l = lower, d = inversePivot)
        fixed (double* error = errors)
        {
            var columnsOf = new Columns(head, head + n, head + 2 * n, columns, rows, l, work, work + n, error);
            for (int j = 0; j < n; j++)
            {
                columnsOf.Gather(j);
                double magnitude = ComplexKernel.Size(d[j]);
                Complex pivot = columnsOf.Update(j, d[j], ref magnitude);
                double columnMax = columnsOf.PutBack(j);
                pivot = Check(j, pivot, magnitude, columnMax, error[j] * UnitRoundoff);
                d[j] = ComplexKernel.Reciprocal(pivot);
                columnsOf.Scale(j, pivot, d[j]);
            }
        }
    }

    /// <summary>Shifts a pivot that is too small for its column, or for what it was summed from.</summary>
    private Complex Check(int j, Complex pivot, double magnitude, double columnMax, double error)
    {
        double scale = Math.Max(magnitude, columnMax), size = ComplexKernel.Size(pivot);
        largest = Math.Max(largest, scale);
        if (size > GrowthTolerance * columnMax && size > CancellationTolerance * magnitude && size > ErrorTolerance * error)
        {
            return pivot;
        }

        if (!(scale < double.PositiveInfinity))
        {
            throw new SingularMatrixException(symbolic.NodeAt[j], double.NaN);
        }

        // In the direction of what is left of the pivot, so that the sum cannot cancel.
        double modulus = Complex.Abs(pivot);
        Complex direction = modulus > 0 ? pivot / modulus : Complex.One;
        scale = scale > 0 ? scale : 1;
        Complex shift = direction * scale;
        shifts.Add(new PivotShift(j, shift, error / scale));
        return pivot + shift;
    }

    /// <summary>The columns of L as far as they are known, and the lists of those that still have to update a later column.</summary>
    private readonly ref struct Columns
    {
        private readonly int* head;     // head[j]: first column whose next row is j
        private readonly int* next;     // next column in the same list
        private readonly int* current;  // position of a column's next row
        private readonly int* columns;
        private readonly int* rows;
        private readonly Complex* l;
        private readonly Complex* full;
        private readonly Complex* pivots;
        private readonly double* errors;    // bound of each pivot's error, in units of roundoff

        public Columns(
            int* head, int* next, int* current, int* columns, int* rows, Complex* l, Complex* full, Complex* pivots, double* errors)
        {
            this.errors = errors;
            this.head = head;
            this.next = next;
            this.current = current;
            this.columns = columns;
            this.rows = rows;
            this.l = l;
            this.full = full;
            this.pivots = pivots;
        }

        public void Gather(int j)
        {
            for (int p = columns[j], end = columns[j + 1]; p < end; p++)
            {
                full[rows[p]] = l[p];
            }
        }

        /// <summary>
        /// Takes l_jk·d_k·L(j:n, k) off column j for every k with l_jk ≠ 0. Keeps a running error bound as it goes (Higham, section 3.3):
        /// the rounding of the sum, and |l_jk|² times the error of each pivot d_k.
        /// </summary>
        public Complex Update(int j, Complex pivot, ref double magnitude)
        {
            double re = pivot.Real, im = pivot.Imaginary, sum = magnitude, error = 0;
            int following;
            for (int k = head[j]; k != None; k = following)
            {
                following = next[k];
                int p = current[k], end = columns[k + 1];
                Complex entry = l[p], factor = ComplexKernel.Multiply(entry, pivots[k]), term = ComplexKernel.Multiply(entry, factor);
                re -= term.Real;
                im -= term.Imaginary;
                sum += ComplexKernel.Size(term);
                error += (entry.Real * entry.Real + entry.Imaginary * entry.Imaginary) * errors[k];
                p++;
                ComplexKernel.SubtractProduct(full, rows + p, l + p, end - p, factor);
                Advance(k, p, end);
            }

            magnitude = sum;
            errors[j] = error + sum;
            return new Complex(re, im);
        }

        /// <returns>The largest entry of the column.</returns>
        public double PutBack(int j)
        {
            double max = 0;
            for (int p = columns[j], end = columns[j + 1]; p < end; p++)
            {
                Complex value = full[rows[p]];
                l[p] = value;
                max = Math.Max(max, ComplexKernel.Size(value));
            }

            return max;
        }

        public void Scale(int j, Complex pivot, Complex inverse)
        {
            pivots[j] = pivot;
            int p = columns[j], end = columns[j + 1];
            Advance(j, p, end);
            for (; p < end; p++)
            {
                l[p] = ComplexKernel.Multiply(l[p], inverse);
            }
        }

        private void Advance(int k, int p, int end)
        {
            if (p < end)
            {
                int row = rows[p];
                current[k] = p;
                next[k] = head[row];
                head[row] = k;
            }
        }
    }
}
