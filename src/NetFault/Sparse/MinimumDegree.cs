namespace NetFault.Sparse;

/// <summary>
/// A fill-reducing ordering in three parts: nodes of degree up to two as they come (<see cref="LowDegreeElimination"/>), the rest by
/// approximate minimum degree (<see cref="QuotientGraph"/>), and nodes with very many neighbours last of all.
/// </summary>
internal static unsafe class MinimumDegree
{
    /// <summary>Orders the nodes of a graph.</summary>
    /// <returns>The nodes in order of elimination.</returns>
    public static int[] Order(Adjacency graph)
    {
        int n = graph.Start.Length - 1;
        int[] order = new int[n];
        using var lists = new Scratch<int>(graph.Neighbour.Length + 1);
        using var work = new Scratch<int>(3 * n + 1);
        graph.Neighbour.CopyTo(lists.Span);
        fixed (int* start = graph.Start, neighbour = lists, d = work, ordered = order)
        {
            int dense = SetDenseNodesAside(n, start, neighbour, d, ordered);
            int low = new LowDegreeElimination(start, neighbour, d, d + n, ordered, n).Run();
            int core = n - low - dense;
            if (core > 0)
            {
                OrderCore(n, core, start, neighbour, d, ordered + low);
            }
        }

        return order;
    }

    /// <summary>
    /// A node joined to very many others would be rewritten at each of their eliminations, and comes last anyway: 10·√n as in the paper's
    /// successor codes. Its neighbours forget it.
    /// </summary>
    private static int SetDenseNodesAside(int n, int* start, int* neighbour, int* degree, int* order)
    {
        int limit = (int)Math.Max(16, 10 * Math.Sqrt(n)), dense = 0;
        for (int v = 0; v < n; v++)
        {
            degree[v] = start[v + 1] - start[v];
            if (degree[v] > limit)
            {
                degree[v] = LowDegreeElimination.Gone;
                order[n - ++dense] = v;
            }
        }

        for (int v = 0; v < n && dense > 0; v++)
        {
            degree[v] = degree[v] < 0 ? degree[v] : DropDense(start[v], degree[v], neighbour, degree);
        }

        return dense;
    }

    private static int DropDense(int from, int count, int* neighbour, int* degree)
    {
        int kept = from;
        for (int p = from; p < from + count; p++)
        {
            int other = neighbour[p];
            if (degree[other] != LowDegreeElimination.Gone)
            {
                neighbour[kept++] = other;
            }
        }

        return kept - from;
    }

    private static void OrderCore(int n, int core, int* start, int* neighbour, int* degree, int* order)
    {
        using var nameSpace = new Scratch<int>(n + core);
        Span<int> names = nameSpace.Span.Slice(0, core), newNames = nameSpace.Span.Slice(core);
        int found = 0, neighbours = 0;
        for (int v = 0; v < n; v++)
        {
            if (degree[v] >= 0)
            {
                names[found] = v;
                newNames[v] = found++;
                neighbours += degree[v];
            }
        }

        using var workspace = new Scratch<int>(QuotientGraph.WorkspaceLength(core, neighbours));
        fixed (int* w = workspace)
        {
            var graph = new QuotientGraph(core, neighbours, w);
            Fill(ref graph, names, newNames, start, neighbour, degree);
            graph.Run(order);
        }

        for (int k = 0; k < core; k++)
        {
            order[k] = names[order[k]];
        }
    }

    private static void Fill(
        ref QuotientGraph graph, ReadOnlySpan<int> names, ReadOnlySpan<int> newNames, int* start, int* neighbour, int* degree)
    {
        for (int node = 0; node < names.Length; node++)
        {
            int v = names[node];
            graph.AddNode(node);
            for (int p = start[v], end = p + degree[v]; p < end; p++)
            {
                graph.AddNeighbour(node, newNames[neighbour[p]]);
            }
        }
    }
}
