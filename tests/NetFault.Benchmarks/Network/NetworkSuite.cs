using System.Diagnostics;
using System.Numerics;
using MathNet.Numerics.LinearAlgebra;
using NetFault.Benchmarks.Kernel;
using NetFault.Tests.Support;

namespace NetFault.Benchmarks.Network;

/// <summary>The library's main job, from a network in memory to the results at every bus, beside what else one could use for it.</summary>
internal static class NetworkSuite
{
    private static readonly MachineDecrement InitialOnly = new() { Instants = FaultInstants.InitialOnly };
    private static readonly MachineDecrement AllInstants = new();
    private static readonly MachineDecrement Separate = new() { Instants = FaultInstants.InitialOnly, XOverRRule = XOverRRule.SeparateNetworks };

    public static int Run(string[] args)
    {
        var folder = args.FirstOrDefault(one => !one.StartsWith("--", StringComparison.Ordinal))
            ?? Environment.GetEnvironmentVariable("NETFAULT_NETWORKS") ?? Path.Combine("..", "shared", "networks");
        var table = new ResultTable();
        if (TryRead(folder, "case10000_goc") is { } large)
        {
            AgainstKlu("case10000_goc", large, table, goal: 200);
            Iec("case10000_goc", large, table);
            DutySuite.Add("case10000_goc", large, table);
        }
        AgainstKlu("generated, 1,000 buses", Grids.Meshed(40, 25), table, goal: null);
        AgainstKlu("generated, 10,000 buses", Grids.Meshed(125, 80), table, goal: null);
        Alone("generated, 100,000 buses", Grids.Meshed(400, 250), table);
        if (!args.Contains("--quick") && TryRead(folder, "case1354_pegase") is { } medium)
            AgainstDenseInverse("case1354_pegase", medium, table);
        table.Print(Console.Out);
        if (File.Exists(Path.Combine(folder, "case10000_goc.yaml")))
            ReaderBenchmark.Run(Path.Combine(folder, "case10000_goc.yaml"));
        return 0;
    }

    /// <summary>The currents over time alone.</summary>
    public static int RunOverTime(string[] args)
    {
        var folder = args.FirstOrDefault() ?? Environment.GetEnvironmentVariable("NETFAULT_NETWORKS") ?? Path.Combine("..", "shared", "networks");
        var table = new ResultTable();
        if (TryRead(folder, "case10000_goc") is { } large)
            OverTimeSuite.Run("case10000_goc", large, table);
        OverTimeSuite.Run("generated, 10,000 buses", Grids.Meshed(125, 80), table);
        table.Print(Console.Out);
        return 0;
    }

    private static NetFault.Network? TryRead(string folder, string name)
    {
        var path = Path.Combine(folder, name + ".yaml");
        if (File.Exists(path))
            return NetworkFile.Read(path);
        Console.WriteLine($"skipped: {path} is not there");
        return null;
    }

    private static IReadOnlyList<BusFault> Solve(NetFault.Network network, MachineDecrement method) => new FaultStudy(network, method).EveryBus();

    private static void AgainstKlu(string name, NetFault.Network network, ResultTable table, double? goal)
    {
        Alone(name, network, table);
        if (Klu.TryLoad() is not { } klu)
            return;
        var matrix = Expand(network);
        var diagonal = new Complex[matrix.Columns.Length - 1];
        var times = Stopwatches.Medians(
            7, TimeSpan.FromSeconds(2), () => Repeat(5, () => Solve(network, InitialOnly)), () => klu.Diagonal(matrix, diagonal, diagonal.Length));
        var ours = times[0] / 5;
        table.Add($"{name}: model to I″k, X/R, DC at every bus", ours, "KLU, factor and one solve a bus", times[1], times[1] / ours,
            goal is null ? "" : $">= {goal}", goal is null ? null : times[1] / ours >= goal);
        Agree(name, network, diagonal);
    }

    private static void Alone(string name, NetFault.Network network, ResultTable table)
    {
        var rounds = network.Buses.Count > 50_000 ? 7 : 31;
        var times = Stopwatches.Medians(
            rounds, TimeSpan.FromSeconds(1.5), () => Solve(network, InitialOnly), () => Solve(network, AllInstants), () => Solve(network, Separate));
        table.AddAlone($"{name}: model to I″k, X/R, DC at every bus", times[0]);
        table.AddAlone("  the same with I′k and Ik", times[1]);
        table.AddAlone("  the same with X/R of separate networks", times[2]);
    }

    /// <summary>Everything IEC 60909-0 gives at every bus: I″k, ip, Ib and i_dc at 0.1 s, Ik, Ith.</summary>
    private static void Iec(string name, NetFault.Network network, ResultTable table)
    {
        var times = Stopwatches.Medians(31, TimeSpan.FromSeconds(2), () => SolveIec(network), () => Solve(network, AllInstants));
        table.Add($"{name}: IEC 60909-0, all quantities at every bus", times[0], "machine decrement, three instants", times[1],
            times[0] / times[1], "<= 10", times[0] / times[1] <= 10.0);
    }

    private static double SolveIec(NetFault.Network network)
    {
        var sum = 0.0;
        foreach (var fault in new FaultStudy(network, new Iec60909()).EveryBus())
        {
            var result = fault.Iec60909!;
            sum += fault.PeakKa + fault.DcComponentKa(0.1) + result.BreakingKa(0.1) + fault.SteadyStateKa!.Value + result.ThermalEquivalentKa(1.0);
        }
        return sum;
    }

    private static void AgainstDenseInverse(string name, NetFault.Network network, ResultTable table)
    {
        var dense = new FaultStudy(network, InitialOnly).AdmittanceMatrix().ToColumnMajorArray();
        var order = network.Buses.Count;
        var start = Stopwatch.GetTimestamp();
        var inverse = Matrix<Complex>.Build.Dense(order, order, dense).Inverse();
        var theirs = Stopwatch.GetElapsedTime(start).TotalMilliseconds;
        var ours = Stopwatches.Medians(101, TimeSpan.FromSeconds(1.5), () => Solve(network, InitialOnly))[0];
        table.Add($"{name}: model to I″k, X/R, DC at every bus", ours, "Math.NET dense inverse, once", theirs, theirs / ours, ">= 10000",
            theirs / ours >= 10_000);
        Agree(name, network, [.. Enumerable.Range(0, order).Select(i => inverse[i, i])]);
    }

    private static void Agree(string name, NetFault.Network network, Complex[] diagonal)
    {
        var faults = Solve(network, InitialOnly);
        var worst = faults.Where(fault => fault.IsEnergised)
            .Select((fault, i) => (fault.ImpedancePu!.Value - diagonal[i]).Magnitude / diagonal[i].Magnitude).Max();
        Console.WriteLine($"{name}: largest relative difference of Zkk {worst:0.0e+0}");
    }

    /// <summary>The admittance matrix in full compressed columns, as the general-purpose library takes it.</summary>
    private static (int[] Columns, int[] Rows, Complex[] Values) Expand(NetFault.Network network)
    {
        var matrix = new FaultStudy(network, InitialOnly).AdmittanceMatrix();
        var entries = matrix.EnumerateIndexed(Zeros.AllowSkip).OrderBy(one => one.Item2).ThenBy(one => one.Item1).ToList();
        var columns = new int[matrix.ColumnCount + 1];
        foreach (var (_, column, _) in entries)
            columns[column + 1]++;
        for (var i = 1; i < columns.Length; i++)
            columns[i] += columns[i - 1];
        return (columns, [.. entries.Select(one => one.Item1)], [.. entries.Select(one => one.Item3)]);
    }

    private static void Repeat(int times, Action work)
    {
        for (var i = 0; i < times; i++)
            work();
    }
}
