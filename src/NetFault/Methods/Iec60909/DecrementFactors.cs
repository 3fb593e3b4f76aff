namespace NetFault;

/// <summary>The factors μ and q by which the AC component falls until contact parting (IEC 60909-0:2016, clause 10).</summary>
internal static class DecrementFactors
{
    /// <summary>The smallest minimum time delay for which the standard gives curves, in seconds.</summary>
    public const double ShortestDelaySeconds = 0.02;

    /// <summary>The curves' minimum time delays in seconds; the last holds from there on.</summary>
    private static readonly double[] Delays = [0.02, 0.05, 0.10, 0.25];

    /// <summary>μ = a + b·e^(−k·I″kG/IrG), one row a delay.</summary>
    private static readonly double[][] Mu = [[0.84, 0.26, 0.26], [0.71, 0.51, 0.30], [0.62, 0.72, 0.32], [0.56, 0.94, 0.38]];

    /// <summary>q = a + b·ln(PrM/p in MW), one row a delay.</summary>
    private static readonly double[][] Q = [[1.03, 0.12], [0.79, 0.12], [0.57, 0.12], [0.26, 0.10]];

    /// <summary>
    /// μ at a minimum time delay; 1 where I″kG/IrG is not above 2. Between the curves it is interpolated linearly, as the standard allows.
    /// </summary>
    /// <param name="currentRatio">I″kG/IrG, or I″kM/IrM.</param>
    /// <param name="delaySeconds">The minimum time delay, from 0.02 s.</param>
    public static double MuAt(double currentRatio, double delaySeconds) =>
        currentRatio <= 2.0 ? 1.0 : Math.Min(1.0, Interpolate(delaySeconds, row => Mu[row][0] + Mu[row][1] * Math.Exp(-Mu[row][2] * currentRatio)));

    /// <summary>q of an asynchronous motor at a minimum time delay; between the curves it is interpolated linearly.</summary>
    /// <param name="megawattsPerPolePair">Rated active power of one motor in MW over its pole pairs.</param>
    /// <param name="delaySeconds">The minimum time delay, from 0.02 s.</param>
    public static double QAt(double megawattsPerPolePair, double delaySeconds)
    {
        var logarithm = Math.Log(megawattsPerPolePair);
        return Interpolate(delaySeconds, row => Math.Max(0.0, Math.Min(1.0, Q[row][0] + Q[row][1] * logarithm)));
    }

    private static double Interpolate(double delaySeconds, Func<int, double> curve)
    {
        var next = Array.FindIndex(Delays, delay => delaySeconds < delay);
        if (next < 0)
            return curve(Delays.Length - 1);
        if (next == 0)
            return curve(0);
        var share = (delaySeconds - Delays[next - 1]) / (Delays[next] - Delays[next - 1]);
        return (1.0 - share) * curve(next - 1) + share * curve(next);
    }
}
