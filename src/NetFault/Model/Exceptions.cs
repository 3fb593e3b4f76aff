namespace NetFault;

/// <summary>A network that was built by a program has errors. <see cref="Exception.Message"/> shows them all.</summary>
public sealed class InvalidNetworkException : Exception
{
    internal InvalidNetworkException(IReadOnlyList<Diagnostic> diagnostics)
        : base(DiagnosticText.Render("The network is not valid.", diagnostics))
    {
        Diagnostics = diagnostics.ToList().AsReadOnly();
    }

    /// <summary>Every problem, warnings included.</summary>
    public IReadOnlyList<Diagnostic> Diagnostics { get; }
}

/// <summary>An id was asked for that the network does not have.</summary>
public sealed class UnknownIdException : ArgumentException
{
    internal UnknownIdException(string section, string id, IEnumerable<string> known)
        : this(section, id, NearestNames.Find(id, known, 3))
    {
    }

    private UnknownIdException(string section, string id, IReadOnlyList<string> nearest)
        : base($"There is no \"{id}\" in {section}." + Suggestion(nearest))
    {
        Section = section;
        Id = id;
        NearestIds = nearest.ToList().AsReadOnly();
    }

    /// <summary>The section that was searched, such as <c>buses</c>.</summary>
    public string Section { get; }

    /// <summary>The id that was asked for.</summary>
    public string Id { get; }

    /// <summary>The ids that look most like it, nearest first; at most three.</summary>
    public IReadOnlyList<string> NearestIds { get; }

    private static string Suggestion(IReadOnlyList<string> nearest) =>
        nearest.Count == 0 ? string.Empty : " Did you mean " + string.Join(" or ", nearest.Select(one => $"\"{one}\"")) + "?";
}

/// <summary>
/// The network's equations have no solution, or an infinite current for one: reactances of opposite sign cancel to working precision, or
/// impedances differ by more than that.
/// </summary>
public sealed class SingularNetworkException : Exception
{
    internal SingularNetworkException(IReadOnlyList<string> busIds, bool hasNegativeReactance, Exception? inner)
        : base(
            $"The network has no solution at bus {string.Join(" = ", busIds.Select(id => $"\"{id}\""))}: "
            + (hasNegativeReactance
                ? "the admittances there cancel to working precision. Look for negative reactances (series compensation, equivalent legs) that are "
                    + "equal and opposite to others."
                : "impedances there differ by more than working precision holds. Look for values in wrong units."),
            inner)
    {
        BusIds = busIds.ToList().AsReadOnly();
    }

    /// <summary>The bus, or the buses joined by closed couplers, at which the solution broke down.</summary>
    public IReadOnlyList<string> BusIds { get; }
}
