namespace NetFault;

/// <summary>The section <c>lines</c>.</summary>
internal sealed class LineSection : Section<Line>
{
    public override string Name => "lines";

    public override string Shape => "{from: MV-A, to: MV-B, length_km: 0.8, ohm_per_km: {r: 0.098, x: 0.095}}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.Lines;

    public override NetworkElement Read(IFields fields) => new Line
    {
        Id = fields.Id,
        From = fields.RequiredReference("from"),
        To = fields.RequiredReference("to"),
        LengthKm = fields.Number("length_km"),
        OhmPerKm = fields.Impedance("ohm_per_km"),
        Ohm = fields.Impedance("ohm"),
        PerUnit = fields.Impedance("per_unit"),
        Parallel = fields.Whole("parallel") ?? 1,
        EndTemperatureC = fields.Number("end_temperature_c"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(Line line, FieldWriter fields)
    {
        fields.Reference("from", line.From);
        fields.Reference("to", line.To);
        fields.Number("length_km", line.LengthKm);
        fields.Impedance("ohm_per_km", line.OhmPerKm);
        fields.Impedance("ohm", line.Ohm);
        fields.Impedance("per_unit", line.PerUnit);
        fields.Number("parallel", line.Parallel == 1 ? null : line.Parallel);
        fields.Number("end_temperature_c", line.EndTemperatureC);
    }
}
