using System.Numerics;

namespace NetFault;

/// <summary>
/// The textbook's method: each machine behind its subtransient, transient or synchronous reactance, all sources at one pre-fault voltage,
/// no load current. Feeders carry no voltage factor and do not decay. Asynchronous motors are in the network of the initial current only:
/// their AC component dies out. Over time the AC component decays with the time constants of all machines together, and the DC component with X/R
/// at the fault, or exactly: docs/current-over-time.md.
/// </summary>
public sealed record MachineDecrement : FaultMethod
{
    internal static readonly NetworkVariant Initial = new() { Name = "initial network" };
    internal static readonly NetworkVariant Transient = new() { Name = "transient network", Instant = FaultInstant.Transient };
    internal static readonly NetworkVariant SteadyState = new() { Name = "steady-state network", Instant = FaultInstant.SteadyState };
    internal static readonly NetworkVariant Reactances = new() { Name = "network of the reactances", Part = ImpedancePart.Reactance };
    internal static readonly NetworkVariant Resistances = new() { Name = "network of the resistances", Part = ImpedancePart.Resistance };

    private const double ShortestHorizon = 0.016;
    private const double LongestHorizon = 10.0;

    private readonly double _prefaultVoltagePu = 1.0;
    private readonly XOverRRule _xOverRRule;
    private readonly FaultInstants _instants = FaultInstants.All;
    private readonly AcComponentRule _acComponentRule = AcComponentRule.QuasiStatic;
    private readonly DcDecayRule _dcDecayRule = DcDecayRule.ByXOverR;
    private readonly double _horizonSeconds = 1.0;
    private readonly double _decayErrorLimit = 5e-7;

    /// <inheritdoc/>
    public override string Name => "Machine decrement";

    /// <summary>The voltage before the fault at every bus, per unit on its nominal voltage; above 0. Default 1.0.</summary>
    /// <exception cref="ArgumentOutOfRangeException">Not a finite number above 0.</exception>
    public double PrefaultVoltagePu
    {
        get => _prefaultVoltagePu;
        init => _prefaultVoltagePu = Guard.Positive(value, nameof(PrefaultVoltagePu));
    }

    /// <summary>The instants to calculate; each costs one factorisation. Default all three.</summary>
    /// <exception cref="ArgumentOutOfRangeException">Not a combination of instants.</exception>
    public FaultInstants Instants
    {
        get => _instants;
        init => _instants = Guard.OneOf(
            value, FaultInstants.InitialOnly, FaultInstants.Transient, FaultInstants.SteadyState, FaultInstants.All);
    }

    /// <summary>
    /// The rule by which X/R at the fault is found: <see cref="XOverRRule.ComplexImpedance"/>, the default, or
    /// <see cref="XOverRRule.SeparateNetworks"/>.
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">A rule of another method.</exception>
    public XOverRRule XOverRRule
    {
        get => _xOverRRule;
        init => _xOverRRule = Guard.OneOf(value, XOverRRule.ComplexImpedance, XOverRRule.SeparateNetworks);
    }

    /// <summary>
    /// How the AC component is found over time: <see cref="AcComponentRule.QuasiStatic"/>, the default, <see cref="AcComponentRule.Exact"/>, or
    /// <see cref="AcComponentRule.HeldAtInitial"/>, which credits no decay.
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">A rule of another method.</exception>
    public AcComponentRule AcComponentRule
    {
        get => _acComponentRule;
        init => _acComponentRule = Guard.OneOf(value, AcComponentRule.QuasiStatic, AcComponentRule.Exact, AcComponentRule.HeldAtInitial);
    }

    /// <summary>
    /// How the DC component is found over time: <see cref="DcDecayRule.ByXOverR"/>, the default, by <see cref="XOverRRule"/>; or
    /// <see cref="DcDecayRule.Exact"/>, the sum of all time constants of the network at the bus.
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">No rule that can be asked for.</exception>
    public DcDecayRule DcDecayRule
    {
        get => _dcDecayRule;
        init => _dcDecayRule = Guard.OneOf(value, DcDecayRule.ByXOverR, DcDecayRule.Exact);
    }

    /// <summary>
    /// The latest time in seconds for which currents are asked, from 0.016 to 10 where the components decay by <see cref="AcComponentRule"/> or
    /// <see cref="DcDecayRule"/> other than by formula. Default 1 s. A later time is an error.
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">Not from 0.016 to 10.</exception>
    public double HorizonSeconds
    {
        get => _horizonSeconds;
        init => _horizonSeconds = value is >= ShortestHorizon and <= LongestHorizon
            ? value
            : throw new ArgumentOutOfRangeException(nameof(HorizonSeconds), value, "must be from 0.016 s, about one cycle, to 10 s");
    }

    /// <summary>
    /// The largest error of currents over time that is accepted, relative to I″k, from 1e-7 to 1e-2. It is bounded from the network's data before
    /// anything is solved, and a study whose bound is larger is refused. Fewer nodes, and so less time, serve a larger one. Default 5e-7.
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">Not from 1e-7 to 1e-2.</exception>
    public double DecayErrorLimit
    {
        get => _decayErrorLimit;
        init => _decayErrorLimit = value is >= 1e-7 and <= 1e-2
            ? value
            : throw new ArgumentOutOfRangeException(nameof(DecayErrorLimit), value, "must be from 1e-7 to 1e-2");
    }

    internal override XOverRRule RatioRule => XOverRRule;

    internal override FaultInstants CalculatedInstants => Instants;

    internal override IReadOnlyList<NetworkVariant> Networks
    {
        get
        {
            var needed = new List<NetworkVariant> { Initial };
            if (Instants.HasFlag(FaultInstants.Transient))
                needed.Add(Transient);
            if (Instants.HasFlag(FaultInstants.SteadyState))
                needed.Add(SteadyState);
            if (XOverRRule == XOverRRule.SeparateNetworks)
                needed.AddRange([Reactances, Resistances]);
            return needed;
        }
    }

    internal override NetworkVariant NetworkAt(FaultInstant instant) => instant switch
    {
        FaultInstant.Transient => Transient,
        FaultInstant.SteadyState => SteadyState,
        _ => Initial,
    };

    internal override double DrivingVoltagePu(Bus bus) => PrefaultVoltagePu;

    internal override Complex?[] SourceImpedances(Circuit circuit, NetworkVariant variant, AssumptionLog? log)
    {
        var impedances = new Complex?[circuit.Sources.Length];
        for (var i = 0; i < impedances.Length; i++)
        {
            if (Impedance(circuit.Network, circuit.Sources[i].Element, variant.Instant, log) is { } z)
                impedances[i] = new Complex(z.Real, z.Imaginary * variant.FrequencyRatio);
        }
        return impedances;
    }

    internal override CurrentsOfMethod Begin(StudyNetworks networks) => new MachineDecrementAtWork(this, networks);

    internal override void LogOverTime(Circuit circuit, AssumptionLog log)
    {
        if (AcComponentRule != AcComponentRule.HeldAtInitial || DcDecayRule == DcDecayRule.Exact)
            OperationalSources.Of(circuit, log);
    }

    private static Complex? Impedance(Network network, int element, FaultInstant instant, AssumptionLog? log)
    {
        var kv = network.Buses[network.Topology.TerminalBus(element, 0)].NominalKv;
        return network.Elements[element] switch
        {
            NetworkFeeder feeder => NetworkFeederCircuit.MaximumPu(feeder, kv, network.BaseMva),
            SynchronousMachine machine => Machine(machine, kv, network, instant, log),
            AsynchronousMotor motor when instant == FaultInstant.Initial =>
                AsynchronousMotorCircuit.ImpedancePu(motor, kv, network.BaseMva, log),
            ConverterFedDrive drive when instant == FaultInstant.Initial => ConverterFedDriveCircuit.ImpedancePu(drive, kv, network.BaseMva, log),
            DoublyFedGenerator generator when instant == FaultInstant.Initial =>
                DoublyFedGeneratorCircuit.ImpedancePu(generator, kv, network.BaseMva, log),
            FullConverterSource source => LeftOut(source, log),
            _ => null,
        };
    }

    private static Complex? LeftOut(FullConverterSource source, AssumptionLog? log)
    {
        log?.Add(source, "source_current_ka", "left out: this method knows no current sources");
        return null;
    }

    private static Complex Machine(SynchronousMachine machine, double kv, Network network, FaultInstant instant, AssumptionLog? log)
    {
        var reactance = instant switch
        {
            FaultInstant.Initial => machine.ReactancePu.Subtransient,
            FaultInstant.Transient => SynchronousMachineCircuit.TransientReactancePu(machine, log),
            _ => SynchronousMachineCircuit.SynchronousReactancePu(machine, log),
        };
        var toBase = SynchronousMachineCircuit.RatedToBase(machine, kv, network.BaseMva, log);
        var resistance = SynchronousMachineCircuit.ArmatureResistancePu(machine, kv, network.FrequencyHz, log);
        return new Complex(resistance * toBase, reactance * toBase);
    }
}
