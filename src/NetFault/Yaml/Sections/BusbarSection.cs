namespace NetFault;

/// <summary>The section <c>busbars</c>.</summary>
internal sealed class BusbarSection : Section<Busbar>
{
    public override string Name => "busbars";

    public override string Shape => "{bus: MV-A, rated_kv: 12, peak_withstand_current_ka: 63}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.Busbars;

    public override NetworkElement Read(IFields fields) => new Busbar
    {
        Id = fields.Id,
        Bus = fields.RequiredReference("bus"),
        RatedKv = fields.Number("rated_kv"),
        PeakWithstandCurrentKa = fields.Number("peak_withstand_current_ka"),
        ShortTimeWithstandCurrentKa = fields.Number("short_time_withstand_current_ka"),
        ShortTimeDurationSeconds = fields.Number("short_time_duration_s"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(Busbar busbar, FieldWriter fields)
    {
        fields.Reference("bus", busbar.Bus);
        fields.Number("rated_kv", busbar.RatedKv);
        fields.Withstand(busbar.PeakWithstandCurrentKa, busbar.ShortTimeWithstandCurrentKa, busbar.ShortTimeDurationSeconds);
    }
}
