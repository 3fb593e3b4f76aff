using System.Numerics;

namespace NetFault;

/// <summary>
/// What the network can be to one machine or motor in it, as points of the edge of a sector: w = x·s + μ, given as μ + jx, over the element's
/// own reactance at the beginning. Where the bounds of R/X hold for the network as a whole only, the element itself is in that whole: the
/// sector begins where all is gone of w but the part of the element's own reactance that the negative ones about it leave.
/// </summary>
internal sealed class ExternalImpedances
{
    /// <summary>Smaller ones are as good as none, larger ones as an open circuit.</summary>
    private const double Smallest = 1e-2, Largest = 1e3;

    private readonly PoleLimits _limits;
    private readonly double _density;
    private readonly double _steepest;
    private readonly double _flattest;

    /// <param name="limits">What bounds the network's poles.</param>
    /// <param name="density">Points for each e-fold of size.</param>
    public ExternalImpedances(PoleLimits limits, double density)
    {
        _limits = limits;
        _density = density;
        _steepest = Math.Atan2(1.0, limits.SmallestResistanceRatio);
        _flattest = Math.Atan2(1.0, limits.LargestResistanceRatio);
    }

    /// <summary>
    /// For the AC poles of a machine, whose own resistance counts as external: any R/X, for close to the rate of another machine nothing is left of
    /// that one's reactance, and it is a resistance.
    /// </summary>
    public IEnumerable<Complex> OfMachineForAc() =>
        Sector(Corner(0.0), 0.0, _limits.LargestResistanceRatio > 0.0 ? 0.0 : _steepest);

    /// <summary>For the DC poles of a machine, whose own resistance counts as external.</summary>
    public IEnumerable<Complex> OfMachineForDc() =>
        Sector(Corner(0.0), _limits.HoldAsAWhole ? WidthOfWhole : _limits.LargestMachineResistanceRatio, _flattest);

    /// <summary>For the poles of a motor.</summary>
    /// <param name="ratio">R/X of the motor.</param>
    public IEnumerable<Complex> OfMotor(double ratio) => Sector(Corner(ratio), _limits.HoldAsAWhole ? WidthOfWhole : 0.0, _flattest);

    /// <summary>Where the sector begins.</summary>
    /// <param name="ratio">R/X that is in the element's own impedance, and so not in w.</param>
    private Complex Corner(double ratio) => _limits.HoldAsAWhole
        ? new Complex(_limits.ReactanceLeft * _limits.SmallestResistanceRatio - ratio, _limits.ReactanceLeft - 1.0)
        : Complex.Zero;

    /// <summary>From the smallest to the largest R/X of what is left at the beginning; with no largest one the edge itself runs there.</summary>
    private double WidthOfWhole => double.IsInfinity(_limits.LargestResistanceRatio)
        ? 0.0
        : _limits.ReactanceLeft * (_limits.LargestResistanceRatio - _limits.SmallestResistanceRatio);

    /// <summary>A sector that begins with a width of resistance.</summary>
    private IEnumerable<Complex> Sector(Complex corner, double width, double flattest)
    {
        yield return corner;
        foreach (var size in Logarithmic(Smallest, Largest, _density))
        {
            yield return corner + Complex.FromPolarCoordinates(size, _steepest);
            yield return corner + width + Complex.FromPolarCoordinates(size, flattest);
        }
        var count = (int)Math.Ceiling(2.0 * _density);
        for (var i = 1; i <= count && width > 0.0; i++)
            yield return corner + width * i / count;
    }

    /// <summary>Values from the first to the last, in equal steps of their logarithm.</summary>
    public static IEnumerable<double> Logarithmic(double first, double last, double density)
    {
        var count = (int)Math.Ceiling(density * Math.Log(last / first)) + 1;
        for (var i = 0; i <= count; i++)
            yield return first * Math.Pow(last / first, (double)i / count);
    }
}
