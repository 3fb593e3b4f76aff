namespace NetFault;

/// <summary>The section <c>asynchronous_motors</c>.</summary>
internal sealed class AsynchronousMotorSection : Section<AsynchronousMotor>
{
    public override string Name => "asynchronous_motors";

    public override string Shape =>
        "{bus: MV-B, rated_kw: 1800, rated_power_factor: 0.88, efficiency: 0.96, locked_rotor_current_ratio: 5.5}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.AsynchronousMotors;

    public override NetworkElement Read(IFields fields) => new AsynchronousMotor
    {
        Id = fields.Id,
        Bus = fields.RequiredReference("bus"),
        RatedKw = fields.RequiredNumber("rated_kw"),
        RatedKv = fields.Number("rated_kv"),
        RatedPowerFactor = fields.RequiredNumber("rated_power_factor"),
        Efficiency = fields.RequiredNumber("efficiency"),
        LockedRotorCurrentRatio = fields.RequiredNumber("locked_rotor_current_ratio"),
        PolePairs = fields.Whole("pole_pairs"),
        Count = fields.Whole("count") ?? 1,
        XOverR = fields.Number("x_over_r"),
        ROverX = fields.Number("r_over_x"),
        RatedSlipPercent = fields.Number("rated_slip_percent"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(AsynchronousMotor motor, FieldWriter fields)
    {
        fields.Reference("bus", motor.Bus);
        fields.Number("rated_kw", motor.RatedKw);
        fields.Number("rated_kv", motor.RatedKv);
        fields.Number("rated_power_factor", motor.RatedPowerFactor);
        fields.Number("efficiency", motor.Efficiency);
        fields.Number("locked_rotor_current_ratio", motor.LockedRotorCurrentRatio);
        fields.Number("pole_pairs", motor.PolePairs);
        fields.Number("count", motor.Count == 1 ? null : motor.Count);
        fields.Number("x_over_r", motor.XOverR);
        fields.Number("r_over_x", motor.ROverX);
        fields.Number("rated_slip_percent", motor.RatedSlipPercent);
    }
}
