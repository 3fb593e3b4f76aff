using BenchmarkDotNet.Running;
using NetFault.Benchmarks.Kernel;
using NetFault.Benchmarks.Network;

// dotnet run -c Release --project tests/NetFault.Benchmarks -- <suite> [options]
switch (args.FirstOrDefault())
{
    case "kernel":
        return KernelSuite.Run(args[1..]);
    case "network":
        return NetworkSuite.Run(args[1..]);
    case "duty":
        return DutySuite.Run(args[1..]);
    case "time":
        return NetworkSuite.RunOverTime(args[1..]);
    case "memory":
        return MemorySuite.Run();
    case "dotnet":
        BenchmarkSwitcher.FromTypes([typeof(StudyBenchmarks)]).Run(args[1..]);
        return 0;
    default:
        Console.WriteLine("usage: <suite> [options]; suites: kernel and network, with [networks-folder] [--quick]; time and duty, with [networks-folder]; memory; dotnet, with the options of BenchmarkDotNet");
        return args.Length == 0 ? 0 : 1;
}
