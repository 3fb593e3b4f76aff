using System.Numerics;

namespace NetFault;

/// <summary>The machine decrement at work on one study: the decay over time is found when it is first asked for, once for all faults.</summary>
internal sealed class MachineDecrementAtWork : CurrentsOfMethod
{
    private readonly MachineDecrement _method;
    private readonly Lazy<DecaySolution> _quasiStatic;
    private readonly Lazy<DecaySolution> _exact;

    public MachineDecrementAtWork(MachineDecrement method, StudyNetworks networks)
    {
        _method = method;
        Omega = 2.0 * Math.PI * networks.Circuit.Network.FrequencyHz;
        _quasiStatic = new(() => Solution(networks, quasiStatic: true));
        _exact = new(() => Solution(networks, quasiStatic: false));
    }

    /// <summary>ω in rad/s.</summary>
    public double Omega { get; }

    /// <summary>ω times the horizon.</summary>
    public double HorizonAngle => Omega * _method.HorizonSeconds;

    /// <summary>What gives the AC component over time; null where it is held.</summary>
    public DecaySolution? AcSolution => _method.AcComponentRule switch
    {
        AcComponentRule.QuasiStatic => _quasiStatic.Value,
        AcComponentRule.Exact => _exact.Value,
        _ => null,
    };

    /// <summary>What gives the DC component; null where X/R does.</summary>
    public DecaySolution? DcSolution => _method.DcDecayRule == DcDecayRule.Exact ? _exact.Value : null;

    /// <summary>The exact solution, whatever the rules are: for comparing rules with it.</summary>
    public DecaySolution ExactSolution => _exact.Value;

    public override DcRuleComparison CompareDcRules(StudyContext context, double seconds, CancellationToken cancellation) =>
        DcRules.At(context, this, seconds, cancellation);

    public override FaultCurrents At(StudyContext context, int bus, in SeenImpedances seen) =>
        new MachineDecrementCurrents(this, context, context.Network.Buses[bus], seen);

    public override FlowBasis FlowsAt(StudyContext context, int bus, FaultInstant instant) =>
        FlowBasis.Of(context.Networks.At(instant), context.Method.DrivingVoltagePu(context.Network.Buses[bus]));

    public override AcComponentRule? AcRuleOfFlows => _method.AcComponentRule;

    public override IEnumerable<FlowBasis> FlowsAtTime(StudyContext context, int bus, double seconds, Complex faultPu)
    {
        if (AcSolution?.For(faultPu) is not { } solution)
            return [FlowsAt(context, bus, FaultInstant.Initial)];
        var angle = AngleOf(seconds);
        var part = solution.PartAt(angle);
        var weights = part.WeightsAt(angle).Ac;
        var voltage = context.Method.DrivingVoltagePu(context.Network.Buses[bus]);
        return part.Rule.Nodes.Select((node, q) =>
            new FlowBasis(solution.NetworkAt(node), voltage, weights[q] / node, []));
    }

    public override IReadOnlyList<DecayPart> PartsOverTime() =>
        new[] { AcSolution, DcSolution }.OfType<DecaySolution>().Distinct().SelectMany(solution => solution.PartsOfHorizon).ToList();

    /// <summary>ω·t of a time within the horizon.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The time is beyond it.</exception>
    public double AngleOf(double seconds) => seconds <= _method.HorizonSeconds
        ? Omega * seconds
        : throw new ArgumentOutOfRangeException(nameof(seconds), seconds,
            FormattableString.Invariant($"is beyond the horizon of {_method.HorizonSeconds} s; set MachineDecrement.HorizonSeconds, up to 10 s"));

    private DecaySolution Solution(StudyNetworks networks, bool quasiStatic)
    {
        if (HorizonAngle > DecayWindow.LargestAngle)
        {
            throw CurrentOverTimeException.Because(
                FormattableString.Invariant($"a horizon of {_method.HorizonSeconds} s is too long at {networks.Circuit.Network.FrequencyHz} Hz"),
                FormattableString.Invariant($"set MachineDecrement.HorizonSeconds to {DecayWindow.LargestAngle / Omega:0.##} s or less"));
        }
        return new DecaySolution(networks, quasiStatic, HorizonAngle, _method.DecayErrorLimit);
    }
}
