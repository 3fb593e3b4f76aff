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

    public ThroughStudy(StudyContext context, IReadOnlyList<ThroughPlace> places, ThroughValues? values = null)
    {
        _context = context;
        _places = places;
        _values = values ?? new ThroughSolution(context, places);
    }

    /// <summary>Both sides of a place.</summary>
    public DeviceCurrents Of(int place)
    {
        if (_places[place].Node < 0)
            return new DeviceCurrents(Current(place, null, FaultSide.AtBus, false), Current(place, null, FaultSide.BeyondDevice, false));
        var nothingBeyond = _context.Method.Networks.All(variant => Complex.Abs(_values.At(variant, place).Beyond) < NoPart);
        return new DeviceCurrents(
            Current(place, new ThroughView(_values, place, faultIsBeyond: false), FaultSide.AtBus, false),
            Current(place, new ThroughView(_values, place, faultIsBeyond: true), FaultSide.BeyondDevice, nothingBeyond));
    }

    private ThroughCurrent Current(int place, ThroughView? view, FaultSide side, bool isWhole) =>
        new(_context, _places[place].Bus, view, side, isWhole);
}
