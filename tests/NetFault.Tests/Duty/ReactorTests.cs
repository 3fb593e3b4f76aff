using NetFault.Tests.Support;
using static NetFault.CircuitBreakerStandard;

namespace NetFault.Tests.Duty;

/// <summary>Oracle: a full solution of the network with the reactor in it, and Ohm's law on two feeders.</summary>
public class ReactorTests
{
    private static readonly Network TwoBuses = new NetworkBuilder { FrequencyHz = 50 }.Add(
        new Bus { Id = "A", NominalKv = 10 },
        new Bus { Id = "B", NominalKv = 10 },
        new Bus { Id = "L", NominalKv = 10 },
        new NetworkFeeder { Id = "QA", Bus = "A", ShortCircuitKa = new MaxMin(20), XOverR = 1e9 },
        new NetworkFeeder { Id = "QB", Bus = "B", ShortCircuitKa = new MaxMin(20), XOverR = 1e9 },
        new BusCoupler { Id = "tie", From = "A", To = "B", Closed = true },
        new Line { Id = "F", From = "A", To = "L", Ohm = new Impedance(0.1, 0.3) },
        new Fuse { Id = "fuse", Bus = "A", Feeds = "F", BreakingCapacityKa = 30, TestXOverR = 1e12 }).Build();

    [Fact]
    public void The_reactor_in_a_tie_between_two_equal_feeders_is_that_of_Ohms_law()
    {
        var check = DutyCheck.Of(new FaultStudy(TwoBuses, new MachineDecrement()));
        var duty = check.Device("fuses", "fuse");
        DutyRuleTests.Expect(duty, DutyKind.BreakingSymmetrical, 40, 30);
        var proposal = check.SmallestReactor(duty, "tie");
        // 20 kA from QA, so 10 kA through the reactor: U/(√3·(XQ + X)) = 10 kA with U/(√3·XQ) = 20 kA gives X = XQ.
        var xQ = 10 / (Math.Sqrt(3) * 20);
        proposal.IsFound.Should().BeTrue(proposal.ToString());
        proposal.ReactanceOhm.Should().BeApproximately(xQ, 1e-6 * xQ);
        proposal.ReactancePercent.Should().BeApproximately(100 * xQ / (10.0 * 10 / 100), 1e-4);
        proposal.BaseMva.Should().Be(100);
        proposal.ByFormula!.Required.Should().BeApproximately(30, 30e-9);
        proposal.ByFullSolution!.Required.Should().BeApproximately(30, 30e-9);
        proposal.ByFullSolution.Verdict.Should().Be(DutyVerdict.Pass);
        proposal.After!.Device("fuses", "fuse").Verdict.Should().Be(DutyVerdict.Pass);
        new FaultStudy(proposal.Network!, new MachineDecrement()).At("A").InitialSymmetricalKa.Should().BeApproximately(30, 1e-6);
    }

    [Theory]
    [InlineData("QA", null)]
    [InlineData("QB", null)]
    [InlineData("tie", "B")]
    public void The_confirmed_duty_equals_the_rating_wherever_a_reactor_helps(string place, string? bus)
    {
        var check = DutyCheck.Of(new FaultStudy(TwoBuses, new IeeeC37()));
        var proposal = check.SmallestReactor(check.Device("fuses", "fuse"), place, busId: bus);
        proposal.IsFound.Should().BeTrue(proposal.ToString());
        proposal.ByFullSolution!.Required.Should().BeApproximately(30, 30e-8);
    }

    [Fact]
    public void A_reactor_beyond_the_device_helps_nothing_against_a_fault_before_it_and_that_is_said()
    {
        var check = DutyCheck.Of(new FaultStudy(TwoBuses, new MachineDecrement()));
        var proposal = check.SmallestReactor(check.Device("fuses", "fuse"), "F");
        proposal.IsFound.Should().BeFalse();
        proposal.Reason.Should().Contain("even the largest reactor there leaves").And.Contain("40 of 30");
        proposal.Network.Should().BeNull();
    }

    [Fact]
    public void Where_couplers_lead_round_the_place_or_nothing_flows_there_is_no_reactor()
    {
        var ring = TwoBuses.With(new BusCoupler { Id = "tie 2", From = "A", To = "B", Closed = true });
        var check = DutyCheck.Of(new FaultStudy(ring, new MachineDecrement()));
        check.SmallestReactor(check.Device("fuses", "fuse"), "tie").Reason.Should().Contain("lead round");
        var open = TwoBuses.With(new BusCoupler { Id = "spare", From = "A", To = "B", Closed = false });
        check = DutyCheck.Of(new FaultStudy(open, new MachineDecrement()));
        check.SmallestReactor(check.Device("fuses", "fuse"), "spare").Reason.Should().Contain("open");
        var unknown = () => check.SmallestReactor(check.Device("fuses", "fuse"), "ties");
        unknown.Should().Throw<UnknownIdException>().Which.NearestIds.Should().Contain("tie");
    }

    [Fact]
    public void A_device_that_passes_needs_none()
    {
        var network = TwoBuses.With(TwoBuses.Fuses[0] with { BreakingCapacityKa = 50 });
        var check = DutyCheck.Of(new FaultStudy(network, new MachineDecrement()));
        check.SmallestReactor(check.Device("fuses", "fuse"), "tie").Reason.Should().Be("the device does not fail");
    }

    [Theory]
    [InlineData("decrement")]
    [InlineData("exact")]
    [InlineData("iec")]
    [InlineData("ieee")]
    public void By_each_method_a_reactor_behind_the_incoming_transformer_brings_a_breaker_with_generators_just_within_its_rating(string name)
    {
        FaultMethod method = name switch
        {
            "decrement" => new MachineDecrement(),
            "exact" => new MachineDecrement { DcDecayRule = DcDecayRule.Exact, AcComponentRule = AcComponentRule.Exact },
            "iec" => new Iec60909(),
            _ => new IeeeC37(),
        };
        var network = new NetworkBuilder { FrequencyHz = 50 }.Add(
            new Bus { Id = "HV", NominalKv = 110 },
            new Bus { Id = "M", NominalKv = 10 },
            new Bus { Id = "L", NominalKv = 10 },
            new NetworkFeeder { Id = "U", Bus = "HV", ShortCircuitMva = new MaxMin(4000), XOverR = 12 },
            new Transformer
            {
                Id = "T", Hv = "HV", Lv = "M", RatedMva = 40, RatedHvKv = 110, RatedLvKv = 10.5, ShortCircuitVoltagePercent = 11, ResistivePercent = 0.5,
            },
            new SynchronousMachine
            {
                Id = "G", Bus = "M", RatedMva = 20, RatedKv = 10.5, RatedPowerFactor = 0.8, ReactancePu = new MachineReactances(0.14, 0.22, 1.9),
                TimeConstantSeconds = new MachineTimeConstants { Subtransient = 0.03, Transient = 0.8 }, ArmatureResistancePu = 0.004,
            },
            new Line { Id = "F", From = "M", To = "L", Ohm = new Impedance(0.2, 0.3) },
            new CircuitBreaker
            {
                Id = "B", Bus = "M", Feeds = "F", Standard = Iec62271_100, ShortCircuitBreakingCurrentKa = 20, MinimumOpeningTimeSeconds = 0.05,
                DcComponentPercent = 60, RelayTimeSeconds = 0.02,
            }).Build();
        var check = DutyCheck.Of(new FaultStudy(network, method));
        var duty = check.CircuitBreaker("B");
        duty.Verdict.Should().Be(DutyVerdict.Fail);
        var proposal = check.SmallestReactor(duty, "T");
        proposal.IsFound.Should().BeTrue(proposal.ToString());
        (proposal.ByFullSolution!.Required / proposal.ByFullSolution.Rated).Should().BeApproximately(1, 1e-8);
        proposal.After!.CircuitBreaker("B").Verdict.Should().NotBe(DutyVerdict.Fail);
        if (name != "iec")
            proposal.ByFormula!.Required.Should().BeApproximately(proposal.ByFullSolution.Required!.Value, 1e-8 * proposal.ByFullSolution.Required.Value);
    }
}
