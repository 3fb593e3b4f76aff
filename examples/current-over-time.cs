#:project ../src/NetFault/NetFault.csproj
#:property TargetFramework=net10.0
#:property PublishAot=false

// Draws the short-circuit current of one bus over time as a picture (SVG): the instantaneous current of the worst phase, its envelope, the
// AC and the DC component, the first peak and the parting of contacts. From the repository's root:
//
//     dotnet run examples/current-over-time.cs -- examples/industrial-plant.yaml MV-A --parting 0.06 --out mv-a.svg
//
// --until SECONDS (default 0.2), --parting SECONDS (default 0.06), --angle DEGREES of closing (default the worst), --rules exact|usual: the
// exact components (default), or those of the usual rules, the AC component with reactances at rated frequency and the DC component by X/R.
//
// Exit codes: 0 done, 1 the network cannot be read or solved or has no such bus, 2 wrong arguments.

using System.Globalization;
using System.Text;
using NetFault;

const string Usage = "usage: dotnet run examples/current-over-time.cs -- NETWORK.yaml BUS [--out FILE.svg] [--until SECONDS] [--parting SECONDS]"
    + " [--angle DEGREES] [--rules exact|usual]";

CultureInfo.CurrentCulture = CultureInfo.InvariantCulture;
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
catch (Exception known) when (known is NetworkFileException or SingularNetworkException or CurrentOverTimeException or UnknownIdException
    or IOException or UnauthorizedAccessException)
{
    Console.Error.WriteLine(known.Message);
    return 1;
}

static void Run(Arguments arguments)
{
    var network = NetworkFile.Read(arguments.NetworkPath);
    var fault = new FaultStudy(network, arguments.Method).At(arguments.BusId);
    if (fault.WorstPeak is not { } peak)
    {
        Console.Error.WriteLine($"{fault.BusId} is de-energised: there is nothing to draw.");
        return;
    }
    var angle = arguments.AngleDegrees ?? peak.ClosingAngleDegrees;
    File.WriteAllText(arguments.OutPath, new Picture(network, fault, angle, arguments).Draw());

    Console.WriteLine($"{fault.BusId}, {fault.NominalKv} kV: I″k {fault.InitialSymmetricalKa:0.000} kA");
    Console.WriteLine($"highest peak {peak.Ka:0.000} kA at {peak.Seconds * 1000:0.00} ms, closing angle {peak.ClosingAngleDegrees:0.0}°");
    Console.WriteLine($"contacts part at {arguments.Parting * 1000:0.#} ms: AC {fault.SymmetricalRmsKa(arguments.Parting):0.000} kA, "
        + $"DC {fault.DcComponentKa(arguments.Parting):0.000} kA, total {fault.AsymmetricalRmsKa(arguments.Parting):0.000} kA RMS");
    Console.WriteLine($"AC {Words(fault.AcComponentRule)}, DC {Words(fault.DcDecayRule)}; error bound {fault.DecayErrorBound(arguments.Parting):0.0e+0} of I″k");
    foreach (var alike in fault.Assumptions.GroupBy(one => (one.Section, one.Text)))
        Console.WriteLine($"assumed: {alike.Key.Section} {string.Join(", ", alike.Select(one => one.ElementId))}: {alike.Key.Text}");
    Console.WriteLine($"drawn to {arguments.OutPath}");
    Console.WriteLine("For study by qualified engineers. Check against the applicable standards and local codes; this does not replace licensed practice.");
}

static string Words(object rule) => rule switch
{
    AcComponentRule.QuasiStatic => "decaying, reactances at rated frequency",
    DcDecayRule.ByXOverR => "by X/R",
    DcDecayRule.Undamped => "undamped",
    _ => "exact",
};

/// <summary>The drawing: one panel, labels at the lines, line styles instead of colours, so that it prints in grey.</summary>
sealed class Picture(Network network, BusFault fault, double angleDegrees, Arguments arguments)
{
    private const double Width = 960, Height = 540, Left = 70, Right = 150, Top = 64, Bottom = 56;
    private const int Points = 1200;

    private readonly double[] _seconds = Enumerable.Range(0, Points + 1).Select(i => arguments.Until * i / Points).ToArray();
    private readonly StringBuilder _svg = new();
    private double _highest;

    public string Draw()
    {
        var current = Values(t => fault.InstantaneousKa(t, angleDegrees));
        var dc = Values(t => fault.DcComponentKa(t, angleDegrees));
        var ac = Values(t => Math.Sqrt(2) * fault.SymmetricalRmsKa(t));
        var upper = dc.Zip(ac, (d, a) => d + a).ToArray();
        var lower = dc.Zip(ac, (d, a) => d - a).ToArray();
        _highest = NiceStep(1.08 * upper.Concat(lower).Max(Math.Abs) / 4) * 4;

        Begin();
        Axes();
        Line(ac, "#777", 1.1, "1.5 4", "AC component, peak");
        Line(ac.Select(a => -a).ToArray(), "#777", 1.1, "1.5 4", null);
        Line(upper, "#555", 1.0, "7 4", "envelope");
        Line(lower, "#555", 1.0, "7 4", null);
        Line(dc, "#000", 1.6, "10 3 2 3", "DC component");
        Line(current, "#000", 1.9, null, null);
        Labels();
        MarkPeak(current);
        MarkParting();
        _svg.Append("</svg>\n");
        return _svg.ToString();
    }

    private double[] Values(Func<double, double> value) => Array.ConvertAll(_seconds, t => value(t));

    private void Begin()
    {
        _svg.Append($"""
            <svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 {Width} {Height}" font-family="Georgia, 'Times New Roman', serif" font-size="14" fill="#000">
            <rect width="{Width}" height="{Height}" fill="#fff"/>

            """);
        Text(Left, 26, $"{Escape(fault.BusId)}, {fault.NominalKv:0.###} kV: three-phase short circuit, phase with closing angle {angleDegrees:0.#}°", size: 17);
        var title = network.Title is { } name ? Escape(name) + ". " : "";
        Text(Left, 46, $"{title}I″k {fault.InitialSymmetricalKa:0.00} kA RMS. For study by qualified engineers.", size: 12, fill: "#444");
    }

    private void Axes()
    {
        for (var i = -4; i <= 4; i++)
        {
            var ka = _highest * i / 4;
            _svg.Append($"<line x1=\"{Left}\" x2=\"{Width - Right}\" y1=\"{Y(ka):0.0}\" y2=\"{Y(ka):0.0}\" stroke=\"{(i == 0 ? "#000" : "#ddd")}\"/>\n");
            Text(Left - 8, Y(ka) + 5, ka.ToString("0.###"), anchor: "end", size: 12);
        }
        var step = NiceStep(arguments.Until / 8);
        for (var t = 0.0; t <= arguments.Until * 1.0001; t += step)
        {
            _svg.Append($"<line x1=\"{X(t):0.0}\" x2=\"{X(t):0.0}\" y1=\"{Height - Bottom}\" y2=\"{Height - Bottom + 5}\" stroke=\"#000\"/>\n");
            Text(X(t), Height - Bottom + 20, (t * 1000).ToString("0.###"), anchor: "middle", size: 12);
        }
        Text(Width - Right, Height - Bottom + 40, "time after the beginning, ms", anchor: "end", size: 12);
        Text(Left - 44, (Top + Height - Bottom) / 2 + 5, "kA", anchor: "middle", size: 12);
    }

    private void Line(double[] ka, string stroke, double width, string? dashes, string? label)
    {
        var path = string.Join(" ", ka.Select((value, i) => $"{X(_seconds[i]):0.0},{Y(value):0.0}"));
        _svg.Append($"<polyline fill=\"none\" stroke=\"{stroke}\" stroke-width=\"{width}\"{(dashes is null ? "" : $" stroke-dasharray=\"{dashes}\"")} points=\"{path}\"/>\n");
        if (label is not null)
            _labels.Add((Y(ka[^1]) + 4, label));
    }

    private readonly List<(double Y, string Text)> _labels = [];

    /// <summary>The labels at the ends of their lines, from above, moved down where there is no room.</summary>
    private void Labels()
    {
        var free = double.NegativeInfinity;
        foreach (var (y, label) in _labels.OrderBy(one => one.Y))
        {
            var at = Math.Max(y, free);
            Text(Width - Right + 8, at, label, size: 12);
            free = at + 16;
        }
    }

    private void MarkPeak(double[] current)
    {
        var at = Array.IndexOf(current, current.MaxBy(Math.Abs));
        Mark(_seconds[at], current[at], $"{Math.Abs(current[at]):0.0} kA at {_seconds[at] * 1000:0.0} ms", above: current[at] > 0);
    }

    private void MarkParting()
    {
        if (arguments.Parting > arguments.Until)
            return;
        var x = X(arguments.Parting);
        _svg.Append($"<line x1=\"{x:0.0}\" x2=\"{x:0.0}\" y1=\"{Top}\" y2=\"{Height - Bottom}\" stroke=\"#000\" stroke-width=\"0.8\" stroke-dasharray=\"3 3\"/>\n");
        Text(x + 6, Height - Bottom - 42, $"contacts part, {arguments.Parting * 1000:0.#} ms", size: 12);
        Text(x + 6, Height - Bottom - 26, $"AC {fault.SymmetricalRmsKa(arguments.Parting):0.00} kA, DC {fault.DcComponentKa(arguments.Parting):0.00} kA", size: 12);
        Text(x + 6, Height - Bottom - 10, $"total {fault.AsymmetricalRmsKa(arguments.Parting):0.00} kA RMS", size: 12);
    }

    private void Mark(double seconds, double ka, string label, bool above)
    {
        _svg.Append($"<circle cx=\"{X(seconds):0.0}\" cy=\"{Y(ka):0.0}\" r=\"4\" fill=\"#fff\" stroke=\"#000\" stroke-width=\"1.5\"/>\n");
        Text(X(seconds) + 10, Y(ka) + (above ? -2 : 12), label, size: 12);
    }

    private double X(double seconds) => Left + (Width - Left - Right) * seconds / arguments.Until;

    private double Y(double ka) => (Top + Height - Bottom) / 2 - (Height - Top - Bottom) / 2 * ka / _highest;

    private void Text(double x, double y, string text, string anchor = "start", int size = 14, string fill = "#000") =>
        _svg.Append($"<text x=\"{x:0.0}\" y=\"{y:0.0}\" text-anchor=\"{anchor}\" font-size=\"{size}\" fill=\"{fill}\">{text}</text>\n");

    private static string Escape(string text) => text.Replace("&", "&amp;").Replace("<", "&lt;").Replace(">", "&gt;");

    /// <summary>The next of 1, 2, 2.5 and 5 times a power of ten.</summary>
    private static double NiceStep(double least)
    {
        var power = Math.Pow(10, Math.Floor(Math.Log10(least)));
        return power * new[] { 1, 2, 2.5, 5, 10 }.First(step => step * power >= least * 0.9999);
    }
}

/// <summary>What the command line asks for.</summary>
sealed record Arguments(
    string NetworkPath, string BusId, MachineDecrement Method, string OutPath, double Until, double Parting, double? AngleDegrees)
{
    private static readonly string[] Known = ["--out", "--until", "--parting", "--angle", "--rules"];

    public static Arguments Parse(string[] args)
    {
        var places = new List<string>();
        var options = new Dictionary<string, string>();
        for (var i = 0; i < args.Length; i++)
        {
            if (!args[i].StartsWith("--", StringComparison.Ordinal))
                places.Add(args[i]);
            else if (!Known.Contains(args[i]))
                throw new UsageException($"there is no option {args[i]}");
            else if (i + 1 == args.Length)
                throw new UsageException($"{args[i]} lacks its value");
            else if (!options.TryAdd(args[i], args[++i]))
                throw new UsageException($"{args[i - 1]} stands twice");
        }
        if (places.Count != 2)
            throw new UsageException("a network file and a bus are needed");
        double until = Number(options, "--until", 0.2, 0.02, 10), parting = Number(options, "--parting", 0.06, 0, 10);
        var exact = options.GetValueOrDefault("--rules", "exact") switch
        {
            "exact" => true,
            "usual" => false,
            var other => throw new UsageException($"--rules {other}: exact or usual"),
        };
        var method = new MachineDecrement
        {
            Instants = FaultInstants.SteadyState,
            HorizonSeconds = Math.Max(until, parting),
            AcComponentRule = exact ? AcComponentRule.Exact : AcComponentRule.QuasiStatic,
            DcDecayRule = exact ? DcDecayRule.Exact : DcDecayRule.ByXOverR,
        };
        return new Arguments(places[0], places[1], method, options.GetValueOrDefault("--out", "current-over-time.svg"), until, parting,
            options.ContainsKey("--angle") ? Number(options, "--angle", 0, -360, 360) : null);
    }

    private static double Number(Dictionary<string, string> options, string option, double otherwise, double least, double most)
    {
        if (!options.TryGetValue(option, out var text))
            return otherwise;
        return double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out var number) && number >= least && number <= most
            ? number
            : throw new UsageException($"{option} {text}: a number from {least} to {most}, with a decimal point");
    }
}

/// <summary>The command line cannot be understood.</summary>
sealed class UsageException(string message) : Exception(message);
