namespace NetFault;

/// <summary>The section <c>bus_couplers</c>.</summary>
internal sealed class BusCouplerSection : Section<BusCoupler>
{
    public override string Name => "bus_couplers";

    public override string Shape => "{from: MV-A, to: MV-B, closed: false}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.BusCouplers;

    public override NetworkElement Read(IFields fields) => new BusCoupler
    {
        Id = fields.Id,
        From = fields.RequiredReference("from"),
        To = fields.RequiredReference("to"),
        Closed = fields.RequiredFlag("closed"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(BusCoupler coupler, FieldWriter fields)
    {
        fields.Reference("from", coupler.From);
        fields.Reference("to", coupler.To);
        fields.Flag("closed", coupler.Closed);
    }
}
