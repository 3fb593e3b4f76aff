using NetFault.Tests.Support;
using static NetFault.CircuitBreakerStandard;

namespace NetFault.Tests.Duty;

/// <summary>
/// Oracle: arithmetic by hand on networks of one feeder, whose current is √2·I·(AC + e^(−t/τ)) with τ = (X/R)/ω, and on two sources side by side.
/// </summary>
public class DutyRuleTests
{
    private const double Tau = 0.045;

    private static readonly double Ratio50 = 2 * Math.PI * 50 * Tau;

    [Fact]
    public void An_IEC_breaker_with_45_ms_against_a_network_with_45_ms_has_the_same_margin_in_each_breaking_duty()
    {
        var breaker = DutyNetworks.Breaker(Iec62271_100) with
        {
            ShortCircuitBreakingCurrentKa = 12.5, MinimumOpeningTimeSeconds = 0.04, RelayTimeSeconds = 0.01,
        };
        var duty = DutyNetworks.Check(new MachineDecrement(), DutyNetworks.Radial(Ratio50, more: breaker));
        var beta = Math.Exp(-0.05 / Tau);
        Expect(duty, DutyKind.BreakingSymmetrical, 10, 12.5);
        Expect(duty, DutyKind.BreakingDcComponent, Math.Sqrt(2) * 10 * beta, Math.Sqrt(2) * 12.5 * beta);
        Expect(duty, DutyKind.BreakingAsymmetrical, 10 * Math.Sqrt(1 + 2 * beta * beta), 12.5 * Math.Sqrt(1 + 2 * beta * beta));
        Expect(duty, DutyKind.Making, 10 * PeakFactor.Of(Ratio50), 2.5 * 12.5);
        Expect(duty, DutyKind.PeakWithstand, 10 * PeakFactor.Of(Ratio50), 2.5 * 12.5);
        var m = Tau / 1.0 * (1 - Math.Exp(-2 / Tau));
        Expect(duty, DutyKind.Thermal, 10 * Math.Sqrt(1 + m), 12.5);
        duty.Duties.Where(one => one.Kind is DutyKind.BreakingSymmetrical or DutyKind.BreakingDcComponent or DutyKind.BreakingAsymmetrical)
            .Should().OnlyContain(one => Math.Abs(one.MarginPercent!.Value - 25) < 1e-9);
        duty.Verdict.Should().Be(DutyVerdict.Pass);
        duty.Duties.Should().OnlyContain(one => one.FaultSide == FaultSide.BeyondDevice && one.FaultBusId == "Q", "the feeder is radial");
        duty.Assumptions.Select(one => one.Key).Should().BeEquivalentTo(
            ["dc_time_constant_s", "short_circuit_making_current_ka", "peak_withstand_current_ka", "short_time_withstand_current_ka", "short_time_duration_s"]);
        duty.Remarks.Should().ContainSingle(one => one.Contains("no standard"));
        duty.Currents!.BeyondDevice.IsWhole.Should().BeTrue();
    }

    [Theory]
    [InlineData(10.0, DutyVerdict.Pass, true)]
    [InlineData(10.3, DutyVerdict.Pass, true)]
    [InlineData(10.6, DutyVerdict.Pass, false)]
    [InlineData(9.9, DutyVerdict.Fail, false)]
    public void The_verdict_and_the_margin(double ratedKa, DutyVerdict verdict, bool marginal)
    {
        var bar = new Busbar { Id = "BB", Bus = "Q", PeakWithstandCurrentKa = 50, ShortTimeWithstandCurrentKa = ratedKa, ShortTimeDurationSeconds = 3 };
        // With X/R → 0 there is no DC component: Ith is I″k.
        var duty = DutyNetworks.Check(new MachineDecrement(), DutyNetworks.Radial(1e-9, more: bar));
        var thermal = duty.Duties.Single(one => one.Kind == DutyKind.Thermal);
        thermal.Verdict.Should().Be(verdict);
        thermal.IsMarginal.Should().Be(marginal);
        thermal.MarginPercent.Should().BeApproximately(10 * ratedKa - 100, 1e-4);
        thermal.FaultSide.Should().BeNull();
    }

    [Fact]
    public void A_longer_fault_than_the_rated_duration_takes_from_the_short_time_current_and_a_shorter_one_adds_nothing()
    {
        var bar = new Busbar { Id = "BB", Bus = "Q", PeakWithstandCurrentKa = 50, ShortTimeWithstandCurrentKa = 16, ShortTimeDurationSeconds = 1 };
        var network = DutyNetworks.Radial(1e-9, more: bar);
        double Rated(double seconds) => DutyNetworks.Check(new MachineDecrement(), network, new DutyOptions { FaultDurationSeconds = seconds })
            .Duties.Single(one => one.Kind == DutyKind.Thermal).Rated!.Value;
        Rated(4).Should().BeApproximately(8, 1e-12);
        Rated(0.25).Should().BeApproximately(16, 1e-12);
    }

    [Fact]
    public void An_IEEE_breaker_takes_the_multiplying_factor_of_its_contact_parting_time()
    {
        var breaker = DutyNetworks.Breaker(IeeeC37_04) with { ShortCircuitBreakingCurrentKa = 12, RatedInterruptingTimeCycles = 5 };
        var network = DutyNetworks.Radial(25, 60, more: breaker);
        var study = new FaultStudy(network, new IeeeC37());
        var duty = DutyCheck.Of(study).Devices.Single();
        var factor = Math.Sqrt(1 + 2 * Math.Exp(-4 * Math.PI * 3 / 25)) / 1.1;
        Expect(duty, DutyKind.BreakingSymmetrical, 10 * factor, 12);
        Expect(duty, DutyKind.BreakingSymmetrical, study.At("Q").IeeeC37!.InterruptingDutyKa(3), 12);
        Expect(duty, DutyKind.Making, 10 * PeakFactor.Of(25), 2.6 * 12);
        duty.Assumptions.Should().Contain(one => one.Key == "contact_parting_time_cycles" && one.Text.StartsWith("3 cycles"));
        duty.Remarks.Should().BeEmpty();
    }

    [Fact]
    public void Below_the_X_over_R_of_the_rating_the_symmetrical_current_alone_counts()
    {
        var breaker = DutyNetworks.Breaker(IeeeC37_04) with { ShortCircuitBreakingCurrentKa = 12, ContactPartingTimeCycles = 2 };
        var duty = DutyNetworks.Check(new IeeeC37(), DutyNetworks.Radial(5, 60, more: breaker));
        Expect(duty, DutyKind.BreakingSymmetrical, 10, 12);
    }

    [Fact]
    public void Ratio_S_comes_from_the_rated_DC_component_where_that_is_given()
    {
        var breaker = DutyNetworks.Breaker(IeeeC37_04) with
        {
            ShortCircuitBreakingCurrentKa = 12, ContactPartingTimeCycles = 3, DcComponentPercent = 50,
        };
        var duty = DutyNetworks.Check(new IeeeC37(), DutyNetworks.Radial(40, 60, more: breaker));
        Expect(duty, DutyKind.BreakingSymmetrical, 10 * Math.Sqrt(1 + 2 * Math.Exp(-4 * Math.PI * 3 / 40)) / Math.Sqrt(1.5), 12);
    }

    [Fact]
    public void A_low_voltage_IEC_breaker_takes_the_ratio_of_the_peaks_below_its_test_power_factor()
    {
        var breaker = DutyNetworks.Breaker(Iec60947_2) with { UltimateShortCircuitBreakingCapacityKa = 12 };
        var xOverR = 10.0;
        var duty = DutyNetworks.Check(new MachineDecrement(), DutyNetworks.Radial(xOverR, kv: 0.4, more: breaker));
        var test = PeakFactor.Of(Math.Sqrt(1 / 0.09 - 1));    // cos φ 0.3 for 10 to 20 kA
        Expect(duty, DutyKind.BreakingSymmetrical, 10 * PeakFactor.Of(xOverR) / test, 12);
        Expect(duty, DutyKind.Making, 10 * PeakFactor.Of(xOverR), 24);
        duty.Duties.Should().HaveCount(2, "without a short-time rating there is no such duty");
        var mild = DutyNetworks.Check(new MachineDecrement(), DutyNetworks.Radial(2, kv: 0.4, more: breaker));
        Expect(mild, DutyKind.BreakingSymmetrical, 10, 12);
    }

    [Fact]
    public void The_service_breaking_capacity_counts_where_the_options_say_so()
    {
        var breaker = DutyNetworks.Breaker(Iec60947_2) with { UltimateShortCircuitBreakingCapacityKa = 12, ServiceShortCircuitBreakingCapacityKa = 6 };
        var network = DutyNetworks.Radial(1, kv: 0.4, more: breaker);
        var duty = DutyNetworks.Check(new MachineDecrement(), network, new DutyOptions { LowVoltageRating = LowVoltageBreakingRating.Service });
        duty.Duties.Single(one => one.Kind == DutyKind.BreakingSymmetrical).Rated.Should().Be(6);
        duty.Verdict.Should().Be(DutyVerdict.Fail);
    }

    [Fact]
    public void A_low_voltage_IEEE_breaker_takes_the_factor_of_C37_13()
    {
        var breaker = DutyNetworks.Breaker(IeeeC37_13) with { ShortCircuitBreakingCurrentKa = 12, ShortTimeWithstandCurrentKa = 12 };
        var duty = DutyNetworks.Check(new IeeeC37(), DutyNetworks.Radial(15, 60, 0.48, breaker));
        Expect(duty, DutyKind.BreakingSymmetrical, 10 * (1 + Math.Exp(-Math.PI / 15)) / (1 + Math.Exp(-Math.PI / 6.6)), 12);
        duty.Duties.Single(one => one.Kind == DutyKind.Thermal).Rated.Should().BeApproximately(12 * Math.Sqrt(0.5), 1e-12);
    }

    [Fact]
    public void A_fuse_takes_the_total_RMS_above_the_X_over_R_of_its_test()
    {
        var fuse = new Fuse { Id = "F1", Bus = "Q", Feeds = "F", BreakingCapacityKa = 12, TestXOverR = 15 };
        var duty = DutyNetworks.Check(new MachineDecrement(), DutyNetworks.Radial(25, more: fuse));
        Expect(duty, DutyKind.BreakingSymmetrical, 10 * Math.Sqrt((1 + 2 * Math.Exp(-2 * Math.PI / 25)) / (1 + 2 * Math.Exp(-2 * Math.PI / 15))), 12);
    }

    [Fact]
    public void A_switch_is_judged_for_making_only_where_it_is_rated_for_it()
    {
        var isolator = new Switch { Id = "S", Bus = "Q", Feeds = "F", ShortTimeWithstandCurrentKa = 12.5, ShortTimeDurationSeconds = 1 };
        var network = DutyNetworks.Radial(Ratio50, more: isolator);
        DutyNetworks.Check(new MachineDecrement(), network).Duties.Select(one => one.Kind).Should().Equal(DutyKind.PeakWithstand, DutyKind.Thermal);
        var rated = network.With(isolator with { ShortCircuitMakingCurrentKa = 31.5 });
        Expect(DutyNetworks.Check(new MachineDecrement(), rated), DutyKind.Making, 10 * PeakFactor.Of(Ratio50), 31.5);
    }

    [Fact]
    public void A_breaker_of_a_source_sees_the_source_on_one_side_and_the_rest_on_the_other()
    {
        var network = Plants.TwoFeedersAndALine();
        var breaker = new CircuitBreaker { Id = "B", Bus = "A", Feeds = "QA", Standard = Iec62271_100, ShortCircuitBreakingCurrentKa = 16 };
        var currents = new FaultStudy(network.With(breaker), new MachineDecrement()).ThroughCurrents(breaker);
        // QA alone: 400 MVA at 20 kV. The rest: QB of 250 MVA with X/R 4, in series with the line.
        var qa = 400 / (Math.Sqrt(3) * 20);
        var size = 20.0 * 20 / 250;
        double r = size / Math.Sqrt(17) + 0.4, x = 4 * size / Math.Sqrt(17) + 1.6;
        currents.AtBus.InitialSymmetricalKa.Should().BeApproximately(qa, 1e-12);
        currents.AtBus.XOverR.Should().BeApproximately(10, 1e-9);
        currents.BeyondDevice.InitialSymmetricalKa.Should().BeApproximately(20 / Math.Sqrt(3) / Math.Sqrt(r * r + x * x), 1e-12);
        currents.BeyondDevice.XOverR.Should().BeApproximately(x / r, 1e-9);
        currents.BeyondDevice.DcComponentKa(0.03).Should().BeApproximately(
            Math.Sqrt(2) * currents.BeyondDevice.InitialSymmetricalKa * Math.Exp(-0.03 * 100 * Math.PI * r / x), 1e-12);
    }

    [Fact]
    public void A_generator_breaker_holds_the_generators_current_and_the_systems_each_against_its_rating()
    {
        var network = new NetworkBuilder { FrequencyHz = 50 }.Add(
            new Bus { Id = "T", NominalKv = 10 },
            new NetworkFeeder { Id = "S", Bus = "T", ShortCircuitKa = new MaxMin(30), XOverR = 40 },
            new SynchronousMachine
            {
                Id = "G", Bus = "T", RatedMva = 100, RatedKv = 10, ReactancePu = new MachineReactances(0.2), ArmatureResistancePu = 0.002,
            },
            new CircuitBreaker
            {
                Id = "B", Bus = "T", Feeds = "G", Standard = IecIeee62271_37_013, ShortCircuitBreakingCurrentKa = 31.5,
                GeneratorSourceBreakingCurrentKa = 25, MinimumOpeningTimeSeconds = 0.03, RelayTimeSeconds = 0.01,
            }).Build();
        var duty = DutyNetworks.Check(new MachineDecrement { AcComponentRule = AcComponentRule.HeldAtInitial }, network);
        var machine = 100 / (Math.Sqrt(3) * 10) / Math.Sqrt(0.2 * 0.2 + 0.002 * 0.002);
        Expect(duty, DutyKind.BreakingSymmetrical, 30, 31.5);
        Expect(duty, DutyKind.BreakingDcComponent, Math.Sqrt(2) * 30 * Math.Exp(-0.04 * 100 * Math.PI / 40), Math.Sqrt(2) * 31.5 * Math.Exp(-0.04 / 0.133));
        Expect(duty, DutyKind.GeneratorSourceSymmetrical, machine, 25);
        Expect(duty, DutyKind.GeneratorSourceDcComponent, Math.Sqrt(2) * machine * Math.Exp(-0.04 * 100 * Math.PI / 100), Math.Sqrt(2) * 25 * 1.1);
        Expect(duty, DutyKind.Making, 30 * PeakFactor.Of(40), 2.74 * 31.5);
        duty.Duties.Single(one => one.Kind == DutyKind.GeneratorSourceSymmetrical).Verdict.Should().Be(DutyVerdict.Fail);
    }

    [Fact]
    public void The_DC_component_may_be_judged_in_percent_or_by_the_total_alone()
    {
        // Half the rated current with twice the rated time constant: fine in kA and by the total, not in percent.
        var breaker = DutyNetworks.Breaker(Iec62271_100) with { ShortCircuitBreakingCurrentKa = 20, MinimumOpeningTimeSeconds = 0.02, RelayTimeSeconds = 0.01 };
        var network = DutyNetworks.Radial(2 * Ratio50, more: breaker);
        DeviceDuty By(DcCriterion criterion) => DutyNetworks.Check(new MachineDecrement(), network, new DutyOptions { DcCriterion = criterion });
        By(DcCriterion.ByCurrent).Verdict.Should().Be(DutyVerdict.Pass);
        By(DcCriterion.ByCurrent).Remarks.Should().Contain(one => one.Contains("judged in kA"));
        var percent = By(DcCriterion.ByPercent).Duties.Single(one => one.Kind == DutyKind.BreakingDcComponent);
        (percent.Verdict, percent.Unit).Should().Be((DutyVerdict.Fail, "%"));
        percent.Required.Should().BeApproximately(100 * Math.Exp(-0.03 / (2 * Tau)), 1e-9);
        percent.Rated.Should().BeApproximately(100 * Math.Exp(-0.03 / Tau), 1e-9);
        By(DcCriterion.ByTotalCurrent).Duties.Should().NotContain(one => one.Kind == DutyKind.BreakingDcComponent);
    }

    [Fact]
    public void A_relay_faster_than_half_a_cycle_gains_no_rated_DC_component()
    {
        var breaker = DutyNetworks.Breaker(Iec62271_100) with { ShortCircuitBreakingCurrentKa = 20, MinimumOpeningTimeSeconds = 0.03, RelayTimeSeconds = 0 };
        var duty = DutyNetworks.Check(new MachineDecrement(), DutyNetworks.Radial(Ratio50, more: breaker));
        Expect(duty, DutyKind.BreakingDcComponent, Math.Sqrt(2) * 10 * Math.Exp(-0.03 / Tau), Math.Sqrt(2) * 20 * Math.Exp(-0.04 / Tau));
    }

    internal static void Expect(DeviceDuty device, DutyKind kind, double required, double rated)
    {
        var duty = device.Duties.Single(one => one.Kind == kind);
        duty.Required.Should().BeApproximately(required, 1e-9 * required, kind.ToString());
        duty.Rated.Should().BeApproximately(rated, 1e-9 * rated, kind.ToString());
    }
}
