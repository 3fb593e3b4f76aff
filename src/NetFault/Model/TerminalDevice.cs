namespace NetFault;

/// <summary>Equipment at a bus that must bear short-circuit currents: what it is rated for. It has no impedance and changes no current.</summary>
public abstract record RatedDevice : NetworkElement
{
    private protected RatedDevice()
    {
    }

    /// <summary>The id of the bus at which it stands.</summary>
    public required string Bus { get; init; }

    /// <summary>
    /// The rated voltage in kV, line to line and greater than 0: Ur of IEC 62271-1, the rated maximum voltage of IEEE C37.04, Ue of
    /// IEC 60947. Null where it is not known.
    /// </summary>
    public double? RatedKv { get; init; }

    internal sealed override ElementRole Role => ElementRole.Device;
}

/// <summary>
/// A device through which one element is connected to a bus: a circuit-breaker, switch or fuse at that element's terminal. Several may
/// stand at the same terminal. It is that of the whole element: of all circuits of <see cref="Line.Parallel"/>, of all motors of
/// <see cref="AsynchronousMotor.Count"/>.
/// </summary>
public abstract record TerminalDevice : RatedDevice
{
    private protected TerminalDevice()
    {
    }

    /// <summary>The id of the branch, source or coupler that it connects with the bus; that element has a terminal at the bus.</summary>
    public required string Feeds { get; init; }

    /// <summary>
    /// The section in which <see cref="Feeds"/> stands, such as <c>transformers</c>. Needed only where the bus has elements of the same id
    /// from several sections; otherwise null.
    /// </summary>
    public string? FeedsSection { get; init; }

    /// <summary>The element that a device connects with its bus.</summary>
    private protected void CheckPlace(ElementCheck check)
    {
        check.BusReference("bus", Bus);
        check.DeviceVoltage("rated_kv", RatedKv, Bus);
        FedElements.Check(this, check);
    }
}
