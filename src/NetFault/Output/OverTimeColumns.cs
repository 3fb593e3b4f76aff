using System.Globalization;

namespace NetFault;

/// <summary>What the machine decrement adds to the files: the worst peak over closing angles and the bound of the quadrature's error.</summary>
internal static class OverTimeColumns
{
    /// <summary>The columns; a table leaves them out.</summary>
    public static IEnumerable<ReportColumn> Of(ReportOptions options)
    {
        yield return new("worst_peak_ka", null, "kA", fault => fault.WorstPeak?.Ka);
        yield return new("worst_peak_s", null, "s", fault => fault.WorstPeak?.Seconds);
        yield return new("worst_peak_closing_angle_degrees", null, "degrees", fault => fault.WorstPeak?.ClosingAngleDegrees);
        foreach (var seconds in options.InstantsSeconds)
        {
            var time = seconds.ToString("R", CultureInfo.InvariantCulture);
            yield return new($"decay_error_bound_at_{time}_s", null, "", fault => fault.DecayErrorBound(seconds));
        }
    }
}
