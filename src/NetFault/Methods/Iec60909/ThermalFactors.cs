namespace NetFault;

/// <summary>The factors m and n of the thermal equivalent short-circuit current (IEC 60909-0:2016, clause 12 and annex A).</summary>
internal static class ThermalFactors
{
    /// <summary>Below this ratio I″k/Ik the standard gives n no curve; n = 1 is taken there, an upper bound.</summary>
    private const double SmallestRatio = 1.25;

    /// <summary>m, for the heat of the DC component: [e^(4·f·Tk·ln(κ − 1)) − 1]/(2·f·Tk·ln(κ − 1)).</summary>
    /// <param name="kappa">κ, above 1.</param>
    /// <param name="cycles">f·Tk.</param>
    public static double M(double kappa, double cycles)
    {
        if (kappa >= PeakFactorKappa.Largest)
            return 2.0;
        var exponent = 2.0 * cycles * Math.Log(kappa - 1.0);
        return (Math.Exp(2.0 * exponent) - 1.0) / exponent;
    }

    /// <summary>
    /// n, for the heat of the AC component: the mean square over Tk of Ik + (I′k − Ik)·e^(−t/T′d) + (I″k − I′k)·e^(−10·t/T′d), over I″k², with
    /// I′k/Ik = (I″k/Ik)/(0.88 + 0.17·I″k/Ik) and T′d = 3.1 s/(I′k/Ik), as annex A gives it.
    /// </summary>
    /// <param name="currentRatio">I″k/Ik.</param>
    /// <param name="seconds">Tk.</param>
    public static double N(double currentRatio, double seconds)
    {
        if (!(currentRatio >= SmallestRatio))
            return 1.0;
        var transient = currentRatio / (0.88 + 0.17 * currentRatio);
        var time = 3.1 / transient;
        double first = currentRatio - transient, second = transient - 1.0;
        double Share(double divisor, double rate) => time / (divisor * seconds) * (1.0 - Math.Exp(-rate * seconds / time));
        var sum = 1.0
            + Share(20.0, 20.0) * first * first
            + Share(2.0, 2.0) * second * second
            + Share(5.0, 10.0) * first
            + Share(0.5, 1.0) * second
            + Share(5.5, 11.0) * first * second;
        return sum / (currentRatio * currentRatio);
    }
}
