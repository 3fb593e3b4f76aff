using System.Diagnostics;

namespace NetFault.Sparse;

/// <summary>
/// Where a symmetric matrix may be non-zero: the strictly lower triangle in compressed columns. The diagonal is always taken as
/// present. A slot is an index into <see cref="RowIndex"/>; values of the matrix are given to the solver in slot order.
/// </summary>
internal sealed class SymmetricPattern
{
    private SymmetricPattern(int order, int[] columnStart, int[] rowIndex)
    {
        Order = order;
        ColumnStart = columnStart;
        RowIndex = rowIndex;
    }

    /// <summary>Number of rows, and of columns.</summary>
    public int Order { get; }

    /// <summary>Length <see cref="Order"/> + 1: column j's slots are ColumnStart[j] up to, not including, ColumnStart[j + 1].</summary>
    public int[] ColumnStart { get; }

    /// <summary>The row of each slot, larger than its column, ascending in each column.</summary>
    public int[] RowIndex { get; }

    /// <summary>Number of entries below the diagonal.</summary>
    public int SlotCount => RowIndex.Length;

    /// <summary>
    /// Gathers unordered node pairs; edges between the same two nodes share one slot. Two bucket passes, O(nodes + edges).
    /// </summary>
    /// <param name="order">Number of nodes.</param>
    /// <param name="from">One end of each edge, 0 to <paramref name="order"/> − 1.</param>
    /// <param name="to">The other end, different from <paramref name="from"/>.</param>
    /// <param name="slotOfEdge">Out: the slot of each edge.</param>
    public static SymmetricPattern FromEdges(int order, ReadOnlySpan<int> from, ReadOnlySpan<int> to, Span<int> slotOfEdge)
    {
        Debug.Assert(from.Length == to.Length && slotOfEdge.Length == from.Length);
        int[] byRow = SortByHigherEnd(order, from, to);
        int[] bucket = CountLowerEnds(order, from, to);
        int[] edgeAt = new int[from.Length];
        foreach (int edge in byRow)
        {
            edgeAt[bucket[Math.Min(from[edge], to[edge])]++] = edge;
        }

        return MergeParallel(order, from, to, edgeAt, slotOfEdge);
    }

    private static int[] SortByHigherEnd(int order, ReadOnlySpan<int> from, ReadOnlySpan<int> to)
    {
        int[] bucket = new int[order + 1];
        for (int e = 0; e < from.Length; e++)
        {
            Debug.Assert(from[e] != to[e]);
            bucket[Math.Max(from[e], to[e]) + 1]++;
        }

        Accumulate(bucket);
        int[] sorted = new int[from.Length];
        for (int e = 0; e < from.Length; e++)
        {
            sorted[bucket[Math.Max(from[e], to[e])]++] = e;
        }

        return sorted;
    }

    private static int[] CountLowerEnds(int order, ReadOnlySpan<int> from, ReadOnlySpan<int> to)
    {
        int[] bucket = new int[order + 1];
        for (int e = 0; e < from.Length; e++)
        {
            bucket[Math.Min(from[e], to[e]) + 1]++;
        }

        Accumulate(bucket);
        return bucket;
    }

    private static void Accumulate(int[] bucket)
    {
        for (int i = 1; i < bucket.Length; i++)
        {
            bucket[i] += bucket[i - 1];
        }
    }

    /// <summary>Edges come sorted by column, then row, so that parallel ones are neighbours.</summary>
    private static SymmetricPattern MergeParallel(
        int order, ReadOnlySpan<int> from, ReadOnlySpan<int> to, int[] edgeAt, Span<int> slotOfEdge)
    {
        int[] columnStart = new int[order + 1];
        int[] rows = new int[edgeAt.Length];
        int slots = 0, lastColumn = -1;
        foreach (int edge in edgeAt)
        {
            int column = Math.Min(from[edge], to[edge]), row = Math.Max(from[edge], to[edge]);
            if (column != lastColumn || rows[slots - 1] != row)
            {
                rows[slots++] = row;
                columnStart[column + 1]++;
                lastColumn = column;
            }

            slotOfEdge[edge] = slots - 1;
        }

        Accumulate(columnStart);
        Array.Resize(ref rows, slots);
        return new SymmetricPattern(order, columnStart, rows);
    }
}
