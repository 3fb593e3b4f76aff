namespace NetFault;

/// <summary>The section <c>transformers</c>.</summary>
internal sealed class TransformerSection : Section<Transformer>
{
    public override string Name => "transformers";

    public override string Shape =>
        "{hv: GRID, lv: MV-A, rated_mva: 25, rated_kv: {hv: 110, lv: 11}, short_circuit_voltage_percent: 10, load_loss_kw: 120}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.Transformers;

    public override NetworkElement Read(IFields fields)
    {
        var ratedKv = fields.Group("rated_kv", required: true, out _);
        return new Transformer
        {
            Id = fields.Id,
            Hv = fields.RequiredReference("hv"),
            Lv = fields.RequiredReference("lv"),
            RatedMva = fields.RequiredNumber("rated_mva"),
            RatedHvKv = ratedKv.RequiredNumber("hv"),
            RatedLvKv = ratedKv.RequiredNumber("lv"),
            ShortCircuitVoltagePercent = fields.RequiredNumber("short_circuit_voltage_percent"),
            LoadLossKw = fields.Number("load_loss_kw"),
            ResistivePercent = fields.Number("resistive_percent"),
            XOverR = fields.Number("x_over_r"),
            VectorGroup = fields.Text("vector_group"),
            OnLoadTapChanger = fields.Flag("on_load_tap_changer"),
            OffLoadTapRangePercent = fields.Number("off_load_tap_range_percent"),
            InService = fields.InService(),
            Note = fields.Note(),
        };
    }

    protected override void Write(Transformer transformer, FieldWriter fields)
    {
        fields.Reference("hv", transformer.Hv);
        fields.Reference("lv", transformer.Lv);
        fields.Number("rated_mva", transformer.RatedMva);
        fields.Group("rated_kv", ("hv", transformer.RatedHvKv), ("lv", transformer.RatedLvKv));
        fields.Number("short_circuit_voltage_percent", transformer.ShortCircuitVoltagePercent);
        fields.Number("load_loss_kw", transformer.LoadLossKw);
        fields.Number("resistive_percent", transformer.ResistivePercent);
        fields.Number("x_over_r", transformer.XOverR);
        fields.Text("vector_group", transformer.VectorGroup);
        fields.Flag("on_load_tap_changer", transformer.OnLoadTapChanger);
        fields.Number("off_load_tap_range_percent", transformer.OffLoadTapRangePercent);
    }
}
