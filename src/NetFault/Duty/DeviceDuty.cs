namespace NetFault;

/// <summary>All duties of one device, with what they rest on. Immutable.</summary>
public sealed class DeviceDuty
{
    private readonly StudyContext _context;

    internal DeviceDuty(
        StudyContext context, RatedDevice device, DeviceCurrents? currents, IReadOnlyList<Duty> duties, IReadOnlyList<Assumption> assumptions,
        IReadOnlyList<string> remarks)
    {
        _context = context;
        Device = device;
        Currents = currents;
        Duties = duties;
        Assumptions = assumptions;
        Remarks = remarks;
        WorstDuty = duties.OrderBy(Rank).ThenBy(duty => duty.MarginPercent ?? double.PositiveInfinity).First();
    }

    /// <summary>The device.</summary>
    public RatedDevice Device { get; }

    /// <summary>Its section of the network file, such as <c>circuit_breakers</c>.</summary>
    public string Section => Device.Section;

    /// <summary>Its id, unique in its section.</summary>
    public string Id => Device.Id;

    /// <summary>The bus at which it stands.</summary>
    public string BusId => Device.Bus;

    /// <summary>The element that it connects with its bus; null for a busbar.</summary>
    public string? Feeds => (Device as TerminalDevice)?.Feeds;

    /// <summary>The standard that a circuit-breaker is rated by, as it is cited; null for other devices.</summary>
    public string? Standard => Device is CircuitBreaker breaker ? CircuitBreakerKeys.Name(breaker.Standard) : null;

    /// <summary>Its duties: at least one.</summary>
    public IReadOnlyList<Duty> Duties { get; }

    /// <summary>The worst of them.</summary>
    public Duty WorstDuty { get; }

    /// <summary>The verdict of the worst duty: fail where one fails, else cannot say where one cannot be said.</summary>
    public DutyVerdict Verdict => WorstDuty.Verdict;

    /// <summary>The smallest margin of the duties that have one, in percent (<see cref="Duty.MarginPercent"/>).</summary>
    public double? MarginPercent => Duties.Min(duty => duty.MarginPercent);

    /// <summary>Whether none fails and one passes with less than the margin of <see cref="DutyOptions.MarginalPercent"/>.</summary>
    public bool IsMarginal => Verdict != DutyVerdict.Fail && Duties.Any(duty => duty.IsMarginal);

    /// <summary>The currents through it; null where there is none. Of a busbar the side at the bus carries nothing and the other one the whole.</summary>
    public DeviceCurrents? Currents { get; }

    /// <summary>The ratings and times that were assumed because the network does not give them.</summary>
    public IReadOnlyList<Assumption> Assumptions { get; }

    /// <summary>What the currents rest on that the network does not say (<see cref="BusFault.Assumptions"/>).</summary>
    public IReadOnlyList<Assumption> StudyAssumptions =>
        Currents is null ? [] : _context.Assumptions.OfBus(_context.Network.Topology.FindBus(BusId));

    /// <summary>What else a reader must know: standards that are mixed, a tie taken as closed, a ring of couplers.</summary>
    public IReadOnlyList<string> Remarks { get; }

    /// <summary>The device with its worst duty, for people.</summary>
    public override string ToString() => $"{Section} {Id}: {WorstDuty}";

    /// <summary>The worst first.</summary>
    internal static int Rank(Duty duty) => duty.Verdict switch
    {
        DutyVerdict.Fail => 0,
        DutyVerdict.CannotSay => 1,
        DutyVerdict.Pass => 2,
        _ => 3,
    };
}
