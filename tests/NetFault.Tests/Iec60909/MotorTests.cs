using System.Numerics;
using static NetFault.Tests.Support.IecCases;

namespace NetFault.Tests.ByIec60909;

/// <summary>Oracle: IEC 60909-0:2016, 6.10 (asynchronous motors) and 6.11 (static-converter-fed drives), evaluated by hand.</summary>
public class MotorTests
{
    [Theory]
    [InlineData(10.0, 1000, 1, 0.10)]
    [InlineData(10.0, 2000, 2, 0.10)]
    [InlineData(10.0, 1999, 2, 0.15)]
    [InlineData(6.0, 500, 1, 0.15)]
    [InlineData(1.0, 2000, 1, 0.42)]
    [InlineData(0.4, 75, 1, 0.42)]
    public void R_over_X_is_by_size_and_voltage_where_it_is_not_given(double kv, double kw, int pairs, double rOverX)
    {
        var motor = Motor("A") with { RatedKv = kv, RatedKw = kw, PolePairs = pairs };
        var study = new FaultStudy(Of(Bus("A", kv), Feeder("A", 12), motor), new Iec60909());
        var own = Polar(kv * kv / (kw / 1000 / 0.95 / 0.88) / 5.5, rOverX);
        ShouldBeClose(study.At("A").ImpedanceOhm!.Value, Parallel(Polar(1.1 * kv / (Sqrt3 * 12), 0.1), own));
        study.Assumptions.Should().ContainSingle(one => one.ElementId == "MA" && one.Key == "r_over_x");
    }

    [Fact]
    public void A_group_is_its_count_in_parallel_and_a_given_ratio_is_kept()
    {
        var group = Motor("A") with { Count = 3, XOverR = 8, RatedKv = 11 };
        var own = Polar(121 / (3 * 2.0 / 0.95 / 0.88) / 5.5, 1 / 8.0);
        var study = new FaultStudy(Of(Bus("A", 10), Feeder("A", 12), group), new Iec60909());
        ShouldBeClose(study.At("A").ImpedanceOhm!.Value, Parallel(Polar(1.1 * 10 / (Sqrt3 * 12), 0.1), own));
        study.Assumptions.Should().BeEmpty();
    }

    /// <summary>6.11: ILR/IrM = 3 and R/X = 0.10; they contribute to I″k and ip, to nothing else.</summary>
    [Fact]
    public void Converter_fed_drives_are_in_the_initial_and_peak_currents_alone()
    {
        var network = Of(Bus("A", 10), Feeder("A", 12), new ConverterFedDrive { Id = "D", Bus = "A", RatedMva = 5, RatedKv = 10 });
        var z = Parallel(Polar(1.1 * 10 / (Sqrt3 * 12), 0.1), Polar(100 / 5.0 / 3, 0.1));
        foreach (var fault in new[] { network.At("A"), network.AmongAll("A") })
        {
            fault.InitialSymmetricalKa.ShouldBe(Ka(1.1, 10, z));
            fault.PeakKa.ShouldBe((1.02 + 0.98 * Math.Exp(-0.3)) * Sqrt2 * Ka(1.1, 10, z));
            fault.Iec60909!.BreakingKa(0.1).ShouldBe(12);
            fault.SteadyStateKa!.Value.ShouldBe(12);
        }
        network.At("A", ShortCircuitCase.Minimum).InitialSymmetricalKa.ShouldBe(12);
    }

    /// <summary>6.10.2: motors may be left out where ΣIrM ≤ 0.01·I″k without them.</summary>
    [Theory]
    [InlineData(0.0099, true)]
    [InlineData(0.0101, false)]
    public void Small_motors_are_left_out_on_request_up_to_one_percent(double share, bool leftOut)
    {
        var kw = share * 12 * Sqrt3 * 10 * 1000 * 0.95 * 0.88;
        var network = Of(Bus("A", 10), Feeder("A", 12), Motor("A") with { RatedKw = kw / 2, Count = 2 });
        var option = new FaultStudy(network, new Iec60909 { LeaveOutSmallMotors = true });
        foreach (var fault in new[] { option.At("A"), option.EveryBus()[0] })
        {
            fault.Iec60909!.MotorsLeftOut.Should().Be(leftOut);
            if (leftOut)
            {
                fault.InitialSymmetricalKa.ShouldBe(12);
                fault.Iec60909.BreakingKa(0.1).ShouldBe(12);
                fault.Iec60909.Machines.Should().BeEmpty();
                fault.PeakKa.ShouldBe((1.02 + 0.98 * Math.Exp(-0.3)) * Sqrt2 * 12);
            }
            else
            {
                fault.InitialSymmetricalKa.Should().BeGreaterThan(12.1);
            }
        }
        network.At("A").Iec60909!.MotorsLeftOut.Should().BeFalse();
        network.At("A").InitialSymmetricalKa.Should().BeGreaterThan(12.1);
    }

    /// <summary>
    /// Where motors are left out, they are left out of all currents: κ and i_dc are those of the network without them too.
    /// </summary>
    [Fact]
    public void Motors_that_are_left_out_change_neither_the_peak_nor_the_direct_current()
    {
        var motor = Motor("A") with { RatedKw = 80, RatedKv = 10, ROverX = 0.5 };
        var with = new FaultStudy(Of(Bus("A", 10), Feeder("A", 12, 0.05), motor), new Iec60909 { LeaveOutSmallMotors = true }).At("A");
        var without = Of(Bus("A", 10), Feeder("A", 12, 0.05)).At("A");
        with.Iec60909!.MotorsLeftOut.Should().BeTrue();
        with.PeakKa.ShouldBe(without.PeakKa);
        with.DcComponentKa(0.05).ShouldBe(without.DcComponentKa(0.05));
    }

    private static Complex Parallel(Complex one, Complex other) => one * other / (one + other);

    private static void ShouldBeClose(Complex actual, Complex expected) =>
        (actual - expected).Magnitude.Should().BeLessThan(1e-11 * expected.Magnitude, $"{actual} should be {expected}");
}
