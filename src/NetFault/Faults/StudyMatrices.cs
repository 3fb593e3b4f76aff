using System.Numerics;
using MathNet.Numerics.LinearAlgebra;

namespace NetFault;

/// <summary>The matrices of a study as Math.NET ones, for those who go on calculating with them.</summary>
internal static class StudyMatrices
{
    /// <summary>Zbus, column by column.</summary>
    public static Matrix<Complex> Impedance(Circuit circuit, SolvedNetwork network)
    {
        var order = circuit.NodeCount;
        var matrix = Matrix<Complex>.Build.Dense(order, order);
        Parallel.For(0, order, node => matrix.SetColumn(node, network.Column(node, out _)));
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
