using System.Numerics;

namespace NetFault;

/// <summary>From what the symmetrical currents by IEEE Std C37.010 are found.</summary>
public enum IeeeCurrentRule
{
    /// <summary>E/Z: the complex impedance at the fault, resistances counted.</summary>
    EOverZ,

    /// <summary>
    /// E/X: the reactance of the network of the reactances alone. Never below E/Z where no reactance is negative, so on the safe side.
    /// </summary>
    EOverX,
}

/// <summary>
/// Short-circuit currents by IEEE Std C37.010, for breakers rated on a symmetrical current basis: a first-cycle, an interrupting and a
/// 30-cycle network with the standard's reactance multipliers of rotating machines, X/R from separate networks of reactances and of
/// resistances. <c>docs/ieee-c37.md</c> goes through the rules. No AC decrement is credited but what the multipliers of motors hold.
/// </summary>
public sealed record IeeeC37 : FaultMethod
{
    internal static readonly NetworkVariant FirstCycle = new() { Name = "first-cycle network" };
    internal static readonly NetworkVariant Interrupting = new() { Name = "interrupting network", Instant = FaultInstant.Transient };
    internal static readonly NetworkVariant ThirtyCycle = new() { Name = "30-cycle network", Instant = FaultInstant.SteadyState };

    internal static readonly NetworkVariant FirstCycleReactances = FirstCycle with
    {
        Name = "first-cycle network of the reactances", Part = ImpedancePart.Reactance,
    };

    internal static readonly NetworkVariant FirstCycleResistances = FirstCycle with
    {
        Name = "first-cycle network of the resistances", Part = ImpedancePart.Resistance,
    };

    internal static readonly NetworkVariant InterruptingReactances = Interrupting with
    {
        Name = "interrupting network of the reactances", Part = ImpedancePart.Reactance,
    };

    internal static readonly NetworkVariant InterruptingResistances = Interrupting with
    {
        Name = "interrupting network of the resistances", Part = ImpedancePart.Resistance,
    };

    internal static readonly NetworkVariant ThirtyCycleReactances = ThirtyCycle with
    {
        Name = "30-cycle network of the reactances", Part = ImpedancePart.Reactance,
    };

    private static readonly IReadOnlyList<NetworkVariant> ForEOverZ =
    [
        FirstCycle, Interrupting, ThirtyCycle, FirstCycleReactances, FirstCycleResistances, InterruptingReactances, InterruptingResistances,
    ];

    private static readonly IReadOnlyList<NetworkVariant> ForEOverX =
    [
        FirstCycleReactances, InterruptingReactances, ThirtyCycleReactances, FirstCycleResistances, InterruptingResistances,
    ];

    private readonly double _prefaultVoltagePu = 1.0;
    private readonly IeeeCurrentRule _currentRule;

    /// <summary>
    /// From this time after the beginning of the fault, in cycles, the interrupting network counts; before it the first-cycle one.
    /// </summary>
    public const double InterruptingFromCycles = 1.5;

    /// <summary>From this time after the beginning of the fault, in cycles, the AC component is that of the 30-cycle network.</summary>
    public const double ThirtyCycleFromCycles = 30.0;

    /// <inheritdoc/>
    public override string Name => CurrentRule == IeeeCurrentRule.EOverZ ? "IEEE C37.010, E/Z" : "IEEE C37.010, E/X";

    /// <summary>The voltage E before the fault at every bus, per unit on its nominal voltage; above 0. Default 1.0.</summary>
    /// <exception cref="ArgumentOutOfRangeException">Not a finite number above 0.</exception>
    public double PrefaultVoltagePu
    {
        get => _prefaultVoltagePu;
        init => _prefaultVoltagePu = Guard.Positive(value, nameof(PrefaultVoltagePu));
    }

    /// <summary>Whether the symmetrical currents are E/Z, the default, or E/X.</summary>
    /// <exception cref="ArgumentOutOfRangeException">None of the two.</exception>
    public IeeeCurrentRule CurrentRule
    {
        get => _currentRule;
        init => _currentRule = Guard.OneOf(value, IeeeCurrentRule.EOverZ, IeeeCurrentRule.EOverX);
    }

    internal override XOverRRule RatioRule => XOverRRule.SeparateNetworks;

    /// <summary>None beside the initial one: interrupting and 30-cycle currents are neither I′k nor Ik.</summary>
    internal override FaultInstants CalculatedInstants => FaultInstants.InitialOnly;

    internal override IReadOnlyList<NetworkVariant> Networks => CurrentRule == IeeeCurrentRule.EOverZ ? ForEOverZ : ForEOverX;

    internal override NetworkVariant NetworkAt(FaultInstant instant) => (instant, CurrentRule) switch
    {
        (FaultInstant.Initial, IeeeCurrentRule.EOverZ) => FirstCycle,
        (FaultInstant.Initial, _) => FirstCycleReactances,
        (FaultInstant.Transient, IeeeCurrentRule.EOverZ) => Interrupting,
        (FaultInstant.Transient, _) => InterruptingReactances,
        (_, IeeeCurrentRule.EOverZ) => ThirtyCycle,
        _ => ThirtyCycleReactances,
    };

    internal override double DrivingVoltagePu(Bus bus) => PrefaultVoltagePu;

    internal override Complex?[] SourceImpedances(Circuit circuit, NetworkVariant variant, AssumptionLog? log) =>
        new IeeeC37Sources(circuit).Impedances(variant.Instant, log);

    internal override CurrentsOfMethod Begin(StudyNetworks networks) => new IeeeC37AtWork(this, networks);
}
