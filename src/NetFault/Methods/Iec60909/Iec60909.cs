using System.Numerics;

namespace NetFault;

/// <summary>
/// Short-circuit currents by IEC 60909-0:2016: an equivalent voltage source c·Un/√3 at the fault, corrected impedances, and the standard's
/// factors for peak, breaking, DC and thermal currents. <c>docs/iec-60909.md</c> goes through the clauses.
/// </summary>
public sealed record Iec60909 : FaultMethod
{
    internal static readonly NetworkVariant Initial = new() { Name = "initial network" };
    internal static readonly NetworkVariant WithoutMotors = new() { Name = "network without motors", Instant = FaultInstant.SteadyState };

    /// <summary>For κ by method (c), with the fictitious resistances R_Gf.</summary>
    internal static readonly NetworkVariant PeakAtEquivalentFrequency = new()
    {
        Name = "network for the peak at the equivalent frequency", FrequencyRatio = EquivalentFrequency.Peak, FictitiousResistance = true,
    };

    /// <summary>For κ by method (b), with the fictitious resistances R_Gf.</summary>
    internal static readonly NetworkVariant PeakAtRatedFrequency = new()
    {
        Name = "network for the peak", FictitiousResistance = true,
    };

    private readonly XOverRRule _xOverRRule = XOverRRule.EquivalentFrequency;
    private readonly ShortCircuitCase _case;

    /// <inheritdoc/>
    public override string Name => Case == ShortCircuitCase.Maximum ? "IEC 60909-0:2016, maximum" : "IEC 60909-0:2016, minimum";

    /// <summary>Maximum (default) or minimum short-circuit currents.</summary>
    /// <exception cref="ArgumentOutOfRangeException">None of the two.</exception>
    public ShortCircuitCase Case
    {
        get => _case;
        init => _case = Guard.OneOf(value, ShortCircuitCase.Maximum, ShortCircuitCase.Minimum);
    }

    /// <summary>
    /// How R/X for the factor κ of the peak is found (8.1.2): <see cref="XOverRRule.SmallestRatio"/> is the standard's method (a),
    /// <see cref="XOverRRule.ComplexImpedance"/> its (b) with the factor 1.15, <see cref="XOverRRule.EquivalentFrequency"/> its (c), the
    /// default.
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">A rule of another method.</exception>
    public XOverRRule XOverRRule
    {
        get => _xOverRRule;
        init => _xOverRRule = Guard.OneOf(
            value, XOverRRule.SmallestRatio, XOverRRule.ComplexImpedance, XOverRRule.EquivalentFrequency);
    }

    /// <summary>
    /// Leaves asynchronous motors and converter-fed drives out at buses where the standard's rules (6.10) allow it: those connected without a
    /// transformer by ΣIrM ≤ 0.01·I″k, those behind transformers that step down by their power against the transformers' and the fault
    /// level. Default false. The result says where motors were left out.
    /// </summary>
    public bool LeaveOutSmallMotors { get; init; }

    internal override XOverRRule RatioRule => XOverRRule;

    internal override FaultInstants CalculatedInstants => FaultInstants.SteadyState;

    internal override IReadOnlyList<NetworkVariant> Networks => XOverRRule switch
    {
        XOverRRule.EquivalentFrequency => [Initial, WithoutMotors, PeakAtEquivalentFrequency],
        XOverRRule.ComplexImpedance => [Initial, WithoutMotors, PeakAtRatedFrequency],
        _ => [Initial, WithoutMotors],
    };

    /// <summary>The network that decides κ; null for method (a), which looks at branches.</summary>
    internal NetworkVariant? PeakNetwork => XOverRRule switch
    {
        XOverRRule.EquivalentFrequency => PeakAtEquivalentFrequency,
        XOverRRule.ComplexImpedance => PeakAtRatedFrequency,
        _ => null,
    };

    /// <summary>The network for the DC component at an equivalent frequency; machines have their real resistance in it.</summary>
    internal static NetworkVariant DcNetwork(double frequencyRatio) =>
        new() { Name = "network for the DC component", FrequencyRatio = frequencyRatio };

    internal override NetworkVariant NetworkAt(FaultInstant instant) => instant switch
    {
        FaultInstant.Initial => Initial,
        FaultInstant.SteadyState => WithoutMotors,
        _ => throw new ArgumentOutOfRangeException(nameof(instant), instant, "IEC 60909-0 knows no transient network"),
    };

    internal override BranchRules BranchRules(Network network) =>
        new Iec60909BranchRules(network, new PowerStationUnits(network, Case), Case);

    internal override double DrivingVoltagePu(Bus bus) => VoltageFactor.Of(bus, Case);

    internal override Complex?[] SourceImpedances(Circuit circuit, NetworkVariant variant, AssumptionLog? log) =>
        new Iec60909Sources(circuit.Network, new PowerStationUnits(circuit.Network, Case), Case).Impedances(circuit, variant, log);

    internal override CurrentsOfMethod Begin(StudyNetworks networks) => new Iec60909AtWork(this, networks);
}
