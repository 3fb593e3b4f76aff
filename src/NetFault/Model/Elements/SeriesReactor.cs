namespace NetFault;

/// <summary>A series reactor that limits short-circuit currents.</summary>
public sealed record SeriesReactor : NetworkElement
{
    /// <summary>The id of the bus at one end.</summary>
    public required string From { get; init; }

    /// <summary>The id of the bus at the other end.</summary>
    public required string To { get; init; }

    /// <summary>Rated current IrR in kA; goes with <see cref="ReactancePercent"/>.</summary>
    public double? RatedKa { get; init; }

    /// <summary>Rated line-to-line voltage UrR in kV; null takes the nominal voltage of the <see cref="From"/> bus.</summary>
    public double? RatedKv { get; init; }

    /// <summary>Rated reactance in percent of UrR/(√3·IrR); this or <see cref="Ohm"/>.</summary>
    public double? ReactancePercent { get; init; }

    /// <summary>Ratio X/R; null where it is not known: then R is taken as 0 and the result says so.</summary>
    public double? XOverR { get; init; }

    /// <summary>Impedance in ohm; this or <see cref="ReactancePercent"/>.</summary>
    public Impedance? Ohm { get; init; }

    /// <inheritdoc/>
    public override string Section => "series_reactors";

    internal override ElementRole Role => ElementRole.Branch;

    internal override IReadOnlyList<string?> Terminals => [From, To];

    internal override void Check(ElementCheck check)
    {
        check.BusReference("from", From);
        check.BusReference("to", To);
        check.DifferentBuses("from", From, "to", To);
        check.ExactlyOne(("reactance_percent", ReactancePercent.HasValue), ("ohm", Ohm.HasValue));
        check.Positive("reactance_percent", ReactancePercent);
        check.UnusualPercent("reactance_percent", ReactancePercent);
        check.Positive("rated_ka", RatedKa);
        check.RatedVoltage("rated_kv", RatedKv, From);
        if (ReactancePercent.HasValue)
            check.Needed("rated_ka", RatedKa, "reactance_percent");
        check.SeriesImpedance("ohm", Ohm);
        check.AtMostOne(("ohm", Ohm.HasValue), ("x_over_r", XOverR.HasValue));
        check.Positive("x_over_r", XOverR);
        check.SameNominalVoltage(From, To, perUnit: false);
    }
}
