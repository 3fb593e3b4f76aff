namespace NetFault.Sparse;

/// <summary>Every node's neighbours, both directions of each slot: the graph of a <see cref="SymmetricPattern"/>.</summary>
internal sealed class Adjacency
{
    /// <summary>Lists the neighbours of each node, O(nodes + slots).</summary>
    public Adjacency(SymmetricPattern pattern)
    {
        int n = pattern.Order;
        int[] columnStart = pattern.ColumnStart, rowIndex = pattern.RowIndex;
        int[] start = new int[n + 1], neighbour = new int[2 * rowIndex.Length], slots = new int[neighbour.Length];
        CountDegrees(columnStart, rowIndex, start);
        for (int column = 0; column < n; column++)
        {
            for (int slot = columnStart[column]; slot < columnStart[column + 1]; slot++)
            {
                int row = rowIndex[slot];
                slots[start[row]] = slot;
                neighbour[start[row]++] = column;
                slots[start[column]] = slot;
                neighbour[start[column]++] = row;
            }
        }

        // Each start has run to its list's end, which is the next list's start.
        Array.Copy(start, 0, start, 1, n);
        start[0] = 0;
        Start = start;
        Neighbour = neighbour;
        Slot = slots;
    }

    /// <summary>Length nodes + 1.</summary>
    public int[] Start { get; }

    /// <summary>Length 2 × slots.</summary>
    public int[] Neighbour { get; }

    /// <summary>The slot that joins a node to each neighbour.</summary>
    public int[] Slot { get; }

    private static void CountDegrees(int[] columnStart, int[] rowIndex, int[] start)
    {
        int n = start.Length - 1;
        foreach (int row in rowIndex)
        {
            start[row]++;
        }

        int sum = 0;
        for (int i = 0; i <= n; i++)
        {
            int degree = i < n ? start[i] + columnStart[i + 1] - columnStart[i] : 0;
            start[i] = sum;
            sum += degree;
        }
    }
}
