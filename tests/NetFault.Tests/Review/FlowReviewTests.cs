using static NetFault.Tests.Review.ReviewNetworks;

namespace NetFault.Tests.Review;

/// <summary>Flows against what a fault at the bus says, and against Kirchhoff's current law.</summary>
public sealed class FlowReviewTests
{
    /// <summary>The only way from ring A-B-C with the feeder to ring D-E-F with the fault is the coupler C-D: all of I″k passes it (cut set).</summary>
    [Fact]
    public void A_coupler_that_alone_joins_two_rings_carries_the_whole_fault_current()
    {
        var network = Build(
            Bus("A", 10), Bus("B", 10), Bus("C", 10), Bus("D", 10), Bus("E", 10), Bus("F", 10), Feeder("A", 100),
            Coupler("1", "A", "B"), Coupler("2", "B", "C"), Coupler("3", "C", "A"), Coupler("tie", "C", "D"),
            Coupler("4", "D", "E"), Coupler("5", "E", "F"), Coupler("6", "F", "D"));
        var flows = new FaultStudy(network, new MachineDecrement()).FlowsAt("E");
        flows.Coupler("tie").FromToKa.HasValue.Should().BeTrue("the tie is in no ring");
        flows.Coupler("tie").FromToKa!.Value.Magnitude.Should().BeApproximately(100.0 / (Math.Sqrt(3.0) * 10.0), 1e-9);
    }

    /// <summary>A voltage-limited capacitor is bridged: all of the fault current passes it, and somewhere the flows have to say so.</summary>
    [Fact]
    public void The_current_through_a_bridged_series_capacitor_is_in_the_flows()
    {
        var network = Build(
            Bus("A", 10), Bus("B", 10), Feeder("A", 100),
            new SeriesCapacitor { Id = "SC", From = "A", To = "B", ReactanceOhm = 0.3, VoltageLimited = true });
        var flows = new FaultStudy(network, new Iec60909()).FlowsAt("B");
        flows.Branches.Select(one => one.Id).Concat(flows.Couplers.Select(one => one.Id)).Should().Contain("SC");
    }

    /// <summary>One law: FlowsAt and At are the same fault by the same method (a power station unit, IEC 60909-0, 7.2 inside it).</summary>
    [Theory]
    [InlineData("GRID")]
    [InlineData("TERMINALS")]
    [InlineData("AUXILIARY")]
    public void Flows_into_a_fault_add_up_to_its_initial_current_around_a_power_station_unit(string bus) =>
        FlowsAgree(new FaultStudy(Unit(), new Iec60909()), bus);

    /// <summary>The same where a full-size converter feeds the fault (IEC 60909-0:2016, 6.9).</summary>
    [Fact]
    public void Flows_into_a_fault_add_up_to_its_initial_current_with_a_full_converter_source() => FlowsAgree(
        new FaultStudy(
            Build(Bus("A", 20), Feeder("A", 500), new FullConverterSource { Id = "PV", Bus = "A", SourceCurrentKa = 0.5 }), new Iec60909()),
        "A");

    /// <summary>The same where small motors are left out.</summary>
    [Fact]
    public void Flows_into_a_fault_add_up_to_its_initial_current_with_small_motors_left_out() => FlowsAgree(
        new FaultStudy(
            Build(Bus("A", 10), Feeder("A", 500), new AsynchronousMotor
            {
                Id = "M", Bus = "A", RatedKw = 200, RatedPowerFactor = 0.88, Efficiency = 0.95, LockedRotorCurrentRatio = 6, PolePairs = 2,
            }),
            new Iec60909 { LeaveOutSmallMotors = true }),
        "A");

    /// <summary>Buses behind a closed coupler are one node with one voltage factor: two tolerances there are refused.</summary>
    [Fact]
    public void Buses_of_unequal_tolerance_are_not_joined_by_a_closed_coupler() =>
        FluentActions.Invoking(() => Build(Bus("A", 0.4, 6), Bus("B", 0.4, 10), Feeder("A", 20), Coupler("C", "A", "B")))
            .Should().Throw<InvalidNetworkException>().Which.Diagnostics.Should().ContainSingle(one => one.Id == "NF309");

    /// <summary>Nothing feeds the low-voltage bus but the transformer from the faulted bus: during a bolted fault there its voltage is 0.</summary>
    [Theory]
    [InlineData(ShortCircuitCase.Maximum, 6.0)]
    [InlineData(ShortCircuitCase.Minimum, 6.0)]
    [InlineData(ShortCircuitCase.Minimum, null)]
    public void A_bus_that_is_fed_from_the_faulted_bus_alone_has_no_voltage(ShortCircuitCase which, double? tolerance)
    {
        var network = Build(
            Bus("MV", 10), Bus("LV", 0.4, tolerance), Feeder("MV", 200),
            new Transformer
            {
                Id = "T", Hv = "MV", Lv = "LV", RatedMva = 1, RatedHvKv = 10, RatedLvKv = 0.4, ShortCircuitVoltagePercent = 6, XOverR = 5,
            });
        var voltage = new FaultStudy(network, new Iec60909 { Case = which }).FlowsAt("MV").Voltage("LV");
        voltage.LineToLineKv.Should().BeApproximately(0.0, 1e-9);
    }

    /// <summary>What is in service but de-energised carries 0; asking for it is no mistake in its id.</summary>
    [Fact]
    public void A_line_in_service_in_a_de_energised_part_carries_nothing()
    {
        var network = Build(Bus("A", 10), Bus("B", 10), Bus("C", 10), Feeder("A", 100), Line("L", "B", "C", 0.1, 0.2));
        var flows = new FaultStudy(network, new MachineDecrement()).FlowsAt("A");
        FluentActions.Invoking(() => flows.Branch("L")).Should().NotThrow();
    }

    /// <summary>Two branches have the id 1: which one is meant has to be said, not guessed.</summary>
    [Fact]
    public void An_id_that_two_sections_share_is_not_answered_for_one_of_them()
    {
        var network = Build(
            Bus("A", 110), Bus("B", 110), Bus("C", 10), Feeder("A", 1000), Line("1", "A", "B", 0.1, 0.2),
            new Transformer { Id = "1", Hv = "B", Lv = "C", RatedMva = 20, RatedHvKv = 110, RatedLvKv = 10, ShortCircuitVoltagePercent = 10, XOverR = 20 });
        var flows = new FaultStudy(network, new MachineDecrement()).FlowsAt("C");
        FluentActions.Invoking(() => flows.Branch("1")).Should().Throw<ArgumentException>();
    }

    /// <summary>
    /// design section 6: an element out of service is gone, and so is one at a bus out of service (docs/method.md). The machine then has no unit
    /// transformer and carries K_G, as with the transformer itself out of service.
    /// </summary>
    [Fact]
    public void A_unit_transformer_at_a_bus_out_of_service_is_as_good_as_out_of_service()
    {
        var network = Unit().With(Feeder("AUXILIARY", 100));
        var withoutTransformer = network.With(network.Find<Transformer>("UT") with { InService = false });
        var withoutGrid = network.With(network.Find<Bus>("GRID") with { InService = false });
        var expected = new FaultStudy(withoutTransformer, new Iec60909()).At("TERMINALS").InitialSymmetricalKa;
        new FaultStudy(withoutGrid, new Iec60909()).At("TERMINALS").InitialSymmetricalKa.Should().BeApproximately(expected, 1e-9 * expected);
    }

    private static Network Unit() => Build(
        Bus("GRID", 110), Bus("TERMINALS", 10), Bus("AUXILIARY", 10), Feeder("GRID", 3000), Line("AUX", "TERMINALS", "AUXILIARY", 0.01, 0.1),
        Generator("G", "TERMINALS", 50) with { UnitTransformer = "UT", RatedKv = 10.5 },
        new Transformer
        {
            Id = "UT", Hv = "GRID", Lv = "TERMINALS", RatedMva = 60, RatedHvKv = 115, RatedLvKv = 10.5, ShortCircuitVoltagePercent = 12, XOverR = 20,
            OnLoadTapChanger = true,
        });

    private static void FlowsAgree(FaultStudy study, string bus)
    {
        var expected = study.At(bus).InitialSymmetricalKa;
        study.FlowsAt(bus).FaultCurrentKa.Magnitude.Should().BeApproximately(expected, 1e-9 * expected);
    }
}
