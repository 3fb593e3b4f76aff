namespace NetFault;

/// <summary>How grave a <see cref="Diagnostic"/> is.</summary>
public enum DiagnosticSeverity
{
    /// <summary>Odd but possible; the network can be calculated.</summary>
    Warning,

    /// <summary>Wrong; no <see cref="Network"/> is made.</summary>
    Error,
}

/// <summary>One problem of a network: what is wrong, where, and what to do. It is data; <see cref="ToString"/> renders it for reading.</summary>
public sealed record Diagnostic
{
    internal Diagnostic(string id, DiagnosticSeverity severity, string message, string? remedy)
    {
        Id = id;
        Severity = severity;
        Message = message;
        Remedy = remedy;
    }

    /// <summary>The stable identifier of the kind of problem, such as <c>NF201</c>; <c>docs/errors.md</c> lists them all.</summary>
    public string Id { get; }

    /// <summary>Error or warning.</summary>
    public DiagnosticSeverity Severity { get; }

    /// <summary>What is wrong, in the words of the network file.</summary>
    public string Message { get; }

    /// <summary>What to do about it, where there is something to say.</summary>
    public string? Remedy { get; }

    /// <summary>The section of the element concerned, such as <c>transformers</c>; null where the problem is of the whole network.</summary>
    public string? Section { get; internal init; }

    /// <summary>The id of the element concerned.</summary>
    public string? ElementId { get; internal init; }

    /// <summary>The key concerned, with dots between nested keys: <c>reactance_pu.transient</c>.</summary>
    public string? Key { get; internal init; }

    /// <summary>Where in the file; null for a network built by a program.</summary>
    public SourceLocation? Location { get; internal init; }

    /// <summary>A second place that belongs to the problem: the first of two duplicates.</summary>
    public SourceLocation? RelatedLocation { get; internal init; }

    /// <summary>The diagnostic as text: place, severity, id and message, the line with a marker below the offending part, the remedy.</summary>
    public override string ToString() => DiagnosticText.Render(this);
}

/// <summary>A place in a network file.</summary>
/// <param name="File">The file's name as it was given to the reader.</param>
/// <param name="Line">The line, counted from 1.</param>
/// <param name="Column">The column, counted from 1.</param>
/// <param name="Length">How many characters the offending part has on this line, at least 1.</param>
/// <param name="LineText">The text of the line.</param>
public sealed record SourceLocation(string File, int Line, int Column, int Length, string LineText);
