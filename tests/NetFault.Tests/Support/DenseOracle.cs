using System.Numerics;
using MathNet.Numerics.LinearAlgebra;

namespace NetFault.Tests.Support;

/// <summary>
/// The short-circuit impedances of a network by another way than the library's: in ohm and kV instead of per unit, three-winding
/// transformers with their star point as a node, couplers joined by relabelling, and Math.NET's dense complex inverse.
/// </summary>
internal sealed class DenseOracle
{
    private readonly Network _network;
    private readonly Dictionary<string, int> _label = [];
    private readonly List<(int From, int To, Complex Siemens, double Ratio)> _branches = [];
    private readonly List<(int Node, Complex Siemens)> _sources = [];
    private readonly HashSet<string> _live = [];
    private readonly Func<Complex, Complex> _part;
    private int _labels;

    /// <param name="network">The network.</param>
    /// <param name="withMotors">Whether asynchronous motors are in it.</param>
    /// <param name="reactancePu">The machines' reactance; x″d by default.</param>
    /// <param name="part">What is taken of each impedance, such as its reactance alone; all of it by default.</param>
    public DenseOracle(
        Network network, bool withMotors = true, Func<SynchronousMachine, double>? reactancePu = null, Func<Complex, Complex>? part = null)
    {
        _network = network;
        _part = part ?? (z => z);
        Label();
        AddBranches();
        AddSources(withMotors, reactancePu ?? (machine => machine.ReactancePu.Subtransient));
        ImpedanceOhm = Invert();
    }

    /// <summary>Zkk in ohm at each energised bus.</summary>
    public IReadOnlyDictionary<string, Complex> ImpedanceOhm { get; }

    /// <summary>The initial current at each energised bus, in kA, with the nominal voltage before the fault.</summary>
    public double CurrentKa(string bus) =>
        _network.Buses.First(one => one.Id == bus).NominalKv / Math.Sqrt(3) / ImpedanceOhm[bus].Magnitude;

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

    private void AddBranches()
    {
        foreach (var line in _network.Lines.Where(one => Active(one, one.From, one.To)))
            Add(line.From, line.To, LineOhm(line) / line.Parallel, 1);
        foreach (var reactor in _network.SeriesReactors.Where(one => Active(one, one.From, one.To)))
        {
            var x = reactor.ReactancePercent!.Value / 100 * (reactor.RatedKv ?? Kv(reactor.From)) / (Math.Sqrt(3) * reactor.RatedKa!.Value);
            Add(reactor.From, reactor.To, new Complex(reactor.XOverR is { } ratio ? x / ratio : 0, x), 1);
        }
        foreach (var one in _network.Transformers.Where(one => Active(one, one.Hv, one.Lv)))
        {
            Add(one.Hv, one.Lv, PercentOhm(one.ShortCircuitVoltagePercent, one.ResistivePercent!.Value, one.RatedHvKv, one.RatedMva),
                one.RatedHvKv / one.RatedLvKv);
        }
        foreach (var one in _network.ThreeWindingTransformers.Where(one => Active(one, one.Hv, one.Mv, one.Lv)))
            AddThreeWinding(one);
    }

    private Complex LineOhm(Line line) => line.OhmPerKm is { } perKm
        ? new Complex(perKm.R, perKm.X) * line.LengthKm!.Value
        : line.Ohm is { } ohm ? new Complex(ohm.R, ohm.X) : new Complex(line.PerUnit!.Value.R, line.PerUnit.Value.X) * Square(Kv(line.From)) / _network.BaseMva;

    /// <summary>Star referred to the rated voltage of HV; the star point is a node; each leg ends in an ideal ratio.</summary>
    private void AddThreeWinding(ThreeWindingTransformer t)
    {
        Complex Pair(double? uk, double? ur, double? a, double? b) => PercentOhm(uk!.Value, ur!.Value, t.RatedKv.Hv!.Value, Math.Min(a!.Value, b!.Value));
        var hm = Pair(t.ShortCircuitVoltagePercent.HvMv, t.ResistivePercent.HvMv, t.RatedMva.Hv, t.RatedMva.Mv);
        var hl = Pair(t.ShortCircuitVoltagePercent.HvLv, t.ResistivePercent.HvLv, t.RatedMva.Hv, t.RatedMva.Lv);
        var ml = Pair(t.ShortCircuitVoltagePercent.MvLv, t.ResistivePercent.MvLv, t.RatedMva.Mv, t.RatedMva.Lv);
        var star = _labels++;
        AddLeg(star, t.Hv, (hm + hl - ml) / 2, 1);
        AddLeg(star, t.Mv, (hm + ml - hl) / 2, t.RatedKv.Hv!.Value / t.RatedKv.Mv!.Value);
        AddLeg(star, t.Lv, (hl + ml - hm) / 2, t.RatedKv.Hv!.Value / t.RatedKv.Lv!.Value);
    }

    private void AddLeg(int star, string? bus, Complex ohm, double ratio)
    {
        if (bus is not null)
            _branches.Add((star, _label[bus], 1 / _part(ohm), ratio));
    }

    private void AddSources(bool withMotors, Func<SynchronousMachine, double> reactancePu)
    {
        foreach (var feeder in _network.NetworkFeeders.Where(one => Active(one, one.Bus)))
        {
            var z = Square(Kv(feeder.Bus)) / feeder.ShortCircuitMva!.Value.Max;
            AddSource(feeder.Bus, Complex.FromPolarCoordinates(z, Math.Atan(feeder.XOverR!.Value)));
        }
        foreach (var machine in _network.SynchronousMachines.Where(one => Active(one, one.Bus)))
        {
            var ohm = Square(machine.RatedKv ?? Kv(machine.Bus)) / machine.RatedMva;
            AddSource(machine.Bus, new Complex(machine.ArmatureResistancePu!.Value, reactancePu(machine)) * ohm);
        }
        FindLiveBuses();
        foreach (var motor in _network.AsynchronousMotors.Where(one => withMotors && Active(one, one.Bus)))
        {
            var mva = motor.RatedKw / 1000 / motor.RatedPowerFactor / motor.Efficiency * motor.Count;
            var z = Square(motor.RatedKv ?? Kv(motor.Bus)) / mva / motor.LockedRotorCurrentRatio;
            AddSource(motor.Bus, Complex.FromPolarCoordinates(z, Math.Atan2(1, motor.ROverX!.Value)));
        }
    }

    /// <summary>What a feeder or synchronous machine reaches, by flooding until nothing changes.</summary>
    private void FindLiveBuses()
    {
        var live = _sources.Select(source => source.Node).ToHashSet();
        for (var before = -1; before != live.Count;)
        {
            before = live.Count;
            foreach (var branch in _branches.Where(one => live.Contains(one.From) || live.Contains(one.To)))
                live.UnionWith([branch.From, branch.To]);
        }
        _live.UnionWith(_network.Buses.Where(bus => live.Contains(_label[bus.Id])).Select(bus => bus.Id));
    }

    private Dictionary<string, Complex> Invert()
    {
        var liveNodes = _live.Select(bus => _label[bus])
            .Concat(_branches.Where(one => IsLive(one.From) || IsLive(one.To)).SelectMany(one => new[] { one.From, one.To }))
            .Distinct().ToList();
        var place = liveNodes.Select((node, i) => (node, i)).ToDictionary(pair => pair.node, pair => pair.i);
        var y = Matrix<Complex>.Build.Dense(place.Count, place.Count);
        foreach (var (from, to, siemens, n) in _branches.Where(one => place.ContainsKey(one.From)))
        {
            y[place[from], place[from]] += siemens;
            y[place[to], place[to]] += siemens * n * n;
            y[place[from], place[to]] -= siemens * n;
            y[place[to], place[from]] -= siemens * n;
        }
        foreach (var (node, siemens) in _sources.Where(one => place.ContainsKey(one.Node)))
            y[place[node], place[node]] += siemens;
        var z = y.Inverse();
        return _live.ToDictionary(bus => bus, bus => z[place[_label[bus]], place[_label[bus]]]);

        bool IsLive(int node) => _live.Any(bus => _label[bus] == node);
    }

    private void Add(string from, string to, Complex ohm, double ratio) => _branches.Add((_label[from], _label[to], 1 / _part(ohm), ratio));

    private void AddSource(string bus, Complex ohm) => _sources.Add((_label[bus], 1 / _part(ohm)));

    private bool Active(NetworkElement element, params string?[] buses) =>
        element.InService && buses.All(id => id is null || _network.Buses.First(bus => bus.Id == id).InService);

    private double Kv(string bus) => _network.Buses.First(one => one.Id == bus).NominalKv;

    private static Complex PercentOhm(double uk, double ur, double ratedKv, double mva) =>
        new Complex(ur, Math.Sqrt(uk * uk - ur * ur)) / 100 * Square(ratedKv) / mva;

    private static double Square(double value) => value * value;
}
