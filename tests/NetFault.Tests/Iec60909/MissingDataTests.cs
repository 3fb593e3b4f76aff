using static NetFault.Tests.Support.IecCases;

namespace NetFault.Tests.ByIec60909;

/// <summary>What IEC 60909-0:2016 needs and a network may lack: clear errors, and only where the method needs the value.</summary>
public class MissingDataTests
{
    private static readonly Transformer UnitTransformer = new()
    {
        Id = "T", Hv = "H", Lv = "A", RatedMva = 30, RatedHvKv = 115, RatedLvKv = 10.5, ShortCircuitVoltagePercent = 10,
        ResistivePercent = 0.5,
        OnLoadTapChanger = true,
    };

    private static SynchronousMachine Machine => Generator("A") with { UnitTransformer = "T" };

    [Theory]
    [InlineData(SynchronousService.Generator)]
    [InlineData(SynchronousService.Motor)]
    public void A_machine_without_power_factor_is_named(SynchronousService service)
    {
        var network = Of(Bus("A", 10), Generator("A") with { RatedPowerFactor = null, Service = service });
        Refusal(network, "A").Should().Be(("synchronous_machines", "GA", "rated_power_factor"));
        AssertMachineDecrementWorks(network);
    }

    [Fact]
    public void A_units_machine_without_power_factor_is_named()
    {
        var network = Of(Bus("H", 110), Bus("A", 10), Machine with { RatedPowerFactor = null }, UnitTransformer);
        Refusal(network, "H").Should().Be(("synchronous_machines", "GA", "rated_power_factor"));
        AssertMachineDecrementWorks(network);
    }

    [Fact]
    public void A_unit_transformer_that_does_not_say_whether_it_has_a_tap_changer_is_named()
    {
        var network = Of(Bus("H", 110), Bus("A", 10), Machine, UnitTransformer with { OnLoadTapChanger = null });
        Refusal(network, "H").Should().Be(("transformers", "T", "on_load_tap_changer"));
        AssertMachineDecrementWorks(network);
    }

    [Fact]
    public void Two_machines_on_one_unit_transformer_are_named()
    {
        var network = Of(Bus("H", 110), Bus("A", 10), Machine, Machine with { Id = "G2" }, UnitTransformer);
        Refusal(network, "H").Should().Be(("synchronous_machines", "G2", "unit_transformer"));
        AssertMachineDecrementWorks(network);
    }

    [Fact]
    public void A_network_transformer_need_not_say_whether_it_has_a_tap_changer()
    {
        var network = Of(Bus("H", 110), Bus("A", 10), Generator("A"), UnitTransformer with { OnLoadTapChanger = null });
        network.At("H").InitialSymmetricalKa.Should().BeGreaterThan(0);
    }

    [Fact]
    public void A_motor_without_pole_pairs_is_named_when_its_q_is_needed_and_not_before()
    {
        var network = Of(Bus("A", 10), Feeder("A", 12), Motor("A") with { PolePairs = null });
        foreach (var fault in new[] { network.At("A"), network.AmongAll("A") })
        {
            fault.PeakKa.Should().BeGreaterThan(fault.InitialSymmetricalKa);
            fault.SteadyStateKa!.Value.ShouldBe(12);
            fault.DcComponentKa(0.1).Should().BeGreaterThan(0);
            var error = ((Action)(() => fault.Iec60909!.BreakingKa(0.1))).Should().Throw<MethodDataException>().Which;
            (error.Section, error.ElementId, error.Key).Should().Be(("asynchronous_motors", "MA", "pole_pairs"));
            error.Message.Should().Contain("asynchronous_motors").And.Contain("MA").And.Contain("pole_pairs");
        }
        network.At("A", ShortCircuitCase.Minimum).Iec60909!.BreakingKa(0.1).ShouldBe(12);
        AssertMachineDecrementWorks(network);
    }

    [Fact]
    public void A_motor_without_pole_pairs_is_no_matter_where_it_feeds_less_than_twice_its_rated_current()
    {
        var network = Of(
            Bus("A", 10), Bus("B", 10), Feeder("A", 12), Line("A", "B", 0, 20), Motor("B") with { PolePairs = null });
        network.At("A").Iec60909!.BreakingKa(0.1).ShouldBe(network.At("A").InitialSymmetricalKa);
    }

    [Fact]
    public void What_is_out_of_service_may_lack_anything()
    {
        var off = Generator("A") with { Id = "off", InService = false, RatedPowerFactor = null };
        Of(Bus("A", 10), Feeder("A", 12), off).At("A").InitialSymmetricalKa.ShouldBe(12);
        var unit = Machine with { InService = false, RatedPowerFactor = null };
        Of(Bus("H", 110), Bus("A", 10), Feeder("H", 12), unit,
            UnitTransformer with { OnLoadTapChanger = null }).At("H").InitialSymmetricalKa.ShouldBe(12);
    }

    /// <summary>A bus out of service takes with it what is connected there.</summary>
    [Fact]
    public void A_unit_on_a_bus_out_of_service_may_lack_anything()
    {
        var network = Of(
            Bus("H", 110), Bus("A", 10) with { InService = false }, Feeder("H", 12), Machine with { RatedPowerFactor = null },
            UnitTransformer with { OnLoadTapChanger = null });
        network.At("H").InitialSymmetricalKa.ShouldBe(12);
    }

    [Fact]
    public void Options_that_are_none_of_this_method_are_refused()
    {
        ((Func<Iec60909>)(() => new Iec60909 { XOverRRule = XOverRRule.SeparateNetworks })).Should().Throw<ArgumentOutOfRangeException>();
        ((Func<Iec60909>)(() => new Iec60909 { XOverRRule = (XOverRRule)99 })).Should().Throw<ArgumentOutOfRangeException>();
        ((Func<Iec60909>)(() => new Iec60909 { Case = (ShortCircuitCase)99 })).Should().Throw<ArgumentOutOfRangeException>();
    }

    [Fact]
    public void The_standard_knows_no_transient_network()
    {
        var study = new FaultStudy(Of(Bus("A", 10), Feeder("A", 12)), new Iec60909());
        study.At("A").TransientKa.Should().BeNull();
        ((Action)(() => study.BusImpedanceMatrix(FaultInstant.Transient))).Should().Throw<ArgumentOutOfRangeException>();
    }

    private static (string Section, string Id, string Key) Refusal(Network network, string bus)
    {
        var atOne = ((Action)(() => new FaultStudy(network, new Iec60909()).At(bus))).Should().Throw<MethodDataException>().Which;
        var atAll = ((Action)(() => new FaultStudy(network, new Iec60909()).EveryBus())).Should().Throw<MethodDataException>().Which;
        atAll.Message.Should().Be(atOne.Message).And.Contain(atOne.Section).And.Contain(atOne.ElementId).And.Contain(atOne.Key);
        return (atOne.Section, atOne.ElementId, atOne.Key);
    }

    private static void AssertMachineDecrementWorks(Network network) =>
        new FaultStudy(network, new MachineDecrement()).EveryBus().Should().OnlyContain(fault => fault.InitialSymmetricalKa > 0);
}
