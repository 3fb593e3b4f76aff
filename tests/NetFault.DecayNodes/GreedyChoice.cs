using System.Numerics;

namespace NetFault.NodeTables;

/// <summary>
/// Nodes to begin with: of candidates on rings about the clusters, one after another the one that takes most off the residuals of all
/// targets (orthogonal least squares; Chen, Billings, Luo 1989).
/// </summary>
internal sealed class GreedyChoice
{
    private const int Rings = 26, Sectors = 24;

    /// <summary>Candidates are nearer to the middle of their cluster than so many times they are to the region.</summary>
    private const double Clearance = 4.0;

    private readonly FitProblem _problem;
    private readonly List<Complex> _candidates;
    private readonly ComplexColumn[] _columns;
    private readonly ComplexColumn[] _residuals;

    private GreedyChoice(FitProblem problem, List<Complex> candidates)
    {
        _problem = problem;
        _candidates = candidates;
        _columns = candidates.Select(Column).ToArray();
        _residuals = Array.ConvertAll(problem.Targets, target => target.Copy());
    }

    /// <summary>So many nodes for a problem.</summary>
    /// <param name="problem">The problem.</param>
    /// <param name="count">How many.</param>
    /// <param name="table">The table it is for, which says how far out candidates lie.</param>
    /// <param name="seed">Of the random angles by which the rings' candidates are off a regular polygon.</param>
    public static Complex[] Nodes(FitProblem problem, int count, TablePlan table, int seed)
    {
        var work = new GreedyChoice(problem, Candidates(problem, table, new Random(seed)).ToList());
        var chosen = new List<Complex>();
        while (chosen.Count < count)
        {
            var best = work.Best();
            chosen.Add(work._candidates[best]);
            work.Take(best);
        }
        return chosen.ToArray();
    }

    private static IEnumerable<Complex> Candidates(FitProblem problem, TablePlan table, Random random)
    {
        double first = 0.3 / table.Window.LastAngle, last = table.QuasiStatic ? 2.0 : 60.0;
        var middles = table.QuasiStatic ? new[] { Complex.Zero } : [Complex.Zero, -Complex.ImaginaryOne];
        foreach (var middle in middles)
        {
            for (var i = 0; i < Rings * Sectors; i++)
            {
                double radius = first * Math.Pow(last / first, i / Sectors / (Rings - 1.0)), turn = i % Sectors + 0.5 * random.NextDouble();
                var candidate = middle + Complex.FromPolarCoordinates(radius, 2.0 * Math.PI * turn / Sectors);
                var toMiddle = middles.Min(each => Complex.Abs(candidate - each));
                if (Clearance * problem.Points.Min(point => Complex.Abs(candidate - point)) > toMiddle)
                    yield return candidate;
            }
        }
    }

    private ComplexColumn Column(Complex candidate)
    {
        var column = new ComplexColumn(_problem.Points.Length);
        for (var i = 0; i < column.Length; i++)
            column[i] = 1.0 / (candidate - _problem.Points[i]);
        column.Scale(1.0 / Math.Sqrt(column.NormSquared));
        return column;
    }

    private int Best()
    {
        const double exhausted = 1e-22;
        var best = -1;
        var largest = double.NegativeInfinity;
        for (var i = 0; i < _columns.Length; i++)
        {
            var left = _columns[i].NormSquared;
            if (left < exhausted)
                continue;
            var gain = 0.0;
            foreach (var residual in _residuals)
            {
                var part = ComplexColumn.Dot(_columns[i], residual);
                gain += (part.Real * part.Real + part.Imaginary * part.Imaginary) / left;
            }
            if (gain > largest)
                (largest, best) = (gain, i);
        }
        return best;
    }

    /// <summary>Takes the direction of a candidate off the residuals and off the other candidates.</summary>
    private void Take(int candidate)
    {
        var direction = _columns[candidate].Copy();
        direction.Scale(1.0 / Math.Sqrt(direction.NormSquared));
        foreach (var column in _residuals.Concat(_columns))
            column.Subtract(ComplexColumn.Dot(direction, column), direction);
    }
}
