using System.Numerics;

namespace NetFault.NodeTables;

/// <summary>
/// The best weights of given nodes for each target, by orthogonal columns (modified Gram and Schmidt, twice), and the residuals that they
/// leave: the variable projection of Golub and Pereyra (1973).
/// </summary>
internal sealed class Projection
{
    /// <summary>Share of its column at which a weight is held down, as in the library's <see cref="QuadratureRule"/>.</summary>
    private const double Damping = 1e-11;

    private readonly FitProblem _problem;
    private readonly Complex[,] _r;

    public Projection(FitProblem problem, Complex[] nodes)
    {
        _problem = problem;
        Nodes = nodes;
        Scale = new double[nodes.Length];
        Q = new ComplexColumn[nodes.Length];
        _r = new Complex[nodes.Length, nodes.Length];
        for (var k = 0; k < nodes.Length; k++)
            Orthogonalise(k);
        Residuals = new ComplexColumn[problem.Targets.Length];
        Weights = new Complex[problem.Targets.Length][];
        for (var k = 0; k < problem.Targets.Length; k++)
        {
            Weights[k] = Solve(k);
            SumOfSquares += Residuals[k].NormSquared;
        }
    }

    public Complex[] Nodes { get; }

    /// <summary>Orthonormal columns of the points' rows and then the damping rows.</summary>
    public ComplexColumn[] Q { get; }

    /// <summary>By which the column of each node is multiplied.</summary>
    public double[] Scale { get; }

    /// <summary>By target and node, of the scaled columns.</summary>
    public Complex[][] Weights { get; }

    /// <summary>By target, with its weights.</summary>
    public ComplexColumn[] Residuals { get; }

    public double SumOfSquares { get; }

    private int Rows => _problem.Points.Length + Nodes.Length;

    /// <summary>How a node's scaled column moves with the node, less what the columns can make up for (Kaufman 1975).</summary>
    public ComplexColumn Derivative(int node)
    {
        var column = new ComplexColumn(Rows);
        for (var i = 0; i < _problem.Points.Length; i++)
        {
            var distance = Nodes[node] - _problem.Points[i];
            column[i] = -_problem.PointWeights[i] * Scale[node] / (distance * distance);
        }
        foreach (var q in Q)
            column.Subtract(ComplexColumn.Dot(q, column), q);
        return column;
    }

    private void Orthogonalise(int k)
    {
        var column = new ComplexColumn(Rows);
        for (var i = 0; i < _problem.Points.Length; i++)
            column[i] = _problem.PointWeights[i] / (Nodes[k] - _problem.Points[i]);
        Scale[k] = 1.0 / Math.Sqrt(column.NormSquared);
        column.Scale(Scale[k]);
        column[_problem.Points.Length + k] = Damping;
        for (var pass = 0; pass < 2; pass++)
        {
            for (var i = 0; i < k; i++)
            {
                var part = ComplexColumn.Dot(Q[i], column);
                _r[i, k] += part;
                column.Subtract(part, Q[i]);
            }
        }
        var norm = Math.Sqrt(column.NormSquared);
        _r[k, k] = norm;
        column.Scale(1.0 / norm);
        Q[k] = column;
    }

    private Complex[] Solve(int target)
    {
        var residual = _problem.Weighted(target, Rows);
        var weights = new Complex[Nodes.Length];
        for (var k = 0; k < Nodes.Length; k++)
        {
            weights[k] = ComplexColumn.Dot(Q[k], residual);
            residual.Subtract(weights[k], Q[k]);
        }
        Residuals[target] = residual;
        for (var k = Nodes.Length - 1; k >= 0; k--)
        {
            for (var i = k + 1; i < Nodes.Length; i++)
                weights[k] -= _r[k, i] * weights[i];
            weights[k] /= _r[k, k];
        }
        return weights;
    }
}
