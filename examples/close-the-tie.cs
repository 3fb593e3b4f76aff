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
if (args.Length is < 1 or > 2 || args.Contains(""))
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
    tieId ??= network.BusCouplers.FirstOrDefault(one => one is { Closed: false, InService: true })?.Id
        ?? throw new NoOpenTieException(path);

    var open = EveryBus(network.WithCoupler(tieId, closed: false));
    var closed = EveryBus(network.WithCoupler(tieId, closed: true));
    Print(network, tieId, open.Zip(closed, (before, after) => new Change(before, after)).ToList());
}

static IReadOnlyList<BusFault> EveryBus(Network network) =>
    new FaultStudy(network, new MachineDecrement { Instants = FaultInstants.InitialOnly }).EveryBus();

static void Print(Network network, string tieId, IReadOnlyList<Change> changes)
{
    var tie = network.BusCouplers.Single(one => one.Id == tieId);
    Console.WriteLine(network.Title ?? "Network without a title");
    Console.WriteLine($"Closing {tie.Id} between {tie.From} and {tie.To}: initial symmetrical current I″k and peak ip, kA\n");
    if (!tie.InService)
        Console.WriteLine($"{tie.Id} is out of service: closing it does nothing.\n");

    var width = Math.Max(3, changes.Max(one => one.BusId.Length));
    Console.WriteLine($"{"".PadRight(width)}  {"I″k open",9} {"closed",8} {"change",9}  {"ip open",9} {"closed",8} {"change",9}");
    var moved = changes.Where(one => one.Share > SmallestChange).OrderByDescending(one => one.Share).ToList();
    foreach (var change in moved)
        Console.WriteLine($"{change.BusId.PadRight(width)}  {change.Initial}  {change.Peak}");
    foreach (var change in changes.Where(one => one.BecomesEnergised))
        Console.WriteLine($"\n{change.BusId} has no source while the tie is open; closing it energises the bus.");

    var rest = FormattableString.Invariant($"{changes.Count - moved.Count} of {changes.Count} buses I″k changes by {SmallestChange:0.0%}");
    Console.WriteLine($"\nAt the other {rest} or less.");
    Console.WriteLine("For study by qualified engineers; check against the applicable standards and local codes.");
    Console.WriteLine("Not for live switching decisions.");
}

/// <summary>One bus with the tie open and closed.</summary>
sealed record Change(BusFault Open, BusFault Closed)
{
    public string BusId => Open.BusId;

    public bool BecomesEnergised => !Open.IsEnergised && Closed.IsEnergised;

    /// <summary>The change of I″k as a share of what it was; infinite where the bus becomes energised.</summary>
    public double Share => BecomesEnergised
        ? double.PositiveInfinity
        : Math.Abs(Closed.InitialSymmetricalKa - Open.InitialSymmetricalKa) / Math.Max(Open.InitialSymmetricalKa, double.Epsilon);

    public string Initial => Cells(Open.InitialSymmetricalKa, Closed.InitialSymmetricalKa);

    public string Peak => Cells(Open.PeakKa, Closed.PeakKa);

    private static string Cells(double before, double after)
    {
        var percent = before > 0 ? FormattableString.Invariant($"{100 * (after - before) / before:+0.0;-0.0} %") : "new";
        return FormattableString.Invariant($"{before,9:0.000} {after,8:0.000} {percent,9}");
    }
}

/// <summary>The network has no tie to close.</summary>
sealed class NoOpenTieException(string path) : Exception($"{path} has no bus coupler that stands open; name one to compare");
