namespace NetFault;

/// <summary>A network file has errors. <see cref="Exception.Message"/> shows them as an engineer would want to read them.</summary>
public sealed class NetworkFileException : Exception
{
    internal NetworkFileException(string file, IReadOnlyList<Diagnostic> diagnostics)
        : base(DiagnosticText.Render($"The network file {file} cannot be used.", diagnostics))
    {
        Diagnostics = diagnostics;
    }

    /// <summary>Every problem in the order of the file, warnings included; the message shows the first 50, errors before warnings.</summary>
    public IReadOnlyList<Diagnostic> Diagnostics { get; }
}
