namespace NetFault;

/// <summary>Puts the parser's refusals into an engineer's words.</summary>
internal static class SyntaxErrors
{
    /// <summary>A part of the parser's message, what it means, and what to do.</summary>
    private static readonly (string Part, string Message, string? Remedy)[] Words =
    [
        ("invalid mapping", "a second colon stands in this value, or this line is not indented like its neighbours",
            "begin each key at the same column as the others of its level, with a blank after its colon; put text that holds \": \" in quotes"),
        ("could not find expected ':'", "a colon is missing after this key", "write key: value"),
        ("block mapping, did not find expected key", "this does not fit the lines above it",
            "begin each key at the same column as the others of its level; look for a bracket or quote too many"),
        ("Mapping keys are not allowed", "a key cannot begin here", "begin each key on a line of its own, or inside { }"),
        ("expected '-' indicator", "a list ends here without its next \"-\"", "sections map ids to elements: write id: {...} without \"-\""),
        ("unexpected end of stream", "this quote is never closed", "add the closing quote"),
        ("unknown escape character", "a backslash in double quotes begins an unknown escape", "use single quotes, or write \\\\ for a backslash"),
        ("hexadecimal number", "a backslash in double quotes begins an unknown escape", "use single quotes, or write \\\\ for a backslash"),
        ("Unicode", "an escape in double quotes is no character", null),
        ("wrong indentation", "text in quotes that goes on over several lines must be indented more than its key",
            "if the text ends on its first line, add the closing quote"),
        ("cannot start any token", "a value cannot begin with this character", "put the text in quotes"),
        ("did not find expected node content", "a value is missing here, or a bracket is closed that was never opened", null),
        ("undefined tag handle", "tags (!) are not read", "remove the tag"),
        ("more than one anchor", "anchors (&) are not read", "remove the anchors"),
        ("anchor or alias", "anchors (&) and aliases (*) are not read", "put text that begins with & or * in quotes"),
        ("block scalar", "the text block that begins here is not well formed", "put the text in double quotes on one line"),
        ("comment", "a comment must have a blank before its #", null),
        ("directive", "a line that begins with % is a YAML directive, and this is none", "remove the line"),
        ("tab character", "a tab stands where YAML allows blanks only", "use blanks"),
    ];

    /// <summary>Adds the problem of a text that the parser refused.</summary>
    /// <param name="problems">Where to.</param>
    /// <param name="parserMessage">The parser's own message.</param>
    /// <param name="offset">Where the parser says the mistake is.</param>
    /// <param name="seen">How far the parser has looked.</param>
    /// <param name="openBracket">Offset of the innermost bracket that is open there; −1 where none is.</param>
    public static void Report(ProblemList problems, string parserMessage, int offset, int seen, int openBracket)
    {
        var source = problems.Source;
        offset = Math.Min(offset, source.Text.Length);
        var tab = FindTabIndentation(source, Math.Max(offset, Math.Min(seen, source.Text.Length)));
        if (tab >= 0 && parserMessage.Contains("tab"))
            problems.Add(FileProblems.TabIndentation(), tab, 1);
        else if (openBracket >= 0)
            ReportOpenBracket(problems, offset, openBracket);
        else if (tab >= 0)
            problems.Add(FileProblems.TabIndentation(), tab, 1);
        else
            ReportWords(problems, parserMessage, offset);
    }

    private static void ReportOpenBracket(ProblemList problems, int offset, int bracket)
    {
        var source = problems.Source;
        var kind = source.Text[bracket] == '[' ? "[ ]" : "{ }";
        var related = source.Locate(bracket, 1);
        var problem = FileProblems.NotYaml(
            $"the {kind} that is open here cannot go on so", "end it with its closing bracket, and put a comma between its parts");
        problems.Add(problem.At(null, null, null), LastText(source.Text, offset), 1, related);
    }

    private static void ReportWords(ProblemList problems, string parserMessage, int offset)
    {
        var known = Array.Find(Words, one => parserMessage.Contains(one.Part));
        var problem = known.Message is null
            ? FileProblems.NotYaml("the text is not YAML from here on: " + FirstSentence(parserMessage), null)
            : FileProblems.NotYaml(known.Message, known.Remedy);
        problems.Add(problem, LastText(problems.Source.Text, offset), 1);
    }

    /// <summary>Where the text ends before the parser stopped, the last character that can be seen is the better place to show.</summary>
    private static int LastText(string text, int offset)
    {
        if (offset < text.Length && !char.IsWhiteSpace(text[offset]))
            return offset;
        var last = Math.Min(offset, text.Length - 1);
        while (last > 0 && char.IsWhiteSpace(text[last]))
            last--;
        return Math.Max(0, last);
    }

    /// <summary>The first tab in the indentation of the line at which the parser stopped, or of the one before it; else −1.</summary>
    private static int FindTabIndentation(SourceText source, int offset)
    {
        var line = source.LineStart(offset);
        var tab = TabInIndentation(source.Text, line);
        return tab >= 0 || line == 0 ? tab : TabInIndentation(source.Text, source.LineStart(line - 1));
    }

    private static int TabInIndentation(string text, int at)
    {
        while (at < text.Length && text[at] == ' ')
            at++;
        return at < text.Length && text[at] == '\t' ? at : -1;
    }

    private static string FirstSentence(string message)
    {
        var end = message.IndexOf(". ", StringComparison.Ordinal);
        return end < 0 ? message.TrimEnd('.') : message.Substring(0, end);
    }
}
