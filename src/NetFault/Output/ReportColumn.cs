using System.Globalization;

namespace NetFault;

/// <summary>
/// One quantity of a report: its machine-readable name with the unit, its heading in a table by the standard's symbol, its value at a bus.
/// Table, CSV and JSON are written from the same list, so that they cannot differ.
/// </summary>
/// <param name="Name">Name in CSV and JSON.</param>
/// <param name="Symbol">Heading in a table; null for a column that a table leaves out.</param>
/// <param name="Unit">Unit in a table's second line.</param>
/// <param name="Value">The value: a number, text, a truth value, or null.</param>
/// <param name="Format">How a number is shown in a table.</param>
internal sealed record ReportColumn(string Name, string? Symbol, string Unit, Func<BusFault, object?> Value, string Format = "0.000")
{
    /// <summary>The columns of an every-bus report.</summary>
    public static IReadOnlyList<ReportColumn> Of(FaultMethod method, ReportOptions options)
    {
        var columns = new List<ReportColumn>
        {
            new("bus_id", "Bus", "", fault => fault.BusId),
            new("nominal_kv", "Un", "kV", fault => fault.NominalKv, "0.###"),
            new("energised", null, "", fault => fault.IsEnergised),
            new("initial_symmetrical_ka", "I″k", "kA", fault => fault.InitialSymmetricalKa),
            new("short_circuit_mva", "S″k", "MVA", fault => fault.ShortCircuitMva, "0.0"),
            new("resistance_ohm", null, "ohm", fault => fault.ImpedanceOhm?.Real),
            new("reactance_ohm", null, "ohm", fault => fault.ImpedanceOhm?.Imaginary),
            new("x_over_r", "X/R", "", fault => fault.XOverR, "0.00"),
            new("peak_ka", "ip", "kA", fault => fault.PeakKa),
        };
        foreach (var seconds in options.InstantsSeconds)
            columns.AddRange(AtInstant(method, seconds));
        if (method.CalculatedInstants.HasFlag(FaultInstants.Transient))
            columns.Add(new("transient_ka", "I′k", "kA", fault => fault.TransientKa));
        if (method.CalculatedInstants.HasFlag(FaultInstants.SteadyState))
            columns.Add(new("steady_state_ka", "Ik", "kA", fault => fault.SteadyStateKa));
        if (method is Iec60909)
            columns.AddRange(Iec60909Columns.Of(options));
        if (method is IeeeC37)
            columns.AddRange(IeeeC37Columns.Of(options));
        if (method is MachineDecrement)
            columns.AddRange(OverTimeColumns.Of(options));
        columns.AddRange(
        [
            new("x_over_r_rule", null, "", fault => Snake(fault.XOverRRule.ToString())),
            new("x_over_r_status", null, "", fault => Snake(fault.XOverRStatus.ToString())),
            new("dc_decay_rule", null, "", fault => Snake(fault.DcDecayRule.ToString())),
            new("ac_component_rule", null, "", fault => Snake(fault.AcComponentRule.ToString())),
            new("assumed_values", null, "", fault => fault.Assumptions.Count),
            new("solution_residual", null, "", fault => fault.SolutionResidual),
            new("", "Notes", "", ReportMark.Of),
        ]);
        return columns;
    }

    /// <summary>The value as text for a table.</summary>
    public string Text(BusFault fault) => Value(fault) switch
    {
        null => "-",
        double number => number.ToString(Format, CultureInfo.InvariantCulture),
        var other => Convert.ToString(other, CultureInfo.InvariantCulture) ?? string.Empty,
    };

    /// <summary>A C# name as the files write names: <c>NotInductive</c> is <c>not_inductive</c>.</summary>
    internal static string Snake(string name) =>
        string.Concat(name.Select((c, i) => i > 0 && char.IsUpper(c) ? "_" + char.ToLowerInvariant(c) : char.ToLowerInvariant(c).ToString()));

    private static IEnumerable<ReportColumn> AtInstant(FaultMethod method, double seconds)
    {
        var time = seconds.ToString("R", CultureInfo.InvariantCulture);
        if (method is Iec60909)
            yield return new($"symmetrical_rms_ka_at_{time}_s", $"Ib({time} s)", "kA", fault => fault.SymmetricalRmsKa(seconds));
        else
            yield return new($"symmetrical_rms_ka_at_{time}_s", SymbolOfAc(method, time), "kA", fault => fault.SymmetricalRmsKa(seconds));
        yield return new($"dc_component_ka_at_{time}_s", $"i_dc({time} s)", "kA", fault => fault.DcComponentKa(seconds));
        yield return new($"asymmetrical_rms_ka_at_{time}_s", $"I_asym({time} s)", "kA", fault => fault.AsymmetricalRmsKa(seconds));
    }

    /// <summary>A table shows the AC component where it is not I″k, which it shows anyway.</summary>
    private static string? SymbolOfAc(FaultMethod method, string time) =>
        method is MachineDecrement { AcComponentRule: not AcComponentRule.HeldAtInitial } ? $"Iac({time} s)" : null;
}
