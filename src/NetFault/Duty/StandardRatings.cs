namespace NetFault;

/// <summary>
/// What standards say of ratings that belong together. All from memory of the standards: IEC 62271-100, IEC 62271-1, IEC 60947-2 table 2 and 11, IEC
/// 61439-1 table 7, IEEE C37.04, C37.010, C37.013.
/// </summary>
public static class StandardRatings
{
    /// <summary>The standard time constant of the DC component in seconds, of IEC 62271-100: X/R of 14.1 at 50 Hz, 17 at 60 Hz.</summary>
    public const double StandardTimeConstantSeconds = 0.045;

    /// <summary>The time constant of the DC component from the system source in seconds, of IEC/IEEE 62271-37-013.</summary>
    public const double GeneratorBreakerTimeConstantSeconds = 0.133;

    /// <summary>The DC component of the generator-source breaking current in percent of the AC component's peak, IEEE C37.013.</summary>
    public const double GeneratorSourceDcPercent = 110.0;

    /// <summary>The making current over the breaking current of a generator circuit-breaker, IEC/IEEE 62271-37-013.</summary>
    public const double GeneratorBreakerMakingFactor = 2.74;

    /// <summary>
    /// The rated making current over the rated breaking current of IEC 62271-100: 2.5 up to 50 Hz and 2.6 at 60 Hz with a time constant of 45 ms, 2.7
    /// with a longer one. The same stand between peak and short-time withstand current of IEC 62271-1.
    /// </summary>
    /// <param name="frequencyHz">The rated frequency in Hz, above 0.</param>
    /// <param name="timeConstantSeconds">The time constant of the DC component in seconds, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value is not a finite number above 0.</exception>
    public static double MakingFactor(double frequencyHz, double timeConstantSeconds = StandardTimeConstantSeconds)
    {
        Guard.Positive(frequencyHz);
        if (Guard.Positive(timeConstantSeconds) > StandardTimeConstantSeconds * (1.0 + 1e-9))
            return 2.7;
        return frequencyHz > 50.0 ? 2.6 : 2.5;
    }

    /// <summary>X/R of a time constant of the DC component: ω·τ.</summary>
    /// <param name="timeConstantSeconds">τ in seconds, above 0.</param>
    /// <param name="frequencyHz">The frequency in Hz, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value is not a finite number above 0.</exception>
    public static double XOverROfTimeConstant(double timeConstantSeconds, double frequencyHz) =>
        2.0 * Math.PI * Guard.Positive(frequencyHz) * Guard.Positive(timeConstantSeconds);

    /// <summary>X/R of a power factor: √(1/cos²φ − 1).</summary>
    /// <param name="powerFactor">cos φ, above 0 and at most 1.</param>
    /// <exception cref="ArgumentOutOfRangeException">Not above 0, or above 1.</exception>
    public static double XOverROfPowerFactor(double powerFactor) => powerFactor is > 0.0 and <= 1.0
        ? Math.Sqrt(1.0 / (powerFactor * powerFactor) - 1.0)
        : throw new ArgumentOutOfRangeException(nameof(powerFactor), powerFactor, "must be above 0 and at most 1");

    /// <summary>The power factor at which a breaking capacity of IEC 60947-2 is tested (table 11).</summary>
    /// <param name="breakingCapacityKa">Icu or Ics in kA, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">Not a finite number above 0.</exception>
    public static double LowVoltageTestPowerFactor(double breakingCapacityKa) => Guard.Positive(breakingCapacityKa) switch
    {
        <= 1.5 => 0.95,
        <= 3.0 => 0.9,
        <= 4.5 => 0.8,
        <= 6.0 => 0.7,
        <= 10.0 => 0.5,
        <= 20.0 => 0.3,
        <= 50.0 => 0.25,
        _ => 0.2,
    };

    /// <summary>
    /// The peak over the RMS current that goes with a low-voltage short-circuit current: n of IEC 60947-2 table 2 (making over breaking capacity) and
    /// of IEC 61439-1 table 7.
    /// </summary>
    /// <param name="currentKa">The RMS current in kA, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">Not a finite number above 0.</exception>
    public static double LowVoltagePeakFactor(double currentKa) => Guard.Positive(currentKa) switch
    {
        <= 1.5 => 1.41,
        <= 3.0 => 1.42,
        <= 4.5 => 1.47,
        <= 6.0 => 1.5,
        <= 10.0 => 1.7,
        <= 20.0 => 2.0,
        <= 50.0 => 2.1,
        _ => 2.2,
    };

    /// <summary>
    /// The contact parting time in cycles that IEEE C37.010 takes for a rated interrupting time, half a cycle of relay time included: 2 cycles 1.5, 3
    /// cycles 2, 5 cycles 3, 8 cycles 4. Another time counts as the next shorter one, which is on the safe side.
    /// </summary>
    /// <param name="ratedInterruptingCycles">Rated interrupting time in cycles, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">Not a finite number above 0.</exception>
    public static double ContactPartingCycles(double ratedInterruptingCycles) => Guard.Positive(ratedInterruptingCycles) switch
    {
        < 2.0 => 1.0,
        < 3.0 => 1.5,
        < 5.0 => 2.0,
        < 8.0 => 3.0,
        _ => 4.0,
    };
}
