namespace NetFault.Tests.ByIeeeC37;

/// <summary>Oracle: arithmetic by hand, 100 MVA, reactances only. The rule of 1.5 times x″d is from memory of IEEE Std C37.010.</summary>
public class ContributionTests
{
    /// <summary>
    /// 50 MVA, x″d 0.2 per unit on it is 0.4; T1 of 50 MVA and 10 % is 0.2; T2 likewise by its percent; the feeder at C, 250 MVA, is 0.4.
    /// </summary>
    [Theory]
    [InlineData(10, 1.0, IeeeContributionKind.LocalGenerator)]      // external 0.2 + 0.2, over 0.4
    [InlineData(19.9, 1.495, IeeeContributionKind.LocalGenerator)]  // external 0.2 + 0.398
    [InlineData(20, 1.5, IeeeContributionKind.RemoteGenerator)]     // external 0.2 + 0.4: not less than 1.5
    [InlineData(30, 2.0, IeeeContributionKind.RemoteGenerator)]
    public void Through_two_transformations_the_external_reactance_decides(double secondPercent, double ratio, IeeeContributionKind kind)
    {
        var result = new FaultStudy(Chain(secondPercent), new IeeeC37()).At("C").IeeeC37!;
        var generator = result.Contributions.Single(one => one.Id == "G");
        var x = 0.4 + 0.2 + secondPercent / 50;
        var share = 1 / x / (1 / x + 1 / 0.4);
        generator.Transformations.Should().Be(2);
        generator.ExternalReactanceRatio.Should().BeApproximately(ratio, 1e-9);
        generator.Kind.Should().Be(kind);
        generator.Share.Should().BeApproximately(share, 1e-9);
        generator.CurrentKa.Should().BeApproximately(100 / (Math.Sqrt(3) * 13.8) / x, 1e-9);
        result.LocalGeneratorShare.Should().BeApproximately(kind == IeeeContributionKind.LocalGenerator ? share : 0, 1e-9);
        result.RemoteShare.Should().BeApproximately(kind == IeeeContributionKind.LocalGenerator ? 1 - share : 1, 1e-9);
        result.MotorShare.Should().Be(0);
    }

    [Fact]
    public void Through_one_transformation_a_generator_is_local_however_far()
    {
        // From B on a line of 5 per unit: external 5.2 over 0.4.
        var network = Chain(10).With(
            new Bus { Id = "far", NominalKv = 115 }, new Line { Id = "L", From = "B", To = "far", PerUnit = new Impedance(0, 5) });
        var generator = new FaultStudy(network, new IeeeC37()).At("far").IeeeC37!.Contributions.Single(one => one.Id == "G");
        generator.Transformations.Should().Be(1);
        generator.Kind.Should().Be(IeeeContributionKind.LocalGenerator);
        generator.ExternalReactanceRatio.Should().BeGreaterThan(5.2 / 0.4);
    }

    [Fact]
    public void A_way_round_transformers_counts_none()
    {
        var network = Chain(30).With(
            new Bus { Id = "A2", NominalKv = 13.8 }, new Line { Id = "cable", From = "A", To = "A2", PerUnit = new Impedance(0, 0.1) },
            new Transformer
            {
                Id = "T3", Hv = "B", Lv = "A2", RatedMva = 50, RatedHvKv = 115, RatedLvKv = 13.8,
                ShortCircuitVoltagePercent = 10, ResistivePercent = 0,
            });
        new FaultStudy(network, new IeeeC37()).At("A2").IeeeC37!.Contributions.Single(one => one.Id == "G").Transformations.Should().Be(0);
    }

    [Fact]
    public void Motors_and_condensers_have_their_kinds()
    {
        // At A: a condenser, a synchronous motor of 10 MVA and 0.25 with its 1.5, beside the generator 0.4 and the way to the feeder,
        // 0.2 + 0.2 + 0.4.
        var network = Chain(10).With(Machine("motor", SynchronousService.Motor), Machine("condenser", SynchronousService.Condenser));
        var result = new FaultStudy(network, new IeeeC37()).At("A").IeeeC37!;
        double all = 1 / 0.4 + 1 / 0.8 + 1 / 3.75 + 1 / 2.5;
        result.MotorShare.Should().BeApproximately(1 / 3.75 / all, 1e-9);
        result.LocalGeneratorShare.Should().BeApproximately((1 / 0.4 + 1 / 2.5) / all, 1e-9);
        result.RemoteShare.Should().BeApproximately(1 / 0.8 / all, 1e-9);
        result.Contributions.Select(one => one.Id).Should().BeEquivalentTo("U", "G", "motor", "condenser");

        static SynchronousMachine Machine(string id, SynchronousService service) => new()
        {
            Id = id, Bus = "A", Service = service, RatedMva = 10, ReactancePu = new MachineReactances(0.25), ArmatureResistancePu = 0,
        };
    }

    private static Network Chain(double secondPercent) => new NetworkBuilder { FrequencyHz = 60, BaseMva = 100 }.Add(
        new Bus { Id = "A", NominalKv = 13.8 }, new Bus { Id = "B", NominalKv = 115 }, new Bus { Id = "C", NominalKv = 34.5 },
        new SynchronousMachine
        {
            Id = "G", Bus = "A", RatedMva = 50, ReactancePu = new MachineReactances(0.2, 0.3), ArmatureResistancePu = 0,
        },
        new Transformer
        {
            Id = "T1", Hv = "B", Lv = "A", RatedMva = 50, RatedHvKv = 115, RatedLvKv = 13.8,
            ShortCircuitVoltagePercent = 10, ResistivePercent = 0,
        },
        new Transformer
        {
            Id = "T2", Hv = "B", Lv = "C", RatedMva = 50, RatedHvKv = 115, RatedLvKv = 34.5,
            ShortCircuitVoltagePercent = secondPercent, ResistivePercent = 0,
        },
        new NetworkFeeder { Id = "U", Bus = "C", ShortCircuitMva = new MaxMin(250), ROverX = 0 }).Build();
}
