using System.Globalization;
using System.Text;
using System.Text.Json;
using NetFault.Tests.Support;

namespace NetFault.Tests.Output;

/// <summary>Oracles: RFC 4180 read by a reader of its own, System.Text.Json, and the results themselves.</summary>
public class FaultReportTests
{
    private static readonly Network Plant = Plants.TwoFeedersAndALine().With(
        new Bus { Id = "dead, \"quoted\"", NominalKv = 20 },
        new SynchronousMachine { Id = "G", Bus = "B", RatedMva = 30, ReactancePu = new MachineReactances(0.15, 0.25) });

    private readonly FaultStudy _study = new(Plant, new MachineDecrement());

    [Fact]
    public void The_table_has_a_row_a_bus_the_assumptions_and_the_caution()
    {
        var table = FaultReport.ToTable(_study, _study.EveryBus());
        var lines = table.Split('\n');
        lines.Should().ContainSingle(line => line.StartsWith("A "));
        lines.Should().ContainSingle(line => line.StartsWith("dead, \"quoted\" ")).Which.Should().EndWith("d");
        table.Should().Contain("I″k").And.Contain("i_dc(0.05 s)").And.Contain("xd is not given; x′d is kept");
        table.Should().Contain("not for live switching decisions").And.Contain("AC component decaying with all machines");
        var bus = _study.At("A");
        lines.Single(line => line.StartsWith("A ")).Should().Contain(bus.PeakKa.ToString("0.000", CultureInfo.InvariantCulture));
    }

    [Fact]
    public void The_CSV_reads_back_to_the_very_same_numbers()
    {
        var text = Csv(new ReportOptions { InstantsSeconds = [0.03], CsvComments = false });
        var rows = ReadCsv(text);
        var faults = _study.EveryBus();
        rows.Should().HaveCount(faults.Count + 1);
        for (var i = 0; i < faults.Count; i++)
        {
            var row = rows[0].Zip(rows[i + 1]).ToDictionary(pair => pair.First, pair => pair.Second);
            row["bus_id"].Should().Be(faults[i].BusId);
            Number(row["initial_symmetrical_ka"]).Should().Be(faults[i].InitialSymmetricalKa);
            Number(row["peak_ka"]).Should().Be(faults[i].PeakKa);
            Number(row["dc_component_ka_at_0.03_s"]).Should().Be(faults[i].DcComponentKa(0.03));
            Number(row["asymmetrical_rms_ka_at_0.03_s"]).Should().Be(faults[i].AsymmetricalRmsKa(0.03));
            row["x_over_r"].Should().Be(faults[i].XOverR is { } ratio ? ratio.ToString("R", CultureInfo.InvariantCulture) : "");
            row["energised"].Should().Be(faults[i].IsEnergised ? "true" : "false");
            row["assumed_values"].Should().Be(faults[i].Assumptions.Count.ToString(CultureInfo.InvariantCulture));
        }
    }

    [Fact]
    public void The_CSV_begins_with_comments_that_name_method_assumptions_and_caution()
    {
        var comments = Csv(new ReportOptions()).Split("\r\n").TakeWhile(line => line.StartsWith('#')).ToList();
        comments.Should().Contain(line => line.Contains("Machine decrement"));
        comments.Should().Contain(line => line.Contains("synchronous_machines G"));
        comments.Should().Contain(line => line.Contains("licensed practice"));
    }

    [Fact]
    public void The_JSON_holds_every_bus_with_units_in_the_names_and_what_it_rests_on()
    {
        using var stream = new MemoryStream();
        FaultReport.WriteJson(stream, _study, _study.EveryBus());
        using var json = JsonDocument.Parse(Encoding.UTF8.GetString(stream.ToArray()));
        var root = json.RootElement;
        root.GetProperty("frequency_hz").GetDouble().Should().Be(50);
        root.GetProperty("caution").GetString().Should().Contain("licensed practice");
        root.GetProperty("assumptions").EnumerateArray().Should().Contain(one => one.GetProperty("key").GetString() == "reactance_pu.synchronous");
        root.GetProperty("warnings").EnumerateArray().Should().Contain(one => one.GetProperty("id").GetString() == "NF405");
        var buses = root.GetProperty("buses").EnumerateArray().ToList();
        buses.Should().HaveCount(3);
        buses[0].GetProperty("initial_symmetrical_ka").GetDouble().Should().Be(_study.EveryBus()[0].InitialSymmetricalKa);
        buses[2].GetProperty("x_over_r").ValueKind.Should().Be(JsonValueKind.Null);
        buses[2].GetProperty("x_over_r_status").GetString().Should().Be("de_energised");
    }

    [Fact]
    public void An_instant_before_the_fault_is_refused()
    {
        var make = () => new ReportOptions { InstantsSeconds = [0.05, -0.01] };
        make.Should().Throw<ArgumentOutOfRangeException>();
    }

    private string Csv(ReportOptions options)
    {
        using var writer = new StringWriter();
        FaultReport.WriteCsv(writer, _study, _study.EveryBus(), options);
        return writer.ToString();
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    /// <summary>RFC 4180: cells apart by commas, quotes doubled inside quotes, lines ended by CR LF.</summary>
    private static List<List<string>> ReadCsv(string text)
    {
        var rows = new List<List<string>> { new() { "" } };
        var quoted = false;
        for (var i = 0; i < text.Length; i++)
        {
            var row = rows[^1];
            if (text[i] == '"' && quoted && i + 1 < text.Length && text[i + 1] == '"')
                row[^1] += text[i++];
            else if (text[i] == '"')
                quoted = !quoted;
            else if (text[i] == ',' && !quoted)
                row.Add("");
            else if (text[i] == '\r' && !quoted && text[i + 1] == '\n')
                rows.Add(text.Length > ++i + 1 ? [""] : []);
            else
                row[^1] += text[i];
        }
        return rows.Where(row => row.Count > 0).ToList();
    }
}
