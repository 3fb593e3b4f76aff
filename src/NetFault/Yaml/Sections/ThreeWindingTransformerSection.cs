namespace NetFault;

/// <summary>The section <c>three_winding_transformers</c>. A winding without a bus is open.</summary>
internal sealed class ThreeWindingTransformerSection : Section<ThreeWindingTransformer>
{
    public override string Name => "three_winding_transformers";

    public override string Shape => "{hv: GRID, mv: MV-A, lv: TERTIARY, rated_mva: {hv: 350, mv: 350, lv: 50}, ...}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.ThreeWindingTransformers;

    public override NetworkElement Read(IFields fields) => new ThreeWindingTransformer
    {
        Id = fields.Id,
        Hv = fields.Reference("hv"),
        Mv = fields.Reference("mv"),
        Lv = fields.Reference("lv"),
        RatedMva = fields.WindingValues("rated_mva"),
        RatedKv = fields.WindingValues("rated_kv"),
        ShortCircuitVoltagePercent = fields.WindingPairValues("short_circuit_voltage_percent"),
        ResistivePercent = fields.WindingPairValues("resistive_percent"),
        VectorGroup = fields.Text("vector_group"),
        OnLoadTapChanger = fields.Flag("on_load_tap_changer"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(ThreeWindingTransformer transformer, FieldWriter fields)
    {
        fields.Reference("hv", transformer.Hv);
        fields.Reference("mv", transformer.Mv);
        fields.Reference("lv", transformer.Lv);
        fields.Windings("rated_mva", transformer.RatedMva);
        fields.Windings("rated_kv", transformer.RatedKv);
        fields.WindingPairs("short_circuit_voltage_percent", transformer.ShortCircuitVoltagePercent);
        fields.WindingPairs("resistive_percent", transformer.ResistivePercent);
        fields.Text("vector_group", transformer.VectorGroup);
        fields.Flag("on_load_tap_changer", transformer.OnLoadTapChanger);
    }
}
