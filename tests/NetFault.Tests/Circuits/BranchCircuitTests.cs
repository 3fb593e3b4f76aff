using System.Numerics;
using NetFault.Tests.Support;

namespace NetFault.Tests.Circuits;

/// <summary>Each kind of branch on its own behind a feeder whose impedance is known. Oracle: hand calculation in ohm.</summary>
public class BranchCircuitTests
{
    /// <summary>The feeder at bus S, 20 kV, 400 MVA: 1 ohm with R/X = 0.1.</summary>
    private static readonly Complex SourceOhm = Complex.FromPolarCoordinates(1, Math.Atan(10));

    [Fact]
    public void Parallel_circuits_of_a_line_share_its_impedance() =>
        At("F", new Line { Id = "L", From = "S", To = "F", LengthKm = 3, OhmPerKm = new Impedance(0.2, 0.3), Parallel = 2 })
            .Should().BeCloseTo(SourceOhm + new Complex(0.3, 0.45));

    [Fact]
    public void A_line_in_per_unit_stands_on_base_power_and_the_voltage_of_its_from_bus() =>
        At("F", new Line { Id = "L", From = "S", To = "F", PerUnit = new Impedance(0.01, 0.05) })
            .Should().BeCloseTo(SourceOhm + new Complex(0.01, 0.05) * 400 / 100);

    [Fact]
    public void A_per_unit_line_between_unequal_voltages_has_the_ratio_of_the_voltages_and_a_warning()
    {
        var network = Source(10).With(new Line { Id = "L", From = "S", To = "F", PerUnit = new Impedance(0.01, 0.05) });
        network.Warnings.Should().ContainSingle().Which.Id.Should().Be("NF401");
        Impedance(network, "F").Should().BeCloseTo((SourceOhm + new Complex(0.01, 0.05) * 4) / 4);
    }

    [Fact]
    public void A_reactor_has_its_percentage_of_rated_voltage_over_rated_current() =>
        At("F", new SeriesReactor { Id = "R", From = "S", To = "F", RatedKa = 1, RatedKv = 20, ReactancePercent = 6, XOverR = 40 })
            .Should().BeCloseTo(SourceOhm + new Complex(1.0 / 40, 1) * 0.06 * 20 / Math.Sqrt(3));

    [Fact]
    public void A_reactor_without_X_over_R_has_no_resistance_and_the_study_says_so()
    {
        var network = Source(20).With(new SeriesReactor { Id = "R", From = "S", To = "F", RatedKa = 1, RatedKv = 20, ReactancePercent = 6 });
        Impedance(network, "F").Should().BeCloseTo(SourceOhm + new Complex(0, 0.06 * 20 / Math.Sqrt(3)));
        new FaultStudy(network, new MachineDecrement()).Assumptions.Select(one => one.Key).Should().Equal("x_over_r");
    }

    [Fact]
    public void A_transformers_resistance_is_the_same_from_percent_losses_or_ratio()
    {
        var percent = new Transformer
        {
            Id = "T", Hv = "S", Lv = "F", RatedMva = 10, RatedHvKv = 20, RatedLvKv = 6, ShortCircuitVoltagePercent = 8, ResistivePercent = 0.6,
        };
        var expected = (SourceOhm + new Complex(0.006, Math.Sqrt(0.08 * 0.08 - 0.006 * 0.006)) * 400 / 10) * 36 / 400;
        Complex Of(Transformer one) => Impedance(Source(6).With(one), "F");
        Of(percent).Should().BeCloseTo(expected);
        Of(percent with { ResistivePercent = null, LoadLossKw = 60 }).Should().BeCloseTo(expected);
        Of(percent with { ResistivePercent = null, XOverR = Math.Sqrt(0.08 * 0.08 - 0.006 * 0.006) / 0.006 }).Should().BeCloseTo(expected);
    }

    [Fact]
    public void An_off_nominal_ratio_refers_the_source_by_the_rated_voltages() =>
        Impedance(Source(6).With(new Transformer
        {
            Id = "T", Hv = "S", Lv = "F", RatedMva = 10, RatedHvKv = 21, RatedLvKv = 6.3, ShortCircuitVoltagePercent = 8, ResistivePercent = 0,
        }), "F").Should().BeCloseTo((SourceOhm + new Complex(0, 0.08 * 21 * 21 / 10)) * (6.3 / 21) * (6.3 / 21));

    [Theory]
    [InlineData("hv")]
    [InlineData("mv")]
    [InlineData("lv")]
    public void With_one_winding_open_the_pair_in_use_counts_alone(string open)
    {
        var transformer = ThreeWindings() with { Hv = open == "hv" ? null : "S", Mv = open == "mv" ? null : open == "hv" ? "S" : "F", Lv = open == "lv" ? null : "F" };
        double percent = open switch { "hv" => 6, "mv" => 15, _ => 10 }, mva = open == "lv" ? 40 : 10;
        Impedance(Source(20).With(transformer), "F").Should().BeCloseTo(SourceOhm + new Complex(0, percent / 100 * 400 / mva));
    }

    [Fact]
    public void A_star_leg_of_zero_is_no_short_circuit_and_no_error()
    {
        // On 10 MVA the pairs are 2.5, 15 and 12.5 %: legs 2.5, 0 and 12.5 %. The MV leg is 0.
        var transformer = ThreeWindings() with { ShortCircuitVoltagePercent = new WindingPairValues(10, 15, 12.5) };
        var network = Source(20).With(new Bus { Id = "G", NominalKv = 20 }, transformer with { Lv = "G" });
        Impedance(network, "F").Should().BeCloseTo(SourceOhm + new Complex(0, 1));
        Impedance(network, "G").Should().BeCloseTo(SourceOhm + new Complex(0, 6));
        var flows = new FaultStudy(network, new MachineDecrement()).FlowsAt("G");
        flows.Branch("T").FromBusKa("F").Magnitude.Should().BeLessThan(1e-12);
        (flows.Branch("T").FromBusKa("S") + flows.Branch("T").FromBusKa("G")).Magnitude.Should().BeLessThan(1e-12);
    }

    [Fact]
    public void An_element_at_a_bus_out_of_service_is_out_of_service_too()
    {
        var network = Source(20).With(
            new Bus { Id = "F", NominalKv = 20, InService = false },
            new Line { Id = "L", From = "S", To = "F", Ohm = new Impedance(0.1, 0.1) },
            new NetworkFeeder { Id = "second", Bus = "F", ShortCircuitMva = new MaxMin(100), XOverR = 10 });
        var study = new FaultStudy(network, new MachineDecrement());
        study.At("F").IsEnergised.Should().BeFalse();
        study.At("S").ImpedanceOhm!.Value.Should().BeCloseTo(SourceOhm);
    }

    [Fact]
    public void Buses_fed_by_asynchronous_motors_alone_are_de_energised()
    {
        var network = Source(20).With(new AsynchronousMotor
        {
            Id = "M", Bus = "F", RatedKw = 500, RatedPowerFactor = 0.9, Efficiency = 0.95, LockedRotorCurrentRatio = 6, ROverX = 0.1,
        });
        network.Warnings.Select(one => one.Id).Should().Equal("NF405");
        new FaultStudy(network, new MachineDecrement()).At("F").InitialSymmetricalKa.Should().Be(0);
    }

    [Fact]
    public void Reactances_that_cancel_exactly_are_refused_with_the_bus_named()
    {
        var network = Source(20).With(
            new NetworkFeeder { Id = "Q", Bus = "S", ShortCircuitMva = new MaxMin(400), ROverX = 0 },
            new Line { Id = "L", From = "S", To = "F", Ohm = new Impedance(0, -1) });
        var all = () => new FaultStudy(network, new MachineDecrement()).EveryBus();
        all.Should().Throw<SingularNetworkException>().Which.BusIds.Should().Equal("F");
        var one = () => new FaultStudy(network, new MachineDecrement()).At("F");
        one.Should().Throw<SingularNetworkException>().WithMessage("*at bus \"F\"*negative reactances*");
        new FaultStudy(network, new MachineDecrement()).At("S").ImpedanceOhm!.Value.Should().BeCloseTo(new Complex(0, 1));
    }

    [Fact]
    public void Equal_and_opposite_branches_between_two_buses_leave_the_far_one_without_a_solution()
    {
        var network = Source(20).With(
            new Line { Id = "plus", From = "S", To = "F", Ohm = new Impedance(0, 1) },
            new Line { Id = "minus", From = "S", To = "F", Ohm = new Impedance(0, -1) });
        var solve = () => new FaultStudy(network, new MachineDecrement()).EveryBus();
        solve.Should().Throw<SingularNetworkException>().Which.BusIds.Should().Equal("F");
    }

    private static ThreeWindingTransformer ThreeWindings() => new()
    {
        Id = "T", Hv = "S", Mv = "F", Lv = "F", RatedMva = new WindingValues(40, 40, 10), RatedKv = new WindingValues(20, 20, 20),
        ShortCircuitVoltagePercent = new WindingPairValues(10, 15, 6), ResistivePercent = new WindingPairValues(0, 0, 0),
    };

    private static Network Source(double farKv) => new NetworkBuilder { FrequencyHz = 50 }.Add(
        new Bus { Id = "S", NominalKv = 20 },
        new Bus { Id = "F", NominalKv = farKv },
        new NetworkFeeder { Id = "Q", Bus = "S", ShortCircuitMva = new MaxMin(400), XOverR = 10 }).Build();

    private static Complex At(string bus, NetworkElement element) => Impedance(Source(20).With(element), bus);

    private static Complex Impedance(Network network, string bus) => new FaultStudy(network, new MachineDecrement()).At(bus).ImpedanceOhm!.Value;
}
