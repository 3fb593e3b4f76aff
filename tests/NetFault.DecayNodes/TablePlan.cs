namespace NetFault.NodeTables;

/// <summary>The tables of one window that are made.</summary>
/// <param name="Name">Of the property in the library's DecayNodes.</param>
/// <param name="QuasiStatic">Whether reactances are kept at rated frequency.</param>
/// <param name="Window">The library's window.</param>
/// <param name="Usual">How many nodes the tables for usual networks have.</param>
/// <param name="Whole">Likewise for the whole class.</param>
internal sealed record TablePlan(string Name, bool QuasiStatic, DecayWindow Window, int[] Usual, int[] Whole)
{
    /// <summary>The earliest ω·t after 0 in the fit, 10 µs at 50 Hz.</summary>
    private const double EarliestAngle = 0.003;

    private const int FitTimes = 28, CheckTimes = 80;

    /// <summary>All tables of the library, over the windows that it has.</summary>
    public static IReadOnlyList<TablePlan> All { get; } =
    [
        new("QuasiStaticEarly", true, DecayWindow.QuasiStatic[0], Usual: [], Whole: [12, 16, 22, 26]),
        new("QuasiStaticMiddle", true, DecayWindow.QuasiStatic[1], Usual: [], Whole: [20, 28, 36, 44]),
        new("QuasiStaticLate", true, DecayWindow.QuasiStatic[2], Usual: [], Whole: [24, 36, 48]),
        new("ExactEarly", false, DecayWindow.Exact[0], Usual: [20, 26, 34, 42], Whole: [34, 42, 50, 64]),
        new("ExactMiddle", false, DecayWindow.Exact[1], Usual: [], Whole: [36, 48, 56, 64]),
        new("ExactLate", false, DecayWindow.Exact[2], Usual: [], Whole: [34, 48, 60, 72]),
    ];

    /// <summary>The tables in the order in which the library tries them: few nodes first, then those for usual networks.</summary>
    public IEnumerable<TableKind> Tables =>
        Usual.Select(count => new TableKind(count, ForUsual: true))
            .Concat(Whole.Select(count => new TableKind(count, ForUsual: false)))
            .OrderBy(kind => kind.Count)
            .ThenByDescending(kind => kind.ForUsual);

    /// <summary>ω·t that nodes are fitted to.</summary>
    public IReadOnlyList<double> FitAngles => [.. Angles(EarliestAngle, FitTimes)];

    /// <summary>ω·t at which errors are looked up.</summary>
    public IReadOnlyList<double> CheckAngles => [.. Angles(0.5 * EarliestAngle, CheckTimes)];

    private IEnumerable<double> Angles(double earliest, int count)
    {
        if (Window.FirstAngle == 0.0)
            yield return 0.0;
        var first = Math.Max(Window.FirstAngle, earliest);
        for (var i = 0; i < count; i++)
            yield return first * Math.Pow(Window.LastAngle / first, i / (count - 1.0));
    }
}

/// <summary>One table of a plan.</summary>
/// <param name="Count">How many nodes it has.</param>
/// <param name="ForUsual">Whether it is made for <see cref="NetworkClass.Usual"/> rather than for <see cref="NetworkClass.Whole"/>.</param>
internal readonly record struct TableKind(int Count, bool ForUsual)
{
    /// <summary>In words.</summary>
    public string Networks => ForUsual ? "usual networks" : "the whole class";
}
