namespace NetFault;

/// <summary>The section <c>converter_fed_drives</c>.</summary>
internal sealed class ConverterFedDriveSection : Section<ConverterFedDrive>
{
    public override string Name => "converter_fed_drives";

    public override string Shape => "{bus: MV-A, rated_mva: 4}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.ConverterFedDrives;

    public override NetworkElement Read(IFields fields) => new ConverterFedDrive
    {
        Id = fields.Id,
        Bus = fields.RequiredReference("bus"),
        RatedMva = fields.RequiredNumber("rated_mva"),
        RatedKv = fields.Number("rated_kv"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(ConverterFedDrive drive, FieldWriter fields)
    {
        fields.Reference("bus", drive.Bus);
        fields.Number("rated_mva", drive.RatedMva);
        fields.Number("rated_kv", drive.RatedKv);
    }
}
