using System.Numerics;
using CsCheck;
using MathNet.Numerics.LinearAlgebra;
using NetFault.Sparse;

namespace NetFault.Tests.Sparse;

/// <summary>A complex symmetric matrix in both forms: as the solver takes it, and dense for Math.NET, the oracle of most tests here.</summary>
internal sealed class TestMatrix
{
    public const double Epsilon = 2.2e-16;

    private TestMatrix(int order, (int From, int To, Complex Value)[] edges, Complex[] diagonal)
    {
        Edges = edges;
        SlotOfEdge = new int[edges.Length];
        Pattern = SymmetricPattern.FromEdges(
            order, edges.Select(e => e.From).ToArray(), edges.Select(e => e.To).ToArray(), SlotOfEdge);
        OffDiagonal = new Complex[Pattern.SlotCount];
        Diagonal = (Complex[])diagonal.Clone();
        for (int e = 0; e < edges.Length; e++)
        {
            OffDiagonal[SlotOfEdge[e]] += edges[e].Value;
        }
    }

    public SymmetricPattern Pattern { get; }

    public (int From, int To, Complex Value)[] Edges { get; }

    public int[] SlotOfEdge { get; }

    public Complex[] Diagonal { get; }

    public Complex[] OffDiagonal { get; }

    public int Order => Pattern.Order;

    public static TestMatrix FromEntries(Complex[] diagonal, params (int From, int To, Complex Value)[] edges) =>
        new(diagonal.Length, edges, diagonal);

    /// <summary>A nodal admittance matrix: branches of an impedance, and admittances to ground.</summary>
    public static TestMatrix Nodal(int order, IEnumerable<(int From, int To, Complex Impedance)> branches, Complex[] toGround)
    {
        Complex[] diagonal = (Complex[])toGround.Clone();
        var edges = new List<(int, int, Complex)>();
        foreach ((int from, int to, Complex impedance) in branches)
        {
            Complex y = 1 / impedance;
            diagonal[from] += y;
            diagonal[to] += y;
            edges.Add((from, to, -y));
        }

        return new TestMatrix(order, [.. edges], diagonal);
    }

    public Matrix<Complex> Dense()
    {
        Matrix<Complex> a = Matrix<Complex>.Build.Dense(Order, Order);
        for (int i = 0; i < Order; i++)
        {
            a[i, i] = Diagonal[i];
        }

        foreach ((int from, int to, Complex value) in Edges)
        {
            a[from, to] += value;
            a[to, from] += value;
        }

        return a;
    }

    public LdlFactor Factor() => SymbolicFactor.Analyze(Pattern).Factor(Diagonal, OffDiagonal);

    /// <summary>‖A‖₁·‖A⁻¹‖₁ by Math.NET.</summary>
    public double Condition() => Dense().L1Norm() * Dense().Inverse().L1Norm();

    /// <summary>
    /// Connected or not, sparse, resistive-inductive networks: every node has a spanning branch to an earlier one or none, some more
    /// branches, and a few connections to ground; every separate part has at least one.
    /// </summary>
    public static Gen<TestMatrix> Passive(int largest) => Networks(largest, Gen.Double[0.01, 1]);

    /// <summary>The same with reactances of either sign, now and then exactly opposite ones.</summary>
    public static Gen<TestMatrix> WithNegativeReactances(int largest) =>
        Networks(largest, Gen.Frequency((4, Gen.Double[0.01, 1]), (1, Gen.Double[-1, -0.01]), (1, Gen.OneOf(Gen.Const(0.1), Gen.Const(-0.1), Gen.Const(0.25), Gen.Const(-0.25)))));

    private static Gen<TestMatrix> Networks(int largest, Gen<double> reactance)
    {
        Gen<Complex> impedance = Gen.Select(Gen.OneOf(Gen.Const(0.0), Gen.Double[0, 0.2]), reactance, (r, x) => new Complex(r, x));
        return Gen.Int[1, largest].SelectMany(n => Gen.Select(
            Gen.Double[0, 1].Array[n],
            Gen.Select(Gen.Int[0, n - 1], Gen.Int[0, n - 1], impedance).Array[0, n],
            impedance.Array[n],
            Gen.Select(Gen.Double[0, 1], Gen.Double[0.05, 2]).Array[n],
            (spanning, extra, treeImpedance, ground) => Build(n, spanning, extra, treeImpedance, ground)));
    }

    private static TestMatrix Build(
        int n, double[] spanning, (int From, int To, Complex Impedance)[] extra, Complex[] treeImpedance, (double Share, double X)[] ground)
    {
        Complex[] toGround = new Complex[n];
        var branches = extra.Where(e => e.From != e.To).ToList();
        for (int i = 0; i < n; i++)
        {
            bool isolatedSoFar = i == 0 || spanning[i] < 0.05;
            if (!isolatedSoFar)
            {
                branches.Add((i, (int)(spanning[i] * 0.999 * i), treeImpedance[i]));
            }

            if (isolatedSoFar || ground[i].Share < 0.1)
            {
                toGround[i] = 1 / new Complex(0.02, ground[i].X);
            }
        }

        return Nodal(n, branches, toGround);
    }

    /// <summary>A rectangular mesh with resistive-inductive branches, sourced at every <paramref name="everySource"/>-th node.</summary>
    public static TestMatrix Mesh(int rows, int columns, int everySource)
    {
        int n = rows * columns;
        var branches = new List<(int, int, Complex)>();
        Complex[] toGround = new Complex[n];
        for (int i = 0; i < n; i++)
        {
            if ((i + 1) % columns != 0)
            {
                branches.Add((i, i + 1, new Complex(0.01, 0.05 + 0.001 * (i % 17))));
            }

            if (i + columns < n)
            {
                branches.Add((i, i + columns, new Complex(0.01, 0.05 + 0.001 * (i % 13))));
            }

            toGround[i] = i % everySource == 0 ? new Complex(0.1, -3) : Complex.Zero;
        }

        return Nodal(n, branches, toGround);
    }
}
