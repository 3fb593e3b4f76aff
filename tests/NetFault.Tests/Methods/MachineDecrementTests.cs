using NetFault.Tests.Support;

namespace NetFault.Tests.Methods;

/// <summary>Oracles: closed forms of one machine, hand calculation.</summary>
public class MachineDecrementTests
{
    private static readonly double RatedKa = 25 / (Math.Sqrt(3) * 10);

    [Fact]
    public void A_generator_at_its_terminals_gives_rated_current_over_its_reactance_at_each_instant()
    {
        var fault = Solve(Plants.OneGenerator(new MachineReactances(0.125, 0.2, 1.6)));
        fault.InitialSymmetricalKa.Should().BeApproximately(RatedKa / 0.125, 1e-12);
        fault.TransientKa.Should().BeApproximately(RatedKa / 0.2, 1e-12);
        fault.SteadyStateKa.Should().BeApproximately(RatedKa / 1.6, 1e-12);
    }

    [Fact]
    public void Armature_resistance_comes_from_negative_reactance_and_armature_time_constant()
    {
        // Ra = x2/(ω·Ta), then X/R = ω·Ta·x″d/x2.
        var network = Plants.OneGenerator(new MachineReactances(0.125, Negative: 0.15), null, new MachineTimeConstants(Armature: 0.2));
        Solve(network).XOverR.Should().BeApproximately(2 * Math.PI * 50 * 0.2 * 0.125 / 0.15, 1e-9);
        AssumedKeys(network).Should().Equal("reactance_pu.transient", "reactance_pu.synchronous");
    }

    [Fact]
    public void Without_negative_reactance_the_DC_component_decays_with_the_armature_time_constant_and_says_what_it_assumed()
    {
        var network = Plants.OneGenerator(new MachineReactances(0.125, 0.2, 1.6), null, new MachineTimeConstants(Armature: 0.2));
        var fault = Solve(network);
        fault.DcComponentKa(0.1).Should().BeApproximately(Math.Sqrt(2) * fault.InitialSymmetricalKa * Math.Exp(-0.1 / 0.2), 1e-9);
        AssumedKeys(network).Should().Equal("reactance_pu.negative");
    }

    [Fact]
    public void Without_any_resistance_data_a_typical_armature_time_constant_is_assumed_and_said()
    {
        var network = Plants.OneGenerator(new MachineReactances(0.125, 0.2, 1.6), null);
        var fault = Solve(network);
        fault.XOverR.Should().BeApproximately(2 * Math.PI * 50 * 0.15, 1e-9);
        Held(network).Assumptions.Should().ContainSingle().Which.Should().Be(new Assumption(
            "synchronous_machines", "G", "armature_resistance_pu", "Ra is not given; X″d/R = 47.1 assumed (Ta = 0.15 s, common practice)"));
    }

    [Fact]
    public void Armature_resistance_in_ohm_is_the_same_as_per_unit()
    {
        var network = Plants.OneGenerator(new MachineReactances(0.125, 0.2, 1.6), 0.01);
        var ohm = network.With(network.SynchronousMachines[0] with { ArmatureResistancePu = null, ArmatureResistanceOhm = 0.01 * 100 / 25.0 });
        Solve(ohm).XOverR.Should().BeApproximately(12.5, 1e-9);
        Solve(network).XOverR.Should().BeApproximately(12.5, 1e-9);
    }

    [Fact]
    public void A_machine_without_later_reactances_keeps_its_last_known_one_and_says_so()
    {
        var network = Plants.OneGenerator(new MachineReactances(0.125, 0.2));
        var fault = Solve(network);
        fault.TransientKa.Should().BeApproximately(RatedKa / 0.2, 1e-12);
        fault.SteadyStateKa.Should().BeApproximately(RatedKa / 0.2, 1e-12);
        Held(network).Assumptions.Select(one => one.Text).Should().Equal("xd is not given; x′d is kept for the steady-state current");
    }

    [Fact]
    public void A_rated_voltage_other_than_the_nominal_one_counts()
    {
        var network = Plants.OneGenerator(new MachineReactances(0.125));
        var raised = network.With(network.SynchronousMachines[0] with { RatedKv = 10.5 });
        Solve(raised).InitialSymmetricalKa.Should().BeApproximately(RatedKa / 0.125 / (1.05 * 1.05), 1e-12);
    }

    [Fact]
    public void A_motor_group_feeds_its_locked_rotor_current_at_the_beginning_and_nothing_later()
    {
        var network = Plants.OneFeeder(0.1).With(new AsynchronousMotor
        {
            Id = "M", Bus = "Q", RatedKw = 2000, RatedKv = 20, RatedPowerFactor = 0.88, Efficiency = 0.95, LockedRotorCurrentRatio = 6,
            ROverX = 0.1, Count = 3,
        });
        var fault = Solve(network);
        var motorsKa = 3 * 6 * 2 / (0.88 * 0.95) / (Math.Sqrt(3) * 20);
        fault.InitialSymmetricalKa.Should().BeApproximately(10 + motorsKa, 1e-9);
        fault.TransientKa.Should().BeApproximately(10, 1e-9);
        fault.SteadyStateKa.Should().BeApproximately(10, 1e-9);
    }

    [Theory]
    [InlineData(6.0, 3000, 2, 0.10, "R/X = 0.10 assumed (IEC 60909-0: medium voltage, 1 MW a pole pair or more)")]
    [InlineData(6.0, 1500, 2, 0.15, "R/X = 0.15 assumed (IEC 60909-0: medium voltage, below 1 MW a pole pair)")]
    [InlineData(0.4, 90, 2, 0.42, "R/X = 0.42 assumed (IEC 60909-0: low-voltage motor groups with their cables)")]
    [InlineData(6.0, 1500, null, 0.10,
        "R/X = 0.10 assumed (IEC 60909-0: medium voltage, 1 MW a pole pair or more; pole_pairs is not given, 1 assumed)")]
    public void A_motor_without_R_over_X_gets_that_of_IEC_60909_by_size(double kv, double kw, int? polePairs, double rOverX, string text)
    {
        // The values 0.10, 0.15 and 0.42 are those of IEC 60909-0 for asynchronous motors, from memory of the standard.
        var network = new NetworkBuilder { FrequencyHz = 50 }.Add(
            new Bus { Id = "Q", NominalKv = kv },
            new NetworkFeeder { Id = "U", Bus = "Q", ShortCircuitMva = new MaxMin(1e-6), ROverX = rOverX },
            new AsynchronousMotor
            {
                Id = "M", Bus = "Q", RatedKv = kv, RatedKw = kw, RatedPowerFactor = 0.88, Efficiency = 0.95, LockedRotorCurrentRatio = 6,
                PolePairs = polePairs,
            }).Build();
        Solve(network).XOverR.Should().BeApproximately(1 / rOverX, 1e-9);
        Held(network).Assumptions.Should().ContainSingle().Which.Text.Should().Be(text);
    }

    [Fact]
    public void Only_the_instants_asked_for_are_calculated()
    {
        var network = Plants.OneGenerator(new MachineReactances(0.125, 0.2, 1.6));
        var fault = new FaultStudy(network, new MachineDecrement { Instants = FaultInstants.Transient }).EveryBus()[0];
        fault.TransientKa.Should().NotBeNull();
        fault.SteadyStateKa.Should().BeNull();
    }

    [Fact]
    public void Asked_to_the_AC_component_is_held_and_the_result_says_so()
    {
        var fault = Held(Plants.OneGenerator(new MachineReactances(0.125, 0.2, 1.6), 0.005)).EveryBus()[0];
        fault.SymmetricalRmsKa(5).Should().Be(fault.InitialSymmetricalKa);
        fault.AcComponentRule.Should().Be(AcComponentRule.HeldAtInitial);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(-1)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void An_impossible_pre_fault_voltage_is_refused(double perUnit)
    {
        var make = () => new MachineDecrement { PrefaultVoltagePu = perUnit };
        make.Should().Throw<ArgumentOutOfRangeException>();
    }

    private static BusFault Solve(Network network) => new FaultStudy(network, new MachineDecrement()).EveryBus()[0];

    private static IEnumerable<string> AssumedKeys(Network network) =>
        Held(network).Assumptions.Select(one => one.Key);

    /// <summary>Without decay over time, which would need time constants and say so.</summary>
    private static FaultStudy Held(Network network) => new(network, new MachineDecrement { AcComponentRule = AcComponentRule.HeldAtInitial });
}
