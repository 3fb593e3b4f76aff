namespace NetFault;

/// <summary>The factor κ of the peak short-circuit current (IEC 60909-0:2016, 8.1).</summary>
internal static class PeakFactorKappa
{
    /// <summary>κ without any decay of the DC component.</summary>
    public const double Largest = 2.0;

    /// <summary>κ = 1.02 + 0.98·e^(−3·R/X); the largest where there is no X/R.</summary>
    public static double Of(in ReactanceRatio ratio) =>
        ratio.XOverR is { } xOverR ? 1.02 + 0.98 * Math.Exp(-3.0 / xOverR) : Largest;

    /// <summary>Method (b): 1.15·κ, limited to 1.8 in low-voltage and to 2.0 in other networks (8.1.2).</summary>
    public static double WithMargin(double kappa, bool lowVoltage) => Math.Min(1.15 * kappa, lowVoltage ? 1.8 : 2.0);
}
