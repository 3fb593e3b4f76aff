namespace NetFault;

/// <summary>A kind of problem with its words, before it is known where it stands.</summary>
internal readonly record struct Problem(string Id, DiagnosticSeverity Severity, string Message, string? Remedy = null)
{
    /// <summary>The problem as a diagnostic of a key of an element.</summary>
    public Diagnostic At(string? section, string? elementId, string? key) =>
        new(Id, Severity, Message, Remedy) { Section = section, ElementId = elementId, Key = key };
}
