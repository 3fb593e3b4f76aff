namespace NetFault;

/// <summary>Disjoint sets with path halving and union by index (Tarjan 1975): near-linear, no recursion.</summary>
internal sealed class DisjointSets
{
    private readonly int[] _parent;

    public DisjointSets(int count)
    {
        _parent = new int[count];
        for (var i = 0; i < count; i++)
            _parent[i] = i;
    }

    /// <summary>Makes one set of the two that hold these members; the smaller representative stays.</summary>
    public void Unite(int one, int other)
    {
        one = Find(one);
        other = Find(other);
        if (one < other)
            _parent[other] = one;
        else
            _parent[one] = other;
    }

    /// <summary>The representative of a member's set: its smallest member.</summary>
    public int Find(int member)
    {
        while (_parent[member] != member)
            member = _parent[member] = _parent[_parent[member]];
        return member;
    }

    /// <summary>Numbers the sets from 0 in the order of their smallest members, and gives each member's set.</summary>
    public int[] Number(out int count)
    {
        var number = new int[_parent.Length];
        count = 0;
        for (var i = 0; i < number.Length; i++)
            number[i] = Find(i) == i ? count++ : number[Find(i)];
        return number;
    }
}
