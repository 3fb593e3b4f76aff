using System.Numerics;
using NetFault.Tests.Support;
using static NetFault.Tests.Support.IecCases;

namespace NetFault.Tests.ByIec60909;

/// <summary>Oracle: IEC 60909-0:2016, clause 10 (μ, q, radial and meshed rules), evaluated by hand.</summary>
public class BreakingCurrentTests
{
    [Theory]
    [InlineData(0.10)]
    [InlineData(0.14)]
    [InlineData(0.25)]
    [InlineData(0.40)]
    public void One_generators_breaking_current_falls_by_mu_at_each_delay(double xd)
    {
        var network = Of(Bus("A", 10), Generator("A") with { ReactancePu = new MachineReactances(xd) });
        var initial = Ka(1.1, 10, 10 / 10.5 * 1.1 / (1 + xd * 0.6) * new Complex(0.003, xd) * (10.5 * 10.5 / 25));
        var ratio = initial / (25 / Sqrt3 / 10.5);
        var at002 = 0.84 + 0.26 * Math.Exp(-0.26 * ratio);
        var at005 = 0.71 + 0.51 * Math.Exp(-0.30 * ratio);
        var at010 = 0.62 + 0.72 * Math.Exp(-0.32 * ratio);
        var at025 = 0.56 + 0.94 * Math.Exp(-0.38 * ratio);
        foreach (var fault in new[] { network.At("A"), network.AmongAll("A") })
        {
            fault.Iec60909!.BreakingCurrentRule.Should().Be(BreakingCurrentRule.Radial);
            foreach (var (delay, mu) in new[]
            {
                (0.02, at002), (0.05, at005), (0.10, at010), (0.25, at025), (0.26, at025), (2.0, at025),
                (0.035, (at002 + at005) / 2), (0.075, (at005 + at010) / 2), (0.175, (at010 + at025) / 2), (0.22, 0.2 * at010 + 0.8 * at025),
            })
            {
                fault.Iec60909.BreakingKa(delay).ShouldBe(mu * initial, $"{delay} s");
                fault.SymmetricalRmsKa(delay).ShouldBe(mu * initial, $"{delay} s");
                fault.Iec60909.Machines.Single().Mu(delay).ShouldBe(mu);
            }
        }
    }

    /// <summary>x″d = 0.6 gives I″k/IrG = (1 + 0.6·0.6)/0.6 = 2.27 (Ra = 0), a line of 0.37 ohm brings it just below 2.</summary>
    [Fact]
    public void Mu_is_1_up_to_twice_the_rated_current()
    {
        var machine = Generator("A") with { ReactancePu = new MachineReactances(0.6), ArmatureResistancePu = 0 };
        var z = 10 / 10.5 * 1.1 / 1.36 * 0.6 * (10.5 * 10.5 / 25);
        var atTwo = 1.1 * 10 / Sqrt3 / (2 * 25 / Sqrt3 / 10.5) - z;
        var near = Of(Bus("A", 10), Bus("B", 10), machine, Line("A", "B", 0, atTwo * 0.999)).At("B");
        near.Iec60909!.BreakingCurrentRule.Should().Be(BreakingCurrentRule.Radial);
        near.Iec60909.BreakingKa(0.02).Should().BeLessThan(0.996 * near.InitialSymmetricalKa);
        var far = Of(Bus("A", 10), Bus("B", 10), machine, Line("A", "B", 0, atTwo * 1.001)).At("B");
        far.Iec60909!.BreakingCurrentRule.Should().Be(BreakingCurrentRule.FarFromMachines);
        far.Iec60909.BreakingKa(0.02).Should().Be(far.InitialSymmetricalKa);
        far.Iec60909.Machines.Should().BeEmpty();
    }

    [Theory]
    [InlineData(6000, 1)]
    [InlineData(2000, 2)]
    [InlineData(1000, 1)]
    [InlineData(160, 2)]
    public void A_motors_breaking_current_falls_by_mu_and_q_beside_a_feeder(double kw, int pairs)
    {
        var motor = Motor("A") with { RatedKw = kw, PolePairs = pairs, Count = 2, ROverX = 0.1 };
        var network = Of(Bus("A", 10), Feeder("A", 12), motor);
        var rated = 2 * kw / 1000 / 0.95 / 0.88 / Sqrt3 / 10;
        var own = 1.1 * 10 / Sqrt3 / Polar(100 / (2 * kw / 1000 / 0.95 / 0.88) / 5.5, 0.1);
        own.Magnitude.ShouldBe(1.1 * 5.5 * rated);
        double m = kw / 1000 / pairs, ratio = 1.1 * 5.5;
        double Q(double a, double b) => Math.Min(1, a + b * Math.Log(m));
        foreach (var (delay, mu, q) in new[]
        {
            (0.02, 0.84 + 0.26 * Math.Exp(-0.26 * ratio), Q(1.03, 0.12)), (0.05, 0.71 + 0.51 * Math.Exp(-0.30 * ratio), Q(0.79, 0.12)),
            (0.10, 0.62 + 0.72 * Math.Exp(-0.32 * ratio), Q(0.57, 0.12)), (0.25, 0.56 + 0.94 * Math.Exp(-0.38 * ratio), Q(0.26, 0.10)),
        })
        {
            var feeder = Complex.FromPolarCoordinates(12, -Math.Atan2(1, 0.1));
            var fault = network.At("A");
            fault.Iec60909!.BreakingCurrentRule.Should().Be(BreakingCurrentRule.Radial);
            fault.Iec60909.BreakingKa(delay).ShouldBe((feeder + mu * q * own).Magnitude, $"{delay} s");
            fault.Iec60909.Machines.Single().Q(delay).ShouldBe(q);
        }
    }

    [Fact]
    public void Q_between_the_curves_is_interpolated_and_the_curves_end_at_1()
    {
        var share = Of(Bus("A", 10), Feeder("A", 12),
            Motor("A") with { RatedKw = 4000, PolePairs = 2 }).At("A").Iec60909!.Machines.Single();
        var at005 = 0.79 + 0.12 * Math.Log(2);
        share.Q(0.02).Should().Be(1);
        share.Q(0.035).ShouldBe((1 + at005) / 2);
        share.Q(0.3).ShouldBe(0.26 + 0.10 * Math.Log(2));
    }

    /// <summary>The meshed equation of 10.1.2: ΔU″G = jX″dK·I″kG with K_G·X″d, as phasors.</summary>
    [Fact]
    public void A_bus_behind_generator_and_feeder_has_the_meshed_breaking_current()
    {
        var network = Of(Bus("A", 10), Bus("B", 10), Generator("A"), Feeder("A", 12), Line("A", "B", 0.05, 0.1));
        var zg = 10 / 10.5 * 1.1 / 1.084 * new Complex(0.003, 0.14) * (10.5 * 10.5 / 25);
        var zq = Polar(1.1 * 10 / (Sqrt3 * 12), 0.1);
        var e = 1.1 * 10 / Sqrt3;
        var total = e / (zg * zq / (zg + zq) + new Complex(0.05, 0.1));
        var own = total * zq / (zg + zq);
        var ratio = own.Magnitude / (25 / Sqrt3 / 10.5);
        ratio.Should().BeGreaterThan(2);
        var mu = 0.62 + 0.72 * Math.Exp(-0.32 * ratio);
        var expected = total - new Complex(0, zg.Imaginary) * own / e * (1 - mu) * own;
        foreach (var fault in new[] { network.At("B"), network.AmongAll("B") })
        {
            fault.Iec60909!.BreakingCurrentRule.Should().Be(BreakingCurrentRule.Meshed);
            fault.Iec60909.BreakingKa(0.1).ShouldBe(expected.Magnitude);
        }
        network.At("A").Iec60909!.BreakingCurrentRule.Should().Be(BreakingCurrentRule.Radial);
    }

    /// <summary>7.1.2: motors are neglected in the minimum case, so the generator is alone on its way to the fault.</summary>
    [Fact]
    public void Motors_make_no_bus_meshed_in_the_minimum_case_where_they_are_not_in_the_network()
    {
        var network = Of(Bus("A", 10), Bus("B", 10), Generator("A"), Motor("A"), Line("A", "B", 0, 0.01));
        var without = Of(Bus("A", 10), Bus("B", 10), Generator("A"), Line("A", "B", 0, 0.01));
        var fault = network.At("B", ShortCircuitCase.Minimum);
        fault.Iec60909!.BreakingCurrentRule.Should().Be(BreakingCurrentRule.Radial);
        fault.Iec60909.BreakingKa(0.1).ShouldBe(without.At("B", ShortCircuitCase.Minimum).Iec60909!.BreakingKa(0.1));
    }

    /// <summary>10.1.2.1: single-fed, Ib = μ·I″k, whatever the taps of the two transformers in parallel on the way.</summary>
    [Theory]
    [InlineData(115, 121)]
    [InlineData(121, 115)]
    public void A_single_fed_bus_behind_parallel_transformers_of_unequal_taps_has_mu_times_its_initial_current(
        double firstKv, double secondKv)
    {
        var transformer = new Transformer
        {
            Id = "T1", Hv = "H", Lv = "A", RatedMva = 30, RatedHvKv = firstKv, RatedLvKv = 10.5, ShortCircuitVoltagePercent = 4,
            ResistivePercent = 0.3,
        };
        var fault = Of(Bus("H", 110), Bus("A", 10), Generator("A"), transformer,
            transformer with { Id = "T2", RatedHvKv = secondKv }).At("H");
        fault.Iec60909!.BreakingCurrentRule.Should().Be(BreakingCurrentRule.Radial);
        var mu = IecFormulas.Mu(fault.Iec60909.Machines.Single().RatioToRated, 0.1);
        fault.Iec60909.BreakingKa(0.1).ShouldBe(mu * fault.InitialSymmetricalKa);
    }

    [Theory]
    [InlineData(0.0)]
    [InlineData(0.0199)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void Delays_for_which_there_is_no_curve_are_refused(double delay)
    {
        var result = Of(Bus("A", 10), Generator("A")).At("A").Iec60909!;
        ((Action)(() => result.BreakingKa(delay))).Should().Throw<ArgumentOutOfRangeException>();
        ((Action)(() => result.AsymmetricalBreakingKa(delay))).Should().Throw<ArgumentOutOfRangeException>();
        ((Action)(() => result.Machines.Single().Mu(delay))).Should().Throw<ArgumentOutOfRangeException>();
    }
}
