#if !NETSTANDARD_BUILD      // tables and their bounds are the same in both builds; once is enough for a slow test
using System.Globalization;
using System.Numerics;

namespace NetFault.Tests.Methods;

/// <summary>
/// The tables of nodes keep what they promise. The bounds are the library's own, of networks given by what limits their poles; the figures
/// they must keep are those that the tables were made for. Oracle of what a bound is worth: e^(zt) at poles z inside of the region, from
/// the quadratic equation of one motor behind an impedance drawn at random.
/// </summary>
public class DecayNodesTests
{
    private const int Seed = 20260;

    public static IEnumerable<object[]> Networks =>
        from ratio in new[] { 0.2, 1.0, 5.0 }
        from motors in new[] { false, true }
        select new object[] { ratio, motors };

    [Theory]
    [MemberData(nameof(Networks))]
    public void The_largest_tables_bound_the_exact_decay_within_2e_8_of_the_initial_current(double ratio, bool motors) =>
        LargestBounds(Limits(ratio, motors), quasiStatic: false).Should().OnlyContain(bound => bound < 2e-8);

    [Theory]
    [MemberData(nameof(Networks))]
    public void The_largest_tables_bound_quasi_static_decay_within_1e_9_of_the_initial_current(double ratio, bool motors) =>
        LargestBounds(Limits(ratio, motors), quasiStatic: true).Should().OnlyContain(bound => bound < 1e-9);

    /// <summary>
    /// Down to what the library asks for at the least: 0.4 of the smallest limit, 1e-7, and 1e-9 of quasi-static decay. Beyond that, a table
    /// for the whole class may be worse in a usual network than a smaller one for usual networks.
    /// </summary>
    [Theory]
    [InlineData(1.0, true)]
    [InlineData(5.0, false)]
    [InlineData(100.0, false)]
    public void More_nodes_bring_the_bound_down_in_every_window(double ratio, bool motors)
    {
        foreach (var (quasiStatic, enough) in new[] { (false, 0.4e-7), (true, 1e-9) })
        {
            var region = new PoleRegion(Limits(ratio, motors), quasiStatic);
            foreach (var window in Windows(quasiStatic))
            {
                var byCount = window.Tables
                    .GroupBy(table => table.Length, (_, tables) => tables.Min(table => Bound(table, window, region))).ToList();
                var asked = byCount.FindIndex(bound => bound <= enough);
                asked.Should().NotBe(-1);
                byCount.Take(asked + 1).Should().BeInDescendingOrder(Invariant($"of ω·t from {window.FirstAngle}, quasi-static {quasiStatic}"));
            }
        }
    }

    [Fact]
    public void Tables_stand_in_the_order_of_their_nodes_and_no_node_stands_twice()
    {
        foreach (var window in Windows(false).Concat(Windows(true)))
        {
            window.Tables.Select(table => table.Length).Should().BeInAscendingOrder();
            foreach (var table in window.Tables)
                table.Should().OnlyHaveUniqueItems();
        }
    }

    /// <summary>A motor behind w, R/X of both given: (ρ + s)·(p + g) + w·p = 0 with s = p + j and w = x·s + μ.</summary>
    [Theory]
    [InlineData(1.0)]
    [InlineData(5.0)]
    public void Poles_inside_of_the_region_are_met_within_the_bound_of_its_edges(double ratio)
    {
        var limits = Limits(ratio, motors: true);
        var region = new PoleRegion(limits, quasiStatic: false);
        var random = new Random(Seed);
        foreach (var window in DecayWindow.Exact)
        {
            foreach (var table in window.Tables)
            {
                var rule = new QuadratureRule(table, region);
                var angle = window.FirstAngle + random.NextDouble() * (window.LastAngle - window.FirstAngle);
                var weights = rule.At(angle);
                for (var i = 0; i < 50; i++)
                {
                    var (ac, dc) = PolesOfMotor(limits, random);
                    MeetsBound(table, weights.Ac, ac, Complex.Exp(ac * angle), weights.AcError);
                    MeetsBound(table, weights.Ac, dc, Complex.Zero, weights.AcError);
                    MeetsBound(table, weights.Dc, dc, Complex.Exp(dc * angle), weights.DcError);
                    MeetsBound(table, weights.Dc, ac, Complex.Zero, weights.DcError);
                }
            }
        }
    }

    private static void MeetsBound(Complex[] nodes, Complex[] weights, Complex pole, Complex expected, double bound)
    {
        var sum = Complex.Zero;
        for (var k = 0; k < nodes.Length; k++)
            sum += weights[k] / (nodes[k] - pole);
        Complex.Abs(sum - expected).Should().BeLessThanOrEqualTo(bound, Invariant($"{nodes.Length} nodes, pole {pole}, seed {Seed}"));
    }

    private static (Complex Ac, Complex Dc) PolesOfMotor(PoleLimits limits, Random random)
    {
        var rate = limits.MotorRates[random.Next(limits.MotorRates.Count)];
        var rho = limits.LargestMotorResistanceRatio * random.NextDouble();
        var flattest = Math.Atan2(1.0, limits.LargestResistanceRatio);
        var direction = flattest + random.NextDouble() * (Math.PI / 2.0 - flattest);
        var w = Complex.FromPolarCoordinates(0.01 * Math.Pow(10, 4 * random.NextDouble()), direction);
        double x = w.Imaginary, mu = w.Real;
        var j = Complex.ImaginaryOne;
        Complex a = 1.0 + x, b = rho + j + rate + x * j + mu, c = (rho + j) * rate;
        var root = Complex.Sqrt(b * b - 4.0 * a * c);
        Complex one = (-b + root) / (2.0 * a), other = (-b - root) / (2.0 * a);
        return one.Imaginary > other.Imaginary ? (one, other) : (other, one);
    }

    private static IEnumerable<double> LargestBounds(PoleLimits limits, bool quasiStatic)
    {
        var region = new PoleRegion(limits, quasiStatic);
        return Windows(quasiStatic).Select(window => Bound(window.Tables[window.Tables.Count - 1], window, region)).ToList();
    }

    private static double Bound(Complex[] nodes, DecayWindow window, PoleRegion region)
    {
        var rule = new QuadratureRule(nodes, region);
        return window.Probes(window.LastAngle).Max(angle => rule.At(angle).Error);
    }

    private static IReadOnlyList<DecayWindow> Windows(bool quasiStatic) => quasiStatic ? DecayWindow.QuasiStatic : DecayWindow.Exact;

    /// <summary>Invented: two machines, of 35 and 20 ms at 50 Hz, and motors of 15 to 60 ms.</summary>
    private static PoleLimits Limits(double ratio, bool motors) => new()
    {
        LargestResistanceRatio = ratio,
        Machines = [Machine(0.5, 0.004, 0.3, 0.09), Machine(0.4, 0.006, 0.4, 0.16)],
        MotorRates = motors ? [0.05, 0.1, 0.2] : [],
        LargestMotorResistanceRatio = motors ? Math.Min(0.3, ratio) : 0.0,
    };

    private static OperationalSource Machine(double share1, double rate1, double share2, double rate2) => new()
    {
        Resistance = 0.0,
        Reactance = 1.0,
        TransientShare = share1,
        TransientRate = rate1,
        SubtransientShare = share2,
        SubtransientRate = rate2,
    };

    private static string Invariant(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
#endif
