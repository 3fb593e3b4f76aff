using System.Numerics;
using CsCheck;
using NetFault.Sparse;

namespace NetFault.Tests.Sparse;

public class RefusalTests
{
    // Oracle: Kirchhoff. A part without any connection to ground has a nodal matrix with the null vector of ones.
    [Fact]
    public void A_part_without_any_source_is_refused_with_one_of_its_nodes() =>
        Gen.Select(TestMatrix.Passive(30), Gen.Int[2, 30], Gen.Double[0.01, 1].Array[60], Gen.Int[0, 1_000_000])
            .Sample((sourced, size, reactances, seed) =>
            {
                int n = sourced.Order, first = n;
                var random = new Random(seed);
                var floating = new List<(int, int, Complex)>();
                for (int i = 1; i < size; i++)
                {
                    floating.Add((first + i, first + random.Next(i), new Complex(0.1 * reactances[i], reactances[i])));
                    floating.Add((first + i, first + (i + size / 2) % size, new Complex(0, reactances[i + 29])));
                }

                TestMatrix part = TestMatrix.Nodal(n + size, floating.Where(b => b.Item1 != b.Item2), new Complex[n + size]);
                var whole = TestMatrix.FromEntries(
                    [.. sourced.Diagonal, .. part.Diagonal[n..]], [.. sourced.Edges, .. part.Edges]);
                Action factor = () => whole.Factor();
                factor.Should().Throw<SingularMatrixException>().Which.Node.Should().BeInRange(first, first + size - 1);
            });

    // Oracle: by hand. A node whose reactances to ground cancel, j10 − j10 = 0, and that hangs on nothing else.
    [Fact]
    public void A_resonance_at_a_single_node_is_refused()
    {
        Action factor = () => TestMatrix.FromEntries([Complex.One, Complex.Zero]).Factor();
        factor.Should().Throw<SingularMatrixException>().Which.Node.Should().Be(1);
    }

    // Oracle: by hand. Nodes 2 and 3, joined by j0.5, with −j2 and +j1 to ground: [−j4, j2; j2, −j1] has determinant −4 + 4 = 0.
    [Fact]
    public void A_resonance_between_two_nodes_is_refused_with_one_of_them()
    {
        var matrix = TestMatrix.Nodal(
            4, [(0, 1, new Complex(0.01, 0.1)), (2, 3, new Complex(0, 0.5))], [1, 0, new Complex(0, -2), new Complex(0, 1)]);
        Action factor = () => matrix.Factor();
        factor.Should().Throw<SingularMatrixException>().Which.Node.Should().BeInRange(2, 3);
    }

    // Oracle: the rule that nothing leaves as a silent NaN.
    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void A_value_that_is_not_finite_is_refused(double value)
    {
        TestMatrix matrix = TestMatrix.Mesh(4, 4, 3);
        matrix.Diagonal[5] = value;
        Action factor = () => matrix.Factor();
        factor.Should().Throw<SingularMatrixException>();
    }

    // Oracle: by hand. One source of admittance y at the end of a network without losses to ground: every node sees 1/y, and the path.
    // The matrix is far from singular to working precision, though y is 10⁻⁸ of its entries.
    [Fact]
    public void A_very_weak_source_is_weak_but_not_refused()
    {
        Complex[] toGround = new Complex[3];
        toGround[0] = new Complex(0, -1e-6);
        var matrix = TestMatrix.Nodal(3, [(0, 1, new Complex(0, 0.01)), (1, 2, new Complex(0, 0.01))], toGround);
        Complex z = SelectedInverse.Of(matrix.Factor()).Diagonal[2];
        (z - new Complex(0, 1e6 + 0.02)).Magnitude.Should().BeLessThan(1e6 * 1e-7);
    }

    // Oracle: Math.NET's dense inverse norm. Higham: the estimate is a lower bound, nearly always within a factor of three.
    // Ten thousand random networks showed one at eleven, so a hundred is where this test calls it broken.
    [Fact]
    public void The_condition_estimate_is_a_close_lower_bound() =>
        TestMatrix.WithNegativeReactances(40).Sample(matrix =>
        {
            double condition = matrix.Condition();
            if (condition < 1e10)
            {
                double estimate = ConditionEstimate.Of(matrix.Factor(), matrix.Diagonal, matrix.OffDiagonal);
                estimate.Should().BeInRange(condition / 100, condition * (1 + 1e-5));
            }
        });
}
