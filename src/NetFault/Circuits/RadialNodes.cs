namespace NetFault;

/// <summary>
/// Which nodes are fed radially: with the node taken out, no connected part of what is left holds more than one source, so that each source
/// feeds the node by a way of its own. One depth-first search over biconnected parts (Tarjan 1972; Hopcroft, Tarjan 1973), without recursion.
/// </summary>
internal sealed class RadialNodes
{
    private readonly CircuitGraph _graph;
    private readonly int[] _sourcesAt;
    private readonly int[] _order;      // order of discovery from 1, by node
    private readonly int[] _low;        // smallest order that the node's subtree reaches by one back edge
    private readonly int[] _parentBranch;  // the branch by which it was discovered, −1 at a root
    private readonly int[] _beneath;    // sources in the node's subtree
    private readonly int[] _cutOff;     // sources in the parts beneath the node that it alone holds
    private readonly bool[] _radial;
    private int _count;

    private RadialNodes(Circuit circuit, CircuitGraph graph, Func<CircuitSource, bool> counts)
    {
        var n = circuit.NodeCount;
        _graph = graph;
        _sourcesAt = new int[n];
        foreach (var source in circuit.Sources)
            _sourcesAt[source.Node] += counts(source) ? 1 : 0;
        (_order, _low, _parentBranch, _beneath, _cutOff) = (new int[n], new int[n], new int[n], new int[n], new int[n]);
        _radial = new bool[n];
    }

    /// <summary>For each node, whether it is fed radially.</summary>
    /// <param name="circuit">The circuit.</param>
    /// <param name="graph">Its graph.</param>
    /// <param name="counts">Which sources are there.</param>
    public static bool[] Of(Circuit circuit, CircuitGraph graph, Func<CircuitSource, bool> counts)
    {
        var nodes = new RadialNodes(circuit, graph, counts);
        for (var root = 0; root < circuit.NodeCount; root++)
        {
            if (nodes._order[root] == 0)
                nodes.Search(root);
        }
        return nodes._radial;
    }

    private void Search(int root)
    {
        var discovered = new List<int>();
        var stack = new Stack<(int Node, int End)>();
        Discover(root, -1, discovered);
        stack.Push((root, _graph.Start(root)));
        while (stack.Count > 0)
        {
            var (node, end) = stack.Pop();
            if (end == _graph.End(node))
            {
                if (stack.Count > 0)
                    Leave(node, stack.Peek().Node);
                continue;
            }
            stack.Push((node, end + 1));
            Follow(node, end, discovered, stack);
        }
        JudgeParts(root, discovered);
    }

    private void Discover(int node, int parentBranch, List<int> discovered)
    {
        _order[node] = _low[node] = ++_count;
        _parentBranch[node] = parentBranch;
        _beneath[node] = _sourcesAt[node];
        _radial[node] = true;
        discovered.Add(node);
    }

    private void Follow(int node, int end, List<int> discovered, Stack<(int Node, int End)> stack)
    {
        var other = _graph.Neighbour(node, end);
        if (_graph.Branch(end) == _parentBranch[node] || other == node)
            return;
        if (_order[other] != 0)
        {
            _low[node] = Math.Min(_low[node], _order[other]);
            return;
        }
        Discover(other, _graph.Branch(end), discovered);
        stack.Push((other, _graph.Start(other)));
    }

    /// <summary>A child that reaches nothing above its parent is cut off with the parent taken out.</summary>
    private void Leave(int child, int parent)
    {
        _low[parent] = Math.Min(_low[parent], _low[child]);
        _beneath[parent] += _beneath[child];
        if (_low[child] < _order[parent])
            return;
        _cutOff[parent] += _beneath[child];
        _radial[parent] &= _beneath[child] <= 1;
    }

    /// <summary>What is neither at a node nor cut off beneath it is one part above it.</summary>
    private void JudgeParts(int root, List<int> discovered)
    {
        foreach (var node in discovered)
        {
            if (node != root)
                _radial[node] &= _beneath[root] - _sourcesAt[node] - _cutOff[node] <= 1;
        }
    }
}
