namespace NetFault;

/// <summary>A value that the calculation had to assume because the network does not give it.</summary>
/// <param name="Section">The section of the element, such as <c>synchronous_machines</c>.</param>
/// <param name="ElementId">The element's id.</param>
/// <param name="Key">The key of the network file that would give the value.</param>
/// <param name="Text">What was assumed, by which rule.</param>
public sealed record Assumption(string Section, string ElementId, string Key, string Text)
{
    /// <summary>The assumption in one line.</summary>
    public override string ToString() => $"{Section} {ElementId}, {Key}: {Text}";
}

/// <summary>
/// Gathers assumptions where somebody wants to read them. The rules that compute values say what they assume in the same place; the
/// numbers alone are computed with no log, so that nobody pays for text that nobody reads.
/// </summary>
internal sealed class AssumptionLog
{
    private readonly List<(Assumption Assumption, NetworkElement Element)> _entries = [];

    /// <summary>What was assumed so far, with the element concerned.</summary>
    public IReadOnlyList<(Assumption Assumption, NetworkElement Element)> Entries => _entries;

    /// <summary>Notes that a value of an element was assumed.</summary>
    public void Add(NetworkElement element, string key, string text) =>
        _entries.Add((new Assumption(element.Section, element.Id, key, text), element));
}
