using System.Collections.Concurrent;
using System.Numerics;

namespace NetFault;

/// <summary>One window of a <see cref="DecaySolution"/>.</summary>
internal sealed class DecayPart
{
    /// <summary>More times than this are not kept; they are found anew each time.</summary>
    private const int MostTimes = 4096;

    private readonly DecaySolution _solution;
    private readonly Lazy<QuadratureRule> _rule;
    private readonly ConcurrentDictionary<double, NodeWeights> _weights = new();
    private readonly object _gate = new();
    private volatile Complex[][]? _samples;

    public DecayPart(DecaySolution solution, DecayWindow window)
    {
        _solution = solution;
        Window = window;
        _rule = new(() => solution.RuleOf(window));
    }

    /// <summary>The span of time.</summary>
    public DecayWindow Window { get; }

    /// <summary>The quadrature.</summary>
    public QuadratureRule Rule => _rule.Value;

    /// <summary>The weights of a time.</summary>
    /// <param name="angle">ω·t.</param>
    /// <exception cref="CurrentOverTimeException">The error bound is above what is accepted.</exception>
    public NodeWeights WeightsAt(double angle)
    {
        if (_weights.TryGetValue(angle, out var known))
            return known;
        var weights = Rule.At(angle);
        _solution.RefuseAbove(weights.Error);
        if (_weights.Count < MostTimes)
            _weights.TryAdd(angle, weights);
        return weights;
    }

    /// <summary>
    /// F = 1/(p·Zkk(p)) at each node p of the quadrature, by node of the circuit, for bolted faults; solved by the first who asks.
    /// </summary>
    /// <param name="step">Told after each node of the quadrature; may be null.</param>
    /// <param name="cancellation">Stops the work between nodes.</param>
    public Complex[][] SamplesOfEveryNode(Action? step = null, CancellationToken cancellation = default)
    {
        if (_samples is { } known)
            return known;
        lock (_gate)
        {
            return _samples ??= OnAllCores(step, cancellation, point =>
                Array.ConvertAll(_solution.NetworkAt(point).DrivingPoints.Impedances, z => 1.0 / (point * z)));
        }
    }

    /// <summary>F at each node of the quadrature, for one node of the circuit and a fault through an impedance.</summary>
    /// <param name="node">The node with the fault.</param>
    /// <param name="faultPu">The fault's own impedance per unit at rated frequency.</param>
    public Complex[] SamplesOf(int node, Complex faultPu)
    {
        if (_samples is { } known)
        {
            return Array.ConvertAll(Enumerable.Range(0, known.Length).ToArray(), q =>
                1.0 / (1.0 / known[q][node] + Rule.Nodes[q] * _solution.VariantAt(Rule.Nodes[q]).OfFault(faultPu)));
        }
        return OnAllCores(null, CancellationToken.None, point =>
            1.0 / (point * (_solution.NetworkAt(point).Column(node, out _)[node] + _solution.VariantAt(point).OfFault(faultPu))));
    }

    /// <summary>Something of the network at each node of the quadrature; the network itself is not kept.</summary>
    public T[] OfEveryNode<T>(Func<SolvedNetwork, T> work) => OnAllCores(null, CancellationToken.None, point => work(_solution.NetworkAt(point)));

    /// <summary>Does something at each node of the quadrature.</summary>
    private T[] OnAllCores<T>(Action? step, CancellationToken cancellation, Func<Complex, T> work)
    {
        var points = Rule.Nodes;
        var results = new T[points.Length];
        SideBySide.Run(points.Length, cancellation, i =>
        {
            results[i] = work(points[i]);
            step?.Invoke();
        });
        return results;
    }
}
