namespace NetFault;

/// <summary>
/// What IEC 60909-0:2016 gives at a fault beyond the quantities that all methods share, with the factors and rules it came by. Immutable.
/// </summary>
public sealed class Iec60909Result
{
    private readonly Iec60909Currents _currents;
    private readonly StudyContext _context;

    internal Iec60909Result(Iec60909Currents currents, StudyContext context)
    {
        _currents = currents;
        _context = context;
    }

    /// <summary>The voltage factor c of table 1.</summary>
    public double VoltageFactor => _context.Method.DrivingVoltagePu(_currents.Bus);

    /// <summary>The factor κ of the peak current; the margin 1.15 of method (b) is in it where that applies.</summary>
    public double Kappa => _currents.Kappa;

    /// <summary>The rule by which the breaking current is found here.</summary>
    public BreakingCurrentRule BreakingCurrentRule => _currents.Breaking.Rule;

    /// <summary>The rule by which the steady-state current was found here.</summary>
    public SteadyStateCurrentRule SteadyStateCurrentRule => _currents.SteadyState.Rule;

    /// <summary>Whether asynchronous motors were left out here as small (<see cref="Iec60909.LeaveOutSmallMotors"/>).</summary>
    public bool MotorsLeftOut => _currents.MotorsLeftOut;

    /// <summary>What sources behind full-size converters add to the initial current in kA; it is in <see cref="BusFault.InitialSymmetricalKa"/>.</summary>
    public double ConverterPartKa => _currents.ConverterPartKa;

    /// <summary>
    /// The machines that feed this fault with more than twice their rated current, which alone have a decrement, and converter-fed drives, which
    /// do not contribute to Ib.
    /// </summary>
    public IReadOnlyList<MachineShare> Machines => _currents.Breaking.Machines();

    /// <summary>The symmetrical breaking current Ib in kA (clause 10).</summary>
    /// <param name="minimumTimeDelaySeconds">tmin in seconds, at least 0.02.</param>
    /// <exception cref="ArgumentOutOfRangeException">The delay is shorter than the standard's curves go, or not finite.</exception>
    /// <exception cref="MethodDataException">A motor that counts does not give its pole pairs.</exception>
    public double BreakingKa(double minimumTimeDelaySeconds)
    {
        if (!(minimumTimeDelaySeconds >= DecrementFactors.ShortestDelaySeconds) || double.IsInfinity(minimumTimeDelaySeconds))
        {
            throw new ArgumentOutOfRangeException(
                nameof(minimumTimeDelaySeconds), minimumTimeDelaySeconds, "IEC 60909-0 gives no breaking current below a minimum time delay of 0.02 s");
        }
        return _currents.Breaking.Ka(minimumTimeDelaySeconds);
    }

    /// <summary>The asymmetrical breaking current √(Ib² + i_dc²) in kA, at the same instant.</summary>
    /// <param name="minimumTimeDelaySeconds">tmin in seconds, at least 0.02.</param>
    /// <exception cref="ArgumentOutOfRangeException">The delay is shorter than the standard's curves go, or not finite.</exception>
    /// <exception cref="MethodDataException">A motor that counts does not give its pole pairs.</exception>
    public double AsymmetricalBreakingKa(double minimumTimeDelaySeconds)
    {
        double symmetrical = BreakingKa(minimumTimeDelaySeconds), dc = _currents.DcComponentKa(minimumTimeDelaySeconds);
        return Math.Sqrt(symmetrical * symmetrical + dc * dc);
    }

    /// <summary>The thermal equivalent short-circuit current Ith = I″k·√(m + n) in kA (clause 12).</summary>
    /// <param name="durationSeconds">Tk in seconds, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">The duration is not a finite number above 0.</exception>
    public double ThermalEquivalentKa(double durationSeconds) =>
        _currents.InitialSymmetricalKa * Math.Sqrt(FactorM(durationSeconds) + FactorN(durationSeconds));

    /// <summary>The factor m for the heat of the DC component.</summary>
    /// <param name="durationSeconds">Tk in seconds, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">The duration is not a finite number above 0.</exception>
    public double FactorM(double durationSeconds) =>
        ThermalFactors.M(Kappa, Guard.Positive(durationSeconds) * _context.Network.FrequencyHz);

    /// <summary>The factor n for the heat of the AC component; 1 where I″k/Ik is below 1.25, the smallest for which the standard has a curve.</summary>
    /// <param name="durationSeconds">Tk in seconds, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">The duration is not a finite number above 0.</exception>
    public double FactorN(double durationSeconds) =>
        ThermalFactors.N(_currents.InitialSymmetricalKa / _currents.SteadyState.Ka, Guard.Positive(durationSeconds));

    /// <summary>The equivalent frequency over the rated one, fc/f, by which the DC component at an instant is found (clause 9).</summary>
    /// <param name="seconds">The time after the beginning of the fault in seconds, not negative.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative or not finite.</exception>
    public double DcFrequencyRatio(double seconds) =>
        EquivalentFrequency.OfDcComponent(Guard.NotNegative(seconds) * _context.Network.FrequencyHz);
}
