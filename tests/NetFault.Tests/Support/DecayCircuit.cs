using System.Numerics;

namespace NetFault.Tests.Support;

/// <summary>
/// The connected part of a network around a faulted bus, as a list of branches per unit on each bus's nominal voltage: made of the model
/// alone, in the way of <see cref="DecayOracle"/>. A three-winding transformer with all windings connected is a star with its own node.
/// </summary>
internal sealed class DecayCircuit
{
    private readonly Network _network;
    private readonly Dictionary<string, Bus> _buses;
    private readonly Dictionary<string, int> _label = [];
    private readonly List<DecayBranch> _all = [];
    private readonly Dictionary<int, int> _number = [];
    private int _labels;

    public DecayCircuit(Network network, string faultedBus)
    {
        _network = network;
        _buses = network.Buses.ToDictionary(bus => bus.Id);
        Omega = 2 * Math.PI * network.FrequencyHz;
        Label();
        AddSources();
        AddBranches();
        Branches = Keep(_label[faultedBus]);
        FaultedNode = _number[_label[faultedBus]];
        IsEnergised = Branches.Any(one => one.Section is "network_feeders" or "synchronous_machines");
    }

    public double Omega { get; }

    public bool IsEnergised { get; }

    public IReadOnlyList<DecayBranch> Branches { get; }

    public int NodeCount => _number.Count;

    public int FaultedNode { get; }

    /// <summary>The current of 1 per unit at a bus, in kA.</summary>
    public double BaseKa(string bus) => _network.BaseMva / (Math.Sqrt(3) * Kv(bus));

    /// <summary>The node of a bus, or −1 where it lies in another part of the network.</summary>
    public int NodeOf(string bus) => _number.TryGetValue(_label[bus], out var node) ? node : -1;

    private void Label()
    {
        foreach (var bus in _network.Buses)
            _label[bus.Id] = _labels++;
        foreach (var coupler in _network.BusCouplers.Where(one => one.Closed && Active(one, one.From, one.To)))
        {
            int keep = _label[coupler.From], drop = _label[coupler.To];
            foreach (var bus in _network.Buses.Where(one => _label[one.Id] == drop))
                _label[bus.Id] = keep;
        }
    }

    private void AddSources()
    {
        foreach (var one in _network.NetworkFeeders.Where(one => Active(one, one.Bus)))
        {
            var mva = one.ShortCircuitMva?.Max ?? Math.Sqrt(3) * Kv(one.Bus) * one.ShortCircuitKa!.Value.Max;
            var z = Complex.FromPolarCoordinates(_network.BaseMva / mva, Math.Atan2(1, one.ROverX ?? 1 / one.XOverR!.Value));
            _all.Add(new DecayBranch(one.Section, one.Id, [new(_label[one.Bus], 1)], z.Real, z.Imaginary));
        }
        foreach (var one in _network.SynchronousMachines.Where(one => Active(one, one.Bus)))
            _all.Add(DecayMachines.Synchronous(one, [new(_label[one.Bus], 1)], Kv(one.Bus), _network.BaseMva, Omega));
        foreach (var one in _network.AsynchronousMotors.Where(one => Active(one, one.Bus)))
            _all.Add(DecayMachines.Asynchronous(one, [new(_label[one.Bus], 1)], Kv(one.Bus), _network.BaseMva, Omega));
    }

    private void AddBranches()
    {
        foreach (var one in _network.Lines.Where(one => Active(one, one.From, one.To)))
        {
            var perUnit = one.PerUnit is { } given ? new Complex(given.R, given.X) : LineOhm(one) / BaseOhm(one.From);
            Add(one, one.From, one.To, perUnit / one.Parallel, 1);
        }
        foreach (var one in _network.SeriesReactors.Where(one => Active(one, one.From, one.To)))
            Add(one, one.From, one.To, ReactorOhm(one) / BaseOhm(one.From), 1);
        foreach (var one in _network.Transformers.Where(one => Active(one, one.Hv, one.Lv)))
        {
            var ohm = TransformerPart(one) * one.RatedHvKv * one.RatedHvKv / one.RatedMva;
            Add(one, one.Hv, one.Lv, ohm / BaseOhm(one.Hv), Ratio(one.RatedHvKv, one.Hv, one.RatedLvKv, one.Lv));
        }
        foreach (var one in _network.ThreeWindingTransformers.Where(one => Active(one, one.Hv, one.Mv, one.Lv)))
            AddThreeWindings(one);
    }

    /// <summary>With an open winding the pair of the two others counts, else the star of the three pairs, referred to HV.</summary>
    private void AddThreeWindings(ThreeWindingTransformer one)
    {
        var (mva, kv, uk, ur) = (one.RatedMva, one.RatedKv, one.ShortCircuitVoltagePercent, one.ResistivePercent);
        var hv = (Bus: one.Hv, Mva: mva.Hv, Kv: kv.Hv);
        var mv = (Bus: one.Mv, Mva: mva.Mv, Kv: kv.Mv);
        var lv = (Bus: one.Lv, Mva: mva.Lv, Kv: kv.Lv);
        var reference = hv.Bus is null ? mv : hv;
        var hm = Pair(uk.HvMv, ur.HvMv, hv.Mva, mv.Mva);
        var hl = Pair(uk.HvLv, ur.HvLv, hv.Mva, lv.Mva);
        var ml = Pair(uk.MvLv, ur.MvLv, mv.Mva, lv.Mva);
        if (hv.Bus is null)
            Add(one, mv.Bus!, lv.Bus!, ml, RatioTo(lv));
        else if (mv.Bus is null)
            Add(one, hv.Bus, lv.Bus!, hl, RatioTo(lv));
        else if (lv.Bus is null)
            Add(one, hv.Bus, mv.Bus, hm, RatioTo(mv));
        else
        {
            var star = _labels++;
            AddLeg(one, hv.Bus, star, (hm + hl - ml) / 2, 1);
            AddLeg(one, mv.Bus, star, (hm + ml - hl) / 2, RatioTo(mv));
            AddLeg(one, lv.Bus, star, (hl + ml - hm) / 2, RatioTo(lv));
        }

        Complex Pair(double? u, double? r, double? a, double? b) => u is null || r is null || a is null || b is null
            ? Complex.Zero
            : Part(u.Value, r.Value) * Math.Pow(reference.Kv!.Value, 2) / Math.Min(a.Value, b.Value) / BaseOhm(reference.Bus!);

        double RatioTo((string? Bus, double? Mva, double? Kv) other) =>
            Ratio(reference.Kv!.Value, reference.Bus!, other.Kv!.Value, other.Bus!);
    }

    private void Add(NetworkElement element, string from, string to, Complex z, double ratio) => _all.Add(
        new DecayBranch(element.Section, element.Id, [new(_label[from], 1), new(_label[to], -ratio)], z.Real, z.Imaginary));

    private void AddLeg(NetworkElement element, string bus, int star, Complex z, double ratio) => _all.Add(
        new DecayBranch(element.Section, element.Id, [new(_label[bus], ratio), new(star, -1)], z.Real, z.Imaginary));

    /// <summary>What the faulted node reaches, its nodes numbered from 0, by flooding until nothing changes.</summary>
    private List<DecayBranch> Keep(int faulted)
    {
        var reached = new HashSet<int> { faulted };
        for (var before = 0; before != reached.Count;)
        {
            before = reached.Count;
            foreach (var branch in _all.Where(one => one.Ends.Any(end => reached.Contains(end.Node))))
                reached.UnionWith(branch.Ends.Select(end => end.Node));
        }
        foreach (var node in reached.OrderBy(node => node))
            _number.Add(node, _number.Count);
        return _all.Where(one => reached.Contains(one.Ends[0].Node))
            .Select(one => one with { Ends = one.Ends.Select(end => end with { Node = _number[end.Node] }).ToList() }).ToList();
    }

    private double Ratio(double rated, string bus, double otherRated, string otherBus) => rated / otherRated * Kv(otherBus) / Kv(bus);

    private double BaseOhm(string bus) => Kv(bus) * Kv(bus) / _network.BaseMva;

    private double Kv(string bus) => _buses[bus].NominalKv;

    private bool Active(NetworkElement element, params string?[] buses) =>
        element.InService && buses.All(id => id is null || _buses[id].InService);

    private static Complex LineOhm(Line line) => line.OhmPerKm is { } perKm
        ? new Complex(perKm.R, perKm.X) * line.LengthKm!.Value
        : new Complex(line.Ohm!.Value.R, line.Ohm.Value.X);

    private Complex ReactorOhm(SeriesReactor reactor)
    {
        if (reactor.Ohm is { } ohm)
            return new Complex(ohm.R, ohm.X);
        var x = reactor.ReactancePercent!.Value / 100 * (reactor.RatedKv ?? Kv(reactor.From)) / (Math.Sqrt(3) * reactor.RatedKa!.Value);
        return new Complex(reactor.XOverR is { } ratio ? x / ratio : 0, x);
    }

    private static Complex TransformerPart(Transformer one) => one.XOverR is { } ratio
        ? Complex.FromPolarCoordinates(one.ShortCircuitVoltagePercent / 100, Math.Atan(ratio))
        : Part(one.ShortCircuitVoltagePercent, one.ResistivePercent ?? one.LoadLossKw!.Value / 10 / one.RatedMva);

    private static Complex Part(double percent, double resistive) =>
        new Complex(resistive, Math.Sqrt(percent * percent - resistive * resistive)) / 100;
}
