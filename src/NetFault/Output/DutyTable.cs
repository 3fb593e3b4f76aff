using System.Globalization;
using System.Text;

namespace NetFault;

/// <summary>A duty check as a table of text, for the terminal.</summary>
internal static class DutyTable
{
    public static string Render(DutyCheck check)
    {
        var text = new StringBuilder();
        if (check.Study.Network.Title is { } title)
            text.Append(title).Append('\n');
        text.Append(FormattableString.Invariant($"Duty of {check.Devices.Count} devices in three-phase short circuits, "))
            .Append(FormattableString.Invariant($"{check.Study.Network.FrequencyHz} Hz, the worst first\n"));
        text.Append(ReportTexts.MethodLine(check.Study.Method)).Append('\n');
        text.Append(DutyTexts.OptionsLine(check.Options)).Append("\n\n");
        if (check.Devices.Count == 0)
            text.Append("The network has no devices with ratings.\n");
        else
            AppendGrid(text, check);
        text.Append('\n').Append(DutyTexts.Summary(check)).Append('\n');
        AppendNotes(text, check);
        return text.Append('\n').Append(ReportTexts.Caution).Append('\n').ToString();
    }

    private static void AppendGrid(StringBuilder text, DutyCheck check)
    {
        var rows = new List<string[]> { Heading, Units };
        foreach (var device in check.Devices)
        {
            rows.Add(Row(device, device.WorstDuty, isFirst: true));
            rows.AddRange(device.Duties.Where(duty => duty != device.WorstDuty && IsShown(duty)).Select(duty => Row(device, duty, isFirst: false)));
        }
        TextTable.Append(text, rows, headingRows: 2);
    }

    private static readonly string[] Heading = ["Device", "At bus", "Towards", "Duty", "Required", "Rated", "Margin", "Verdict", "Fault", "Notes"];

    private static readonly string[] Units = ["", "", "", "", "kA", "kA", "%", "", "", ""];

    private static bool IsShown(Duty duty) => duty.Verdict is DutyVerdict.Fail or DutyVerdict.CannotSay || duty.IsMarginal;

    private static string[] Row(DeviceDuty device, Duty duty, bool isFirst) =>
    [
        isFirst ? device.Id : "", isFirst ? device.BusId : "", isFirst ? device.Feeds ?? "" : "", DutyTexts.Name(duty.Kind),
        Number(duty.Required, duty.Unit), Number(duty.Rated, duty.Unit), duty.MarginPercent?.ToString("+0.0;-0.0;0.0", CultureInfo.InvariantCulture) ?? "-",
        DutyTexts.Verdict(duty), DutyTexts.Side(duty.FaultSide), duty.Reason ?? Marks(device, isFirst),
    ];

    private static string Number(double? value, string unit) =>
        value is { } number ? number.ToString(unit == "%" ? "0.0'%'" : "0.00", CultureInfo.InvariantCulture) : "-";

    private static string Marks(DeviceDuty device, bool isFirst) => !isFirst
        ? ""
        : (device.Assumptions.Count > 0 ? "a" : "") + (device.StudyAssumptions.Count > 0 ? "c" : "") + (device.Remarks.Count > 0 ? "r" : "");

    private static void AppendNotes(StringBuilder text, DutyCheck check)
    {
        var assumptions = check.Devices.SelectMany(device => device.Assumptions).ToList();
        if (assumptions.Count > 0)
            text.Append("\na: rests on ratings or times that the network does not give:\n");
        foreach (var group in ReportTexts.Group(assumptions))
            text.Append("   ").Append(group).Append('\n');
        var remarks = check.Devices
            .SelectMany(device => device.Remarks, (device, remark) => (device.Id, remark)).GroupBy(one => one.remark).ToList();
        if (remarks.Count > 0)
            text.Append("\nr: to be known:\n");
        foreach (var group in remarks)
            text.Append("   ").Append(DutyTexts.Ids(group.Select(one => one.Id).ToList())).Append(": ").Append(group.Key).Append('\n');
        if (check.Study.Assumptions.Count > 0)
            text.Append("\nc: the currents rest on values that the network does not give:\n");
        foreach (var group in ReportTexts.Group(check.Study.Assumptions))
            text.Append("   ").Append(group).Append('\n');
    }
}
