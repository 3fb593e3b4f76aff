using System.Numerics;
using CsCheck;
using MathNet.Numerics.LinearAlgebra;
using NetFault.Sparse;
using ComplexVector = MathNet.Numerics.LinearAlgebra.Vector<System.Numerics.Complex>;

namespace NetFault.Tests.Sparse;

public class FactorTests
{
    // Oracle: the definition. L and D as stored, multiplied densely, must give P·A·Pᵀ to n·ε of the entries that were summed.
    [Fact]
    public void L_D_Lt_is_the_permuted_matrix() =>
        TestMatrix.Passive(60).Sample(matrix =>
        {
            LdlFactor factor = matrix.Factor();
            factor.ShiftedPivots.Should().Be(0, "a passive network of one sign of reactance never needs a shift");
            int n = factor.Order;
            Matrix<Complex> l = Matrix<Complex>.Build.DenseIdentity(n), d = Matrix<Complex>.Build.Dense(n, n);
            for (int j = 0; j < n; j++)
            {
                d[j, j] = 1 / factor.InversePivot[j];
                for (int p = factor.Symbolic.ColumnStart[j]; p < factor.Symbolic.ColumnStart[j + 1]; p++)
                {
                    l[factor.Symbolic.RowIndex[p], j] = factor.Lower[p];
                }
            }

            Matrix<Complex> product = l * d * l.Transpose(), a = matrix.Dense();
            double tolerance = 4 * (n + 4) * TestMatrix.Epsilon * Largest(a);
            for (int i = 0; i < n; i++)
            {
                for (int j = 0; j < n; j++)
                {
                    Complex expected = a[factor.Symbolic.NodeAt[i], factor.Symbolic.NodeAt[j]];
                    (product[i, j] - expected).Magnitude.Should().BeLessThan(tolerance);
                }
            }
        });

    // Oracle: the residual b − A·x by Math.NET's dense product; the bound is the backward error of a stable solver in units of n·ε.
    [Fact]
    public void A_passive_network_is_solved_with_a_backward_error_of_rounding_size() =>
        TestMatrix.Passive(120).Sample(matrix =>
        {
            Complex[] b = Load(matrix.Order), x = (Complex[])b.Clone();
            matrix.Factor().Solve(x, new SolveScratch(matrix.Order));
            BackwardError(matrix, x, b).Should().BeLessThan((matrix.Order + 16) * TestMatrix.Epsilon);
        });

    // Oracle: as above. Negative reactances cost growth; refinement must bring the error back to rounding size all the same.
    [Fact]
    public void Networks_with_negative_reactances_are_refined_to_a_backward_error_of_rounding_size() =>
        TestMatrix.WithNegativeReactances(60).Sample(matrix =>
        {
            if (!(matrix.Condition() < 1e12))
            {
                return;
            }

            Complex[] b = Load(matrix.Order), x = (Complex[])b.Clone();
            double reported = matrix.Factor().SolveRefined(matrix.Diagonal, matrix.OffDiagonal, x, new SolveScratch(matrix.Order));
            BackwardError(matrix, x, b).Should().BeLessThan((matrix.Order + 16) * TestMatrix.Epsilon);
            reported.Should().BeLessThan((matrix.Order + 16) * TestMatrix.Epsilon);
        });

    // Oracle: by hand. Nodes 0–1–2 with +j0.1 and −j0.1 meeting at node 1, whose own admittance is then −j10 + j10 = 0;
    // 0.5 and 1 per unit to ground at the ends. Node 1's equation says v0 = v2 for no injection, so the two ends are one node of 1.5.
    // The order of elimination is given, so that node 1 comes first.
    [Fact]
    public void A_zero_pivot_between_opposite_reactances_is_still_solved_exactly()
    {
        var matrix = TestMatrix.Nodal(3, [(0, 1, new Complex(0, 0.1)), (1, 2, new Complex(0, -0.1))], [0.5, 0, 1]);
        matrix.Diagonal[1].Should().Be(Complex.Zero);
        Complex[] x = [1, 0, 0];
        LdlFactor factor = SymbolicFactor.Analyze(matrix.Pattern, new Adjacency(matrix.Pattern), [1, 0, 2])
            .Factor(matrix.Diagonal, matrix.OffDiagonal);
        factor.Solve(x, new SolveScratch(3));
        (x[0] - 1 / 1.5).Magnitude.Should().BeLessThan(1e-14);
        (x[2] - 1 / 1.5).Magnitude.Should().BeLessThan(1e-14);
        factor.ShiftedPivots.Should().BeGreaterThan(0);
    }

    // Oracle: Math.NET's dense inverse. Two nodes joined by 1 and nothing to ground: A = [0 1; 1 0].
    [Fact]
    public void A_matrix_without_any_diagonal_is_solved()
    {
        var matrix = TestMatrix.FromEntries([0, 0], (0, 1, Complex.ImaginaryOne));
        Complex[] x = [3, 5];
        matrix.Factor().Solve(x, new SolveScratch(2));
        (x[0] - 5 / Complex.ImaginaryOne).Magnitude.Should().BeLessThan(1e-14);
        (x[1] - 3 / Complex.ImaginaryOne).Magnitude.Should().BeLessThan(1e-14);
    }

    // Oracle: the first column of the definition, a solve with a unit vector.
    [Fact]
    public void A_unit_injection_gives_the_same_as_a_full_solve() =>
        TestMatrix.WithNegativeReactances(40).Sample(matrix =>
        {
            if (!(matrix.Condition() < 1e10))
            {
                return;
            }

            LdlFactor factor = matrix.Factor();
            int node = matrix.Order / 2;
            Complex[] b = new Complex[matrix.Order], x = new Complex[matrix.Order];
            b[node] = 1;
            factor.Solve(b, new SolveScratch(matrix.Order));
            factor.SolveUnit(node, x, new SolveScratch(matrix.Order));
            x.Should().Equal(b);
        });

    // Oracle: a fixed network solved once by one thread. Two well-known solvers fail this by keeping workspace in the factor.
    [Fact]
    public void Many_threads_solving_over_one_factor_all_get_the_same_bits()
    {
        TestMatrix matrix = TestMatrix.Mesh(30, 30, 7);
        LdlFactor factor = matrix.Factor();
        Complex[][] expected = Enumerable.Range(0, 16).Select(k => Solve(k, new SolveScratch(factor.Order))).ToArray();
        Parallel.For(0, 400, k => Solve(k % 16, new SolveScratch(factor.Order)).Should().Equal(expected[k % 16]));

        Complex[] Solve(int k, SolveScratch scratch)
        {
            Complex[] x = Load(factor.Order);
            x[k] += k;
            factor.Solve(x, scratch);
            return x;
        }
    }

    // Oracle: physics. Renumbering the nodes of a network changes no voltage.
    [Fact]
    public void Renumbering_the_nodes_changes_nothing() =>
        Gen.Select(TestMatrix.Passive(50), Gen.Int[0, int.MaxValue]).Sample((matrix, seed) =>
        {
            int n = matrix.Order;
            int[] renamed = [.. Enumerable.Range(0, n)];
            Shuffle(renamed, new Random(seed));
            Complex[] diagonal = new Complex[n], b = Load(n), x = (Complex[])b.Clone(), y = new Complex[n];
            for (int i = 0; i < n; i++)
            {
                diagonal[renamed[i]] = matrix.Diagonal[i];
                y[renamed[i]] = b[i];
            }

            var other = TestMatrix.FromEntries(diagonal, [.. matrix.Edges.Select(e => (renamed[e.To], renamed[e.From], e.Value))]);
            matrix.Factor().Solve(x, new SolveScratch(n));
            other.Factor().Solve(y, new SolveScratch(n));
            double tolerance = 10 * (n + 4) * TestMatrix.Epsilon * matrix.Condition() * x.Max(v => v.Magnitude);
            for (int i = 0; i < n; i++)
            {
                (x[i] - y[renamed[i]]).Magnitude.Should().BeLessThan(tolerance);
            }
        });

    internal static Complex[] Load(int n) => [.. Enumerable.Range(0, n).Select(i => new Complex(1 + i % 5, i % 3 - 1))];

    internal static double BackwardError(TestMatrix matrix, Complex[] x, Complex[] b)
    {
        Matrix<Complex> a = matrix.Dense();
        ComplexVector r = ComplexVector.Build.Dense(b) - a * ComplexVector.Build.Dense(x);
        return r.InfinityNorm() / (a.InfinityNorm() * x.Max(v => v.Magnitude) + b.Max(v => v.Magnitude));
    }

    internal static double Largest(Matrix<Complex> a) => a.Enumerate().Max(v => v.Magnitude);

    internal static void Shuffle(int[] items, Random random)
    {
        for (int i = items.Length - 1; i > 0; i--)
        {
            int j = random.Next(i + 1);
            (items[i], items[j]) = (items[j], items[i]);
        }
    }
}
