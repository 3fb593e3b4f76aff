namespace NetFault;

/// <summary>A two-winding transformer.</summary>
public sealed record Transformer : NetworkElement
{
    /// <summary>The id of the bus at the high-voltage winding.</summary>
    public required string Hv { get; init; }

    /// <summary>The id of the bus at the low-voltage winding.</summary>
    public required string Lv { get; init; }

    /// <summary>Rated apparent power SrT in MVA, greater than 0.</summary>
    public required double RatedMva { get; init; }

    /// <summary>Rated line-to-line voltage UrTHV of the high-voltage winding in kV, at the tap in use.</summary>
    public required double RatedHvKv { get; init; }

    /// <summary>Rated line-to-line voltage UrTLV of the low-voltage winding in kV, at the tap in use.</summary>
    public required double RatedLvKv { get; init; }

    /// <summary>Short-circuit voltage ukr in percent, greater than 0; more than 100 only where the rated power is a nominal one.</summary>
    public required double ShortCircuitVoltagePercent { get; init; }

    /// <summary>Load losses PkrT at rated current in kW; this, <see cref="ResistivePercent"/> or <see cref="XOverR"/>.</summary>
    public double? LoadLossKw { get; init; }

    /// <summary>Resistive part uRr of the short-circuit voltage in percent; this, <see cref="LoadLossKw"/> or <see cref="XOverR"/>.</summary>
    public double? ResistivePercent { get; init; }

    /// <summary>Ratio X/R of the short-circuit impedance; this, <see cref="LoadLossKw"/> or <see cref="ResistivePercent"/>.</summary>
    public double? XOverR { get; init; }

    /// <summary>The vector group, such as Dyn11; text, not used in the positive sequence.</summary>
    public string? VectorGroup { get; init; }

    /// <summary>Whether the transformer has an on-load tap changer; null where it is not known.</summary>
    public bool? OnLoadTapChanger { get; init; }

    /// <summary>
    /// The range pT in percent by which a permanently used off-load tap of a unit transformer may be off the main one (IEC 60909-0, K_SO), 0
    /// to 100; null where only the main tap is used.
    /// </summary>
    public double? OffLoadTapRangePercent { get; init; }

    /// <inheritdoc/>
    public override string Section => "transformers";

    internal override ElementRole Role => ElementRole.Branch;

    internal override IReadOnlyList<string?> Terminals => [Hv, Lv];

    internal override void Check(ElementCheck check)
    {
        check.BusReference("hv", Hv);
        check.BusReference("lv", Lv);
        check.DifferentBuses("hv", Hv, "lv", Lv);
        check.Positive("rated_mva", RatedMva);
        check.RatedVoltage("rated_kv.hv", RatedHvKv, Hv);
        check.RatedVoltage("rated_kv.lv", RatedLvKv, Lv);
        check.HighVoltageFirst("rated_kv.hv", RatedHvKv, "rated_kv.lv", RatedLvKv);
        check.Positive("short_circuit_voltage_percent", ShortCircuitVoltagePercent);
        check.UnusualPercent("short_circuit_voltage_percent", ShortCircuitVoltagePercent);
        check.ExactlyOne(("load_loss_kw", LoadLossKw.HasValue), ("resistive_percent", ResistivePercent.HasValue), ("x_over_r", XOverR.HasValue));
        check.WithinPercent("off_load_tap_range_percent", OffLoadTapRangePercent);
        check.NotNegative("load_loss_kw", LoadLossKw);
        check.NotNegative("resistive_percent", ResistivePercent);
        check.Positive("x_over_r", XOverR);
        check.NotAbove("resistive_percent", ResistivePercent, "short_circuit_voltage_percent", ShortCircuitVoltagePercent);
        if (LoadLossKw is { } loss && loss / 10.0 / RatedMva > ShortCircuitVoltagePercent)
            check.Say("load_loss_kw", Problems.LossAboveShortCircuitVoltage(loss, loss / 10.0 / RatedMva, ShortCircuitVoltagePercent));
    }
}
