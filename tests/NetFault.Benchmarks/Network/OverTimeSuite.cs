namespace NetFault.Benchmarks.Network;

/// <summary>The AC and DC components over time at every bus, beside one every-bus solution of the initial network.</summary>
internal static class OverTimeSuite
{
    private static readonly MachineDecrement InitialOnly = new() { Instants = FaultInstants.InitialOnly };

    private static readonly MachineDecrement QuasiStatic = InitialOnly with { HorizonSeconds = 0.3 };

    private static readonly MachineDecrement Exact = InitialOnly with
    {
        AcComponentRule = AcComponentRule.Exact, DcDecayRule = DcDecayRule.Exact, HorizonSeconds = 0.3, DecayErrorLimit = 1e-5,
    };

    private static readonly MachineDecrement Closer = Exact with { DecayErrorLimit = 5e-7 };

    public static void Run(string name, NetFault.Network network, ResultTable table)
    {
        var prepared = new FaultStudy(network, Exact);
        var faults = prepared.EveryBus();
        Console.WriteLine(FormattableString.Invariant(
            $"{name}, exact AC and DC to 0.3 s: error bound {At(faults, 0.06).Bound:0.0e+0} at 60 ms, DC at the first bus {faults[0].DcComponentKa(0.06):0.000} kA"));
        var later = 0.06;
        var times = Stopwatches.Medians(11, TimeSpan.FromSeconds(3),
            () => new FaultStudy(network, InitialOnly).EveryBus(),
            () => At(new FaultStudy(network, Exact).EveryBus(), 0.06),
            () => At(new FaultStudy(network, Closer).EveryBus(), 0.06),
            () => At(new FaultStudy(network, QuasiStatic).EveryBus(), 0.06, dc: false),
            () => At(faults, later += 1e-4),
            () => new FaultStudy(network, Exact).CompareDcRules(0.05));
        void Row(string what, double time, double? goal) => table.Add($"{name}: {what}", time, "one every-bus solution", times[0],
            time / times[0], goal is null ? "" : $"<= {goal}", goal is null ? null : time / times[0] <= goal);
        Row("exact AC and DC at every bus, 0.3 s, bound 1e-5", times[1], 50);
        Row("the same, bound 5e-7", times[2], null);
        Row("quasi-static AC at every bus, 0.3 s", times[3], null);
        Row("one instant more at every bus, exact", times[4], null);
        Row("rules for the DC component compared at every bus", times[5], null);
    }

    private static (double Sum, double Bound) At(IReadOnlyList<BusFault> faults, double seconds, bool dc = true)
    {
        var sum = 0.0;
        foreach (var fault in faults)
            sum += fault.SymmetricalRmsKa(seconds) + (dc ? fault.DcComponentKa(seconds) : 0.0);
        return (sum, faults[0].DecayErrorBound(seconds));
    }
}
