namespace NetFault;

/// <summary>
/// The factors by which IEEE standards bring a symmetrical current with its X/R beside a breaker's symmetrical rating. X/R may be <see
/// cref="double.PositiveInfinity"/>: a DC component that does not decay. Times are in cycles of the rated frequency, from the beginning
/// of the fault. The formulas are those behind the standards' curves and tables, from memory of the standards.
/// </summary>
public static class IeeeMultiplyingFactors
{
    /// <summary>Times this far beyond a step of a table are rounding.</summary>
    private const double Rounding = 1e-9;

    /// <summary>X/R at which unfused low-voltage power breakers are tested: 15 % power factor (IEEE Std C37.13).</summary>
    public const double UnfusedTestXOverR = 6.6;

    /// <summary>
    /// X/R at which fused low-voltage power breakers, and moulded-case ones above 20 kA, are tested: 20 % power factor (IEEE Std C37.13).
    /// </summary>
    public const double FusedTestXOverR = 4.9;

    /// <summary>
    /// The peak close-and-latch multiplier of a symmetrical rating at 60 Hz: X/R of 17 (IEEE Std C37.04-1999, C37.06-2000).
    /// </summary>
    public const double CloseAndLatchPeakMultiplier = 2.6;

    /// <summary>
    /// The RMS multiplier of the first cycle: X/R of 25 (IEEE Std C37.010-1979, C37.06 before 1987: closing and latching capability 1.6·K
    /// times the rated short-circuit current).
    /// </summary>
    public const double CloseAndLatchRmsMultiplier = 1.6;

    /// <summary>
    /// The ratio S of a breaker's asymmetrical to its symmetrical interrupting capability by contact-parting time (IEEE Std C37.04-1979,
    /// C37.010): 1 cycle 1.4, 1.5 cycles 1.3, 2 cycles 1.2, 3 cycles 1.1, 4 cycles and more 1.0. Between them that of the next longer
    /// time, the smaller one, on the safe side; below 1 cycle 1.4.
    /// </summary>
    /// <param name="contactPartingCycles">Contact-parting time in cycles, not negative.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative or not finite.</exception>
    public static double RatioS(double contactPartingCycles) => (Guard.NotNegative(contactPartingCycles) - Rounding) switch
    {
        <= 1.0 => 1.4,
        <= 1.5 => 1.3,
        <= 2.0 => 1.2,
        <= 3.0 => 1.1,
        _ => 1.0,
    };

    /// <summary>
    /// Total RMS over symmetrical RMS current at a time, with DC decrement only: √(1 + 2·e^(−2·ω·t/(X/R))), ω·t = 2π·cycles.
    /// </summary>
    /// <param name="cycles">Time in cycles, not negative.</param>
    /// <param name="xOverR">X/R, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value is out of its range.</exception>
    public static double TotalCurrent(double cycles, double xOverR) =>
        Math.Sqrt(1.0 + 2.0 * Math.Exp(-4.0 * Math.PI * Guard.NotNegative(cycles) / Ratio(xOverR)));

    /// <summary>
    /// The remote multiplying factor, DC decrement only, of a breaker rated on a symmetrical current basis: <see cref="TotalCurrent"/> over
    /// <see cref="RatioS"/>, never below 1 (IEEE Std C37.010).
    /// </summary>
    /// <param name="contactPartingCycles">Contact-parting time in cycles, not negative.</param>
    /// <param name="xOverR">X/R, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value is out of its range.</exception>
    public static double Remote(double contactPartingCycles, double xOverR) =>
        Remote(contactPartingCycles, xOverR, RatioS(contactPartingCycles));

    /// <summary>The same for a breaker whose ratio S is known, as from the DC component of its rating.</summary>
    /// <param name="contactPartingCycles">Contact-parting time in cycles, not negative.</param>
    /// <param name="xOverR">X/R, above 0.</param>
    /// <param name="ratioS">S, the asymmetrical over the symmetrical interrupting capability at that time; 1 or more.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value is out of its range.</exception>
    public static double Remote(double contactPartingCycles, double xOverR, double ratioS)
    {
        if (!(ratioS >= 1.0) || double.IsInfinity(ratioS))
            throw new ArgumentOutOfRangeException(nameof(ratioS), ratioS, "must be a finite number that is 1 or more");
        return Math.Max(1.0, TotalCurrent(contactPartingCycles, xOverR) / ratioS);
    }

    /// <summary>
    /// Peak over symmetrical RMS current at half a cycle: √2·(1 + e^(−π/(X/R))). The exact peak comes earlier and is up to about 3 %
    /// higher.
    /// </summary>
    /// <param name="xOverR">X/R, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">Not above 0.</exception>
    public static double HalfCyclePeak(double xOverR) => PerUnit.Sqrt2 * (1.0 + Math.Exp(-Math.PI / Ratio(xOverR)));

    /// <summary>Total RMS over symmetrical RMS current at half a cycle: √(1 + 2·e^(−2π/(X/R))).</summary>
    /// <param name="xOverR">X/R, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">Not above 0.</exception>
    public static double HalfCycleRms(double xOverR) => TotalCurrent(0.5, xOverR);

    /// <summary>
    /// The multiplying factor of an unfused low-voltage breaker, by the peak: (1 + e^(−π/(X/R)))/(1 + e^(−π/(X/R)test)), never below 1
    /// (IEEE Std C37.13).
    /// </summary>
    /// <param name="xOverR">X/R of the first-cycle current, above 0.</param>
    /// <param name="testXOverR">X/R at which the breaker was tested, above 0; 6.6 for power breakers, 4.9 for moulded-case ones.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value is not above 0.</exception>
    public static double LowVoltageUnfused(double xOverR, double testXOverR = UnfusedTestXOverR) =>
        Math.Max(1.0, HalfCyclePeak(xOverR) / HalfCyclePeak(testXOverR));

    /// <summary>
    /// The multiplying factor of a fused low-voltage breaker, by the total RMS current at half a cycle:
    /// √((1 + 2e^(−2π/(X/R)))/(1 + 2e^(−2π/(X/R)test))), never below 1 (IEEE Std C37.13).
    /// </summary>
    /// <param name="xOverR">X/R of the first-cycle current, above 0.</param>
    /// <param name="testXOverR">X/R at which the breaker was tested, above 0; 4.9 by default.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value is not above 0.</exception>
    public static double LowVoltageFused(double xOverR, double testXOverR = FusedTestXOverR) =>
        Math.Max(1.0, HalfCycleRms(xOverR) / HalfCycleRms(testXOverR));

    private static double Ratio(double xOverR) =>
        xOverR > 0.0 ? xOverR : throw new ArgumentOutOfRangeException(nameof(xOverR), xOverR, "must be above 0");
}
