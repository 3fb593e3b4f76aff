using System.Numerics;

namespace NetFault.NodeTables;

/// <summary>
/// What nodes are fitted to: at each point z of the regions and each time, Σ W/(node − z) shall be e^(zt) for the component that z belongs
/// to and 0 for the other. A target is one time of one component. Its points are thinned, for the fit is repeated thousands of times.
/// </summary>
internal sealed class FitProblem
{
    /// <summary>Points of a region for each e-fold of distance from the middle of its cluster.</summary>
    private const double PointsAnEFold = 10.0;

    /// <summary>|z|·t below which a point is as good as the middle.</summary>
    private const double Middle = 0.02;

    private readonly double[] _timeWeights;

    public FitProblem(NetworkClass networks, IReadOnlyList<double> angles)
    {
        var last = angles.Max();
        var ac = Thinned(networks.AcFit, Complex.Zero, Middle / last);
        var dc = Thinned(networks.DcFit, -Complex.ImaginaryOne, Middle / last);
        Points = [.. ac, .. dc];
        AcCount = ac.Length;
        Targets = [.. angles.Select(angle => Target(angle, 0, AcCount))];
        if (dc.Length > 0)
            Targets = [.. Targets, .. angles.Select(angle => Target(angle, AcCount, Points.Length))];
        _timeWeights = Enumerable.Repeat(1.0, Targets.Length).ToArray();
        PointWeights = Enumerable.Repeat(1.0, Points.Length).ToArray();
    }

    /// <summary>Points of the AC region, then of the DC region.</summary>
    public Complex[] Points { get; }

    /// <summary>How many of the points are of the AC region.</summary>
    public int AcCount { get; }

    /// <summary>What the sums shall be at the points, without weights.</summary>
    public ComplexColumn[] Targets { get; }

    /// <summary>The weight of each point in the sum of squares, as a factor of its residual.</summary>
    public double[] PointWeights { get; }

    /// <summary>A target with its weights, with room for the rows that damp the weights.</summary>
    public ComplexColumn Weighted(int target, int rows)
    {
        var column = new ComplexColumn(rows);
        for (var i = 0; i < Points.Length; i++)
            column[i] = Targets[target][i] * (PointWeights[i] * _timeWeights[target]);
        return column;
    }

    /// <summary>Moves weight to points and targets whose residuals are large, to bring least squares near to the least maximum.</summary>
    /// <param name="residuals">By target, with the present weights.</param>
    /// <param name="attempt">How strongly.</param>
    public void Reweight(ComplexColumn[] residuals, Attempt attempt)
    {
        var atPoint = new double[Points.Length];
        var ofTarget = new double[Targets.Length];
        for (var k = 0; k < Targets.Length; k++)
        {
            for (var i = 0; i < Points.Length; i++)
            {
                var error = Complex.Abs(residuals[k][i]) / (PointWeights[i] * _timeWeights[k]);
                atPoint[i] = Math.Max(atPoint[i], error);
                ofTarget[k] = Math.Max(ofTarget[k], error);
            }
        }
        Shift(PointWeights, atPoint, attempt.PointExponent);
        Shift(_timeWeights, ofTarget, attempt.TargetExponent);
    }

    private static void Shift(double[] weights, double[] errors, double exponent)
    {
        const double least = 1e-3, smallest = 1e-2, largest = 30.0;
        var mean = errors.Average();
        for (var i = 0; i < weights.Length; i++)
            weights[i] = Math.Clamp(weights[i] * Math.Pow(errors[i] / mean + least, exponent), smallest, largest);
    }

    private ComplexColumn Target(double angle, int from, int to)
    {
        var column = new ComplexColumn(Points.Length);
        for (var i = from; i < to; i++)
            column[i] = Complex.Exp(Points[i] * angle);
        return column;
    }

    private static Complex[] Thinned(Complex[] points, Complex middle, double smallest)
    {
        var taken = new HashSet<(int Ring, int Sector)>();
        return points.Where(point => taken.Add(Cell(point - middle, smallest))).ToArray();
    }

    private static (int Ring, int Sector) Cell(Complex offset, double smallest)
    {
        var distance = Complex.Abs(offset);
        return distance < smallest
            ? (int.MinValue, 0)
            : ((int)Math.Round(Math.Log(distance) * PointsAnEFold), (int)Math.Round(offset.Phase * 2.0 * PointsAnEFold));
    }
}
