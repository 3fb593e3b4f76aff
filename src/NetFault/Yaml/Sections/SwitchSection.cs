namespace NetFault;

/// <summary>The section <c>switches</c>.</summary>
internal sealed class SwitchSection : Section<Switch>
{
    public override string Name => "switches";

    public override string Shape => "{bus: MV-A, feeds: C1, rated_kv: 12, peak_withstand_current_ka: 63}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.Switches;

    public override NetworkElement Read(IFields fields) => new Switch
    {
        Id = fields.Id,
        Bus = fields.RequiredReference("bus"),
        Feeds = fields.RequiredReference("feeds"),
        FeedsSection = fields.FeedsSection(),
        RatedKv = fields.Number("rated_kv"),
        ShortCircuitMakingCurrentKa = fields.Number("short_circuit_making_current_ka"),
        PeakWithstandCurrentKa = fields.Number("peak_withstand_current_ka"),
        ShortTimeWithstandCurrentKa = fields.Number("short_time_withstand_current_ka"),
        ShortTimeDurationSeconds = fields.Number("short_time_duration_s"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(Switch device, FieldWriter fields)
    {
        fields.Terminal(device);
        fields.Number("rated_kv", device.RatedKv);
        fields.Number("short_circuit_making_current_ka", device.ShortCircuitMakingCurrentKa);
        fields.Withstand(device.PeakWithstandCurrentKa, device.ShortTimeWithstandCurrentKa, device.ShortTimeDurationSeconds);
    }
}
