namespace NetFault;

/// <summary>What a synchronous machine is used as.</summary>
public enum SynchronousService
{
    /// <summary>A generator.</summary>
    Generator,

    /// <summary>A motor.</summary>
    Motor,

    /// <summary>A synchronous condenser.</summary>
    Condenser,
}

/// <summary>A synchronous machine, described by its d-axis data.</summary>
public sealed record SynchronousMachine : ShuntElement
{
    /// <summary>What the machine is used as; default generator.</summary>
    public SynchronousService Service { get; init; }

    /// <summary>Rated apparent power SrG in MVA, greater than 0.</summary>
    public required double RatedMva { get; init; }

    /// <summary>Rated line-to-line voltage UrG in kV; null takes the bus's nominal voltage.</summary>
    public double? RatedKv { get; init; }

    /// <summary>Rated power factor cos φrG, above 0 and at most 1; only some methods need it.</summary>
    public double? RatedPowerFactor { get; init; }

    /// <summary>Reactances per unit on the machine's rating.</summary>
    public required MachineReactances ReactancePu { get; init; }

    /// <summary>Short-circuit time constants in seconds.</summary>
    public MachineTimeConstants TimeConstantSeconds { get; init; }

    /// <summary>
    /// Armature resistance Ra per unit on the machine's rating, not negative; this or <see cref="ArmatureResistanceOhm"/>. With neither,
    /// it follows from <see cref="MachineTimeConstants.Armature"/>.
    /// </summary>
    public double? ArmatureResistancePu { get; init; }

    /// <summary>Armature resistance Ra in ohm, not negative; this or <see cref="ArmatureResistancePu"/>.</summary>
    public double? ArmatureResistanceOhm { get; init; }

    /// <summary>The range of voltage regulation pG in percent (IEC 60909-0), 0 to 100.</summary>
    public double? VoltageRegulationPercent { get; init; }

    /// <summary>The id of the transformer with which the machine forms one power station unit (IEC 60909-0).</summary>
    public string? UnitTransformer { get; init; }

    /// <summary>
    /// The factors λmax and λmin for the steady-state current of a machine that feeds a short circuit alone, read off the curves of IEC
    /// 60909-0; null where they are not known.
    /// </summary>
    public MaxMin? SteadyStateFactor { get; init; }

    /// <inheritdoc/>
    public override string Section => "synchronous_machines";

    internal override ElementRole Role => ElementRole.Source;

    internal override void Check(ElementCheck check)
    {
        check.BusReference("bus", Bus);
        check.OneOf("service", Service, "generator, motor or condenser");
        check.Positive("rated_mva", RatedMva);
        check.RatedVoltage("rated_kv", RatedKv, Bus);
        check.AboveZeroUpToOne("rated_power_factor", RatedPowerFactor);
        check.WithinPercent("voltage_regulation_percent", VoltageRegulationPercent);
        check.PositiveMaxMin("steady_state_factor", SteadyStateFactor);
        CheckReactances(check);
        CheckTimeConstants(check);
        CheckArmatureResistance(check);
        if (UnitTransformer is not null)
            check.TransformerReference("unit_transformer", UnitTransformer, Bus);
    }

    private void CheckReactances(ElementCheck check)
    {
        var x = ReactancePu;
        check.Positive("reactance_pu.subtransient", x.Subtransient);
        check.Positive("reactance_pu.transient", x.Transient);
        check.Positive("reactance_pu.synchronous", x.Synchronous);
        check.Positive("reactance_pu.negative", x.Negative);
        check.NotAbove("reactance_pu.subtransient", x.Subtransient, "reactance_pu.transient", x.Transient);
        check.NotAbove("reactance_pu.transient", x.Transient, "reactance_pu.synchronous", x.Synchronous);
        if (x.Transient is null)
            check.NotAbove("reactance_pu.subtransient", x.Subtransient, "reactance_pu.synchronous", x.Synchronous);
        check.Unusual("reactance_pu.subtransient", x.Subtransient, 0.05, 1.0, "per unit on the machine's rating");
    }

    private void CheckTimeConstants(ElementCheck check)
    {
        var t = TimeConstantSeconds;
        check.Positive("time_constant_s.subtransient", t.Subtransient);
        check.Positive("time_constant_s.transient", t.Transient);
        check.Positive("time_constant_s.armature", t.Armature);
        check.NotAbove("time_constant_s.subtransient", t.Subtransient, "time_constant_s.transient", t.Transient);
    }

    private void CheckArmatureResistance(ElementCheck check)
    {
        check.AtMostOne(("armature_resistance_pu", ArmatureResistancePu.HasValue), ("armature_resistance_ohm", ArmatureResistanceOhm.HasValue));
        check.NotNegative("armature_resistance_pu", ArmatureResistancePu);
        check.NotNegative("armature_resistance_ohm", ArmatureResistanceOhm);
    }
}
