using System.Numerics;
using System.Runtime.CompilerServices;
#if NET
using System.Runtime.Intrinsics;
using System.Runtime.Intrinsics.X86;
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
        Vector128<double> re = Vector128.Create(factor.Real), im = Vector128.Create(factor.Imaginary, -factor.Imaginary);
        for (int t = 0; t < count; t++)
        {
            double* target = (double*)(full + rows[t]);
            Vector128<double> c = Vector128.Load((double*)(column + t));
            Vector128<double> sum = Vector128.Load(target) - c * re;
            (sum + Swap(c) * im).Store(target);
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

    /// <summary>
    /// One column of a symmetric matrix times a vector, both triangles at once: product[rows[t]] += column[t]·factor, and returns
    /// Σ column[t]·vector[rows[t]].
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Complex AddProductAndDot(Complex* product, Complex* vector, int* rows, Complex* column, int count, Complex factor)
    {
#if NET
        Vector128<double> re = Vector128.Create(factor.Real), im = Vector128.Create(-factor.Imaginary, factor.Imaginary);
        Vector128<double> straight = Vector128<double>.Zero, crossed = straight;
        for (int t = 0; t < count; t++)
        {
            int row = rows[t];
            double* target = (double*)(product + row);
            Vector128<double> c = Vector128.Load((double*)(column + t)), x = Vector128.Load((double*)(vector + row));
            Vector128<double> swapped = Swap(c);
            (Vector128.Load(target) + c * re + swapped * im).Store(target);
            straight += c * x;
            crossed += swapped * x;
        }

        return new Complex(straight[0] - straight[1], crossed[0] + crossed[1]);
#else
        double re = factor.Real, im = factor.Imaginary, dotRe = 0, dotIm = 0;
        for (int t = 0; t < count; t++)
        {
            int row = rows[t];
            double* target = (double*)(product + row), x = (double*)(vector + row), c = (double*)(column + t);
            target[0] += c[0] * re - c[1] * im;
            target[1] += c[0] * im + c[1] * re;
            dotRe += c[0] * x[0] - c[1] * x[1];
            dotIm += c[0] * x[1] + c[1] * x[0];
        }

        return new Complex(dotRe, dotIm);
#endif
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
        Sse2.IsSupported ? Sse2.Shuffle(a, a, 1) : Vector128.Create(a[1], a[0]);
#endif
}
