using System.Numerics;
using MathNet.Numerics.LinearAlgebra;

namespace NetFault;

/// <summary>The matrices of a study as Math.NET ones, for those who go on calculating with them.</summary>
internal static class StudyMatrices
{
    /// <summary>Most nodes of a dense matrix.</summary>
    private const int LargestDense = 20_000;

    /// <summary>Zbus, column by column.</summary>
    public static Matrix<Complex> Impedance(Circuit circuit, SolvedNetwork network, CancellationToken cancellation)
    {
        var order = circuit.NodeCount;
        if (order > LargestDense)
            throw new InvalidOperationException($"a dense matrix of {order} nodes takes {16e-9 * order * order:0} GB; EveryBus gives Zkk of every bus without it");
        var matrix = Matrix<Complex>.Build.Dense(order, order);
        Parallel.For(0, order, new ParallelOptions { CancellationToken = cancellation }, node => matrix.SetColumn(node, network.Column(node, out _)));
        return matrix;
    }

    /// <summary>Ybus.</summary>
    public static Matrix<Complex> Admittance(CircuitMatrix matrix, SolvedNetwork network) =>
        Matrix<Complex>.Build.SparseOfIndexed(matrix.Circuit.NodeCount, matrix.Circuit.NodeCount, Entries(matrix, network.Values));

    private static IEnumerable<(int Row, int Column, Complex Value)> Entries(CircuitMatrix matrix, AdmittanceValues values)
    {
        var pattern = matrix.Symbolic.Pattern;
        for (var column = 0; column < pattern.Order; column++)
        {
            yield return (column, column, values.Diagonal[column]);
            for (var slot = pattern.ColumnStart[column]; slot < pattern.ColumnStart[column + 1]; slot++)
            {
                yield return (pattern.RowIndex[slot], column, values.OffDiagonal[slot]);
                yield return (column, pattern.RowIndex[slot], values.OffDiagonal[slot]);
            }
        }
    }
}
