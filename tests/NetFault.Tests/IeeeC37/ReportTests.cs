using System.Globalization;

namespace NetFault.Tests.ByIeeeC37;

/// <summary>Oracle: the results themselves.</summary>
public class ReportTests
{
    [Fact]
    public void The_reports_name_the_method_its_rules_and_its_columns()
    {
        var study = new FaultStudy(Support.Plants.TwoFeedersAndALine(), new IeeeC37 { CurrentRule = IeeeCurrentRule.EOverX });
        var faults = study.EveryBus();
        var options = new ReportOptions { InstantsSeconds = [0.06], CsvComments = false };
        var table = FaultReport.ToTable(study, faults, options);
        table.Should().Contain("IEEE C37.010, E/X").And.Contain("no AC decrement credited").And.Contain("I_int")
            .And.Contain("duty(0.06 s)");
        using var writer = new StringWriter();
        FaultReport.WriteCsv(writer, study, faults, options);
        var rows = writer.ToString().Split(["\r\n"], StringSplitOptions.RemoveEmptyEntries).Select(row => row.Split(',')).ToArray();
        var row = rows[0].Zip(rows[1], (name, value) => (name, value)).ToDictionary(pair => pair.name, pair => pair.value);
        // 0.06 s at 50 Hz are 3 cycles.
        row["interrupting_duty_ka_at_0.06_s"].Should().Be(Text(faults[0].IeeeC37!.InterruptingDutyKa(0.06 * 50)));
        row["interrupting_symmetrical_ka"].Should().Be(Text(faults[0].IeeeC37!.InterruptingSymmetricalKa));
        row["thirty_cycle_symmetrical_ka"].Should().Be(Text(faults[0].IeeeC37!.ThirtyCycleSymmetricalKa));
        row["symmetrical_rms_ka_at_0.06_s"].Should().Be(Text(faults[0].SymmetricalRmsKa(0.06)));
        row["ac_component_rule"].Should().Be("network_of_time");
        row.Should().NotContainKeys("transient_ka", "steady_state_ka");
    }

    private static string Text(double number) => number.ToString("R", CultureInfo.InvariantCulture);
}
