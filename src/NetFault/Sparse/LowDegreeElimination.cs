namespace NetFault.Sparse;

/// <summary>
/// The first phase of the minimum-degree ordering: nodes with no, one or two neighbours left. Eliminating such a node removes an edge,
/// or replaces two edges by one, so the neighbour lists never grow and no quotient graph is needed. In a power network this takes most
/// of the nodes. What remains has degree three and more everywhere, and is ordered by <see cref="QuotientGraph"/>.
/// </summary>
internal unsafe ref struct LowDegreeElimination
{
    private readonly int* start;        // start of each node's list in neighbour
    private readonly int* neighbour;    // live neighbours, first degree[v] entries of each list
    private readonly int* degree;       // live degree; Gone once eliminated
    private readonly int* pendants;     // nodes that have come down to degree 0 or 1, a stack
    private readonly int* links;        // nodes that have come down to degree 2, a queue
    private readonly int* order;
    private int pendantCount;
    private int linkHead;
    private int linkTail;
    private int ordered;

    /// <summary>The degree of a node that has been eliminated or set aside.</summary>
    public const int Gone = -1;

    /// <param name="start">Starts of the neighbour lists.</param>
    /// <param name="neighbour">The neighbour lists; overwritten.</param>
    /// <param name="degree">Lengths of the lists; <see cref="Gone"/> for a node that must not be touched.</param>
    /// <param name="workspace">2 × nodes.</param>
    /// <param name="order">Out: the eliminated nodes in order.</param>
    /// <param name="nodes">Number of nodes.</param>
    public LowDegreeElimination(int* start, int* neighbour, int* degree, int* workspace, int* order, int nodes)
    {
        this.start = start;
        this.neighbour = neighbour;
        this.degree = degree;
        this.order = order;
        pendants = workspace;
        links = workspace + nodes;
        for (int v = 0; v < nodes; v++)
        {
            if (degree[v] == 0)
            {
                pendants[pendantCount++] = v;
            }

            Enqueue(v);
        }
    }

    /// <summary>Eliminates until every degree is at least three.</summary>
    /// <returns>How many nodes were eliminated.</returns>
    public int Run()
    {
        while (true)
        {
            if (pendantCount > 0)
            {
                EliminatePendant(pendants[--pendantCount]);
            }
            else if (linkHead < linkTail)
            {
                EliminateLink(links[linkHead++]);
            }
            else
            {
                return ordered;
            }
        }
    }

    private void EliminatePendant(int v)
    {
        if (degree[v] == 1)
        {
            Disconnect(neighbour[start[v]], v);
        }

        Take(v);
    }

    private void EliminateLink(int v)
    {
        if (degree[v] != 2)
        {
            return; // eliminated as a pendant since it was queued
        }

        int a = neighbour[start[v]], b = neighbour[start[v] + 1];
        Take(v);
        if (AreNeighbours(a, b))
        {
            Disconnect(a, v);
            Disconnect(b, v);
        }
        else
        {
            neighbour[Find(a, v)] = b;
            neighbour[Find(b, v)] = a;
        }
    }

    private void Take(int v)
    {
        degree[v] = Gone;
        order[ordered++] = v;
    }

    private void Disconnect(int from, int gone)
    {
        int last = start[from] + --degree[from];
        neighbour[Find(from, gone)] = neighbour[last];
        Enqueue(from);
    }

    /// <summary>Queues a node whose degree has just come down; degree 0 is always reached through 1, and is in the stack already.</summary>
    private void Enqueue(int v)
    {
        if (degree[v] == 2)
        {
            links[linkTail++] = v;
        }
        else if (degree[v] == 1)
        {
            pendants[pendantCount++] = v;
        }
    }

    private readonly int Find(int list, int node)
    {
        int p = start[list];
        while (neighbour[p] != node)
        {
            p++;
        }

        return p;
    }

    private readonly bool AreNeighbours(int a, int b)
    {
        int shorter = degree[a] <= degree[b] ? a : b, other = shorter == a ? b : a;
        for (int p = start[shorter], end = p + degree[shorter]; p < end; p++)
        {
            if (neighbour[p] == other)
            {
                return true;
            }
        }

        return false;
    }
}
