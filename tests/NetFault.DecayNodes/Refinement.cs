using System.Numerics;
using MathNet.Numerics.LinearAlgebra.Complex;

namespace NetFault.NodeTables;

/// <summary>
/// Moves nodes to where the best weights leave the least: the method of Levenberg (1944) and Marquardt (1963) on the nodes alone, the
/// weights projected out. After each round, weight goes to what is still worst.
/// </summary>
internal sealed class Refinement
{
    /// <summary>Steps between two shifts of weight.</summary>
    private const int StepsARound = 25;

    private const int TrialsAStep = 8;

    private readonly FitProblem _problem;
    private Projection _current;
    private double _damping = 1e-2;

    private Refinement(FitProblem problem, Complex[] nodes)
    {
        _problem = problem;
        _current = new Projection(problem, nodes);
    }

    /// <summary>Refines nodes and gives those after each round.</summary>
    public static IEnumerable<Complex[]> Rounds(FitProblem problem, Complex[] nodes, int rounds, Attempt attempt)
    {
        var work = new Refinement(problem, nodes);
        for (var round = 0; round < rounds; round++)
        {
            for (var step = 0; step < StepsARound && work.Step(); step++)
            {
            }
            yield return work._current.Nodes;
            problem.Reweight(work._current.Residuals, attempt);
            work._current = new Projection(problem, work._current.Nodes);
            work._damping = Math.Clamp(work._damping, 1e-4, 1e-2);
        }
    }

    private bool Step()
    {
        var (normal, gradient) = NormalEquations();
        for (var trial = 0; trial < TrialsAStep; trial++)
        {
            var moved = new Projection(_problem, Moved(normal, gradient));
            if (moved.SumOfSquares < _current.SumOfSquares)
            {
                _current = moved;
                _damping = Math.Max(_damping / 4.0, 1e-9);
                return true;
            }
            _damping *= 6.0;
        }
        return false;
    }

    private (DenseMatrix Normal, DenseVector Gradient) NormalEquations()
    {
        var n = _current.Nodes.Length;
        var derivatives = Enumerable.Range(0, n).Select(_current.Derivative).ToArray();
        var normal = new DenseMatrix(n, n);
        var gradient = new DenseVector(n);
        for (var i = 0; i < n; i++)
        {
            for (var j = i; j < n; j++)
            {
                normal[i, j] = WeightProduct(i, j) * ComplexColumn.Dot(derivatives[i], derivatives[j]);
                normal[j, i] = Complex.Conjugate(normal[i, j]);
            }
            for (var k = 0; k < _current.Weights.Length; k++)
                gradient[i] += Complex.Conjugate(_current.Weights[k][i]) * ComplexColumn.Dot(derivatives[i], _current.Residuals[k]);
        }
        return (normal, gradient);
    }

    private Complex WeightProduct(int i, int j)
    {
        var sum = Complex.Zero;
        foreach (var weights in _current.Weights)
            sum += Complex.Conjugate(weights[i]) * weights[j];
        return sum;
    }

    /// <summary>The nodes after a damped step, none moved by more than a third of its distance to the region.</summary>
    private Complex[] Moved(DenseMatrix normal, DenseVector gradient)
    {
        var damped = (DenseMatrix)normal.Clone();
        for (var i = 0; i < gradient.Count; i++)
            damped[i, i] += _damping * normal[i, i];
        var step = damped.LU().Solve(gradient);
        return _current.Nodes.Select((node, i) => node + Held(step[i], node)).ToArray();
    }

    private Complex Held(Complex step, Complex node)
    {
        var longest = _problem.Points.Min(point => Complex.Abs(node - point)) / 3.0;
        var length = Complex.Abs(step);
        return length > longest ? step * (longest / length) : step;
    }
}
