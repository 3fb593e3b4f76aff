using static NetFault.Tests.Support.IecCases;

namespace NetFault.Tests.ByIec60909;

/// <summary>
/// Oracle: IEC 60909-0:2016, clause 11: λ·IrG for machines that feed a fault by a way of their own, else I″k without motors.
/// </summary>
public class SteadyStateTests
{
    private static readonly double RatedKa = 25 / Sqrt3 / 10.5;

    private static SynchronousMachine WithFactor => Generator("A") with { SteadyStateFactor = new MaxMin(3.2, 0.45) };

    [Theory]
    [InlineData(ShortCircuitCase.Maximum, 3.2)]
    [InlineData(ShortCircuitCase.Minimum, 0.45)]
    public void One_generator_feeds_lambda_times_its_rated_current(ShortCircuitCase which, double lambda)
    {
        var fault = Of(Bus("A", 10), WithFactor).At("A", which);
        fault.SteadyStateKa!.Value.ShouldBe(lambda * RatedKa);
        fault.Iec60909!.SteadyStateCurrentRule.Should().Be(SteadyStateCurrentRule.RadialByFactor);
    }

    [Fact]
    public void Beside_a_feeder_the_parts_are_added_and_motors_give_nothing()
    {
        var network = Of(Bus("A", 10), WithFactor, Feeder("A", 12), Motor("A"));
        foreach (var fault in new[] { network.At("A"), network.AmongAll("A") })
        {
            fault.SteadyStateKa!.Value.ShouldBe(12 + 3.2 * RatedKa);
            fault.Iec60909!.SteadyStateCurrentRule.Should().Be(SteadyStateCurrentRule.RadialByFactor);
        }
    }

    [Fact]
    public void Through_a_transformer_the_machines_current_is_brought_to_the_faults_voltage()
    {
        var network = Of(Bus("H", 110), Bus("A", 10), WithFactor, new Transformer
        {
            Id = "T", Hv = "H", Lv = "A", RatedMva = 30, RatedHvKv = 115, RatedLvKv = 10.5, ShortCircuitVoltagePercent = 10,
            ResistivePercent = 0.5,
        });
        network.At("H").SteadyStateKa!.Value.ShouldBe(3.2 * RatedKa * 10.5 / 115);
    }

    [Fact]
    public void A_missing_factor_keeps_the_initial_current_and_the_result_says_so()
    {
        var fault = Of(Bus("A", 10), Generator("A")).At("A");
        fault.SteadyStateKa!.Value.ShouldBe(fault.InitialSymmetricalKa);
        fault.Iec60909!.SteadyStateCurrentRule.Should().Be(SteadyStateCurrentRule.RadialFactorMissing);
        var other = Generator("A") with { Id = "G2" };
        var two = Of(Bus("A", 10), WithFactor, other).At("A");
        two.Iec60909!.SteadyStateCurrentRule.Should().Be(SteadyStateCurrentRule.RadialFactorMissing);
        two.SteadyStateKa!.Value.ShouldBe(fault.InitialSymmetricalKa + 3.2 * RatedKa);
    }

    /// <summary>11.2.3: meshed, Ik is the initial current without asynchronous motors; λ plays no part.</summary>
    [Fact]
    public void Behind_generator_and_feeder_together_it_is_the_initial_current_without_motors()
    {
        var network = Of(Bus("A", 10), Bus("B", 10), WithFactor, Feeder("A", 12), Motor("A"), Line("A", "B", 0.05, 0.1));
        var without = Of(Bus("A", 10), Bus("B", 10), WithFactor, Feeder("A", 12), Line("A", "B", 0.05, 0.1));
        var fault = network.At("B");
        fault.SteadyStateKa!.Value.ShouldBe(without.At("B").InitialSymmetricalKa);
        fault.SteadyStateKa.Value.Should().BeLessThan(fault.InitialSymmetricalKa);
        fault.Iec60909!.SteadyStateCurrentRule.Should().Be(SteadyStateCurrentRule.WithoutMotors);
    }

    /// <summary>A machine in another part of the network cannot feed this fault.</summary>
    [Fact]
    public void Two_generators_apart_feed_their_own_buses_alone()
    {
        var network = Of(Bus("A", 10), Bus("B", 10), WithFactor, Generator("B") with { SteadyStateFactor = new MaxMin(2.1) });
        network.At("A").SteadyStateKa!.Value.ShouldBe(3.2 * RatedKa);
        network.AmongAll("B").SteadyStateKa!.Value.ShouldBe(2.1 * RatedKa);
    }

    /// <summary>Ik of motors is 0 (11.2), so a motor beside the generator does not take its own way from it.</summary>
    [Theory]
    [InlineData(ShortCircuitCase.Maximum, 3.2)]
    [InlineData(ShortCircuitCase.Minimum, 0.45)]
    public void A_motor_beside_the_generator_leaves_the_radial_steady_state_current_as_it_is(ShortCircuitCase which, double lambda)
    {
        var network = Of(Bus("A", 10), Bus("B", 10), WithFactor, Motor("A"), Line("A", "B", 0, 0.05));
        network.At("B", which).SteadyStateKa!.Value.ShouldBe(lambda * RatedKa);
    }
}
