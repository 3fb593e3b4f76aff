namespace NetFault;

/// <summary>Something that is installed in the network. Immutable; <c>with</c> makes a changed copy.</summary>
public abstract record NetworkElement
{
    private protected NetworkElement()
    {
    }

    /// <summary>The element's id: any text, unique within its section of the network file.</summary>
    public required string Id { get; init; }

    /// <summary>False takes the element out of the calculation, whatever else it says. Default true.</summary>
    public bool InService { get; init; } = true;

    /// <summary>Free text for people.</summary>
    public string? Note { get; init; }

    /// <summary>The section of the network file in which elements of this kind stand, such as <c>transformers</c>.</summary>
    public abstract string Section { get; }

    /// <summary>What the element is to the graph of the network.</summary>
    internal abstract ElementRole Role { get; }

    /// <summary>The ids of the buses it is connected to, in the order of its ends; null for an open winding.</summary>
    internal virtual IReadOnlyList<string?> Terminals => [];

    /// <summary>Says by <paramref name="check"/> what is wrong or odd with this element's own values and references.</summary>
    internal abstract void Check(ElementCheck check);
}

/// <summary>An element that connects one bus with the earth of the positive-sequence circuit: an infeed or a machine.</summary>
public abstract record ShuntElement : NetworkElement
{
    private protected ShuntElement()
    {
    }

    /// <summary>The id of the bus at which it is connected.</summary>
    public required string Bus { get; init; }

    internal override IReadOnlyList<string?> Terminals => [Bus];
}

/// <summary>What an element is to the graph of the network.</summary>
internal enum ElementRole
{
    /// <summary>A bus.</summary>
    Bus,

    /// <summary>Holds the voltage of its bus: what is connected to it is energised.</summary>
    Source,

    /// <summary>Feeds short circuits only while something else holds the voltage (asynchronous motors).</summary>
    Follower,

    /// <summary>Connects its terminals through an impedance.</summary>
    Branch,

    /// <summary>Makes one node of its terminals.</summary>
    Joint,

    /// <summary>Leaves its terminals apart.</summary>
    Gap,

    /// <summary>Says what equipment can bear; takes no part in the graph.</summary>
    Device,
}
