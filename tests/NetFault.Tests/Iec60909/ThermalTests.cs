using NetFault.Tests.Support;
using static NetFault.Tests.Support.IecCases;

namespace NetFault.Tests.ByIec60909;

/// <summary>
/// Oracle: IEC 60909-0:2016, clause 12 and annex A: m by its formula, n by Simpson's rule over the current that annex A states.
/// </summary>
public class ThermalTests
{
    [Theory]
    [InlineData(0.02)]
    [InlineData(0.1)]
    [InlineData(1.0)]
    [InlineData(3.0)]
    public void Factor_m_is_the_mean_heat_of_the_direct_current(double duration)
    {
        foreach (var (frequency, rOverX) in new[] { (50.0, 0.05), (50.0, 0.3), (60.0, 0.1), (60.0, 1.0) })
        {
            var fault = new NetworkBuilder { FrequencyHz = frequency }.Add(Bus("A", 20), Feeder("A", 10, rOverX)).Build().At("A");
            var m = IecFormulas.FactorM(IecFormulas.Kappa(rOverX), frequency, duration);
            fault.Iec60909!.FactorM(duration).ShouldBe(m);
            fault.Iec60909.FactorN(duration).Should().Be(1);
            fault.Iec60909.ThermalEquivalentKa(duration).ShouldBe(10 * Math.Sqrt(m + 1));
        }
    }

    /// <summary>κ = 2: ln(κ − 1) = 0, of which the limit of m is 2.</summary>
    [Fact]
    public void Without_any_resistance_m_is_2() => Of(Bus("A", 20), Feeder("A", 10, 0)).At("A").Iec60909!.FactorM(1).Should().Be(2);

    [Theory]
    [InlineData(1.26, 0.1)]
    [InlineData(2.0, 0.5)]
    [InlineData(2.5, 1.0)]
    [InlineData(4.0, 0.1)]
    [InlineData(4.0, 3.0)]
    [InlineData(8.0, 1.0)]
    [InlineData(8.0, 10.0)]
    public void Factor_n_is_the_mean_heat_of_the_decaying_current(double initialOverSteady, double duration)
    {
        var one = Of(Bus("A", 10), Generator("A")).At("A").InitialSymmetricalKa;
        var lambda = one / initialOverSteady / (25 / Sqrt3 / 10.5);
        var fault = Of(Bus("A", 10), Generator("A") with { SteadyStateFactor = new MaxMin(lambda) }).At("A");
        (fault.InitialSymmetricalKa / fault.SteadyStateKa!.Value).ShouldBe(initialOverSteady);
        var n = IecFormulas.FactorN(initialOverSteady, duration);
        fault.Iec60909!.FactorN(duration).ShouldBe(n, relative: 1e-8);
        var m = IecFormulas.FactorM(IecFormulas.Kappa(0.07), 50, duration);
        fault.Iec60909.ThermalEquivalentKa(duration).ShouldBe(fault.InitialSymmetricalKa * Math.Sqrt(m + n), relative: 1e-8);
    }

    [Theory]
    [InlineData(0.0)]
    [InlineData(-1.0)]
    [InlineData(double.NaN)]
    public void Durations_that_are_none_are_refused(double duration)
    {
        var result = Of(Bus("A", 20), Feeder("A", 10)).At("A").Iec60909!;
        ((Action)(() => result.ThermalEquivalentKa(duration))).Should().Throw<ArgumentOutOfRangeException>();
        ((Action)(() => result.FactorM(duration))).Should().Throw<ArgumentOutOfRangeException>();
        ((Action)(() => result.FactorN(duration))).Should().Throw<ArgumentOutOfRangeException>();
    }
}
