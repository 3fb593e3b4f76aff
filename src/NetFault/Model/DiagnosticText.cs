using System.Text;

namespace NetFault;

/// <summary>Renders diagnostics as text; apart from the data, so that another front end can show them its own way.</summary>
internal static class DiagnosticText
{
    /// <summary>Longest piece of a line that is shown: a file may hold lines of any length.</summary>
    private const int LongestShownLine = 160;

    /// <summary>One diagnostic, over several lines where it has a place in a file.</summary>
    public static string Render(Diagnostic diagnostic)
    {
        var text = new StringBuilder();
        if (diagnostic.Location is { } place)
            text.Append(FormattableString.Invariant($"{place.File}({place.Line},{place.Column}): "));
        text.Append(diagnostic.Severity == DiagnosticSeverity.Error ? "error " : "warning ").Append(diagnostic.Id).Append(": ");
        AppendElement(text, diagnostic);
        text.Append(diagnostic.Message);
        if (diagnostic.Location is { } shown)
            AppendMarkedLine(text, shown);
        if (diagnostic.RelatedLocation is { } related)
            AppendRelated(text, related);
        if (diagnostic.Remedy is { } remedy)
            text.Append('\n').Append("    ").Append(remedy);
        return text.ToString();
    }

    /// <summary>Several diagnostics under one heading, errors first, each as <see cref="Render(Diagnostic)"/> gives it.</summary>
    public static string Render(string heading, IReadOnlyList<Diagnostic> diagnostics)
    {
        var text = new StringBuilder(heading);
        foreach (var diagnostic in diagnostics.OrderByDescending(one => one.Severity))
            text.Append("\n\n").Append(Render(diagnostic));
        return text.ToString();
    }

    private static void AppendElement(StringBuilder text, Diagnostic diagnostic)
    {
        if (diagnostic.Section is null)
            return;
        text.Append(diagnostic.Section);
        if (diagnostic.ElementId is not null)
            text.Append(' ').Append(diagnostic.ElementId);
        if (diagnostic.Key is not null)
            text.Append(", ").Append(diagnostic.Key);
        text.Append(": ");
    }

    private static void AppendMarkedLine(StringBuilder text, SourceLocation place)
    {
        var (line, column) = Excerpt(place);
        text.Append("\n    ").Append(line).Append("\n    ").Append(' ', column);
        text.Append('^', Math.Max(1, Math.Min(place.Length, line.Length - column)));
    }

    private static void AppendRelated(StringBuilder text, SourceLocation related)
    {
        text.Append(FormattableString.Invariant($"\n    first at {related.File}({related.Line},{related.Column}):"));
        AppendMarkedLine(text, related);
    }

    /// <summary>The part of the line around the place, tabs as blanks so that the marker stands right.</summary>
    private static (string Line, int Column) Excerpt(SourceLocation place)
    {
        var line = place.LineText.Replace('\t', ' ').TrimEnd();
        var column = Math.Min(place.Column - 1, line.Length);
        if (line.Length <= LongestShownLine)
            return (line, column);
        var start = Math.Max(0, Math.Min(column - LongestShownLine / 2, line.Length - LongestShownLine));
        return (line.Substring(start, LongestShownLine), column - start);
    }
}
