namespace NetFault;

/// <summary>A public network seen from its connection point, by its short-circuit power or current (IEC 60909-0, 6.2 network feeders).</summary>
public sealed record NetworkFeeder : ShuntElement
{
    /// <summary>The initial symmetrical short-circuit power S″kQ in MVA; this or <see cref="ShortCircuitKa"/>.</summary>
    public MaxMin? ShortCircuitMva { get; init; }

    /// <summary>The initial symmetrical short-circuit current I″kQ in kA; this or <see cref="ShortCircuitMva"/>.</summary>
    public MaxMin? ShortCircuitKa { get; init; }

    /// <summary>The ratio X/R of the feeder's impedance, greater than 0; this or <see cref="ROverX"/>.</summary>
    public double? XOverR { get; init; }

    /// <summary>The ratio R/X of the feeder's impedance, not negative; this or <see cref="XOverR"/>.</summary>
    public double? ROverX { get; init; }

    /// <inheritdoc/>
    public override string Section => "network_feeders";

    internal override ElementRole Role => ElementRole.Source;

    internal override void Check(ElementCheck check)
    {
        check.BusReference("bus", Bus);
        check.ExactlyOne(("short_circuit_mva", ShortCircuitMva.HasValue), ("short_circuit_ka", ShortCircuitKa.HasValue));
        check.ExactlyOne(("x_over_r", XOverR.HasValue), ("r_over_x", ROverX.HasValue));
        check.PositiveMaxMin("short_circuit_mva", ShortCircuitMva);
        check.PositiveMaxMin("short_circuit_ka", ShortCircuitKa);
        check.ReactanceRatio(XOverR, ROverX);
    }
}
