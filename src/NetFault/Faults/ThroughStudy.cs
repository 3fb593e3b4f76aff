using System.Numerics;

namespace NetFault;

/// <summary>The currents through the devices of one study.</summary>
internal sealed class ThroughStudy
{
    /// <summary>A part below this of the whole is none: rounding of the admittances.</summary>
    private const double NoPart = 1e-9;

    private readonly StudyContext _context;
    private readonly ThroughValues _values;
    private readonly IReadOnlyList<ThroughPlace> _places;

    /// <param name="context">The study.</param>
    /// <param name="places">The places.</param>
    /// <param name="values">Their values; null finds them.</param>
    public ThroughStudy(StudyContext context, IReadOnlyList<ThroughPlace> places, ThroughValues? values = null)
    {
        _context = context;
        _places = places;
        _values = values ?? new ThroughSolution(context, places);
    }

    /// <summary>Both sides of a place, as the flows of the faults have them.</summary>
    public DeviceCurrents Of(int place) => Of(_values, place, place);

    /// <summary>
    /// Both sides of a place for judging ratings: inside a power station unit of IEC 60909-0, of each side the larger of the currents with the unit
    /// transformer corrected, as in the flows, and uncorrected, by which the standard finds the part that flows through it.
    /// </summary>
    public DeviceCurrents ForDuty(int place)
    {
        var currents = Of(place);
        if (_places[place].Node < 0 || _context.Currents.NetworkSeenFrom(_places[place].Node, _context.Method.Networks[0]) is null)
            return currents;
        var other = Of(new ThroughSolution(_context, [_places[place]], forTransformers: true), 0, place);
        return new DeviceCurrents(Larger(currents.AtBus, other.AtBus), Larger(currents.BeyondDevice, other.BeyondDevice));
    }

    private static ThroughCurrent Larger(ThroughCurrent one, ThroughCurrent other) => other.InitialSymmetricalKa > one.InitialSymmetricalKa ? other : one;

    private DeviceCurrents Of(ThroughValues values, int index, int place)
    {
        var bus = _places[place].Bus;
        if (_places[place].Node < 0)
        {
            return new DeviceCurrents(
                new ThroughCurrent(_context, bus, null, FaultSide.AtBus, false), new ThroughCurrent(_context, bus, null, FaultSide.BeyondDevice, false));
        }
        var nothingBeyond = _context.Method.Networks.All(variant => Complex.Abs(values.At(variant, index).Beyond) < NoPart);
        return new DeviceCurrents(
            new ThroughCurrent(_context, bus, new ThroughView(values, index, faultIsBeyond: false), FaultSide.AtBus, false),
            new ThroughCurrent(_context, bus, new ThroughView(values, index, faultIsBeyond: true), FaultSide.BeyondDevice, nothingBeyond));
    }
}
