namespace NetFault;

/// <summary>
/// A wind power station unit with a doubly fed asynchronous generator and its unit transformer, seen from the transformer's high-voltage
/// side (IEC 60909-0:2016).
/// </summary>
public sealed record DoublyFedGenerator : ShuntElement
{
    /// <summary>
    /// The highest instantaneous value iWDmax of the short-circuit current of the unit in a three-phase short circuit at this bus, in kA;
    /// greater than 0. By the manufacturer.
    /// </summary>
    public required double HighestInstantaneousKa { get; init; }

    /// <summary>Rated line-to-line voltage UrTHV of the unit transformer's high-voltage side in kV; null takes the bus's nominal voltage.</summary>
    public double? RatedKv { get; init; }

    /// <summary>The factor κWD for the peak current, from 1 to 2; by the manufacturer, null assumes the standard's 1.7.</summary>
    public double? PeakFactor { get; init; }

    /// <summary>Ratio R/X of the unit's impedance, not negative; null assumes the standard's 0.1.</summary>
    public double? ROverX { get; init; }

    /// <summary>RMS value IkWD of the steady-state current in kA, of the maximum and the minimum case; null where it is not known.</summary>
    public MaxMin? SteadyStateKa { get; init; }

    /// <inheritdoc/>
    public override string Section => "doubly_fed_generators";

    internal override ElementRole Role => ElementRole.Follower;

    internal override void Check(ElementCheck check)
    {
        check.BusReference("bus", Bus);
        check.Positive("highest_instantaneous_ka", HighestInstantaneousKa);
        check.RatedVoltage("rated_kv", RatedKv, Bus);
        check.NotNegative("r_over_x", ROverX);
        check.PositiveMaxMin("steady_state_ka", SteadyStateKa);
        check.Within("peak_factor", PeakFactor, 1.0, 2.0);
    }
}
