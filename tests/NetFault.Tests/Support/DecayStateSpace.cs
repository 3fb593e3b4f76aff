using System.Numerics;
using MathNet.Numerics.LinearAlgebra;
using ComplexVector = MathNet.Numerics.LinearAlgebra.Vector<System.Numerics.Complex>;

namespace NetFault.Tests.Support;

/// <summary>
/// A circuit with a short circuit at one node as ordinary differential equations in time τ = ωt: x′ = H·x + b, branch currents P·x + d,
/// x(0) = 0, for a drive of 1 per unit in the fault. Loop currents fulfil Kirchhoff's current law by themselves: they are a basis of the
/// null space of the incidence matrix (with the transformers' ratios), from a spanning tree of the smallest impedances with the fault in
/// it. The fault is the last branch.
/// </summary>
internal sealed class DecayStateSpace
{
    private static readonly Complex J = Complex.ImaginaryOne;
    private readonly DecayCircuit _circuit;
    private readonly int _count;
    private readonly List<(int Branch, double Decaying, double Seconds, bool IsMotor)> _rotors = [];

    public DecayStateSpace(DecayCircuit circuit, bool quasiStatic)
    {
        _circuit = circuit;
        _count = circuit.Branches.Count + 1;
        Loops = LoopMatrix();
        FindRotors();
        if (quasiStatic)
            MakeQuasiStatic();
        else
            MakeExact();
    }

    /// <summary>The current of each branch for each loop's current; real.</summary>
    public Matrix<Complex> Loops { get; }

    public Matrix<Complex> H { get; private set; } = null!;

    public ComplexVector B { get; private set; } = null!;

    public Matrix<Complex> P { get; private set; } = null!;

    public ComplexVector D { get; private set; } = null!;

    /// <summary>Loop equations: s·(M·i + N·w) + R·i + Rw·w = c, with s = j + d/dτ; rotors: w′ = G·i + Q·w.</summary>
    private void MakeExact()
    {
        var (m, r, n, rw, g, q, c) = Equations();
        int loops = m.RowCount, rotors = g.RowCount;
        var lu = m.LU();
        H = Zeros(loops + rotors, loops + rotors);
        H.SetSubMatrix(0, 0, -lu.Solve(r + m * J + n * g));
        H.SetSubMatrix(0, loops, -lu.Solve(rw + n * J + n * q));
        H.SetSubMatrix(loops, 0, g);
        H.SetSubMatrix(loops, loops, q);
        B = ComplexVector.Build.Dense(loops + rotors);
        B.SetSubVector(0, loops, lu.Solve(c));
        P = Zeros(_count, loops + rotors);
        P.SetSubMatrix(0, 0, Loops);
        D = ComplexVector.Build.Dense(_count);
    }

    /// <summary>The same with s = j: the loop currents follow from the rotors at once.</summary>
    private void MakeQuasiStatic()
    {
        var (m, r, n, rw, g, q, c) = Equations();
        var lu = (r + m * J).LU();
        var ofDrive = lu.Solve(c);
        D = Loops * ofDrive;
        var ofRotors = -lu.Solve(rw + n * J);
        H = g * ofRotors + q;
        B = g * ofDrive;
        P = Loops * ofRotors;
    }

    /// <summary>
    /// Flux of a machine: X″·(i + Σ A·w), T·dw/dt = flux − w. Motor: (R + sX)·(i + w), T·dw/dt = i. Matrices cannot be empty: where nothing
    /// decays there is one rotor that nothing drives.
    /// </summary>
    private (Matrix<Complex> M, Matrix<Complex> R, Matrix<Complex> N, Matrix<Complex> Rw,
        Matrix<Complex> G, Matrix<Complex> Q, ComplexVector C) Equations()
    {
        var branches = _circuit.Branches;
        var transposed = Loops.Transpose();
        var m = transposed * Diagonal(i => i < branches.Count ? branches[i].X : 0) * Loops;
        var r = transposed * Diagonal(i => i < branches.Count ? branches[i].R : 0) * Loops;
        int loops = m.RowCount, rotors = Math.Max(1, _rotors.Count);
        Matrix<Complex> n = Zeros(loops, rotors), rw = Zeros(loops, rotors), g = Zeros(rotors, loops), q = Zeros(rotors, rotors);
        for (var k = 0; k < _rotors.Count; k++)
        {
            var (at, decaying, seconds, isMotor) = _rotors[k];
            var (branch, tau) = (branches[at], _circuit.Omega * seconds);
            n.SetColumn(k, Loops.Row(at) * branch.X * decaying);
            if (isMotor)
                rw.SetColumn(k, Loops.Row(at) * branch.R);
            g.SetRow(k, Loops.Row(at) * (isMotor ? 1 : branch.X) / tau);
            for (var other = 0; other < _rotors.Count; other++)
            {
                if (!isMotor && _rotors[other].Branch == at)
                    q[k, other] += branch.X * _rotors[other].Decaying / tau;
            }
            if (!isMotor)
                q[k, k] -= 1 / tau;
        }
        if (_rotors.Count == 0)
            q[0, 0] = -1;
        return (m, r, n, rw, g, q, Loops.Row(_count - 1));
    }

    private void FindRotors()
    {
        for (var i = 0; i < _circuit.Branches.Count; i++)
        {
            if (_circuit.Branches[i].MotorSeconds is { } seconds)
                _rotors.Add((i, 1, seconds, true));
            foreach (var term in _circuit.Branches[i].Terms)
                _rotors.Add((i, term.Admittance, term.Seconds, false));
        }
    }

    /// <summary>Tree currents for 1 in each link, from Kirchhoff's current law at every node.</summary>
    private Matrix<Complex> LoopMatrix()
    {
        var incidence = Matrix<double>.Build.Dense(_circuit.NodeCount, _count);
        for (var i = 0; i < _count - 1; i++)
        {
            foreach (var end in _circuit.Branches[i].Ends)
                incidence[end.Node, i] += end.Share;
        }
        incidence[_circuit.FaultedNode, _count - 1] = 1;
        var tree = Tree();
        var links = Enumerable.Range(0, _count).Except(tree).ToList();
        var ofTree = -Columns(incidence, tree).LU().Solve(Columns(incidence, links));
        var loops = Zeros(_count, links.Count);
        for (var link = 0; link < links.Count; link++)
        {
            loops[links[link], link] = 1;
            for (var i = 0; i < tree.Count; i++)
                loops[tree[i], link] = Math.Abs(ofTree[i, link]) < 1e-13 ? 0 : ofTree[i, link];
        }
        return loops;
    }

    /// <summary>
    /// A spanning tree with the reference (numbered last) as its root, of the smallest impedances (Kruskal), the fault first.
    /// </summary>
    private List<int> Tree()
    {
        var group = Enumerable.Range(0, _circuit.NodeCount + 1).ToArray();
        var tree = new List<int>();
        TryJoin(_count - 1, _circuit.FaultedNode, _circuit.NodeCount);
        foreach (var i in Enumerable.Range(0, _count - 1).OrderBy(i => _circuit.Branches[i].Size))
        {
            var ends = _circuit.Branches[i].Ends;
            TryJoin(i, ends[0].Node, ends.Count > 1 ? ends[1].Node : _circuit.NodeCount);
        }
        return tree;

        void TryJoin(int branch, int one, int other)
        {
            int keep = group[one], drop = group[other];
            if (keep == drop)
                return;
            for (var i = 0; i < group.Length; i++)
                group[i] = group[i] == drop ? keep : group[i];
            tree.Add(branch);
        }
    }

    private Matrix<Complex> Diagonal(Func<int, double> value) => Matrix<Complex>.Build.Diagonal(_count, _count, i => value(i));

    private static Matrix<double> Columns(Matrix<double> of, List<int> columns) =>
        Matrix<double>.Build.DenseOfColumnVectors(columns.Select(of.Column));

    private static Matrix<Complex> Zeros(int rows, int columns) => Matrix<Complex>.Build.Dense(rows, columns);
}
