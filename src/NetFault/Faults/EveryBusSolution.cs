using System.Numerics;
using System.Runtime.ExceptionServices;

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
    private readonly IProgress<StudyProgress>? _progress;
    private readonly CancellationToken _cancellation;
    private int _done;

    public EveryBusSolution(
        StudyContext context, StudyNetworks networks, IProgress<StudyProgress>? progress, CancellationToken cancellation)
    {
        _context = context;
        _networks = networks;
        _progress = progress;
        _cancellation = cancellation;
    }

    /// <summary>Solves and gathers the results.</summary>
    public IReadOnlyList<BusFault> Run()
    {
        var wanted = _context.Method.Networks;
        var impedances = new DrivingPointImpedances[wanted.Count];
        SideBySide(wanted.Count, i =>
        {
            impedances[i] = _networks.Of(wanted[i]).DrivingPoints;
            Report(wanted[i].Name, wanted.Count + 1);
        });
        var results = Results(wanted, impedances);
        Report("currents", wanted.Count + 1);
        return Array.AsReadOnly(results);
    }

    /// <summary>Counts and tells in one step, so that the counts come in order.</summary>
    private void Report(string step, int total)
    {
        if (_progress is null)
            return;
        lock (_progress)
            _progress.Report(new StudyProgress(++_done, total, step));
    }

    /// <summary>Runs the steps on the cores there are; a step's exception comes out as it is, not gathered in another.</summary>
    private void SideBySide(int count, Action<int> step)
    {
        _cancellation.ThrowIfCancellationRequested();
        try
        {
            Parallel.For(0, count, new ParallelOptions { CancellationToken = _cancellation }, step);
        }
        catch (AggregateException gathered)
        {
            ExceptionDispatchInfo.Capture(gathered.InnerExceptions[0]).Throw();
        }
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
