namespace NetFault;

/// <summary>The network is valid, but lacks data that the chosen method needs.</summary>
public sealed class MethodDataException : Exception
{
    private MethodDataException(Network network, NetworkElement element, string key, string message)
        : base($"{Place(network.PlaceOf(element))}{element.Section} {element.Id}, {key}: {message}")
    {
        Section = element.Section;
        ElementId = element.Id;
        Key = key;
        (File, Line) = network.PlaceOf(element) is { } place ? (place.File, (int?)place.Line) : (null, null);
    }

    /// <summary>The section of the element concerned.</summary>
    public string Section { get; }

    /// <summary>The element's id.</summary>
    public string ElementId { get; }

    /// <summary>The key of the network file concerned.</summary>
    public string Key { get; }

    /// <summary>The file in which the element stands; null for a network built by a program.</summary>
    public string? File { get; }

    /// <summary>The line at which the element begins, counted from 1; null for a network built by a program.</summary>
    public int? Line { get; }

    internal static MethodDataException Missing(Network network, NetworkElement element, string key, string reason) =>
        new(network, element, key, $"is missing, and the method needs it: {reason}");

    internal static MethodDataException SharedUnitTransformer(Network network, SynchronousMachine machine, SynchronousMachine other) => new(
        network, machine, "unit_transformer",
        $"machine \"{other.Id}\" names the same unit transformer; the method knows units of one machine and one transformer");

    private static string Place((string File, int Line)? place) => place is { } at ? FormattableString.Invariant($"{at.File}({at.Line}): ") : string.Empty;
}
