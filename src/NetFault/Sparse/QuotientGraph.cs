using System.Diagnostics;

namespace NetFault.Sparse;

/// <summary>
/// Approximate minimum degree on a quotient graph: P. R. Amestoy, T. A. Davis, I. S. Duff, "An approximate minimum degree ordering
/// algorithm", SIAM J. Matrix Anal. Appl. 17 (1996) 886–905. Eliminated nodes live on as elements: an element stands for the clique of
/// the variables in its list. A variable's list holds its elements first, then the variables it is still joined to directly.
/// With element absorption, aggressive absorption, mass elimination and merging of indistinguishable variables.
/// </summary>
internal unsafe ref partial struct QuotientGraph
{
    private const int IsElement = -1;   // in elementCount
    private const int Dead = 0;         // in mark: an absorbed element
    private const int None = -1;

    private readonly int nodes;
    private readonly int capacity;
    private readonly int* list;         // all lists, length capacity
    private readonly int* start;        // start of each variable's or element's list
    private readonly int* length;       // its length
    private readonly int* elementCount; // how many elements lead a variable's list; IsElement for an element
    private readonly int* size;         // nodes in a supervariable; negative while in the pivot's element; 0 once merged or eliminated
    private readonly int* degree;       // upper bound of a variable's external degree; an element's nodes
    private readonly int* mark;         // elements: Dead, or compared with stamp; variables: scratch when comparing lists
    private readonly int* nextMember;   // the nodes merged into a supervariable, a chain from its name
    private readonly int* lastMember;
    private readonly int* bucket;       // hash buckets of the variables in the pivot's element
    private readonly int* nextInBucket;
    private readonly int* hash;
    private DegreeLists byDegree;
    private int free;                   // list is used up to here
    private int stamp;                  // all marks of living elements are below
    private int eliminated;

    /// <summary>Ints of workspace for a graph.</summary>
    /// <param name="nodes">Number of nodes.</param>
    /// <param name="neighbours">Total length of the neighbour lists.</param>
    public static int WorkspaceLength(int nodes, int neighbours) => 15 * nodes + ListCapacity(nodes, neighbours);

    /// <summary>One element more than the graph itself always fits; a fifth on top keeps compression rare (the paper's choice).</summary>
    private static int ListCapacity(int nodes, int neighbours) => neighbours + neighbours / 5 + nodes + 1;

    /// <param name="nodes">Number of nodes.</param>
    /// <param name="neighbours">Total length of the neighbour lists that will be added.</param>
    /// <param name="workspace">Of <see cref="WorkspaceLength"/>; need not be cleared.</param>
    public QuotientGraph(int nodes, int neighbours, int* workspace)
    {
        this.nodes = nodes;
        capacity = ListCapacity(nodes, neighbours);
        start = workspace;
        length = start + nodes;
        elementCount = length + nodes;
        size = elementCount + nodes;
        degree = size + nodes;
        mark = degree + nodes;
        nextMember = mark + nodes;
        lastMember = nextMember + nodes;
        bucket = lastMember + nodes;
        nextInBucket = bucket + nodes;
        hash = nextInBucket + nodes;
        byDegree = new DegreeLists(hash + nodes, nodes);
        list = hash + 4 * nodes;
        new Span<int>(bucket, nodes).Fill(None);
        stamp = 2;
    }

    /// <summary>Begins the next node's neighbour list; nodes are added in order, each followed by its neighbours.</summary>
    public readonly void AddNode(int node)
    {
        start[node] = free;
        length[node] = 0;
        elementCount[node] = 0;
        size[node] = 1;
        mark[node] = 1;
        nextMember[node] = None;
        lastMember[node] = node;
    }

    /// <summary>Adds a neighbour to the node added last.</summary>
    public void AddNeighbour(int node, int neighbour)
    {
        list[free++] = neighbour;
        length[node]++;
    }

    /// <summary>Orders all nodes.</summary>
    /// <param name="order">Out: the nodes in order of elimination.</param>
    public void Run(int* order)
    {
        for (int v = 0; v < nodes; v++)
        {
            degree[v] = length[v];
            byDegree.Insert(v, degree[v]);
        }

        while (eliminated < nodes)
        {
            order = Eliminate(byDegree.TakeLeast(), order);
        }
    }

    private int* Eliminate(int pivot, int* order)
    {
        if (free + degree[pivot] > capacity)
        {
            Compress();
        }

        int pivotSize = size[pivot];
        eliminated += pivotSize;
        FormElement(pivot);
        MeasureElementsOutside(pivot);
        UpdateDegrees(pivot);
        MergeIndistinguishable(pivot);
        RestoreDegreeLists(pivot);
        for (int member = pivot; member != None; member = nextMember[member])
        {
            *order++ = member;
        }

        return order;
    }

    /// <summary>L_p: what the pivot is joined to, directly or through its elements, which it absorbs.</summary>
    private void FormElement(int pivot)
    {
        int from = start[pivot], elements = elementCount[pivot], variables = length[pivot] - elements;
        int begin = free, end = free;
        size[pivot] = 0;
        degree[pivot] = 0;
        for (int p = from; p < from + elements; p++)
        {
            int element = list[p];
            if (mark[element] != Dead)
            {
                end = Join(pivot, start[element], length[element], end);
                mark[element] = Dead;
            }
        }

        end = Join(pivot, from + elements, variables, end);
        Debug.Assert(end <= capacity);
        free = end;
        start[pivot] = begin;
        length[pivot] = end - begin;
        elementCount[pivot] = IsElement;
        mark[pivot] = 1;
    }

    private int Join(int pivot, int from, int count, int end)
    {
        for (int p = from; p < from + count; p++)
        {
            int i = list[p], nodesIn = size[i];
            if (nodesIn > 0)
            {
                size[i] = -nodesIn;
                degree[pivot] += nodesIn;
                byDegree.Remove(i, degree[i]);
                list[end++] = i;
            }
        }

        return end;
    }

    /// <summary>Leaves mark[e] − stamp = |L_e \ L_p| for every element e that touches L_p.</summary>
    private readonly void MeasureElementsOutside(int pivot)
    {
        for (int p = start[pivot], end = p + length[pivot]; p < end; p++)
        {
            int i = list[p], nodesIn = -size[i];
            for (int q = start[i], last = q + elementCount[i]; q < last; q++)
            {
                int element = list[q];
                if (mark[element] >= stamp)
                {
                    mark[element] -= nodesIn;
                }
                else if (mark[element] != Dead)
                {
                    mark[element] = degree[element] + stamp - nodesIn;
                }
            }
        }
    }

    /// <summary>Gives living variables of the pivot's element back to the degree lists, with the paper's bound on their degree.</summary>
    private void RestoreDegreeLists(int pivot)
    {
        int begin = start[pivot], kept = begin, left = nodes - eliminated;
        for (int p = begin, end = begin + length[pivot]; p < end; p++)
        {
            int i = list[p], nodesIn = -size[i];
            if (nodesIn > 0)
            {
                size[i] = nodesIn;
                degree[i] = Math.Min(degree[i] + degree[pivot] - nodesIn, left - nodesIn);
                byDegree.Insert(i, degree[i]);
                list[kept++] = i;
            }
        }

        length[pivot] = kept - begin;
        free = kept;
        mark[pivot] = kept == begin ? Dead : 1;
        AdvanceStamp();
    }

    private void AdvanceStamp()
    {
        if (stamp < int.MaxValue - 4 * (nodes + 1))
        {
            stamp += nodes + 1;
            return;
        }

        for (int v = 0; v < nodes; v++)
        {
            mark[v] = Math.Min(mark[v], 1);
        }

        stamp = 2;
    }

    /// <summary>Moves the living lists to the front, in the order in which they lie.</summary>
    private void Compress()
    {
        for (int v = 0; v < nodes; v++)
        {
            bool lives = elementCount[v] == IsElement ? mark[v] != Dead : size[v] != 0;
            if (lives && length[v] > 0)
            {
                int first = start[v];
                start[v] = list[first]; // the entry is kept here while its place bears the owner's name
                list[first] = ~v;
            }
        }

        int to = 0;
        for (int from = 0; from < free;)
        {
            int owner = ~list[from++];
            if (owner >= 0)
            {
                list[to] = start[owner];
                start[owner] = to++;
                for (int rest = length[owner] - 1; rest > 0; rest--)
                {
                    list[to++] = list[from++];
                }
            }
        }

        free = to;
    }
}
