using System.Numerics;
using System.Runtime.CompilerServices;
#if NET
using System.Runtime.Intrinsics;
#endif

namespace NetFault.Sparse;

/// <summary>The innermost loops: products of a compressed complex column with a full vector. Unconjugated throughout.</summary>
internal static unsafe class ComplexKernel
{
    /// <summary>full[rows[t]] −= column[t]·factor for t = 0 to count − 1.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static void SubtractProduct(Complex* full, int* rows, Complex* column, int count, Complex factor)
    {
#if NET
        Vector128<double> re = Vector128.Create(-factor.Real), im = Vector128.Create(factor.Imaginary, -factor.Imaginary);
        for (int t = 0; t < count; t++)
        {
            double* target = (double*)(full + rows[t]);
            Vector128<double> c = Vector128.Load((double*)(column + t));
            Vector128<double> sum = Vector128.MultiplyAddEstimate(c, re, Vector128.Load(target));
            Vector128.MultiplyAddEstimate(Swap(c), im, sum).Store(target);
        }
#else
        double re = factor.Real, im = factor.Imaginary;
        for (int t = 0; t < count; t++)
        {
            double* target = (double*)(full + rows[t]), c = (double*)(column + t);
            target[0] -= c[0] * re - c[1] * im;
            target[1] -= c[0] * im + c[1] * re;
        }
#endif
    }

    /// <summary>Σ column[t]·full[rows[t]].</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Complex Dot(Complex* full, int* rows, Complex* column, int count)
    {
        double re = 0, im = 0;
        for (int t = 0; t < count; t++)
        {
            double* x = (double*)(full + rows[t]), c = (double*)(column + t);
            re += c[0] * x[0] - c[1] * x[1];
            im += c[0] * x[1] + c[1] * x[0];
        }

        return new Complex(re, im);
    }

    /// <summary>result = S·x for a dense symmetric S whose lower triangle stands by columns.</summary>
    /// <param name="s">The first diagonal entry; the next is <paramref name="stride"/> + 1 behind.</param>
    /// <param name="stride">From one column to the next.</param>
    /// <param name="x">The vector.</param>
    /// <param name="result">Out.</param>
    /// <param name="count">Rows, at least one.</param>
    public static void SymmetricProduct(Complex* s, int stride, Complex* x, Complex* result, int count)
    {
        result[0] = Multiply(s[0], x[0]);
        for (int b = 1; b < count; b++)
        {
            result[b] = Multiply(s[b], x[0]);
            result[0] += Multiply(s[b], x[b]);
        }

        for (int a = 1; a < count; a++)
        {
            s += stride + 1;
            Complex onDiagonal = Multiply(s[0], x[a]);
            Complex dot = AddProductAndDot(result + a + 1, x + a + 1, s + 1, count - a - 1, x[a]);
            result[a] += onDiagonal + dot;
        }
    }

    /// <summary>result[t] += column[t]·factor, and returns Σ column[t]·x[t].</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Complex AddProductAndDot(Complex* result, Complex* x, Complex* column, int count, Complex factor)
    {
#if NET
        Vector256<double> re = Vector256.Create(factor.Real);
        Vector256<double> im = Vector256.Create(-factor.Imaginary, factor.Imaginary, -factor.Imaginary, factor.Imaginary);
        Vector256<double> straight = Vector256<double>.Zero, crossed = straight;
        int t = 0;
        for (; t < count - 1; t += 2)
        {
            double* target = (double*)(result + t);
            Vector256<double> c = Vector256.Load((double*)(column + t)), v = Vector256.Load((double*)(x + t)), swapped = Swap(c);
            Vector256<double> sum = Vector256.MultiplyAddEstimate(c, re, Vector256.Load(target));
            Vector256.MultiplyAddEstimate(swapped, im, sum).Store(target);
            straight = Vector256.MultiplyAddEstimate(c, v, straight);
            crossed = Vector256.MultiplyAddEstimate(swapped, v, crossed);
        }

        var dot = new Complex(straight[0] - straight[1] + straight[2] - straight[3], crossed[0] + crossed[1] + crossed[2] + crossed[3]);
#else
        int t = 0;
        Complex dot = Complex.Zero;
#endif
        for (; t < count; t++)
        {
            result[t] += Multiply(column[t], factor);
            dot += Multiply(column[t], x[t]);
        }

        return dot;
    }

    /// <summary>x = −x, and returns Σ column[t]·x[t].</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Complex NegateAndDot(Complex* x, Complex* column, int count)
    {
        double re = 0, im = 0;
        for (int t = 0; t < count; t++)
        {
            double a = -x[t].Real, b = -x[t].Imaginary, c = column[t].Real, d = column[t].Imaginary;
            x[t] = new Complex(a, b);
            re += a * c - b * d;
            im += a * d + b * c;
        }

        return new Complex(re, im);
    }

    /// <summary>a·b without the runtime's checks for infinities.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Complex Multiply(Complex a, Complex b) =>
        new(a.Real * b.Real - a.Imaginary * b.Imaginary, a.Real * b.Imaginary + a.Imaginary * b.Real);

    /// <summary>|Re| + |Im|, within a factor √2 of the modulus and much cheaper.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static double Size(Complex a) => Math.Abs(a.Real) + Math.Abs(a.Imaginary);

    /// <summary>1/a; scaled only when the square of the modulus would overflow or underflow.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Complex Reciprocal(Complex a)
    {
        double square = a.Real * a.Real + a.Imaginary * a.Imaginary;
        if (square is > 1e-280 and < 1e280)
        {
            double scale = 1 / square;
            return new Complex(a.Real * scale, -a.Imaginary * scale);
        }

        return Complex.Reciprocal(a);
    }

#if NET
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector128<double> Swap(Vector128<double> a) =>
        Vector128.Shuffle(a, Vector128.Create(1L, 0L));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector256<double> Swap(Vector256<double> a) =>
        Vector256.Shuffle(a, Vector256.Create(1L, 0L, 3L, 2L));
#endif
}
