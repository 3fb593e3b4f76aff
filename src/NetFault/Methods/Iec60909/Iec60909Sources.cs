using System.Numerics;

namespace NetFault;

/// <summary>The impedances of sources by IEC 60909-0:2016, clause 6, per unit.</summary>
internal sealed class Iec60909Sources
{
    private readonly Network _network;
    private readonly PowerStationUnits _units;
    private readonly ShortCircuitCase _case;

    public Iec60909Sources(Network network, PowerStationUnits units, ShortCircuitCase which)
    {
        _network = network;
        _units = units;
        _case = which;
    }

    /// <summary>The impedance of each source of a circuit in a network; null where it is not in it.</summary>
    public Complex?[] Impedances(Circuit circuit, NetworkVariant variant, AssumptionLog? log) =>
        Array.ConvertAll(circuit.Sources, source => Impedance(source.Element, variant, log));

    /// <summary>The impedance of one source in a network; null where it is not in it.</summary>
    public Complex? Impedance(int element, NetworkVariant variant, AssumptionLog? log)
    {
        var bus = _network.Buses[_network.Topology.TerminalBus(element, 0)];
        var z = _network.Elements[element] switch
        {
            NetworkFeeder feeder => Feeder(feeder, bus, log),
            SynchronousMachine machine => Machine(machine, bus, MachineFactor(machine, bus, log), variant.FictitiousResistance, log),
            var other => variant.Instant == FaultInstant.Initial ? Follower(other, bus, log) : null,
        };
        return z is { } value ? new Complex(value.Real, value.Imaginary * variant.FrequencyRatio) : null;
    }

    /// <summary>A machine's K·(R + jX″d), with Ra or with the fictitious R_Gf.</summary>
    public Complex Machine(SynchronousMachine machine, Bus bus, double factor, bool fictitiousResistance, AssumptionLog? log)
    {
        var toBase = SynchronousMachineCircuit.RatedToBase(machine, bus.NominalKv, _network.BaseMva, log);
        var x = machine.ReactancePu.Subtransient;
        var r = fictitiousResistance
            ? x * FictitiousROverX(machine, machine.RatedKv ?? bus.NominalKv)
            : SynchronousMachineCircuit.ArmatureResistancePu(machine, bus.NominalKv, _network.FrequencyHz, log);
        return new Complex(r, x) * (toBase * factor);
    }

    /// <summary>K_G, or K_S or K_SO where the machine belongs to a power station unit.</summary>
    private double MachineFactor(SynchronousMachine machine, Bus bus, AssumptionLog? log)
    {
        if (_units.Of(machine) is { } unit)
            return unit.Factor;
        if (machine is { RatedPowerFactor: null, Service: SynchronousService.Condenser })
            log?.Add(machine, "rated_power_factor", "a condenser: cos φ = 0 assumed in K_G");
        var terminalKv = (machine.RatedKv ?? bus.NominalKv) * (1.0 + machine.VoltageRegulationPercent.GetValueOrDefault() / 100.0);
        return CorrectionFactors.Generator(
            bus.NominalKv, terminalKv, VoltageFactor.Max(bus), machine.ReactancePu.Subtransient, SinPhi.Of(_network, machine));
    }

    /// <summary>R_Gf/X″d for the peak current (6.6.1): 0.05 from 100 MVA, 0.07 below, 0.15 up to 1 kV.</summary>
    private static double FictitiousROverX(SynchronousMachine machine, double ratedKv)
    {
        if (ratedKv <= 1.0)
            return 0.15;
        return machine.RatedMva >= 100.0 ? 0.05 : 0.07;
    }

    /// <summary>ZQ = c·Un/(√3·I″kQ), I″kQ and c of the case (6.2).</summary>
    private Complex Feeder(NetworkFeeder feeder, Bus bus, AssumptionLog? log)
    {
        var data = feeder.ShortCircuitMva ?? feeder.ShortCircuitKa.GetValueOrDefault();
        if (_case == ShortCircuitCase.Minimum && data.Min is null)
            log?.Add(feeder, feeder.ShortCircuitMva.HasValue ? "short_circuit_mva.min" : "short_circuit_ka.min", "the maximum is taken in the minimum case too");
        var strength = _case == ShortCircuitCase.Minimum ? data.Min ?? data.Max : data.Max;
        var mva = feeder.ShortCircuitMva.HasValue ? strength : PerUnit.Sqrt3 * bus.NominalKv * strength;
        return NetworkFeederCircuit.ImpedancePu(feeder, mva, _network.BaseMva) * VoltageFactor.Of(bus, _case);
    }

    /// <summary>What feeds only while others hold the voltage is left out of the minimum case (7.1.2).</summary>
    private Complex? Follower(NetworkElement element, Bus bus, AssumptionLog? log)
    {
        if (element is FullConverterSource converter)
            ConverterCurrents.Log(converter, _case, log);
        if (element is DoublyFedGenerator { SteadyStateKa: null } && _case == ShortCircuitCase.Maximum)
            log?.Add(element, "steady_state_ka", "left out of Ik: no steady-state current is given");
        if (_case == ShortCircuitCase.Minimum)
            return null;
        return element switch
        {
            AsynchronousMotor motor => AsynchronousMotorCircuit.ImpedancePu(motor, bus.NominalKv, _network.BaseMva, log),
            ConverterFedDrive drive => ConverterFedDriveCircuit.ImpedancePu(drive, bus.NominalKv, _network.BaseMva, log),
            DoublyFedGenerator generator => DoublyFedGeneratorCircuit.ImpedancePu(generator, bus.NominalKv, _network.BaseMva, log),
            _ => null,
        };
    }
}
