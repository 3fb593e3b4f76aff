namespace NetFault;

/// <summary>The section <c>series_reactors</c>.</summary>
internal sealed class SeriesReactorSection : Section<SeriesReactor>
{
    public override string Name => "series_reactors";

    public override string Shape => "{from: MV-A, to: MV-C, rated_ka: 1.6, reactance_percent: 6}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.SeriesReactors;

    public override NetworkElement Read(IFields fields) => new SeriesReactor
    {
        Id = fields.Id,
        From = fields.RequiredReference("from"),
        To = fields.RequiredReference("to"),
        RatedKa = fields.Number("rated_ka"),
        RatedKv = fields.Number("rated_kv"),
        ReactancePercent = fields.Number("reactance_percent"),
        XOverR = fields.Number("x_over_r"),
        Ohm = fields.Impedance("ohm"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(SeriesReactor reactor, FieldWriter fields)
    {
        fields.Reference("from", reactor.From);
        fields.Reference("to", reactor.To);
        fields.Number("rated_ka", reactor.RatedKa);
        fields.Number("rated_kv", reactor.RatedKv);
        fields.Number("reactance_percent", reactor.ReactancePercent);
        fields.Number("x_over_r", reactor.XOverR);
        fields.Impedance("ohm", reactor.Ohm);
    }
}
