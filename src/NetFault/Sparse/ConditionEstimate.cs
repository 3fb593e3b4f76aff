using System.Numerics;

namespace NetFault.Sparse;

/// <summary>
/// The 1-norm condition number from below, by a few solves: W. W. Hager, SIAM J. Sci. Stat. Comput. 5 (1984) 311–316; N. J. Higham,
/// ACM TOMS 14 (1988) 381–396, complex version. Nearly always within a factor of three of the truth.
/// </summary>
internal static class ConditionEstimate
{
    private const int MaximumSteps = 5;

    /// <summary>‖A‖₁ times an estimate of ‖A⁻¹‖₁.</summary>
    public static double Of(LdlFactor factor, ReadOnlySpan<Complex> diagonal, ReadOnlySpan<Complex> offDiagonal)
    {
        if (factor.Order == 0)
        {
            return 0;
        }

        var scratch = new SolveScratch(factor.Order);
        double inverseNorm = Math.Max(Climb(factor, scratch), Alternating(factor, scratch));
        return inverseNorm * SymmetricProduct.Norm(factor.Symbolic.Pattern, diagonal, offDiagonal);
    }

    private static double Climb(LdlFactor factor, SolveScratch scratch)
    {
        int n = factor.Order;
        Complex[] x = new Complex[n];
        x.AsSpan().Fill(new Complex(1.0 / n, 0));
        factor.Solve(x, scratch);
        double estimate = Sum(x);
        int last = -1;
        for (int step = 0; step < MaximumSteps; step++)
        {
            int peak = SteepestColumn(factor, x, scratch);
            if (peak == last)
            {
                break;
            }

            factor.SolveUnit(peak, x, scratch);
            double sum = Sum(x);
            if (sum <= estimate)
            {
                break;
            }

            estimate = sum;
            last = peak;
        }

        return estimate;
    }

    /// <summary>The largest entry of A⁻ᴴ·sign(x). A is symmetric, so A⁻ᴴ·y is the conjugate of A⁻¹ times the conjugate of y.</summary>
    private static int SteepestColumn(LdlFactor factor, Complex[] x, SolveScratch scratch)
    {
        for (int i = 0; i < x.Length; i++)
        {
            double modulus = Complex.Abs(x[i]);
            x[i] = modulus > 0 ? Complex.Conjugate(x[i]) / modulus : Complex.One;
        }

        factor.Solve(x, scratch);
        int peak = 0;
        for (int i = 1; i < x.Length; i++)
        {
            peak = Complex.Abs(x[i]) > Complex.Abs(x[peak]) ? i : peak;
        }

        return peak;
    }

    /// <summary>Higham's safeguard against cancellation: a vector of alternating signs and growing entries.</summary>
    private static double Alternating(LdlFactor factor, SolveScratch scratch)
    {
        int n = factor.Order;
        Complex[] x = new Complex[n];
        for (int i = 0; i < n; i++)
        {
            double value = 1 + i / Math.Max(1.0, n - 1.0);
            x[i] = i % 2 == 0 ? value : -value;
        }

        factor.Solve(x, scratch);
        return 2 * Sum(x) / (3 * n);
    }

    private static double Sum(Complex[] x)
    {
        double sum = 0;
        foreach (Complex value in x)
        {
            sum += Complex.Abs(value);
        }

        return sum;
    }
}
