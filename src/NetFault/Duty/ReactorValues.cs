using System.Collections.Concurrent;
using System.Numerics;

namespace NetFault;

/// <summary>
/// What the currents through one device become when the reactance of one reactor changes, without a factorisation: with Δ the change of its admittance
/// and u = e_a − e_b, Z′ = Z − (Z·u)·(Δ/(1 + Δ·uᵀZ·u))·(Z·u)ᵀ (J. Sherman, W. J. Morrison 1950). Three solves for each network of the method serve
/// all reactances.
/// </summary>
internal sealed class ReactorColumns
{
    private readonly StudyContext _context;
    private readonly int _reactor;      // its place among the circuit's branches
    private readonly ConcurrentDictionary<NetworkVariant, Lazy<ReactorSolution>> _solved = new();
    private readonly ConcurrentDictionary<DecayPart, Lazy<ReactorSolution[]>> _overTime = new();

    public ReactorColumns(StudyContext context, ThroughPlace place, int reactor)
    {
        _context = context;
        Place = place;
        _reactor = reactor;
    }

    /// <summary>Where the device stands.</summary>
    public ThroughPlace Place { get; }

    /// <summary>The solves in a network of the method.</summary>
    public ReactorSolution Of(NetworkVariant variant) => _solved.GetOrAdd(variant, one => new Lazy<ReactorSolution>(() => Solve(
        _context.Currents.NetworkSeenFrom(Place.Node, one) ?? _context.Networks.Of(one)))).Value;

    /// <summary>The solves at the nodes of a quadrature.</summary>
    public ReactorSolution[] OverTime(DecayPart part) =>
        _overTime.GetOrAdd(part, one => new Lazy<ReactorSolution[]>(() => one.OfEveryNode(Solve))).Value;

    private ReactorSolution Solve(SolvedNetwork network)
    {
        var branch = _context.Networks.Circuit.Branches[_reactor];
        var fault = network.Column(Place.Node, out _);
        var reactor = network.Column(branch.From, out _);
        var to = network.Column(branch.To, out _);
        for (var i = 0; i < reactor.Length; i++)
            reactor[i] -= to[i];
        return new ReactorSolution(network, Place, _reactor, fault, reactor);
    }
}

/// <summary>One network with its two solves.</summary>
internal sealed class ReactorSolution(SolvedNetwork network, ThroughPlace place, int reactor, Complex[] fault, Complex[] change)
{
    /// <summary>The value at the device's place with another reactance.</summary>
    /// <param name="reactancePu">The reactance per unit.</param>
    public PlaceValue With(double reactancePu)
    {
        var circuit = network.Matrix.Circuit;
        var branch = circuit.Branches[reactor];
        var admittance = NetworkAdmittances.OfSeries(new Complex(0.0, reactancePu), network.Variant);
        var delta = admittance - network.Values.Branches[reactor];
        var factor = delta / (1.0 + delta * (change[branch.From] - change[branch.To])) * change[place.Node];
        var whole = fault[place.Node] - change[place.Node] * factor;
        return ThroughShares.Of(circuit, network.Values, place, whole, index =>
        {
            var other = circuit.Branches[index].From == place.Node ? circuit.Branches[index].To : circuit.Branches[index].From;
            return fault[other] - change[other] * factor;
        }, index => index == reactor ? admittance : network.Values.Branches[index]);
    }
}

/// <summary>The values at one place with one reactance.</summary>
internal sealed class ReactorValues(ReactorColumns columns, double reactancePu) : ThroughValues
{
    public override double Residual => 0.0;

    public override int NodeOf(int place) => columns.Place.Node;

    public override PlaceValue At(NetworkVariant variant, int place) => columns.Of(variant).With(reactancePu);

    public override IReadOnlyList<PlaceValue> OverTime(DecayPart part, int place) =>
        Array.ConvertAll(columns.OverTime(part), solution => solution.With(reactancePu));

    public override SeenImpedances? WholeSeen(int place) => null;
}
