using System.Numerics;

namespace NetFault;

/// <summary>
/// The impedances of a circuit's sources by IEEE Std C37.010, per unit. A multiplier takes resistance and reactance alike, so that each
/// machine keeps its X/R.
/// </summary>
internal sealed class IeeeC37Sources
{
    private readonly Circuit _circuit;
    private readonly Network _network;

    public IeeeC37Sources(Circuit circuit)
    {
        _circuit = circuit;
        _network = circuit.Network;
    }

    /// <summary>
    /// The impedance of each source in the network of an instant: first-cycle, interrupting (<see cref="FaultInstant.Transient"/>) or
    /// 30-cycle (<see cref="FaultInstant.SteadyState"/>); null where it is not in it.
    /// </summary>
    public Complex?[] Impedances(FaultInstant instant, AssumptionLog? log)
    {
        var isHeld = instant == FaultInstant.SteadyState ? NodesHeldAtThirtyCycles(_circuit) : null;
        return Array.ConvertAll(_circuit.Sources, source => Impedance(source, instant, isHeld, log));
    }

    /// <summary>
    /// Whether something holds the voltage of each node in the 30-cycle network: a feeder or a generator in its connected part. Synchronous
    /// motors and condensers are left out of that network.
    /// </summary>
    public static bool[] NodesHeldAtThirtyCycles(Circuit circuit)
    {
        var islands = Islands.OfNodes(circuit);
        var held = new HashSet<int>();
        foreach (var source in circuit.Sources)
        {
            if (circuit.Network.Elements[source.Element] is NetworkFeeder or SynchronousMachine { Service: SynchronousService.Generator })
                held.Add(islands[source.Node]);
        }
        return Array.ConvertAll(islands, held.Contains);
    }

    private Complex? Impedance(in CircuitSource source, FaultInstant instant, bool[]? isHeld, AssumptionLog? log)
    {
        var kv = _network.Buses[_network.Topology.TerminalBus(source.Element, 0)].NominalKv;
        var mva = _network.BaseMva;
        switch (_network.Elements[source.Element])
        {
            case NetworkFeeder feeder:
                return NetworkFeederCircuit.MaximumPu(feeder, kv, mva);
            case SynchronousMachine machine:
                // Where motors and condensers alone hold a part they stay, lest its equations have no solution; its currents count as 0.
                return instant == FaultInstant.SteadyState
                    ? ThirtyCycle(machine, kv, isStandIn: !isHeld![source.Node], log)
                    : Multiplied(Machine(machine, machine.ReactancePu.Subtransient, kv, log), ReactanceMultipliers.Of(machine), instant);
            case AsynchronousMotor motor:
                var ofMotor = ReactanceMultipliers.Of(motor, _network.FrequencyHz, log);
                return Multiplied(AsynchronousMotorCircuit.ImpedancePu(motor, kv, mva, log), ofMotor, instant);
            case ConverterFedDrive drive:
                return Multiplied(ConverterFedDriveCircuit.ImpedancePu(drive, kv, mva, log), ReactanceMultipliers.Of(drive, log), instant);
            case DoublyFedGenerator generator:
                InjectedCurrents.LogSteadyState(generator, generator.SteadyStateKa, log);
                var ofGenerator = ReactanceMultipliers.Of(generator, log);
                return Multiplied(DoublyFedGeneratorCircuit.ImpedancePu(generator, kv, mva, log), ofGenerator, instant);
            case FullConverterSource converter:
                InjectedCurrents.Log(converter, log);
                return null;
            default:
                return null;
        }
    }

    private static Complex? Multiplied(Complex subtransient, in ReactanceMultipliers multipliers, FaultInstant instant) => instant switch
    {
        FaultInstant.Initial => subtransient * multipliers.FirstCycle,
        FaultInstant.Transient => subtransient * multipliers.Interrupting,
        _ => null,
    };

    /// <summary>Generators with x′d; motors and condensers are left out but as stand-ins.</summary>
    private Complex? ThirtyCycle(SynchronousMachine machine, double kv, bool isStandIn, AssumptionLog? log)
    {
        if (machine.Service != SynchronousService.Generator)
            return isStandIn ? Machine(machine, machine.ReactancePu.Subtransient, kv, log) : null;
        if (machine.ReactancePu.Transient is null)
        {
            log?.Add(machine, "reactance_pu.transient",
                "x′d is not given; x″d is kept in the 30-cycle network, whose current is then too large to judge whether relays pick up");
        }
        return Machine(machine, machine.ReactancePu.Transient ?? machine.ReactancePu.Subtransient, kv, log);
    }

    private Complex Machine(SynchronousMachine machine, double reactancePu, double kv, AssumptionLog? log) =>
        new Complex(SynchronousMachineCircuit.ArmatureResistancePu(machine, kv, _network.FrequencyHz, log), reactancePu)
            * SynchronousMachineCircuit.RatedToBase(machine, kv, _network.BaseMva, log);
}
