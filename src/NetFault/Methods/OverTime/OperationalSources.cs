using System.Globalization;
using System.Numerics;

namespace NetFault;

/// <summary>
/// Makes the operational sources of a circuit for <see cref="MachineDecrement"/>. What the network does not give is held at its initial value,
/// or taken by a rule, and said.
/// </summary>
internal sealed class OperationalSources
{
    /// <summary>
    /// Largest decay rate 1/(ω·T). Near 0.5 the poles of the AC and the DC component meet (p² + (g + j + μ)·p + j·g has a double root at g = μ =
    /// 0.5), and there is no telling one component from the other. T is 7.1 ms at 50 Hz.
    /// </summary>
    public const double LargestRate = 0.45;

    /// <summary>Slip where none is given. Common practice: 0.5 to 1.5 percent for large motors, more for small; a small slip decays slowly.</summary>
    private const double AssumedSlip = 0.01;

    private readonly Network _network;
    private readonly AssumptionLog? _log;
    private readonly double _omega;

    private OperationalSources(Network network, AssumptionLog? log)
    {
        _network = network;
        _log = log;
        _omega = 2.0 * Math.PI * network.FrequencyHz;
    }

    /// <summary>One for each source of the circuit; null where the method leaves it out.</summary>
    public static OperationalSource?[] Of(Circuit circuit, AssumptionLog? log)
    {
        var maker = new OperationalSources(circuit.Network, log);
        return Array.ConvertAll(circuit.Sources, source => maker.Make(source.Element));
    }

    private OperationalSource? Make(int element)
    {
        var kv = _network.Buses[_network.Topology.TerminalBus(element, 0)].NominalKv;
        return _network.Elements[element] switch
        {
            NetworkFeeder feeder => Constant(NetworkFeederCircuit.MaximumPu(feeder, kv, _network.BaseMva)),
            SynchronousMachine machine => Machine(machine, kv),
            AsynchronousMotor motor => Motor(motor, kv),
            ConverterFedDrive drive => ByOwnRatio(drive, ConverterFedDriveCircuit.ImpedancePu(drive, kv, _network.BaseMva, _log)),
            DoublyFedGenerator generator => ByOwnRatio(generator, DoublyFedGeneratorCircuit.ImpedancePu(generator, kv, _network.BaseMva, _log)),
            _ => null,
        };
    }

    private static OperationalSource Constant(Complex z) => new() { Resistance = z.Real, Reactance = z.Imaginary };

    private OperationalSource Machine(SynchronousMachine machine, double kv)
    {
        var toBase = SynchronousMachineCircuit.RatedToBase(machine, kv, _network.BaseMva, _log);
        var resistance = SynchronousMachineCircuit.ArmatureResistancePu(machine, kv, _network.FrequencyHz, _log);
        var initial = machine.ReactancePu.Subtransient;
        var transient = SynchronousMachineCircuit.TransientReactancePu(machine, _log);
        var synchronous = SynchronousMachineCircuit.SynchronousReactancePu(machine, _log);
        double transientShare = initial / transient - initial / synchronous, subtransientShare = 1.0 - initial / transient;
        var time = machine.TimeConstantSeconds;
        return new OperationalSource
        {
            Resistance = resistance * toBase,
            Reactance = initial * toBase,
            TransientShare = transientShare,
            TransientRate = Rate(machine, "transient", "T′d", "x′d", time.Transient, transientShare),
            SubtransientShare = subtransientShare,
            SubtransientRate = Rate(machine, "subtransient", "T″d", "x″d", time.Subtransient, subtransientShare),
        };
    }

    /// <summary>1/(ω·T); 0, which holds the share, where there is nothing to decay, no time constant, or one too short to tell from the DC.</summary>
    private double Rate(SynchronousMachine machine, string key, string symbol, string kept, double? seconds, double share)
    {
        if (share <= 0.0)
            return 0.0;
        if (seconds is { } given)
            return Held(1.0 / (_omega * given), machine, "time_constant_s." + key, symbol);
        _log?.Add(machine, "time_constant_s." + key, $"{symbol} is not given; what it decays is held at {kept} over time");
        return 0.0;
    }

    private OperationalSource Motor(AsynchronousMotor motor, double kv)
    {
        var z = AsynchronousMotorCircuit.ImpedancePu(motor, kv, _network.BaseMva, _log);
        if (motor.RatedSlipPercent is null)
            _log?.Add(motor, "rated_slip_percent", "a slip of 1 % is assumed in T = X/(ω·R2), by which the AC component decays (common practice)");
        var slip = motor.RatedSlipPercent / 100.0 ?? AssumedSlip;
        var reactanceOnRating = z.Imaginary / Complex.Abs(z) / motor.LockedRotorCurrentRatio;
        return Constant(z) with { MotorRate = Held(slip / reactanceOnRating, motor, "rated_slip_percent", "T = X/(ω·R2)") };
    }

    /// <summary>For what has no slip: T = X/(ω·R) of its own impedance.</summary>
    private OperationalSource ByOwnRatio(NetworkElement element, Complex z)
    {
        _log?.Add(element, "r_over_x", "its AC component decays with T = X/(ω·R) of its own impedance, assumed");
        return Constant(z) with { MotorRate = Held(z.Real / z.Imaginary, element, "r_over_x", "T = X/(ω·R)") };
    }

    private double Held(double rate, NetworkElement element, string key, string symbol)
    {
        if (rate <= LargestRate)
            return rate;
        _log?.Add(element, key, string.Format(CultureInfo.InvariantCulture,
            "{0} = {1:0.##} ms is too short to tell the AC component from the DC component (below {2:0.#} ms); held at its initial value over time",
            symbol, 1000.0 / (rate * _omega), 1000.0 / (LargestRate * _omega)));
        return 0.0;
    }
}
