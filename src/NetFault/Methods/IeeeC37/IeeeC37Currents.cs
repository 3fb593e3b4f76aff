using System.Numerics;

namespace NetFault;

/// <summary>The currents of one fault by <see cref="IeeeC37"/>.</summary>
internal sealed class IeeeC37Currents : FaultCurrents
{
    /// <summary>A time this many cycles before a network's own is rounding.</summary>
    private const double Rounding = 1e-9;

    private readonly IeeeC37AtWork _work;
    private readonly StudyContext _context;
    private readonly Bus _bus;
    private readonly SeenImpedances _seen;

    // Made when first asked for; two threads may make the same twice, and either is right.
    private IeeeContributions? _contributions;

    public IeeeC37Currents(IeeeC37AtWork work, StudyContext context, Bus bus, in SeenImpedances seen)
    {
        _work = work;
        _context = context;
        _bus = bus;
        _seen = seen;
        InitialSymmetricalKa = CurrentKa(FaultInstant.Initial);
    }

    /// <summary>The first-cycle current.</summary>
    public override double InitialSymmetricalKa { get; }

    public override double? TransientKa => null;

    public override double? SteadyStateKa => null;

    public override Complex ImpedancePu => Impedance(FaultInstant.Initial);

    /// <summary>X/R of the first-cycle network.</summary>
    public override ReactanceRatio Ratio => RatioOf(IeeeC37.FirstCycleReactances, IeeeC37.FirstCycleResistances);

    /// <summary>X/R of the interrupting network.</summary>
    public ReactanceRatio InterruptingRatio => RatioOf(IeeeC37.InterruptingReactances, IeeeC37.InterruptingResistances);

    public override AcComponentRule AcComponentRule => AcComponentRule.NetworkOfTime;

    public override double PeakKa => InitialSymmetricalKa * (Ratio.XOverR is { } ratio ? PeakFactor.Of(ratio) : PeakFactor.Undamped);

    public override double Residual => _seen.Residual;

    public override IeeeC37Result Ieee => new(this, _context.Method);

    /// <summary>The node.</summary>
    public int Node => _seen.Node;

    /// <summary>The sources' shares of the interrupting current.</summary>
    public IeeeContributions Contributions => _contributions ??= IeeeContributions.Of(_work, this);

    /// <summary>The impedance that drives the current of an instant's network: Z, or jX.</summary>
    public Complex Impedance(FaultInstant instant) => _seen.Find(_context.Method.NetworkAt(instant)).GetValueOrDefault();

    /// <summary>The symmetrical current of an instant's network in kA, with what sources of their own current add.</summary>
    public double CurrentKa(FaultInstant instant) =>
        instant == FaultInstant.SteadyState && !_work.IsHeldAtThirtyCycles(Node)
            ? 0.0
            : _context.CurrentKa(_bus, Impedance(instant)) + InjectedKa(instant);

    /// <summary>
    /// What sources of their own current add in an instant's network, in kA; through a device all that they add to the fault, for no more of it can
    /// come from one side.
    /// </summary>
    public double InjectedKa(FaultInstant instant) =>
        _work.Injected.At(Node, _context.Method.NetworkAt(instant))
        / Complex.Abs(_seen.Through?.Whole(_context.Method.NetworkAt(instant)) ?? Impedance(instant)) * _context.BaseKa(_bus);

    /// <summary>
    /// Current and X/R of what a breaker must interrupt: those of the first cycle before the interrupting network's time.
    /// </summary>
    public (double SymmetricalKa, ReactanceRatio Ratio) ToInterrupt(double cycles) => IsFirstCycle(cycles)
        ? (InitialSymmetricalKa, Ratio)
        : (CurrentKa(FaultInstant.Transient), InterruptingRatio);

    public override double DcComponentKa(double seconds)
    {
        var (symmetrical, ratio) = ToInterrupt(Cycles(seconds));
        return DcComponent.Ka(symmetrical, ratio, _context.Omega * seconds);
    }

    public override double SymmetricalRmsKa(double seconds)
    {
        var cycles = Cycles(seconds);
        return cycles < IeeeC37.ThirtyCycleFromCycles - Rounding ? ToInterrupt(cycles).SymmetricalKa : CurrentKa(FaultInstant.SteadyState);
    }

    private static bool IsFirstCycle(double cycles) => cycles < IeeeC37.InterruptingFromCycles - Rounding;

    /// <summary>A time in cycles.</summary>
    public double Cycles(double seconds) => seconds * _context.Network.FrequencyHz;

    private ReactanceRatio RatioOf(NetworkVariant reactances, NetworkVariant resistances) => ReactanceRatio.Of(
        _seen.Find(resistances).GetValueOrDefault().Real, _seen.Find(reactances).GetValueOrDefault().Imaginary);
}
