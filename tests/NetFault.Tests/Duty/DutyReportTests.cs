using System.Globalization;
using System.Text;
using System.Text.Json;
using NetFault.Tests.Examples;

namespace NetFault.Tests.Duty;

/// <summary>Oracles: the check itself, System.Text.Json; and what the plant's comments say of its scenario.</summary>
public class DutyReportTests
{
    private static readonly DutyCheck Plant = Check(new MachineDecrement());

    [Fact]
    public void The_plant_has_devices_that_fail_and_one_that_is_marginal()
    {
        Plant.Devices[0].Verdict.Should().Be(DutyVerdict.Fail);
        Plant.Devices.Where(one => one.Verdict == DutyVerdict.Fail).Should().OnlyContain(one => one.BusId == "MV-A" && one.WorstDuty.Kind == DutyKind.BreakingDcComponent);
        Plant.Devices.Where(one => one.IsMarginal).Select(one => one.Id).Should().Equal("CB-EFFL-LV");
        Plant.Device("switches", "Q-STANDBY").Verdict.Should().Be(DutyVerdict.NoCurrent);
    }

    [Fact]
    public void Every_device_of_the_plant_is_in_the_check_once_by_each_method()
    {
        foreach (var check in new[] { Plant, Check(new Iec60909()), Check(new IeeeC37()) })
        {
            check.Devices.Select(one => (one.Section, one.Id)).Should().BeEquivalentTo(
                check.Study.Network.Elements.OfType<RatedDevice>().Select(one => (one.Section, one.Id)));
            check.Devices.Select(one => DeviceDuty.Rank(one.WorstDuty)).Should().BeInAscendingOrder();
            check.Devices.Where(one => one.Verdict == DutyVerdict.Fail).Select(one => one.MarginPercent).Should().BeInAscendingOrder();
        }
    }

    [Fact]
    public void The_tables_first_row_is_the_worst_device_and_the_caution_is_the_last_line()
    {
        var lines = DutyReport.ToTable(Plant).Split('\n');
        lines[Array.FindIndex(lines, line => line.StartsWith("---", StringComparison.Ordinal)) + 1].Should().StartWith(Plant.Devices[0].Id).And.Contain("FAIL");
        lines.Last(line => line.Length > 0).Should().Contain("not for live switching decisions");
        lines.Should().ContainSingle(line => line.Contains(" fail, ")).Which.Should().StartWith("3 fail, 0 cannot say, ");
        lines.Should().Contain(line => line.Contains("45 ms assumed")).And.Contain(line => line.Contains("TIE-20 closed"));
        lines.Should().Contain(line => line.StartsWith("Method: Machine decrement"));
    }

    [Fact]
    public void The_CSV_has_a_row_for_each_duty_with_the_very_same_numbers()
    {
        using var writer = new StringWriter();
        DutyReport.WriteCsv(writer, Plant, new ReportOptions { CsvComments = false });
        var rows = writer.ToString().Split(["\r\n"], StringSplitOptions.RemoveEmptyEntries);
        var duties = Plant.Devices.SelectMany(device => device.Duties, (device, duty) => (device, duty)).ToList();
        rows.Should().HaveCount(duties.Count + 1);
        rows[0].Should().StartWith("section,device_id,bus_id,feeds,standard,device_verdict,duty,verdict,is_marginal,required,rated,unit,margin_percent");
        var cells = rows[1].Split(',');
        cells[1].Should().Be(duties[0].device.Id);
        cells[7].Should().Be(duties[0].duty.Verdict == DutyVerdict.Fail ? "fail" : "pass");
        double.Parse(cells[9], CultureInfo.InvariantCulture).Should().Be(duties[0].duty.Required);
        double.Parse(cells[12], CultureInfo.InvariantCulture).Should().Be(duties[0].duty.MarginPercent);
    }

    [Fact]
    public void The_CSV_says_method_assumptions_and_caution()
    {
        using var writer = new StringWriter();
        DutyReport.WriteCsv(writer, Plant);
        var comments = writer.ToString().Split(["\r\n"], StringSplitOptions.None).TakeWhile(line => line.StartsWith("#", StringComparison.Ordinal)).ToList();
        comments.Should().Contain(line => line.Contains("licensed practice")).And.Contain(line => line.Contains("dc_time_constant_s"))
            .And.Contain(line => line.Contains("Margin: rated over required"));
    }

    [Fact]
    public void The_JSON_holds_every_device_with_its_duties()
    {
        using var stream = new MemoryStream();
        DutyReport.WriteJson(stream, Plant);
        using var json = JsonDocument.Parse(Encoding.UTF8.GetString(stream.ToArray()));
        json.RootElement.GetProperty("caution").GetString().Should().Contain("licensed practice");
        json.RootElement.GetProperty("failing").GetInt32().Should().Be(3);
        var devices = json.RootElement.GetProperty("devices").EnumerateArray().ToList();
        devices.Should().HaveCount(Plant.Devices.Count);
        devices[0].GetProperty("margin_percent").GetDouble().Should().Be(Plant.Devices[0].MarginPercent);
        var duty = devices[0].GetProperty("duties").EnumerateArray().First(one => one.GetProperty("verdict").GetString() == "fail");
        duty.GetProperty("fault_side").GetString().Should().Be("beyond_device");
        duty.GetProperty("formula").GetString().Should().Contain("i_dc");
    }

    [Fact]
    public void A_network_without_devices_says_so()
    {
        var check = DutyCheck.Of(new FaultStudy(DutyNetworks.Radial(10), new MachineDecrement()));
        DutyReport.ToTable(check).Should().Contain("no devices with ratings").And.Contain("0 fail");
        check.HasFailure.Should().BeFalse();
    }

    [Fact]
    public void A_reactor_at_T1_brings_the_plants_worst_breaker_within_its_rating_or_says_why_not()
    {
        var proposal = Plant.SmallestReactor(Plant.Devices[0], "T-G1");
        proposal.IsFound.Should().BeTrue(proposal.ToString());
        proposal.After!.CircuitBreaker(Plant.Devices[0].Id).Verdict.Should().Be(DutyVerdict.Pass);
        proposal.ByFullSolution!.Required.Should().BeApproximately(proposal.ByFullSolution.Rated!.Value, 1e-8);
    }

    private static DutyCheck Check(FaultMethod method) =>
        DutyCheck.Of(new FaultStudy(NetworkFile.Read(Repository.PathOf("examples/industrial-plant.yaml")), method));
}
