using System.Numerics;
using MathNet.Numerics.LinearAlgebra;

namespace NetFault.Tests.Support;

/// <summary>
/// Which network: frequency over the rated one, R_Gf or Ra, with asynchronous machines or not, the unit inside which the fault is.
/// </summary>
internal sealed record IecVariant(double FrequencyRatio = 1, bool Fictitious = false, bool Motors = true, string? InsideMachine = null);

/// <summary>A branch in ohm at rated frequency on its from side; its to end is an ideal ratio away.</summary>
internal sealed record IecBranch(NetworkElement Element, int From, int To, Complex Ohm, double Ratio = 1);

/// <summary>A source in ohm at rated frequency.</summary>
internal sealed record IecSource(ShuntElement Element, int Node, Complex Ohm);

/// <summary>
/// A network in ohm with corrected impedances for a dense inverse: star points of three-winding transformers are nodes, closed couplers and
/// limited capacitors are joined by relabelling. Nothing of the library's circuit is used.
/// </summary>
internal sealed class IecDenseNetwork
{
    private readonly Network _network;
    private readonly IecElements _elements;
    private readonly bool _maximum;
    private readonly Dictionary<string, int> _node = [];
    private readonly Dictionary<string, int> _star = [];
    private readonly Dictionary<string, List<IecBranch>> _branches = [];
    private readonly Dictionary<IecVariant, List<IecSource>> _sources = [];

    public IecDenseNetwork(Network network, IecElements elements, ShortCircuitCase which)
    {
        (_network, _elements, _maximum) = (network, elements, which == ShortCircuitCase.Maximum);
        foreach (var bus in network.Buses)
            _node[bus.Id] = _node.Count;
        foreach (var transformer in network.ThreeWindingTransformers)
            _star[transformer.Id] = network.Buses.Count + _star.Count;
        foreach (var one in network.BusCouplers.Where(one => one.Closed && Active(one, one.From, one.To)))
            Join(one.From, one.To);
        foreach (var one in network.SeriesCapacitors.Where(one => one.VoltageLimited && Active(one, one.From, one.To)))
            Join(one.From, one.To);
        var plain = new IecVariant();
        Live = Flood(
            Sources(plain).Where(one => one.Element is NetworkFeeder or SynchronousMachine).Select(one => one.Node).ToHashSet(),
                Branches(plain), -1);
    }

    /// <summary>Nodes that a feeder or synchronous machine reaches.</summary>
    public HashSet<int> Live { get; }

    public int Node(string bus) => _node[bus];

    public List<IecBranch> Branches(IecVariant variant) => _branches.TryGetValue(variant.InsideMachine ?? "", out var known)
        ? known
        : _branches[variant.InsideMachine ?? ""] = MakeBranches(variant);

    public List<IecSource> Sources(IecVariant variant) =>
        _sources.TryGetValue(variant, out var known) ? known : _sources[variant] = MakeSources(variant);

    private List<IecBranch> MakeBranches(IecVariant variant)
    {
        var list = new List<IecBranch>();
        list.AddRange(_network.Lines.Where(one => Active(one, one.From, one.To))
            .Select(one => new IecBranch(one, _node[one.From], _node[one.To], _elements.Line(one))));
        list.AddRange(_network.SeriesReactors.Where(one => Active(one, one.From, one.To))
            .Select(one => new IecBranch(one, _node[one.From], _node[one.To], _elements.Reactor(one))));
        list.AddRange(_network.SeriesCapacitors.Where(one => !one.VoltageLimited && Active(one, one.From, one.To))
            .Select(one => new IecBranch(one, _node[one.From], _node[one.To], new Complex(0, -one.ReactanceOhm))));
        list.AddRange(_network.Transformers.Where(one => Active(one, one.Hv, one.Lv)).Select(one => new IecBranch(
            one, _node[one.Hv], _node[one.Lv], _elements.Transformer(one, variant.InsideMachine), one.RatedHvKv / one.RatedLvKv)));
        list.AddRange(_network.ThreeWindingTransformers.Where(one => Active(one, one.Hv, one.Mv, one.Lv)).SelectMany(Legs));
        return list;
    }

    private List<IecSource> MakeSources(IecVariant variant)
    {
        var followers = variant.Motors && _maximum;
        var list = new List<IecSource>();
        Add(_network.NetworkFeeders, _elements.Feeder);
        Add(_network.SynchronousMachines, one => _elements.Machine(one, variant.Fictitious, one.Id == variant.InsideMachine));
        if (!followers)
            return list;
        Add(_network.AsynchronousMotors, _elements.Motor);
        Add(_network.ConverterFedDrives, _elements.Drive);
        Add(_network.DoublyFedGenerators, _elements.DoublyFed);
        return list;

        void Add<T>(IEnumerable<T> all, Func<T, Complex> ohm) where T : ShuntElement =>
            list.AddRange(all.Where(one => Active(one, one.Bus)).Select(one => new IecSource(one, _node[one.Bus], ohm(one))));
    }

    /// <summary>Z of the live part of a network: row and column by node.</summary>
    public Func<int, int, Complex> Invert(IecVariant variant) => Invert(
        Branches(variant).Where(one => Live.Contains(one.From)), Sources(variant).Where(one => Live.Contains(one.Node)),
            variant.FrequencyRatio);

    /// <summary>Z of some branches and sources, all connected.</summary>
    public static Func<int, int, Complex> Invert(
        IEnumerable<IecBranch> someBranches, IEnumerable<IecSource> someSources, double frequencyRatio)
    {
        List<IecBranch> branches = [.. someBranches];
        List<IecSource> sources = [.. someSources];
        var place = branches.SelectMany(one => new[] { one.From, one.To }).Concat(sources.Select(one => one.Node)).Distinct()
            .Select((node, i) => (node, i)).ToDictionary(pair => pair.node, pair => pair.i);
        var y = Matrix<Complex>.Build.Dense(place.Count, place.Count);
        foreach (var (element, from, to, ohm, n) in branches)
        {
            int a = place[from], b = place[to];
            var siemens = 1 / At(ohm, element is SeriesCapacitor ? 1 / frequencyRatio : frequencyRatio);
            y[a, a] += siemens;
            y[b, b] += siemens * n * n;
            y[a, b] -= siemens * n;
            y[b, a] -= siemens * n;
        }
        foreach (var source in sources)
            y[place[source.Node], place[source.Node]] += 1 / At(source.Ohm, frequencyRatio);
        var (z, scale) = ScaledInverse(y);
        return (i, j) => z[place[i], place[j]] * scale[place[i]] * scale[place[j]];
    }

    /// <summary>The inverse of S·Y·S with a diagonal of magnitude 1: from 0.4 to 220 kV, siemens alone would cost six digits.</summary>
    private static (Matrix<Complex> Inverse, double[] Scale) ScaledInverse(Matrix<Complex> y)
    {
        var scale = y.Diagonal().Select(one => 1 / Math.Sqrt(one.Magnitude)).ToArray();
        return (Matrix<Complex>.Build.Dense(y.RowCount, y.ColumnCount, (i, j) => y[i, j] * scale[i] * scale[j]).Inverse(), scale);
    }

    /// <summary>What a set of nodes reaches over branches, never through the node without.</summary>
    public static HashSet<int> Flood(HashSet<int> from, List<IecBranch> branches, int without, NetworkElement? withoutBranch = null)
    {
        var reached = from.ToHashSet();
        for (var before = -1; before != reached.Count;)
        {
            before = reached.Count;
            foreach (var one in branches.Where(one => one.From != without && one.To != without && one.Element != withoutBranch))
            {
                if (reached.Contains(one.From) || reached.Contains(one.To))
                    reached.UnionWith([one.From, one.To]);
            }
        }
        return reached;
    }

    private IEnumerable<IecBranch> Legs(ThreeWindingTransformer t)
    {
        WindingValues mva = t.RatedMva, kv = t.RatedKv;
        Complex Pair(double? uk, double? ur, double? a, double? b, string? bus) =>
            bus is null ? Complex.Zero : _elements.Windings(uk!.Value, ur!.Value, Math.Min(a!.Value, b!.Value), kv.Hv!.Value, bus);
        if (t.Lv is null)
        {
            var only = Pair(t.ShortCircuitVoltagePercent.HvMv, t.ResistivePercent.HvMv, mva.Hv, mva.Mv, t.Mv);
            return [new IecBranch(t, _node[t.Hv!], _node[t.Mv!], only, kv.Hv!.Value / kv.Mv!.Value)];
        }
        var hm = Pair(t.ShortCircuitVoltagePercent.HvMv, t.ResistivePercent.HvMv, mva.Hv, mva.Mv, t.Mv);
        var hl = Pair(t.ShortCircuitVoltagePercent.HvLv, t.ResistivePercent.HvLv, mva.Hv, mva.Lv, t.Lv);
        var ml = Pair(t.ShortCircuitVoltagePercent.MvLv, t.ResistivePercent.MvLv, mva.Mv, mva.Lv, t.Lv);
        return
        [
            new IecBranch(t, _star[t.Id], _node[t.Hv!], (hm + hl - ml) / 2),
            new IecBranch(t, _star[t.Id], _node[t.Mv!], (hm + ml - hl) / 2, kv.Hv!.Value / kv.Mv!.Value),
            new IecBranch(t, _star[t.Id], _node[t.Lv], (hl + ml - hm) / 2, kv.Hv!.Value / kv.Lv!.Value),
        ];
    }

    private void Join(string one, string other)
    {
        int keep = _node[one], drop = _node[other];
        foreach (var bus in _network.Buses.Where(bus => _node[bus.Id] == drop))
            _node[bus.Id] = keep;
    }

    private bool Active(NetworkElement element, params string?[] buses) =>
        element.InService && buses.All(id => id is null || _network.Find<Bus>(id).InService);

    private static Complex At(Complex ohm, double ratio) => new(ohm.Real, ohm.Imaginary * ratio);
}
