using System.Numerics;

namespace NetFault;

/// <summary>The currents at one bus: one solve for each network that the method needs, or the every-bus solution where it is there.</summary>
internal sealed class OneBusSolution
{
    private readonly StudyContext _context;
    private readonly StudyNetworks _networks;

    public OneBusSolution(StudyContext context, StudyNetworks networks)
    {
        _context = context;
        _networks = networks;
    }

    /// <summary>Solves for a fault at a bus through an impedance in ohm.</summary>
    public BusFault Solve(int bus, Complex faultImpedanceOhm)
    {
        var node = _networks.Circuit.NodeOfBus[bus];
        if (node < 0)
            return BusFault.DeEnergised(_context, bus);
        var wanted = _context.Method.Networks;
        var impedances = wanted.Select(one => At(_networks.Of(one), node)).ToArray();
        var fault = faultImpedanceOhm / _context.BaseOhm(_context.Network.Buses[bus]);
        return new BusFault(_context, bus, new SeenImpedances(wanted, impedances, 0, node, fault), faultImpedanceOhm);
    }

    private static DrivingPointImpedances At(SolvedNetwork network, int node)
    {
        if (network.HasDrivingPoints)
            return new DrivingPointImpedances([network.DrivingPoints.Impedances[node]], network.DrivingPoints.WorstResidual);
        var impedance = network.Column(node, out var residual)[node];
        return new DrivingPointImpedances([impedance], residual);
    }
}
