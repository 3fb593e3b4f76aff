using System.Text;
using System.Text.Json;
using static NetFault.Tests.Review.ReviewNetworks;

namespace NetFault.Tests.Review;

/// <summary>What results and reports say about themselves.</summary>
public sealed class ResultReviewTests
{
    /// <summary>Ra = 0 at the only source: nothing damps the DC component (√2·I″k at all times), and the rule has to say so.</summary>
    [Fact]
    public void A_dc_component_that_does_not_decay_is_called_undamped_by_IEC_60909()
    {
        var fault = new FaultStudy(Build(Bus("A", 10), Generator("G", "A", 10, armatureResistancePu: 0.0)), new Iec60909()).At("A");
        fault.DcComponentKa(5.0).Should().BeApproximately(Math.Sqrt(2.0) * fault.InitialSymmetricalKa, 1e-9);
        fault.DcDecayRule.Should().Be(DcDecayRule.Undamped);
    }

    /// <summary>
    /// A feeder of 1 Mohm behind a line of 1 microhm: I = Un/√3/Z. A result may be refused, or say that digits are lost; it must not be 1e-5 off with
    /// a residual of 0 (design section 7: 1e-9; style: "the solver tells its own health: residual and condition").
    /// </summary>
    [Theory]
    [InlineData(1e-6, 1e3)]
    [InlineData(1e-6, 1e6)]
    public void Digits_that_a_tiny_impedance_beside_a_large_one_costs_are_not_lost_in_silence(double lineOhm, double feederOhm)
    {
        var study = new FaultStudy(
            Build(Bus("A", 10), Bus("B", 10), Feeder("A", 100.0 / feederOhm, 0.0), Line("L", "A", "B", 0.0, lineOhm)), new MachineDecrement());
        var exact = 10.0 / Math.Sqrt(3.0) / (feederOhm + lineOhm);
        var fault = study.At("B");
        (Math.Abs(fault.InitialSymmetricalKa / exact - 1.0) < 1e-9 || fault.SolutionResidual > 1e-9).Should().BeTrue(
            $"the current is {fault.InitialSymmetricalKa / exact - 1.0:0.0e0} off and the residual says {fault.SolutionResidual:0.0e0}");
    }

    /// <summary>RFC 8259, section 4: the names within an object should be unique.</summary>
    [Fact]
    public void Json_has_each_name_once_when_an_instant_is_asked_for_twice()
    {
        var study = new FaultStudy(Build(Bus("A", 10), Feeder("A", 100)), new MachineDecrement());
        using var stream = new MemoryStream();
        FaultReport.WriteJson(stream, study, study.EveryBus(), new ReportOptions { InstantsSeconds = [0.05, 0.05] });
        using var document = JsonDocument.Parse(Encoding.UTF8.GetString(stream.ToArray()));
        document.RootElement.GetProperty("buses")[0].EnumerateObject().Select(one => one.Name).Should().OnlyHaveUniqueItems();
    }

    [Fact]
    public void A_report_that_cannot_be_finished_leaves_nothing_half_written()
    {
        var motor = new AsynchronousMotor
        {
            Id = "M", Bus = "A", RatedKw = 2500, RatedPowerFactor = 0.88, Efficiency = 0.95, LockedRotorCurrentRatio = 6,
        };
        var study = new FaultStudy(Build(Bus("A", 10), Feeder("A", 100), motor), new Iec60909());
        var writer = new StringWriter();
        FluentActions.Invoking(() => FaultReport.WriteCsv(writer, study, study.EveryBus())).Should().Throw<MethodDataException>();
        writer.ToString().Should().BeEmpty();
    }

    [Fact]
    public void A_report_is_not_headed_by_another_method_than_that_of_its_numbers()
    {
        var network = Build(Bus("A", 10), Feeder("A", 100), Generator("G", "A", 10));
        var faults = new FaultStudy(network, new MachineDecrement()).EveryBus();
        FluentActions.Invoking(() => FaultReport.ToTable(new FaultStudy(network, new Iec60909()), faults)).Should().Throw<ArgumentException>();
    }

    [Fact]
    public void A_missing_id_or_bus_is_named_by_element_and_key()
    {
        FluentActions.Invoking(() => Build(new Bus { Id = null!, NominalKv = 10 })).Should().Throw<InvalidNetworkException>();
        FluentActions.Invoking(() => Build(Bus("A", 10), Feeder("A", 100) with { Bus = null! })).Should().Throw<InvalidNetworkException>();
    }

    [Fact]
    public void A_case_that_is_neither_maximum_nor_minimum_is_refused() =>
        FluentActions.Invoking(() => new Iec60909 { Case = (ShortCircuitCase)7 }).Should().Throw<ArgumentOutOfRangeException>();

    [Fact]
    public void An_id_of_characters_that_cannot_be_seen_is_refused() =>
        FluentActions.Invoking(() => Build(Bus("A", 10), Bus("A\u200B", 10), Feeder("A", 100))).Should().Throw<InvalidNetworkException>();

    /// <summary>A motor that is left out is out of the peak and the DC component too: as with the motor out of service.</summary>
    [Fact]
    public void A_small_motor_that_is_left_out_does_not_damp_the_peak()
    {
        var motor = new AsynchronousMotor
        {
            Id = "M", Bus = "A", RatedKw = 150, RatedPowerFactor = 0.88, Efficiency = 0.95, LockedRotorCurrentRatio = 12, PolePairs = 2,
        };
        var network = Build(Bus("A", 0.4), Feeder("A", 20, 0.05), motor);
        var leftOut = new FaultStudy(network, new Iec60909 { LeaveOutSmallMotors = true }).At("A");
        var absent = new FaultStudy(network.With(motor with { InService = false }), new Iec60909()).At("A");
        leftOut.Iec60909!.MotorsLeftOut.Should().BeTrue();
        leftOut.PeakKa.Should().BeApproximately(absent.PeakKa, 1e-9);
        leftOut.DcComponentKa(0.05).Should().BeApproximately(absent.DcComponentKa(0.05), 1e-9);
    }

    /// <summary>IEC 60909-0, 8.1.2 (b): the margin is left out only while R/X stays below 0.3 in all branches; x = 0 makes it infinite.</summary>
    [Fact]
    public void A_branch_without_reactance_keeps_the_margin_of_method_b()
    {
        var network = Build(
            Bus("A", 10), Bus("B", 10), Bus("C", 10), Feeder("A", 100, 0.05), Line("R", "A", "B", 0.2, 0.0), Line("X", "B", "C", 0.0, 5.0));
        var result = new FaultStudy(network, new Iec60909 { XOverRRule = XOverRRule.ComplexImpedance }).At("C");
        var kappa = 1.02 + 0.98 * Math.Exp(-3.0 / result.XOverR!.Value);
        result.Iec60909!.Kappa.Should().BeApproximately(Math.Min(2.0, 1.15 * kappa), 1e-9);
    }

    /// <summary>NISTIR 5935: no line of the format is longer than 1024 characters.</summary>
    [Fact]
    public void A_matrix_file_has_no_line_beyond_1024_characters()
    {
        var elements = new List<NetworkElement> { Bus("0", 10), Feeder("0", 100) };
        for (var i = 1; i < 400; i++)
            elements.AddRange([Bus($"{i}", 10), Coupler($"{i}", $"{i - 1}", $"{i}")]);
        var study = new FaultStudy(Build([.. elements]), new MachineDecrement());
        var writer = new StringWriter();
        MatrixMarket.Write(writer, study.AdmittanceMatrix(), study.Nodes);
        writer.ToString().Split('\n').Max(line => line.Length).Should().BeLessThanOrEqualTo(1024);
    }
}
