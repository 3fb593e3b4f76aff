namespace NetFault;

/// <summary>The section <c>network_feeders</c>.</summary>
internal sealed class NetworkFeederSection : Section<NetworkFeeder>
{
    public override string Name => "network_feeders";

    public override string Shape => "{bus: GRID, short_circuit_mva: 3500, x_over_r: 12}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.NetworkFeeders;

    public override NetworkElement Read(IFields fields) => new NetworkFeeder
    {
        Id = fields.Id,
        Bus = fields.RequiredReference("bus"),
        ShortCircuitMva = fields.MaxMin("short_circuit_mva"),
        ShortCircuitKa = fields.MaxMin("short_circuit_ka"),
        XOverR = fields.Number("x_over_r"),
        ROverX = fields.Number("r_over_x"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(NetworkFeeder feeder, FieldWriter fields)
    {
        fields.Reference("bus", feeder.Bus);
        fields.MaxMin("short_circuit_mva", feeder.ShortCircuitMva);
        fields.MaxMin("short_circuit_ka", feeder.ShortCircuitKa);
        fields.Number("x_over_r", feeder.XOverR);
        fields.Number("r_over_x", feeder.ROverX);
    }
}
