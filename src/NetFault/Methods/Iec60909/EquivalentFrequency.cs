namespace NetFault;

/// <summary>The equivalent frequencies fc of IEC 60909-0:2016 as a share of the rated one.</summary>
internal static class EquivalentFrequency
{
    /// <summary>For the peak current, method (c) (8.1.2): 20 Hz in 50 Hz networks, 24 Hz in 60 Hz networks.</summary>
    public const double Peak = 0.4;

    /// <summary>
    /// For the DC component at time t (clause 9): fc/f by f·t. Beyond f·t = 12.5 the table ends; its last value is kept.
    /// </summary>
    public static double OfDcComponent(double cycles) => cycles switch
    {
        < 1.0 => 0.27,
        < 2.5 => 0.15,
        < 5.0 => 0.092,
        _ => 0.055,
    };

    /// <summary>X/R at rated frequency from an impedance at an equivalent one: R/X = (Rc/Xc)·(fc/f).</summary>
    public static ReactanceRatio Ratio(System.Numerics.Complex atEquivalentFrequency, double frequencyRatio) =>
        ReactanceRatio.Of(atEquivalentFrequency.Real, atEquivalentFrequency.Imaginary / frequencyRatio);
}
