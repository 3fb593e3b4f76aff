using System.Numerics;
using NetFault.Tests.Support;

namespace NetFault.Tests.ByIeeeC37;

/// <summary>Oracle: arithmetic by hand on small invented networks.</summary>
public class CurrentTests
{
    [Fact]
    public void E_over_Z_E_over_X_and_X_over_R_of_two_sources_by_hand()
    {
        // 20 kV, fault at A: 400 MVA with X/R 10 (|Z| = 1 ohm) beside 0.4 + j1.6 ohm in series with 250 MVA with X/R 4 (|Z| = 1.6 ohm).
        var a = Complex.FromPolarCoordinates(1.0, Math.Atan(10));
        var b = Complex.FromPolarCoordinates(1.6, Math.Atan(4)) + new Complex(0.4, 1.6);
        var x = a.Imaginary * b.Imaginary / (a.Imaginary + b.Imaginary);
        var r = a.Real * b.Real / (a.Real + b.Real);
        var byZ = new FaultStudy(Plants.TwoFeedersAndALine(), new IeeeC37()).At("A");
        var byX = new FaultStudy(Plants.TwoFeedersAndALine(), new IeeeC37 { CurrentRule = IeeeCurrentRule.EOverX }).At("A");
        byZ.InitialSymmetricalKa.Should().BeApproximately(20 / Math.Sqrt(3) / (a * b / (a + b)).Magnitude, 1e-9);
        byX.InitialSymmetricalKa.Should().BeApproximately(20 / Math.Sqrt(3) / x, 1e-9);
        byX.ImpedanceOhm!.Value.Should().Be(new Complex(0, byX.ImpedanceOhm.Value.Imaginary));
        foreach (var fault in new[] { byZ, byX })
        {
            fault.XOverR.Should().BeApproximately(x / r, 1e-9);
            fault.XOverRRule.Should().Be(XOverRRule.SeparateNetworks);
            fault.IeeeC37!.InterruptingXOverR.Should().BeApproximately(x / r, 1e-9);
            fault.IeeeC37.InterruptingSymmetricalKa.Should().BeApproximately(fault.InitialSymmetricalKa, 1e-9);
            fault.TransientKa.Should().BeNull();
            fault.SteadyStateKa.Should().BeNull();
        }
    }

    [Fact]
    public void The_pre_fault_voltage_scales_every_current()
    {
        var flat = new FaultStudy(Plant(), new IeeeC37()).At("B");
        var raised = new FaultStudy(Plant(), new IeeeC37 { PrefaultVoltagePu = 1.05 }).At("B");
        raised.InitialSymmetricalKa.Should().BeApproximately(1.05 * flat.InitialSymmetricalKa, 1e-9);
        raised.PeakKa.Should().BeApproximately(1.05 * flat.PeakKa, 1e-9);
        raised.IeeeC37!.InterruptingDutyKa(2).Should().BeApproximately(1.05 * flat.IeeeC37!.InterruptingDutyKa(2), 1e-9);
        raised.IeeeC37.ThirtyCycleSymmetricalKa.Should().BeApproximately(1.05 * flat.IeeeC37.ThirtyCycleSymmetricalKa, 1e-9);
    }

    [Fact]
    public void The_impedance_of_the_fault_counts_whole_in_E_over_Z_and_by_its_reactance_in_E_over_X()
    {
        // 20 kV, 10 kA, R/X = 0.1, and 0.5 + j0.25 ohm in the fault.
        var zk = 20 / Math.Sqrt(3) / 10;
        double x = zk / Math.Sqrt(1.01), r = 0.1 * x;
        var fault = new Complex(0.5, 0.25);
        foreach (var rule in new[] { IeeeCurrentRule.EOverZ, IeeeCurrentRule.EOverX })
        {
            var ohm = rule == IeeeCurrentRule.EOverZ ? new Complex(r + 0.5, x + 0.25).Magnitude : x + 0.25;
            var study = new FaultStudy(Plants.OneFeeder(0.1), new IeeeC37 { CurrentRule = rule });
            var at = study.At("Q", fault);
            at.InitialSymmetricalKa.Should().BeApproximately(20 / Math.Sqrt(3) / ohm, 1e-9);
            at.XOverR.Should().BeApproximately((x + 0.25) / (r + 0.5), 1e-9);
            study.FlowsAt("Q", FaultInstant.Transient, fault).FaultCurrentKa.Magnitude
                .Should().BeApproximately(20 / Math.Sqrt(3) / ohm, 1e-9);
        }
    }

    [Fact]
    public void Each_time_has_its_network()
    {
        var fault = new FaultStudy(Plant(), new IeeeC37()).At("B");
        var result = fault.IeeeC37!;
        fault.AcComponentRule.Should().Be(AcComponentRule.NetworkOfTime);
        double Cycle(double cycles) => cycles / 60;
        fault.InitialSymmetricalKa.Should().BeGreaterThan(result.InterruptingSymmetricalKa);
        result.InterruptingSymmetricalKa.Should().BeGreaterThan(result.ThirtyCycleSymmetricalKa);
        foreach (var (cycles, expected) in new[]
        {
            (0, fault.InitialSymmetricalKa), (0.5, fault.InitialSymmetricalKa), (1.49, fault.InitialSymmetricalKa),
            (1.5, result.InterruptingSymmetricalKa), (4, result.InterruptingSymmetricalKa), (29.9, result.InterruptingSymmetricalKa),
            (30, result.ThirtyCycleSymmetricalKa),
        })
        {
            fault.SymmetricalRmsKa(Cycle(cycles)).Should().Be(expected);
        }
        result.SymmetricalToInterruptKa(1).Should().Be(fault.InitialSymmetricalKa);
        result.SymmetricalToInterruptKa(60).Should().Be(result.InterruptingSymmetricalKa);
        // √2·I·e^(−2π·cycles/(X/R)), current and X/R of the time's network.
        fault.DcComponentKa(Cycle(0.5)).Should().BeApproximately(
            Math.Sqrt(2) * fault.InitialSymmetricalKa * Math.Exp(-Math.PI / fault.XOverR!.Value), 1e-9);
        fault.DcComponentKa(Cycle(3)).Should().BeApproximately(
            Math.Sqrt(2) * result.InterruptingSymmetricalKa * Math.Exp(-6 * Math.PI / result.InterruptingXOverR!.Value), 1e-9);
    }

    [Fact]
    public void The_duty_is_the_total_current_over_S_or_the_symmetrical_one_where_that_is_more()
    {
        var fault = new FaultStudy(Plants.OneFeeder(1 / 40.0, frequencyHz: 60), new IeeeC37()).At("Q");
        var result = fault.IeeeC37!;
        // 10 kA, X/R 40, 3 cycles: total 13.33912 kA (see MultiplyingFactorTests), S = 1.1.
        result.TotalToInterruptKa(3).Should().BeApproximately(13.33912, 2e-5);
        fault.AsymmetricalRmsKa(3.0 / 60).Should().BeApproximately(result.TotalToInterruptKa(3), 1e-9);
        result.InterruptingDutyKa(3).Should().BeApproximately(13.33912 / 1.1, 2e-5);
        result.MultiplyingFactor(3).Should().BeApproximately(1.333912 / 1.1, 2e-6);
        result.AcDecrementCredited.Should().BeFalse();
        var low = new FaultStudy(Plants.OneFeeder(1 / 8.0, frequencyHz: 60), new IeeeC37()).At("Q");
        low.IeeeC37!.InterruptingDutyKa(3).Should().BeApproximately(10, 1e-9);
        // C37.13 at X/R 8.27 prints 1.04 unfused and 1.12 fused.
        var lowVoltage = new FaultStudy(Plants.OneFeeder(1 / 8.27), new IeeeC37()).At("Q").IeeeC37!;
        Math.Round(lowVoltage.LowVoltageUnfusedFactor(), 2).Should().Be(1.04);
        Math.Round(lowVoltage.LowVoltageFusedFactor(), 2).Should().Be(1.12);
        lowVoltage.LowVoltageUnfusedFactor(testXOverR: 8.27).Should().Be(1);
    }

    [Fact]
    public void The_multipliers_2_6_and_1_6_are_given_where_they_cover_the_exact_values()
    {
        static BusFault At(double xOverR) => new FaultStudy(Plants.OneFeeder(1 / xOverR, frequencyHz: 60), new IeeeC37()).At("Q");
        At(17).IeeeC37!.PeakByMultiplierKa.Should().BeApproximately(26, 1e-9);
        At(17).PeakKa.Should().BeLessThan(26);
        At(18).IeeeC37!.PeakByMultiplierKa.Should().BeNull();
        At(18).PeakKa.Should().BeGreaterThan(26);
        At(25).IeeeC37!.AsymmetricalRmsByMultiplierKa.Should().BeApproximately(16, 1e-9);
        At(26).IeeeC37!.AsymmetricalRmsByMultiplierKa.Should().BeNull();
        // Half a cycle, X/R 25: e^(−2π/25) = 0.777767, √(1 + 1.555534) = 1.598604.
        At(25).IeeeC37!.FirstCycleAsymmetricalRmsKa.Should().BeApproximately(15.98604, 2e-5);
    }

    [Fact]
    public void Without_reactance_there_is_no_X_over_R_and_the_factor_is_the_undamped_one()
    {
        var capacitive = Plants.OneFeeder(0.1).With(
            new Bus { Id = "end", NominalKv = 20 }, new Line { Id = "C", From = "Q", To = "end", Ohm = new Impedance(0.1, -3) });
        var fault = new FaultStudy(capacitive, new IeeeC37()).At("end");
        fault.XOverRStatus.Should().Be(XOverRStatus.NotInductive);
        fault.IeeeC37!.InterruptingXOverRStatus.Should().Be(XOverRStatus.NotInductive);
        fault.IeeeC37.MultiplyingFactor(4).Should().BeApproximately(Math.Sqrt(3), 1e-12);
        fault.PeakKa.Should().BeApproximately(2 * Math.Sqrt(2) * fault.InitialSymmetricalKa, 1e-9);
    }

    [Fact]
    public void Options_are_checked_and_other_methods_have_no_such_result()
    {
        var voltage = () => new IeeeC37 { PrefaultVoltagePu = 0 };
        var rule = () => new IeeeC37 { CurrentRule = (IeeeCurrentRule)7 };
        voltage.Should().Throw<ArgumentOutOfRangeException>();
        rule.Should().Throw<ArgumentOutOfRangeException>();
        new FaultStudy(Plant(), new MachineDecrement()).At("B").IeeeC37.Should().BeNull();
        var time = () => new FaultStudy(Plant(), new IeeeC37()).At("B").IeeeC37!.MultiplyingFactor(-1);
        time.Should().Throw<ArgumentOutOfRangeException>();
    }

    /// <summary>13.8 kV, 60 Hz: a feeder, a generator and motors that leave one network after the other.</summary>
    private static Network Plant() => new NetworkBuilder { FrequencyHz = 60 }.Add(
        new Bus { Id = "B", NominalKv = 13.8 },
        new NetworkFeeder { Id = "U", Bus = "B", ShortCircuitMva = new MaxMin(300), XOverR = 15 },
        new SynchronousMachine
        {
            Id = "G", Bus = "B", RatedMva = 12, RatedKv = 13.8, ReactancePu = new MachineReactances(0.15, 0.24),
            ArmatureResistancePu = 0.004,
        },
        new AsynchronousMotor
        {
            Id = "M", Bus = "B", RatedKw = 1500, RatedKv = 13.2, RatedPowerFactor = 0.9, Efficiency = 0.95, LockedRotorCurrentRatio = 6,
            XOverR = 25, PolePairs = 2, Count = 2,
        }).Build();
}
