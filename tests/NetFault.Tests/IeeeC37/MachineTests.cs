namespace NetFault.Tests.ByIeeeC37;

/// <summary>
/// Oracle: arithmetic by hand on one bus. Multipliers from memory of IEEE Std C37.010's table of rotating machine reactances, 1.67 from
/// memory of IEEE Std 141.
/// </summary>
public class MachineTests
{
    [Theory]
    [InlineData(29.84, 2, 60, 1.67, 0)]         // 40 hp
    [InlineData(37.0, 2, 60, 1.2, 3.0)]         // the metric 50 hp
    [InlineData(37.3, 2, 60, 1.2, 3.0)]         // 50 hp
    [InlineData(149.2, 1, 60, 1.2, 3.0)]        // 200 hp at 3600 r/min
    [InlineData(186.5, 1, 60, 1.2, 3.0)]        // 250 hp at 3600 r/min: not above
    [InlineData(223.8, 1, 60, 1.0, 1.5)]        // 300 hp at 3600 r/min
    [InlineData(223.8, 2, 60, 1.2, 3.0)]        // 300 hp at 1800 r/min
    [InlineData(223.8, 1, 50, 1.0, 1.5)]        // 300 hp at 3000 r/min: faster than 1800
    [InlineData(223.8, null, 60, 1.0, 1.5)]     // 300 hp at an unknown speed: the larger contribution
    [InlineData(746.0, 2, 60, 1.2, 3.0)]        // 1000 hp at 1800 r/min: not above
    [InlineData(895.2, 2, 60, 1.0, 1.5)]        // 1200 hp at 1800 r/min
    [InlineData(895.2, 6, 50, 1.0, 1.5)]        // 1200 hp at 500 r/min
    public void Asynchronous_motors_contribute_by_size_and_speed(
        double kw, int? polePairs, double frequencyHz, double first, double interrupting)
    {
        var fault = Solve(frequencyHz, new AsynchronousMotor
        {
            Id = "M", Bus = "B", RatedKw = kw, RatedPowerFactor = 0.9, Efficiency = 0.95, LockedRotorCurrentRatio = 6, ROverX = 0,
            PolePairs = polePairs, Count = 3,
        });
        // Three motors at 6 times their rated current kw/(√3·4.16·0.9·0.95), in kA.
        var lockedRotorKa = 3 * 6 * kw / 1000 / (Math.Sqrt(3) * 4.16 * 0.9 * 0.95);
        fault.InitialSymmetricalKa.Should().BeApproximately(20 + lockedRotorKa / first, 1e-9);
        fault.IeeeC37!.InterruptingSymmetricalKa.Should().BeApproximately(20 + (interrupting > 0 ? lockedRotorKa / interrupting : 0), 1e-9);
        fault.IeeeC37.ThirtyCycleSymmetricalKa.Should().BeApproximately(20, 1e-9);
    }

    [Theory]
    [InlineData(SynchronousService.Generator, 1.0, 1.0)]
    [InlineData(SynchronousService.Motor, 1.0, 1.5)]
    [InlineData(SynchronousService.Condenser, 1.0, 1.0)]
    public void Synchronous_machines_contribute_by_service(SynchronousService service, double first, double interrupting)
    {
        var fault = Solve(60, new SynchronousMachine
        {
            Id = "S", Bus = "B", Service = service, RatedMva = 5, ReactancePu = new MachineReactances(0.16, 0.25), ArmatureResistancePu = 0,
        });
        var ratedKa = 5 / (Math.Sqrt(3) * 4.16);
        fault.InitialSymmetricalKa.Should().BeApproximately(20 + ratedKa / 0.16 / first, 1e-9);
        fault.IeeeC37!.InterruptingSymmetricalKa.Should().BeApproximately(20 + ratedKa / 0.16 / interrupting, 1e-9);
        fault.IeeeC37.ThirtyCycleSymmetricalKa
            .Should().BeApproximately(20 + (service == SynchronousService.Generator ? ratedKa / 0.25 : 0), 1e-9);
    }

    [Fact]
    public void A_multiplier_leaves_the_machine_its_X_over_R()
    {
        // A synchronous motor alone: X/R = 0.2/0.01 in the first-cycle and in the interrupting network.
        var fault = new FaultStudy(new NetworkBuilder { FrequencyHz = 60 }.Add(
            new Bus { Id = "B", NominalKv = 4.16 },
            new SynchronousMachine
            {
                Id = "S", Bus = "B", Service = SynchronousService.Motor, RatedMva = 5, ReactancePu = new MachineReactances(0.2),
                ArmatureResistancePu = 0.01,
            }).Build(), new IeeeC37()).At("B");
        fault.XOverR.Should().BeApproximately(20, 1e-9);
        fault.IeeeC37!.InterruptingXOverR.Should().BeApproximately(20, 1e-9);
    }

    [Fact]
    public void Where_motors_and_condensers_alone_hold_a_bus_the_30_cycle_current_is_0_and_others_are_solved()
    {
        var network = Feeder(60).With(
            new Bus { Id = "apart", NominalKv = 4.16 },
            new SynchronousMachine
            {
                Id = "C", Bus = "apart", Service = SynchronousService.Condenser, RatedMva = 5, ReactancePu = new MachineReactances(0.2),
                ArmatureResistancePu = 0,
            });
        var study = new FaultStudy(network, new IeeeC37());
        study.At("apart").IeeeC37!.ThirtyCycleSymmetricalKa.Should().Be(0);
        study.At("apart").SymmetricalRmsKa(1).Should().Be(0);
        study.FlowsAt("apart", FaultInstant.SteadyState).FaultCurrentKa.Magnitude.Should().Be(0);
        study.At("apart").IeeeC37!.InterruptingSymmetricalKa.Should().BeApproximately(5 / (Math.Sqrt(3) * 4.16) / 0.2, 1e-9);
        study.At("B").IeeeC37!.ThirtyCycleSymmetricalKa.Should().BeApproximately(20, 1e-9);
    }

    [Fact]
    public void Drives_doubly_fed_generators_and_converters_are_taken_on_the_safe_side_and_that_is_said()
    {
        var network = Feeder(60).With(
            new ConverterFedDrive { Id = "D", Bus = "B", RatedMva = 2 },
            new DoublyFedGenerator { Id = "W", Bus = "B", HighestInstantaneousKa = 3, PeakFactor = 1.7, ROverX = 0, RatedKv = 4.16 },
            new FullConverterSource { Id = "F", Bus = "B", SourceCurrentKa = 0.5, SteadyStateKa = new MaxMin(0.4, 0.3) });
        var study = new FaultStudy(network, new IeeeC37 { CurrentRule = IeeeCurrentRule.EOverX });
        var fault = study.At("B");
        // The drive as ILR/Ir = 3 with R/X = 0.1: E/X is √1.01 times E/Z; 1.5 times the reactance in the interrupting network. The doubly
        // fed generator gives iWDmax/(κ·√2); the converter its own current, 0.3 kA at 30 cycles.
        var drive = 3 * 2 / (Math.Sqrt(3) * 4.16) * Math.Sqrt(1.01);
        var doublyFed = 3 / (1.7 * Math.Sqrt(2));
        fault.InitialSymmetricalKa.Should().BeApproximately(20 + drive + doublyFed + 0.5, 1e-9);
        fault.IeeeC37!.InterruptingSymmetricalKa.Should().BeApproximately(20 + drive / 1.5 + doublyFed + 0.5, 1e-9);
        fault.IeeeC37.ThirtyCycleSymmetricalKa.Should().BeApproximately(20 + 0.3, 1e-9);
        fault.IeeeC37.ConverterPartKa.Should().BeApproximately(0.5, 1e-9);
        study.FlowsAt("B", FaultInstant.Transient).FaultCurrentKa.Magnitude
            .Should().BeApproximately(fault.IeeeC37.InterruptingSymmetricalKa, 1e-9);
        study.Assumptions.Select(one => one.ElementId).Should().Contain(["D", "W", "F"]);
        study.Assumptions.Single(one => one.ElementId == "W" && one.Key == "steady_state_ka.min").Text
            .Should().Contain("left out of the 30-cycle");
    }

    [Fact]
    public void What_a_converter_adds_falls_with_the_impedance_between_as_IEC_60909_0_has_it()
    {
        // 11 kV, base 100 MVA: feeder 500 MVA at A is j0.2 per unit; the line to B j0.3; 1 per unit of current injected at B.
        var network = new NetworkBuilder { FrequencyHz = 50, BaseMva = 100 }.Add(
            new Bus { Id = "A", NominalKv = 11 }, new Bus { Id = "B", NominalKv = 11 },
            new NetworkFeeder { Id = "U", Bus = "A", ShortCircuitMva = new MaxMin(500), ROverX = 0 },
            new Line { Id = "L", From = "A", To = "B", PerUnit = new Impedance(0, 0.3) },
            new FullConverterSource { Id = "F", Bus = "B", SourceCurrentKa = 100 / (Math.Sqrt(3) * 11) }).Build();
        var result = new FaultStudy(network, new IeeeC37()).EveryBus();
        var baseKa = 100 / (Math.Sqrt(3) * 11);
        result[0].InitialSymmetricalKa.Should().BeApproximately(baseKa * (1 / 0.2 + 1), 1e-9);      // ZAB/ZAA = 0.2/0.2
        result[1].InitialSymmetricalKa.Should().BeApproximately(baseKa * (1 / 0.5 + 1), 1e-9);      // ZBB/ZBB
        result[0].IeeeC37!.ThirtyCycleSymmetricalKa.Should().BeApproximately(baseKa / 0.2, 1e-9);
        var converter = result[0].IeeeC37!.Contributions.Single(one => one.Id == "F");
        converter.Kind.Should().Be(IeeeContributionKind.Converter);
        converter.Share.Should().BeApproximately(1.0 / 6, 1e-9);
        result[0].IeeeC37!.RemoteShare.Should().BeApproximately(1, 1e-9);
    }

    [Fact]
    public void What_is_assumed_is_said_where_it_matters()
    {
        static AsynchronousMotor Motor(string id, double kw) => new()
        {
            Id = id, Bus = "B", RatedKw = kw, RatedKv = 4.16, RatedPowerFactor = 0.9, Efficiency = 0.95, LockedRotorCurrentRatio = 6,
            ROverX = 0.1,
        };
        var study = new FaultStudy(Feeder(60).With(
            Motor("small", 100), Motor("between", 400), Motor("large", 900),
            new SynchronousMachine
            {
                Id = "G", Bus = "B", RatedMva = 5, RatedKv = 4.16, ReactancePu = new MachineReactances(0.2), ArmatureResistancePu = 0.01,
            }),
            new IeeeC37());
        study.Assumptions.Where(one => one.Key == "pole_pairs").Should().ContainSingle().Which.ElementId.Should().Be("between");
        study.Assumptions.Single(one => one.Key == "reactance_pu.transient").Text.Should().Contain("x″d is kept in the 30-cycle network");
        study.At("B").Assumptions.Should().Contain(one => one.ElementId == "U" && one.Text.Contains("R = |X|/200"));
    }

    private static BusFault Solve(double frequencyHz, NetworkElement machine) =>
        new FaultStudy(Feeder(frequencyHz).With(machine), new IeeeC37()).At("B");

    /// <summary>A bus of 4.16 kV with a feeder of 20 kA without resistance.</summary>
    private static Network Feeder(double frequencyHz) => new NetworkBuilder { FrequencyHz = frequencyHz }.Add(
        new Bus { Id = "B", NominalKv = 4.16 },
        new NetworkFeeder { Id = "U", Bus = "B", ShortCircuitKa = new MaxMin(20), ROverX = 0 }).Build();
}
