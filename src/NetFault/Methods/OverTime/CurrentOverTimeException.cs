namespace NetFault;

/// <summary>
/// A current over time was asked for that cannot be had within the error that was asked for. <see cref="Exception.Message"/> says why and what to
/// do; nothing was returned in its place.
/// </summary>
public sealed class CurrentOverTimeException : Exception
{
    private CurrentOverTimeException(string message, IReadOnlyList<string> elementIds)
        : base(message)
    {
        ElementIds = elementIds;
    }

    /// <summary>The elements that are in the way, where single ones are.</summary>
    public IReadOnlyList<string> ElementIds { get; }

    internal static CurrentOverTimeException Of(Circuit circuit, IReadOnlyList<int> branches, string why, string what)
    {
        var elements = branches.Select(branch => circuit.Network.Elements[circuit.Branches[branch].Element]).Distinct().ToList();
        var named = string.Join(", ", elements.Take(5).Select(element => $"{element.Section} \"{element.Id}\"")) + (elements.Count > 5 ? ", ..." : "");
        return new CurrentOverTimeException(
            $"The current over time cannot be found. {named}: {why}. What to do: {what}.", elements.Select(element => element.Id).ToList().AsReadOnly());
    }

    internal static CurrentOverTimeException Because(string why, string what) =>
        new($"The current over time cannot be found: {why}. What to do: {what}.", []);
}
