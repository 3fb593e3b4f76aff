using System.Globalization;
using System.Numerics;
using NetFault.Tests.Support;
using Matrix = MathNet.Numerics.LinearAlgebra.Matrix<System.Numerics.Complex>;

namespace NetFault.Tests.Output;

/// <summary>Oracle: the format's definition (NISTIR 5935) read back by a reader of its own.</summary>
public class MatrixMarketTests
{
    [Fact]
    public void The_admittance_matrix_reads_back_as_coordinates()
    {
        var study = new FaultStudy(RandomNetworks.Make(7, 25), new MachineDecrement());
        var matrix = study.AdmittanceMatrix();
        var text = Written(matrix, study.Nodes);
        text[0].Should().Be("%%MatrixMarket matrix coordinate complex symmetric");
        text.Count(line => line.StartsWith("% row ")).Should().Be(study.Nodes.Count);
        var entries = text.SkipWhile(line => line.StartsWith('%')).Skip(1).Select(line => line.Split(' ')).ToList();
        var read = Matrix.Build.Dense(matrix.RowCount, matrix.RowCount);
        foreach (var entry in entries)
        {
            int row = int.Parse(entry[0], CultureInfo.InvariantCulture) - 1, column = int.Parse(entry[1], CultureInfo.InvariantCulture) - 1;
            row.Should().BeGreaterThanOrEqualTo(column);
            read[row, column] = read[column, row] = Value(entry[2], entry[3]);
        }
        (read - matrix).Enumerate().Max(Complex.Abs).Should().Be(0);
    }

    [Fact]
    public void The_impedance_matrix_reads_back_as_an_array()
    {
        var study = new FaultStudy(RandomNetworks.Make(8, 12), new MachineDecrement());
        var matrix = study.BusImpedanceMatrix();
        var text = Written(matrix, null);
        text[0].Should().Be("%%MatrixMarket matrix array complex symmetric");
        var values = text.SkipWhile(line => line.StartsWith('%')).Skip(1).ToList();
        var at = 0;
        for (var column = 0; column < matrix.ColumnCount; column++)
        {
            for (var row = column; row < matrix.RowCount; row++)
            {
                var parts = values[at++].Split(' ');
                Value(parts[0], parts[1]).Should().Be(matrix[row, column]);
            }
        }
        values.Should().HaveCount(at);
    }

    [Fact]
    public void A_matrix_that_is_not_square_is_refused()
    {
        var write = () => MatrixMarket.Write(TextWriter.Null, Matrix.Build.Dense(2, 3));
        write.Should().Throw<ArgumentException>().WithMessage("the matrix is 2 by 3, not square*");
    }

    private static List<string> Written(Matrix matrix, IReadOnlyList<StudyNode>? nodes)
    {
        using var writer = new StringWriter();
        MatrixMarket.Write(writer, matrix, nodes);
        return [.. writer.ToString().Split('\n', StringSplitOptions.RemoveEmptyEntries)];
    }

    private static Complex Value(string real, string imaginary) =>
        new(double.Parse(real, CultureInfo.InvariantCulture), double.Parse(imaginary, CultureInfo.InvariantCulture));
}
