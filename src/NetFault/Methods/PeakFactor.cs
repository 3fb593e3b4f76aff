namespace NetFault;

/// <summary>The exact first peak of a fault at voltage zero in an R-L circuit without AC decay.</summary>
internal static class PeakFactor
{
    /// <summary>
    /// The peak over the symmetrical RMS current: the largest value over time of √2·[sin(ωt − φ) + sin φ·e^(−ωt/(X/R))], φ = atan(X/R),
    /// which solves the circuit's equation for a fault at voltage zero. With ψ = ωt − φ the derivative vanishes where
    /// cos ψ = cos φ·e^(−(ψ + φ)/(X/R)); Newton's method from ψ = π/2 comes down to it monotonically.
    /// </summary>
    /// <param name="xOverR">X/R, greater than 0.</param>
    public static double Of(double xOverR)
    {
        var phi = Math.Atan(xOverR);
        var cosPhi = Math.Cos(phi);
        var psi = Math.PI / 2.0;
        for (var step = double.MaxValue; Math.Abs(step) > 1e-14;)
        {
            var decayed = cosPhi * Math.Exp(-(psi + phi) / xOverR);
            step = (Math.Cos(psi) - decayed) / (Math.Sin(psi) - decayed / xOverR);
            psi += step;
            if (Math.Abs(step) < 1e-9)
                break;
        }
        return PerUnit.Sqrt2 * (Math.Sin(psi) + Math.Sin(phi) * Math.Exp(-(psi + phi) / xOverR));
    }

    /// <summary>The bound without any decay of the DC component: 2√2.</summary>
    public static double Undamped => 2.0 * PerUnit.Sqrt2;
}
