using System.Numerics;

namespace NetFault.NodeTables;

/// <summary>
/// The largest errors of nodes with the weights that the library would take, least squares without shifted weights, over more points and
/// times than the nodes were fitted to.
/// </summary>
internal sealed class Validation
{
    private readonly FitProblem _problem;
    private readonly Complex[] _ac;
    private readonly Complex[] _dc;
    private readonly IReadOnlyList<double> _angles;

    public Validation(NetworkClass networks, IReadOnlyList<double> angles)
    {
        _problem = new FitProblem(networks, angles);
        _ac = networks.AcCheck;
        _dc = networks.DcCheck;
        _angles = angles;
    }

    /// <summary>The largest errors of nodes.</summary>
    public LargestErrors Of(Complex[] nodes)
    {
        var projection = new Projection(_problem, nodes);
        ComplexColumn[] ac = Columns(projection, _ac), dc = Columns(projection, _dc);
        double largestAc = 0.0, largestDc = 0.0;
        for (var k = 0; k < projection.Weights.Length; k++)
        {
            var ofAc = k < _angles.Count;
            var angle = _angles[k % _angles.Count];
            var error = Math.Max(
                Largest(_ac, ac, projection.Weights[k], ofAc ? angle : null),
                Largest(_dc, dc, projection.Weights[k], ofAc ? null : angle));
            if (ofAc)
                largestAc = Math.Max(largestAc, error);
            else
                largestDc = Math.Max(largestDc, error);
        }
        return new LargestErrors(largestAc, largestDc);
    }

    private static ComplexColumn[] Columns(Projection projection, Complex[] points) =>
        projection.Nodes.Select((node, k) => Column(points, point => projection.Scale[k] / (node - point))).ToArray();

    private static ComplexColumn Column(Complex[] points, Func<Complex, Complex> value)
    {
        var column = new ComplexColumn(points.Length);
        for (var i = 0; i < points.Length; i++)
            column[i] = value(points[i]);
        return column;
    }

    private static double Largest(Complex[] points, ComplexColumn[] columns, Complex[] weights, double? angle)
    {
        var errors = Column(points, point => angle is { } t ? Complex.Exp(point * t) : Complex.Zero);
        for (var k = 0; k < weights.Length; k++)
            errors.Subtract(weights[k], columns[k]);
        return errors.LargestMagnitude;
    }
}

/// <summary>Errors relative to the sum of the residues.</summary>
/// <param name="Ac">Of the AC component.</param>
/// <param name="Dc">Of the DC component.</param>
internal readonly record struct LargestErrors(double Ac, double Dc)
{
    public double Largest => Math.Max(Ac, Dc);
}
