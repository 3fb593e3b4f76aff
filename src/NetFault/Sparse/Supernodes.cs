namespace NetFault.Sparse;

/// <summary>
/// Runs of columns of L in which each has the rows of the next and the next itself: dense blocks. A supernode's front is the dense matrix
/// over its own columns and the rows below them; the front of a child lies right behind its parent's, so that the fronts on the way
/// from a root to the present supernode stand in memory one after another, and what is off that way is overwritten.
/// </summary>
internal sealed class Supernodes
{
    private Supernodes(int[] first, int[] parent, long[] frontStart, long frontSpace)
    {
        First = first;
        Parent = parent;
        FrontStart = frontStart;
        FrontSpace = frontSpace;
    }

    /// <summary>Number of supernodes.</summary>
    public int Count => Parent.Length;

    /// <summary>The first column of each, length <see cref="Count"/> + 1.</summary>
    public int[] First { get; }

    /// <summary>The supernode of the first row below each; −1 if there is none.</summary>
    public int[] Parent { get; }

    /// <summary>Where each front starts.</summary>
    public long[] FrontStart { get; }

    /// <summary>Entries needed for all fronts on the longest way down.</summary>
    public long FrontSpace { get; }

    /// <summary>Finds the supernodes of a postordered factor, O(columns).</summary>
    /// <param name="parent">The elimination tree.</param>
    /// <param name="columnStart">Starts of the columns of L.</param>
    public static Supernodes Find(int[] parent, int[] columnStart)
    {
        int n = parent.Length, count = 0;
        using var starts = new Scratch<int>(n + 1);
        using var owners = new Scratch<int>(n + 1);
        Span<int> first = starts.Span, supernodeOf = owners.Span;
        for (int j = 0; j < n; j++)
        {
            if (j == 0 || !Continues(j, parent, columnStart))
            {
                first[count++] = j;
            }

            supernodeOf[j] = count - 1;
        }

        first[count] = n;
        return PlaceFronts(first.Slice(0, count + 1).ToArray(), supernodeOf, parent, columnStart);
    }

    private static bool Continues(int j, int[] parent, int[] columnStart) =>
        parent[j - 1] == j && columnStart[j] - columnStart[j - 1] == columnStart[j + 1] - columnStart[j] + 1;

    private static Supernodes PlaceFronts(int[] first, ReadOnlySpan<int> supernodeOf, int[] parent, int[] columnStart)
    {
        int count = first.Length - 1;
        int[] above = new int[count];
        long[] start = new long[count];
        long space = 0;
        for (int s = count - 1; s >= 0; s--)
        {
            int up = parent[first[s + 1] - 1];
            above[s] = up < 0 ? EliminationTree.None : supernodeOf[up];
            start[s] = up < 0 ? 0 : start[above[s]] + FrontEntries(above[s]);
            space = Math.Max(space, start[s] + FrontEntries(s));
        }

        return new Supernodes(first, above, start, space);

        long FrontEntries(int s)
        {
            long size = columnStart[first[s] + 1] - columnStart[first[s]] + 1;
            return size * size;
        }
    }
}
