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
    private volatile Complex[][]? _everyNode;

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

    /// <summary>Zkk per unit at each node of the quadrature, by node of the circuit; solved by the first who asks.</summary>
    /// <param name="step">Told after each node of the quadrature; may be null.</param>
    /// <param name="cancellation">Stops the work between nodes.</param>
    public Complex[][] EveryNode(Action? step = null, CancellationToken cancellation = default)
    {
        if (_everyNode is { } known)
            return known;
        lock (_gate)
            return _everyNode ??= OnAllCores(step, cancellation, point => _solution.NetworkAt(point).DrivingPoints.Impedances);
    }

    /// <summary>Zkk per unit of one node of the circuit at each node of the quadrature.</summary>
    public Complex[] ImpedancesOf(int node) => _everyNode is { } known
        ? Array.ConvertAll(known, impedances => impedances[node])
        : OnAllCores(null, CancellationToken.None, point => _solution.NetworkAt(point).Column(node, out _)[node]);

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
