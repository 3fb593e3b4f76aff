using System.Numerics;

namespace NetFault;

/// <summary>Two smooth complex functions of one variable by their values at Chebyshev's points of the second kind.</summary>
internal sealed class ChebyshevPair
{
    private const int Points = 40;
    private const int Steps = 60;

    private readonly double[] _x = new double[Points];
    private readonly Complex[] _first = new Complex[Points];
    private readonly Complex[] _second = new Complex[Points];

    public ChebyshevPair(double from, double to, Func<double, Complex> first, Func<double, Complex> second)
    {
        for (var i = 0; i < Points; i++)
        {
            _x[i] = (from + to) / 2.0 - (to - from) / 2.0 * Math.Cos(Math.PI * i / (Points - 1));
            _first[i] = first(_x[i]);
            _second[i] = second(_x[i]);
        }
    }

    /// <summary>Both functions, by the barycentric formula with the weights ±1, halved at the ends.</summary>
    public (Complex First, Complex Second) At(double x)
    {
        Complex first = Complex.Zero, second = Complex.Zero;
        var sum = 0.0;
        for (var i = 0; i < Points; i++)
        {
            var distance = x - _x[i];
            if (distance == 0.0)
                return (_first[i], _second[i]);
            var weight = (i % 2 == 0 ? 1.0 : -1.0) * (i is 0 or Points - 1 ? 0.5 : 1.0) / distance;
            first += weight * _first[i];
            second += weight * _second[i];
            sum += weight;
        }
        return (first / sum, second / sum);
    }

    /// <summary>Where a function of both is largest: the best of equal steps, then golden sections about it.</summary>
    public double Maximise(Func<ChebyshevPair, double, double> value)
    {
        double from = _x[0], step = (_x[Points - 1] - from) / Steps;
        var best = from;
        var highest = double.NegativeInfinity;
        for (var i = 0; i <= Steps; i++)
        {
            var here = value(this, from + i * step);
            if (here > highest)
                (highest, best) = (here, from + i * step);
        }
        return Refine(value, Math.Max(from, best - step), Math.Min(_x[Points - 1], best + step));
    }

    private double Refine(Func<ChebyshevPair, double, double> value, double low, double high)
    {
        const double golden = 0.6180339887498949;
        double a = high - golden * (high - low), b = low + golden * (high - low);
        double atA = value(this, a), atB = value(this, b);
        while (high - low > 1e-7)
        {
            if (atA > atB)
            {
                (high, b, atB) = (b, a, atA);
                a = high - golden * (high - low);
                atA = value(this, a);
            }
            else
            {
                (low, a, atA) = (a, b, atB);
                b = low + golden * (high - low);
                atB = value(this, b);
            }
        }
        return (low + high) / 2.0;
    }
}
