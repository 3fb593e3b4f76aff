using System.Numerics;
using MathNet.Numerics.LinearAlgebra;

namespace NetFault;

/// <summary>
/// Writes complex symmetric matrices in the Matrix Market exchange format (Boisvert, Pozo, Remington, NISTIR 5935, 1996). One small file, so
/// that a library for matrix text files can take its place.
/// </summary>
public static class MatrixMarket
{
    /// <summary>
    /// Writes the lower triangle: a sparse matrix as <c>coordinate complex symmetric</c>, a dense one as <c>array complex symmetric</c>.
    /// </summary>
    /// <param name="writer">Where to write; it is left open.</param>
    /// <param name="matrix">A symmetric matrix, such as <see cref="FaultStudy.AdmittanceMatrix"/>; its upper triangle is not looked at.</param>
    /// <param name="nodes">The nodes of its rows, written as comments; null leaves them out.</param>
    /// <exception cref="ArgumentNullException">Writer or matrix is null.</exception>
    /// <exception cref="ArgumentException">The matrix is not square, or the nodes are not as many as its rows.</exception>
    public static void Write(TextWriter writer, Matrix<Complex> matrix, IReadOnlyList<StudyNode>? nodes = null)
    {
        Guard.NotNull(writer);
        Guard.NotNull(matrix);
        if (matrix.RowCount != matrix.ColumnCount)
            throw new ArgumentException($"the matrix is {matrix.RowCount} by {matrix.ColumnCount}, not square", nameof(matrix));
        if (nodes is not null && nodes.Count != matrix.RowCount)
            throw new ArgumentException($"{nodes.Count} nodes are given for {matrix.RowCount} rows", nameof(nodes));
        var sparse = matrix.Storage.IsDense == false;
        writer.Write($"%%MatrixMarket matrix {(sparse ? "coordinate" : "array")} complex symmetric\n");
        writer.Write($"% {ReportTexts.Caution}\n");
        foreach (var node in nodes ?? [])
            writer.Write($"% row {node.Index + 1}: {Shortened(node.ToString())}\n");
        if (sparse)
            WriteCoordinates(writer, matrix);
        else
            WriteArray(writer, matrix);
    }

    /// <summary>The format knows no lines beyond 1024 characters.</summary>
    private static string Shortened(string buses) => buses.Length <= 1000 ? buses : buses.Substring(0, 996) + " ...";

    private static void WriteCoordinates(TextWriter writer, Matrix<Complex> matrix)
    {
        var lower = matrix.EnumerateIndexed(Zeros.AllowSkip).Where(entry => entry.Item1 >= entry.Item2).ToList();
        writer.Write(FormattableString.Invariant($"{matrix.RowCount} {matrix.ColumnCount} {lower.Count}\n"));
        foreach (var (row, column, value) in lower)
            writer.Write(FormattableString.Invariant($"{row + 1} {column + 1} {Text(value)}\n"));
    }

    private static void WriteArray(TextWriter writer, Matrix<Complex> matrix)
    {
        writer.Write(FormattableString.Invariant($"{matrix.RowCount} {matrix.ColumnCount}\n"));
        for (var column = 0; column < matrix.ColumnCount; column++)
        {
            for (var row = column; row < matrix.RowCount; row++)
                writer.Write(Text(matrix[row, column]) + "\n");
        }
    }

    private static string Text(Complex value) =>
        RoundTrip.Text(value.Real) + " " + RoundTrip.Text(value.Imaginary);
}
