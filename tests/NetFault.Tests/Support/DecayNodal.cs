using System.Numerics;
using MathNet.Numerics.LinearAlgebra;

namespace NetFault.Tests.Support;

/// <summary>
/// The driving-point impedance of the circuit of <see cref="DecayOracle"/> at the faulted node, by nodes and a dense solve.
/// </summary>
internal static class DecayNodal
{
    public static Complex Impedance(DecayCircuit circuit, Func<DecayBranch, Complex> impedance)
    {
        var y = Matrix<Complex>.Build.Dense(circuit.NodeCount, circuit.NodeCount);
        foreach (var branch in circuit.Branches)
        {
            var siemens = 1 / impedance(branch);
            foreach (var one in branch.Ends)
            {
                foreach (var other in branch.Ends)
                    y[one.Node, other.Node] += one.Share * other.Share * siemens;
            }
        }
        return y.Inverse()[circuit.FaultedNode, circuit.FaultedNode];
    }
}

/// <summary>
/// Diagonal scaling by powers of two that makes rows and columns alike in size (Parlett and Reinsch 1969), for eigenvalues.
/// </summary>
internal static class Balancing
{
    public static double[] Of(Matrix<Complex> h)
    {
        var scale = Enumerable.Repeat(1.0, h.RowCount).ToArray();
        var size = h.Map(Complex.Abs).ToArray();
        for (var changed = true; changed;)
        {
            changed = false;
            for (var i = 0; i < scale.Length; i++)
                changed |= Improve(size, scale, i);
        }
        return scale;
    }

    /// <summary>S⁻¹·H·S.</summary>
    public static Matrix<Complex> Apply(Matrix<Complex> h, double[] scale) => h.MapIndexed((i, j, value) => value / scale[i] * scale[j]);

    private static bool Improve(double[,] size, double[] scale, int at)
    {
        double row = 0, column = 0;
        for (var i = 0; i < scale.Length; i++)
        {
            if (i == at)
                continue;
            row += size[at, i] / scale[at] * scale[i];
            column += size[i, at] / scale[i] * scale[at];
        }
        if (row.Equals(0.0) || column.Equals(0.0))
            return false;
        var factor = Math.Pow(2, Math.Round(Math.Log(row / column, 2) / 2));
        if (row / factor + column * factor >= 0.95 * (row + column))
            return false;
        scale[at] *= factor;
        return true;
    }
}
