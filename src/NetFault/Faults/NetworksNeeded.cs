using System.Numerics;

namespace NetFault;

/// <summary>One of the networks that a method's results need.</summary>
/// <param name="Use">What its impedance at the fault is used for.</param>
/// <param name="Name">Its name for people.</param>
/// <param name="Choose">Finds it among a study's networks.</param>
internal sealed record NeededNetwork(NetworkUse Use, string Name, Func<StudyNetworks, SolvedNetwork> Choose);

/// <summary>What a network's impedance at the fault is used for.</summary>
internal enum NetworkUse
{
    /// <summary>I″k, and X/R by the complex impedance.</summary>
    Initial,

    /// <summary>I′k.</summary>
    Transient,

    /// <summary>Ik.</summary>
    SteadyState,

    /// <summary>X of the separate networks.</summary>
    Reactance,

    /// <summary>R of the separate networks.</summary>
    Resistance,
}

/// <summary>Lists the networks that a method needs.</summary>
internal static class NetworksNeeded
{
    private static readonly NeededNetwork Initial = new(NetworkUse.Initial, "initial network", n => n.At(FaultInstant.Initial));
    private static readonly NeededNetwork Transient = new(NetworkUse.Transient, "transient network", n => n.At(FaultInstant.Transient));
    private static readonly NeededNetwork Steady = new(NetworkUse.SteadyState, "steady-state network", n => n.At(FaultInstant.SteadyState));
    private static readonly NeededNetwork Reactance = new(NetworkUse.Reactance, "network of the reactances", n => n.Reactances);
    private static readonly NeededNetwork Resistance = new(NetworkUse.Resistance, "network of the resistances", n => n.Resistances);

    /// <summary>The initial network first, then what the method's options add.</summary>
    public static IReadOnlyList<NeededNetwork> Of(FaultMethod method)
    {
        var needed = new List<NeededNetwork> { Initial };
        if (method.CalculatedInstants.HasFlag(FaultInstants.Transient))
            needed.Add(Transient);
        if (method.CalculatedInstants.HasFlag(FaultInstants.SteadyState))
            needed.Add(Steady);
        if (method.XOverRRule == XOverRRule.SeparateNetworks)
            needed.AddRange([Reactance, Resistance]);
        return needed;
    }
}

/// <summary>The impedances at all nodes, of all networks that a method needs.</summary>
internal sealed class NodeImpedances
{
    private readonly DrivingPointImpedances?[] _byUse = new DrivingPointImpedances?[5];
    private readonly double _worstResidual;

    public NodeImpedances(IReadOnlyList<NeededNetwork> networks, DrivingPointImpedances[] impedances)
    {
        for (var i = 0; i < impedances.Length; i++)
        {
            _byUse[(int)networks[i].Use] = impedances[i];
            _worstResidual = Math.Max(_worstResidual, impedances[i].WorstResidual);
        }
    }

    /// <summary>The impedances seen from one node.</summary>
    public FaultImpedances At(int node) => new(
        _byUse[0]!.Impedances[node],
        Find(NetworkUse.Transient, node),
        Find(NetworkUse.SteadyState, node),
        Find(NetworkUse.Reactance, node)?.Imaginary,
        Find(NetworkUse.Resistance, node)?.Real,
        _worstResidual);

    private Complex? Find(NetworkUse use, int node) => _byUse[(int)use]?.Impedances[node];
}

/// <summary>The impedances seen from the place of a fault, per unit.</summary>
/// <param name="Initial">Zk of the initial network.</param>
/// <param name="Transient">Zk of the transient network; null where it is not calculated.</param>
/// <param name="SteadyState">Zk of the steady-state network; null where it is not calculated.</param>
/// <param name="SeparateX">Xk of the network of the reactances alone; null where the rule does not ask for it.</param>
/// <param name="SeparateR">Rk of the network of the resistances alone; null where the rule does not ask for it.</param>
/// <param name="Residual">The largest residual of the solutions these come from.</param>
internal readonly record struct FaultImpedances(
    Complex Initial, Complex? Transient, Complex? SteadyState, double? SeparateX, double? SeparateR, double Residual)
{
    /// <summary>The same with the impedance of the fault itself in series.</summary>
    public FaultImpedances Plus(Complex z) => this with
    {
        Initial = Initial + z,
        Transient = Transient + z,
        SteadyState = SteadyState + z,
        SeparateX = SeparateX + z.Imaginary,
        SeparateR = SeparateR + z.Real,
    };
}
