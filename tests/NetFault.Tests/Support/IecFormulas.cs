namespace NetFault.Tests.Support;

/// <summary>
/// The curves, tables and factors of IEC 60909-0:2016, written down for the tests from the standard (its text and coefficients from
/// memory), one by one, without the library.
/// </summary>
internal static class IecFormulas
{
    /// <summary>8.1.1: κ = 1.02 + 0.98·e^(−3R/X).</summary>
    public static double Kappa(double rOverX) => 1.02 + 0.98 * Math.Exp(-3 * rOverX);

    /// <summary>Clause 9, the table of the equivalent frequency fc/f by f·t.</summary>
    public static double FcOverF(double cycles) => cycles < 1 ? 0.27 : cycles < 2.5 ? 0.15 : cycles < 5 ? 0.092 : 0.055;

    /// <summary>10.1.2, μ by the four equations; 1 for I″kG/IrG ≤ 2; linear between the curves.</summary>
    public static double Mu(double ratio, double delay)
    {
        if (ratio <= 2)
            return 1;
        var t002 = 0.84 + 0.26 * Math.Exp(-0.26 * ratio);
        var t005 = 0.71 + 0.51 * Math.Exp(-0.30 * ratio);
        var t010 = 0.62 + 0.72 * Math.Exp(-0.32 * ratio);
        var t025 = 0.56 + 0.94 * Math.Exp(-0.38 * ratio);
        return BetweenCurves(delay, t002, t005, t010, t025);
    }

    /// <summary>
    /// 10.1.2, q by the four equations, m in MW a pole pair, each curve ending at 1 (and at 0, where the logarithm falls below).
    /// </summary>
    public static double Q(double m, double delay) => BetweenCurves(
        delay, Limited(1.03 + 0.12 * Math.Log(m)), Limited(0.79 + 0.12 * Math.Log(m)), Limited(0.57 + 0.12 * Math.Log(m)),
        Limited(0.26 + 0.10 * Math.Log(m)));

    /// <summary>Clause 12: the factor m.</summary>
    public static double FactorM(double kappa, double frequencyHz, double duration)
    {
        var ln = Math.Log(kappa - 1);
        return (Math.Exp(4 * frequencyHz * duration * ln) - 1) / (2 * frequencyHz * duration * ln);
    }

    /// <summary>
    /// Annex A: n is the mean square of the decaying AC component over I″k². The current is that of the annex; the mean square here is by
    /// Simpson's rule, not by the closed form.
    /// </summary>
    public static double FactorN(double initialOverSteady, double duration)
    {
        var transient = initialOverSteady / (0.88 + 0.17 * initialOverSteady);
        var time = 3.1 / transient;
        double Square(double t)
        {
            var i = 1 + (transient - 1) * Math.Exp(-t / time) + (initialOverSteady - transient) * Math.Exp(-10 * t / time);
            return i * i;
        }
        const int Steps = 20000;
        var h = duration / Steps;
        var sum = Square(0) + Square(duration);
        for (var i = 1; i < Steps; i++)
            sum += Square(i * h) * (i % 2 == 1 ? 4 : 2);
        return sum * h / 3 / duration / (initialOverSteady * initialOverSteady);
    }

    private static double Limited(double q) => Math.Clamp(q, 0, 1);

    private static double BetweenCurves(double t, double t002, double t005, double t010, double t025) =>
        t < 0.05 ? t002 + (t005 - t002) * (t - 0.02) / 0.03
        : t < 0.10 ? t005 + (t010 - t005) * (t - 0.05) / 0.05
        : t < 0.25 ? t010 + (t025 - t010) * (t - 0.10) / 0.15
        : t025;
}
