namespace NetFault.Tests.Methods;

/// <summary>
/// The rules by which motors may be left out, IEC 60909-0:2016, 6.10 (from memory of the standard). Oracle: the two inequalities by hand for a
/// feeder of 500 MVA at 20 kV, whose I″k is that of 500 MVA whatever c is.
/// </summary>
public class SmallMotorTests
{
    private static readonly double FeederKa = 500 / (Math.Sqrt(3) * 20);

    [Theory]
    [InlineData(4.9, true)]
    [InlineData(5.1, false)]
    public void A_motor_at_the_faulted_bus_is_left_out_up_to_one_percent_of_the_current_without_it(double ratedMva, bool leftOut)
    {
        var fault = Solve(Plant().With(Motor("HV", ratedMva))).At("HV");
        fault.Iec60909!.MotorsLeftOut.Should().Be(leftOut);
        if (leftOut)
            fault.InitialSymmetricalKa.Should().BeApproximately(FeederKa, 1e-9);
        else
            fault.InitialSymmetricalKa.Should().BeGreaterThan(FeederKa);
    }

    /// <summary>10 MVA of transformer: the limit of ΣPrM/ΣSrT is 0.8/|100·1.1·10/500 − 0.3| = 0.42105.</summary>
    [Theory]
    [InlineData(4.2, true)]
    [InlineData(4.3, false)]
    public void Motors_behind_a_transformer_are_left_out_by_their_power_against_its_own(double ratedMw, bool leftOut)
    {
        var fault = Solve(Plant().With(Motor("LV", ratedMw))).At("HV");
        fault.Iec60909!.MotorsLeftOut.Should().Be(leftOut);
        fault.BreakingAndSteadyAreConsistent();
    }

    [Fact]
    public void Behind_the_transformer_the_same_motors_are_at_the_bus_and_too_large_to_leave_out() =>
        Solve(Plant().With(Motor("LV", 4.2))).At("LV").Iec60909!.MotorsLeftOut.Should().BeFalse();

    [Fact]
    public void Unless_asked_for_no_motor_is_left_out() =>
        new FaultStudy(Plant().With(Motor("HV", 0.1)), new Iec60909()).At("HV").Iec60909!.MotorsLeftOut.Should().BeFalse();

    [Fact]
    public void Without_motors_nothing_is_said_to_be_left_out() =>
        Solve(Plant()).At("HV").Iec60909!.MotorsLeftOut.Should().BeFalse();

    private static FaultStudy Solve(Network network) => new(network, new Iec60909 { LeaveOutSmallMotors = true });

    private static Network Plant() => new NetworkBuilder { FrequencyHz = 50 }.Add(
        new Bus { Id = "HV", NominalKv = 20 },
        new Bus { Id = "LV", NominalKv = 6 },
        new NetworkFeeder { Id = "Q", Bus = "HV", ShortCircuitMva = new MaxMin(500), ROverX = 0.1 },
        new Transformer
        {
            Id = "T", Hv = "HV", Lv = "LV", RatedMva = 10, RatedHvKv = 20, RatedLvKv = 6, ShortCircuitVoltagePercent = 8, ResistivePercent = 0.5,
        }).Build();

    /// <summary>A motor whose rated power in MW is its apparent power in MVA, so that both rules are easy to read.</summary>
    private static AsynchronousMotor Motor(string bus, double rated) => new()
    {
        Id = "M", Bus = bus, RatedKw = rated * 1000, RatedPowerFactor = 1, Efficiency = 1, LockedRotorCurrentRatio = 5, ROverX = 0.1, PolePairs = 2,
    };
}

internal static class SmallMotorAssertions
{
    /// <summary>Ib lies between Ik, which never has motors in it here, and I″k.</summary>
    public static void BreakingAndSteadyAreConsistent(this BusFault fault)
    {
        var breaking = fault.Iec60909!.BreakingKa(0.1);
        breaking.Should().BeLessThanOrEqualTo(fault.InitialSymmetricalKa * (1 + 1e-12));
        fault.SteadyStateKa!.Value.Should().BeLessThanOrEqualTo(breaking * (1 + 1e-12));
    }
}
