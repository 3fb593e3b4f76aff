using System.Globalization;

namespace NetFault;

/// <summary>A synchronous machine in the positive-sequence circuit: Ra + jX with the reactance of an instant.</summary>
internal static class SynchronousMachineCircuit
{
    /// <summary>
    /// Armature time constant where nothing is known of the resistance. Common practice, after the averages of E. W. Kimbark, Power
    /// System Stability, chapter 12 (from memory): 0.15 to 0.17 s for all kinds of machines.
    /// </summary>
    private const double TypicalArmatureSeconds = 0.15;

    /// <summary>What per-unit values on the machine's rating are multiplied with, to be on the bus's nominal voltage and the base power.</summary>
    public static double RatedToBase(SynchronousMachine machine, double nominalKv, double baseMva, AssumptionLog? log)
    {
        if (machine.RatedKv is null)
            log?.Add(machine, "rated_kv", AssumptionTexts.RatedVoltageOfBus);
        var kv = machine.RatedKv ?? nominalKv;
        return kv * kv / machine.RatedMva / PerUnit.BaseOhm(nominalKv, baseMva);
    }

    /// <summary>x′d per unit on the rating; without it the last known reactance.</summary>
    public static double TransientReactancePu(SynchronousMachine machine, AssumptionLog? log)
    {
        if (machine.ReactancePu.Transient is { } given)
            return given;
        log?.Add(machine, "reactance_pu.transient", "x′d is not given; x″d is kept for the transient current");
        return machine.ReactancePu.Subtransient;
    }

    /// <summary>xd per unit on the rating; without it the last known reactance.</summary>
    public static double SynchronousReactancePu(SynchronousMachine machine, AssumptionLog? log)
    {
        if (machine.ReactancePu.Synchronous is { } given)
            return given;
        var kept = machine.ReactancePu.Transient.HasValue ? "x′d" : "x″d";
        log?.Add(machine, "reactance_pu.synchronous", $"xd is not given; {kept} is kept for the steady-state current");
        return machine.ReactancePu.Transient ?? machine.ReactancePu.Subtransient;
    }

    /// <summary>Ra per unit on the rating: given, or x2/(ω·Ta), or assumed with a typical Ta.</summary>
    public static double ArmatureResistancePu(SynchronousMachine machine, double nominalKv, double frequencyHz, AssumptionLog? log)
    {
        if (machine.ArmatureResistancePu is { } perUnit)
            return perUnit;
        if (machine.ArmatureResistanceOhm is { } ohm)
        {
            var kv = machine.RatedKv ?? nominalKv;
            return ohm * machine.RatedMva / (kv * kv);
        }
        var omega = 2.0 * Math.PI * frequencyHz;
        if (machine.TimeConstantSeconds.Armature is not { } seconds)
        {
            log?.Add(machine, "armature_resistance_pu", string.Format(CultureInfo.InvariantCulture,
                "Ra is not given; X″d/R = {0:0.#} assumed (Ta = {1} s, common practice)", omega * TypicalArmatureSeconds, TypicalArmatureSeconds));
            return machine.ReactancePu.Subtransient / (omega * TypicalArmatureSeconds);
        }
        if (machine.ReactancePu.Negative is null)
            log?.Add(machine, "reactance_pu.negative", "x2 is not given; x″d taken in Ra = x2/(2πf·Ta)");
        return (machine.ReactancePu.Negative ?? machine.ReactancePu.Subtransient) / (omega * seconds);
    }
}
