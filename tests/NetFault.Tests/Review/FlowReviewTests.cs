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

    /// <summary>Buses behind a closed coupler are one node: one voltage, one short-circuit current.</summary>
    [Fact]
    public void Buses_joined_by_a_coupler_have_one_fault_current_whatever_their_tolerance()
    {
        var network = Build(Bus("A", 0.4, 6), Bus("B", 0.4, 10), Feeder("A", 20), Coupler("C", "A", "B"));
        var study = new FaultStudy(network, new Iec60909());
        study.At("A").InitialSymmetricalKa.Should().BeApproximately(study.At("B").InitialSymmetricalKa, 1e-9);
        study.FlowsAt("A").Voltage("B").LineToLineKv.Should().BeApproximately(0.0, 1e-9, "B is the faulted node");
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
