namespace NetFault;

/// <summary>A node of the circuit: one bus, or several that closed couplers join.</summary>
/// <param name="Index">Its row and column in the study's matrices, from 0.</param>
/// <param name="BusIds">Its buses, in the order of the network.</param>
public sealed record StudyNode(int Index, IReadOnlyList<string> BusIds)
{
    internal static IReadOnlyList<StudyNode> Of(Circuit circuit)
    {
        var buses = new List<string>[circuit.NodeCount];
        for (var bus = 0; bus < circuit.NodeOfBus.Length; bus++)
        {
            if (circuit.NodeOfBus[bus] >= 0)
                (buses[circuit.NodeOfBus[bus]] ??= []).Add(circuit.Network.Buses[bus].Id);
        }
        return Array.AsReadOnly(buses.Select((ids, index) => new StudyNode(index, ids.AsReadOnly())).ToArray());
    }

    /// <summary>The node's buses, joined by equals signs.</summary>
    public override string ToString() => string.Join(" = ", BusIds);
}
