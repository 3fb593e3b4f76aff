using System.Globalization;

namespace NetFault.Tests.Published;

/// <summary>Tables of peak and asymmetry against X/R, one feeder at its terminals, from a network file.</summary>
public class PeakAndAsymmetryTableTests
{
    /// <summary>
    /// Source: A. L. Sheldrake, Handbook of Electrical Engineering for Practitioners in the Oil, Gas and Petrochemical Industry, Wiley 2003,
    /// table 8.1: peak, and largest one-phase RMS at half a cycle, over the symmetrical RMS. The RMS column is truncated in places, so that
    /// it is met to one unit of its last digit.
    /// </summary>
    [Theory]
    [InlineData("r_over_x: 0", 2.828, 1.732)]
    [InlineData("x_over_r: 100", 2.785, 1.696)]
    [InlineData("x_over_r: 33.322", 2.702, 1.630)]
    [InlineData("x_over_r: 24.979", 2.663, 1.598)]
    [InlineData("x_over_r: 19.974", 2.625, 1.568)]
    [InlineData("x_over_r: 9.9501", 2.455, 1.436)]
    [InlineData("x_over_r: 6.5912", 2.309, 1.330)]
    [InlineData("x_over_r: 4.8990", 2.183, 1.247)]
    [InlineData("x_over_r: 3.1798", 1.978, 1.130)]
    [InlineData("x_over_r: 2.2913", 1.819, 1.062)]
    [InlineData("x_over_r: 1.7321", 1.694, 1.026)]
    [InlineData("x_over_r: 1.0202", 1.517, 1.002)]
    [InlineData("r_over_x: 1e9", 1.414, 1.000)]
    public void Peak_and_half_cycle_RMS_are_those_of_the_handbook(string ratio, double peak, double rms)
    {
        var fault = Solve(ratio);
        Math.Round(fault.PeakKa / fault.InitialSymmetricalKa, 3).Should().Be(peak);
        var halfCycle = fault.AsymmetricalRmsKa(0.01) / fault.InitialSymmetricalKa;
        new[] { Math.Round(halfCycle, 3), Math.Floor(halfCycle * 1000) / 1000 }.Should().Contain(rms);
    }

    /// <summary>Source: IEC 61439-1 table 7, factor n for the peak withstand current.</summary>
    [Theory]
    [InlineData(0.7, 1.5)]
    [InlineData(0.5, 1.7)]
    [InlineData(0.3, 2.0)]
    [InlineData(0.25, 2.1)]
    [InlineData(0.2, 2.2)]
    public void The_peak_rounds_to_the_factor_n_of_IEC_61439(double powerFactor, double n)
    {
        var ratio = Math.Tan(Math.Acos(powerFactor)).ToString("R", CultureInfo.InvariantCulture);
        var fault = Solve("x_over_r: " + ratio);
        Math.Round(fault.PeakKa / fault.InitialSymmetricalKa, 1).Should().Be(n);
    }

    private static BusFault Solve(string ratio) => new FaultStudy(NetworkFile.Parse($$"""
        netfault: 1
        frequency_hz: 50
        buses:
          Q: {nominal_kv: 10}
        network_feeders:
          U: {bus: Q, short_circuit_ka: 1, {{ratio}}}
        """), new MachineDecrement()).EveryBus()[0];
}
