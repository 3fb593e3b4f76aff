using System.Numerics;

namespace NetFault;

/// <summary>
/// The currents through closed couplers, by Kirchhoff's current law: where the couplers of a node form a tree, what enters beyond one has to
/// come through it. Leaves are peeled off one by one; what is left is rings, whose currents nothing determines.
/// </summary>
internal sealed class CouplerFlows
{
    private readonly StudyContext _context;
    private readonly Complex[] _surplus;
    private readonly List<int>[] _couplersAt;
    private readonly List<(NetworkElement Joint, int From, int To)> _couplers = [];
    private readonly Complex?[] _current;
    private readonly bool[] _done;

    private CouplerFlows(StudyContext context, Complex[] injections)
    {
        _context = context;
        _surplus = injections;
        _couplersAt = new List<int>[injections.Length];
        Gather(context.Network);
        _current = new Complex?[_couplers.Count];
        _done = new bool[_couplers.Count];
    }

    /// <summary>The flows, given what flows into each bus per unit from everything but couplers.</summary>
    public static IReadOnlyList<CouplerFlow> Of(StudyContext context, Complex[] injections)
    {
        var flows = new CouplerFlows(context, injections);
        flows.PeelLeaves();
        return flows._couplers.Select(flows.Flow).OfType<CouplerFlow>().ToList().AsReadOnly();
    }

    /// <summary>Closed couplers, and capacitors that their voltage-limiting devices bridge: current passes these too.</summary>
    private void Gather(Network network)
    {
        Gather(network, network.BusCouplers);
        Gather(network, network.SeriesCapacitors);
    }

    private void Gather<T>(Network network, IReadOnlyList<T> joints) where T : NetworkElement
    {
        var first = network.Topology.FirstOfKind<T>();
        for (var i = 0; i < joints.Count; i++)
        {
            if (joints[i].Role != ElementRole.Joint || !network.Topology.IsActive(first + i))
                continue;
            int from = network.Topology.TerminalBus(first + i, 0), to = network.Topology.TerminalBus(first + i, 1);
            (_couplersAt[from] ??= []).Add(_couplers.Count);
            (_couplersAt[to] ??= []).Add(_couplers.Count);
            _couplers.Add((joints[i], from, to));
        }
    }

    private void PeelLeaves()
    {
        var open = _couplersAt.Select(list => list?.Count ?? 0).ToArray();
        var leaves = new Stack<int>(Enumerable.Range(0, open.Length).Where(bus => open[bus] == 1));
        while (leaves.Count > 0)
        {
            var leaf = leaves.Pop();
            if (open[leaf] != 1)
                continue;
            var only = _couplersAt[leaf].First(coupler => !_done[coupler]);
            var other = Settle(only, leaf);
            open[leaf]--;
            if (--open[other] == 1)
                leaves.Push(other);
        }
    }

    /// <summary>Sends a leaf's surplus through its only coupler left, and gives the bus at the other side.</summary>
    private int Settle(int coupler, int leaf)
    {
        var (_, from, to) = _couplers[coupler];
        var other = from == leaf ? to : from;
        _current[coupler] = from == leaf ? _surplus[leaf] : -_surplus[leaf];
        _surplus[other] += _surplus[leaf];
        _done[coupler] = true;
        return other;
    }

    private CouplerFlow? Flow((NetworkElement Joint, int From, int To) entry, int index)
    {
        var baseKa = _context.BaseKa(_context.Network.Buses[entry.From]);
        return entry.Joint is BusCoupler coupler ? new CouplerFlow(coupler.Id, coupler.From, coupler.To, _current[index] * baseKa) : null;
    }
}
