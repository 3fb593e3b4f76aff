using System.Globalization;
using System.Text;

namespace NetFault;

/// <summary>Columns of text for the terminal: the first and the last left-aligned, the others right-aligned.</summary>
internal static class TextTable
{
    /// <summary>Appends the rows with a rule below the heading.</summary>
    public static void Append(StringBuilder text, IReadOnlyList<string[]> rows, int headingRows)
    {
        var widths = rows[0].Select((_, i) => rows.Max(row => Width(row[i]))).ToArray();
        for (var i = 0; i < rows.Count; i++)
        {
            AppendRow(text, rows[i], widths);
            if (i == headingRows - 1)
                text.Append('-', widths.Sum() + 2 * (widths.Length - 1)).Append('\n');
        }
    }

    private static void AppendRow(StringBuilder text, string[] cells, int[] widths)
    {
        var line = new StringBuilder();
        for (var i = 0; i < cells.Length; i++)
        {
            var gap = widths[i] - Width(cells[i]);
            var leftAligned = i == 0 || i == cells.Length - 1;
            line.Append(i > 0 ? "  " : "");
            line.Append(' ', leftAligned ? 0 : gap).Append(cells[i]).Append(' ', leftAligned ? gap : 0);
        }
        text.Append(line.ToString().TrimEnd()).Append('\n');
    }

    /// <summary>Columns a text takes on a terminal, counted in text elements, not in UTF-16 units.</summary>
    private static int Width(string text) => new StringInfo(text).LengthInTextElements;
}
