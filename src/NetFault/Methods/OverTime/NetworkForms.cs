using System.Numerics;

namespace NetFault;

/// <summary>
/// What a network's resistances and reactances are together, where single ones are negative. All currents that Kirchhoff's law allows see a
/// positive Σ v·|i|² exactly when the node matrix of the admittances 1/v has as many negative eigenvalues as the elements themselves have (E. V.
/// Haynsworth 1968, inertia of partitioned matrices); with a fault at any bus that stays so where every impedance seen is positive. With v = x, v =
/// ρ·x − r and v = r + δ·x that shows stability and bounds R/X from above by ρ, from below by −δ.
/// </summary>
internal sealed class NetworkForms
{
    private static readonly double[] Above = [1.0, 1.5, 2.0, 3.0, 5.0, 10.0, 20.0, 50.0];
    private static readonly double[] Below = [1e-4, 1e-3, 1e-2, 0.05];
    private static readonly double[] Taken = [0.02, 0.05, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9];

    private readonly StudyNetworks _networks;
    private readonly Circuit _circuit;
    private readonly OperationalSource?[] _sources;

    private NetworkForms(StudyNetworks networks, OperationalSource?[] sources)
    {
        _networks = networks;
        _circuit = networks.Circuit;
        _sources = sources;
    }

    /// <summary>What is shown for the whole network.</summary>
    /// <param name="networks">The study's networks.</param>
    /// <param name="sources">The sources in them.</param>
    /// <param name="ofPositive">The largest R/X among elements that are positive themselves.</param>
    /// <exception cref="CurrentOverTimeException">The network is not stable, or it cannot be shown to be.</exception>
    public static Bounds Of(StudyNetworks networks, OperationalSource?[] sources, double ofPositive)
    {
        var forms = new NetworkForms(networks, sources);
        if (!forms.IsPositive(z => z.Imaginary, out var buses))
            throw forms.Unstable("reactance", "reactances", z => z.Imaginary, buses);
        var below = Below.FirstOrDefault(delta => forms.IsPositive(z => z.Real + delta * z.Imaginary, out buses));
        if (below == 0.0)
            throw forms.Unstable("resistance", "resistances", z => z.Real, buses);
        var ratios = Above.Select(step => step * Math.Max(ofPositive, 1e-3));
        var above = double.IsInfinity(ofPositive)
            ? 0.0
            : ratios.FirstOrDefault(ratio => forms.IsPositive(z => ratio * z.Imaginary - z.Real, out _));
        return new Bounds(-below, above == 0.0 ? double.PositiveInfinity : above, 1.0 - forms.ReactanceTaken());
    }

    /// <summary>
    /// The part of the reactance of machines and motors that negative ones take: with only that part of it the network is still positive.
    /// </summary>
    private double ReactanceTaken()
    {
        var taken = _sources.All(source => source is null || source.IsConstant)
            ? Taken[0]
            : Taken.FirstOrDefault(part => IsPositive(z => z.Imaginary, out _, part));
        return taken > 0.0 ? taken : throw CurrentOverTimeException.Of(_circuit, Negatives(z => z.Imaginary),
            FormattableString.Invariant($"its negative reactance takes more than {Taken[Taken.Length - 1]:0%} of that of machines or motors about it, which then decay too fast to tell the AC component from the DC component"),
            "look at its value; or take AcComponentRule.HeldAtInitial and DcDecayRule.ByXOverR");
    }

    private List<int> Negatives(Func<Complex, double> value) =>
        Enumerable.Range(0, _circuit.Branches.Length).Where(i => NegativesOf(_circuit, i, value) > 0).ToList();

    /// <summary>How many negative eigenvalues a value makes in an element: 1 or 0 in a branch, 0 to 2 in the two currents of a star.</summary>
    public static int NegativesOf(Circuit circuit, int branch, Func<Complex, double> value)
    {
        var z = circuit.BranchImpedances;
        switch (circuit.Branches[branch].Kind)
        {
            case BranchKind.StarFirst:
                double a = value(z[branch]), b = value(z[branch + 1]), c = value(z[branch + 2]);
                var determinant = a * b + b * c + c * a;
                return determinant < 0.0 ? 1 : a + b + 2.0 * c < 0.0 ? 2 : 0;
            case BranchKind.StarNext:
                return 0;
            default:
                return value(z[branch]) < 0.0 ? 1 : 0;
        }
    }

    private CurrentOverTimeException Unstable(string one, string several, Func<Complex, double> value, IReadOnlyList<string> buses)
    {
        return CurrentOverTimeException.Of(_circuit, Negatives(value),
            $"its negative {one} outweighs the {several} about it" + (buses.Count > 0 ? " as seen from bus " + string.Join(", ", buses) : "")
            + ": the currents of such a network grow instead of decaying",
            "look at its value; or take AcComponentRule.HeldAtInitial and DcDecayRule.ByXOverR");
    }

    /// <summary>Whether a value of each branch makes a form that is positive for all currents of the network, faults included.</summary>
    /// <param name="value">The value.</param>
    /// <param name="buses">Buses that see a negative one.</param>
    /// <param name="part">The part of it that machines and motors with time constants have.</param>
    private bool IsPositive(Func<Complex, double> value, out IReadOnlyList<string> buses, double part = 1.0)
    {
        buses = [];
        var branches = Array.ConvertAll(_circuit.BranchImpedances, z => new Complex(0.0, value(z)));
        var sources = Array.ConvertAll(_sources, source =>
            source is null ? (Complex?)null : new Complex(0.0, (source.IsConstant ? 1.0 : part) * value(new Complex(source.Resistance, source.Reactance))));
        if (sources.Any(source => source is { Imaginary: <= 0.0 }))
            return false;
        var expected = Enumerable.Range(0, branches.Length).Sum(i => NegativesOf(_circuit, i, value));
        try
        {
            var solved = SolvedNetwork.Of(_networks.Matrix, sources, branches, MachineDecrement.Reactances);
            buses = BusesSeeingNegative(solved.DrivingPoints.Impedances);
            return buses.Count == 0 && solved.NegativeSusceptances == expected;
        }
        catch (SingularNetworkException)
        {
            return false;
        }
    }

    private List<string> BusesSeeingNegative(Complex[] impedances)
    {
        var found = new List<string>();
        for (var bus = 0; bus < _circuit.NodeOfBus.Length && found.Count < 5; bus++)
        {
            if (_circuit.NodeOfBus[bus] is >= 0 and var node && impedances[node].Imaginary <= 0.0)
                found.Add(_circuit.Network.Buses[bus].Id);
        }
        return found;
    }

    /// <summary>What bounds the network as a whole.</summary>
    /// <param name="Smallest">The smallest R/X, not above 0.</param>
    /// <param name="Largest">The largest R/X, infinite where none can be shown.</param>
    /// <param name="ReactanceLeft">The part of their own reactance that machines and motors have left at least.</param>
    public sealed record Bounds(double Smallest, double Largest, double ReactanceLeft);
}
