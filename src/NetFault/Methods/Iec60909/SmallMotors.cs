namespace NetFault;

/// <summary>
/// The rules by which motors may be left out (IEC 60909-0:2016, 6.10). For a fault in a zone, the buses that are connected without a
/// transformer: motors there count by ΣIrM ≤ 0.01·I″k; motors behind transformers that step down from the zone by
/// ΣPrM/ΣSrT ≤ 0.8/|100·c·ΣSrT/(√3·UnQ·I″kQ) − 0.3|, with I″k and I″kQ without motors. Motors elsewhere, behind transformers that step up, count
/// with those in the zone. All motors are left out where both rules hold.
/// </summary>
internal sealed class SmallMotors
{
    private readonly int[] _zoneOfNode;
    private readonly Dictionary<int, Sums> _sums;
    private readonly Circuit _circuit;

    public SmallMotors(Circuit circuit)
    {
        _circuit = circuit;
        var zones = new DisjointSets(circuit.NodeCount);
        foreach (var branch in circuit.Branches)
        {
            if (!IsTransformer(branch))
                zones.Unite(branch.From, branch.To);
        }
        _zoneOfNode = zones.Number(out var count);
        _sums = FindSums(count);
    }

    /// <summary>Whether there are motors around a node, and all of them may be left out there.</summary>
    /// <param name="node">The node.</param>
    /// <param name="c">The voltage factor there.</param>
    /// <param name="currentPu">I″k without motors per unit.</param>
    public bool AreSmall(int node, double c, double currentPu)
    {
        if (!_sums.TryGetValue(_zoneOfNode[node], out var sums) || sums is { DirectMva: 0.0, BehindMw: 0.0 })
            return false;
        var faultMva = currentPu * _circuit.Network.BaseMva;
        return sums.DirectMva <= 0.01 * faultMva && IsSmallBehind(sums, c, faultMva);
    }

    private static bool IsSmallBehind(in Sums sums, double c, double faultMva) => sums.BehindMw == 0.0
        || sums.BehindMw / sums.TransformerMva <= 0.8 / Math.Abs(100.0 * c * sums.TransformerMva / faultMva - 0.3);

    private bool IsTransformer(in CircuitBranch branch) => _circuit.Network.Elements[branch.Element] is Transformer or ThreeWindingTransformer;

    private Dictionary<int, Sums> FindSums(int zones)
    {
        var islands = Islands.OfNodes(_circuit);
        var steps = StepsDown(zones);
        var motors = new (double Mva, double Mw)[zones];
        var islandMva = new Dictionary<int, double>();
        foreach (var source in _circuit.Sources)
        {
            if (Ratings(_circuit.Network.Elements[source.Element]) is not { } ratings)
                continue;
            var zone = _zoneOfNode[source.Node];
            motors[zone] = (motors[zone].Mva + ratings.Mva, motors[zone].Mw + ratings.Mw);
            islandMva[islands[source.Node]] = (islandMva.TryGetValue(islands[source.Node], out var sum) ? sum : 0.0) + ratings.Mva;
        }
        var sums = new Dictionary<int, Sums>();
        for (var node = 0; node < _zoneOfNode.Length; node++)
        {
            if (islandMva.TryGetValue(islands[node], out var all) && !sums.ContainsKey(_zoneOfNode[node]))
                sums.Add(_zoneOfNode[node], Sum(_zoneOfNode[node], steps, motors, all));
        }
        return sums;
    }

    /// <summary>For each zone the transformers that step down from it, with the zones they lead to.</summary>
    private List<(int Zone, double Mva)>[] StepsDown(int zones)
    {
        var steps = new List<(int Zone, double Mva)>[zones];
        foreach (var branch in _circuit.Branches)
        {
            if (!IsTransformer(branch))
                continue;
            double from = Kv(branch.Element, branch.FromTerminal), to = Kv(branch.Element, branch.ToTerminal);
            int upper = _zoneOfNode[from >= to ? branch.From : branch.To], lower = _zoneOfNode[from >= to ? branch.To : branch.From];
            (steps[upper] ??= []).Add((lower, RatedMva(branch)));
        }
        return steps;
    }

    private double RatedMva(in CircuitBranch branch) => _circuit.Network.Elements[branch.Element] switch
    {
        Transformer transformer => transformer.RatedMva,
        ThreeWindingTransformer transformer => ThreeWindingTransformerCircuit.PairOf(transformer, branch.FromTerminal, branch.ToTerminal).RatedMva,
        _ => 0.0,
    };

    private double Kv(int element, int terminal) => _circuit.Network.Buses[_circuit.Network.Topology.TerminalBus(element, terminal)].NominalKv;

    private static Sums Sum(int zone, List<(int Zone, double Mva)>[] steps, (double Mva, double Mw)[] motors, double islandMva)
    {
        var transformerMva = 0.0;
        var behind = new HashSet<int>();
        foreach (var (lower, mva) in steps[zone] ?? [])
        {
            var below = Below(lower, steps);
            below.Remove(zone);
            if (!below.Any(one => motors[one].Mw > 0.0))
                continue;
            transformerMva += mva;
            behind.UnionWith(below);
        }
        double behindMva = behind.Sum(one => motors[one].Mva), behindMw = behind.Sum(one => motors[one].Mw);
        // What rounding leaves of a difference of equal sums is no motor.
        var direct = islandMva - behindMva;
        return new Sums(direct > 1e-9 * islandMva ? direct : 0.0, behindMw, transformerMva);
    }

    private static HashSet<int> Below(int zone, List<(int Zone, double Mva)>[] steps)
    {
        var below = new HashSet<int> { zone };
        var open = new Stack<int>(below);
        while (open.Count > 0)
        {
            foreach (var (lower, _) in steps[open.Pop()] ?? [])
            {
                if (below.Add(lower))
                    open.Push(lower);
            }
        }
        return below;
    }

    private static (double Mva, double Mw)? Ratings(NetworkElement element) => element switch
    {
        AsynchronousMotor motor => (motor.RatedMvaOfOne * motor.Count, motor.RatedKw / 1000.0 * motor.Count),
        ConverterFedDrive drive => (drive.RatedMva, drive.RatedMva),
        _ => null,
    };

    /// <summary>What counts for faults in a zone.</summary>
    /// <param name="DirectMva">Rated power of the motors in the zone and elsewhere but below it, in MVA.</param>
    /// <param name="BehindMw">ΣPrM of the motors behind transformers that step down from it, in MW.</param>
    /// <param name="TransformerMva">ΣSrT of these transformers, in MVA.</param>
    private readonly record struct Sums(double DirectMva, double BehindMw, double TransformerMva);
}
