using System.Collections.Concurrent;
using System.Numerics;

namespace NetFault;

/// <summary>
/// Where the poles of a network's fault currents can lie, found from its data alone, as points of the regions' edges in units of ω. A pole is
/// possible at p only where no open half-plane holds the impedances of all branches at p (else Σ z·|i|² = 0 has no solution but i = 0), so that
/// an edge consists of the poles of one machine behind an external impedance, of which only the direction is bounded
/// (<see cref="ExternalImpedances"/>). The error of a quadrature is analytic between the edges, so it is largest on them.
/// </summary>
internal sealed class PoleRegion
{
    /// <summary>
    /// Points of an edge for each e-fold of distance from the point about which the cluster lies: a rule of some 60 nodes has no more than about 5
    /// extremes of its error in one. A small region has more, for it takes several points a node to hold a rule down everywhere (with two a
    /// node, bounds came out up to 30 times as large as with eight).
    /// </summary>
    private const int FewestAnEFold = 10, MostAnEFold = 160, PointsANode = 8;

    /// <summary>So many points at which errors are looked up come on one that weights are fitted to.</summary>
    private const double ChecksAPoint = 2.4;

    /// <summary>Poles that decay faster than this many times ω are not resolved: they are gone within 0.2 ms.</summary>
    public const double LargestDcRate = 100.0;

    private readonly PoleLimits _limits;
    private readonly bool _quasiStatic;
    private readonly ConcurrentDictionary<int, EdgePoints> _edges = new();

    /// <param name="limits">What bounds the network's poles.</param>
    /// <param name="quasiStatic">Whether reactances are kept at rated frequency.</param>
    public PoleRegion(PoleLimits limits, bool quasiStatic)
    {
        _limits = limits;
        _quasiStatic = quasiStatic;
    }

    /// <summary>Where poles of the AC component can lie, in enough points for a rule of so many nodes.</summary>
    public PolePoints Ac(int nodes) => Enough(nodes, (edges, density) => edges.Ac(density));

    /// <summary>Where poles of the DC component can lie; none where reactances are kept at rated frequency.</summary>
    public PolePoints Dc(int nodes) => Enough(nodes, (edges, density) => edges.Dc(density));

    private PolePoints Enough(int nodes, Func<EdgePoints, double, Complex[]> points)
    {
        for (var density = FewestAnEFold;; density *= 2)
        {
            var edges = _edges.GetOrAdd(density, Edges);
            var fit = points(edges, density);
            if (fit.Length <= 1 || fit.Length >= PointsANode * nodes || density >= MostAnEFold)
                return new PolePoints(fit, points(edges, ChecksAPoint * density));
        }
    }

    private EdgePoints Edges(int density)
    {
        var edges = new EdgePoints(_quasiStatic);
        edges.Add(Complex.Zero);
        if (!_quasiStatic)
            AddNetworkAlone(edges, density);
        var external = new ExternalImpedances(_limits, ChecksAPoint * density);
        AddMachines(edges, external.OfMachineForAc(), Clusters.Ac);
        AddMachines(edges, external.OfMachineForDc(), Clusters.Dc);
        foreach (var ratio in new[] { 0.0, _limits.LargestMotorResistanceRatio }.Distinct())
            AddMotors(edges, ratio, external.OfMotor(ratio).ToList());
        return edges;
    }

    /// <summary>Resistances and constant inductances alone have their poles at p = −j − λ, λ between the extremes of their R/X.</summary>
    private void AddNetworkAlone(EdgePoints edges, int density)
    {
        edges.Add(-Complex.ImaginaryOne);
        for (var i = 1; i <= 4 && _limits.SmallestResistanceRatio < 0.0; i++)
            edges.Add(new Complex(-i / 4.0 * _limits.SmallestResistanceRatio, -1.0));
        var last = Math.Min(_limits.LargestResistanceRatio, LargestDcRate);
        if (last <= 0.0)
            return;
        foreach (var rate in ExternalImpedances.Logarithmic(1e-4 * last, last, ChecksAPoint * density))
            edges.Add(new Complex(-rate, -1.0));
    }

    private void AddMachines(EdgePoints edges, IEnumerable<Complex> external, Clusters wanted)
    {
        var points = external.ToList();
        foreach (var machine in _limits.Machines)
            AddMachine(edges, machine, points, wanted);
    }

    /// <summary>
    /// A machine without its resistance behind w: s·(p + g1)(p + g2) + w·[(p + g1)(p + g2) − y1·g1·(p + g2) − y2·g2·(p + g1)] = 0, w = x·s + μ.
    /// </summary>
    private static void AddMachine(EdgePoints edges, OperationalSource machine, List<Complex> external, Clusters wanted)
    {
        double sum = machine.TransientRate + machine.SubtransientRate, product = machine.TransientRate * machine.SubtransientRate;
        var (constant, linear) = machine.OpenCircuit;
        foreach (var w in external)
        {
            double x = w.Imaginary, mu = w.Real;
            edges.AddRootsOf(
                atS: [product + x * constant, sum + x * linear, 1.0 + x], alone: [mu * constant, mu * linear, mu], wanted);
        }
    }

    /// <summary>A motor behind w: (ρ + s)·(p + g) + (x·s + μ)·p = 0.</summary>
    private void AddMotors(EdgePoints edges, double rho, List<Complex> external)
    {
        foreach (var rate in _limits.MotorRates)
        {
            foreach (var w in external)
                edges.AddRootsOf(atS: [rate, 1.0 + w.Imaginary], alone: [rho * rate, rho + w.Real], Clusters.Both);
        }
    }
}

/// <summary>Points of the edges of the region of one cluster.</summary>
/// <param name="Fit">Those that weights are fitted to.</param>
/// <param name="Check">More of them, at which the error is looked up.</param>
internal sealed record PolePoints(Complex[] Fit, Complex[] Check);

/// <summary>What bounds the places of a network's poles; each figure holds for the whole network.</summary>
internal sealed record PoleLimits
{
    /// <summary>The smallest R/X of the network: 0, or a little below where single resistances are negative.</summary>
    public double SmallestResistanceRatio { get; init; }

    /// <summary>The largest R/X of a branch, feeder or machine; infinite where one has no reactance.</summary>
    public required double LargestResistanceRatio { get; init; }

    /// <summary>Synchronous machines with time constants, those that differ.</summary>
    public required IReadOnlyList<OperationalSource> Machines { get; init; }

    /// <summary>The decay rates of the motors, those that differ.</summary>
    public required IReadOnlyList<double> MotorRates { get; init; }

    /// <summary>
    /// Whether the bounds of R/X hold for the network as a whole only, single elements having negative reactance or resistance.
    /// </summary>
    public bool HoldAsAWhole { get; init; }

    /// <summary>The part of a machine's or motor's own reactance that negative reactances about it leave at least; 1 where there are none.</summary>
    public double ReactanceLeft { get; init; } = 1.0;

    /// <summary>The largest R/X of a machine with time constants.</summary>
    public double LargestMachineResistanceRatio { get; init; }

    /// <summary>The largest R/X of a motor.</summary>
    public double LargestMotorResistanceRatio { get; init; }

    /// <summary>The limits with one more element of an R/X.</summary>
    public PoleLimits WithRatio(double ratio) => this with { LargestResistanceRatio = Math.Max(ratio, LargestResistanceRatio) };

    /// <summary>The limits for people.</summary>
    public override string ToString()
    {
        var rates = Machines.SelectMany(machine => new[] { machine.TransientRate, machine.SubtransientRate }).Concat(MotorRates).ToList();
        return FormattableString.Invariant($"R/X from {SmallestResistanceRatio:0.####} to {LargestResistanceRatio:0.###}")
            + FormattableString.Invariant($", time constants of machines from {1.0 / rates.DefaultIfEmpty().Max():0.#}/ω");
    }
}
