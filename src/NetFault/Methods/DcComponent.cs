namespace NetFault;

/// <summary>The DC component of the phase with the largest one.</summary>
internal static class DcComponent
{
    /// <summary>√2·I″k·e^(−ω·t/(X/R)) in kA; without decay where there is no X/R.</summary>
    /// <param name="initialKa">I″k in kA.</param>
    /// <param name="ratio">X/R.</param>
    /// <param name="angle">ω·t in radians.</param>
    public static double Ka(double initialKa, in ReactanceRatio ratio, double angle) =>
        PerUnit.Sqrt2 * initialKa * (ratio.XOverR is { } value ? Math.Exp(-angle / value) : 1.0);
}
