namespace NetFault;

/// <summary>
/// The whole way of a duty check: where each device stands, the parts of the fault currents in each of the method's networks, side by side on the
/// cores there are, then each device's duties. Breakers at open couplers have a study each with the coupler closed.
/// </summary>
internal sealed class DutySolution
{
    private readonly FaultStudy _study;
    private readonly StudyContext _context;
    private readonly DutyOptions _options;
    private readonly CancellationToken _cancellation;
    private readonly StepCounter _steps;
    private readonly ThroughPlaces _places;
    private readonly List<RatedDevice> _devices;

    public DutySolution(FaultStudy study, DutyOptions options, IProgress<StudyProgress>? progress, CancellationToken cancellation)
    {
        _study = study;
        _context = study.Context;
        _options = options;
        _cancellation = cancellation;
        _steps = new StepCounter(progress, study.Method.Networks.Count + 1);
        _places = new ThroughPlaces(_context.Networks.Circuit);
        var network = study.Network;
        _devices = [.. network.CircuitBreakers, .. network.Switches, .. network.Busbars, .. network.Fuses];
    }

    /// <summary>Solves and judges.</summary>
    public IReadOnlyList<DeviceDuty> Run()
    {
        var found = new DeviceDuty?[_devices.Count];
        var atPlaces = new List<(int Device, ThroughPlace Place)>();
        var atTies = new List<(int Device, BusCoupler Tie)>();
        for (var i = 0; i < _devices.Count; i++)
        {
            if (WhyNoCurrent(_devices[i]) is { } reason)
                found[i] = NoCurrent(_devices[i], reason);
            else if (Fed(_devices[i]) is BusCoupler { Closed: false } tie)
                atTies.Add((i, tie));
            else if (!_context.Network.Topology.IsEnergised(BusOf(_devices[i])))
                found[i] = NoCurrent(_devices[i], "de-energised: no path to a source");
            else
                atPlaces.Add((i, PlaceOf(_devices[i])));
        }
        JudgeAtPlaces(atPlaces, found);
        foreach (var group in atTies.GroupBy(one => one.Tie.Id))
            JudgeAtTie(group.First().Tie, group.Select(one => one.Device), found);
        _steps.Done("duties");
        return found.Select(one => one!).ToList();
    }

    private void JudgeAtPlaces(List<(int Device, ThroughPlace Place)> seats, DeviceDuty?[] found)
    {
        var places = seats.Select(seat => seat.Place).ToList();
        var values = new ThroughSolution(_context, places);
        var variants = _study.Method.Networks;
        SideBySide.Run(variants.Count, _cancellation, i =>
        {
            values.Values(variants[i]);
            _steps.Done(variants[i].Name);
        });
        var through = new ThroughStudy(_context, places, values);
        for (var i = 0; i < seats.Count; i++)
        {
            _cancellation.ThrowIfCancellationRequested();
            found[seats[i].Device] = DutyRules.Judge(_context, _options, _devices[seats[i].Device], through.ForDuty(i),
                seats[i].Place.IsInRing ? [InRing] : []);
        }
    }

    /// <summary>A study of its own with the tie closed.</summary>
    private void JudgeAtTie(BusCoupler tie, IEnumerable<int> devices, DeviceDuty?[] found)
    {
        _cancellation.ThrowIfCancellationRequested();
        var closed = ClosedTie.Of(_study, tie, out var refusal);
        foreach (var device in devices)
        {
            found[device] = closed is null
                ? CannotSay(_devices[device], $"the network with {tie.Id} closed has no solution: {refusal}")
                : JudgeWith(closed, tie, _devices[device]);
        }
    }

    private DeviceDuty JudgeWith(FaultStudy closed, BusCoupler tie, RatedDevice device)
    {
        var context = closed.Context;
        var bus = context.Network.Topology.FindBus(device.Bus);
        if (!context.Network.Topology.IsEnergised(bus))
            return NoCurrent(device, $"de-energised even with {tie.Id} closed");
        var place = new ThroughPlaces(context.Networks.Circuit).Of(bus, context.Network.Find<BusCoupler>(tie.Id));
        string[] remarks = place.IsInRing ? [WithClosed(tie), InRing] : [WithClosed(tie)];
        return DutyRules.Judge(context, _options, device, new ThroughStudy(context, [place]).ForDuty(0), remarks);
    }

    private static string WithClosed(BusCoupler tie) => $"judged with the open coupler {tie.Id} closed";

    private const string InRing = "in a ring of couplers the current divides by impedances that nobody gave: the whole fault current is taken";

    private ThroughPlace PlaceOf(RatedDevice device) => Fed(device) is { } fed ? _places.Of(BusOf(device), fed) : _places.OfBus(BusOf(device));

    private int BusOf(RatedDevice device) => _context.Network.Topology.FindBus(device.Bus);

    private NetworkElement? Fed(RatedDevice device) => device is TerminalDevice terminal ? _context.Network.ElementBehind(terminal) : null;

    private string? WhyNoCurrent(RatedDevice device)
    {
        if (!device.InService)
            return "out of service";
        if (!_context.Network.Buses[BusOf(device)].InService)
            return $"bus {device.Bus} is out of service";
        return Fed(device) is { } fed && !_context.Network.Topology.IsActive(_places.ElementAt(fed))
            ? $"{fed.Section} {fed.Id} is out of service; put it into service to judge"
            : null;
    }

    private DeviceDuty NoCurrent(RatedDevice device, string reason) => Alone(device, DutyVerdict.NoCurrent, reason);

    private DeviceDuty CannotSay(RatedDevice device, string reason) => Alone(device, DutyVerdict.CannotSay, reason);

    private DeviceDuty Alone(RatedDevice device, DutyVerdict verdict, string reason) => new(_context, device, null,
        [new Duty(DutyRules.FirstOf(device), verdict, null, null, "kA", "", reason, null, null, false)], [], []);
}

/// <summary>A study of the same network with a coupler closed.</summary>
internal static class ClosedTie
{
    /// <summary>The study; null where there is none, with the reason.</summary>
    public static FaultStudy? Of(FaultStudy study, BusCoupler tie, out string? refusal)
    {
        refusal = null;
        try
        {
            return new FaultStudy(study.Network.WithCoupler(tie.Id, closed: true), study.Method);
        }
        catch (Exception known) when (known is InvalidNetworkException or SingularNetworkException or MethodDataException)
        {
            refusal = known.Message;
            return null;
        }
    }
}
