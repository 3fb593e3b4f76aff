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
    public static double MuAt(double currentRatio, double delaySeconds)
    {
        if (currentRatio <= 2.0)
            return 1.0;
        var (row, share) = Locate(delaySeconds);
        var mu = MuCurve(row, currentRatio);
        return Math.Min(1.0, share > 0.0 ? (1.0 - share) * mu + share * MuCurve(row + 1, currentRatio) : mu);
    }

    /// <summary>q of an asynchronous motor at a minimum time delay; between the curves it is interpolated linearly.</summary>
    /// <param name="megawattsPerPolePair">Rated active power of one motor in MW over its pole pairs.</param>
    /// <param name="delaySeconds">The minimum time delay, from 0.02 s.</param>
    public static double QAt(double megawattsPerPolePair, double delaySeconds)
    {
        var (row, share) = Locate(delaySeconds);
        var q = QCurve(row, megawattsPerPolePair);
        return share > 0.0 ? (1.0 - share) * q + share * QCurve(row + 1, megawattsPerPolePair) : q;
    }

    private static double MuCurve(int row, double currentRatio) => Mu[row][0] + Mu[row][1] * Math.Exp(-Mu[row][2] * currentRatio);

    private static double QCurve(int row, double megawattsPerPolePair) =>
        Math.Max(0.0, Math.Min(1.0, Q[row][0] + Q[row][1] * Math.Log(megawattsPerPolePair)));

    /// <summary>The curve at or before a delay, and how far on towards the next.</summary>
    private static (int Row, double Share) Locate(double delaySeconds)
    {
        var row = Delays.Length - 1;
        while (row > 0 && delaySeconds < Delays[row])
            row--;
        return row == Delays.Length - 1 ? (row, 0.0) : (row, Math.Max(0.0, (delaySeconds - Delays[row]) / (Delays[row + 1] - Delays[row])));
    }
}
