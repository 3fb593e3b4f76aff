using System.Globalization;

namespace NetFault;

/// <summary>The columns that IEEE Std C37.010 adds to a report.</summary>
internal static class IeeeC37Columns
{
    /// <summary>
    /// The networks' currents, and for each of the options' instants, as contact-parting times, multiplying factor and duty.
    /// Contributions are not among them: they cost a solve a bus.
    /// </summary>
    public static IEnumerable<ReportColumn> Of(ReportOptions options)
    {
        yield return new("first_cycle_asymmetrical_rms_ka", null, "kA", fault => Value(fault, one => one.FirstCycleAsymmetricalRmsKa));
        yield return new("peak_by_multiplier_ka", null, "kA", fault => fault.IeeeC37?.PeakByMultiplierKa);
        yield return new("interrupting_symmetrical_ka", "I_int", "kA", fault => Value(fault, one => one.InterruptingSymmetricalKa));
        yield return new("interrupting_x_over_r", "X/R_int", "", fault => fault.IeeeC37?.InterruptingXOverR, "0.00");
        yield return new("thirty_cycle_symmetrical_ka", "I_30", "kA", fault => Value(fault, one => one.ThirtyCycleSymmetricalKa));
        foreach (var seconds in options.InstantsSeconds)
        {
            var time = seconds.ToString("R", CultureInfo.InvariantCulture);
            yield return new(
                $"multiplying_factor_at_{time}_s", $"MF({time} s)", "",
                fault => Value(fault, one => one.MultiplyingFactor(one.Cycles(seconds))));
            yield return new(
                $"interrupting_duty_ka_at_{time}_s", $"duty({time} s)", "kA",
                fault => Value(fault, one => one.InterruptingDutyKa(one.Cycles(seconds))));
        }
    }

    private static object? Value(BusFault fault, Func<IeeeC37Result, double> of) => fault.IeeeC37 is { } result ? of(result) : null;
}
