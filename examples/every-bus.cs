#:project ../src/NetFault/NetFault.csproj
#:property TargetFramework=net10.0
#:property PublishAot=false

// Reads a network file and prints the short-circuit currents at every bus. From the repository's root:
//
//     dotnet run examples/every-bus.cs -- examples/industrial-plant.yaml --csv plant.csv
//     dotnet run examples/every-bus.cs -- examples/industrial-plant.yaml --method iec --case min
//
//     dotnet run examples/every-bus.cs -- examples/industrial-plant.yaml --method ieee --current e/x
//
// --method decrement (default) takes --prefault and --x-over-r complex|separate; --method iec, which is IEC 60909-0, takes
// --case max|min and --x-over-r a|b|c, the standard's three ways to the factor kappa; --method ieee, which is IEEE C37.010, takes
// --prefault and --current e/z|e/x, and its times --at are contact-parting times.
//
// Exit codes: 0 done, 1 the network cannot be read or solved, 2 wrong arguments.

using System.Globalization;
using System.Text;
using NetFault;

const string Usage =
    "usage: dotnet run examples/every-bus.cs -- NETWORK.yaml [--csv FILE] [--json FILE]"
    + " [--at SECONDS[,SECONDS...]] [--method decrement|iec|ieee] [--case max|min] [--current e/z|e/x] [--x-over-r complex|separate|a|b|c]"
    + " [--prefault PU]";

Console.OutputEncoding = Encoding.UTF8;
try
{
    Run(Arguments.Parse(args));
    return 0;
}
catch (UsageException wrong)
{
    Console.Error.WriteLine(wrong.Message);
    Console.Error.WriteLine(Usage);
    return 2;
}
catch (Exception known) when (known is NetworkFileException or MethodDataException or SingularNetworkException
    or CurrentOverTimeException or IOException or UnauthorizedAccessException)
{
    Console.Error.WriteLine(known.Message);
    return 1;
}

static void Run(Arguments arguments)
{
    var network = NetworkFile.Read(arguments.NetworkPath);
    foreach (var warning in network.Warnings)
        Console.Error.WriteLine(warning + "\n");

    var study = new FaultStudy(network, arguments.Method);
    var faults = study.EveryBus();
    Console.Write(FaultReport.ToTable(study, faults, arguments.Report));

    if (arguments.CsvPath is { } csvPath)
    {
        using var csv = new StreamWriter(csvPath);
        FaultReport.WriteCsv(csv, study, faults, arguments.Report);
    }
    if (arguments.JsonPath is { } jsonPath)
    {
        using var json = File.Create(jsonPath);
        FaultReport.WriteJson(json, study, faults, arguments.Report);
    }
}

/// <summary>What the command line asks for.</summary>
sealed record Arguments(string NetworkPath, FaultMethod Method, ReportOptions Report, string? CsvPath, string? JsonPath)
{
    private static readonly string[] Known = ["--csv", "--json", "--at", "--method", "--case", "--current", "--x-over-r", "--prefault"];

    public static Arguments Parse(string[] args)
    {
        var paths = new List<string>();
        var options = new Dictionary<string, string>();
        for (var i = 0; i < args.Length; i++)
        {
            if (!args[i].StartsWith("--", StringComparison.Ordinal))
                paths.Add(args[i]);
            else if (!Known.Contains(args[i]))
                throw new UsageException($"there is no option {args[i]}");
            else if (args.ElementAtOrDefault(i + 1) is null or "" || args[i + 1].StartsWith("--", StringComparison.Ordinal))
                throw new UsageException($"{args[i]} lacks its value");
            else if (!options.TryAdd(args[i], args[++i]))
                throw new UsageException($"{args[i - 1]} stands twice");
        }
        if (paths.Count != 1 || paths[0].Length == 0)
            throw new UsageException($"one network file is needed; given: {(paths.Count == 0 ? "none" : string.Join(", ", paths))}");
        string? csvPath = options.GetValueOrDefault("--csv"), jsonPath = options.GetValueOrDefault("--json");
        return new Arguments(paths[0], MethodOf(options), ReportOf(options), csvPath, jsonPath);
    }

    private static FaultMethod MethodOf(Dictionary<string, string> options)
    {
        var method = options.GetValueOrDefault("--method", "decrement");
        if (method is not ("decrement" or "iec" or "ieee"))
            throw new UsageException($"--method {method}: decrement, iec or ieee");
        Refuse(options, "--case", method != "iec", "goes with --method iec");
        Refuse(options, "--current", method != "ieee", "goes with --method ieee");
        Refuse(options, "--prefault", method == "iec", "does not go with --method iec: IEC 60909-0 has its factor c");
        Refuse(options, "--x-over-r", method == "ieee", "does not go with --method ieee: IEEE C37.010 asks for separate networks");
        return method switch
        {
            "decrement" => new MachineDecrement
            {
                PrefaultVoltagePu = Prefault(options),
                XOverRRule = Choice(options, "--x-over-r",
                    ("complex", XOverRRule.ComplexImpedance), ("separate", XOverRRule.SeparateNetworks)),
            },
            "iec" => new Iec60909
            {
                Case = Choice(options, "--case", ("max", ShortCircuitCase.Maximum), ("min", ShortCircuitCase.Minimum)),
                XOverRRule = Choice(options, "--x-over-r",
                    ("c", XOverRRule.EquivalentFrequency), ("b", XOverRRule.ComplexImpedance), ("a", XOverRRule.SmallestRatio)),
            },
            _ => new IeeeC37
            {
                PrefaultVoltagePu = Prefault(options),
                CurrentRule = Choice(options, "--current", ("e/z", IeeeCurrentRule.EOverZ), ("e/x", IeeeCurrentRule.EOverX)),
            },
        };
    }

    private static double Prefault(Dictionary<string, string> options) =>
        Number("--prefault", options.GetValueOrDefault("--prefault", "1"), zeroAllowed: false);

    private static void Refuse(Dictionary<string, string> options, string option, bool when, string why)
    {
        if (when && options.ContainsKey(option))
            throw new UsageException($"{option} {why}");
    }

    /// <summary>The value of the word given, of the first word where none is.</summary>
    private static T Choice<T>(Dictionary<string, string> options, string option, params (string Word, T Value)[] choices)
    {
        if (!options.TryGetValue(option, out var given))
            return choices[0].Value;
        foreach (var (word, value) in choices)
        {
            if (word == given)
                return value;
        }
        throw new UsageException($"{option} {given}: {string.Join(" or ", choices.Select(choice => choice.Word))}");
    }

    private static ReportOptions ReportOf(Dictionary<string, string> options) => options.TryGetValue("--at", out var times)
        ? new ReportOptions { InstantsSeconds = times.Split(',').Select(time => Number("--at", time, zeroAllowed: true)).ToArray() }
        : new ReportOptions();

    private static double Number(string option, string text, bool zeroAllowed)
    {
        var isNumber = double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out var number);
        return isNumber && double.IsFinite(number) && (number > 0 || (zeroAllowed && number == 0))
            ? number
            : throw new UsageException($"{option} {text}: a number {(zeroAllowed ? "not below" : "above")} 0, with a decimal point");
    }
}

/// <summary>The command line cannot be understood.</summary>
sealed class UsageException(string message) : Exception(message);
