namespace NetFault;

/// <summary>The section <c>buses</c>.</summary>
internal sealed class BusSection : Section<Bus>
{
    public override string Name => "buses";

    public override string Shape => "{nominal_kv: 11}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.Buses;

    public override NetworkElement Read(IFields fields) => new Bus
    {
        Id = fields.Id,
        NominalKv = fields.RequiredNumber("nominal_kv"),
        LowVoltageTolerancePercent = fields.Number("low_voltage_tolerance_percent"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(Bus bus, FieldWriter fields)
    {
        fields.Number("nominal_kv", bus.NominalKv);
        fields.Number("low_voltage_tolerance_percent", bus.LowVoltageTolerancePercent);
    }
}
