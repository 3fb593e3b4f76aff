using System.Numerics;

namespace NetFault;

/// <summary>
/// A three-phase short circuit at one bus: its currents, how they come about, and what they rest on. Immutable. Currents are RMS values of
/// a phase in kA unless they say otherwise.
/// </summary>
public sealed class BusFault
{
    private readonly StudyContext _context;
    private readonly int _bus;
    private readonly FaultCurrents? _currents;

    internal BusFault(StudyContext context, int bus, in SeenImpedances seen, Complex faultImpedanceOhm)
    {
        _context = context;
        _bus = bus;
        _currents = context.Currents.At(context, bus, seen);
        FaultImpedanceOhm = faultImpedanceOhm;
    }

    private BusFault(StudyContext context, int bus)
    {
        _context = context;
        _bus = bus;
    }

    /// <summary>The bus at which the fault is.</summary>
    public Bus Bus => _context.Network.Buses[_bus];

    /// <summary>The bus's id.</summary>
    public string BusId => Bus.Id;

    /// <summary>The bus's nominal voltage in kV.</summary>
    public double NominalKv => Bus.NominalKv;

    /// <summary>False where the bus has no path to a source: then all currents are 0 and there is no impedance.</summary>
    public bool IsEnergised => _currents is not null;

    /// <summary>The initial symmetrical short-circuit current I″k: the AC component at the beginning.</summary>
    public double InitialSymmetricalKa => _currents?.InitialSymmetricalKa ?? 0.0;

    /// <summary>The transient short-circuit current I′k: the AC component after the subtransient decay; null where it was not asked for.</summary>
    public double? TransientKa => _currents is null ? ZeroIf(FaultInstants.Transient) : _currents.TransientKa;

    /// <summary>The steady-state short-circuit current Ik, at constant excitation; null where it was not asked for.</summary>
    public double? SteadyStateKa => _currents is null ? ZeroIf(FaultInstants.SteadyState) : _currents.SteadyStateKa;

    /// <summary>The short-circuit power S″k = √3·Un·I″k in MVA.</summary>
    public double ShortCircuitMva => PerUnit.Sqrt3 * NominalKv * InitialSymmetricalKa;

    /// <summary>
    /// The short-circuit impedance Zk at the beginning, with the fault's own impedance, per unit on the network's base power and the bus's
    /// nominal voltage; null at a de-energised bus.
    /// </summary>
    public Complex? ImpedancePu => _currents?.ImpedancePu;

    /// <summary>The short-circuit impedance Zk in ohm; null at a de-energised bus.</summary>
    public Complex? ImpedanceOhm => _currents?.ImpedancePu * _context.BaseOhm(Bus);

    /// <summary>The impedance of the fault itself in ohm; 0 for a bolted fault.</summary>
    public Complex FaultImpedanceOhm { get; }

    /// <summary>
    /// X/R at the fault by <see cref="XOverRRule"/>, by which the peak is found; by IEC 60909-0 machines have their fictitious resistance in it;
    /// null where there is none, and <see cref="XOverRStatus"/> says why.
    /// </summary>
    public double? XOverR => Ratio.XOverR;

    /// <summary>Whether X/R is known, and if not, why.</summary>
    public XOverRStatus XOverRStatus => Ratio.Status;

    /// <summary>The rule by which X/R was found.</summary>
    public XOverRRule XOverRRule => _context.Method.RatioRule;

    /// <summary>How the DC component is taken to decay.</summary>
    public DcDecayRule DcDecayRule => _currents?.DcDecayRule ?? DcDecayRule.NoCurrent;

    /// <summary>How the AC component is taken over time.</summary>
    public AcComponentRule AcComponentRule => _currents?.AcComponentRule ?? AcComponentRule.HeldAtInitial;

    /// <summary>
    /// The peak short-circuit current ip, an instantaneous value in kA. By <see cref="MachineDecrement"/> with the DC component by X/R the exact
    /// maximum over time for a fault at voltage zero, the AC component held at I″k, 2√2·I″k where the DC component is undamped; with the exact DC
    /// component that of <see cref="WorstPeak"/>; by <see cref="NetFault.IeeeC37"/> as the first, of the first-cycle current; by
    /// <see cref="NetFault.Iec60909"/> κ·√2·I″k.
    /// </summary>
    public double PeakKa => _currents?.PeakKa ?? 0.0;

    /// <summary>
    /// How good the solutions behind this result are: the largest residual of the network's equations, or what rounding of the admittances
    /// alone may cost where that is more; about 1e-15 to 1e-12 for good ones. A tiny impedance beside a very large one costs digits.
    /// </summary>
    public double SolutionResidual => _currents?.Residual ?? 0.0;

    /// <summary>What this result rests on that the network does not say: the assumed values of its connected part of the network.</summary>
    public IReadOnlyList<Assumption> Assumptions => IsEnergised ? _context.Assumptions.OfBus(_bus) : [];

    /// <summary>
    /// What IEC 60909-0 gives beyond these: breaking currents, thermal equivalent, factors, contributions; null by another method and at a
    /// de-energised bus.
    /// </summary>
    public Iec60909Result? Iec60909 => _currents?.Standard;

    /// <summary>
    /// What IEEE Std C37.010 gives beyond these: interrupting and 30-cycle currents, multiplying factors, contributions; null by another
    /// method and at a de-energised bus.
    /// </summary>
    public IeeeC37Result? IeeeC37 => _currents?.Ieee;

    /// <summary>Whether this is a result of a study.</summary>
    internal bool IsOf(StudyContext context) => ReferenceEquals(_context, context);

    private ReactanceRatio Ratio => _currents?.Ratio ?? new ReactanceRatio(null, XOverRStatus.DeEnergised);

    /// <summary>
    /// The largest instantaneous current over time and closing angle, with the components as <see cref="AcComponentRule"/> and
    /// <see cref="DcDecayRule"/> say; null by a method that gives no waveform, as IEC 60909-0, and at a de-energised bus.
    /// </summary>
    /// <exception cref="CurrentOverTimeException">The current over time cannot be found within the error that the method accepts.</exception>
    public PeakCurrent? WorstPeak => _currents?.WorstPeak;

    /// <summary>
    /// The DC component i_dc(t) of the phase with the largest one, in kA, an instantaneous value: √2·I″k·e^(−ω·t/(X/R)), undamped where there
    /// is no X/R; or, as <see cref="DcDecayRule"/> says, the exact one, at each time that of the closing angle which makes it largest. By IEC 60909-0
    /// the X/R is that of the equivalent frequency for the time, and what full-size converters add has no DC component. By IEEE Std C37.010 current
    /// and X/R are those of the first-cycle network before 1.5 cycles, then of the interrupting one.
    /// </summary>
    /// <param name="seconds">The time after the beginning of the fault in seconds, not negative; with the exact rule within the horizon.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative, not finite or beyond the method's horizon.</exception>
    /// <exception cref="CurrentOverTimeException">The current over time cannot be found within the error that the method accepts.</exception>
    public double DcComponentKa(double seconds)
    {
        Guard.NotNegative(seconds);
        return _currents?.DcComponentKa(seconds) ?? 0.0;
    }

    /// <summary>
    /// The RMS value of the AC component in kA, as <see cref="AcComponentRule"/> says: decaying with the machines, or held at I″k; by IEC
    /// 60909-0 the breaking current Ib of this minimum time delay; by IEEE Std C37.010 the current of the time's network.
    /// </summary>
    /// <param name="seconds">The time after the beginning of the fault in seconds, not negative; within the horizon where the rule has one.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative, not finite or beyond the method's horizon.</exception>
    /// <exception cref="CurrentOverTimeException">The current over time cannot be found within the error that the method accepts.</exception>
    public double SymmetricalRmsKa(double seconds)
    {
        Guard.NotNegative(seconds);
        return _currents?.SymmetricalRmsKa(seconds) ?? 0.0;
    }

    /// <summary>
    /// The instantaneous current in kA of the phase whose voltage is √2·U·sin(ωt + closing angle) when the fault begins; the two other phases are
    /// those of 120 degrees less and more. The worst phase is the one whose angle is that of <see cref="WorstPeak"/>.
    /// </summary>
    /// <param name="seconds">The time after the beginning of the fault in seconds, not negative; within the horizon where a rule has one.</param>
    /// <param name="closingAngleDegrees">The closing angle in degrees; 0 is a voltage zero.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative, not finite or beyond the method's horizon; or the angle is not finite.</exception>
    /// <exception cref="NotSupportedException">The method gives no waveform, as IEC 60909-0.</exception>
    /// <exception cref="CurrentOverTimeException">The current over time cannot be found within the error that the method accepts.</exception>
    public double InstantaneousKa(double seconds, double closingAngleDegrees)
    {
        Guard.NotNegative(seconds);
        Guard.Finite(closingAngleDegrees);
        return _currents is null ? 0.0 : Waveform(_currents.InstantaneousKa(seconds, closingAngleDegrees * Math.PI / 180.0));
    }

    /// <summary>
    /// The instantaneous current in kA of the worst of the three phases: the one that carries the most at that time, when the fault begins with the
    /// voltage of one of them at the closing angle and of the others 120 degrees before and behind.
    /// </summary>
    /// <param name="seconds">The time after the beginning of the fault in seconds, not negative; within the horizon where a rule has one.</param>
    /// <param name="closingAngleDegrees">The closing angle of any of the phases in degrees; 0 is a voltage zero.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative, not finite or beyond the method's horizon; or the angle is not finite.</exception>
    /// <exception cref="NotSupportedException">The method gives no waveform, as IEC 60909-0.</exception>
    /// <exception cref="CurrentOverTimeException">The current over time cannot be found within the error that the method accepts.</exception>
    public double WorstPhaseKa(double seconds, double closingAngleDegrees)
    {
        var worst = InstantaneousKa(seconds, closingAngleDegrees);
        foreach (var shift in new[] { -120.0, 120.0 })
        {
            var other = InstantaneousKa(seconds, closingAngleDegrees + shift);
            worst = Math.Abs(other) > Math.Abs(worst) ? other : worst;
        }
        return worst;
    }

    /// <summary>
    /// The DC component in kA, with its sign, of the phase whose voltage is √2·U·sin(ωt + closing angle) when the fault begins: what
    /// <see cref="InstantaneousKa"/> has beside the AC component √2·Iac·sin(ωt + closing angle − φ).
    /// </summary>
    /// <param name="seconds">The time after the beginning of the fault in seconds, not negative; within the horizon where a rule has one.</param>
    /// <param name="closingAngleDegrees">The closing angle in degrees; 0 is a voltage zero.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative, not finite or beyond the method's horizon; or the angle is not finite.</exception>
    /// <exception cref="NotSupportedException">The method gives no waveform, as IEC 60909-0.</exception>
    /// <exception cref="CurrentOverTimeException">The current over time cannot be found within the error that the method accepts.</exception>
    public double DcComponentKa(double seconds, double closingAngleDegrees)
    {
        Guard.NotNegative(seconds);
        Guard.Finite(closingAngleDegrees);
        return _currents is null ? 0.0 : Waveform(_currents.DcOfPhaseKa(seconds, closingAngleDegrees * Math.PI / 180.0));
    }

    /// <summary>
    /// A bound of the error of <see cref="SymmetricalRmsKa"/> and <see cref="DcComponentKa(double)"/> at a time, relative to I″k: that of the quadrature,
    /// found from the network's data before anything is solved (docs/current-over-time.md); 0 where closed formulas give both.
    /// </summary>
    /// <param name="seconds">The time after the beginning of the fault in seconds, not negative; within the horizon where a rule has one.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative, not finite or beyond the method's horizon.</exception>
    /// <exception cref="CurrentOverTimeException">The bound is above what the method accepts.</exception>
    public double DecayErrorBound(double seconds)
    {
        Guard.NotNegative(seconds);
        return _currents?.ErrorBoundAt(seconds) ?? 0.0;
    }

    /// <summary>The asymmetrical (total) RMS value √(Iac² + i_dc²) in kA.</summary>
    /// <param name="seconds">The time after the beginning of the fault in seconds, not negative.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative or not finite.</exception>
    public double AsymmetricalRmsKa(double seconds)
    {
        double ac = SymmetricalRmsKa(seconds), dc = DcComponentKa(seconds);
        return Math.Sqrt(ac * ac + dc * dc);
    }

    /// <summary>The bus with its initial current, for people.</summary>
    public override string ToString() => FormattableString.Invariant($"{BusId}: I\u2033k = {InitialSymmetricalKa:0.###} kA");

    internal static BusFault DeEnergised(StudyContext context, int bus) => new(context, bus);

    private double Waveform(double? value) =>
        value ?? throw new NotSupportedException($"{_context.Method.Name} gives no waveform; take MachineDecrement");

    private double? ZeroIf(FaultInstants instant) => _context.Method.CalculatedInstants.HasFlag(instant) ? 0.0 : null;
}
