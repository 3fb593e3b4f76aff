using System.Collections.Concurrent;
using System.Numerics;

namespace NetFault;

/// <summary>At a place in one network: Zkk of the node, and the part of a fault's current there that comes from beyond the device.</summary>
/// <param name="Whole">Zkk per unit.</param>
/// <param name="Beyond">The part, 1 being the whole fault current.</param>
internal readonly record struct PlaceValue(Complex Whole, Complex Beyond);

/// <summary>What gives the values of places in each network. Safe for many threads.</summary>
internal abstract class ThroughValues
{
    /// <summary>The largest residual of the solutions behind the values.</summary>
    public abstract double Residual { get; }

    /// <summary>The node of a place.</summary>
    public abstract int NodeOf(int place);

    /// <summary>The value at a place in a network of the method.</summary>
    public abstract PlaceValue At(NetworkVariant variant, int place);

    /// <summary>The values at a place at the nodes of a quadrature.</summary>
    public abstract IReadOnlyList<PlaceValue> OverTime(DecayPart part, int place);

    /// <summary>The impedances of the whole fault at a place; null where these values are not those of a study.</summary>
    public abstract SeenImpedances? WholeSeen(int place);
}

/// <summary>One side of a place, as the methods' formulas look at it.</summary>
internal sealed class ThroughView(ThroughValues values, int place, bool faultIsBeyond)
{
    /// <summary>Below this a part is rounding, and no impedance belongs to it that could be worked with.</summary>
    private const double Smallest = 1e-15;

    /// <summary>The node with the fault.</summary>
    public int Node => values.NodeOf(place);

    /// <summary>The largest residual of the solutions behind the values.</summary>
    public double Residual => values.Residual;

    /// <summary>Zkk of the fault.</summary>
    public Complex Whole(NetworkVariant variant) => values.At(variant, place).Whole;

    /// <summary>The part of the fault current that flows through the device.</summary>
    public Complex Share(NetworkVariant variant) => Share(values.At(variant, place));

    /// <summary>Zkk over the share.</summary>
    public Complex Impedance(NetworkVariant variant)
    {
        var value = values.At(variant, place);
        return value.Whole / Share(value);
    }

    /// <summary>The impedances of the whole fault; null where there is no study for it.</summary>
    public SeenImpedances? WholeSeen() => values.WholeSeen(place);

    /// <summary>F = share/(p·Zkk) at the nodes p of a quadrature.</summary>
    public Complex[] Samples(DecayPart part)
    {
        var found = values.OverTime(part, place);
        var samples = new Complex[found.Count];
        for (var q = 0; q < samples.Length; q++)
            samples[q] = Share(found[q]) / (part.Rule.Nodes[q] * found[q].Whole);
        return samples;
    }

    private Complex Share(in PlaceValue value)
    {
        var share = faultIsBeyond ? 1.0 - value.Beyond : value.Beyond;
        return Complex.Abs(share) < Smallest ? Smallest : share;
    }
}

/// <summary>
/// The values of many places in one study. The part of a branch needs Zkk and Zmk of its other end alone, which stand on the pattern of L: one
/// selected inverse a network serves all places. A few places take a solve each.
/// </summary>
internal sealed class ThroughSolution : ThroughValues
{
    /// <summary>Up to this many nodes are solved one by one.</summary>
    private const int FewNodes = 3;

    private readonly StudyContext _context;
    private readonly ThroughPlace[] _places;
    private readonly bool _fewNodes;
    private readonly bool _forTransformers;
    private readonly ConcurrentDictionary<NetworkVariant, Lazy<PlaceValue[]>> _values = new();
    private readonly ConcurrentDictionary<DecayPart, Lazy<PlaceValue[][]>> _overTime = new();

    /// <param name="context">The study.</param>
    /// <param name="places">The places.</param>
    /// <param name="forTransformers">Whether unit transformers are uncorrected for faults inside their units (IEC 60909-0).</param>
    public ThroughSolution(StudyContext context, IEnumerable<ThroughPlace> places, bool forTransformers = false)
    {
        _forTransformers = forTransformers;
        _context = context;
        _places = places.ToArray();
        _fewNodes = _places.Select(place => place.Node).Where(node => node >= 0).Distinct().Take(FewNodes + 1).Count() <= FewNodes;
    }

    public override double Residual =>
        _fewNodes ? 0.0 : _context.Method.Networks.Max(variant => _context.Networks.Of(variant).DrivingPoints.WorstResidual);

    public override int NodeOf(int place) => _places[place].Node;

    /// <summary>The place.</summary>
    public ThroughPlace PlaceOf(int place) => _places[place];

    public override PlaceValue At(NetworkVariant variant, int place) => Values(variant)[place];

    public override IReadOnlyList<PlaceValue> OverTime(DecayPart part, int place)
    {
        var nodes = _overTime.GetOrAdd(part, one => new Lazy<PlaceValue[][]>(() => one.OfEveryNode(Solve))).Value;
        return Array.ConvertAll(nodes, values => values[place]);
    }

    /// <summary>The values of all places in a network.</summary>
    public PlaceValue[] Values(NetworkVariant variant) =>
        _values.GetOrAdd(variant, one => new Lazy<PlaceValue[]>(() => Solve(one))).Value;

    public override SeenImpedances? WholeSeen(int place)
    {
        var variants = _context.Method.Networks;
        var node = _places[place].Node;
        var networks = _fewNodes
            ? variants.Select(one => new DrivingPointImpedances([_context.Networks.Of(one).Column(node, out var residual)[node]], residual)).ToArray()
            : variants.Select(one => _context.Networks.Of(one).DrivingPoints).ToArray();
        return new SeenImpedances(variants, networks, _fewNodes ? 0 : node, node, Complex.Zero);
    }

    private PlaceValue[] Solve(NetworkVariant variant)
    {
        var values = Solve(_context.Networks.Of(variant));
        for (var i = 0; i < values.Length; i++)
        {
            if (_places[i].Node >= 0 && _context.Currents.NetworkSeenFrom(_places[i].Node, variant, _forTransformers) is { } other)
                values[i] = ByColumn(other, _places[i], other.Column(_places[i].Node, out _));
        }
        return values;
    }

    private PlaceValue[] Solve(SolvedNetwork network)
    {
        if (!_fewNodes)
            return Array.ConvertAll(_places, place => place.Node < 0 ? default : ByNeighbours(network, place));
        var columns = _places.Select(place => place.Node).Where(node => node >= 0).Distinct().ToDictionary(node => node, node => network.Column(node, out _));
        return Array.ConvertAll(_places, place => place.Node < 0 ? default : ByColumn(network, place, columns[place.Node]));
    }

    private static PlaceValue ByNeighbours(SolvedNetwork network, ThroughPlace place)
    {
        var local = network.Local;
        var whole = local.DrivingPoints.Impedances[place.Node];
        return ThroughShares.Of(network.Matrix.Circuit, network.Values, place, whole, branch =>
            network.Matrix.SlotOfBranch[branch] is var slot and >= 0 ? local.Neighbours[slot] : whole);
    }

    private static PlaceValue ByColumn(SolvedNetwork network, ThroughPlace place, Complex[] column)
    {
        var circuit = network.Matrix.Circuit;
        return ThroughShares.Of(circuit, network.Values, place, column[place.Node], branch =>
            column[circuit.Branches[branch].From == place.Node ? circuit.Branches[branch].To : circuit.Branches[branch].From]);
    }
}

/// <summary>The parts of a fault current that come from elements at the faulted node.</summary>
internal static class ThroughShares
{
    /// <summary>
    /// By superposition, with ΔV = −Z(:,k) for a fault current of 1: a source brings y·Zkk, a branch ta·y·(ta·Zkk − tb·Zmk) from its from end.
    /// </summary>
    /// <param name="circuit">The circuit.</param>
    /// <param name="values">The admittances of the network.</param>
    /// <param name="place">The place.</param>
    /// <param name="whole">Zkk.</param>
    /// <param name="neighbour">Zmk of the other node of a branch.</param>
    /// <param name="admittance">The admittance of a branch; null takes those of the network.</param>
    public static PlaceValue Of(
        Circuit circuit, AdmittanceValues values, ThroughPlace place, Complex whole, Func<int, Complex> neighbour, Func<int, Complex>? admittance = null)
    {
        var beyond = Complex.Zero;
        foreach (var end in place.Beyond)
        {
            if (end.Kind == ElementEndKind.Source)
            {
                beyond += values.Sources[end.Index] * whole;
                continue;
            }
            var branch = circuit.Branches[end.Index];
            var (here, there) = end.Kind == ElementEndKind.From ? (branch.FromRatio, branch.ToRatio) : (branch.ToRatio, branch.FromRatio);
            beyond += here * (admittance?.Invoke(end.Index) ?? values.Branches[end.Index]) * (here * whole - there * neighbour(end.Index));
        }
        return new PlaceValue(whole, beyond);
    }
}
