namespace NetFault;

/// <summary>The nodes and branches of a circuit as a graph, in compressed form.</summary>
internal sealed class CircuitGraph
{
    private readonly int[] _start;
    private readonly int[] _branch;
    private readonly Circuit _circuit;

    public CircuitGraph(Circuit circuit)
    {
        _circuit = circuit;
        _start = new int[circuit.NodeCount + 1];
        foreach (var branch in circuit.Branches)
        {
            _start[branch.From + 1]++;
            _start[branch.To + 1]++;
        }
        for (var i = 1; i < _start.Length; i++)
            _start[i] += _start[i - 1];
        _branch = new int[_start[^1]];
        var next = (int[])_start.Clone();
        for (var i = 0; i < circuit.Branches.Length; i++)
        {
            _branch[next[circuit.Branches[i].From]++] = i;
            _branch[next[circuit.Branches[i].To]++] = i;
        }
    }

    /// <summary>Index of a node's first branch end.</summary>
    public int Start(int node) => _start[node];

    /// <summary>Index after a node's last branch end.</summary>
    public int End(int node) => _start[node + 1];

    /// <summary>The branch of a branch end.</summary>
    public int Branch(int end) => _branch[end];

    /// <summary>The node at the other side of a branch end.</summary>
    public int Neighbour(int node, int end)
    {
        var branch = _circuit.Branches[_branch[end]];
        return branch.From == node ? branch.To : branch.From;
    }

    /// <summary>
    /// A voltage level for each node, so that between the ends of each branch of a tree the levels stand as its ratio: what a voltage or
    /// current at one node is at another, through the transformers between.
    /// </summary>
    public double[] Levels()
    {
        var level = new double[_circuit.NodeCount];
        var queue = new Queue<int>();
        for (var root = 0; root < level.Length; root++)
        {
            if (level[root] != 0.0)
                continue;
            level[root] = 1.0;
            queue.Enqueue(root);
            while (queue.Count > 0)
                Spread(queue.Dequeue(), level, queue);
        }
        return level;
    }

    /// <summary>Whether every branch agrees with the levels, so that it does not matter by which way one goes.</summary>
    public bool Agrees(double[] level)
    {
        foreach (var branch in _circuit.Branches)
        {
            double from = level[branch.From] * branch.FromRatio, to = level[branch.To] * branch.ToRatio;
            if (Math.Abs(from - to) > 1e-12 * Math.Abs(from))
                return false;
        }
        return true;
    }

    /// <summary>The nodes that one reaches by the branches that may be passed.</summary>
    /// <param name="from">Where to begin.</param>
    /// <param name="passes">Whether a branch may be passed to a node.</param>
    public HashSet<int> Reached(int from, Func<int, int, bool> passes)
    {
        var reached = new HashSet<int> { from };
        var open = new Stack<int>(reached);
        while (open.Count > 0)
        {
            var node = open.Pop();
            for (var end = _start[node]; end < _start[node + 1]; end++)
            {
                var other = Neighbour(node, end);
                if (passes(_branch[end], other) && reached.Add(other))
                    open.Push(other);
            }
        }
        return reached;
    }

    private void Spread(int node, double[] level, Queue<int> queue)
    {
        for (var end = _start[node]; end < _start[node + 1]; end++)
        {
            var branch = _circuit.Branches[_branch[end]];
            var other = Neighbour(node, end);
            if (level[other] != 0.0)
                continue;
            level[other] = level[node] * (branch.From == node ? branch.FromRatio / branch.ToRatio : branch.ToRatio / branch.FromRatio);
            queue.Enqueue(other);
        }
    }
}
