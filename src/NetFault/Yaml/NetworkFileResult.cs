namespace NetFault;

/// <summary>What <see cref="NetworkFile.Check(string)"/> found: a network or the reasons why there is none, and all that is odd.</summary>
public sealed class NetworkFileResult
{
    internal NetworkFileResult(Network? network, IReadOnlyList<Diagnostic> diagnostics)
    {
        Network = network;
        Diagnostics = diagnostics;
    }

    /// <summary>The network; null where a diagnostic is an error.</summary>
    public Network? Network { get; }

    /// <summary>
    /// Every problem in the order of the file, warnings included; at most <see cref="NetworkFile.MaximumProblems"/> where there is an error,
    /// and then one more that says so.
    /// </summary>
    public IReadOnlyList<Diagnostic> Diagnostics { get; }
}
