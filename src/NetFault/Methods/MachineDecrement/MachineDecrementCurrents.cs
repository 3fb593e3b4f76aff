using System.Numerics;

namespace NetFault;

/// <summary>The currents of one fault by <see cref="MachineDecrement"/>.</summary>
internal sealed class MachineDecrementCurrents : FaultCurrents
{
    private readonly MachineDecrementAtWork _work;
    private readonly StudyContext _context;
    private readonly Bus _bus;
    private readonly SeenImpedances _seen;
    private DecayOfFault? _ac;      // made when first asked for; whoever comes at the same time makes an equal one
    private DecayOfFault? _dc;
    private PeakCurrent? _worstPeak;

    public MachineDecrementCurrents(MachineDecrementAtWork work, StudyContext context, Bus bus, in SeenImpedances seen)
    {
        _work = work;
        _context = context;
        _bus = bus;
        _seen = seen;
        InitialSymmetricalKa = context.CurrentKa(bus, seen[0]);
    }

    public override double InitialSymmetricalKa { get; }

    public override double? TransientKa => CurrentKa(MachineDecrement.Transient);

    public override double? SteadyStateKa => CurrentKa(MachineDecrement.SteadyState);

    public override Complex ImpedancePu => _seen[0];

    public override ReactanceRatio Ratio => RatioOf(Method, _seen);

    public override DcDecayRule DcDecayRule => Method.DcDecayRule == DcDecayRule.Exact ? DcDecayRule.Exact : base.DcDecayRule;

    public override AcComponentRule AcComponentRule => Method.AcComponentRule;

    public override double PeakKa => Method.DcDecayRule == DcDecayRule.Exact
        ? WorstPeak.Ka
        : InitialSymmetricalKa * (Ratio.XOverR is { } ratio ? PeakFactor.Of(ratio) : PeakFactor.Undamped);

    public override double Residual => _seen.Residual;

    public override double? InstantaneousKa(double seconds, double closingAngle) =>
        Waveform.InstantaneousKa(AngleOf(seconds, AcOfDecay ?? DcOfDecay), closingAngle);

    public override PeakCurrent WorstPeak => _worstPeak ??= Waveform.WorstPeak(AcOfDecay is null && DcOfDecay is null
        ? double.PositiveInfinity
        : _work.HorizonAngle);

    public override double SymmetricalRmsKa(double seconds) => Complex.Abs(Ac(AngleOf(seconds, AcOfDecay)));

    public override double DcComponentKa(double seconds) => PerUnit.Sqrt2 * Complex.Abs(Dc(AngleOf(seconds, DcOfDecay)));

    public override double ErrorBoundAt(double seconds) => Math.Max(
        AcOfDecay is { } ac ? ac.WeightsAt(AngleOf(seconds, ac)).AcError : 0.0,
        DcOfDecay is { } dc ? dc.WeightsAt(AngleOf(seconds, dc)).DcError : 0.0);

    public override double? DcOfPhaseKa(double seconds, double closingAngle) =>
        Waveform.DcOfPhaseKa(AngleOf(seconds, DcOfDecay), closingAngle);

    private CurrentWaveform Waveform => new(_context.Omega, Ac, Dc);

    private MachineDecrement Method => (MachineDecrement)_context.Method;

    private double VoltageKa => Method.PrefaultVoltagePu * _context.BaseKa(_bus);

    private DecayOfFault? AcOfDecay => _work.AcSolution is { } solution ? _ac ??= new DecayOfFault(solution, _seen) : null;

    private DecayOfFault? DcOfDecay => _work.DcSolution is { } solution ? _dc ??= new DecayOfFault(solution, _seen) : null;

    private double AngleOf(double seconds, DecayOfFault? decay) => decay is null ? _context.Omega * seconds : _work.AngleOf(seconds);

    private Complex Ac(double angle) => VoltageKa * (AcOfDecay?.Ac(angle) ?? 1.0 / _seen[0]);

    /// <summary>By X/R the DC component begins at −AC(0) and stands still in the frame at rest.</summary>
    private Complex Dc(double angle) => DcOfDecay is { } decay
        ? VoltageKa * decay.Dc(angle)
        : -VoltageKa / _seen[0] * Complex.Exp(new Complex(Ratio.XOverR is { } ratio ? -angle / ratio : 0.0, -angle));

    private double? CurrentKa(NetworkVariant variant) => _seen.Find(variant) is { } z ? _context.CurrentKa(_bus, z) : null;

    private static ReactanceRatio RatioOf(MachineDecrement method, in SeenImpedances seen) =>
        method.XOverRRule == XOverRRule.SeparateNetworks
            ? ReactanceRatio.Of(
                seen.Find(MachineDecrement.Resistances).GetValueOrDefault().Real,
                seen.Find(MachineDecrement.Reactances).GetValueOrDefault().Imaginary)
            : ReactanceRatio.Of(seen[0].Real, seen[0].Imaginary);
}
