using System.Diagnostics;

namespace NetFault.Benchmarks;

/// <summary>Times several ways of doing the same work in turn, round by round, so that they share the machine's moods.</summary>
internal static class Stopwatches
{
    /// <summary>Runs each once a round, after a warm-up that lets the runtime finish compiling.</summary>
    /// <returns>The median time of each, in milliseconds.</returns>
    public static double[] Medians(int rounds, TimeSpan warmUp, params Action[] contestants)
    {
        long warm = Stopwatch.GetTimestamp();
        do
        {
            foreach (Action contestant in contestants)
            {
                contestant();
            }
        }
        while (Stopwatch.GetElapsedTime(warm) < warmUp);

        double[][] times = [.. contestants.Select(_ => new double[rounds])];
        for (int round = 0; round < rounds; round++)
        {
            for (int c = 0; c < contestants.Length; c++)
            {
                long start = Stopwatch.GetTimestamp();
                contestants[c]();
                times[c][round] = Stopwatch.GetElapsedTime(start).TotalMilliseconds;
            }
        }

        return [.. times.Select(t => t.Order().ElementAt(rounds / 2))];
    }
}
