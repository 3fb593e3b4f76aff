using System.Numerics;

namespace NetFault;

/// <summary>Gathers points of the edges of pole regions; of points close to each other, seen from the middle of their cluster, one is kept.</summary>
internal sealed class EdgePoints(bool quasiStatic)
{
    /// <summary>Points nearer to the middle of a cluster than this are as good as in it: nothing moves there within the longest window.</summary>
    private const double Middle = 1e-7;

    private readonly List<Complex> _ac = [];
    private readonly List<Complex> _dc = [];

    /// <summary>Adds a point to the cluster in which it lies, where that is wanted.</summary>
    public void Add(Complex point, Clusters wanted = Clusters.Both)
    {
        var isAc = quasiStatic || point.Imaginary > -0.5;
        if (isAc && wanted != Clusters.Dc)
            _ac.Add(point);
        else if (!isAc && wanted != Clusters.Ac && point.Real >= -PoleRegion.LargestDcRate)
            _dc.Add(point);
    }

    /// <summary>
    /// Adds the roots of s·A(p) + B(p) = 0 with the coefficients of A and B from the constant up, s = p + j, or j in quasi-static networks.
    /// </summary>
    public void AddRootsOf(double[] atS, double[] alone, Clusters wanted)
    {
        var degree = quasiStatic ? atS.Length - 1 : atS.Length;
        var polynomial = new Complex[degree + 1];
        for (var i = 0; i < atS.Length; i++)
        {
            polynomial[i] += new Complex(alone[i], atS[i]);
            if (!quasiStatic)
                polynomial[i + 1] += atS[i];
        }
        foreach (var root in Roots(polynomial))
            Add(root, wanted);
    }

    /// <summary>The points about p = 0.</summary>
    public Complex[] Ac(double pointsAnEFold) => Thinned(_ac, Complex.Zero, pointsAnEFold);

    /// <summary>The points about p = −j that are resolved.</summary>
    public Complex[] Dc(double pointsAnEFold) => Thinned(_dc, -Complex.ImaginaryOne, pointsAnEFold);

    private static Complex[] Thinned(IEnumerable<Complex> points, Complex middle, double pointsAnEFold)
    {
        var taken = new HashSet<(int Ring, int Sector)>();
        return points.Where(point => taken.Add(Cell(point - middle, pointsAnEFold))).ToArray();
    }

    private static (int Ring, int Sector) Cell(Complex offset, double pointsAnEFold)
    {
        var distance = Complex.Abs(offset);
        return distance < Middle
            ? (int.MinValue, 0)
            : ((int)Math.Round(Math.Log(distance) * pointsAnEFold), (int)Math.Round(offset.Phase * pointsAnEFold));
    }

    /// <summary>All roots at once by the iteration of Durand and Kerner (Kerner 1966); degrees up to three, simple roots or nearly so.</summary>
    private static Complex[] Roots(Complex[] polynomial)
    {
        var degree = polynomial.Length - 1;
        var roots = new Complex[degree];
        for (var i = 0; i < degree; i++)
            roots[i] = Complex.FromPolarCoordinates(0.5 + i * 0.3, 0.9 + 2.4 * i);
        for (var round = 0; round < 200; round++)
        {
            var change = 0.0;
            for (var i = 0; i < degree; i++)
                change = Math.Max(change, Improve(polynomial, roots, i));
            if (change < 1e-14)
                break;
        }
        return roots;
    }

    private static double Improve(Complex[] polynomial, Complex[] roots, int index)
    {
        var value = polynomial[polynomial.Length - 1];
        for (var i = polynomial.Length - 2; i >= 0; i--)
            value = value * roots[index] + polynomial[i];
        var others = polynomial[polynomial.Length - 1];
        for (var i = 0; i < roots.Length; i++)
        {
            if (i != index)
                others *= roots[index] - roots[i];
        }
        if (others == Complex.Zero)
            return 0.0;
        var step = value / others;
        roots[index] -= step;
        return Complex.Abs(step) / (Complex.Abs(roots[index]) + 1e-9);
    }
}

/// <summary>The clusters of poles.</summary>
internal enum Clusters
{
    /// <summary>About p = 0: the AC component.</summary>
    Ac,

    /// <summary>About p = −j: the DC component.</summary>
    Dc,

    /// <summary>Both.</summary>
    Both,
}
