namespace NetFault;

/// <summary>
/// The smallest series reactor at a place that brings the duties of a device within its ratings, or why there is none. Immutable. Short circuits alone
/// are looked at: voltage drop, losses, the reactor's own ratings and recovery voltages are for the engineer to check.
/// </summary>
public sealed class ReactorProposal
{
    internal ReactorProposal(DeviceDuty before, NetworkElement place, string busId)
    {
        Before = before;
        PlaceSection = place.Section;
        PlaceId = place.Id;
        BusId = busId;
    }

    /// <summary>The device as it is without the reactor.</summary>
    public DeviceDuty Before { get; }

    /// <summary>The section of the element that the reactor is in series with.</summary>
    public string PlaceSection { get; }

    /// <summary>The id of that element.</summary>
    public string PlaceId { get; }

    /// <summary>The bus between which and the element the reactor stands; devices towards the element stand between bus and reactor.</summary>
    public string BusId { get; }

    /// <summary>Whether there is such a reactor.</summary>
    public bool IsFound => Reactor is not null;

    /// <summary>Why there is none; null where there is one.</summary>
    public string? Reason { get; internal init; }

    /// <summary>The reactor, without resistance; null where there is none.</summary>
    public SeriesReactor? Reactor { get; internal init; }

    /// <summary>Its reactance in ohm.</summary>
    public double? ReactanceOhm => Reactor?.Ohm?.X;

    /// <summary>Its reactance in percent of the bus's nominal voltage squared over <see cref="BaseMva"/>.</summary>
    public double? ReactancePercent { get; internal init; }

    /// <summary>The base power of <see cref="ReactancePercent"/> in MVA: the network's.</summary>
    public double BaseMva { get; internal init; }

    /// <summary>The duty that decides, with its value by the low-rank formula, no factorisation having been made for this reactance.</summary>
    public Duty? ByFormula { get; internal init; }

    /// <summary>The same duty by a full solution of the network with the reactor in it.</summary>
    public Duty? ByFullSolution { get; internal init; }

    /// <summary>The network with the reactor; for a device at an open coupler with that coupler closed, as the device is judged.</summary>
    public Network? Network { get; internal init; }

    /// <summary>The duty check of every device in <see cref="Network"/>: it also shows what the reactor does to the others.</summary>
    public DutyCheck? After { get; internal init; }

    /// <summary>The proposal in one line.</summary>
    public override string ToString() => IsFound
        ? FormattableString.Invariant(
            $"{ReactanceOhm:0.####} ohm ({ReactancePercent:0.##} % on {BaseMva:0.###} MVA) between {BusId} and {PlaceSection} {PlaceId}: {ByFullSolution}")
        : $"no reactor between {BusId} and {PlaceSection} {PlaceId}: {Reason}";
}
