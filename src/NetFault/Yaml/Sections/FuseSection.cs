namespace NetFault;

/// <summary>The section <c>fuses</c>.</summary>
internal sealed class FuseSection : Section<Fuse>
{
    public override string Name => "fuses";

    public override string Shape => "{bus: MV-A, feeds: T3, rated_kv: 12, breaking_capacity_ka: 63}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.Fuses;

    public override NetworkElement Read(IFields fields) => new Fuse
    {
        Id = fields.Id,
        Bus = fields.RequiredReference("bus"),
        Feeds = fields.RequiredReference("feeds"),
        FeedsSection = fields.FeedsSection(),
        RatedKv = fields.Number("rated_kv"),
        BreakingCapacityKa = fields.Number("breaking_capacity_ka"),
        TestPowerFactor = fields.Number("test_power_factor"),
        TestXOverR = fields.Number("test_x_over_r"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(Fuse fuse, FieldWriter fields)
    {
        fields.Terminal(fuse);
        fields.Number("rated_kv", fuse.RatedKv);
        fields.Number("breaking_capacity_ka", fuse.BreakingCapacityKa);
        fields.Number("test_power_factor", fuse.TestPowerFactor);
        fields.Number("test_x_over_r", fuse.TestXOverR);
    }
}
