using System.Numerics;

namespace NetFault;

/// <summary>
/// The current of one fault over time, by what gives its two components: complex RMS values in kA in the frame that rotates with ω, the driving
/// voltage's angle their reference. The current of a phase is √2·Im[(AC + DC)·e^(j(ωt + α))], α its closing angle.
/// </summary>
internal sealed class CurrentWaveform(double omega, Func<double, Complex> ac, Func<double, Complex> dc)
{
    /// <summary>The AC component at ω·t.</summary>
    public Complex Ac(double angle) => ac(angle);

    /// <summary>The DC component at ω·t; of constant direction once it is turned by e^(jωt).</summary>
    public Complex Dc(double angle) => dc(angle);

    /// <summary>The current of a phase in kA.</summary>
    public double InstantaneousKa(double angle, double closingAngle) =>
        OfPhase(Ac(angle) + Dc(angle), angle + closingAngle);

    /// <summary>The DC component of a phase in kA.</summary>
    public double DcOfPhaseKa(double angle, double closingAngle) => OfPhase(Dc(angle), angle + closingAngle);

    /// <summary>
    /// The largest instantaneous current over time and closing angle: √2·max|AC + DC|, for at each time there is a closing angle that brings it
    /// about. AC and e^(jωt)·DC are smooth, so Chebyshev's points stand for them (J.-P. Berrut, L. N. Trefethen, Barycentric Lagrange interpolation,
    /// SIAM Review 46, 2004), and the maximum is searched on the interpolant.
    /// </summary>
    /// <param name="horizonAngle">ω times the end of the search.</param>
    public PeakCurrent WorstPeak(double horizonAngle)
    {
        var components = new ChebyshevPair(Math.Min(FirstAngle, 0.5 * horizonAngle), Math.Min(LastAngle, horizonAngle), Ac,
            angle => Dc(angle) * Complex.FromPolarCoordinates(1.0, angle));
        var angle = components.Maximise(Magnitude);
        var current = Current(components, angle);
        var closing = Math.PI / 2.0 - angle - current.Phase;
        closing -= Math.PI * Math.Ceiling(closing / Math.PI - 0.5);
        return new PeakCurrent(PerUnit.Sqrt2 * Complex.Abs(current), angle / omega, closing * 180.0 / Math.PI);
    }

    /// <summary>The first peak is about half a cycle after the beginning; no later one is higher.</summary>
    private const double FirstAngle = 0.2, LastAngle = 5.5;

    private static double OfPhase(Complex rms, double angle) => PerUnit.Sqrt2 * (rms * Complex.FromPolarCoordinates(1.0, angle)).Imaginary;

    private static double Magnitude(ChebyshevPair components, double angle) => Complex.Abs(Current(components, angle));

    private static Complex Current(ChebyshevPair components, double angle)
    {
        var (still, turning) = components.At(angle);
        return still + turning * Complex.FromPolarCoordinates(1.0, -angle);
    }
}

/// <summary>The highest instantaneous value that a short-circuit current can reach.</summary>
/// <param name="Ka">The peak in kA, of either polarity.</param>
/// <param name="Seconds">When it comes, after the beginning of the fault.</param>
/// <param name="ClosingAngleDegrees">
/// The closing angle that brings it about, above −90 and up to 90 degrees: that of the voltage √2·U·sin(ωt + α) of the phase at the beginning; the
/// same with 180 degrees more gives the peak in the other direction.
/// </param>
public sealed record PeakCurrent(double Ka, double Seconds, double ClosingAngleDegrees);
