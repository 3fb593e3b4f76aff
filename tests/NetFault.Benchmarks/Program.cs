using NetFault.Benchmarks.Kernel;
using NetFault.Benchmarks.Network;

// dotnet run -c Release --project tests/NetFault.Benchmarks -- <suite> [options]
switch (args.FirstOrDefault())
{
    case "kernel":
        return KernelSuite.Run(args[1..]);
    case "network":
        return NetworkSuite.Run(args[1..]);
    default:
        Console.WriteLine("usage: <suite> [options]; suites: kernel, network; each takes [networks-folder] [--quick]");
        return args.Length == 0 ? 0 : 1;
}
