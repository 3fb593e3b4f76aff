namespace NetFault;

/// <summary>The section <c>full_converter_sources</c>.</summary>
internal sealed class FullConverterSourceSection : Section<FullConverterSource>
{
    public override string Name => "full_converter_sources";

    public override string Shape => "{bus: MV-A, source_current_ka: 0.12}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.FullConverterSources;

    public override NetworkElement Read(IFields fields) => new FullConverterSource
    {
        Id = fields.Id,
        Bus = fields.RequiredReference("bus"),
        SourceCurrentKa = fields.RequiredNumber("source_current_ka"),
        SteadyStateKa = fields.MaxMin("steady_state_ka"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(FullConverterSource source, FieldWriter fields)
    {
        fields.Reference("bus", source.Bus);
        fields.Number("source_current_ka", source.SourceCurrentKa);
        fields.MaxMin("steady_state_ka", source.SteadyStateKa);
    }
}
