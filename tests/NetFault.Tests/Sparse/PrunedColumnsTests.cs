using System.Numerics;
using CsCheck;
using NetFault.Sparse;

namespace NetFault.Tests.Sparse;

/// <summary>Oracle: whole columns by solves, looked through entry by entry.</summary>
public class PrunedColumnsTests
{
    [Fact]
    public void Every_entry_above_the_share_is_found_and_none_below_it() =>
        Gen.Select(TestMatrix.Passive(80), Gen.Double[0.01, 1.2]).Sample((matrix, share) => Check(matrix, share));

    [Fact]
    public void With_negative_reactances_and_shifted_pivots_nothing_is_missed_either() =>
        Gen.Select(TestMatrix.WithNegativeReactances(60), Gen.Double[0.01, 1.2]).Sample((matrix, share) =>
        {
            if (matrix.Condition() < 1e10)
                Check(matrix, share);
        });

    [Fact]
    public void In_a_large_mesh_only_the_surroundings_of_a_node_are_visited()
    {
        var matrix = TestMatrix.Mesh(40, 50, 3);
        var factor = matrix.Factor();
        var columns = PrunedColumns.Of(factor, SelectedInverse.Of(factor).Diagonal);
        var scratch = new PrunedColumns.Scratch(matrix.Order);
        var visited = 0;
        for (var node = 0; node < matrix.Order; node += 37)
        {
            var found = new List<(int Node, Complex Value)>();
            columns.Find(node, 0.5, found, scratch);
            found.Should().Contain(one => one.Node == node);
            visited = Math.Max(visited, found.Count);
            scratch.X.Should().OnlyContain(value => value == Complex.Zero);
        }
        visited.Should().BeLessThan(matrix.Order);
    }

    private static void Check(TestMatrix matrix, double share)
    {
        var factor = matrix.Factor();
        var inverse = SelectedInverse.Of(factor);
        var columns = PrunedColumns.Of(factor, inverse.Diagonal);
        var scratch = new PrunedColumns.Scratch(matrix.Order);
        var whole = new Complex[matrix.Order];
        for (var node = 0; node < matrix.Order; node++)
        {
            factor.SolveUnit(node, whole, new SolveScratch(matrix.Order));
            var found = new List<(int Node, Complex Value)>();
            columns.Find(node, share, found, scratch);
            var byNode = found.ToDictionary(one => one.Node, one => one.Value);
            for (var k = 0; k < matrix.Order; k++)
            {
                double size = whole[k].Magnitude, limit = share * inverse.Diagonal[k].Magnitude, rounding = 1e-9 * (size + limit);
                if (size > limit + rounding)
                    (byNode[k] - whole[k]).Magnitude.Should().BeLessThan(rounding);
                else if (size < limit - rounding)
                    byNode.Should().NotContainKey(k);
            }
        }
    }
}
