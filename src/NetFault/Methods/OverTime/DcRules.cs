using System.Numerics;

namespace NetFault;

/// <summary>Compares the rules for the DC component with the exact one, at every bus of a study by <see cref="MachineDecrement"/>.</summary>
internal sealed class DcRules
{
    private static readonly NetworkVariant AtPeakFrequency = new()
    {
        Name = "network for the peak at the equivalent frequency", FrequencyRatio = EquivalentFrequency.Peak,
    };

    private readonly StudyContext _context;
    private readonly MachineDecrementAtWork _work;
    private readonly double _angle;
    private readonly NetworkVariant _atDcFrequency;
    private readonly DrivingPointImpedances _initial, _reactances, _resistances, _peak, _dc;

    private DcRules(StudyContext context, MachineDecrementAtWork work, double seconds)
    {
        _context = context;
        _work = work;
        _angle = work.AngleOf(seconds);
        _atDcFrequency = new NetworkVariant
        {
            Name = "network for the DC component", FrequencyRatio = EquivalentFrequency.OfDcComponent(seconds * context.Network.FrequencyHz),
        };
        _initial = Seen(MachineDecrement.Initial);
        _reactances = Seen(MachineDecrement.Reactances);
        _resistances = Seen(MachineDecrement.Resistances);
        _peak = Seen(AtPeakFrequency);
        _dc = Seen(_atDcFrequency);
    }

    /// <summary>The comparison at a time.</summary>
    public static DcRuleComparison At(StudyContext context, MachineDecrementAtWork work, double seconds, CancellationToken cancellation)
    {
        foreach (var part in work.ExactSolution.PartsUpTo(work.AngleOf(seconds)))
            part.SamplesOfEveryNode(null, cancellation);
        var rules = new DcRules(context, work, seconds);
        var buses = new List<BusDcComparison>();
        for (var bus = 0; bus < context.Network.Buses.Count; bus++)
        {
            if (context.Networks.Circuit.NodeOfBus[bus] is >= 0 and var node)
                buses.Add(rules.AtBus(context.Network.Buses[bus], node));
        }
        return new DcRuleComparison(seconds, buses.AsReadOnly());
    }

    private DrivingPointImpedances Seen(NetworkVariant variant) => _context.Networks.Of(variant).DrivingPoints;

    private BusDcComparison AtBus(Bus bus, int node)
    {
        var decay = new DecayOfFault(_work.ExactSolution, new SeenImpedances([MachineDecrement.Initial], [_initial], node, node, Complex.Zero));
        var voltageKa = _context.Method.DrivingVoltagePu(bus) * _context.BaseKa(bus);
        var waveform = new CurrentWaveform(_context.Omega, angle => voltageKa * decay.Ac(angle), angle => voltageKa * decay.Dc(angle));
        var z = _initial.Impedances[node];
        var initial = voltageKa / Complex.Abs(z);
        var exact = PerUnit.Sqrt2 * Complex.Abs(waveform.Dc(_angle));
        var peak = waveform.WorstPeak(_work.HorizonAngle).Ka;
        DcRuleDifference Rule(XOverRRule rule, ReactanceRatio forDc, ReactanceRatio forPeak)
        {
            var dc = DcComponent.Ka(initial, forDc, _angle);
            var ip = initial * (forPeak.XOverR is { } ratio ? PeakFactor.Of(ratio) : PeakFactor.Undamped);
            return new DcRuleDifference(rule, forDc.XOverR, dc, 100.0 * (dc - exact) / (PerUnit.Sqrt2 * initial), ip, 100.0 * (ip / peak - 1.0));
        }

        var complex = ReactanceRatio.Of(z.Real, z.Imaginary);
        var separate = ReactanceRatio.Of(_resistances.Impedances[node].Real, _reactances.Impedances[node].Imaginary);
        return new BusDcComparison(bus.Id, initial, exact, peak, Array.AsReadOnly(new[]
        {
            Rule(XOverRRule.ComplexImpedance, complex, complex),
            Rule(XOverRRule.SeparateNetworks, separate, separate),
            Rule(XOverRRule.EquivalentFrequency,
                EquivalentFrequency.Ratio(_dc.Impedances[node], _atDcFrequency.FrequencyRatio),
                EquivalentFrequency.Ratio(_peak.Impedances[node], EquivalentFrequency.Peak)),
        }));
    }
}
