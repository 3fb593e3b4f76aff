using System.Diagnostics;
using YamlDotNet.Core;

namespace NetFault.Benchmarks;

/// <summary>Reading a network file against YamlDotNet's bare scan of the same text: medians of interleaved runs in one process.</summary>
public static class ReaderBenchmark
{
    private const int Runs = 31;

    /// <summary>Measures a file and prints one row; says so where the file is not there.</summary>
    /// <param name="path">The network file.</param>
    public static void Run(string path)
    {
        if (!File.Exists(path))
        {
            Console.WriteLine($"reading {path}: skipped, there is no such file");
            return;
        }
        var text = File.ReadAllText(path);
        double[] scan = new double[Runs], parse = new double[Runs], read = new double[Runs];
        for (var run = -5; run < Runs; run++)
        {
            var at = Math.Max(run, 0);
            scan[at] = Milliseconds(() => Scan(text));
            parse[at] = Milliseconds(() => NetworkFile.Parse(text));
            read[at] = Milliseconds(() => NetworkFile.Read(path));
        }
        Console.WriteLine(FormattableString.Invariant(
            $"reading {Path.GetFileName(path)}, {Environment.ProcessorCount} cores, medians of {Runs}: bare event scan {Median(scan):F1} ms, ") +
            FormattableString.Invariant($"Parse {Median(parse):F1} ms ({Median(parse) / Median(scan):F2} times), ") +
            FormattableString.Invariant($"Read from disk {Median(read):F1} ms ({Median(read) / Median(scan):F2} times)"));
    }

    private static void Scan(string text)
    {
        var parser = new Parser(new StringReader(text));
        while (parser.MoveNext())
        {
        }
    }

    private static double Milliseconds(Action work)
    {
        GC.Collect();
        var clock = Stopwatch.StartNew();
        work();
        return clock.Elapsed.TotalMilliseconds;
    }

    private static double Median(double[] values)
    {
        var sorted = values.Order().ToArray();
        return sorted[sorted.Length / 2];
    }
}
