namespace NetFault;

/// <summary>The section <c>doubly_fed_generators</c>.</summary>
internal sealed class DoublyFedGeneratorSection : Section<DoublyFedGenerator>
{
    public override string Name => "doubly_fed_generators";

    public override string Shape => "{bus: MV-A, highest_instantaneous_ka: 0.5}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.DoublyFedGenerators;

    public override NetworkElement Read(IFields fields) => new DoublyFedGenerator
    {
        Id = fields.Id,
        Bus = fields.RequiredReference("bus"),
        HighestInstantaneousKa = fields.RequiredNumber("highest_instantaneous_ka"),
        RatedKv = fields.Number("rated_kv"),
        PeakFactor = fields.Number("peak_factor"),
        ROverX = fields.Number("r_over_x"),
        SteadyStateKa = fields.MaxMin("steady_state_ka"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(DoublyFedGenerator generator, FieldWriter fields)
    {
        fields.Reference("bus", generator.Bus);
        fields.Number("highest_instantaneous_ka", generator.HighestInstantaneousKa);
        fields.Number("rated_kv", generator.RatedKv);
        fields.Number("peak_factor", generator.PeakFactor);
        fields.Number("r_over_x", generator.ROverX);
        fields.MaxMin("steady_state_ka", generator.SteadyStateKa);
    }
}
