using System.Numerics;
using MathNet.Numerics.RootFinding;

namespace NetFault;

/// <summary>
/// Searches the smallest series reactor at a place that brings a device's duties within their ratings: by the low-rank formula, then confirmed by a
/// full solution. What the formula leaves out (the decrement of IEC 60909-0, which needs the whole network) the confirmation brings in, and the search
/// goes on from there.
/// </summary>
internal sealed class ReactorSearch
{
    private const int PointsInADecade = 6;
    private const int MostConfirmations = 12;

    /// <summary>How near to the rating the confirmed duty comes, relative.</summary>
    private const double Tolerance = 1e-9;

    private readonly DutyCheck _check;
    private readonly DeviceDuty _before;
    private readonly FaultStudy _study;
    private readonly NetworkElement _place;
    private readonly string _bus;
    private readonly ReactorNetwork _networks;
    private readonly double _baseOhm;

    public ReactorSearch(DutyCheck check, DeviceDuty before, FaultStudy study, NetworkElement place, string bus)
    {
        (_check, _before, _study, _place, _bus) = (check, before, study, place, bus);
        _networks = new ReactorNetwork(study.Network, place, bus);
        _baseOhm = study.Context.BaseOhm(study.Network.Find<Bus>(bus));
    }

    /// <summary>The proposal.</summary>
    public ReactorProposal Run()
    {
        if (_before.Verdict != DutyVerdict.Fail)
            return None("the device does not fail");
        if (WhyNoPlace() is { } why)
            return None(why);
        var start = SizeOfNetwork();
        FaultStudy trial;
        try
        {
            trial = new FaultStudy(_networks.With(start * _baseOhm), _study.Method);
        }
        catch (Exception known) when (known is InvalidNetworkException or SingularNetworkException or MethodDataException)
        {
            return None(known.Message);
        }
        var circuit = trial.Context.Networks.Circuit;
        var reactor = Array.FindIndex(circuit.Branches, one => trial.Network.Elements[one.Element] is SeriesReactor found && found.Id == _networks.ReactorId);
        if (reactor < 0 || circuit.Branches[reactor].From == circuit.Branches[reactor].To)
            return None("closed couplers lead round the reactor, or nothing is connected behind it");
        return Search(trial, start, new ReactorColumns(trial.Context, PlaceIn(trial), reactor));
    }

    private ReactorProposal Search(FaultStudy trial, double start, ReactorColumns columns)
    {
        var device = DeviceIn(trial.Network);
        DeviceDuty ByFormula(double x) => DutyRules.Judge(trial.Context, _check.Options, device,
            new ThroughStudy(trial.Context, [columns.Place], new ReactorValues(columns, x)).Of(0), []);
        var correction = 1.0;
        for (var round = 0; round < MostConfirmations; round++)
        {
            if (Smallest(x => Excess(ByFormula(x)) * correction - 1.0, start) is not { } x)
                return None(WhyNot(ByFormula(1e5 * start), correction));
            var full = FullSolution(x);
            double found = Excess(full), estimated = Excess(ByFormula(x));
            if (Math.Abs(found - 1.0) < Tolerance)
                return Proposal(x, ByFormula(x), full);
            correction = found / estimated;
        }
        return None("the search does not settle: by a full solution the duty jumps with the reactance");
    }

    /// <summary>The largest required over rated of the duties that have both.</summary>
    private static double Excess(DeviceDuty duty) => duty.Duties.Max(one => one.Required / one.Rated) ?? 0.0;

    /// <summary>The first root from below: a DC component may rise with the first ohms of a reactor, for they raise X/R.</summary>
    private static double? Smallest(Func<double, double> excess, double start)
    {
        double low = 0.0, lowest = 1e-5 * start;
        for (var i = 0; i <= 10 * PointsInADecade; i++)
        {
            var x = lowest * Math.Pow(10.0, (double)i / PointsInADecade);
            if (excess(x) <= 0.0)
                return low > 0.0 && Brent.TryFindRoot(excess, low, x, 1e-13 * x, 200, out var root) ? root : x;
            low = x;
        }
        return null;
    }

    private static string WhyNot(DeviceDuty limit, double correction)
    {
        var worst = limit.Duties.Where(one => one.MarginPercent.HasValue).OrderBy(one => one.MarginPercent).First();
        var where = worst.FaultSide == FaultSide.BeyondDevice ? "beyond the device at" : "at";
        return FormattableString.Invariant($"even the largest reactor there leaves {DutyTexts.Name(worst.Kind)} at {worst.Required * correction:0.###} ")
            + FormattableString.Invariant($"of {worst.Rated:0.###} {worst.Unit}, for a fault {where} {worst.FaultBusId}: the current comes by other ways");
    }

    private DeviceDuty FullSolution(double x)
    {
        var study = new FaultStudy(_networks.With(x * _baseOhm), _study.Method);
        return DutyRules.Judge(study.Context, _check.Options, DeviceIn(study.Network), new ThroughStudy(study.Context, [PlaceIn(study)]).ForDuty(0), []);
    }

    private ReactorProposal Proposal(double x, DeviceDuty byFormula, DeviceDuty full)
    {
        var network = _networks.With(x * _baseOhm);
        var deciding = full.Duties.OrderBy(one => one.MarginPercent ?? double.PositiveInfinity).First();
        return new ReactorProposal(_before, _place, _bus)
        {
            Reactor = network.Find<SeriesReactor>(_networks.ReactorId),
            ReactancePercent = 100.0 * x,
            BaseMva = network.BaseMva,
            ByFormula = byFormula.Duties.First(one => one.Kind == deciding.Kind),
            ByFullSolution = deciding,
            Network = network,
            After = DutyCheck.Of(new FaultStudy(network, _study.Method), _check.Options),
        };
    }

    /// <summary>A reactance per unit of the size of the network's at the bus, from which the search begins.</summary>
    private double SizeOfNetwork() => Complex.Abs(_study.At(_bus).ImpedancePu.GetValueOrDefault());

    private ReactorProposal None(string reason) => new(_before, _place, _bus) { Reason = reason };

    private string? WhyNoPlace()
    {
        var topology = _study.Network.Topology;
        if (_place.Role == ElementRole.Gap || !topology.IsActive(new ThroughPlaces(_study.Context.Networks.Circuit).ElementAt(_place)))
            return "it is open or out of service";
        return topology.IsEnergised(topology.FindBus(_bus)) ? null : $"bus {_bus} is de-energised";
    }

    private RatedDevice DeviceIn(Network network) =>
        network.Elements.OfType<RatedDevice>().First(one => one.Section == _before.Section && one.Id == _before.Id);

    private ThroughPlace PlaceIn(FaultStudy study)
    {
        var places = new ThroughPlaces(study.Context.Networks.Circuit);
        var device = DeviceIn(study.Network);
        var bus = study.Network.Topology.FindBus(device.Bus);
        return device is TerminalDevice terminal ? places.Of(bus, study.Network.ElementBehind(terminal)) : places.OfBus(bus);
    }
}
