namespace NetFault;

/// <summary>The section <c>synchronous_machines</c>.</summary>
internal sealed class SynchronousMachineSection : Section<SynchronousMachine>
{
    /// <summary>The words of <see cref="SynchronousService"/>, in its order.</summary>
    private static readonly string[] Services = ["generator", "motor", "condenser"];

    public override string Name => "synchronous_machines";

    public override string Shape => "{bus: MV-A, rated_mva: 12.5, reactance_pu: {subtransient: 0.14}}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.SynchronousMachines;

    public override NetworkElement Read(IFields fields) => new SynchronousMachine
    {
        Id = fields.Id,
        Bus = fields.RequiredReference("bus"),
        Service = (SynchronousService)(fields.Choice("service", Services) ?? 0),
        RatedMva = fields.RequiredNumber("rated_mva"),
        RatedKv = fields.Number("rated_kv"),
        RatedPowerFactor = fields.Number("rated_power_factor"),
        ReactancePu = Reactances(fields.Group("reactance_pu", required: true, out _)),
        TimeConstantSeconds = TimeConstants(fields.Group("time_constant_s", required: false, out _)),
        ArmatureResistancePu = fields.Number("armature_resistance_pu"),
        ArmatureResistanceOhm = fields.Number("armature_resistance_ohm"),
        VoltageRegulationPercent = fields.Number("voltage_regulation_percent"),
        SteadyStateFactor = fields.MaxMin("steady_state_factor"),
        UnitTransformer = fields.Reference("unit_transformer"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(SynchronousMachine machine, FieldWriter fields)
    {
        fields.Reference("bus", machine.Bus);
        if (machine.Service != SynchronousService.Generator)
            fields.Word("service", Services[(int)machine.Service]);
        fields.Number("rated_mva", machine.RatedMva);
        fields.Number("rated_kv", machine.RatedKv);
        fields.Number("rated_power_factor", machine.RatedPowerFactor);
        var x = machine.ReactancePu;
        fields.Group(
            "reactance_pu", ("subtransient", x.Subtransient), ("transient", x.Transient), ("synchronous", x.Synchronous), ("negative", x.Negative));
        var t = machine.TimeConstantSeconds;
        fields.Group("time_constant_s", ("subtransient", t.Subtransient), ("transient", t.Transient), ("armature", t.Armature));
        fields.Number("armature_resistance_pu", machine.ArmatureResistancePu);
        fields.Number("armature_resistance_ohm", machine.ArmatureResistanceOhm);
        fields.Number("voltage_regulation_percent", machine.VoltageRegulationPercent);
        fields.MaxMin("steady_state_factor", machine.SteadyStateFactor);
        fields.Reference("unit_transformer", machine.UnitTransformer);
    }

    private static MachineReactances Reactances(IFields group) =>
        new(group.RequiredNumber("subtransient"), group.Number("transient"), group.Number("synchronous"), group.Number("negative"));

    private static MachineTimeConstants TimeConstants(IFields group) =>
        new(group.Number("subtransient"), group.Number("transient"), group.Number("armature"));
}
