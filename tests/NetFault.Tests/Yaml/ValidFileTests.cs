using System.Text;

namespace NetFault.Tests.Yaml;

public class ValidFileTests
{
    public static IEnumerable<object[]> Files => TestFiles.Names("valid");

    [Theory]
    [MemberData(nameof(Files))]
    public void A_good_file_reads_without_an_error(string name) => Read(name).Buses.Should().NotBeEmpty();

    [Theory]
    [MemberData(nameof(Files))]
    public void What_was_read_is_written_and_read_back_the_same(string name)
    {
        var network = Read(name);
        var text = NetworkFile.ToText(network);
        SameNetworks.Compare(NetworkFile.Parse(text), network);
        NetworkFile.ToText(NetworkFile.Parse(text)).Should().Be(text);
    }

    [Fact]
    public void Every_key_of_every_section_is_read()
    {
        var network = Read("every-key.yaml");
        var t1 = network.Transformers[0];
        network.Title.Should().Be("Every key, once");
        network.FrequencyHz.Should().Be(60);
        network.BaseMva.Should().Be(50);
        network.Buses[0].Note.Should().Be("the utility's yard");
        network.Buses[3].InService.Should().BeFalse();
        network.Buses[5].LowVoltageTolerancePercent.Should().Be(10);
        network.NetworkFeeders[0].ShortCircuitMva.Should().Be(new MaxMin(3500, 1800.5));
        network.NetworkFeeders[1].ShortCircuitKa.Should().Be(new MaxMin(9.25));
        network.NetworkFeeders[2].ROverX.Should().Be(0);
        network.SynchronousMachines[0].Should().Be(new SynchronousMachine
        {
            Id = "G1", Bus = "MV-A", RatedMva = 12.5, RatedKv = 11, RatedPowerFactor = 0.8, ReactancePu = new(0.14, 0.22, 1.9, 0.15),
            TimeConstantSeconds = new(0.03, 0.9, 0.12), ArmatureResistancePu = 0.004, VoltageRegulationPercent = 5, SteadyStateFactor = new(1.8, 0.5), UnitTransformer = "T1", Note = "two\nlines\n",
        });
        network.SynchronousMachines[1].Service.Should().Be(SynchronousService.Motor);
        network.SynchronousMachines[1].ArmatureResistanceOhm.Should().Be(0.1);
        network.SynchronousMachines[2].Service.Should().Be(SynchronousService.Condenser);
        network.AsynchronousMotors[0].Should().Be(new AsynchronousMotor
        {
            Id = "M1", Bus = "MV-B", RatedKw = 1800, RatedKv = 11, RatedPowerFactor = 0.88, Efficiency = 0.96, LockedRotorCurrentRatio = 5.5,
            PolePairs = 2, Count = 3, XOverR = 10, RatedSlipPercent = 1.2, Note = "pumps",
        });
        network.AsynchronousMotors[1].ROverX.Should().Be(0.42);
        t1.Should().Be(new Transformer
        {
            Id = "T1", Hv = "GRID", Lv = "MV-A", RatedMva = 25, RatedHvKv = 110, RatedLvKv = 11, ShortCircuitVoltagePercent = 10, LoadLossKw = 120,
            VectorGroup = "Dyn11", OnLoadTapChanger = true, OffLoadTapRangePercent = 5, Note = "T1",
        });
        network.Transformers[1].ResistivePercent.Should().Be(1.1);
        network.Transformers[2].XOverR.Should().Be(25);
        network.Transformers[2].OnLoadTapChanger.Should().BeFalse();
    }

    [Fact]
    public void Every_key_of_the_branches_is_read()
    {
        var network = Read("every-key.yaml");
        network.ThreeWindingTransformers[0].Should().Be(new ThreeWindingTransformer
        {
            Id = "T9", Hv = "GRID", Mv = "MV-B", Lv = "TERTIARY", RatedMva = new(35, 35, 10), RatedKv = new(110, 11, 30),
            ShortCircuitVoltagePercent = new(12, 8, 6), ResistivePercent = new(0.3, 0.2, 0.2), VectorGroup = "YNyn0d5", OnLoadTapChanger = true,
            Note = "tertiary for the station's own use",
        });
        network.ThreeWindingTransformers[1].Lv.Should().BeNull();
        network.ThreeWindingTransformers[1].RatedMva.Should().Be(new WindingValues(35, 35, null));
        network.Lines[0].Should().Be(new Line
        {
            Id = "C1", From = "MV-A", To = "MV-B", LengthKm = 0.8, OhmPerKm = new(0.098, 0.095), Parallel = 2, EndTemperatureC = 160, Note = "cable",
        });
        network.Lines[1].Ohm.Should().Be(new Impedance(0.1, 0.2));
        network.Lines[2].PerUnit.Should().Be(new Impedance(0.001, -0.02));
        network.SeriesReactors[0].Should().Be(new SeriesReactor
        {
            Id = "R1", From = "MV-A", To = "MV-B", RatedKa = 1.6, RatedKv = 11, ReactancePercent = 6, XOverR = 80, InService = false, Note = "spare",
        });
        network.SeriesReactors[1].Ohm.Should().Be(new Impedance(0.001, 0.12));
        network.BusCouplers.Select(one => one.Closed).Should().Equal(false, true);
    }

    [Fact]
    public void Every_key_of_the_converters_and_capacitors_is_read()
    {
        var network = Read("every-key.yaml");
        network.ConverterFedDrives.Should().Equal(new ConverterFedDrive { Id = "D1", Bus = "MV-A", RatedMva = 4, RatedKv = 11, Note = "rolling mill" });
        network.FullConverterSources.Should().Equal(
            new FullConverterSource { Id = "PV1", Bus = "MV-A", SourceCurrentKa = 0.12, SteadyStateKa = new(0.12, 0.1), Note = "roof" });
        network.DoublyFedGenerators.Should().Equal(new DoublyFedGenerator
        {
            Id = "WP1", Bus = "MV-A", HighestInstantaneousKa = 0.5, RatedKv = 11, PeakFactor = 1.8, ROverX = 0.1, SteadyStateKa = new(0.15), Note = "hill",
        });
        network.SeriesCapacitors.Should().Equal(
            new SeriesCapacitor { Id = "SC1", From = "MV-A", To = "MV-B", ReactanceOhm = 12, VoltageLimited = false, Note = "north line" });
    }

    [Fact]
    public void Every_key_of_the_circuit_breakers_is_read()
    {
        var breakers = Read("every-key.yaml").CircuitBreakers;
        breakers.Should().Equal(
            new CircuitBreaker
            {
                Id = "CB1", Bus = "GRID", Feeds = "T1", FeedsSection = "transformers", Standard = CircuitBreakerStandard.Iec62271_100, RatedKv = 123,
                ShortCircuitBreakingCurrentKa = 31.5, DcComponentPercent = 36, ShortCircuitMakingCurrentKa = 80, PeakWithstandCurrentKa = 81,
                ShortTimeWithstandCurrentKa = 31, ShortTimeDurationSeconds = 3, MinimumOpeningTimeSeconds = 0.035, RelayTimeSeconds = 0.01, Note = "bay 1",
            },
            new CircuitBreaker
            {
                Id = "CB2", Bus = "MV-A", Feeds = "T1", Standard = CircuitBreakerStandard.IeeeC37_04, RatedKv = 15, ShortCircuitBreakingCurrentKa = 25,
                DcTimeConstantSeconds = 0.045, ClosingAndLatchingCurrentKa = 65, RatedInterruptingTimeCycles = 5, ContactPartingTimeCycles = 3,
            },
            new CircuitBreaker
            {
                Id = "CB3", Bus = "MV-A", Feeds = "G1", Standard = CircuitBreakerStandard.IecIeee62271_37_013, RatedKv = 12, ShortCircuitBreakingCurrentKa = 50,
                DcComponentPercent = 60, GeneratorSourceBreakingCurrentKa = 25, GeneratorSourceDcComponentPercent = 110,
            },
            new CircuitBreaker
            {
                Id = "CB4", Bus = "LV", Feeds = "T2", Standard = CircuitBreakerStandard.Iec60947_2, RatedKv = 0.69, UltimateShortCircuitBreakingCapacityKa = 50,
                ServiceShortCircuitBreakingCapacityKa = 37.5, ShortCircuitMakingCapacityKa = 105, TestPowerFactor = 0.25,
            },
            new CircuitBreaker
            {
                Id = "CB5", Bus = "LV", Feeds = "M2", Standard = CircuitBreakerStandard.IeeeC37_13, RatedKv = 0.508, ShortCircuitBreakingCurrentKa = 42,
                InService = false,
            });
    }

    [Fact]
    public void Every_key_of_switches_busbars_and_fuses_is_read()
    {
        var network = Read("every-key.yaml");
        network.Switches.Should().Equal(new Switch
        {
            Id = "Q1", Bus = "MV-A", Feeds = "C1", FeedsSection = "lines", RatedKv = 12, ShortCircuitMakingCurrentKa = 50, PeakWithstandCurrentKa = 63,
            ShortTimeWithstandCurrentKa = 25, ShortTimeDurationSeconds = 1, Note = "load break switch",
        });
        network.Busbars.Should().Equal(new Busbar
        {
            Id = "BB1", Bus = "MV-A", RatedKv = 12, PeakWithstandCurrentKa = 63, ShortTimeWithstandCurrentKa = 25, ShortTimeDurationSeconds = 1,
            Note = "double bar",
        });
        network.Fuses.Should().Equal(
            new Fuse
            {
                Id = "F1", Bus = "MV-B", Feeds = "T2", FeedsSection = "transformers", RatedKv = 12, BreakingCapacityKa = 63, TestPowerFactor = 0.1, Note = "160 A",
            },
            new Fuse { Id = "F2", Bus = "MV-B", Feeds = "C1", RatedKv = 15.5, BreakingCapacityKa = 50, TestXOverR = 25 });
    }

    [Fact]
    public void The_file_of_every_key_holds_every_key()
    {
        var text = File.ReadAllText(Path.Combine(TestFiles.Folder("valid"), "every-key.yaml"));
        var missing = AllSections.InOrder.SelectMany(
            section => section.Keys.Names.Where(key => !System.Text.RegularExpressions.Regex.IsMatch(Part(text, section.Name), $@"\b{key}: ")).Select(key => section.Name + "." + key));
        missing.Should().BeEmpty();
    }

    [Fact]
    public void The_IEC_test_network_is_read_as_the_standard_has_it()
    {
        var network = Read("iec-tr-60909-4-test-network.yaml");
        network.Warnings.Should().BeEmpty();
        network.Elements.Should().HaveCount(29);
        network.NetworkFeeders.Select(one => one.ShortCircuitKa!.Value.Max).Should().Equal(38, 16);
        network.ThreeWindingTransformers[1].Lv.Should().BeNull();
        network.AsynchronousMotors[1].Count.Should().Be(2);
    }

    [Theory]
    [InlineData("\n")]
    [InlineData("\r\n")]
    [InlineData("\r")]
    public void Any_line_end_and_a_byte_order_mark_are_fine(string lineEnd)
    {
        var text = File.ReadAllText(Path.Combine(TestFiles.Folder("valid"), "iec-tr-60909-4-test-network.yaml")).Replace("\n", lineEnd);
        using var stream = new MemoryStream(new UTF8Encoding(true).GetPreamble().Concat(Encoding.UTF8.GetBytes(text)).ToArray());
        SameNetworks.Compare(NetworkFile.Read(stream), Read("iec-tr-60909-4-test-network.yaml"));
        NetworkFile.Parse("\uFEFF" + text).Elements.Should().HaveCount(29);
    }

    [Fact]
    public void A_network_is_written_to_a_file_without_a_byte_order_mark_and_read_from_it()
    {
        var path = Path.GetTempFileName();
        try
        {
            var network = Read("every-key.yaml");
            NetworkFile.Write(network, path);
            File.ReadAllBytes(path)[0].Should().Be((byte)'n');
            SameNetworks.Compare(NetworkFile.Read(path), network);
        }
        finally
        {
            File.Delete(path);
        }
    }

    [Fact]
    public void Warnings_of_a_file_have_their_places()
    {
        var network = NetworkFile.Parse(
            "netfault: 1\nfrequency_hz: 50\nbuses:\n  A: {nominal_kv: 11}\n  B: {nominal_kv: 11}\nnetwork_feeders:\n  Q: {bus: A, short_circuit_ka: 5, x_over_r: 10}\n", "p.yaml");
        network.Warnings.Should().ContainSingle().Which.Location.Should().Be(new SourceLocation("p.yaml", 5, 3, 1, "  B: {nominal_kv: 11}"));
    }

    private static Network Read(string name) => NetworkFile.Read(Path.Combine(TestFiles.Folder("valid"), name));

    private static string Part(string text, string section)
    {
        var start = text.IndexOf("\n" + section + ":", StringComparison.Ordinal);
        var end = text.IndexOf("\n\n", start + 1, StringComparison.Ordinal);
        return text.Substring(start, (end < 0 ? text.Length : end) - start);
    }
}
