using NetFault.Sparse;

namespace NetFault.Tests.Sparse;

public class OrderingTests
{
    // Oracle: nested dissection of a square mesh (A. George 1973), of the asymptotically least fill, carried out here by halving with
    // straight separators. Minimum degree is known to come near it on meshes of this size; within a fifth is our own bound.
    [Theory]
    [InlineData(31)]
    [InlineData(63)]
    [InlineData(127)]
    public void Fill_on_a_square_mesh_is_within_a_fifth_of_nested_dissection(int side)
    {
        SymmetricPattern pattern = TestMatrix.Mesh(side, side, 10).Pattern;
        int ours = SymbolicFactor.Analyze(pattern).FactorEntries;
        int dissected = SymbolicFactor.Analyze(pattern, new Adjacency(pattern), Dissect(side)).FactorEntries;
        ((double)ours / dissected).Should().BeLessThan(1.2);
    }

    // Oracle: a forest eliminated from its leaves has no fill at all, so L has one entry a branch.
    [Fact]
    public void A_radial_network_has_no_fill()
    {
        var random = new Random(7);
        SymmetricPattern pattern = Pattern(5000, Enumerable.Range(1, 4999).Select(i => (i, random.Next(i))));
        SymbolicFactor.Analyze(pattern).FactorEntries.Should().Be(4999);
    }

    // Oracle: a ring of n nodes has n − 3 chords in any triangulation, so L has 2n − 3 entries.
    [Fact]
    public void A_ring_has_the_fill_of_a_triangulation()
    {
        SymmetricPattern pattern = Pattern(1000, Enumerable.Range(0, 1000).Select(i => (i, (i + 1) % 1000)));
        SymbolicFactor.Analyze(pattern).FactorEntries.Should().Be(1997);
    }

    // Oracle: a wheel is a ring whose chords are drawn beside the hub, which comes last: 2n − 3 for the ring and n spokes.
    [Fact]
    public void A_wheel_of_many_spokes_keeps_its_hub_for_last()
    {
        const int Rim = 50_000;
        SymmetricPattern pattern = Pattern(
            Rim + 1, Enumerable.Range(0, Rim).Select(i => (i, (i + 1) % Rim)).Concat(Enumerable.Range(0, Rim).Select(i => (i, Rim))));
        var symbolic = SymbolicFactor.Analyze(pattern);
        symbolic.NodeAt[Rim].Should().Be(Rim);
        symbolic.FactorEntries.Should().Be(2 * Rim - 3 + Rim);
    }

    private static SymmetricPattern Pattern(int order, IEnumerable<(int From, int To)> edges)
    {
        (int From, int To)[] all = [.. edges];
        return SymmetricPattern.FromEdges(order, all.Select(e => e.From).ToArray(), all.Select(e => e.To).ToArray(), new int[all.Length]);
    }

    private static int[] Dissect(int side)
    {
        var order = new List<int>();
        var pending = new Stack<(int Top, int Left, int Rows, int Columns)>([(0, 0, side, side)]);
        while (pending.TryPop(out var part)) // separators come out first and are reversed to the end
        {
            (int top, int left, int rows, int columns) = part;
            if (rows <= 0 || columns <= 0)
            {
                continue;
            }

            bool cutAcross = rows >= columns;
            int middle = (cutAcross ? rows : columns) / 2;
            for (int i = 0; i < (cutAcross ? columns : rows); i++)
            {
                order.Add(cutAcross ? (top + middle) * side + left + i : (top + i) * side + left + middle);
            }

            pending.Push(cutAcross ? (top, left, middle, columns) : (top, left, rows, middle));
            pending.Push(cutAcross
                ? (top + middle + 1, left, rows - middle - 1, columns)
                : (top, left + middle + 1, rows, columns - middle - 1));
        }

        order.Reverse();
        return [.. order];
    }
}
