namespace NetFault;

/// <summary>The network is valid, but lacks data that the chosen method needs.</summary>
public sealed class MethodDataException : Exception
{
    private MethodDataException(NetworkElement element, string key, string message)
        : base($"{element.Section} {element.Id}, {key}: {message}")
    {
        Section = element.Section;
        ElementId = element.Id;
        Key = key;
    }

    /// <summary>The section of the element concerned.</summary>
    public string Section { get; }

    /// <summary>The element's id.</summary>
    public string ElementId { get; }

    /// <summary>The key of the network file concerned.</summary>
    public string Key { get; }

    internal static MethodDataException Missing(NetworkElement element, string key, string reason) =>
        new(element, key, $"is missing, and the method needs it: {reason}");

    internal static MethodDataException SharedUnitTransformer(SynchronousMachine machine, SynchronousMachine other) =>
        new(machine, "unit_transformer", $"machine \"{other.Id}\" names the same unit transformer; the method knows units of one machine and one transformer");
}
