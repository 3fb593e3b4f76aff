namespace NetFault;

/// <summary>
/// A wind or photovoltaic power station unit behind a full-size converter, a current source during a short circuit (IEC 60909-0:2016). It
/// holds no voltage: alone it does not energise a bus.
/// </summary>
public sealed record FullConverterSource : ShuntElement
{
    /// <summary>
    /// RMS value IskPF of the source current in a three-phase short circuit, at the bus's voltage, in kA; not negative. By the manufacturer.
    /// </summary>
    public required double SourceCurrentKa { get; init; }

    /// <summary>RMS value IkPF of the steady-state current in kA, of the maximum and the minimum case; null keeps the source current.</summary>
    public MaxMin? SteadyStateKa { get; init; }

    /// <inheritdoc/>
    public override string Section => "full_converter_sources";

    internal override ElementRole Role => ElementRole.Follower;

    internal override void Check(ElementCheck check)
    {
        check.BusReference("bus", Bus);
        check.NotNegative("source_current_ka", SourceCurrentKa);
        check.PositiveMaxMin("steady_state_ka", SteadyStateKa);
    }
}
