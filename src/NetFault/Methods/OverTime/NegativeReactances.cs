using System.Numerics;

namespace NetFault;

/// <summary>
/// Whether a network with negative reactances behaves like one without. All currents that Kirchhoff's law allows see positive reactance together
/// exactly when the matrix of the susceptances 1/x has one negative eigenvalue for each negative branch (E. V. Haynsworth 1968, inertia of
/// partitioned matrices); with a fault at any bus that stays so where every Xkk is positive. The same of ρ·x − r bounds R/X by ρ.
/// </summary>
internal sealed class NegativeReactances
{
    private static readonly double[] Steps = [1.0, 1.5, 2.0, 3.0, 5.0, 10.0, 20.0, 50.0];

    private readonly StudyNetworks _networks;
    private readonly Circuit _circuit;
    private readonly OperationalSource?[] _sources;

    private NegativeReactances(StudyNetworks networks, OperationalSource?[] sources)
    {
        _networks = networks;
        _circuit = networks.Circuit;
        _sources = sources;
    }

    /// <summary>A bound of R/X for the whole network.</summary>
    /// <param name="networks">The study's networks.</param>
    /// <param name="sources">The sources in them.</param>
    /// <param name="ofPositive">The largest R/X among branches of positive reactance.</param>
    /// <exception cref="CurrentOverTimeException">The network is not stable, or no bound can be shown.</exception>
    public static double LargestRatio(StudyNetworks networks, OperationalSource?[] sources, double ofPositive)
    {
        var work = new NegativeReactances(networks, sources);
        work.RefuseUnstable();
        if (!double.IsInfinity(ofPositive))
        {
            foreach (var step in Steps)
            {
                var ratio = step * Math.Max(ofPositive, 1e-3);
                if (work.IsPositive(z => ratio * z.Imaginary - z.Real, out _))
                    return ratio;
            }
        }
        return double.PositiveInfinity;
    }

    private void RefuseUnstable()
    {
        var negative = Enumerable.Range(0, _circuit.Branches.Length).Where(i => IsNegative(i, z => z.Imaginary)).ToList();
        if (!IsPositive(z => z.Imaginary, out var nodes))
        {
            throw CurrentOverTimeException.Of(_circuit, negative,
                "its negative reactance outweighs the reactances about it" + (nodes.Count > 0 ? " at bus " + string.Join(", ", nodes) : "")
                + ": the currents of such a network grow instead of decaying",
                "look at its value; or take AcComponentRule.HeldAtInitial and DcDecayRule.ByXOverR");
        }
    }

    private bool IsNegative(int branch, Func<Complex, double> value) =>
        _circuit.Branches[branch].Kind is BranchKind.Series or BranchKind.Capacitor && value(_circuit.BranchImpedances[branch]) < 0.0;

    /// <summary>Whether a value of each branch makes a form that is positive for all currents of the network, faults included.</summary>
    private bool IsPositive(Func<Complex, double> value, out IReadOnlyList<string> nodes)
    {
        nodes = [];
        var branches = Array.ConvertAll(_circuit.BranchImpedances, z => new Complex(0.0, value(z)));
        var sources = Array.ConvertAll(_sources, source =>
            source is null ? (Complex?)null : new Complex(0.0, value(new Complex(source.Resistance, source.Reactance))));
        if (sources.Any(source => source is { Imaginary: <= 0.0 }))
            return false;
        var expected = Enumerable.Range(0, branches.Length).Count(i => IsNegative(i, value));
        try
        {
            var solved = SolvedNetwork.Of(_networks.Matrix, sources, branches, MachineDecrement.Reactances);
            nodes = BusesSeeing(solved.DrivingPoints.Impedances);
            return nodes.Count == 0 && solved.NegativeSusceptances == expected;
        }
        catch (SingularNetworkException)
        {
            return false;
        }
    }

    private List<string> BusesSeeing(Complex[] impedances)
    {
        var found = new List<string>();
        for (var bus = 0; bus < _circuit.NodeOfBus.Length && found.Count < 5; bus++)
        {
            if (_circuit.NodeOfBus[bus] is >= 0 and var node && impedances[node].Imaginary <= 0.0)
                found.Add(_circuit.Network.Buses[bus].Id);
        }
        return found;
    }
}
