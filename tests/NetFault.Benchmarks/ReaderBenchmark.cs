using System.Diagnostics;
using YamlDotNet.Core;

namespace NetFault.Benchmarks;

/// <summary>
/// Reading a network file against YamlDotNet's bare scan of the same text: medians of interleaved runs in one process, each from a clean heap.
/// </summary>
public static class ReaderBenchmark
{
    private const int WarmUps = 10;
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
        List<double> scan = [], parse = [], scanFile = [], read = [];
        for (var run = -WarmUps; run < Runs; run++)
        {
            Measure(() => Scan(text), run < 0 ? [] : scan);
            Measure(() => NetworkFile.Parse(text), run < 0 ? [] : parse);
            Measure(() => Scan(File.ReadAllText(path)), run < 0 ? [] : scanFile);
            Measure(() => NetworkFile.Read(path), run < 0 ? [] : read);
        }
        Console.WriteLine(
            $"reading {Path.GetFileName(path)}, {Environment.ProcessorCount} cores, medians of {Runs}: " +
            $"{Compare("text", scan, parse)}; {Compare("file", scanFile, read)}");
    }

    private static string Compare(string what, List<double> scan, List<double> read) => FormattableString.Invariant(
        $"of the {what}, bare event scan {Median(scan):F1} ms, network {Median(read):F1} ms, {Median(read) / Median(scan):F2} times");

    private static void Scan(string text)
    {
        var parser = new Parser(new StringReader(text));
        while (parser.MoveNext())
        {
        }
    }

    private static void Measure(Action work, List<double> milliseconds)
    {
        // What the last run left behind is not this one's to clear away.
        GC.Collect();
        var clock = Stopwatch.StartNew();
        work();
        milliseconds.Add(clock.Elapsed.TotalMilliseconds);
    }

    private static double Median(List<double> values)
    {
        var sorted = values.Order().ToArray();
        return sorted[sorted.Length / 2];
    }
}
