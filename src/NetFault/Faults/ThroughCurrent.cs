using System.Numerics;

namespace NetFault;

/// <summary>On which side of a device a fault is.</summary>
public enum FaultSide
{
    /// <summary>At the device's bus: through the device flows what the element that it feeds, or the far side of the coupler, contributes.</summary>
    AtBus,

    /// <summary>Just beyond the device, before the element that it feeds: through the device flows all that the others contribute.</summary>
    BeyondDevice,
}

/// <summary>
/// The current that flows through a device during a three-phase short circuit just beside it. Immutable. Currents are RMS values of a phase in kA
/// unless they say otherwise; they come from the study's method, for the part of the fault current that flows there.
/// </summary>
public sealed class ThroughCurrent
{
    private readonly StudyContext _context;
    private readonly int _bus;
    private readonly ThroughView? _through;
    private readonly FaultCurrents? _currents;

    internal ThroughCurrent(StudyContext context, int bus, ThroughView? through, FaultSide side, bool isWhole)
    {
        _context = context;
        _bus = bus;
        _through = through;
        Side = side;
        IsWhole = isWhole;
        if (through is not null)
            _currents = context.Currents.At(context, bus, new SeenImpedances(context.Method.Networks, through));
    }

    /// <summary>Where the fault is.</summary>
    public FaultSide Side { get; }

    /// <summary>The device's bus.</summary>
    public string BusId => _context.Network.Buses[_bus].Id;

    /// <summary>False where there is no path to a source: then all currents are 0.</summary>
    public bool IsEnergised => _currents is not null;

    /// <summary>
    /// Whether the device carries the whole current of the fault: nothing comes from the other side, or it stands in a ring of couplers, in which the
    /// current divides by impedances that are not known and the whole is taken.
    /// </summary>
    public bool IsWhole { get; }

    /// <summary>
    /// The part of the initial fault current that flows through the device, 1 being the whole; a complex number, for the parts are not in phase. What
    /// full-size converters feed is not in it.
    /// </summary>
    public Complex Share => _through?.Share(_context.Method.NetworkAt(FaultInstant.Initial)) ?? Complex.Zero;

    /// <summary>The initial symmetrical current I″k through the device.</summary>
    public double InitialSymmetricalKa => _currents?.InitialSymmetricalKa ?? 0.0;

    /// <summary>X/R of this current by the rule of the study's method; null where there is none, and <see cref="XOverRStatus"/> says why.</summary>
    public double? XOverR => _currents?.Ratio.XOverR;

    /// <summary>Whether X/R is known, and if not, why; without one the DC component is taken as undamped.</summary>
    public XOverRStatus XOverRStatus => _currents?.Ratio.Status ?? XOverRStatus.DeEnergised;

    /// <summary>The peak through the device, an instantaneous value in kA, by the rule of <see cref="BusFault.PeakKa"/>.</summary>
    /// <exception cref="CurrentOverTimeException">The current over time cannot be found within the error that the method accepts.</exception>
    public double PeakKa => _currents?.PeakKa ?? 0.0;

    /// <summary>The DC component through the device, by the rule of <see cref="BusFault.DcComponentKa(double)"/>.</summary>
    /// <param name="seconds">The time after the beginning of the fault in seconds, not negative; within the horizon where a rule has one.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative, not finite or beyond the method's horizon.</exception>
    /// <exception cref="CurrentOverTimeException">The current over time cannot be found within the error that the method accepts.</exception>
    public double DcComponentKa(double seconds)
    {
        Guard.NotNegative(seconds);
        return _currents?.DcComponentKa(seconds) ?? 0.0;
    }

    /// <summary>
    /// The AC component through the device, by the rule of <see cref="BusFault.SymmetricalRmsKa"/>. By IEC 60909-0, which gives Ib at the fault alone,
    /// I″k through the device without decrement, but not more than Ib of the whole fault.
    /// </summary>
    /// <param name="seconds">The time after the beginning of the fault in seconds, not negative; within the horizon where a rule has one.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative, not finite or beyond the method's horizon.</exception>
    /// <exception cref="CurrentOverTimeException">The current over time cannot be found within the error that the method accepts.</exception>
    public double SymmetricalRmsKa(double seconds)
    {
        Guard.NotNegative(seconds);
        return _currents?.SymmetricalRmsKa(seconds) ?? 0.0;
    }

    /// <summary>The asymmetrical (total) RMS value √(Iac² + i_dc²) through the device.</summary>
    /// <param name="seconds">The time after the beginning of the fault in seconds, not negative; within the horizon where a rule has one.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative, not finite or beyond the method's horizon.</exception>
    /// <exception cref="CurrentOverTimeException">The current over time cannot be found within the error that the method accepts.</exception>
    public double AsymmetricalRmsKa(double seconds)
    {
        double ac = SymmetricalRmsKa(seconds), dc = DcComponentKa(seconds);
        return Math.Sqrt(ac * ac + dc * dc);
    }

    /// <summary>
    /// The thermal equivalent current Ith through the device: I″k·√(m + 1) with the AC component held at I″k and m of the DC component by X/R; by IEC
    /// 60909-0 with its m and n.
    /// </summary>
    /// <param name="durationSeconds">The duration Tk in seconds, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">The duration is not a finite number above 0.</exception>
    public double ThermalEquivalentKa(double durationSeconds)
    {
        Guard.Positive(durationSeconds);
        return _currents?.ThermalEquivalentKa(durationSeconds, _context.Omega) ?? 0.0;
    }

    /// <summary>How good the solutions behind this are, as <see cref="BusFault.SolutionResidual"/> says.</summary>
    public double SolutionResidual => _currents?.Residual ?? 0.0;

    /// <summary>The side with the current, for people.</summary>
    public override string ToString() => FormattableString.Invariant(
        $"{(Side == FaultSide.AtBus ? "fault at" : "fault beyond the device at")} {BusId}: I\u2033k through = {InitialSymmetricalKa:0.###} kA");
}

/// <summary>The currents through one device, for a fault on either side of it.</summary>
/// <param name="AtBus">For a fault at the device's bus.</param>
/// <param name="BeyondDevice">For a fault just beyond the device.</param>
public sealed record DeviceCurrents(ThroughCurrent AtBus, ThroughCurrent BeyondDevice);
