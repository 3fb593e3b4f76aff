using System.Numerics;

namespace NetFault;

/// <summary>
/// What IEEE Std C37.010 gives at a fault beyond the quantities that all methods share. Immutable. Currents are RMS values in kA unless
/// they say otherwise; contact-parting times are in cycles of the rated frequency, from the beginning of the fault. The first-cycle
/// current and its X/R are <see cref="BusFault.InitialSymmetricalKa"/> and <see cref="BusFault.XOverR"/>.
/// </summary>
public sealed class IeeeC37Result
{
    private readonly IeeeC37Currents _currents;
    private readonly IeeeC37 _method;

    internal IeeeC37Result(IeeeC37Currents currents, FaultMethod method)
    {
        _currents = currents;
        _method = (IeeeC37)method;
    }

    /// <summary>Whether the symmetrical currents are E/Z or E/X.</summary>
    public IeeeCurrentRule CurrentRule => _method.CurrentRule;

    /// <summary>The symmetrical current of the interrupting network (1.5 to 4 cycles).</summary>
    public double InterruptingSymmetricalKa => _currents.CurrentKa(FaultInstant.Transient);

    /// <summary>
    /// The impedance at the fault in the interrupting network, with the fault's own, per unit on the base power and the bus's nominal
    /// voltage: Z, or jX where the currents are E/X.
    /// </summary>
    public Complex InterruptingImpedancePu => _currents.Impedance(FaultInstant.Transient);

    /// <summary>
    /// X/R of the interrupting network, from the network of the reactances and that of the resistances; null where there is none, and
    /// <see cref="InterruptingXOverRStatus"/> says why.
    /// </summary>
    public double? InterruptingXOverR => _currents.InterruptingRatio.XOverR;

    /// <summary>
    /// Whether X/R of the interrupting network is known, and if not, why; factors then take the DC component as undamped.
    /// </summary>
    public XOverRStatus InterruptingXOverRStatus => _currents.InterruptingRatio.Status;

    /// <summary>
    /// The symmetrical current of the 30-cycle network, for time-delayed relays: generators at x′d, no motors and no condensers; 0 where
    /// only such hold the bus.
    /// </summary>
    public double ThirtyCycleSymmetricalKa => _currents.CurrentKa(FaultInstant.SteadyState);

    /// <summary>What sources behind full-size converters add to the first-cycle current; it is in it.</summary>
    public double ConverterPartKa => _currents.InjectedKa(FaultInstant.Initial);

    /// <summary>The total RMS current at half a cycle: the first-cycle current times √(1 + 2·e^(−2π/(X/R))).</summary>
    public double FirstCycleAsymmetricalRmsKa => _currents.InitialSymmetricalKa * IeeeMultiplyingFactors.HalfCycleRms(FirstCycleXOverR);

    /// <summary>
    /// The close-and-latch peak by the multiplier alone, 2.6 times the first-cycle current, an instantaneous value; null where the exact
    /// peak (<see cref="BusFault.PeakKa"/>) is higher, at an X/R above about 17.5, for there the rule is not on the safe side.
    /// </summary>
    public double? PeakByMultiplierKa => CoveringKa(IeeeMultiplyingFactors.CloseAndLatchPeakMultiplier, _currents.PeakKa);

    /// <summary>
    /// The first-cycle total RMS current by the multiplier alone, 1.6 times the first-cycle current; null where
    /// <see cref="FirstCycleAsymmetricalRmsKa"/> is higher, at an X/R above about 25.
    /// </summary>
    public double? AsymmetricalRmsByMultiplierKa =>
        CoveringKa(IeeeMultiplyingFactors.CloseAndLatchRmsMultiplier, FirstCycleAsymmetricalRmsKa);

    /// <summary>
    /// Always false: the standard's curves with AC decrement, for faults fed by local generators, are not in this library. All faults
    /// take the remote factor, with DC decrement only, which is on the safe side.
    /// </summary>
    public bool AcDecrementCredited => false;

    /// <summary>
    /// The sources' contributions to the interrupting current, in the order of the network. Found when first asked for: each bus costs a
    /// solve, so that asking at every bus of a large network takes time.
    /// </summary>
    public IReadOnlyList<IeeeContribution> Contributions => _currents.Contributions.All;

    /// <summary>The share of local generators in the interrupting current, 0 to 1; costs what <see cref="Contributions"/> costs.</summary>
    public double LocalGeneratorShare => Share(IeeeContributionKind.LocalGenerator);

    /// <summary>
    /// The share of what has no AC decay by the standard: feeders, remote generators, converters; costs what <see cref="Contributions"/>
    /// costs.
    /// </summary>
    public double RemoteShare => Share(IeeeContributionKind.Feeder) + Share(IeeeContributionKind.RemoteGenerator)
        + Share(IeeeContributionKind.Converter);

    /// <summary>The share of motors; costs what <see cref="Contributions"/> costs.</summary>
    public double MotorShare => Share(IeeeContributionKind.Motor);

    /// <summary>
    /// The symmetrical current to interrupt at a contact-parting time: that of the interrupting network, or the first-cycle one before 1.5
    /// cycles. The 30-cycle network is never credited.
    /// </summary>
    /// <param name="contactPartingCycles">Contact-parting time in cycles, not negative.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative or not finite.</exception>
    public double SymmetricalToInterruptKa(double contactPartingCycles) =>
        _currents.ToInterrupt(Guard.NotNegative(contactPartingCycles)).SymmetricalKa;

    /// <summary>
    /// The remote multiplying factor (<see cref="IeeeMultiplyingFactors.Remote(double, double)"/>) from X/R of the network of that time.
    /// </summary>
    /// <param name="contactPartingCycles">Contact-parting time in cycles, not negative.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative or not finite.</exception>
    public double MultiplyingFactor(double contactPartingCycles) =>
        IeeeMultiplyingFactors.Remote(contactPartingCycles, XOverRToInterrupt(contactPartingCycles));

    /// <summary>
    /// The current to set beside a breaker's symmetrical interrupting capability: the symmetrical current times the multiplying factor.
    /// </summary>
    /// <param name="contactPartingCycles">Contact-parting time in cycles, not negative.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative or not finite.</exception>
    public double InterruptingDutyKa(double contactPartingCycles) =>
        SymmetricalToInterruptKa(contactPartingCycles) * MultiplyingFactor(contactPartingCycles);

    /// <summary>The total RMS current at a contact-parting time, with DC decrement only.</summary>
    /// <param name="contactPartingCycles">Contact-parting time in cycles, not negative.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative or not finite.</exception>
    public double TotalToInterruptKa(double contactPartingCycles) => SymmetricalToInterruptKa(contactPartingCycles)
        * IeeeMultiplyingFactors.TotalCurrent(contactPartingCycles, XOverRToInterrupt(contactPartingCycles));

    /// <summary>The multiplying factor of an unfused low-voltage breaker for the first-cycle current (IEEE Std C37.13).</summary>
    /// <param name="testXOverR">X/R at which the breaker was tested, above 0; 6.6, for power breakers, by default.</param>
    /// <exception cref="ArgumentOutOfRangeException">Not above 0.</exception>
    public double LowVoltageUnfusedFactor(double testXOverR = IeeeMultiplyingFactors.UnfusedTestXOverR) =>
        IeeeMultiplyingFactors.LowVoltageUnfused(FirstCycleXOverR, testXOverR);

    /// <summary>The multiplying factor of a fused low-voltage breaker for the first-cycle current (IEEE Std C37.13).</summary>
    /// <param name="testXOverR">X/R at which the breaker was tested, above 0; 4.9 by default.</param>
    /// <exception cref="ArgumentOutOfRangeException">Not above 0.</exception>
    public double LowVoltageFusedFactor(double testXOverR = IeeeMultiplyingFactors.FusedTestXOverR) =>
        IeeeMultiplyingFactors.LowVoltageFused(FirstCycleXOverR, testXOverR);

    /// <summary>A time in cycles of the network's rated frequency.</summary>
    internal double Cycles(double seconds) => _currents.Cycles(seconds);

    private double Share(IeeeContributionKind kind) => _currents.Contributions.ShareOf(kind);

    private double FirstCycleXOverR => Undamped(_currents.Ratio);

    private double XOverRToInterrupt(double cycles) => Undamped(_currents.ToInterrupt(Guard.NotNegative(cycles)).Ratio);

    private static double Undamped(in ReactanceRatio ratio) => ratio.XOverR ?? double.PositiveInfinity;

    private double? CoveringKa(double multiplier, double exactKa) =>
        multiplier * _currents.InitialSymmetricalKa is var byMultiplier && byMultiplier >= exactKa ? byMultiplier : null;
}
