using System.Globalization;
using static NetFault.DiagnosticSeverity;

namespace NetFault;

/// <summary>
/// Every problem that a network itself can have, with its wording, so that all of it can be reviewed in one read. NF2xx are values,
/// NF3xx references and connections, NF4xx warnings. The reader's own, about the text of a file, are in <c>FileProblems</c>.
/// </summary>
internal static class Problems
{
    public static Problem NotFinite(double value) =>
        new("NF201", Error, $"{Text(value)} is not a finite number");

    public static Problem NotPositive(double value) =>
        new("NF202", Error, $"{Text(value)} must be greater than 0");

    public static Problem Negative(double value) =>
        new("NF203", Error, $"{Text(value)} must not be negative");

    public static Problem OutsidePercent(double value) =>
        new("NF204", Error, $"{Text(value)} must be from 0 to 100 percent");

    public static Problem NotAFraction(double value) =>
        new("NF205", Error, $"{Text(value)} must be greater than 0 and at most 1",
            value is > 1 and <= 100 ? $"if {Text(value)} is in percent, write {Text(value / 100)}" : null);

    public static Problem NotOneOf(object value, string allowed) =>
        new("NF206", Error, $"{string.Format(CultureInfo.InvariantCulture, "{0}", value)} must be {allowed}");

    public static Problem LessThanOne(int value) =>
        new("NF207", Error, $"{Text(value)} must be 1 or more");

    public static Problem Above(double value, string otherKey, double other) =>
        new("NF208", Error, $"{Text(value)} must not be above {otherKey}, which is {Text(other)}");

    public static Problem BothForms(string one, string other) =>
        new("NF209", Error, $"{one} and {other} say the same thing in two ways", $"keep one of them");

    public static Problem NoForm(string forms) =>
        new("NF210", Error, $"one of {forms} is needed");

    public static Problem NeededFor(string what) =>
        new("NF211", Error, $"is needed because of {what}");

    public static Problem NoImpedance() =>
        new("NF212", Error, "r and x must not both be 0", "for a connection without impedance use a coupler in bus_couplers");

    public static Problem LossAboveShortCircuitVoltage(double lossKw, double percent, double voltagePercent) =>
        new("NF213", Error, $"{Text(lossKw)} kW is {Text(percent)} percent of the rated power, above the short-circuit voltage of {Text(voltagePercent)} percent",
            "give load_loss_kw in kW and rated_mva in MVA");

    public static Problem ToleranceAboveLowVoltage(double nominalKv) =>
        new("NF214", Error, $"is for buses up to 1 kV, and this one has {Text(nominalKv)} kV");

    public static Problem FewerThanTwoWindings(int connected) =>
        new("NF215", Error, $"{Text(connected)} of the windings hv, mv, lv has a bus, and at least two must", "give the buses of the windings in use");

    public static Problem MinimumAboveMaximum(double min, double max) =>
        new("NF216", Error, $"the minimum {Text(min)} must not be above the maximum {Text(max)}");

    public static Problem BlankId(string section) =>
        new("NF217", Error, $"an id in {section} is empty", "give every element an id");

    public static Problem OutOfFrequency(double hz) =>
        new("NF218", Error, $"{Text(hz)} Hz must be above 0 and at most 1000");

    public static Problem OutsideRange(double value, double low, double high) =>
        new("NF220", Error, $"{Text(value)} must be from {Text(low)} to {Text(high)}");

    public static Problem BadId(int longest) =>
        new("NF219", Error, $"an id has at most {Text(longest)} characters, and none that breaks the line or cannot be seen");

    public static Problem NoReference(string what) =>
        new("NF221", Error, $"names no {what}", $"give the id of the {what}");

    public static Problem NotOfStandard(string standard, string remedy) =>
        new("NF222", Error, $"is no rating of a circuit-breaker by {standard}", remedy);

    public static Problem UnequalTolerances(string from, double fromPercent, string to, double toPercent) =>
        new("NF309", Error, $"closed, it makes one node of bus \"{Shown(from)}\" with a voltage tolerance of {Text(fromPercent)} percent and bus \"{Shown(to)}\" with {Text(toPercent)}",
            "give both the same low_voltage_tolerance_percent");

    public static Problem UnknownBus(string id, string? nearest) =>
        new("NF301", Error, $"there is no bus \"{Shown(id)}\"", nearest ?? "add it to buses");

    public static Problem UnknownTransformer(string id, string? nearest) =>
        new("NF302", Error, $"there is no transformer \"{Shown(id)}\"", nearest ?? "add it to transformers");

    public static Problem UnitTransformerElsewhere(string transformer, string bus) =>
        new("NF303", Error, $"transformer \"{transformer}\" is not connected to the machine's bus \"{bus}\"",
            "name the transformer whose winding is at the machine's terminals, or behind its breaker in bus_couplers");

    public static Problem SameBus(string bus) =>
        new("NF304", Error, $"both ends are at bus \"{bus}\"");

    public static Problem UnequalVoltages(string from, double fromKv, string to, double toKv) =>
        new("NF305", Error, $"joins bus \"{from}\" of {Text(fromKv)} kV with bus \"{to}\" of {Text(toKv)} kV",
            "different nominal voltages need a transformer between them");

    public static Problem DuplicateId(string section, string id) =>
        new("NF306", Error, $"the id \"{Shown(id)}\" stands twice in {section}", "give each element of a section its own id");

    public static Problem NoBuses() =>
        new("NF307", Error, "the network has no buses", "at least one bus is needed");

    public static Problem NoSource() =>
        new("NF308", Error, "the network has no source in service, so no short-circuit current can flow",
            "add or put in service a network feeder or a synchronous machine");

    public static Problem UnknownFed(string id, string? section, string? nearest) =>
        new("NF310", Error, $"there is no {(section is null ? "branch, source or coupler" : "element")} \"{Shown(id)}\"{(section is null ? "" : " in " + section)}",
            nearest ?? "name the branch, source or coupler that the device connects with its bus");

    public static Problem NotAtBus(string section, string id, string ends, string bus, string remedy) =>
        new("NF311", Error, $"\"{Shown(id)}\" of {section} is connected to {ends}, not to bus \"{Shown(bus)}\"", remedy);

    public static Problem SeveralFed(string id, string bus, string sections) =>
        new("NF312", Error, $"bus \"{Shown(bus)}\" has an element \"{Shown(id)}\" in {sections}", "say which one by feeds_section");

    public static Problem UnitRatio(string from, double fromKv, string to, double toKv) =>
        new("NF401", Warning, $"joins bus \"{from}\" of {Text(fromKv)} kV with bus \"{to}\" of {Text(toKv)} kV; its per-unit impedance is taken with the ratio 1");

    public static Problem RatedVoltageFarOff(double ratedKv, string bus, double nominalKv) =>
        new("NF402", Warning, $"{Text(ratedKv)} kV is more than a factor of 1.3 off the nominal {Text(nominalKv)} kV of bus \"{bus}\"");

    public static Problem UnusualValue(double value, double low, double high, string unit) =>
        new("NF403", Warning, $"{Text(value)} is unusual: commonly {Text(low)} to {Text(high)} {unit}");

    public static Problem WindingsSwapped(double hvKv, double lvKv) =>
        new("NF404", Warning, $"{Text(hvKv)} kV of the high-voltage winding is below the {Text(lvKv)} kV of the low-voltage winding");

    public static Problem DeEnergised() =>
        new("NF405", Warning, "has no path to a network feeder or synchronous machine in service: it is de-energised and its currents are 0");

    public static Problem UnusualFrequency(double hz) =>
        new("NF406", Warning, $"{Text(hz)} Hz is neither 50 nor 60");

    public static Problem RatedVoltageBelow(double ratedKv, string bus, double nominalKv) =>
        new("NF407", Warning, $"{Text(ratedKv)} kV is below the nominal {Text(nominalKv)} kV of bus \"{bus}\"");

    public static Problem StandardOfOtherVoltage(string standard, bool lowVoltage, string bus, double nominalKv) =>
        new("NF408", Warning, $"{standard} is for circuit-breakers {(lowVoltage ? "up to" : "above")} 1 kV, and bus \"{bus}\" has {Text(nominalKv)} kV");

    /// <summary>A text of the user's the way a message can show it: on one line, and not too long.</summary>
    internal static string Shown(string text)
    {
        const int longest = 60;
        var shown = text.Length <= longest ? text : text.Substring(0, longest) + "...";
        return shown.Any(char.IsControl) ? new string([.. shown.Select(one => char.IsControl(one) ? ' ' : one)]) : shown;
    }

    /// <summary>A number the way it would be typed.</summary>
    internal static string Text(double value) => value.ToString("R", CultureInfo.InvariantCulture);

    private static string Text(int value) => value.ToString(CultureInfo.InvariantCulture);
}
