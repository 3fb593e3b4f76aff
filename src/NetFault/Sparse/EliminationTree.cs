namespace NetFault.Sparse;

/// <summary>
/// The elimination tree of a symmetric matrix: J. W. H. Liu, "The role of elimination trees in sparse factorization", SIAM J. Matrix
/// Anal. Appl. 11 (1990) 134–172. The parent of column j is the row of its first entry below the diagonal in L.
/// </summary>
internal static unsafe class EliminationTree
{
    /// <summary>The parent of a root.</summary>
    public const int None = -1;

    /// <summary>
    /// Finds parents and the number of entries in each column of L below the diagonal, by walking row by row through the subtrees that
    /// make up each row of L: T. A. Davis, "Algorithm 849: a concise sparse Cholesky factorization package", ACM TOMS 31 (2005) 587–591.
    /// Time is the number of entries of L.
    /// </summary>
    /// <param name="graph">The matrix's graph, in original numbering.</param>
    /// <param name="order">Original node at each place of the elimination order.</param>
    /// <param name="place">The inverse of <paramref name="order"/>.</param>
    /// <param name="parent">Out, by place.</param>
    /// <param name="count">Out, by place.</param>
    public static void Build(Adjacency graph, ReadOnlySpan<int> order, ReadOnlySpan<int> place, Span<int> parent, Span<int> count)
    {
        int n = order.Length;
        using var visitedFor = new Scratch<int>(n + 1);
        fixed (int* start = graph.Start, neighbour = graph.Neighbour, at = place, up = parent, inColumn = count, visited = visitedFor)
        {
            for (int k = 0; k < n; k++)
            {
                int node = order[k];
                up[k] = None;
                inColumn[k] = 0;
                visited[k] = k;
                for (int p = start[node], end = start[node + 1]; p < end; p++)
                {
                    for (int i = at[neighbour[p]]; i < k && visited[i] != k; i = up[i])
                    {
                        up[i] = up[i] == None ? k : up[i];
                        inColumn[i]++;
                        visited[i] = k;
                    }
                }
            }
        }
    }

    /// <summary>A postorder: children before parents, each subtree in one run, which keeps what belongs together close in memory.</summary>
    /// <param name="parent">The tree.</param>
    /// <param name="order">Out: the place in the old order of each place in the new one.</param>
    public static void Postorder(ReadOnlySpan<int> parent, Span<int> order)
    {
        int n = parent.Length;
        using var children = new Scratch<int>(2 * n + 1);
        Span<int> firstChild = children.Span.Slice(0, n), nextSibling = children.Span.Slice(n, n);
        firstChild.Fill(None);
        int root = None;
        for (int j = n - 1; j >= 0; j--)
        {
            int above = parent[j];
            nextSibling[j] = above == None ? root : firstChild[above];
            if (above == None)
            {
                root = j;
            }
            else
            {
                firstChild[above] = j;
            }
        }

        Walk(root, parent, firstChild, nextSibling, order);
    }

    /// <summary>Down to the first leaf, then to siblings and up again; the tree itself is the stack.</summary>
    private static void Walk(
        int root, ReadOnlySpan<int> parent, ReadOnlySpan<int> firstChild, ReadOnlySpan<int> nextSibling, Span<int> order)
    {
        int j = root, placed = 0;
        while (placed < order.Length)
        {
            while (firstChild[j] != None)
            {
                j = firstChild[j];
            }

            while (true)
            {
                order[placed++] = j;
                if (nextSibling[j] != None)
                {
                    j = nextSibling[j];
                    break;
                }

                j = parent[j];
                if (j == None)
                {
                    break;
                }
            }
        }
    }
}
