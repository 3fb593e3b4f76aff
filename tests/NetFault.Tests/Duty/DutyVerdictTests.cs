using NetFault.Tests.Support;
using static NetFault.CircuitBreakerStandard;

namespace NetFault.Tests.Duty;

/// <summary>Which verdict there is when data or currents are missing, and what is said beside it.</summary>
public class DutyVerdictTests
{
    private static readonly CircuitBreaker Breaker = DutyNetworks.Breaker(Iec62271_100);

    [Fact]
    public void Without_ratings_nothing_can_be_said_and_the_missing_keys_are_named()
    {
        var duty = DutyNetworks.Check(new MachineDecrement(), DutyNetworks.Radial(10, more: Breaker));
        duty.Verdict.Should().Be(DutyVerdict.CannotSay);
        duty.Duties.Should().OnlyContain(one => one.Verdict == DutyVerdict.CannotSay && one.Reason != null);
        duty.Duties.Select(one => one.Reason).Should().Contain("short_circuit_breaking_current_ka is not given")
            .And.Contain(reason => reason!.Contains("minimum_opening_time_s"));
        duty.Duties.Single(one => one.Kind == DutyKind.BreakingSymmetrical).Required.Should().BeApproximately(10, 1e-9, "the duty is known all the same");
    }

    [Fact]
    public void Without_a_contact_parting_time_the_initial_current_stands_for_the_AC_component_and_the_DC_component_cannot_be_said()
    {
        var duty = DutyNetworks.Check(new MachineDecrement(), DutyNetworks.Radial(10, more: Breaker with { ShortCircuitBreakingCurrentKa = 16 }));
        DutyRuleTests.Expect(duty, DutyKind.BreakingSymmetrical, 10, 16);
        duty.Duties.Where(one => one.Verdict == DutyVerdict.CannotSay).Select(one => one.Kind)
            .Should().Equal(DutyKind.BreakingDcComponent, DutyKind.BreakingAsymmetrical);
        duty.Verdict.Should().Be(DutyVerdict.CannotSay);
    }

    [Fact]
    public void An_IEEE_breaker_without_any_time_cannot_be_judged_for_breaking()
    {
        var breaker = DutyNetworks.Breaker(IeeeC37_04) with { ShortCircuitBreakingCurrentKa = 16 };
        DutyNetworks.Check(new IeeeC37(), DutyNetworks.Radial(10, 60, more: breaker)).Duties
            .Single(one => one.Kind == DutyKind.BreakingSymmetrical).Reason.Should().Contain("no contact parting time");
    }

    [Fact]
    public void Out_of_service_and_de_energised_devices_have_no_current()
    {
        var rated = Breaker with { ShortCircuitBreakingCurrentKa = 16, MinimumOpeningTimeSeconds = 0.04 };
        var network = DutyNetworks.Radial(10);
        string Reason(params NetworkElement[] change)
        {
            var duty = DutyNetworks.Check(new MachineDecrement(), network.With(change));
            duty.Verdict.Should().Be(DutyVerdict.NoCurrent);
            duty.Currents.Should().BeNull();
            return duty.WorstDuty.Reason!;
        }

        Reason(rated with { InService = false }).Should().Be("out of service");
        Reason(rated, network.Lines[0] with { InService = false }).Should().Contain("lines F is out of service");
        Reason(new Bus { Id = "dead", NominalKv = 20 }, new Busbar { Id = "BB", Bus = "dead" }).Should().Contain("de-energised");
    }

    [Fact]
    public void A_breaker_at_an_open_tie_is_judged_with_the_tie_closed()
    {
        var network = Plants.TwoFeedersAndALine();
        network = network.With(
            network.Lines[0] with { InService = false },
            new BusCoupler { Id = "tie", From = "A", To = "B", Closed = false },
            new CircuitBreaker
            {
                Id = "B", Bus = "A", Feeds = "tie", Standard = Iec62271_100, ShortCircuitBreakingCurrentKa = 12.5, MinimumOpeningTimeSeconds = 0.04,
            });
        var duty = DutyNetworks.Check(new MachineDecrement(), network);
        // A fault at A is fed through the tie by QB of 250 MVA, one at B by QA of 400 MVA.
        DutyRuleTests.Expect(duty, DutyKind.BreakingSymmetrical, 400 / (Math.Sqrt(3) * 20), 12.5);
        duty.Duties.Single(one => one.Kind == DutyKind.BreakingSymmetrical).FaultSide.Should().Be(FaultSide.BeyondDevice);
        duty.Currents!.AtBus.InitialSymmetricalKa.Should().BeApproximately(250 / (Math.Sqrt(3) * 20), 1e-9);
        duty.Remarks.Should().Contain("judged with the open coupler tie closed");
    }

    [Fact]
    public void In_a_ring_of_couplers_the_whole_current_is_taken_and_that_is_said()
    {
        var network = DutyNetworks.Radial(10, more:
        [
            new Bus { Id = "Q2", NominalKv = 20 },
            new BusCoupler { Id = "c1", From = "Q", To = "Q2", Closed = true },
            new BusCoupler { Id = "c2", From = "Q", To = "Q2", Closed = true },
            Breaker with { Feeds = "c1", ShortCircuitBreakingCurrentKa = 12.5, MinimumOpeningTimeSeconds = 0.04 },
        ]);
        var duty = DutyNetworks.Check(new MachineDecrement(), network);
        DutyRuleTests.Expect(duty, DutyKind.BreakingSymmetrical, 10, 12.5);
        duty.Remarks.Should().Contain(one => one.Contains("ring of couplers"));
    }

    [Fact]
    public void Mixed_standards_are_said()
    {
        var iec = Breaker with { ShortCircuitBreakingCurrentKa = 12.5, MinimumOpeningTimeSeconds = 0.04 };
        DutyNetworks.Check(new IeeeC37(), DutyNetworks.Radial(10, more: iec)).Remarks
            .Should().Contain("standards mixed: rated by IEC 62271-100, currents by IEEE C37.010, E/Z");
        DutyNetworks.Check(new Iec60909(), DutyNetworks.Radial(10, more: iec)).Remarks.Should().BeEmpty();
    }

    [Fact]
    public void The_worst_comes_first()
    {
        Busbar Bar(string id, double? ka, string bus = "Q") => new() { Id = id, Bus = bus, PeakWithstandCurrentKa = 60, ShortTimeWithstandCurrentKa = ka };
        var network = DutyNetworks.Radial(10, more:
        [
            Bar("good", 30), Bar("bad", 8), Bar("unknown", null), Bar("worse", 5), Bar("fair", 15), new Bus { Id = "dead", NominalKv = 20 }, Bar("idle", 20, "dead"),
        ]);
        var check = DutyCheck.Of(new FaultStudy(network, new MachineDecrement()));
        check.Devices.Select(one => one.Id).Should().Equal("worse", "bad", "unknown", "fair", "good", "idle");
        check.HasFailure.Should().BeTrue();
        check.Count(DutyVerdict.Fail).Should().Be(2);
        check.Device("busbars", "fair").Verdict.Should().Be(DutyVerdict.Pass);
        var unknown = () => check.CircuitBreaker("B");
        unknown.Should().Throw<UnknownIdException>();
    }

    [Fact]
    public void Minimum_currents_are_refused()
    {
        var check = () => DutyCheck.Of(new FaultStudy(DutyNetworks.Radial(10), new Iec60909 { Case = ShortCircuitCase.Minimum }));
        check.Should().Throw<ArgumentException>().WithMessage("*take ShortCircuitCase.Maximum*");
    }

    [Fact]
    public void A_relay_slower_than_the_horizon_is_judged_at_the_horizon()
    {
        var slow = Breaker with { ShortCircuitBreakingCurrentKa = 12.5, MinimumOpeningTimeSeconds = 0.04, RelayTimeSeconds = 3 };
        var duty = DutyNetworks.Check(new MachineDecrement(), DutyNetworks.Radial(10, more: slow));
        duty.Remarks.Should().Contain(one => one.Contains("beyond the method's horizon"));
    }

    [Fact]
    public void The_breaking_current_of_a_radial_feeder_by_IEC_has_the_decrement_of_the_whole_fault()
    {
        var breaker = Breaker with { ShortCircuitBreakingCurrentKa = 40, MinimumOpeningTimeSeconds = 0.09, RelayTimeSeconds = 0.01 };
        var network = DutyNetworks.Radial(10, more:
        [
            new SynchronousMachine
            {
                Id = "G", Bus = "Q", RatedMva = 200, RatedKv = 20, RatedPowerFactor = 0.85, ReactancePu = new MachineReactances(0.15),
                ArmatureResistancePu = 0.003,
            },
            breaker,
        ]);
        var study = new FaultStudy(network, new Iec60909());
        var fault = study.At("Q");
        fault.Iec60909!.BreakingKa(0.1).Should().BeLessThan(0.95 * fault.InitialSymmetricalKa);
        DutyRuleTests.Expect(DutyCheck.Of(study).Devices.Single(), DutyKind.BreakingSymmetrical, fault.Iec60909.BreakingKa(0.1), 40);
        DutyRuleTests.Expect(DutyCheck.Of(study).Devices.Single(), DutyKind.Thermal, fault.Iec60909.ThermalEquivalentKa(1), 40);
    }
}
