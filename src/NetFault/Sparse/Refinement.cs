using System.Numerics;

namespace NetFault.Sparse;

/// <summary>Iterative refinement in working precision, for one right-hand side after another.</summary>
internal readonly ref struct Refinement
{
    private const int MaximumSteps = 10;

    private readonly LdlFactor factor;
    private readonly ReadOnlySpan<Complex> diagonal;
    private readonly ReadOnlySpan<Complex> offDiagonal;
    private readonly SolveScratch scratch;
    private readonly double normOfA;

    public Refinement(LdlFactor factor, ReadOnlySpan<Complex> diagonal, ReadOnlySpan<Complex> offDiagonal, SolveScratch scratch)
    {
        this.factor = factor;
        this.diagonal = diagonal;
        this.offDiagonal = offDiagonal;
        this.scratch = scratch;
        normOfA = SymmetricProduct.Norm(factor.Symbolic.Pattern, diagonal, offDiagonal);
    }

    /// <summary>Solves in place.</summary>
    /// <returns>The normwise backward error of what is returned.</returns>
    public double Solve(Span<Complex> x)
    {
        Complex[] b = scratch.RightHandSide;
        x.CopyTo(b);
        double normOfB = Largest(b);
        if (normOfB == 0)
        {
            return 0;
        }

        factor.Solve(x, scratch);
        double error = BackwardError(x, b, normOfB);
        for (int step = 0; step < MaximumSteps && error > 0; step++)
        {
            double before = error;
            Correct(x, 1);
            error = BackwardError(x, b, normOfB);
            if (!(error <= before))
            {
                Correct(x, -1); // the step made it worse: Correct has kept it
                return before;
            }

            if (error > before / 2)
            {
                break;
            }
        }

        return error;
    }

    /// <summary>x += sign·step, where the step solves A·step = residual and is worked out for sign = 1 only.</summary>
    private void Correct(Span<Complex> x, int sign)
    {
        Complex[] step = sign > 0 ? scratch.Residual : scratch.Step;
        if (sign > 0)
        {
            factor.Solve(step, scratch);
            step.CopyTo(scratch.Step, 0);
        }

        for (int i = 0; i < x.Length; i++)
        {
            x[i] += sign * step[i];
        }
    }

    private double BackwardError(ReadOnlySpan<Complex> x, Complex[] b, double normOfB)
    {
        Complex[] r = scratch.Residual;
        SymmetricProduct.Multiply(factor.Symbolic.Pattern, diagonal, offDiagonal, x, r);
        for (int i = 0; i < r.Length; i++)
        {
            r[i] = b[i] - r[i];
        }

        return Largest(r) / (normOfA * Largest(x) + normOfB);
    }

    private static double Largest(ReadOnlySpan<Complex> x)
    {
        double max = 0;
        foreach (Complex value in x)
        {
            max = Math.Max(max, Complex.Abs(value));
        }

        return max;
    }
}
