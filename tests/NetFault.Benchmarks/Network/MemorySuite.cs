using System.Diagnostics;
using NetFault.Tests.Support;

namespace NetFault.Benchmarks.Network;

/// <summary>What the 100,000-bus grid takes in a process that does nothing else.</summary>
internal static class MemorySuite
{
    public static int Run()
    {
        var network = Grids.Meshed(400, 250);
        var withNetwork = Process.GetCurrentProcess().PeakWorkingSet64;
        var allocated = GC.GetTotalAllocatedBytes(true);
        var faults = new FaultStudy(network, new MachineDecrement()).EveryBus();
        Console.WriteLine(FormattableString.Invariant(
            $"{faults.Count} buses, three instants: peak working set {Process.GetCurrentProcess().PeakWorkingSet64 / 1e6:0} MB ({withNetwork / 1e6:0} MB with the network alone), allocated by the study {(GC.GetTotalAllocatedBytes(true) - allocated) / 1e6:0} MB"));
        return 0;
    }
}
