namespace NetFault;

/// <summary>
/// The sum of the rated currents of all motors in each connected part of a circuit, for the rule by which small motors may be left out (IEC
/// 60909-0:2016, 6.10): ΣIrM ≤ 0.01·I″k, I″k without motors. All motors of the part count here, not only those connected without a
/// transformer, so that fewer are left out than the standard would allow.
/// </summary>
internal sealed class RatedMotors
{
    private readonly Dictionary<int, double> _perUnitByIsland = [];
    private readonly int[] _islandOfNode;

    public RatedMotors(Circuit circuit)
    {
        _islandOfNode = Islands.OfNodes(circuit);
        foreach (var source in circuit.Sources)
        {
            var mva = circuit.Network.Elements[source.Element] switch
            {
                AsynchronousMotor motor => motor.RatedMvaOfOne * motor.Count,
                ConverterFedDrive drive => drive.RatedMva,
                _ => 0.0,
            };
            var island = _islandOfNode[source.Node];
            _perUnitByIsland[island] = (_perUnitByIsland.TryGetValue(island, out var sum) ? sum : 0.0) + mva / circuit.Network.BaseMva;
        }
    }

    /// <summary>Whether the motors around a node are small against the current there without them.</summary>
    public bool AreSmall(int node, double currentWithoutMotorsPu) =>
        _perUnitByIsland.TryGetValue(_islandOfNode[node], out var sum) && sum > 0.0 && sum <= 0.01 * currentWithoutMotorsPu;
}
