namespace NetFault;

/// <summary>A three-winding transformer. A winding without a bus is open.</summary>
public sealed record ThreeWindingTransformer : NetworkElement
{
    /// <summary>The id of the bus at the high-voltage winding; null where the winding is open.</summary>
    public string? Hv { get; init; }

    /// <summary>The id of the bus at the medium-voltage winding; null where the winding is open.</summary>
    public string? Mv { get; init; }

    /// <summary>The id of the bus at the low-voltage winding; null where the winding is open.</summary>
    public string? Lv { get; init; }

    /// <summary>Rated apparent power of each winding in MVA, greater than 0.</summary>
    public required WindingValues RatedMva { get; init; }

    /// <summary>Rated line-to-line voltage of each winding in kV, at the tap in use.</summary>
    public required WindingValues RatedKv { get; init; }

    /// <summary>Short-circuit voltage of each pair of windings in percent, on the smaller rating of the two.</summary>
    public required WindingPairValues ShortCircuitVoltagePercent { get; init; }

    /// <summary>Resistive part of each pair's short-circuit voltage in percent, on the smaller rating of the two.</summary>
    public required WindingPairValues ResistivePercent { get; init; }

    /// <summary>The vector group; text, not used in the positive sequence.</summary>
    public string? VectorGroup { get; init; }

    /// <summary>Whether the transformer has an on-load tap changer; null where it is not known.</summary>
    public bool? OnLoadTapChanger { get; init; }

    /// <inheritdoc/>
    public override string Section => "three_winding_transformers";

    internal override ElementRole Role => ElementRole.Branch;

    internal override IReadOnlyList<string?> Terminals => [Hv, Mv, Lv];

    internal override void Check(ElementCheck check)
    {
        var connected = new[] { Hv, Mv, Lv }.Count(bus => bus is not null);
        if (connected < 2)
            check.Say(null, Problems.FewerThanTwoWindings(connected));
        CheckWinding(check, "hv", Hv, RatedMva.Hv, RatedKv.Hv);
        CheckWinding(check, "mv", Mv, RatedMva.Mv, RatedKv.Mv);
        CheckWinding(check, "lv", Lv, RatedMva.Lv, RatedKv.Lv);
        CheckPair(check, "hv_mv", ("hv", Hv), ("mv", Mv), ShortCircuitVoltagePercent.HvMv, ResistivePercent.HvMv);
        CheckPair(check, "hv_lv", ("hv", Hv), ("lv", Lv), ShortCircuitVoltagePercent.HvLv, ResistivePercent.HvLv);
        CheckPair(check, "mv_lv", ("mv", Mv), ("lv", Lv), ShortCircuitVoltagePercent.MvLv, ResistivePercent.MvLv);
    }

    private static void CheckWinding(ElementCheck check, string name, string? bus, double? ratedMva, double? ratedKv)
    {
        check.Positive("rated_mva." + name, ratedMva);
        check.RatedVoltage("rated_kv." + name, ratedKv, bus);
        if (bus is null)
            return;
        check.BusReference(name, bus);
        check.Needed("rated_mva." + name, ratedMva, name);
        check.Needed("rated_kv." + name, ratedKv, name);
    }

    private static void CheckPair(
        ElementCheck check, string name, (string Key, string? Bus) one, (string Key, string? Bus) other, double? voltage, double? resistive)
    {
        var voltageKey = "short_circuit_voltage_percent." + name;
        var resistiveKey = "resistive_percent." + name;
        check.Positive(voltageKey, voltage);
        check.UnusualPercent(voltageKey, voltage);
        check.NotNegative(resistiveKey, resistive);
        check.NotAbove(resistiveKey, resistive, voltageKey, voltage);
        if (one.Bus is null || other.Bus is null)
            return;
        check.DifferentBuses(one.Key, one.Bus, other.Key, other.Bus);
        check.Needed(voltageKey, voltage, name);
        check.Needed(resistiveKey, resistive, name);
    }
}
