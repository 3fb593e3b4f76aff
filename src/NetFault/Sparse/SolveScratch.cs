using System.Numerics;

namespace NetFault.Sparse;

/// <summary>A caller's work arrays for solves with matrices of one order; one for each thread.</summary>
internal sealed class SolveScratch
{
    private Complex[]? residual;
    private Complex[]? rightHandSide;
    private Complex[]? step;

    /// <param name="order">Number of rows of the matrices to be solved.</param>
    public SolveScratch(int order)
    {
        Permuted = new Complex[order];
        Correction = new Complex[order];
    }

    /// <summary>The vector in elimination order.</summary>
    internal Complex[] Permuted { get; }

    /// <summary>A second one, for the Woodbury correction.</summary>
    internal Complex[] Correction { get; }

    /// <summary>For refinement.</summary>
    internal Complex[] Residual => residual ??= new Complex[Permuted.Length];

    /// <summary>For refinement.</summary>
    internal Complex[] RightHandSide => rightHandSide ??= new Complex[Permuted.Length];

    /// <summary>For refinement.</summary>
    internal Complex[] Step => step ??= new Complex[Permuted.Length];
}
