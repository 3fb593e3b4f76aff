using System.Globalization;

namespace NetFault;

/// <summary>The columns that IEC 60909-0 adds to a report.</summary>
internal static class Iec60909Columns
{
    /// <summary>Factors, thermal equivalent and rules.</summary>
    public static IEnumerable<ReportColumn> Of(ReportOptions options)
    {
        var duration = options.ThermalDurationSeconds;
        var time = duration.ToString("R", CultureInfo.InvariantCulture);
        return
        [
            new($"thermal_equivalent_ka_for_{time}_s", $"Ith({time} s)", "kA", fault => Value(fault, one => one.ThermalEquivalentKa(duration))),
            new("voltage_factor", "c", "", fault => Value(fault, one => one.VoltageFactor), "0.00"),
            new("kappa", "κ", "", fault => Value(fault, one => one.Kappa), "0.00"),
            new($"factor_m_for_{time}_s", null, "", fault => Value(fault, one => one.FactorM(duration))),
            new($"factor_n_for_{time}_s", null, "", fault => Value(fault, one => one.FactorN(duration))),
            new("breaking_current_rule", null, "", fault => Rule(fault, one => one.BreakingCurrentRule.ToString())),
            new("steady_state_current_rule", null, "", fault => Rule(fault, one => one.SteadyStateCurrentRule.ToString())),
            new("motors_left_out", null, "", fault => fault.Iec60909?.MotorsLeftOut),
        ];
    }

    private static object? Value(BusFault fault, Func<Iec60909Result, double> of) => fault.Iec60909 is { } result ? of(result) : null;

    private static object? Rule(BusFault fault, Func<Iec60909Result, string> of) =>
        fault.Iec60909 is { } result ? ReportColumn.Snake(of(result)) : null;
}
