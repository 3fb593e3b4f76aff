using System.Numerics;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace NetFault.NodeTables;

/// <summary>
/// A complex vector with real and imaginary parts apart, for four lanes at a time. The lanes are the same on every processor, so that the
/// order of the sums is too.
/// </summary>
internal sealed class ComplexColumn
{
    private readonly double[] _real;
    private readonly double[] _imaginary;

    public ComplexColumn(int length)
    {
        Length = length;
        var padded = (length + 3) / 4 * 4;
        _real = new double[padded];
        _imaginary = new double[padded];
    }

    private ComplexColumn(ComplexColumn other)
    {
        Length = other.Length;
        _real = (double[])other._real.Clone();
        _imaginary = (double[])other._imaginary.Clone();
    }

    public int Length { get; }

    public Complex this[int index]
    {
        get => new(_real[index], _imaginary[index]);
        set => (_real[index], _imaginary[index]) = (value.Real, value.Imaginary);
    }

    public double NormSquared => Dot(this, this).Real;

    public double LargestMagnitude
    {
        get
        {
            var largest = 0.0;
            for (var i = 0; i < Length; i++)
                largest = Math.Max(largest, _real[i] * _real[i] + _imaginary[i] * _imaginary[i]);
            return Math.Sqrt(largest);
        }
    }

    public ComplexColumn Copy() => new(this);

    public void Scale(double factor)
    {
        for (var i = 0; i < Length; i++)
        {
            _real[i] *= factor;
            _imaginary[i] *= factor;
        }
    }

    /// <summary>Σ conj(a)·b.</summary>
    public static Complex Dot(ComplexColumn a, ComplexColumn b)
    {
        var real = Vector256<double>.Zero;
        var imaginary = Vector256<double>.Zero;
        ReadOnlySpan<Vector256<double>> ar = Lanes(a._real), ai = Lanes(a._imaginary), br = Lanes(b._real), bi = Lanes(b._imaginary);
        for (var i = 0; i < ar.Length; i++)
        {
            real += ar[i] * br[i] + ai[i] * bi[i];
            imaginary += ar[i] * bi[i] - ai[i] * br[i];
        }
        return new Complex(Vector256.Sum(real), Vector256.Sum(imaginary));
    }

    /// <summary>this −= factor·column.</summary>
    public void Subtract(Complex factor, ComplexColumn column)
    {
        var fr = Vector256.Create(factor.Real);
        var fi = Vector256.Create(factor.Imaginary);
        Span<Vector256<double>> real = Lanes(_real), imaginary = Lanes(_imaginary);
        ReadOnlySpan<Vector256<double>> cr = Lanes(column._real), ci = Lanes(column._imaginary);
        for (var i = 0; i < real.Length; i++)
        {
            real[i] -= fr * cr[i] - fi * ci[i];
            imaginary[i] -= fr * ci[i] + fi * cr[i];
        }
    }

    private static Span<Vector256<double>> Lanes(double[] values) => MemoryMarshal.Cast<double, Vector256<double>>(values.AsSpan());
}
