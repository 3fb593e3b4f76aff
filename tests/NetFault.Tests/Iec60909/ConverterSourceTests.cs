using System.Numerics;
using static NetFault.Tests.Support.IecCases;

namespace NetFault.Tests.ByIec60909;

/// <summary>
/// Oracle: IEC 60909-0:2016, 6.8 (doubly fed generators), 6.9 and 7.2.1 (full-size converters:
/// I″k = c·Un/(√3·Zk) + (1/Zk)·Σ Zkj·IskPFj), and series capacitors, evaluated by hand.
/// </summary>
public class ConverterSourceTests
{
    private static readonly Complex Strong = Polar(1.1 * 10 / (Sqrt3 * 12), 0.1);
    private static readonly Complex Cable = new(0.3, 0.4);

    private static FullConverterSource Park => new() { Id = "P", Bus = "B", SourceCurrentKa = 0.7 };

    [Fact]
    public void A_full_converter_adds_its_share_of_the_source_current_without_direct_current()
    {
        var network = Of(Bus("A", 10), Bus("B", 10), Feeder("A", 12), Line("A", "B", 0.3, 0.4), Park);
        var low = new Complex(Strong.Real + 0.3, 0.4 * (Strong.Imaginary + 0.4));
        var kappa = 1.02 + 0.98 * Math.Exp(-3 * 0.4 * low.Real / low.Imaginary);
        foreach (var fault in new[] { network.At("B"), network.AmongAll("B") })
        {
            var own = Ka(1.1, 10, Strong + Cable);
            fault.InitialSymmetricalKa.ShouldBe(own + 0.7);
            fault.Iec60909!.ConverterPartKa.ShouldBe(0.7);
            fault.PeakKa.ShouldBe(Sqrt2 * (kappa * own + 0.7));
            fault.DcComponentKa(0).ShouldBe(Sqrt2 * own);
            fault.Iec60909.BreakingKa(0.1).ShouldBe(own + 0.7);
        }
        network.At("A").InitialSymmetricalKa.ShouldBe(12 + 0.7);
    }

    /// <summary>Zkj at a bus on a way of its own is that of the common part of both ways.</summary>
    [Fact]
    public void At_a_bus_on_another_way_the_share_is_Zkj_over_Zk()
    {
        var network = Of(Bus("A", 10), Bus("B", 10), Bus("C", 10), Feeder("A", 12), Line("A", "B", 0.3, 0.4), Line("A", "C", 0.1, 0.2),
            Park);
        var zk = Strong + new Complex(0.1, 0.2);
        network.At("C").Iec60909!.ConverterPartKa.ShouldBe(Strong.Magnitude / zk.Magnitude * 0.7);
    }

    [Fact]
    public void Behind_a_transformer_the_source_current_is_brought_to_the_faults_voltage()
    {
        var network = Of(Bus("A", 10), Bus("B", 0.4), Feeder("A", 12), Park with { SourceCurrentKa = 2.5 }, new Transformer
        {
            Id = "T", Hv = "A", Lv = "B", RatedMva = 2, RatedHvKv = 10.5, RatedLvKv = 0.42, ShortCircuitVoltagePercent = 6,
            ResistivePercent = 1,
        });
        network.At("A").Iec60909!.ConverterPartKa.ShouldBe(2.5 * 0.42 / 10.5);
        network.At("B").Iec60909!.ConverterPartKa.ShouldBe(2.5);
    }

    /// <summary>11.2: the steady-state current is that of the manufacturer, IkPFmax, in the maximum case.</summary>
    [Fact]
    public void A_full_converters_steady_state_current_is_its_own()
    {
        var network = Of(Bus("A", 10), Bus("B", 10), Feeder("A", 12), Line("A", "B", 0.3, 0.4),
            Park with { SteadyStateKa = new MaxMin(0.6, 0.2) });
        network.At("B").SteadyStateKa!.Value.ShouldBe(Ka(1.1, 10, Strong + Cable) + 0.6);
        network.At("B").InitialSymmetricalKa.ShouldBe(Ka(1.1, 10, Strong + Cable) + 0.7);
    }

    /// <summary>
    /// 7.1.2: in the minimum case the contributions of wind and photovoltaic power stations shall be neglected (from memory).
    /// </summary>
    [Fact]
    public void Wind_and_photovoltaic_stations_are_neglected_in_the_minimum_initial_current()
    {
        var generator = new DoublyFedGenerator { Id = "W", Bus = "A", HighestInstantaneousKa = 1.2, RatedKv = 10 };
        var network = Of(Bus("A", 10), Bus("B", 10), Feeder("A", 12, minKa: 8), Park, generator, Line("A", "B", 0.3, 0.4));
        network.At("A", ShortCircuitCase.Minimum).InitialSymmetricalKa.ShouldBe(8);
    }

    [Theory]
    [InlineData(null, null, 1.7, 0.1)]
    [InlineData(1.8, 0.07, 1.8, 0.07)]
    public void A_doubly_fed_generator_has_the_impedance_Z_WD_by_6_8(double? peakFactor, double? ratio, double kappa, double rOverX)
    {
        var network = Of(Bus("A", 20), Feeder("A", 5), new DoublyFedGenerator
        {
            Id = "W", Bus = "A", HighestInstantaneousKa = 1.2, RatedKv = 21, PeakFactor = peakFactor, ROverX = ratio,
        });
        Complex own = Polar(Sqrt2 * kappa * 21 / (Sqrt3 * 1.2), rOverX), feeder = Polar(1.1 * 20 / (Sqrt3 * 5), 0.1);
        network.At("A").InitialSymmetricalKa.ShouldBe(Ka(1.1, 20, own * feeder / (own + feeder)));
        // Beside these the missing steady-state current is said.
        new FaultStudy(network, new Iec60909()).Assumptions.Should().HaveCount(peakFactor is null ? 3 : 1);
    }

    /// <summary>Series capacitors are left out where voltage-limiting devices act; else their reactance rises as frequency falls.</summary>
    [Fact]
    public void A_series_capacitor_scales_as_one_over_frequency_in_the_20_Hz_network()
    {
        var network = Of(
            Bus("A", 110), Bus("M", 110), Bus("B", 110), Feeder("A", 20), Line("A", "M", 2, 20),
            new SeriesCapacitor { Id = "C", From = "M", To = "B", ReactanceOhm = 3, VoltageLimited = false });
        var z = Polar(1.1 * 110 / (Sqrt3 * 20), 0.1) + new Complex(2, 20);
        var fault = network.At("B");
        fault.InitialSymmetricalKa.ShouldBe(Ka(1.1, 110, z - new Complex(0, 3)));
        var lowX = z.Imaginary * 20 / 50 - 3.0 * 50 / 20;
        fault.PeakKa.ShouldBe((1.02 + 0.98 * Math.Exp(-3 * z.Real / lowX * 0.4)) * Sqrt2 * fault.InitialSymmetricalKa);
        var limited = network.With(network.SeriesCapacitors[0] with { VoltageLimited = true });
        limited.At("B").InitialSymmetricalKa.ShouldBe(Ka(1.1, 110, z));
        limited.At("M").InitialSymmetricalKa.ShouldBe(Ka(1.1, 110, z));
    }

    /// <summary>An equivalent leg of negative reactance is no capacitor: it scales as the frequency does.</summary>
    [Fact]
    public void A_line_of_negative_reactance_scales_as_frequency()
    {
        var network = Of(Bus("A", 110), Bus("M", 110), Bus("B", 110), Feeder("A", 20), Line("A", "M", 2, 20), Line("M", "B", 0, -3));
        var z = Polar(1.1 * 110 / (Sqrt3 * 20), 0.1) + new Complex(2, 17);
        var fault = network.At("B");
        fault.PeakKa.ShouldBe((1.02 + 0.98 * Math.Exp(-3 * z.Real / z.Imaginary)) * Sqrt2 * Ka(1.1, 110, z));
    }
}
