using System.Numerics;

namespace NetFault.Tests.Support;

/// <summary>One end of a branch: the node's number, and what part of the branch's current flows out of the node there.</summary>
internal readonly record struct DecayEnd(int Node, double Share);

/// <summary>A part of a machine's admittance that decays: 1/X(p) has −Admittance/(1 + p·Seconds) for it.</summary>
internal readonly record struct DecayTerm(double Admittance, double Seconds);

/// <summary>
/// A branch of the circuit of <see cref="DecayOracle"/>, per unit. Sources have one end, the other is the reference. A machine has its
/// subtransient reactance as X and what decays as terms; an asynchronous motor has the seconds of its one decaying branch.
/// </summary>
internal sealed record DecayBranch(string Section, string Id, IReadOnlyList<DecayEnd> Ends, double R, double X)
{
    public IReadOnlyList<DecayTerm> Terms { get; init; } = [];

    public double? MotorSeconds { get; init; }

    public bool IsSource => Ends.Count == 1;

    public double Size => Math.Sqrt(R * R + X * X);

    /// <summary>
    /// The operational impedance: <paramref name="s"/> is what reactances are multiplied with, <paramref name="p"/> Laplace's variable.
    /// </summary>
    public Complex Impedance(Complex s, Complex p)
    {
        if (MotorSeconds is { } seconds)
            return (R + s * X) * (1 + p * seconds) / (p * seconds);
        var inverse = new Complex(1 / X, 0);
        foreach (var term in Terms)
            inverse -= term.Admittance / (1 + p * term.Seconds);
        return Terms.Count == 0 ? R + s * X : R + s / inverse;
    }
}
