using System.Collections.Concurrent;
using System.Numerics;

namespace NetFault;

/// <summary>The AC and the DC component of one fault, per unit of the driving voltage: short sums over the samples of F = 1/(p·Zkk(p)).</summary>
internal sealed class DecayOfFault
{
    private readonly DecaySolution _solution;
    private readonly int _node;
    private readonly Complex _faultPu;
    private readonly ThroughView? _through;
    private readonly ConcurrentDictionary<DecayPart, Complex[]>? _own;     // null among the results at every bus, which share theirs

    /// <param name="solution">The study's quadratures.</param>
    /// <param name="seen">The place of the fault and the fault's own impedance.</param>
    public DecayOfFault(DecaySolution solution, in SeenImpedances seen)
    {
        _solution = solution.For(seen.FaultPu);
        _node = seen.Node;
        _faultPu = seen.FaultPu;
        _through = seen.Through;
        _own = seen.CoversEveryBus ? null : new ConcurrentDictionary<DecayPart, Complex[]>();
    }

    /// <summary>The AC component's phasor.</summary>
    /// <param name="angle">ω·t.</param>
    public Complex Ac(double angle)
    {
        var part = _solution.PartAt(angle);
        return Sum(part.WeightsAt(angle).Ac, part);
    }

    /// <summary>The DC component, in the rotating frame: e^(jωt) times it stands still.</summary>
    /// <param name="angle">ω·t.</param>
    public Complex Dc(double angle)
    {
        var part = _solution.PartAt(angle);
        return Sum(part.WeightsAt(angle).Dc, part);
    }

    /// <summary>The bound of the error of a time, relative to I″k.</summary>
    public NodeWeights WeightsAt(double angle) => _solution.PartAt(angle).WeightsAt(angle);

    private Complex Sum(Complex[] weights, DecayPart part)
    {
        var sum = Complex.Zero;
        if (_own is { } own)
        {
            var samples = own.GetOrAdd(part, one => _through?.Samples(one) ?? one.SamplesOf(_node, _faultPu));
            for (var q = 0; q < weights.Length; q++)
                sum += weights[q] * samples[q];
            return sum;
        }
        var everyNode = part.SamplesOfEveryNode();
        for (var q = 0; q < weights.Length; q++)
            sum += weights[q] * everyNode[q][_node];
        return sum;
    }
}
