namespace NetFault;

/// <summary>The section <c>series_capacitors</c>.</summary>
internal sealed class SeriesCapacitorSection : Section<SeriesCapacitor>
{
    public override string Name => "series_capacitors";

    public override string Shape => "{from: LINE-1, to: LINE-2, reactance_ohm: 12, voltage_limited: true}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.SeriesCapacitors;

    public override NetworkElement Read(IFields fields) => new SeriesCapacitor
    {
        Id = fields.Id,
        From = fields.RequiredReference("from"),
        To = fields.RequiredReference("to"),
        ReactanceOhm = fields.RequiredNumber("reactance_ohm"),
        VoltageLimited = fields.RequiredFlag("voltage_limited"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(SeriesCapacitor capacitor, FieldWriter fields)
    {
        fields.Reference("from", capacitor.From);
        fields.Reference("to", capacitor.To);
        fields.Number("reactance_ohm", capacitor.ReactanceOhm);
        fields.Flag("voltage_limited", capacitor.VoltageLimited);
    }
}
