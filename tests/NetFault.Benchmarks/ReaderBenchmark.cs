using System.Diagnostics;
using YamlDotNet.Core;

namespace NetFault.Benchmarks;

/// <summary>Reading a network file against YamlDotNet's bare scan of the same text: medians of interleaved blocks of runs in one process.</summary>
public static class ReaderBenchmark
{
    private const int Blocks = 9;

    /// <summary>Each block begins with a clean heap and one run that is not counted, so that each work pays for its own garbage.</summary>
    private const int RunsOfBlock = 5;

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
        List<double> scan = [], parse = [], read = [];
        for (var block = -1; block < Blocks; block++)
        {
            Measure(() => Scan(text), block < 0 ? [] : scan);
            Measure(() => NetworkFile.Parse(text), block < 0 ? [] : parse);
            Measure(() => NetworkFile.Read(path), block < 0 ? [] : read);
        }
        Console.WriteLine(FormattableString.Invariant(
            $"reading {Path.GetFileName(path)}, {Environment.ProcessorCount} cores, medians of {scan.Count}: bare event scan {Median(scan):F1} ms, ") +
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

    private static void Measure(Action work, List<double> milliseconds)
    {
        GC.Collect();
        for (var run = 0; run <= RunsOfBlock; run++)
        {
            var clock = Stopwatch.StartNew();
            work();
            if (run > 0)
                milliseconds.Add(clock.Elapsed.TotalMilliseconds);
        }
    }

    private static double Median(List<double> values)
    {
        var sorted = values.Order().ToArray();
        return sorted[sorted.Length / 2];
    }
}
