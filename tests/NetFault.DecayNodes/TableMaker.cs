using System.Globalization;
using System.Numerics;

namespace NetFault.NodeTables;

/// <summary>
/// Makes one table: from a few beginnings, each refined with its own way of shifting weight, the nodes whose largest error is least after
/// any round. They all come to nearly the same figure; which is best depends on how least squares meet the least maximum.
/// </summary>
internal static class TableMaker
{
    private const int Rounds = 24;

    private static readonly Attempt[] Attempts =
    [
        new(Seed: 1, PointExponent: 0.3, TargetExponent: 0.3),
        new(Seed: 2, PointExponent: 0.15, TargetExponent: 0.5),
        new(Seed: 3, PointExponent: 0.3, TargetExponent: 0.6),
    ];

    /// <summary>Makes a table of a plan.</summary>
    public static NodeTable Make(TablePlan plan, TableKind kind)
    {
        var networks = kind.ForUsual ? NetworkClass.Usual(plan.QuasiStatic) : NetworkClass.Whole(plan.QuasiStatic);
        var validation = new Validation(networks, plan.CheckAngles);
        NodeTable? best = null;
        foreach (var attempt in Attempts)
        {
            var problem = new FitProblem(networks, plan.FitAngles);
            var nodes = GreedyChoice.Nodes(problem, kind.Count, plan, attempt.Seed);
            foreach (var refined in Refinement.Rounds(problem, nodes, Rounds, attempt))
            {
                var written = AsWritten(refined);
                var errors = validation.Of(written);
                if (best is null || errors.Largest < best.Errors.Largest)
                    best = new NodeTable(kind, written, errors);
            }
        }
        return best!;
    }

    /// <summary>Six digits, in the order of the imaginary parts: the nodes that are checked are those that are written.</summary>
    private static Complex[] AsWritten(Complex[] nodes) =>
        [.. nodes.Select(node => new Complex(Rounded(node.Real), Rounded(node.Imaginary))).OrderBy(node => node.Imaginary)];

    private static double Rounded(double value) =>
        double.Parse(value.ToString("G6", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
}

/// <summary>A beginning and a way of shifting weight.</summary>
/// <param name="Seed">Of the candidates.</param>
/// <param name="PointExponent">Power of a point's largest residual by which its weight grows.</param>
/// <param name="TargetExponent">Likewise of a target's.</param>
internal sealed record Attempt(int Seed, double PointExponent, double TargetExponent);

/// <summary>A table that was made.</summary>
/// <param name="Kind">What for.</param>
/// <param name="Nodes">In units of ω, as they are written.</param>
/// <param name="Errors">The largest errors that the validation found.</param>
internal sealed record NodeTable(TableKind Kind, Complex[] Nodes, LargestErrors Errors);
