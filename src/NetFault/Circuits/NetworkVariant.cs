using System.Numerics;

namespace NetFault;

/// <summary>
/// Which of a study's networks: all have the circuit's shape, and differ in the values. Two equal variants are the same network, solved once.
/// </summary>
internal sealed record NetworkVariant
{
    /// <summary>A name for people.</summary>
    public required string Name { get; init; }

    /// <summary>The instant whose sources are in it.</summary>
    public FaultInstant Instant { get; init; }

    /// <summary>The parts of the impedances in it.</summary>
    public ImpedancePart Part { get; init; }

    /// <summary>The frequency it is solved at over the rated one: reactances are scaled by it, those of capacitors by its inverse.</summary>
    public double FrequencyRatio { get; init; } = 1.0;

    /// <summary>
    /// What reactances are multiplied with in place of j, for a network at a point p of the Laplace plane: (p + jω)/ω in the frame that rotates
    /// with ω; null for a real frequency.
    /// </summary>
    public Complex? ReactanceFactor { get; init; }

    /// <summary>Whether it is taken at a node of a quadrature, where a vanishing impedance is a pole nearby and no fault of the network.</summary>
    public bool IsAtNode { get; init; }

    /// <summary>Whether machines carry the fictitious resistance that IEC 60909-0 gives them for the peak current.</summary>
    public bool FictitiousResistance { get; init; }

    /// <summary>The impedance of the fault itself as it stands in this network.</summary>
    public Complex OfFault(Complex z) => Part switch
    {
        ImpedancePart.Reactance => new Complex(0.0, z.Imaginary),
        ImpedancePart.Resistance => z.Real,
        _ when ReactanceFactor is { } s => z.Real + z.Imaginary * s,
        _ => new Complex(z.Real, z.Imaginary * FrequencyRatio),
    };
}
