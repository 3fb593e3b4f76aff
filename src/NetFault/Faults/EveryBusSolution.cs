using System.Numerics;

namespace NetFault;

/// <summary>
/// The whole way of an every-bus study: each network the method asks for is factored and its selected inverse taken, side by side on the
/// cores there are; then Zkk of each bus becomes its currents.
/// </summary>
internal sealed class EveryBusSolution
{
    /// <summary>Buses between two looks at the cancellation token.</summary>
    private const int BusesInAStride = 8192;

    private readonly StudyContext _context;
    private readonly StudyNetworks _networks;
    private readonly StepCounter _steps;
    private readonly CancellationToken _cancellation;

    public EveryBusSolution(
        StudyContext context, StudyNetworks networks, IProgress<StudyProgress>? progress, CancellationToken cancellation)
    {
        _context = context;
        _networks = networks;
        _steps = new StepCounter(progress, context.Method.Networks.Count + 1);
        _cancellation = cancellation;
    }

    /// <summary>Solves and gathers the results.</summary>
    public IReadOnlyList<BusFault> Run()
    {
        var wanted = _context.Method.Networks;
        var impedances = new DrivingPointImpedances[wanted.Count];
        SideBySide.Run(wanted.Count, _cancellation, i =>
        {
            impedances[i] = _networks.Of(wanted[i]).DrivingPoints;
            _steps.Done(wanted[i].Name);
        });
        var results = Results(wanted, impedances);
        _steps.Done("currents");
        return Array.AsReadOnly(results);
    }

    private BusFault[] Results(IReadOnlyList<NetworkVariant> variants, DrivingPointImpedances[] impedances)
    {
        var buses = _context.Network.Buses;
        var results = new BusFault[buses.Count];
        for (var bus = 0; bus < results.Length; bus++)
        {
            if (bus % BusesInAStride == 0)
                _cancellation.ThrowIfCancellationRequested();
            var node = _networks.Circuit.NodeOfBus[bus];
            results[bus] = node < 0
                ? BusFault.DeEnergised(_context, bus)
                : new BusFault(_context, bus, new SeenImpedances(variants, impedances, node, node, Complex.Zero), Complex.Zero);
        }
        return results;
    }
}
