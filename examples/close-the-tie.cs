#:project ../src/NetFault/NetFault.csproj
#:property TargetFramework=net10.0
#:property PublishAot=false

// What does closing a tie do? Solves a network with one bus coupler open and closed and lists the buses whose currents change. From the
// repository's root:
//
//     dotnet run examples/close-the-tie.cs -- examples/industrial-plant.yaml TIE-20
//
// Without an id it takes the first coupler that stands open. Exit codes: 0 done, 1 the network cannot be read or solved or has no such
// coupler, 2 wrong arguments.

using System.Text;
using NetFault;

const double SmallestChange = 0.005;

Console.OutputEncoding = Encoding.UTF8;
if (args.Length is < 1 or > 2)
{
    Console.Error.WriteLine("usage: dotnet run examples/close-the-tie.cs -- NETWORK.yaml [TIE-ID]");
    return 2;
}
try
{
    Run(args[0], args.ElementAtOrDefault(1));
    return 0;
}
catch (Exception known) when (known is NetworkFileException or SingularNetworkException or UnknownIdException
    or NoOpenTieException or IOException or UnauthorizedAccessException)
{
    Console.Error.WriteLine(known.Message);
    return 1;
}

static void Run(string path, string? tieId)
{
    var network = NetworkFile.Read(path);
    tieId ??= network.BusCouplers.FirstOrDefault(one => one is { Closed: false, InService: true })?.Id ?? throw new NoOpenTieException(path);

    var open = EveryBus(network.WithCoupler(tieId, closed: false));
    var closed = EveryBus(network.WithCoupler(tieId, closed: true));
    Print(network, tieId, open.Zip(closed, (before, after) => new Change(before, after)).ToList());
}

static IReadOnlyList<BusFault> EveryBus(Network network) =>
    new FaultStudy(network, new MachineDecrement { Instants = FaultInstants.Initial }).EveryBus();

static void Print(Network network, string tieId, IReadOnlyList<Change> changes)
{
    var tie = network.BusCouplers.Single(one => one.Id == tieId);
    Console.WriteLine(network.Title ?? "Network without a title");
    Console.WriteLine($"Closing {tie.Id} between {tie.From} and {tie.To}: initial symmetrical current I″k and peak ip, kA\n");
    if (!tie.InService)
        Console.WriteLine($"{tie.Id} is out of service: closing it does nothing.\n");

    var width = Math.Max(3, changes.Max(one => one.BusId.Length));
    Console.WriteLine($"{"Bus".PadRight(width)}  I″k open   closed  change  ip open   closed  change");
    var moved = changes.Where(one => one.Share > SmallestChange).OrderByDescending(one => one.Share).ToList();
    foreach (var change in moved)
        Console.WriteLine(change.Line(width));
    foreach (var change in changes.Where(one => one.BecomesEnergised))
        Console.WriteLine($"\n{change.BusId} has no source while the tie is open; closing it energises the bus.");

    var rest = changes.Count - moved.Count;
    Console.WriteLine(FormattableString.Invariant($"\nAt the other {rest} of {changes.Count} buses I″k changes by no more than {SmallestChange:0.0%}."));
    Console.WriteLine("For study by qualified engineers; check against the applicable standards and local codes. Not for live switching decisions.");
}

/// <summary>One bus with the tie open and closed.</summary>
sealed record Change(BusFault Open, BusFault Closed)
{
    public string BusId => Open.BusId;

    public bool BecomesEnergised => !Open.IsEnergised && Closed.IsEnergised;

    /// <summary>The change of I″k as a share of what it was; infinite where a bus becomes energised.</summary>
    public double Share => ShareOf(Open.InitialSymmetricalKa, Closed.InitialSymmetricalKa) is var share && double.IsNaN(share) ? 0 : Math.Abs(share);

    public string Line(int width) => FormattableString.Invariant(
        $"{BusId.PadRight(width)}  {Open.InitialSymmetricalKa,8:0.000} {Closed.InitialSymmetricalKa,8:0.000} {Percent(Open.InitialSymmetricalKa, Closed.InitialSymmetricalKa),7}")
        + FormattableString.Invariant($" {Open.PeakKa,8:0.000} {Closed.PeakKa,8:0.000} {Percent(Open.PeakKa, Closed.PeakKa),7}");

    private static string Percent(double before, double after) =>
        before > 0 ? FormattableString.Invariant($"{100 * ShareOf(before, after):+0.0;-0.0} %") : "new";

    private static double ShareOf(double before, double after) => (after - before) / before;
}

/// <summary>The network has no tie to close.</summary>
sealed class NoOpenTieException(string path) : Exception($"{path} has no bus coupler that stands open; name one to compare");
