using System.Numerics;

namespace NetFault;

/// <summary>
/// A span of ω·t with the tables of nodes that serve it, few nodes first. A span has its own nodes because those that serve early times well
/// are far from those that serve late ones; what is not asked for is not solved.
/// </summary>
/// <param name="FirstAngle">ω·t at which it begins.</param>
/// <param name="LastAngle">ω·t at which it ends.</param>
/// <param name="Tables">The tables of nodes, in units of ω.</param>
internal sealed record DecayWindow(double FirstAngle, double LastAngle, IReadOnlyList<Complex[]> Tables)
{
    /// <summary>The largest ω·t there are nodes for: 10 s at 60 Hz.</summary>
    public const double LargestAngle = 3800.0;

    /// <summary>0.3 s at 60 Hz.</summary>
    private const double FirstEnd = 115.0;
    private const double SecondEnd = 1150.0;

    /// <summary>With reactances at rated frequency.</summary>
    public static IReadOnlyList<DecayWindow> QuasiStatic { get; } =
    [
        new(0.0, FirstEnd, DecayNodes.QuasiStaticEarly),
        new(FirstEnd, SecondEnd, DecayNodes.QuasiStaticMiddle),
        new(SecondEnd, LargestAngle, DecayNodes.QuasiStaticLate),
    ];

    /// <summary>With inductances, for AC and DC component alike.</summary>
    public static IReadOnlyList<DecayWindow> Exact { get; } =
    [
        new(0.0, FirstEnd, DecayNodes.ExactEarly),
        new(FirstEnd, SecondEnd, DecayNodes.ExactMiddle),
        new(SecondEnd, LargestAngle, DecayNodes.ExactLate),
    ];

    /// <summary>Some values of ω·t of the window up to a horizon, close enough to tell how well a table serves it.</summary>
    public IEnumerable<double> Probes(double horizonAngle)
    {
        const int count = 16;
        var last = Math.Min(LastAngle, horizonAngle);
        var first = FirstAngle > 0.0 ? FirstAngle : Math.Min(0.05, last);
        if (FirstAngle <= 0.0)
            yield return 0.0;
        for (var i = 0; i < count; i++)
            yield return first * Math.Pow(last / first, i / (count - 1.0));
    }
}
