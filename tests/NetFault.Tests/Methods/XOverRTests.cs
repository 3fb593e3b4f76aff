using System.Numerics;
using NetFault.Tests.Support;

namespace NetFault.Tests.Methods;

/// <summary>Oracles: two parallel branches by hand, the closed form of an R-L circuit, and its numerical integration.</summary>
public class XOverRTests
{
    [Fact]
    public void The_two_rules_differ_where_sources_of_different_X_over_R_meet()
    {
        // 20 kV: 400 MVA with X/R 10 beside 0.4 + j1.6 ohm in series with 250 MVA with X/R 4.
        var a = Complex.FromPolarCoordinates(400.0 / 400, Math.Atan(10));
        var b = Complex.FromPolarCoordinates(400.0 / 250, Math.Atan(4)) + new Complex(0.4, 1.6);
        var parallel = a * b / (a + b);
        var x = a.Imaginary * b.Imaginary / (a.Imaginary + b.Imaginary);
        var r = a.Real * b.Real / (a.Real + b.Real);
        Solve(XOverRRule.ComplexImpedance).XOverR.Should().BeApproximately(parallel.Imaginary / parallel.Real, 1e-9);
        Solve(XOverRRule.SeparateNetworks).XOverR.Should().BeApproximately(x / r, 1e-9);
        Solve(XOverRRule.SeparateNetworks).XOverRRule.Should().Be(XOverRRule.SeparateNetworks);

        static BusFault Solve(XOverRRule rule) =>
            new FaultStudy(Plants.TwoFeedersAndALine(), new MachineDecrement { XOverRRule = rule }).At("A");
    }

    [Fact]
    public void In_separate_networks_an_element_without_resistance_gets_a_share_of_its_reactance_and_that_is_said()
    {
        var study = new FaultStudy(Plants.OneFeeder(0), new MachineDecrement { XOverRRule = XOverRRule.SeparateNetworks });
        study.EveryBus()[0].XOverR.Should().BeApproximately(200, 1e-9);
        study.Assumptions.Should().ContainSingle().Which.Text.Should().Contain("R = |X|/200");
    }

    [Fact]
    public void The_impedance_of_the_fault_counts_in_both_rules()
    {
        foreach (var rule in new[] { XOverRRule.ComplexImpedance, XOverRRule.SeparateNetworks })
        {
            var study = new FaultStudy(Plants.OneFeeder(0.1), new MachineDecrement { XOverRRule = rule });
            var zk = 20 / Math.Sqrt(3) / 10;
            double x = zk / Math.Sqrt(1.01), r = 0.1 * x;
            var fault = study.At("Q", new Complex(0.5, 0.25));
            fault.XOverR.Should().BeApproximately((x + 0.25) / (r + 0.5), 1e-9);
            fault.InitialSymmetricalKa.Should().BeApproximately(20 / Math.Sqrt(3) / new Complex(r + 0.5, x + 0.25).Magnitude, 1e-9);
        }
    }

    [Fact]
    public void Without_resistance_there_is_no_X_over_R_and_the_DC_component_is_bounded_by_no_decay()
    {
        var fault = new FaultStudy(Plants.OneFeeder(0), new MachineDecrement()).EveryBus()[0];
        fault.XOverR.Should().BeNull();
        fault.XOverRStatus.Should().Be(XOverRStatus.NoResistance);
        fault.DcDecayRule.Should().Be(DcDecayRule.Undamped);
        fault.PeakKa.Should().BeApproximately(2 * Math.Sqrt(2) * 10, 1e-9);
        fault.DcComponentKa(3).Should().BeApproximately(Math.Sqrt(2) * 10, 1e-9);
    }

    [Fact]
    public void Seen_capacitive_from_the_fault_there_is_no_X_over_R_and_that_is_said()
    {
        var network = Plants.OneFeeder(0.1).With(
            new Bus { Id = "end", NominalKv = 20 }, new Line { Id = "C", From = "Q", To = "end", Ohm = new Impedance(0.1, -3) });
        var fault = new FaultStudy(network, new MachineDecrement()).At("end");
        fault.XOverRStatus.Should().Be(XOverRStatus.NotInductive);
        fault.DcDecayRule.Should().Be(DcDecayRule.Undamped);
    }

    [Theory]
    [InlineData(0.05)]
    [InlineData(0.7)]
    [InlineData(4.0)]
    [InlineData(17.0)]
    [InlineData(300.0)]
    public void The_peak_is_the_largest_current_of_the_circuit_integrated_over_time(double xOverR)
    {
        // Fourth-order Runge-Kutta on L·di/dt + R·i = √2·U·sin ωt from i = 0, in units of ωt, X = |Z|·sin φ.
        var phi = Math.Atan(xOverR);
        double x = Math.Sin(phi), r = Math.Cos(phi), i = 0, largest = 0;
        const double step = 1e-4;
        double Slope(double t, double at) => (Math.Sqrt(2) * Math.Sin(t) - r * at) / x;
        for (double t = 0; t < 2 * Math.PI; t += step)
        {
            var k1 = Slope(t, i);
            var k2 = Slope(t + step / 2, i + step / 2 * k1);
            var k3 = Slope(t + step / 2, i + step / 2 * k2);
            var k4 = Slope(t + step, i + step * k3);
            i += step / 6 * (k1 + 2 * k2 + 2 * k3 + k4);
            largest = Math.Max(largest, i);
        }
        new FaultStudy(Plants.OneFeeder(1 / xOverR), new MachineDecrement()).EveryBus()[0].PeakKa
            .Should().BeApproximately(10 * largest, 1e-7 * 10);
    }

    [Fact]
    public void A_negative_time_is_refused()
    {
        var fault = new FaultStudy(Plants.OneFeeder(0.1), new MachineDecrement()).EveryBus()[0];
        var ask = () => fault.DcComponentKa(-0.01);
        ask.Should().Throw<ArgumentOutOfRangeException>();
    }
}
