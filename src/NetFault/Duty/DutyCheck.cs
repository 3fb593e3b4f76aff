namespace NetFault;

/// <summary>
/// Whether each circuit-breaker, switch, fuse and busbar of a network can do its duty: what it must close onto, carry and interrupt for a
/// three-phase short circuit on either side of it, against its ratings. Immutable. <c>docs/duty-check.md</c> has each duty's formula.
/// </summary>
/// <remarks>
/// The verdicts are for study by qualified engineers, to be checked against the applicable standards and local codes. They do not replace
/// licensed practice and are not for live switching decisions.
/// </remarks>
public sealed class DutyCheck
{
    private readonly Dictionary<(string Section, string Id), DeviceDuty> _byId;

    internal DutyCheck(FaultStudy study, DutyOptions options, IReadOnlyList<DeviceDuty> devices)
    {
        Study = study;
        Options = options;
        Devices = devices
            .OrderBy(one => DeviceDuty.Rank(one.WorstDuty))
            .ThenBy(one => one.MarginPercent ?? double.PositiveInfinity)
            .ToList().AsReadOnly();
        _byId = Devices.ToDictionary(one => (one.Section, one.Id));
    }

    /// <summary>The study that gave the currents.</summary>
    public FaultStudy Study { get; }

    /// <summary>How it was judged.</summary>
    public DutyOptions Options { get; }

    /// <summary>All devices, the worst first: those that fail, those of which it cannot be said, those that pass, those without current.</summary>
    public IReadOnlyList<DeviceDuty> Devices { get; }

    /// <summary>Whether any device fails.</summary>
    public bool HasFailure => Devices.Any(one => one.Verdict == DutyVerdict.Fail);

    /// <summary>How many devices have a verdict.</summary>
    public int Count(DutyVerdict verdict) => Devices.Count(one => one.Verdict == verdict);

    /// <summary>
    /// Checks every device of the study's network, for currents by the study's method. A breaker at an open coupler is judged with that coupler closed,
    /// which takes a further study each. By <see cref="MachineDecrement"/> with its AC component decaying, the quadrature of docs/current-over-time.md is
    /// solved once for all.
    /// </summary>
    /// <param name="study">The study.</param>
    /// <param name="options">How to judge; null for the defaults.</param>
    /// <param name="progress">Told of each step done; may be null.</param>
    /// <param name="cancellationToken">Stops the work between steps.</param>
    /// <exception cref="ArgumentNullException">The study is null.</exception>
    /// <exception cref="ArgumentException">The study's currents are the smallest ones: they do not show what a device must do.</exception>
    /// <exception cref="SingularNetworkException">The network's equations have no solution in one of the method's networks.</exception>
    /// <exception cref="CurrentOverTimeException">The current over time cannot be found within the error that the method accepts.</exception>
    /// <exception cref="OperationCanceledException">The work was stopped.</exception>
    public static DutyCheck Of(
        FaultStudy study, DutyOptions? options = null, IProgress<StudyProgress>? progress = null, CancellationToken cancellationToken = default)
    {
        if (Guard.NotNull(study).Method is Iec60909 { Case: ShortCircuitCase.Minimum })
            throw new ArgumentException("minimum short-circuit currents do not show what a device must do; take ShortCircuitCase.Maximum", nameof(study));
        var chosen = options ?? new DutyOptions();
        return new DutyCheck(study, chosen, new DutySolution(study, chosen, progress, cancellationToken).Run());
    }

    /// <summary>The duties of a device, by its section and id.</summary>
    /// <param name="section">Its section, such as <c>circuit_breakers</c>.</param>
    /// <param name="id">Its id.</param>
    /// <exception cref="UnknownIdException">There is none; the exception names the nearest ids.</exception>
    public DeviceDuty Device(string section, string id) => _byId.TryGetValue((Guard.NotNull(section), Guard.NotNull(id)), out var found)
        ? found
        : throw new UnknownIdException(section, id, Devices.Where(one => one.Section == section).Select(one => one.Id));

    /// <summary>The duties of a circuit-breaker.</summary>
    /// <param name="id">Its id.</param>
    /// <exception cref="UnknownIdException">There is none; the exception names the nearest ids.</exception>
    public DeviceDuty CircuitBreaker(string id) => Device("circuit_breakers", id);

    /// <summary>
    /// The smallest series reactor at a place that brings all duties of a failing device within their ratings. It is found with the low-rank formula for a
    /// change of one branch, without a factorisation for each reactance, and confirmed by a full solution of the network with the reactor in it.
    /// </summary>
    /// <param name="device">A device of this check.</param>
    /// <param name="placeId">The element that the reactor is in series with: a branch, a source or a closed coupler.</param>
    /// <param name="placeSection">Its section, where elements of several sections have the id; otherwise null.</param>
    /// <param name="busId">
    /// The bus between which and the element it stands; null takes the device's bus where the element is connected there, else the element's first one.
    /// </param>
    /// <returns>The reactor, or the reason why none there helps.</returns>
    /// <exception cref="UnknownIdException">There is no such element, or it is not connected with that bus.</exception>
    /// <exception cref="ArgumentException">The device is not of this check, or elements of several sections have the id.</exception>
    public ReactorProposal SmallestReactor(DeviceDuty device, string placeId, string? placeSection = null, string? busId = null)
    {
        if (!Devices.Contains(Guard.NotNull(device)))
            throw new ArgumentException("the device is of another check", nameof(device));
        var study = StudyOf(device);
        var places = study.Network.Elements.Take(study.Network.ConductingCount)
            .Where(one => one.Id == Guard.NotNull(placeId) && one.Terminals.Count > 0)
            .Where(one => placeSection is null || one.Section == placeSection).ToList();
        if (places.Count > 1)
        {
            var sections = string.Join(" and ", places.Select(one => one.Section));
            throw new ArgumentException($"\"{placeId}\" stands in {sections}: name the section too", nameof(placeId));
        }
        if (places.Count == 0)
        {
            var known = study.Network.Elements.Where(one => one.Terminals.Count > 0).Select(one => one.Id);
            throw new UnknownIdException(placeSection ?? "the network", placeId, known);
        }
        var ends = places[0].Terminals.OfType<string>().ToList();
        var bus = busId ?? (ends.Contains(device.BusId) ? device.BusId : ends[0]);
        if (!ends.Contains(bus))
            throw new UnknownIdException($"the ends of {places[0].Section} {placeId}", bus, ends);
        return new ReactorSearch(this, device, study, places[0], bus).Run();
    }

    /// <summary>The study that judged a device: for one at an open coupler that with the coupler closed.</summary>
    private FaultStudy StudyOf(DeviceDuty device) =>
        device.Device is TerminalDevice terminal && Study.Network.ElementBehind(terminal) is BusCoupler { Closed: false } tie
            ? ClosedTie.Of(Study, tie, out _) ?? Study
            : Study;
}
