namespace NetFault.Benchmarks.Network;

/// <summary>The duty check of 2,000 breakers beside one every-bus solution of the same network by the same method.</summary>
internal static class DutySuite
{
    private const int Breakers = 2000;

    public static int Run(string[] args)
    {
        var folder = args.FirstOrDefault(one => !one.StartsWith("--", StringComparison.Ordinal))
            ?? Environment.GetEnvironmentVariable("NETFAULT_NETWORKS") ?? Path.Combine("..", "shared", "networks");
        var path = Path.Combine(folder, "case10000_goc.yaml");
        if (!File.Exists(path))
        {
            Console.WriteLine($"skipped: {path} is not there");
            return 0;
        }
        var table = new ResultTable();
        Add("case10000_goc", NetworkFile.Read(path), table);
        table.Print(Console.Out);
        return 0;
    }

    public static void Add(string name, NetFault.Network network, ResultTable table)
    {
        var rated = WithBreakers(network);
        Add(name, rated, new MachineDecrement(), table);
        Add(name, rated, new MachineDecrement { AcComponentRule = AcComponentRule.HeldAtInitial }, table);
        Add(name, rated, new Iec60909(), table);
        Add(name, rated, new IeeeC37(), table);
    }

    private static void Add(string name, NetFault.Network network, FaultMethod method, ResultTable table)
    {
        var times = Stopwatches.Medians(
            7, TimeSpan.FromSeconds(3), () => DutyCheck.Of(new FaultStudy(network, method)), () => new FaultStudy(network, method).EveryBus());
        var rule = method is MachineDecrement decrement ? $", AC {decrement.AcComponentRule}" : "";
        table.Add($"{name}: duty check of {Breakers} breakers, {method.Name}{rule}", times[0], "every bus by the same method", times[1],
            times[0] / times[1], "< 20", times[0] / times[1] < 20.0);
    }

    /// <summary>Breakers evenly over the ends of all lines and transformers.</summary>
    private static NetFault.Network WithBreakers(NetFault.Network network)
    {
        var ends = network.Lines.SelectMany(line => new[] { (line.From, line.Id, line.Section), (line.To, line.Id, line.Section) })
            .Concat(network.Transformers.SelectMany(one => new[] { (one.Hv, one.Id, one.Section), (one.Lv, one.Id, one.Section) })).ToList();
        var builder = network.ToBuilder();
        for (var i = 0; i < Breakers; i++)
        {
            var (bus, id, section) = ends[(int)((long)i * ends.Count / Breakers)];
            var isLow = network.Find<Bus>(bus).NominalKv <= 1.0;
            builder.Add(new CircuitBreaker
            {
                Id = $"CB{i}", Bus = bus, Feeds = id, FeedsSection = section,
                Standard = isLow ? CircuitBreakerStandard.Iec60947_2 : CircuitBreakerStandard.Iec62271_100,
                ShortCircuitBreakingCurrentKa = isLow ? null : 40, UltimateShortCircuitBreakingCapacityKa = isLow ? 40 : null,
                MinimumOpeningTimeSeconds = 0.04, RelayTimeSeconds = 0.01,
            });
        }
        return builder.Build();
    }
}
