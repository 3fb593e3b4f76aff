using System.Numerics;
using CsCheck;
using MathNet.Numerics.LinearAlgebra;
using NetFault.Sparse;

namespace NetFault.Tests.Sparse;

public class PatternTests
{
    private static readonly Gen<(int Order, (int From, int To)[] Edges)> Graphs =
        Gen.Int[2, 40].SelectMany(n => Gen.Select(Gen.Int[0, n - 1], Gen.Int[0, n - 1]).Where(e => e.Item1 != e.Item2)
            .Select(e => (From: e.Item1, To: e.Item2)).Array[0, 4 * n].Select(edges => (n, edges)));

    // Oracle: a sorted set of pairs.
    [Fact]
    public void Slots_are_the_distinct_pairs_in_column_order_and_every_edge_finds_its_own() =>
        Graphs.Sample((n, edges) =>
        {
            (SymmetricPattern pattern, int[] slots) = Build(n, edges);
            var expected = edges.Select(Key).Distinct().Order().ToList();
            var found = new List<(int Column, int Row)>();
            for (int j = 0; j < n; j++)
            {
                for (int slot = pattern.ColumnStart[j]; slot < pattern.ColumnStart[j + 1]; slot++)
                {
                    found.Add((j, pattern.RowIndex[slot]));
                }
            }

            found.Should().Equal(expected);
            slots.Select(slot => expected[slot]).Should().Equal(edges.Select(Key));
        });

    // Oracle: Math.NET's dense product and norm.
    [Fact]
    public void Products_and_norms_agree_with_dense_ones() =>
        TestMatrix.WithNegativeReactances(40).Sample(matrix =>
        {
            Complex[] x = FactorTests.Load(matrix.Order), y = new Complex[matrix.Order];
            SymmetricProduct.Multiply(matrix.Pattern, matrix.Diagonal, matrix.OffDiagonal, x, y);
            Matrix<Complex> dense = matrix.Dense();
            Complex[] expected = (dense * MathNet.Numerics.LinearAlgebra.Vector<Complex>.Build.Dense(x)).ToArray();
            double norm = dense.InfinityNorm();
            for (int i = 0; i < x.Length; i++)
            {
                (y[i] - expected[i]).Magnitude.Should().BeLessThan(1e-14 * norm * 10);
            }

            SymmetricProduct.Norm(matrix.Pattern, matrix.Diagonal, matrix.OffDiagonal).Should().BeApproximately(norm, 1e-13 * norm);
        });

    // Oracle: the definition of a permutation. The graphs are dense enough to reach supervariables, absorption and compression.
    [Fact]
    public void The_ordering_is_a_permutation() =>
        Graphs.Sample((n, edges) =>
        {
            (SymmetricPattern pattern, _) = Build(n, edges);
            MinimumDegree.Order(new Adjacency(pattern)).Order().Should().Equal(Enumerable.Range(0, n));
        });

    // Oracle: elimination played out on sets of neighbours, in the order that was chosen.
    [Fact]
    public void The_pattern_of_L_is_what_elimination_on_sets_gives() =>
        Graphs.Sample((n, edges) =>
        {
            (SymmetricPattern pattern, int[] slots) = Build(n, edges);
            var symbolic = SymbolicFactor.Analyze(pattern);
            HashSet<int>[] later = [.. Enumerable.Range(0, n).Select(_ => new HashSet<int>())];
            foreach ((int from, int to) in edges)
            {
                int a = symbolic.PlaceOf[from], b = symbolic.PlaceOf[to];
                later[Math.Min(a, b)].Add(Math.Max(a, b));
            }

            for (int j = 0; j < n; j++)
            {
                int[] rows = [.. later[j].Order()];
                symbolic.RowIndex[symbolic.ColumnStart[j]..symbolic.ColumnStart[j + 1]].Should().Equal(rows);
                symbolic.Parent[j].Should().Be(rows.Length == 0 ? -1 : rows[0]);
                foreach (int row in rows)
                {
                    later[row].UnionWith(rows.Where(r => r > row));
                }
            }

            for (int e = 0; e < edges.Length; e++)
            {
                int a = symbolic.PlaceOf[edges[e].From], b = symbolic.PlaceOf[edges[e].To], p = symbolic.PositionOfSlot[slots[e]];
                symbolic.RowIndex[p].Should().Be(Math.Max(a, b));
                (p >= symbolic.ColumnStart[Math.Min(a, b)] && p < symbolic.ColumnStart[Math.Min(a, b) + 1]).Should().BeTrue();
            }
        });

    private static (int, int) Key((int From, int To) e) => (Math.Min(e.From, e.To), Math.Max(e.From, e.To));

    private static (SymmetricPattern Pattern, int[] Slots) Build(int n, (int From, int To)[] edges)
    {
        int[] slots = new int[edges.Length];
        return (SymmetricPattern.FromEdges(n, edges.Select(e => e.From).ToArray(), edges.Select(e => e.To).ToArray(), slots), slots);
    }
}
