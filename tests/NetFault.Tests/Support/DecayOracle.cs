using System.Numerics;
using MathNet.Numerics.LinearAlgebra;
using ComplexVector = MathNet.Numerics.LinearAlgebra.Vector<System.Numerics.Complex>;

namespace NetFault.Tests.Support;

/// <summary>Which circuit: reactances at rated frequency with machines that decay, or L·di/dt everywhere.</summary>
internal enum DecayMode
{
    QuasiStatic,
    Exact,
}

/// <summary>The largest instantaneous current over time and closing angle.</summary>
internal sealed record DecayPeak(double Ka, double Seconds, double ClosingAngleDegrees);

/// <summary>
/// The fault current over time by another way than the library's: the poles z and residues r of F(p) = V/(p·Zkk(p)), V = 1, in the frame
/// that rotates with ω, from the eigenvalues of the circuit's state matrix (Math.NET), so that i(t) = Σ r·e^(zt). The AC component is the
/// sum over the poles above Im p = −ω/2, the DC component the rest.
/// </summary>
internal sealed class DecayOracle
{
    private readonly DecayCircuit _circuit;
    private readonly DecayMode _mode;
    private readonly double _baseKa;

    /// <summary>Residues of each branch's current (a row), the fault's last.</summary>
    private readonly Complex[,] _residues;

    public DecayOracle(Network network, string bus, DecayMode mode)
    {
        _circuit = new DecayCircuit(network, bus);
        _mode = mode;
        _baseKa = _circuit.BaseKa(bus);
        (Poles, _residues) = _circuit.IsEnergised
            ? Solve(new DecayStateSpace(_circuit, mode == DecayMode.QuasiStatic))
            : ([], new Complex[1, 0]);
        Residues = Enumerable.Range(0, Poles.Count).Select(j => _residues[_residues.GetLength(0) - 1, j]).ToList();
    }

    public bool IsEnergised => _circuit.IsEnergised;

    public double Omega => _circuit.Omega;

    /// <summary>z in 1/s; the first is 0.</summary>
    public IReadOnlyList<Complex> Poles { get; }

    /// <summary>r per unit, of the fault current.</summary>
    public IReadOnlyList<Complex> Residues { get; }

    /// <summary>|F| at p = 0 of the network with subtransient reactances, and motors: the initial current of the usual method.</summary>
    public double InitialKa => _baseKa / DecayNodal.Impedance(_circuit, branch => new Complex(branch.R, branch.X)).Magnitude;

    /// <summary>How far the clusters are apart: the least distance of a pole from Im p = −ω/2, in units of ω.</summary>
    public double Gap => Poles.Min(z => Math.Abs(z.Imaginary + Omega / 2)) / Omega;

    public Complex AcKa(double seconds) => _baseKa * Sum(seconds, ac: true, _residues.GetLength(0) - 1);

    public Complex DcKa(double seconds) => _baseKa * Sum(seconds, ac: false, _residues.GetLength(0) - 1);

    public double AcRmsKa(double seconds) => AcKa(seconds).Magnitude;

    /// <summary>At each instant that of the closing angle with the largest.</summary>
    public double DcEnvelopeKa(double seconds) => Math.Sqrt(2) * DcKa(seconds).Magnitude;

    /// <summary>Of the phase whose voltage is √2·U·sin(ωt + angle).</summary>
    public double InstantaneousKa(double seconds, double closingAngleDegrees)
    {
        var turned = Complex.FromPolarCoordinates(Math.Sqrt(2), Omega * seconds + closingAngleDegrees * Math.PI / 180);
        return ((AcKa(seconds) + DcKa(seconds)) * turned).Imaginary;
    }

    /// <summary>√2·max |AC + DC|: a scan of 400 steps a cycle, then golden sections around the largest.</summary>
    public DecayPeak WorstPeak(double horizonSeconds = 0.2)
    {
        var step = 2 * Math.PI / Omega / 400;
        var best = Enumerable.Range(0, (int)(horizonSeconds / step) + 1).Select(i => i * step).OrderByDescending(Size).First();
        double low = Math.Max(0, best - step), high = best + step;
        var golden = (Math.Sqrt(5) - 1) / 2;
        while (high - low > 1e-12)
        {
            double one = high - golden * (high - low), other = low + golden * (high - low);
            (low, high) = Size(one) > Size(other) ? (low, other) : (one, high);
        }
        var at = (low + high) / 2;
        var angle = Math.PI / 2 - Omega * at - (AcKa(at) + DcKa(at)).Phase;
        return new DecayPeak(Size(at), at, (angle * 180 / Math.PI % 180 + 180) % 180);

        double Size(double t) => Math.Sqrt(2) * (AcKa(t) + DcKa(t)).Magnitude;
    }

    /// <summary>Whether couplers make one node of two buses of the faulted part of the network.</summary>
    public bool AreOneNode(string bus, string other) => _circuit.NodeOf(bus) == _circuit.NodeOf(other);

    /// <summary>
    /// The AC current from a bus into a branch during the fault, as the library's flows have it: all that flows in at the bus's node.
    /// </summary>
    public Complex AcIntoBranchKa(string section, string id, string bus, double seconds)
    {
        var node = _circuit.NodeOf(bus);
        var sum = Complex.Zero;
        for (var i = 0; i < _circuit.Branches.Count; i++)
        {
            if (_circuit.Branches[i] is var branch && branch.Section == section && branch.Id == id)
                sum += branch.Ends.Where(end => end.Node == node).Sum(end => end.Share) * Sum(seconds, ac: true, i);
        }
        return _circuit.BaseKa(bus) * sum;
    }

    /// <summary>The AC current from a source into its bus during the fault.</summary>
    public Complex AcIntoBusKa(string section, string id, string bus, double seconds) => -AcIntoBranchKa(section, id, bus, seconds);

    /// <summary>F(p) by its definition, with a dense inverse of the nodal admittances at p: to check the poles and residues by.</summary>
    public Complex DirectTransform(Complex p)
    {
        var s = _mode == DecayMode.Exact ? p / Omega + Complex.ImaginaryOne : Complex.ImaginaryOne;
        return 1 / (p * DecayNodal.Impedance(_circuit, branch => branch.Impedance(s, p)));
    }

    /// <summary>Σ r/(p − z).</summary>
    public Complex Transform(Complex p) =>
        Poles.Select((z, j) => Residues[j] / (p - z)).Aggregate(Complex.Zero, (sum, term) => sum + term);

    private Complex Sum(double seconds, bool ac, int branch)
    {
        var sum = Complex.Zero;
        for (var j = 0; j < Poles.Count; j++)
        {
            if (Poles[j].Imaginary > -Omega / 2 == ac)
                sum += _residues[branch, j] * Complex.Exp(Poles[j] * seconds);
        }
        return sum;
    }

    /// <summary>
    /// x′ = H·x + b from x(0) = 0: the mode z with vector v gives v·(V⁻¹b)/z·(e^(zτ) − 1); what is left at the end is −H⁻¹b.
    /// </summary>
    private (IReadOnlyList<Complex> Poles, Complex[,] Residues) Solve(DecayStateSpace space)
    {
        var states = space.H.RowCount;
        var scale = Balancing.Of(space.H);
        var evd = Balancing.Apply(space.H, scale).Evd(Symmetricity.Asymmetric);
        var weights = evd.EigenVectors.LU().Solve(ComplexVector.Build.Dense(states, i => space.B[i] / scale[i]));
        var output = space.P.MapIndexed((_, j, value) => value * scale[j]) * evd.EigenVectors;
        var last = space.D - space.P * space.H.LU().Solve(space.B);
        var residues = new Complex[space.D.Count, states + 1];
        for (var i = 0; i < space.D.Count; i++)
        {
            residues[i, 0] = last[i];
            for (var j = 0; j < states; j++)
                residues[i, j + 1] = output[i, j] * weights[j] / evd.EigenValues[j];
        }
        return ([Complex.Zero, .. evd.EigenValues.Select(z => z * Omega)], residues);
    }
}
