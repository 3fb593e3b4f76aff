using System.Numerics;
using NetFault.Tests.Support;
using static NetFault.Tests.Support.IecCases;

namespace NetFault.Tests.ByIec60909;

/// <summary>Oracle: IEC 60909-0:2016, 8.1 (κ by methods (a), (b), (c)) and 6.6.1 (R_Gf), evaluated by hand.</summary>
public class PeakTests
{
    [Theory]
    [InlineData(0.0)]
    [InlineData(0.05)]
    [InlineData(0.3)]
    [InlineData(1.0)]
    [InlineData(5.0)]
    public void One_series_path_has_the_kappa_of_its_own_ratio_by_8_1_1(double rOverX)
    {
        foreach (var rule in new[] { XOverRRule.EquivalentFrequency, XOverRRule.SmallestRatio })
        {
            var fault = new FaultStudy(Of(Bus("A", 20), Feeder("A", 10, rOverX)), new Iec60909 { XOverRRule = rule }).At("A");
            var kappa = 1.02 + 0.98 * Math.Exp(-3 * rOverX);
            fault.Iec60909!.Kappa.ShouldBe(kappa);
            fault.PeakKa.ShouldBe(kappa * Sqrt2 * 10);
        }
    }

    [Theory]
    [InlineData(50.0)]
    [InlineData(60.0)]
    public void Method_c_solves_the_network_at_20_or_24_Hz_by_8_1_2(double frequency)
    {
        var builder = new NetworkBuilder { FrequencyHz = frequency }.Add(TwoWays());
        var fc = frequency.Equals(50) ? 20.0 : 24.0;
        Complex At(Complex z) => new(z.Real, z.Imaginary / frequency * fc);
        var strong = Polar(1.1 * 20 / (Sqrt3 * 10), 0.05);
        var weak = Polar(1.1 * 20 / (Sqrt3 * 4), 0.2) + new Complex(1.5, 0.4);
        var low = At(strong) * At(weak) / (At(strong) + At(weak));
        var rOverX = low.Real / low.Imaginary * fc / frequency;
        var fault = builder.Build().At("A");
        fault.XOverR!.Value.ShouldBe(1 / rOverX);
        fault.PeakKa.ShouldBe(IecFormulas.Kappa(rOverX) * Sqrt2 * Ka(1.1, 20, strong * weak / (strong + weak)));
    }

    [Fact]
    public void Method_a_takes_the_smallest_ratio_of_all_branches_by_8_1_2()
    {
        var fault = new FaultStudy(Of(TwoWays()), new Iec60909 { XOverRRule = XOverRRule.SmallestRatio }).At("A");
        fault.Iec60909!.Kappa.ShouldBe(IecFormulas.Kappa(0.05));
        fault.PeakKa.ShouldBe(IecFormulas.Kappa(0.05) * Sqrt2 * fault.InitialSymmetricalKa);
    }

    [Fact]
    public void Method_b_has_its_margin_where_a_branch_has_a_ratio_of_0_3_or_more()
    {
        var fault = new FaultStudy(Of(TwoWays()), new Iec60909 { XOverRRule = XOverRRule.ComplexImpedance }).At("A");
        var strong = Polar(1.1 * 20 / (Sqrt3 * 10), 0.05);
        var weak = Polar(1.1 * 20 / (Sqrt3 * 4), 0.2) + new Complex(1.5, 0.4);
        var z = strong * weak / (strong + weak);
        fault.Iec60909!.Kappa.ShouldBe(Math.Min(2.0, 1.15 * IecFormulas.Kappa(z.Real / z.Imaginary)));
    }

    [Theory]
    [InlineData(0.299, false)]
    [InlineData(0.3, true)]
    public void Method_b_has_no_margin_where_all_branches_have_ratios_below_0_3(double lineRatio, bool margin)
    {
        var network = Of(Bus("A", 20), Bus("B", 20), Feeder("A", 10, 0.1), Line("A", "B", lineRatio, 1));
        var fault = new FaultStudy(network, new Iec60909 { XOverRRule = XOverRRule.ComplexImpedance }).At("B");
        var z = Polar(1.1 * 20 / (Sqrt3 * 10), 0.1) + new Complex(lineRatio, 1);
        fault.Iec60909!.Kappa.ShouldBe((margin ? 1.15 : 1) * IecFormulas.Kappa(z.Real / z.Imaginary));
    }

    [Theory]
    [InlineData(0.4, 1.8)]
    [InlineData(1.0, 1.8)]
    [InlineData(10.0, 2.0)]
    public void The_margin_of_method_b_is_limited_by_voltage(double kv, double limit)
    {
        var network = Of(Bus("A", kv), Bus("B", kv), Feeder("A", 10, 0.02), Line("A", "B", 1e-5, 3e-5));
        var fault = new FaultStudy(network, new Iec60909 { XOverRRule = XOverRRule.ComplexImpedance }).At("B");
        fault.Iec60909!.Kappa.Should().Be(limit);
    }

    /// <summary>6.6.1: R_Gf/X″d = 0.05 from 100 MVA, 0.07 below, 0.15 up to 1 kV; in ip alone.</summary>
    [Theory]
    [InlineData(100.0, 10.5, 0.05)]
    [InlineData(99.9, 10.5, 0.07)]
    [InlineData(25.0, 1.05, 0.07)]
    [InlineData(2.0, 1.0, 0.15)]
    [InlineData(0.8, 0.4, 0.15)]
    public void The_fictitious_resistance_is_in_the_peak_current_alone(double mva, double kv, double rGf)
    {
        var network = Of(Bus("A", kv), Generator("A") with { RatedMva = mva, RatedKv = kv });
        var own = 1.1 / 1.084 * new Complex(0.003, 0.14) * (kv * kv / mva);
        foreach (var rule in new[] { XOverRRule.EquivalentFrequency, XOverRRule.SmallestRatio })
        {
            var fault = new FaultStudy(network, new Iec60909 { XOverRRule = rule }).At("A");
            fault.InitialSymmetricalKa.ShouldBe(Ka(1.1, kv, own));
            fault.Iec60909!.Kappa.ShouldBe(IecFormulas.Kappa(rGf));
            fault.PeakKa.ShouldBe(IecFormulas.Kappa(rGf) * Sqrt2 * Ka(1.1, kv, own));
            fault.DcComponentKa(0.05).ShouldBe(Sqrt2 * Ka(1.1, kv, own) * Math.Exp(-2 * Math.PI * 50 * 0.05 * 0.003 / 0.14));
        }
    }

    private static NetworkElement[] TwoWays() =>
        [Bus("A", 20), Bus("B", 20), Feeder("A", 10, 0.05), Feeder("B", 4, 0.2), Line("A", "B", 1.5, 0.4)];
}
