#:project ../src/NetFault/NetFault.csproj
#:property TargetFramework=net10.0
#:property PublishAot=false

// Reads a network file and checks every circuit-breaker, switch, fuse and busbar in it against its ratings, the worst first. From the
// repository's root:
//
//     dotnet run examples/duty-check.cs -- examples/industrial-plant.yaml --csv duties.csv
//     dotnet run examples/duty-check.cs -- examples/industrial-plant.yaml --method iec --duration 0.5
//
// --method decrement (default) takes --prefault and --x-over-r complex|separate; --method iec, which is IEC 60909-0, takes --x-over-r a|b|c, the
// standard's three ways to the factor kappa; --method ieee, which is IEEE C37.010, takes --prefault and --current e/z|e/x. --duration is that of
// the short circuit for the thermal duties, --marginal the margin in percent below which a duty that passes is marked, --dc current|percent|total how the
// DC component is held against the rating, --low-voltage icu|ics which rating of IEC 60947-2 counts. --reactor ELEMENT looks, for each device that
// fails, for the smallest series reactor between that branch, source or closed coupler and its bus.
//
// Exit codes: 0 no device fails, 1 the network cannot be read or solved, 2 wrong arguments, 3 at least one device fails.

using System.Globalization;
using System.Text;
using NetFault;

const string Usage =
    "usage: dotnet run examples/duty-check.cs -- NETWORK.yaml [--csv FILE] [--json FILE] [--method decrement|iec|ieee] [--current e/z|e/x]"
    + " [--x-over-r complex|separate|a|b|c] [--prefault PU] [--duration SECONDS] [--marginal PERCENT] [--dc current|percent|total]"
    + " [--low-voltage icu|ics] [--reactor ELEMENT]";

Console.OutputEncoding = Encoding.UTF8;
try
{
    return Run(Arguments.Parse(args));
}
catch (UsageException wrong)
{
    Console.Error.WriteLine(wrong.Message);
    Console.Error.WriteLine(Usage);
    return 2;
}
catch (Exception known) when (known is NetworkFileException or MethodDataException or SingularNetworkException or CurrentOverTimeException
    or UnknownIdException or IOException or UnauthorizedAccessException)
{
    Console.Error.WriteLine(known.Message);
    return 1;
}

static int Run(Arguments arguments)
{
    var network = NetworkFile.Read(arguments.NetworkPath);
    foreach (var warning in network.Warnings)
        Console.Error.WriteLine(warning + "\n");

    var check = DutyCheck.Of(new FaultStudy(network, arguments.Method), arguments.Duty);
    Console.Write(DutyReport.ToTable(check));

    if (arguments.CsvPath is { } csvPath)
    {
        using var csv = new StreamWriter(csvPath);
        DutyReport.WriteCsv(csv, check);
    }
    if (arguments.JsonPath is { } jsonPath)
    {
        using var json = File.Create(jsonPath);
        DutyReport.WriteJson(json, check);
    }
    if (arguments.Reactor is { } place)
        PrintReactors(check, place);
    return check.HasFailure ? 3 : 0;
}

static void PrintReactors(DutyCheck check, string place)
{
    Console.WriteLine($"\nThe smallest series reactor at {place} that brings a device within its ratings, confirmed by a full solution:");
    foreach (var device in check.Devices.Where(one => one.Verdict == DutyVerdict.Fail))
    {
        var proposal = check.SmallestReactor(device, place);
        Console.WriteLine($"{device.Id}: {proposal}");
        if (proposal is not { ByFormula: { } formula, ByFullSolution: { } full, After: { } after })
            continue;
        Console.WriteLine(FormattableString.Invariant($"   by the low-rank formula {formula.Required:0.######}, by the full solution {full.Required:0.######} ")
            + FormattableString.Invariant($"{full.Unit}; with it {after.Count(DutyVerdict.Fail)} devices fail"));
    }
}

/// <summary>What the command line asks for.</summary>
sealed record Arguments(string NetworkPath, FaultMethod Method, DutyOptions Duty, string? CsvPath, string? JsonPath, string? Reactor)
{
    private static readonly string[] Known =
    [
        "--csv", "--json", "--method", "--current", "--x-over-r", "--prefault", "--duration", "--marginal", "--dc", "--low-voltage", "--reactor",
    ];

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
        return new Arguments(paths[0], MethodOf(options), DutyOf(options), csvPath, jsonPath, options.GetValueOrDefault("--reactor"));
    }

    private static FaultMethod MethodOf(Dictionary<string, string> options)
    {
        var method = options.GetValueOrDefault("--method", "decrement");
        if (method is not ("decrement" or "iec" or "ieee"))
            throw new UsageException($"--method {method}: decrement, iec or ieee");
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

    private static DutyOptions DutyOf(Dictionary<string, string> options) => new()
    {
        FaultDurationSeconds = Number("--duration", options.GetValueOrDefault("--duration", "1"), zeroAllowed: false),
        MarginalPercent = Number("--marginal", options.GetValueOrDefault("--marginal", "5"), zeroAllowed: true),
        DcCriterion = Choice(options, "--dc", ("current", DcCriterion.ByCurrent), ("percent", DcCriterion.ByPercent),
            ("total", DcCriterion.ByTotalCurrent)),
        LowVoltageRating = Choice(options, "--low-voltage", ("icu", LowVoltageBreakingRating.Ultimate), ("ics", LowVoltageBreakingRating.Service)),
    };

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
