using System.Numerics;

namespace NetFault;

/// <summary>
/// A quadrature of the contour integrals of e^(pt)·F(p) about the two clusters of poles: with F known at a few nodes, AC(t) ≈ Σ W·F and DC(t) ≈
/// Σ W′·F. The weights of a time are those for which Σ W/(node − z) comes nearest to e^(zt) at each z where a pole of the component can lie and to
/// 0 where one of the other can: least squares over the regions' edges, by orthogonal columns. Immutable; one rule serves every bus and time.
/// </summary>
internal sealed class QuadratureRule
{
    /// <summary>Share of its column at which a weight is held down, so that rounding in F is not blown up.</summary>
    private const double Damping = 1e-11;

    /// <summary>Rounding in the samples of F, relative.</summary>
    private const double SampleRounding = 1e-13;

    /// <summary>
    /// Bound of Σ|residues| of F over I″k in a cluster. Without resistances it is 1 for the AC component (all residues have one sign), without
    /// decay at most √2 for the DC component (all lie in a quarter of the plane). There is no proof for networks of both; 2.0 was the largest in
    /// some 3,000 generated ones, commonly it is below 1.2.
    /// </summary>
    private const double ResidueSum = 3.0;

    private readonly Complex[] _poles;       // AC region, then DC region
    private readonly int _acCount;
    private readonly double[] _scale;        // by which each column is divided
    private readonly Complex[][] _q;         // orthonormal columns, length poles + nodes
    private readonly Complex[][] _r;         // _r[k][i], i ≤ k: the columns in them
    private readonly Complex[] _check;       // points of the AC region, then of the DC region, at which errors are looked up
    private readonly int _acCheckCount;
    private readonly Complex[][] _atCheck;   // 1/(node − point), by node

    public QuadratureRule(Complex[] nodes, PoleRegion region)
    {
        Nodes = nodes;
        PolePoints ac = region.Ac(nodes.Length), dc = region.Dc(nodes.Length);
        _poles = [.. ac.Fit, .. dc.Fit];
        _acCount = ac.Fit.Length;
        _check = [.. ac.Check, .. dc.Check];
        _acCheckCount = ac.Check.Length;
        _atCheck = Array.ConvertAll(nodes, node => Array.ConvertAll(_check, point => 1.0 / (node - point)));
        _scale = new double[nodes.Length];
        _q = new Complex[nodes.Length][];
        _r = new Complex[nodes.Length][];
        for (var k = 0; k < nodes.Length; k++)
            Orthogonalise(k);
    }

    /// <summary>Where F is sampled, in units of ω.</summary>
    public Complex[] Nodes { get; }

    /// <summary>Whether the regions have the poles of the DC component too.</summary>
    public bool HasDc => _acCount < _poles.Length;

    /// <summary>The weights of a time.</summary>
    /// <param name="angle">ω·t.</param>
    public NodeWeights At(double angle)
    {
        var ac = Weights(angle, 0, _acCount);
        var acError = ErrorOf(ac, angle, 0, _acCheckCount);
        if (!HasDc)
            return new NodeWeights(ac, [], acError, 0.0);
        var dc = Weights(angle, _acCount, _poles.Length);
        return new NodeWeights(ac, dc, acError, ErrorOf(dc, angle, _acCheckCount, _check.Length));
    }

    private void Orthogonalise(int k)
    {
        var column = new Complex[_poles.Length + Nodes.Length];
        for (var i = 0; i < _poles.Length; i++)
            column[i] = 1.0 / (Nodes[k] - _poles[i]);
        _scale[k] = Math.Sqrt(Dot(column, column).Real);
        for (var i = 0; i < _poles.Length; i++)
            column[i] /= _scale[k];
        column[_poles.Length + k] = Damping;
        _q[k] = column;
        _r[k] = Project(column, k);
        var norm = Math.Sqrt(Dot(column, column).Real);
        _r[k][k] = norm;
        for (var i = 0; i < column.Length; i++)
            column[i] /= norm;
    }

    /// <summary>Takes its parts along the first columns off a vector, twice for orthogonality to rounding, and gives them.</summary>
    private Complex[] Project(Complex[] vector, int columns)
    {
        var parts = new Complex[Math.Max(columns + 1, 1)];
        for (var pass = 0; pass < 2; pass++)
        {
            for (var i = 0; i < columns; i++)
            {
                var part = Dot(_q[i], vector);
                parts[i] += part;
                SubtractProduct(vector, _q[i], part);
            }
        }
        return parts;
    }

    /// <summary>The weights for e^(zt) at some of the poles and 0 at the others.</summary>
    private Complex[] Weights(double angle, int from, int to)
    {
        var residual = new Complex[_poles.Length + Nodes.Length];
        for (var i = from; i < to; i++)
            residual[i] = Complex.Exp(_poles[i] * angle);
        var weights = Project(residual, Nodes.Length);
        Array.Resize(ref weights, Nodes.Length);
        for (var k = Nodes.Length - 1; k >= 0; k--)
        {
            for (var i = k + 1; i < Nodes.Length; i++)
                weights[k] -= _r[i][k] * weights[i];
            weights[k] /= _r[k][k];
        }
        for (var k = 0; k < Nodes.Length; k++)
            weights[k] /= _scale[k];
        return weights;
    }

    /// <summary>The bound of the error that weights make, relative to I″k.</summary>
    private double ErrorOf(Complex[] weights, double angle, int from, int to)
    {
        var errors = new Complex[_check.Length];
        for (var i = from; i < to; i++)
            errors[i] = Complex.Exp(_check[i] * angle);
        var rounding = 0.0;
        for (var k = 0; k < weights.Length; k++)
        {
            SubtractProduct(errors, _atCheck[k], weights[k]);
            rounding += Complex.Abs(weights[k] / Nodes[k]);
        }
        return ResidueSum * (errors.Max(Complex.Abs) + SampleRounding * rounding);
    }

    /// <summary>Σ conj(a)·b.</summary>
    private static Complex Dot(Complex[] a, Complex[] b)
    {
        double real = 0.0, imaginary = 0.0;
        for (var i = 0; i < a.Length; i++)
        {
            real += a[i].Real * b[i].Real + a[i].Imaginary * b[i].Imaginary;
            imaginary += a[i].Real * b[i].Imaginary - a[i].Imaginary * b[i].Real;
        }
        return new Complex(real, imaginary);
    }

    private static void SubtractProduct(Complex[] vector, Complex[] column, Complex factor)
    {
        for (var i = 0; i < vector.Length; i++)
        {
            double re = column[i].Real * factor.Real - column[i].Imaginary * factor.Imaginary;
            double im = column[i].Real * factor.Imaginary + column[i].Imaginary * factor.Real;
            vector[i] = new Complex(vector[i].Real - re, vector[i].Imaginary - im);
        }
    }
}

/// <summary>The weights of one time.</summary>
/// <param name="Ac">For the AC component, by node.</param>
/// <param name="Dc">For the DC component, by node; none in quasi-static networks.</param>
/// <param name="AcError">The bound of the AC component's error, relative to I″k.</param>
/// <param name="DcError">Likewise of the DC component.</param>
internal sealed record NodeWeights(Complex[] Ac, Complex[] Dc, double AcError, double DcError)
{
    /// <summary>The larger of the two.</summary>
    public double Error => Math.Max(AcError, DcError);
}
