using static NetFault.CircuitBreakerStandard;

namespace NetFault.Tests.Duty;

/// <summary>Oracle: the formulas of IEC 60909-0:2016, 7.2, by hand (from memory of the standard).</summary>
public class GeneratorBreakerTests
{
    private static readonly Network Unit = new NetworkBuilder { FrequencyHz = 50 }.Add(
        new Bus { Id = "HV", NominalKv = 110 },
        new Bus { Id = "GT", NominalKv = 10.5 },
        new NetworkFeeder { Id = "Q", Bus = "HV", ShortCircuitMva = new MaxMin(3000), XOverR = 10 },
        new Transformer
        {
            Id = "T", Hv = "HV", Lv = "GT", RatedMva = 100, RatedHvKv = 115, RatedLvKv = 10.5, ShortCircuitVoltagePercent = 12, ResistivePercent = 0.3,
            OnLoadTapChanger = true,
        },
        new SynchronousMachine
        {
            Id = "G", Bus = "GT", RatedMva = 90, RatedKv = 10.5, RatedPowerFactor = 0.85, ReactancePu = new MachineReactances(0.16),
            ArmatureResistancePu = 0.002, UnitTransformer = "T",
        }).Build();

    private static readonly CircuitBreaker Breaker = new()
    {
        Id = "B", Bus = "GT", Feeds = "G", Standard = IecIeee62271_37_013, ShortCircuitBreakingCurrentKa = 80, GeneratorSourceBreakingCurrentKa = 50,
        MinimumOpeningTimeSeconds = 0.04, RelayTimeSeconds = 0.01,
    };

    [Fact]
    public void The_system_source_current_flows_through_the_uncorrected_unit_transformer()
    {
        var duty = DutyNetworks.Check(new Iec60909(), Unit.With(Breaker));
        var sin = 1 / Math.Sqrt(101);
        var zQ = 1.1 * 110 * 110 / 3000 / Math.Pow(115 / 10.5, 2);
        var zT = 10.5 * 10.5 / 100;
        double r = zQ * sin + 0.003 * zT, x = zQ * 10 * sin + Math.Sqrt(0.12 * 0.12 - 0.003 * 0.003) * zT;
        var expected = 1.1 * 10.5 / Math.Sqrt(3) / Math.Sqrt(r * r + x * x);
        duty.Currents!.BeyondDevice.InitialSymmetricalKa.Should().BeApproximately(expected, 1e-9 * expected);
        var flows = new FaultStudy(Unit, new Iec60909()).FlowsAt("GT");
        flows.Branch("T").FromBusKa("GT").Magnitude.Should().BeLessThan(expected, "the flows have K_T,S");
    }

    [Fact]
    public void The_generator_source_current_has_the_factor_for_faults_inside_the_unit()
    {
        var duty = DutyNetworks.Check(new Iec60909(), Unit.With(Breaker));
        var sinPhi = Math.Sqrt(1 - 0.85 * 0.85);
        var factor = 1.1 / (1 + 0.16 * sinPhi);
        var expected = 1.1 * 10.5 / Math.Sqrt(3) / (factor * Math.Sqrt(0.16 * 0.16 + 0.002 * 0.002) * 10.5 * 10.5 / 90);
        duty.Currents!.AtBus.InitialSymmetricalKa.Should().BeApproximately(expected, 1e-9 * expected);
        DutyRuleTests.Expect(duty, DutyKind.GeneratorSourceSymmetrical, expected, 50);
    }

    [Theory]
    [InlineData("G", FaultSide.AtBus)]
    [InlineData("T", FaultSide.BeyondDevice)]
    public void The_generator_is_found_on_either_side(string feeds, FaultSide side)
    {
        var duty = DutyNetworks.Check(new MachineDecrement(), Unit.With(Breaker with { Feeds = feeds }));
        duty.Duties.Single(one => one.Kind == DutyKind.GeneratorSourceSymmetrical).FaultSide.Should().Be(side);
        duty.Duties.Single(one => one.Kind == DutyKind.BreakingSymmetrical).FaultSide.Should().NotBe(side);
    }

    [Fact]
    public void A_breaker_between_the_buses_of_machine_and_transformer_is_a_coupler()
    {
        var network = Unit.With(
            new Bus { Id = "TT", NominalKv = 10.5 },
            new BusCoupler { Id = "gcb", From = "GT", To = "TT", Closed = true },
            Unit.Transformers[0] with { Lv = "TT" },
            Breaker with { Bus = "TT", Feeds = "gcb" });
        var duty = DutyNetworks.Check(new MachineDecrement(), network);
        duty.Duties.Single(one => one.Kind == DutyKind.GeneratorSourceSymmetrical).FaultSide.Should().Be(FaultSide.AtBus);
        duty.Currents!.AtBus.InitialSymmetricalKa.Should().BeApproximately(
            90 / (Math.Sqrt(3) * 10.5) / Math.Sqrt(0.16 * 0.16 + 0.002 * 0.002), 1e-9);
    }

    [Fact]
    public void Where_no_generator_is_on_either_side_the_larger_current_is_held_against_the_system_source_rating_and_that_is_said()
    {
        var network = DutyNetworks.Radial(10, more: DutyNetworks.Breaker(IecIeee62271_37_013) with { ShortCircuitBreakingCurrentKa = 80 });
        var duty = DutyNetworks.Check(new MachineDecrement(), network);
        duty.Remarks.Should().Contain(one => one.Contains("on which side the generator is"));
        DutyRuleTests.Expect(duty, DutyKind.BreakingSymmetrical, 10, 80);
    }

    [Fact]
    public void A_check_tells_its_progress_and_can_be_stopped()
    {
        var steps = new List<StudyProgress>();
        DutyCheck.Of(new FaultStudy(Unit.With(Breaker), new IeeeC37()), progress: new Steps(steps));
        steps.Select(one => one.Done).Should().BeEquivalentTo(Enumerable.Range(1, 8));
        steps[^1].Step.Should().Be("duties");
        var stopped = () => DutyCheck.Of(new FaultStudy(Unit.With(Breaker), new IeeeC37()), cancellationToken: new CancellationToken(canceled: true));
        stopped.Should().Throw<OperationCanceledException>();
    }

    private sealed class Steps(List<StudyProgress> steps) : IProgress<StudyProgress>
    {
        public void Report(StudyProgress value) => steps.Add(value);
    }
}
