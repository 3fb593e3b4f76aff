using System.Numerics;

namespace NetFault;

/// <summary>The currents of one fault by <see cref="MachineDecrement"/>.</summary>
internal sealed class MachineDecrementCurrents : FaultCurrents
{
    private readonly StudyContext _context;
    private readonly Bus _bus;
    private readonly SeenImpedances _seen;

    public MachineDecrementCurrents(StudyContext context, Bus bus, in SeenImpedances seen)
    {
        _context = context;
        _bus = bus;
        _seen = seen;
        InitialSymmetricalKa = context.CurrentKa(bus, seen[0]);
    }

    public override double InitialSymmetricalKa { get; }

    public override double? TransientKa => CurrentKa(MachineDecrement.Transient);

    public override double? SteadyStateKa => CurrentKa(MachineDecrement.SteadyState);

    public override Complex ImpedancePu => _seen[0];

    public override ReactanceRatio Ratio => RatioOf((MachineDecrement)_context.Method, _seen);

    public override AcComponentRule AcComponentRule => AcComponentRule.HeldAtInitial;

    public override double PeakKa => InitialSymmetricalKa * (Ratio.XOverR is { } ratio ? PeakFactor.Of(ratio) : PeakFactor.Undamped);

    public override double Residual => _seen.Residual;

    public override double DcComponentKa(double seconds) => DcComponent.Ka(InitialSymmetricalKa, Ratio, _context.Omega * seconds);

    public override double SymmetricalRmsKa(double seconds) => InitialSymmetricalKa;

    private double? CurrentKa(NetworkVariant variant) => _seen.Find(variant) is { } z ? _context.CurrentKa(_bus, z) : null;

    private static ReactanceRatio RatioOf(MachineDecrement method, in SeenImpedances seen) =>
        method.XOverRRule == XOverRRule.SeparateNetworks
            ? ReactanceRatio.Of(
                seen.Find(MachineDecrement.Resistances).GetValueOrDefault().Real,
                seen.Find(MachineDecrement.Reactances).GetValueOrDefault().Imaginary)
            : ReactanceRatio.Of(seen[0].Real, seen[0].Imaginary);
}
