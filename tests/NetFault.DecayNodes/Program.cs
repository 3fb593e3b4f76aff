using System.Collections.Concurrent;
using System.Diagnostics;
using System.Runtime.CompilerServices;
using NetFault.NodeTables;

// dotnet run -c Release --project tests/NetFault.DecayNodes -- all [file] | <window> <nodes> usual|whole
return args switch
{
    ["all"] => All(LibraryFile()),
    ["all", var file] => All(file),
    [var window, var count, "usual" or "whole"] => One(window, count, args[2] == "usual"),
    _ => Usage(),
};

static int All(string file)
{
    var watch = Stopwatch.StartNew();
    var made = new ConcurrentDictionary<(string, TableKind), NodeTable>();
    var jobs = TablePlan.All.SelectMany(plan => plan.Tables.Select(kind => (Plan: plan, Kind: kind)));
    var largestFirst = Partitioner.Create(jobs.OrderByDescending(job => job.Kind.Count), EnumerablePartitionerOptions.NoBuffering);
    Parallel.ForEach(largestFirst, new ParallelOptions { MaxDegreeOfParallelism = Environment.ProcessorCount }, job =>
    {
        var table = made[(job.Plan.Name, job.Kind)] = TableMaker.Make(job.Plan, job.Kind);
        Console.WriteLine($"{job.Plan.Name,-18} {TableFile.Line(job.Plan, table)}");
    });
    var windows = TablePlan.All.Select(plan => (plan, plan.Tables.Select(kind => made[(plan.Name, kind)]).ToArray()));
    File.WriteAllText(file, TableFile.Text(windows));
    Console.WriteLine($"{file} written after {watch.Elapsed.TotalMinutes:0} min on {Environment.ProcessorCount} cores");
    return 0;
}

static int One(string window, string count, bool usual)
{
    if (TablePlan.All.FirstOrDefault(each => each.Name == window) is not { } plan || !int.TryParse(count, out var nodes) || nodes < 2)
        return Usage();
    var table = TableMaker.Make(plan, new TableKind(nodes, usual));
    Console.WriteLine(TableFile.Line(plan, table));
    foreach (var node in table.Nodes)
        Console.WriteLine(FormattableString.Invariant($"{node.Real:G6} {node.Imaginary:G6}"));
    return 0;
}

static int Usage()
{
    Console.WriteLine("usage: all [file] | <window> <nodes> usual|whole");
    Console.WriteLine("windows: " + string.Join(", ", TablePlan.All.Select(plan => plan.Name)));
    return 1;
}

static string LibraryFile([CallerFilePath] string here = "") =>
    Path.Combine(Path.GetDirectoryName(here)!, "../../src/NetFault/Methods/OverTime/DecayNodes.cs");
