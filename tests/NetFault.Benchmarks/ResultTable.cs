using System.Globalization;
using System.Runtime.InteropServices;

namespace NetFault.Benchmarks;

/// <summary>One table a run: work, our time, what it is held against, the ratio, the goal.</summary>
internal sealed class ResultTable
{
    private readonly List<string[]> rows = [["work", "ours", "against", "theirs", "ratio", "goal", ""]];

    public void Add(string work, double ours, string against, double theirs, double ratio, string goal, bool? met) =>
        rows.Add([work, Time(ours), against, Time(theirs), ratio.ToString("0.##", CultureInfo.InvariantCulture), goal,
            met switch { true => "met", false => "MISSED", null => "" }]);

    public void AddAlone(string work, double ours) => rows.Add([work, Time(ours), "", "", "", "", ""]);

    public void Print(TextWriter output)
    {
        output.WriteLine($"{Environment.ProcessorCount} cores, {RuntimeInformation.FrameworkDescription}, "
            + $"{RuntimeInformation.OSDescription}, medians of interleaved rounds");
        output.WriteLine();
        int[] width = [.. Enumerable.Range(0, rows[0].Length).Select(c => rows.Max(r => r[c].Length))];
        for (int r = 0; r < rows.Count; r++)
        {
            output.WriteLine("| " + string.Join(" | ", rows[r].Select((cell, c) => cell.PadRight(width[c]))) + " |");
            if (r == 0)
            {
                output.WriteLine("| " + string.Join(" | ", width.Select(w => new string('-', w))) + " |");
            }
        }
    }

    private static string Time(double milliseconds) => milliseconds switch
    {
        < 0.1 => FormattableString.Invariant($"{milliseconds * 1000:0.0} µs"),
        < 1000 => FormattableString.Invariant($"{milliseconds:0.000} ms"),
        _ => FormattableString.Invariant($"{milliseconds / 1000:0.00} s"),
    };
}
