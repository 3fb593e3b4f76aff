namespace NetFault.Sparse;

/// <summary>Nodes in doubly linked lists by degree: takes out any node, and finds one of least degree, in constant time but for the scan.</summary>
internal unsafe ref struct DegreeLists
{
    private const int None = -1;

    private readonly int* head;     // head[d]: first node of degree d
    private readonly int* next;
    private readonly int* previous;
    private int least;              // no list below this degree holds a node

    /// <param name="workspace">3 × nodes.</param>
    /// <param name="nodes">Number of nodes; degrees are less.</param>
    public DegreeLists(int* workspace, int nodes)
    {
        head = workspace;
        next = workspace + nodes;
        previous = next + nodes;
        new Span<int>(head, nodes).Fill(None);
    }

    /// <summary>Puts a node in front of its list.</summary>
    public void Insert(int node, int degree)
    {
        int first = head[degree];
        next[node] = first;
        previous[node] = None;
        if (first != None)
        {
            previous[first] = node;
        }

        head[degree] = node;
        least = Math.Min(least, degree);
    }

    /// <summary>Takes a node out of the list of its degree.</summary>
    public readonly void Remove(int node, int degree)
    {
        int after = next[node], before = previous[node];
        if (after != None)
        {
            previous[after] = before;
        }

        if (before != None)
        {
            next[before] = after;
        }
        else
        {
            head[degree] = after;
        }
    }

    /// <summary>Takes out a node of least degree; there must be one.</summary>
    public int TakeLeast()
    {
        while (head[least] == None)
        {
            least++;
        }

        int node = head[least];
        Remove(node, least);
        return node;
    }
}
