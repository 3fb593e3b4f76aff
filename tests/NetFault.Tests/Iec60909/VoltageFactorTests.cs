using System.Numerics;
using static NetFault.Tests.Support.IecCases;

namespace NetFault.Tests.ByIec60909;

/// <summary>Oracle: IEC 60909-0:2016, table 1 (5.3.1) and 6.2, evaluated by hand.</summary>
public class VoltageFactorTests
{
    [Theory]
    [InlineData(0.4, 6.0, 1.05, 0.95)]
    [InlineData(0.4, 10.0, 1.10, 0.90)]
    [InlineData(0.4, null, 1.10, 0.90)]
    [InlineData(1.0, 6.0, 1.05, 0.95)]
    [InlineData(1.0, null, 1.10, 0.90)]
    [InlineData(1.001, null, 1.10, 1.00)]
    [InlineData(10.0, null, 1.10, 1.00)]
    [InlineData(35.0, null, 1.10, 1.00)]
    [InlineData(110.0, null, 1.10, 1.00)]
    [InlineData(400.0, null, 1.10, 1.00)]
    public void The_voltage_factor_is_that_of_table_1(double kv, double? tolerance, double max, double min)
    {
        var network = Of(Bus("A", kv, tolerance), Bus("B", kv, tolerance), Feeder("A", 20, minKa: 12),
            Line("A", "B", 0, 0.03) with { EndTemperatureC = 20 });
        foreach (var (which, c, feederKa) in new[] { (ShortCircuitCase.Maximum, max, 20.0), (ShortCircuitCase.Minimum, min, 12.0) })
        {
            var fault = network.At("B", which);
            fault.Iec60909!.VoltageFactor.Should().Be(c);
            var ohm = Polar(c * kv / (Sqrt3 * feederKa), 0.1) + new Complex(0, 0.03);
            fault.InitialSymmetricalKa.ShouldBe(Ka(c, kv, ohm));
        }
    }

    [Fact]
    public void A_feeder_gives_its_own_current_at_its_bus_in_both_cases_by_6_2()
    {
        var network = Of(Bus("A", 20), Feeder("A", 16, minKa: 9));
        network.At("A").InitialSymmetricalKa.ShouldBe(16);
        network.At("A", ShortCircuitCase.Minimum).InitialSymmetricalKa.ShouldBe(9);
    }

    [Fact]
    public void A_feeder_by_power_is_the_same_as_by_current_by_6_2()
    {
        var byPower = new NetworkFeeder { Id = "Q", Bus = "A", ShortCircuitMva = new MaxMin(500, 300), XOverR = 10 };
        var network = Of(Bus("A", 20), byPower);
        network.At("A").InitialSymmetricalKa.ShouldBe(500 / Sqrt3 / 20);
        var fault = network.At("A", ShortCircuitCase.Minimum);
        fault.InitialSymmetricalKa.ShouldBe(300 / Sqrt3 / 20);
        fault.ShortCircuitMva.ShouldBe(300);
        (fault.ImpedanceOhm!.Value - Polar(1.0 * 20 * 20 / 300, 0.1)).Magnitude.Should().BeLessThan(1e-12);
    }

    [Fact]
    public void A_feeder_without_a_minimum_keeps_its_maximum_and_the_study_says_so()
    {
        var network = Of(Bus("A", 20), Feeder("A", 16));
        var study = new FaultStudy(network, new Iec60909 { Case = ShortCircuitCase.Minimum });
        study.At("A").InitialSymmetricalKa.ShouldBe(16);
        study.Assumptions.Should().ContainSingle().Which.ElementId.Should().Be("QA");
        new FaultStudy(network, new Iec60909()).Assumptions.Should().BeEmpty();
    }
}
