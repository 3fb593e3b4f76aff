using System.Numerics;

namespace NetFault.NodeTables;

/// <summary>
/// A class of networks that tables are made for, as points where its poles can lie, by the library's own <see cref="PoleRegion"/>.
/// Impedances between machines have R/X up to 5. Transient time constants are from 0.1 s at 50 Hz with X′d/Xd from 0.08, subtransient
/// ones have X″d/X′d from 0.3, each alone, and both in one machine where they are apart by a factor of 10. Motors have R/X up to 0.5.
/// How fast the R-L modes and the fastest machines decay is what sets the two classes apart. A
/// network outside of a class gets a larger error bound from the library, no wrong result.
/// </summary>
internal sealed class NetworkClass
{
    private const double LargestSectorRatio = 5.0, LargestTransientRate = 0.03;

    /// <summary>Smaller R/X, whose regions lie within that of the largest: a node between the edges would not be seen from them.</summary>
    private static readonly double[] InnerRatios = [0.2, 1.0, 2.5];

    /// <summary>A region's line of R-L modes begins at a share of its largest R/X; this one goes on to slow modes.</summary>
    private const double SlowRatio = 0.1;

    private NetworkClass(PolePoints[] ac, PolePoints[] dc)
    {
        AcFit = ac[0].Fit;
        AcCheck = [.. ac.SelectMany(points => points.Check)];
        DcFit = [.. dc[0].Fit, .. dc[1].Fit];
        DcCheck = [.. dc.SelectMany(points => points.Check)];
    }

    /// <summary>Places of AC poles, closer to each other than a fit needs.</summary>
    public Complex[] AcFit { get; }

    /// <summary>More of them, inside the region too.</summary>
    public Complex[] AcCheck { get; }

    /// <summary>Places of DC poles; none in quasi-static networks.</summary>
    public Complex[] DcFit { get; }

    /// <summary>More of them.</summary>
    public Complex[] DcCheck { get; }

    /// <summary>Branches of R/X up to 10, T″ and the time constants of motors from 16 ms at 50 Hz, 13 ms at 60 Hz.</summary>
    public static NetworkClass Usual(bool quasiStatic) => new Bounds(quasiStatic, LargestDcRate: 10.0, LargestMachineRate: 0.2).Make();

    /// <summary>R-L modes that decay with up to 100·ω, as far as the library resolves them; time constants from 10 ms at 50 Hz.</summary>
    public static NetworkClass Whole(bool quasiStatic) =>
        new Bounds(quasiStatic, LargestDcRate: PoleRegion.LargestDcRate, LargestMachineRate: 0.32).Make();

    private sealed record Bounds(bool QuasiStatic, double LargestDcRate, double LargestMachineRate)
    {
        public NetworkClass Make()
        {
            var inner = Array.ConvertAll(InnerRatios, Region);
            PoleRegion sector = Region(LargestSectorRatio), fast = Region(LargestDcRate), slow = Region(SlowRatio);
            return new NetworkClass(
                [sector.Ac(0), .. inner.Select(region => region.Ac(0))],
                [fast.Dc(0), slow.Dc(0), sector.Dc(0), .. inner.Select(region => region.Dc(0))]);
        }

        private PoleRegion Region(double ratio) => new(
            new PoleLimits
            {
                LargestResistanceRatio = ratio,
                Machines = [.. Machines()],
                MotorRates = [.. Rates(LargestMachineRate, 0.008, 12)],
                LargestMotorResistanceRatio = 0.5,
            },
            QuasiStatic);

        private IEnumerable<OperationalSource> Machines()
        {
            foreach (var transient in Rates(LargestTransientRate, 1e-5, 16))
                yield return Machine(0.92, transient, 0.0, 0.0);
            foreach (var subtransient in Rates(LargestMachineRate, 0.003, 12))
                yield return Machine(0.0, 0.0, 0.7, subtransient);
            foreach (var subtransient in Rates(LargestMachineRate, 0.05, 3))
            {
                foreach (var transient in Rates(0.1 * subtransient, 1e-4, 4))
                    yield return Machine(0.3 * 0.92, transient, 0.7, subtransient);
            }
        }
    }

    private static OperationalSource Machine(double share1, double rate1, double share2, double rate2) => new()
    {
        Resistance = 0.0,
        Reactance = 1.0,
        TransientShare = share1,
        TransientRate = rate1,
        SubtransientShare = share2,
        SubtransientRate = rate2,
    };

    private static IEnumerable<double> Rates(double largest, double smallest, int count) =>
        Enumerable.Range(0, count).Select(i => largest * Math.Pow(smallest / largest, i / (count - 1.0)));
}
