namespace NetFault.Tests.Duty;

/// <summary>Published relations, to their printed digits (from memory of the standards named).</summary>
public class StandardRatingsTests
{
    [Theory]
    [InlineData(50, 0.045, 2.5)]
    [InlineData(60, 0.045, 2.6)]
    [InlineData(50, 0.12, 2.7)]
    [InlineData(60, 0.075, 2.7)]
    public void The_making_factors_of_IEC_62271_100(double hertz, double tau, double factor) =>
        StandardRatings.MakingFactor(hertz, tau).Should().Be(factor);

    [Theory]
    [InlineData(50, 14.1)]
    [InlineData(60, 17.0)]
    public void The_standard_time_constant_of_45_ms_is_X_over_R_of_14_1_and_17(double hertz, double ratio) =>
        Math.Round(StandardRatings.XOverROfTimeConstant(0.045, hertz), 1).Should().Be(ratio);

    [Theory]
    [InlineData(50, 2.5)]
    [InlineData(60, 2.6)]
    public void The_making_factor_is_the_half_cycle_peak_at_that_X_over_R(double hertz, double factor) =>
        Math.Round(IeeeMultiplyingFactors.HalfCyclePeak(StandardRatings.XOverROfTimeConstant(0.045, hertz)), 1).Should().Be(factor);

    /// <summary>IEC 61439-1 table 7: pairs of power factor and n.</summary>
    [Theory]
    [InlineData(0.7, 5.5, 1.5)]
    [InlineData(0.5, 8, 1.7)]
    [InlineData(0.3, 16, 2.0)]
    [InlineData(0.25, 36, 2.1)]
    [InlineData(0.2, 65, 2.2)]
    public void The_low_voltage_test_power_factors_and_peak_factors_belong_together(double powerFactor, double ka, double n)
    {
        StandardRatings.LowVoltageTestPowerFactor(ka).Should().Be(powerFactor);
        StandardRatings.LowVoltagePeakFactor(ka).Should().Be(n);
        Math.Round(PeakFactor.Of(StandardRatings.XOverROfPowerFactor(powerFactor)), 1).Should().Be(n);
    }

    [Theory]
    [InlineData(0.15, 6.6)]
    [InlineData(0.20, 4.9)]
    public void Test_power_factors_of_IEEE_C37_13_are_X_over_R_of_6_6_and_4_9(double powerFactor, double ratio) =>
        Math.Round(StandardRatings.XOverROfPowerFactor(powerFactor), 1).Should().Be(ratio);

    [Theory]
    [InlineData(2, 1.5)]
    [InlineData(3, 2)]
    [InlineData(5, 3)]
    [InlineData(8, 4)]
    public void Contact_parting_times_of_IEEE_C37_010(double interrupting, double parting) =>
        StandardRatings.ContactPartingCycles(interrupting).Should().Be(parting);

    [Theory]
    [InlineData(1, 1.4)]
    [InlineData(1.5, 1.3)]
    [InlineData(2, 1.2)]
    [InlineData(3, 1.1)]
    [InlineData(4, 1.0)]
    public void Ratio_S_of_IEEE_C37_04(double cycles, double s) => IeeeMultiplyingFactors.RatioS(cycles).Should().Be(s);

    [Fact]
    public void Values_out_of_range_are_refused()
    {
        var powerFactor = () => StandardRatings.XOverROfPowerFactor(1.2);
        powerFactor.Should().Throw<ArgumentOutOfRangeException>();
        var frequency = () => StandardRatings.MakingFactor(0);
        frequency.Should().Throw<ArgumentOutOfRangeException>();
    }
}
