using System.Numerics;

namespace NetFault;

/// <summary>
/// A way of calculating short-circuit currents: which impedance and driving voltage each element gets, and how the impedance at the fault
/// becomes currents over time. Methods are immutable options; their defaults are stated with each.
/// </summary>
public abstract record FaultMethod
{
    private protected FaultMethod()
    {
    }

    /// <summary>The method's name, as results and reports show it.</summary>
    public abstract string Name { get; }

    /// <summary>The rule by which X/R at the fault is found.</summary>
    internal abstract XOverRRule RatioRule { get; }

    /// <summary>The instants for which symmetrical currents are calculated; the initial one always is.</summary>
    internal abstract FaultInstants CalculatedInstants { get; }

    /// <summary>The networks that every result of this method needs; the initial one first.</summary>
    internal abstract IReadOnlyList<NetworkVariant> Networks { get; }

    /// <summary>The network of an instant.</summary>
    internal abstract NetworkVariant NetworkAt(FaultInstant instant);

    /// <summary>What the method changes about the impedances of branches.</summary>
    internal virtual BranchRules BranchRules(Network network) => new();

    /// <summary>The voltage that drives the fault current at a bus, per unit on its nominal voltage.</summary>
    internal abstract double DrivingVoltagePu(Bus bus);

    /// <summary>The impedance of each source of a circuit in a network, per unit; null where it is not in it.</summary>
    internal abstract Complex?[] SourceImpedances(Circuit circuit, NetworkVariant variant, AssumptionLog? log);

    /// <summary>Says what the currents over time rest on, beside what <see cref="SourceImpedances"/> says.</summary>
    internal virtual void LogOverTime(Circuit circuit, AssumptionLog log)
    {
    }

    /// <summary>Sets the method to work on a study.</summary>
    internal abstract CurrentsOfMethod Begin(StudyNetworks networks);
}

/// <summary>An instant of the short circuit, by the reactance of the machines that governs it.</summary>
public enum FaultInstant
{
    /// <summary>The beginning: subtransient reactances, I″k. By <see cref="IeeeC37"/> the first-cycle network.</summary>
    Initial,

    /// <summary>After the subtransient decay: transient reactances, I′k. By <see cref="IeeeC37"/> the interrupting network.</summary>
    Transient,

    /// <summary>The end: synchronous reactances at constant excitation, Ik. By <see cref="IeeeC37"/> the 30-cycle network.</summary>
    SteadyState,
}

/// <summary>A choice of the instants to calculate beside the initial one.</summary>
[Flags]
public enum FaultInstants
{
    /// <summary>I″k alone, which always is calculated.</summary>
    InitialOnly = 0,

    /// <summary>I′k too.</summary>
    Transient = 1,

    /// <summary>Ik too.</summary>
    SteadyState = 2,

    /// <summary>I″k, I′k and Ik.</summary>
    All = Transient | SteadyState,
}

/// <summary>How X/R at the fault is found. The rules differ where sources of different X/R meet; no result is without its rule.</summary>
public enum XOverRRule
{
    /// <summary>Im Zk / Re Zk of the complex impedance at the fault.</summary>
    ComplexImpedance,

    /// <summary>
    /// X of the network of the reactances alone over R of the network of the resistances alone, as IEEE Std C37.010 asks for. An element
    /// without resistance gets R = |X|/200 there, which is said to be assumed.
    /// </summary>
    SeparateNetworks,

    /// <summary>The smallest R/X of all branches and sources that the bus is connected with: IEC 60909-0, method (a) for the peak.</summary>
    SmallestRatio,

    /// <summary>
    /// R/X of the network solved at 20 Hz (24 Hz in 60 Hz networks), brought to rated frequency: IEC 60909-0, method (c) for the peak.
    /// </summary>
    EquivalentFrequency,
}
