#:project ../src/NetFault/NetFault.csproj
#:property TargetFramework=net10.0
#:property PublishAot=false

// Who feeds a fault, and through which breaker? Prints the voltage of every bus and the current of every source, branch and closed
// coupler for a fault at one bus. From the repository's root:
//
//     dotnet run examples/flows.cs -- examples/small-plant.yaml MAIN
//
// Exit codes: 0 done, 1 the network cannot be read or solved or has no such bus, 2 wrong arguments.

using System.Numerics;
using System.Text;
using NetFault;

Console.OutputEncoding = Encoding.UTF8;
if (args.Length != 2 || args.Contains(""))
{
    Console.Error.WriteLine("usage: dotnet run examples/flows.cs -- NETWORK.yaml BUS-ID");
    return 2;
}
try
{
    var network = NetworkFile.Read(args[0]);
    Print(network, new FaultStudy(network, new MachineDecrement()).FlowsAt(args[1]));
    return 0;
}
catch (Exception known) when (known is NetworkFileException or SingularNetworkException or UnknownIdException
    or IOException or UnauthorizedAccessException)
{
    Console.Error.WriteLine(known.Message);
    return 1;
}

static void Print(Network network, FaultFlows flows)
{
    var nominalKv = network.Buses.ToDictionary(bus => bus.Id, bus => bus.NominalKv);
    double Mva(SourceFlow source) => Math.Sqrt(3) * nominalKv[source.BusId] * source.IntoBusKa.Magnitude;

    Console.WriteLine($"Fault at {flows.BusId}: I″k = {Ka(flows.FaultCurrentKa).Trim()}. Angles are against the voltage before the fault.");

    Console.WriteLine("\nSources, the strongest first                 into their bus");
    foreach (var source in flows.Sources.OrderByDescending(Mva))
        Console.WriteLine(FormattableString.Invariant(
            $"  {source.Id,-16} at {source.BusId,-16}  {Ka(source.IntoBusKa),-20} {Mva(source),8:0.0} MVA"));

    Console.WriteLine("\nBranches                                     from the bus into the branch");
    foreach (var branch in flows.Branches)
        foreach (var end in branch.Ends)
            Console.WriteLine($"  {branch.Id,-16} at {end.BusId,-16}  {Ka(end.IntoBranchKa)}");

    Console.WriteLine("\nClosed couplers");
    foreach (var coupler in flows.Couplers)
        Console.WriteLine($"  {coupler.Id,-16} {coupler.FromBusId} to {coupler.ToBusId}  {Through(coupler)}");

    Console.WriteLine("\nVoltages, line to line");
    foreach (var voltage in flows.Voltages)
        Console.WriteLine(FormattableString.Invariant(
            $"  {voltage.BusId,-16} {voltage.LineToLineKv,9:0.000} kV  {100 * voltage.PerUnit.Magnitude,6:0.0} %"));
    Console.WriteLine("\nFor study by qualified engineers; check against the applicable standards and local codes.");
}

static string Through(CouplerFlow coupler) =>
    coupler.FromToKa is { } current ? Ka(current) : "divides in a ring of couplers, not determined";

static string Ka(Complex current) => current.Magnitude < 1e-9
    ? "   0.000 kA"
    : FormattableString.Invariant($"{current.Magnitude,8:0.000} kA {180 / Math.PI * current.Phase,7:0.0}°");
