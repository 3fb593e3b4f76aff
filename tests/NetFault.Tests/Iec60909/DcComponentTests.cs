using System.Numerics;
using NetFault.Tests.Support;
using static NetFault.Tests.Support.IecCases;

namespace NetFault.Tests.ByIec60909;

/// <summary>
/// Oracle: IEC 60909-0:2016, clause 9: i_dc = √2·I″k·e^(−2π·f·t·R/X), R/X by the equivalent frequency of its table, by hand.
/// </summary>
public class DcComponentTests
{
    [Theory]
    [InlineData(0.0, 0.27)]
    [InlineData(0.99, 0.27)]
    [InlineData(1.0, 0.15)]
    [InlineData(2.49, 0.15)]
    [InlineData(2.5, 0.092)]
    [InlineData(4.99, 0.092)]
    [InlineData(5.0, 0.055)]
    [InlineData(12.49, 0.055)]
    public void The_equivalent_frequency_steps_by_cycles_with_strict_limits(double cycles, double fcOverF)
    {
        foreach (var frequency in new[] { 50.0, 60.0 })
        {
            var network = new NetworkBuilder { FrequencyHz = frequency }.Add(
                Bus("A", 20), Bus("B", 20), Feeder("A", 10, 0.05), Feeder("B", 4, 0.2), Line("A", "B", 1.5, 0.4)).Build();
            Complex At(Complex z) => new(z.Real, z.Imaginary * fcOverF);
            var strong = Polar(1.1 * 20 / (Sqrt3 * 10), 0.05);
            var weak = Polar(1.1 * 20 / (Sqrt3 * 4), 0.2) + new Complex(1.5, 0.4);
            var low = At(strong) * At(weak) / (At(strong) + At(weak));
            var rOverX = low.Real / low.Imaginary * fcOverF;
            var initial = Ka(1.1, 20, strong * weak / (strong + weak));
            foreach (var fault in new[] { network.At("A"), network.AmongAll("A") })
            {
                fault.Iec60909!.DcFrequencyRatio(cycles / frequency).Should().Be(fcOverF);
                fault.DcComponentKa(cycles / frequency).ShouldBe(Sqrt2 * initial * Math.Exp(-2 * Math.PI * cycles * rOverX));
            }
        }
    }

    [Fact]
    public void The_direct_current_of_one_path_decays_with_its_own_ratio()
    {
        var fault = Of(Bus("A", 20), Feeder("A", 10, 0.1)).At("A");
        foreach (var t in new[] { 0, 0.01, 0.03, 0.06, 0.2 })
            fault.DcComponentKa(t).ShouldBe(Sqrt2 * 10 * Math.Exp(-2 * Math.PI * 50 * t * 0.1));
    }

    /// <summary>Clause 10: the asymmetrical breaking current is √(Ib² + i_dc²) at the same instant.</summary>
    [Fact]
    public void The_asymmetrical_breaking_current_joins_Ib_and_the_direct_current()
    {
        var fault = Of(Bus("A", 10), Generator("A")).At("A");
        double ib = fault.Iec60909!.BreakingKa(0.05), dc = fault.DcComponentKa(0.05);
        fault.Iec60909.AsymmetricalBreakingKa(0.05).ShouldBe(Math.Sqrt(ib * ib + dc * dc));
        fault.AsymmetricalRmsKa(0.05).ShouldBe(Math.Sqrt(ib * ib + dc * dc));
    }
}
