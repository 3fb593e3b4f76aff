using System.Numerics;
using static NetFault.Tests.Support.IecCases;

namespace NetFault.Tests.ByIec60909;

/// <summary>Oracle: the formulas of IEC 60909-0:2016, 6.3.3 and 6.6, evaluated by hand on Zk in ohm.</summary>
public class CorrectionFactorTests
{
    private static readonly Transformer TwoWindings = new()
    {
        Id = "T", Hv = "H", Lv = "L", RatedMva = 25, RatedHvKv = 115, RatedLvKv = 10.5, ShortCircuitVoltagePercent = 12,
        ResistivePercent = 0.5,
    };

    [Theory]
    [InlineData(10.0, null, 1.10)]
    [InlineData(0.69, null, 1.10)]
    [InlineData(0.69, 6.0, 1.05)]
    public void K_T_takes_cmax_of_the_low_voltage_side_by_6_3_3(double lowKv, double? tolerance, double cMax)
    {
        var network = Of(Bus("H", 110), Bus("L", lowKv, tolerance), Feeder("H", 20, minKa: 15),
            TwoWindings with { RatedLvKv = lowKv * 1.05 });
        var xT = Math.Sqrt(0.12 * 0.12 - 0.005 * 0.005);
        var kT = 0.95 * cMax / (1 + 0.6 * xT);
        foreach (var (which, cHigh, ka) in new[] { (ShortCircuitCase.Maximum, 1.10, 20.0), (ShortCircuitCase.Minimum, 1.00, 15.0) })
        {
            var toLow = lowKv * 1.05 / 115;
            var expected = Polar(cHigh * 110 / (Sqrt3 * ka), 0.1) * toLow * toLow
                + kT * new Complex(0.005, xT) * (lowKv * 1.05 * lowKv * 1.05 / 25);
            ShouldBeClose(network.At("L", which).ImpedanceOhm!.Value, expected);
        }
    }

    [Fact]
    public void A_transformer_by_load_losses_has_the_resistance_of_6_3_1()
    {
        var network = Of(Bus("H", 110), Bus("L", 10), Feeder("H", 20), TwoWindings with { ResistivePercent = null, LoadLossKw = 150 });
        double r = 0.150 / 25, x = Math.Sqrt(0.12 * 0.12 - r * r), toLow = 10.5 / 115;
        var expected = Polar(1.1 * 110 / (Sqrt3 * 20), 0.1) * toLow * toLow + 0.95 * 1.1 / (1 + 0.6 * x) * new Complex(r, x)
            * (10.5 * 10.5 / 25);
        ShouldBeClose(network.At("L").ImpedanceOhm!.Value, expected);
    }

    /// <summary>
    /// 6.3.3: each pair has its own K_T with its own x, before the star is made; each pair is on the smaller of its two ratings.
    /// </summary>
    [Fact]
    public void K_T_of_three_windings_is_by_pairs_before_the_star()
    {
        var network = Of(Bus("H", 380), Bus("M", 110), Bus("L", 30), Feeder("H", 38), ThreeWindings);
        Complex Pair(double uk, double ur, double mva)
        {
            var x = Math.Sqrt(uk * uk - ur * ur) / 100;
            return 0.95 * 1.1 / (1 + 0.6 * x) * new Complex(ur / 100, x) * (400.0 * 400 / mva);
        }
        Complex hm = Pair(21, 0.26, 350), hl = Pair(10, 0.16, 50), ml = Pair(7, 0.16, 50);
        Complex legH = (hm + hl - ml) / 2, legM = (hm + ml - hl) / 2, legL = (hl + ml - hm) / 2;
        var feeder = Polar(1.1 * 380 / (Sqrt3 * 38), 0.1);
        ShouldBeClose(network.At("M").ImpedanceOhm!.Value, (feeder + legH + legM) * (120.0 / 400 * 120 / 400));
        ShouldBeClose(network.At("L").ImpedanceOhm!.Value, (feeder + legH + legL) * (30.0 / 400 * 30 / 400));
    }

    [Fact]
    public void K_T_of_two_of_three_windings_is_that_of_the_pair()
    {
        var network = Of(Bus("M", 110), Bus("L", 30), Feeder("M", 20), ThreeWindings with { Hv = null });
        var x = Math.Sqrt(7 * 7 - 0.16 * 0.16) / 100;
        var pair = 0.95 * 1.1 / (1 + 0.6 * x) * new Complex(0.0016, x) * (30.0 * 30 / 50);
        ShouldBeClose(network.At("L").ImpedanceOhm!.Value, Polar(1.1 * 110 / (Sqrt3 * 20), 0.1) * (30.0 / 120 * 30 / 120) + pair);
    }

    [Theory]
    [InlineData(10.0, 10.5, 0.0)]
    [InlineData(10.5, 10.5, 0.0)]
    [InlineData(10.0, 10.5, 5.0)]
    [InlineData(11.0, 10.5, 7.5)]
    public void K_G_of_a_generator_connected_directly_by_6_6_1(double nominalKv, double ratedKv, double pG)
    {
        var network = Of(Bus("A", nominalKv), Generator("A") with { RatedKv = ratedKv, VoltageRegulationPercent = pG });
        var kG = nominalKv / (ratedKv * (1 + pG / 100)) * 1.1 / (1 + 0.14 * 0.6);
        var expected = kG * new Complex(0.003, 0.14) * (ratedKv * ratedKv / 25);
        foreach (var (which, c) in new[] { (ShortCircuitCase.Maximum, 1.1), (ShortCircuitCase.Minimum, 1.0) })
        {
            var fault = network.At("A", which);
            ShouldBeClose(fault.ImpedanceOhm!.Value, expected);
            fault.InitialSymmetricalKa.ShouldBe(Ka(c, nominalKv, expected));
        }
    }

    [Fact]
    public void K_G_at_low_voltage_takes_cmax_of_its_tolerance()
    {
        var machine = Generator("A") with { RatedMva = 0.8, RatedKv = 0.4 };
        ShouldBeClose(Of(Bus("A", 0.4, 6), machine).At("A").ImpedanceOhm!.Value, 1.05 / 1.084 * new Complex(0.003, 0.14) * (0.16 / 0.8));
        ShouldBeClose(Of(Bus("A", 0.4), machine).At("A").ImpedanceOhm!.Value, 1.10 / 1.084 * new Complex(0.003, 0.14) * (0.16 / 0.8));
    }

    /// <summary>6.6.2: synchronous motors and condensers as generators; an ideal condenser has sin φ = 1.</summary>
    [Theory]
    [InlineData(SynchronousService.Motor, 0.9, 0.43588989435406735)]
    [InlineData(SynchronousService.Condenser, null, 1.0)]
    public void Synchronous_motors_and_condensers_carry_K_G(SynchronousService service, double? cosPhi, double sinPhi)
    {
        var network = Of(Bus("A", 10), Generator("A") with { Service = service, RatedPowerFactor = cosPhi });
        var expected = 10 / 10.5 * 1.1 / (1 + 0.14 * sinPhi) * new Complex(0.003, 0.14) * (10.5 * 10.5 / 25);
        ShouldBeClose(network.At("A").ImpedanceOhm!.Value, expected);
    }

    private static ThreeWindingTransformer ThreeWindings => new()
    {
        Id = "T", Hv = "H", Mv = "M", Lv = "L", RatedMva = new WindingValues(350, 350, 50), RatedKv = new WindingValues(400, 120, 30),
        ShortCircuitVoltagePercent = new WindingPairValues(21, 10, 7), ResistivePercent = new WindingPairValues(0.26, 0.16, 0.16),
    };

    private static void ShouldBeClose(Complex actual, Complex expected) =>
        (actual - expected).Magnitude.Should().BeLessThan(1e-11 * expected.Magnitude, $"{actual} should be {expected}");
}
