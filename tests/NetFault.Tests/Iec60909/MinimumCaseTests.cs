using System.Numerics;
using static NetFault.Tests.Support.IecCases;

namespace NetFault.Tests.ByIec60909;

/// <summary>
/// Oracle: IEC 60909-0:2016, 7.1.2 (conditions of the minimum case) and 6.4 (resistance at the end temperature), by hand.
/// </summary>
public class MinimumCaseTests
{
    [Theory]
    [InlineData(160.0, 1.56)]
    [InlineData(20.0, 1.0)]
    [InlineData(null, 1.24)]
    public void Lines_have_their_resistance_at_the_end_temperature_in_the_minimum_case_alone(double? celsius, double factor)
    {
        var network = Of(Bus("A", 10), Bus("B", 10), Feeder("A", 12, minKa: 8),
            Line("A", "B", 0.3, 0.1) with { EndTemperatureC = celsius });
        var warm = Polar(1.0 * 10 / (Sqrt3 * 8), 0.1) + new Complex(0.3 * factor, 0.1);
        network.At("B", ShortCircuitCase.Minimum).InitialSymmetricalKa.ShouldBe(Ka(1.0, 10, warm));
        network.At("B").InitialSymmetricalKa.ShouldBe(Ka(1.1, 10, Polar(1.1 * 10 / (Sqrt3 * 12), 0.1) + new Complex(0.3, 0.1)));
    }

    [Fact]
    public void An_end_temperature_of_80_degrees_is_said_to_be_assumed()
    {
        var network = Of(Bus("A", 10), Bus("B", 10), Feeder("A", 12, minKa: 8), Line("A", "B", 0.3, 0.1));
        var study = new FaultStudy(network, new Iec60909 { Case = ShortCircuitCase.Minimum });
        var assumption = study.Assumptions.Should().ContainSingle().Subject;
        (assumption.Section, assumption.ElementId, assumption.Key).Should().Be(("lines", "AB", "end_temperature_c"));
        assumption.Text.Should().Contain("80");
        study.At("B").Assumptions.Should().Equal(assumption);
        new FaultStudy(network, new Iec60909()).Assumptions.Should().BeEmpty();
    }

    [Fact]
    public void Asynchronous_motors_are_not_in_the_minimum_case_and_generators_are()
    {
        var network = Of(Bus("A", 10), Feeder("A", 12, minKa: 8), Motor("A"));
        network.At("A", ShortCircuitCase.Minimum).InitialSymmetricalKa.ShouldBe(8);
        network.At("A", ShortCircuitCase.Minimum).Iec60909!.BreakingKa(0.1).ShouldBe(8);
        var zg = 10 / 10.5 * 1.1 / 1.084 * new Complex(0.003, 0.14) * (10.5 * 10.5 / 25);
        Of(Bus("A", 10), Generator("A"), Motor("A")).At("A", ShortCircuitCase.Minimum).InitialSymmetricalKa.ShouldBe(Ka(1.0, 10, zg));
    }

    /// <summary>λmax in a minimum would overstate it: the result or the study has to say what was done.</summary>
    [Fact]
    public void A_machine_without_its_minimum_factor_is_not_silently_given_the_maximum_one()
    {
        var network = Of(Bus("A", 10), Generator("A") with { SteadyStateFactor = new MaxMin(3.2) });
        var study = new FaultStudy(network, new Iec60909 { Case = ShortCircuitCase.Minimum });
        var said = study.Assumptions.Any(one => one.Key.StartsWith("steady_state_factor", StringComparison.Ordinal));
        (said || study.At("A").Iec60909!.SteadyStateCurrentRule == SteadyStateCurrentRule.RadialFactorMissing).Should().BeTrue();
    }
}
