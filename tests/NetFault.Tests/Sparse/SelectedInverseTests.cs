using System.Numerics;
using CsCheck;
using MathNet.Numerics.LinearAlgebra;
using NetFault.Sparse;

namespace NetFault.Tests.Sparse;

public class SelectedInverseTests
{
    // Oracle: Math.NET's dense inverse. Both are accurate to the condition number times rounding, no better.
    [Fact]
    public void The_selected_inverse_of_a_passive_network_agrees_with_a_dense_inverse() =>
        TestMatrix.Passive(100).Sample(matrix => AgreesWithDense(matrix, SelectedInverse.Of(matrix.Factor())));

    // Oracle: the selected inverse itself, which the other tests check.
    [Fact]
    public void The_diagonal_alone_is_the_same_to_the_bit() =>
        TestMatrix.WithNegativeReactances(60).Sample(matrix =>
        {
            if (matrix.Condition() < 1e12)
            {
                LdlFactor factor = matrix.Factor();
                Complex[] diagonal = new Complex[matrix.Order];
                SelectedInverse.DiagonalOf(factor, diagonal);
                diagonal.Should().Equal(SelectedInverse.Of(factor).Diagonal.ToArray());
            }
        });

    // Oracle: as above, with the health check and its repairs in the way.
    [Fact]
    public void Negative_reactances_leave_the_selected_inverse_in_agreement_with_a_dense_inverse() =>
        TestMatrix.WithNegativeReactances(60).Sample(matrix =>
        {
            if (matrix.Condition() < 1e10)
            {
                LdlFactor factor = matrix.Factor();
                AgreesWithDense(matrix, SelectedInverse.Of(factor, matrix.Diagonal, matrix.OffDiagonal, out InverseHealth health));
                health.WorstResidual.Should().BeLessThan(1e-9);
            }
        });

    // Oracle: the solver's own columns, which FactorTests check against a dense residual.
    [Fact]
    public void The_selected_inverse_equals_the_columns_from_solves()
    {
        TestMatrix matrix = TestMatrix.Mesh(25, 40, 11);
        LdlFactor factor = matrix.Factor();
        SelectedInverse inverse = SelectedInverse.Of(factor);
        Complex[] x = new Complex[matrix.Order];
        var scratch = new SolveScratch(matrix.Order);
        for (int k = 0; k < matrix.Order; k++)
        {
            factor.SolveUnit(k, x, scratch);
            double tolerance = 1e-12 * x[k].Magnitude;
            (inverse.Diagonal[k] - x[k]).Magnitude.Should().BeLessThan(tolerance);
            for (int slot = matrix.Pattern.ColumnStart[k]; slot < matrix.Pattern.ColumnStart[k + 1]; slot++)
            {
                (inverse.OffDiagonal(slot) - x[matrix.Pattern.RowIndex[slot]]).Magnitude.Should().BeLessThan(tolerance);
            }
        }
    }

    // Oracle: by hand. Ends of 0.5 and 1 to ground joined through +j0.1 and −j0.1: seen from an end the pair is a short circuit, 1/1.5;
    // from the middle, (j0.1 + 2) and (−j0.1 + 1) in parallel.
    [Fact]
    public void A_shifted_pivot_leaves_no_trace_in_the_selected_inverse()
    {
        var matrix = TestMatrix.Nodal(3, [(0, 1, new Complex(0, 0.1)), (1, 2, new Complex(0, -0.1))], [0.5, 0, 1]);
        LdlFactor factor = SymbolicFactor.Analyze(matrix.Pattern, new Adjacency(matrix.Pattern), [1, 0, 2])
            .Factor(matrix.Diagonal, matrix.OffDiagonal);
        factor.ShiftedPivots.Should().Be(1);
        SelectedInverse inverse = SelectedInverse.Of(factor);
        Complex left = new(2, 0.1), right = new(1, -0.1);
        (inverse.Diagonal[0] - 1 / 1.5).Magnitude.Should().BeLessThan(1e-14);
        (inverse.Diagonal[2] - 1 / 1.5).Magnitude.Should().BeLessThan(1e-14);
        (inverse.Diagonal[1] - left * right / (left + right)).Magnitude.Should().BeLessThan(1e-14);
    }

    // Oracle: the definition, 1/a.
    [Fact]
    public void One_node_alone_is_its_own_inverse()
    {
        var matrix = TestMatrix.FromEntries([new Complex(3, -4)]);
        Complex z = SelectedInverse.Of(matrix.Factor()).Diagonal[0];
        (z - new Complex(3, 4) / 25).Magnitude.Should().BeLessThan(1e-16);
    }

    // Oracle: the definition; nothing has nothing.
    [Fact]
    public void A_matrix_without_rows_is_no_trouble()
    {
        TestMatrix matrix = TestMatrix.FromEntries([]);
        LdlFactor factor = matrix.Factor();
        SelectedInverse.Of(factor, matrix.Diagonal, matrix.OffDiagonal, out InverseHealth health).Diagonal.Length.Should().Be(0);
        health.WorstResidual.Should().Be(0);
        factor.Solve([], new SolveScratch(0));
        ConditionEstimate.Of(factor, [], []).Should().Be(0);
    }

    // Oracle: Math.NET's dense inverse of the matrix whose values are given, while the factors are those of a neighbour of it: refinement
    // must bring the suspect node to the former.
    [Fact]
    public void A_suspect_node_is_solved_anew_by_refinement()
    {
        TestMatrix matrix = TestMatrix.Mesh(6, 6, 5);
        LdlFactor factor = matrix.Factor();
        matrix.Diagonal[20] *= 1.001;
        SelectedInverse inverse = SelectedInverse.Of(factor, matrix.Diagonal, matrix.OffDiagonal, out InverseHealth health);
        health.Repaired.Should().Be(1);
        health.Suspects.Should().NotContain(20);
        Complex expected = matrix.Dense().Inverse()[20, 20];
        (inverse.Diagonal[20] - expected).Magnitude.Should().BeLessThan(1e-13 * expected.Magnitude);
    }

    // Oracle: a wrong inverse on purpose. The factors of one matrix are checked against the values of another.
    [Fact]
    public void The_health_check_finds_values_that_do_not_belong_to_the_factors_and_repairs_nothing_silently()
    {
        TestMatrix matrix = TestMatrix.Mesh(6, 6, 5);
        LdlFactor factor = matrix.Factor();
        Complex[] other = (Complex[])matrix.Diagonal.Clone();
        other[20] *= 1.001;
        InverseHealth health = InverseHealth.Check(SelectedInverse.Of(factor), matrix.Pattern, other, matrix.OffDiagonal);
        health.WorstNode.Should().Be(20);
        health.Suspects.Should().Equal(20);
        InverseHealth.Check(SelectedInverse.Of(factor), matrix.Pattern, matrix.Diagonal, matrix.OffDiagonal)
            .WorstResidual.Should().BeLessThan(1e-12);
    }

    private static void AgreesWithDense(TestMatrix matrix, SelectedInverse inverse)
    {
        Matrix<Complex> expected = matrix.Dense().Inverse();
        double tolerance = Math.Min(1e-9, 20 * (matrix.Order + 4) * TestMatrix.Epsilon * matrix.Condition()) * FactorTests.Largest(expected);
        for (int k = 0; k < matrix.Order; k++)
        {
            (inverse.Diagonal[k] - expected[k, k]).Magnitude.Should().BeLessThan(tolerance);
        }

        for (int e = 0; e < matrix.Edges.Length; e++)
        {
            Complex z = inverse.OffDiagonal(matrix.SlotOfEdge[e]);
            (z - expected[matrix.Edges[e].From, matrix.Edges[e].To]).Magnitude.Should().BeLessThan(tolerance);
        }
    }
}
