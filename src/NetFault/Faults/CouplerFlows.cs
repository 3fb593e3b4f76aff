using System.Numerics;

namespace NetFault;

/// <summary>
/// The currents through what joins buses without impedance, closed couplers and bridged capacitors, by Kirchhoff's current law: a joint
/// that alone holds two parts of a node together carries what enters beyond it. In rings of joints the current divides by impedances that
/// nobody gave, and is not claimed. One depth-first search a node finds the bridges (Tarjan 1974), without recursion.
/// </summary>
internal sealed class CouplerFlows
{
    private readonly StudyContext _context;
    private readonly List<(NetworkElement Joint, int From, int To)> _joints = [];
    private readonly List<int>[] _jointsAt;
    private readonly Complex[] _beyond;     // what enters the bus's subtree of the search
    private readonly int[] _order;          // order of discovery from 1, by bus
    private readonly int[] _low;
    private readonly int[] _next;           // how many of the bus's joints were followed
    private readonly int[] _cameBy;         // the joint by which the bus was discovered
    private readonly Complex?[] _current;
    private int _count;

    private CouplerFlows(StudyContext context, Complex[] injections)
    {
        var buses = injections.Length;
        _context = context;
        _beyond = injections;
        _jointsAt = new List<int>[buses];
        (_order, _low, _next, _cameBy) = (new int[buses], new int[buses], new int[buses], new int[buses]);
        Gather(context.Network, context.Network.BusCouplers);
        Gather(context.Network, context.Network.SeriesCapacitors);
        _current = new Complex?[_joints.Count];
    }

    /// <summary>The flows, given what flows into each bus per unit from everything but joints.</summary>
    public static IReadOnlyList<CouplerFlow> Of(StudyContext context, Complex[] injections)
    {
        var flows = new CouplerFlows(context, injections);
        for (var bus = 0; bus < injections.Length; bus++)
        {
            if (flows._order[bus] == 0 && flows._jointsAt[bus] is not null)
                flows.Search(bus);
        }
        return flows._joints.Select(flows.Flow).ToList().AsReadOnly();
    }

    private void Gather<T>(Network network, IReadOnlyList<T> joints) where T : NetworkElement
    {
        var first = network.Topology.FirstOfKind<T>();
        for (var i = 0; i < joints.Count; i++)
        {
            if (joints[i].Role != ElementRole.Joint || !network.Topology.IsActive(first + i))
                continue;
            int from = network.Topology.TerminalBus(first + i, 0), to = network.Topology.TerminalBus(first + i, 1);
            (_jointsAt[from] ??= []).Add(_joints.Count);
            (_jointsAt[to] ??= []).Add(_joints.Count);
            _joints.Add((joints[i], from, to));
        }
    }

    private void Search(int root)
    {
        var open = new Stack<int>();
        Discover(root, -1, open);
        while (open.Count > 0)
        {
            var bus = open.Peek();
            if (_next[bus] < _jointsAt[bus].Count)
                Follow(bus, _jointsAt[bus][_next[bus]++], open);
            else
                Leave(open.Pop());
        }
    }

    private void Discover(int bus, int joint, Stack<int> open)
    {
        _order[bus] = _low[bus] = ++_count;
        _cameBy[bus] = joint;
        open.Push(bus);
    }

    private void Follow(int bus, int joint, Stack<int> open)
    {
        var other = Other(joint, bus);
        if (_order[other] == 0)
            Discover(other, joint, open);
        else if (joint != _cameBy[bus])
            _low[bus] = Math.Min(_low[bus], _order[other]);
    }

    /// <summary>A subtree that reaches nothing above by another joint hangs on the one it came by: that carries all that enters it.</summary>
    private void Leave(int bus)
    {
        var joint = _cameBy[bus];
        if (joint < 0)
            return;
        var parent = Other(joint, bus);
        _low[parent] = Math.Min(_low[parent], _low[bus]);
        if (_low[bus] > _order[parent])
            _current[joint] = _joints[joint].From == bus ? _beyond[bus] : -_beyond[bus];
        _beyond[parent] += _beyond[bus];
    }

    private int Other(int joint, int bus) => _joints[joint].From == bus ? _joints[joint].To : _joints[joint].From;

    private CouplerFlow Flow((NetworkElement Joint, int From, int To) entry, int index)
    {
        var buses = _context.Network.Buses;
        return new CouplerFlow(
            entry.Joint.Section, entry.Joint.Id, buses[entry.From].Id, buses[entry.To].Id, _current[index] * _context.BaseKa(buses[entry.From]));
    }
}
