using System.Numerics;

namespace NetFault.Tests.Support;

/// <summary>
/// IEC 60909-0:2016 a second time, for tests: dense inverses in ohm, every machine's share by superposition, nothing pruned, the radial
/// rule by taking the node out and flooding. Formulas from <see cref="IecFormulas"/> and <see cref="IecElements"/>.
/// </summary>
internal sealed class IecOracle
{
    private readonly Network _network;
    private readonly IecElements _elements;
    private readonly IecDenseNetwork _dense;
    private readonly Dictionary<IecVariant, Func<int, int, Complex>> _solved = [];
    private readonly Dictionary<string, string?> _inside = [];

    public IecOracle(Network network, ShortCircuitCase which = ShortCircuitCase.Maximum)
    {
        _network = network;
        _elements = new IecElements(network, which);
        _dense = new IecDenseNetwork(network, _elements, which);
    }

    public bool IsEnergised(string bus) => _dense.Live.Contains(_dense.Node(bus));

    public double InitialKa(string bus) => DrivingKv(bus) / Impedance(bus, new IecVariant()).Magnitude;

    /// <summary>8.1.2, method (c): the network at 20 Hz (24 Hz), machines with R_Gf.</summary>
    public double KappaC(string bus) => IecFormulas.Kappa(ROverX(bus, 0.4, fictitious: true));

    /// <summary>8.1.2, method (a): the smallest R/X of the branches and sources that are connected with the bus.</summary>
    public double KappaA(string bus) => IecFormulas.Kappa(BranchRatios(bus).Min());

    /// <summary>8.1.2, method (b): 1.15·κ up to 1.8 or 2.0; κ alone where all branches have R/X below 0.3.</summary>
    public double KappaB(string bus)
    {
        var kappa = IecFormulas.Kappa(ROverX(bus, 1, fictitious: true));
        return BranchRatios(bus).Max() < 0.3 ? kappa : Math.Min(1.15 * kappa, _elements.Kv(bus) > 1 ? 2.0 : 1.8);
    }

    public double PeakKa(string bus) => KappaC(bus) * Math.Sqrt(2) * InitialKa(bus);

    /// <summary>Clause 9.</summary>
    public double DcKa(string bus, double seconds) => Math.Sqrt(2) * InitialKa(bus) * Math.Exp(
        -2 * Math.PI * _network.FrequencyHz * seconds
            * ROverX(bus, IecFormulas.FcOverF(_network.FrequencyHz * seconds), fictitious: false));

    /// <summary>11.2, meshed: I″k without asynchronous motors.</summary>
    public double SteadyWithoutMotorsKa(string bus) => DrivingKv(bus) / Impedance(bus, new IecVariant(Motors: false)).Magnitude;

    /// <summary>10.1.2 by the rule that holds at the bus.</summary>
    public double BreakingKa(string bus, double delay) => IsRadial(bus) ? RadialBreakingKa(bus, delay) : MeshedBreakingKa(bus, delay);

    /// <summary>Whether any machine feeds the fault with more than twice its rated current, or any drive at all.</summary>
    public bool IsNearMachines(string bus) =>
        Shares(bus).Any(one =>
            one.Source.Element is ConverterFedDrive || one.Current.Magnitude / _elements.RatedKa(one.Source.Element) > 2);

    /// <summary>No part that is left when the node is taken out holds more than one source.</summary>
    public bool IsRadial(string bus) => Parts(bus, new IecVariant()).All(part => part.Sources.Count <= 1);

    /// <summary>11.2.2: each machine λ·IrG as far as the fault, feeders their initial current.</summary>
    public double RadialSteadyKa(string bus, Func<SynchronousMachine, double> lambda)
    {
        var variant = new IecVariant(Motors: false, InsideMachine: Inside(bus));
        Complex held = 0;
        var sum = 0.0;
        foreach (var (sources, z) in SolvedParts(bus, variant))
        {
            var k = _dense.Node(bus);
            var current = DrivingKv(bus) / z(k, k);
            if (sources is [{ Element: SynchronousMachine machine } source])
                sum += lambda(machine) * _elements.RatedKa(machine)!.Value * (source.Ohm / z(source.Node, k)).Magnitude;
            else
                held += current;
        }
        return held.Magnitude + sum;
    }

    /// <summary>
    /// Equation for Ib in meshed networks, as phasors; products ΔU″·I″ are the same on both sides of an ideal transformer.
    /// </summary>
    public double MeshedBreakingKa(string bus, double delay)
    {
        var e = DrivingKv(bus);
        var current = e / Impedance(bus, new IecVariant());
        foreach (var (source, own) in Shares(bus))
        {
            var voltageChange = new Complex(0, source.Ohm.Imaginary) * own;
            current -= voltageChange / e * (1 - Kept(source.Element, own.Magnitude, delay)) * own;
        }
        return current.Magnitude;
    }

    /// <summary>Each machine's own current in kA at its terminals.</summary>
    public IEnumerable<(IecSource Source, Complex Current)> Shares(string bus)
    {
        var variant = new IecVariant(InsideMachine: Inside(bus));
        var z = Solve(variant);
        var k = _dense.Node(bus);
        var island = IecDenseNetwork.Flood([k], _dense.Branches(variant), -1);
        return _dense.Sources(variant).Where(one => island.Contains(one.Node) && _elements.RatedKa(one.Element).HasValue)
            .Select(one => (one, DrivingKv(bus) / z(k, k) * z(one.Node, k) / one.Ohm));
    }

    private double RadialBreakingKa(string bus, double delay)
    {
        var k = _dense.Node(bus);
        Complex total = 0;
        foreach (var (sources, z) in SolvedParts(bus, new IecVariant(InsideMachine: Inside(bus))))
        {
            var part = DrivingKv(bus) / z(k, k);
            var kept = sources is [var source] ? Kept(source.Element, (part * z(source.Node, k) / source.Ohm).Magnitude, delay) : 1;
            total += part * kept;
        }
        return total.Magnitude;
    }

    /// <summary>μ, or μ·q; 1 up to twice the rated current; 0 for converter-fed drives.</summary>
    private double Kept(ShuntElement element, double ka, double delay)
    {
        if (element is ConverterFedDrive)
            return 0;
        if (_elements.RatedKa(element) is not { } rated || ka / rated <= 2)
            return 1;
        var mu = IecFormulas.Mu(ka / rated, delay);
        return element is AsynchronousMotor motor ? mu * IecFormulas.Q(motor.RatedKw / 1000 / motor.PolePairs!.Value, delay) : mu;
    }

    private IEnumerable<(List<IecSource> Sources, Func<int, int, Complex> Z)> SolvedParts(string bus, IecVariant variant)
    {
        var branches = _dense.Branches(variant);
        var k = _dense.Node(bus);
        foreach (var (nodes, sources) in Parts(bus, variant).Where(part => part.Sources.Count > 0))
        {
            var own = branches.Where(one => nodes.Contains(one.From) || nodes.Contains(one.To));
            yield return (sources, IecDenseNetwork.Invert(own, sources, variant.FrequencyRatio));
        }
    }

    private List<(HashSet<int> Nodes, List<IecSource> Sources)> Parts(string bus, IecVariant variant)
    {
        var k = _dense.Node(bus);
        var branches = _dense.Branches(variant);
        var sources = _dense.Sources(variant);
        var parts = sources.Where(one => one.Node == k).Select(one => (new HashSet<int>(), new List<IecSource> { one })).ToList();
        var seen = new HashSet<int> { k };
        foreach (var start in branches.SelectMany(one => one.From == k ? [one.To] : one.To == k ? new[] { one.From } : []))
        {
            if (seen.Contains(start))
                continue;
            var nodes = IecDenseNetwork.Flood([start], branches, k);
            seen.UnionWith(nodes);
            parts.Add((nodes, sources.Where(one => nodes.Contains(one.Node)).ToList()));
        }
        return parts;
    }

    /// <summary>
    /// R/X of what is connected with a bus; star legs may have negative parts: without reactance they give none, without resistance
    /// 0.
    /// </summary>
    private List<double> BranchRatios(string bus)
    {
        var variant = new IecVariant(Fictitious: true);
        var island = IecDenseNetwork.Flood([_dense.Node(bus)], _dense.Branches(variant), -1);
        return _dense.Branches(variant).Where(one => island.Contains(one.From)).Select(one => one.Ohm)
            .Concat(_dense.Sources(variant).Where(one => island.Contains(one.Node)).Select(one => one.Ohm))
            .Where(ohm => ohm.Imaginary > 0).Select(ohm => Math.Max(0, ohm.Real / ohm.Imaginary)).ToList();
    }

    /// <summary>
    /// R/X at rated frequency; 0, no decay, where series capacitors make the network capacitive at the equivalent frequency.
    /// </summary>
    private double ROverX(string bus, double frequencyRatio, bool fictitious)
    {
        var z = Impedance(bus, new IecVariant(frequencyRatio, fictitious));
        return z.Imaginary > 0 ? z.Real / z.Imaginary * frequencyRatio : 0;
    }

    private Complex Impedance(string bus, IecVariant variant) =>
        Solve(variant with { InsideMachine = Inside(bus) })(_dense.Node(bus), _dense.Node(bus));

    private Func<int, int, Complex> Solve(IecVariant variant) =>
        _solved.TryGetValue(variant, out var z) ? z : _solved[variant] = _dense.Invert(variant);

    /// <summary>c·Un/√3, or c·UrG/√3 at the terminals of a unit's machine.</summary>
    private double DrivingKv(string bus)
    {
        var kv = Inside(bus) is { } id && _network.Find<SynchronousMachine>(id) is var machine
            && _dense.Node(machine.Bus) == _dense.Node(bus)
            ? machine.RatedKv ?? _elements.Kv(bus)
            : _elements.Kv(bus);
        return _elements.C(bus) * kv / Math.Sqrt(3);
    }

    /// <summary>
    /// 7.2.2 and 7.2.3: the machine of the unit inside which a bus lies. Auxiliary buses count where the terminals are their only way to a
    /// source.
    /// </summary>
    private string? Inside(string bus) => _inside.TryGetValue(bus, out var known) ? known : _inside[bus] = FindInside(bus);

    private string? FindInside(string bus)
    {
        var variant = new IecVariant();
        var branches = _dense.Branches(variant);
        var holders = _dense.Sources(variant).Where(one => one.Element is NetworkFeeder or SynchronousMachine).ToList();
        foreach (var machine in holders.Select(one => one.Element).OfType<SynchronousMachine>().Where(one =>
            one.UnitTransformer is not null))
        {
            if (branches.FirstOrDefault(one => one.Element is Transformer && one.Element.Id == machine.UnitTransformer) is not { } unit)
                continue;
            var terminals = _dense.Node(machine.Bus);
            var reached = IecDenseNetwork.Flood([terminals], branches, -1, unit.Element);
            if (_dense.Node(bus) == terminals || (reached.Contains(_dense.Node(bus))
                && holders.Count(one => reached.Contains(one.Node)) == 1))
                return machine.Id;
        }
        return null;
    }
}
