using System.Text;

namespace NetFault;

/// <summary>Renders diagnostics as text; apart from the data, so that another front end can show them its own way.</summary>
internal static class DiagnosticText
{
    /// <summary>Longest piece of a line that is shown: a file may hold lines of any length.</summary>
    private const int LongestShownLine = 160;

    /// <summary>How many of many diagnostics are shown: nobody reads thousands.</summary>
    private const int MostShown = 50;

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

    /// <summary>The first <see cref="MostShown"/> of several diagnostics under one heading, errors first, each as <see cref="Render(Diagnostic)"/> gives it.</summary>
    public static string Render(string heading, IReadOnlyList<Diagnostic> diagnostics)
    {
        var text = new StringBuilder(heading);
        foreach (var diagnostic in diagnostics.OrderByDescending(one => one.Severity).Take(MostShown))
            text.Append("\n\n").Append(Render(diagnostic));
        if (diagnostics.Count > MostShown)
            text.Append(FormattableString.Invariant($"\n\nand {diagnostics.Count - MostShown} more"));
        return text.ToString();
    }

    private static void AppendElement(StringBuilder text, Diagnostic diagnostic)
    {
        var element = diagnostic.ElementId is { } id ? diagnostic.Section + " " + Problems.Shown(id) : diagnostic.Section;
        if (element is not null)
            text.Append(element).Append(diagnostic.Key is null ? ": " : ", ");
        if (diagnostic.Key is not null)
            text.Append(diagnostic.Key).Append(": ");
    }

    private static void AppendMarkedLine(StringBuilder text, SourceLocation place)
    {
        var (line, column) = Excerpt(place);
        if (line.Length == 0)
            return;
        text.Append("\n    ").Append(line).Append("\n    ").Append(' ', column);
        text.Append('^', Math.Max(1, Math.Min(place.Length, line.Length - column)));
    }

    private static void AppendRelated(StringBuilder text, SourceLocation related)
    {
        text.Append(FormattableString.Invariant($"\n    see also {related.File}({related.Line},{related.Column}):"));
        AppendMarkedLine(text, related);
    }

    /// <summary>The part of the line around the place, tabs and whatever a terminal might obey as blanks so that the marker stands right.</summary>
    private static (string Line, int Column) Excerpt(SourceLocation place)
    {
        var line = place.LineText;
        var column = Math.Min(place.Column - 1, line.Length);
        var start = Math.Max(0, Math.Min(column - LongestShownLine / 2, line.Length - LongestShownLine));
        var shown = line.Substring(start, Math.Min(LongestShownLine, line.Length - start));
        return (string.Concat(shown.Select(one => char.IsControl(one) ? ' ' : one)).TrimEnd(), column - start);
    }
}
