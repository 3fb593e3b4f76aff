namespace NetFault;

/// <summary>
/// A drive fed by a static converter that can feed energy back from its rotating mass (IEC 60909-0: static-converter-fed drives). Drives
/// that cannot do not contribute to short circuits and need not be in the network.
/// </summary>
public sealed record ConverterFedDrive : ShuntElement
{
    /// <summary>Rated apparent power SrM of the drive with its converter transformer in MVA, greater than 0.</summary>
    public required double RatedMva { get; init; }

    /// <summary>Rated line-to-line voltage UrM on the network side in kV; null takes the bus's nominal voltage.</summary>
    public double? RatedKv { get; init; }

    /// <inheritdoc/>
    public override string Section => "converter_fed_drives";

    internal override ElementRole Role => ElementRole.Follower;

    internal override void Check(ElementCheck check)
    {
        check.BusReference("bus", Bus);
        check.Positive("rated_mva", RatedMva);
        check.RatedVoltage("rated_kv", RatedKv, Bus);
    }
}
