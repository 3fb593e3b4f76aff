using NetFault.Benchmarks.Kernel;

// dotnet run -c Release --project tests/NetFault.Benchmarks -- <suite> [options]
switch (args.FirstOrDefault())
{
    case "kernel":
        return KernelSuite.Run(args[1..]);
    default:
        Console.WriteLine("usage: <suite> [options]; suites: kernel [networks-folder] [--quick]");
        return args.Length == 0 ? 0 : 1;
}
