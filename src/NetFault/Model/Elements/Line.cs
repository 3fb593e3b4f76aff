namespace NetFault;

/// <summary>An overhead line or a cable, or several equal ones in parallel.</summary>
public sealed record Line : NetworkElement
{
    /// <summary>The id of the bus at one end.</summary>
    public required string From { get; init; }

    /// <summary>The id of the bus at the other end.</summary>
    public required string To { get; init; }

    /// <summary>Length in km, greater than 0; goes with <see cref="OhmPerKm"/>.</summary>
    public double? LengthKm { get; init; }

    /// <summary>Impedance of one circuit in ohm per km; this, <see cref="Ohm"/> or <see cref="PerUnit"/>.</summary>
    public Impedance? OhmPerKm { get; init; }

    /// <summary>Impedance of one circuit over its whole length in ohm; this, <see cref="OhmPerKm"/> or <see cref="PerUnit"/>.</summary>
    public Impedance? Ohm { get; init; }

    /// <summary>
    /// Impedance of one circuit over its whole length, per unit on the network's base power and the nominal voltage of the
    /// <see cref="From"/> bus; this, <see cref="OhmPerKm"/> or <see cref="Ohm"/>.
    /// </summary>
    public Impedance? PerUnit { get; init; }

    /// <summary>How many equal circuits run in parallel, 1 or more. Default 1.</summary>
    public int Parallel { get; init; } = 1;

    /// <summary>
    /// The conductor temperature θe at the end of the short circuit in °C, for the resistance in the minimum case (IEC 60909-0), 20 to 400;
    /// the impedance given is that at 20 °C.
    /// </summary>
    public double? EndTemperatureC { get; init; }

    /// <inheritdoc/>
    public override string Section => "lines";

    internal override ElementRole Role => ElementRole.Branch;

    internal override IReadOnlyList<string?> Terminals => [From, To];

    internal override void Check(ElementCheck check)
    {
        check.BusReference("from", From);
        check.BusReference("to", To);
        check.DifferentBuses("from", From, "to", To);
        check.AtLeastOne("parallel", Parallel);
        check.ExactlyOne(("ohm_per_km", OhmPerKm.HasValue), ("ohm", Ohm.HasValue), ("per_unit", PerUnit.HasValue));
        check.SeriesImpedance("ohm_per_km", OhmPerKm);
        check.SeriesImpedance("ohm", Ohm);
        check.SeriesImpedance("per_unit", PerUnit);
        check.Positive("length_km", LengthKm);
        check.Within("end_temperature_c", EndTemperatureC, 20.0, 400.0);
        if (OhmPerKm.HasValue)
            check.Needed("length_km", LengthKm, "ohm_per_km");
        check.SameNominalVoltage(From, To, PerUnit.HasValue);
    }
}
