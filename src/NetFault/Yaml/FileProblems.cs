using static NetFault.DiagnosticSeverity;

namespace NetFault;

/// <summary>
/// Every problem that the text of a network file can have, with its wording, so that all of it can be reviewed in one read. NF0xx are the
/// text and its YAML, NF1xx keys and kinds of values. What a network itself can get wrong is in <see cref="Problems"/>.
/// </summary>
internal static class FileProblems
{
    public static Problem NotUtf8(byte first) =>
        new("NF001", Error, $"the byte 0x{first:X2} is not UTF-8 text", "save the file as UTF-8");

    public static Problem OtherEncoding(string encoding) =>
        new("NF002", Error, $"the file is {encoding}, and a network file is UTF-8", "save the file as UTF-8");

    public static Problem Empty() =>
        new("NF003", Error, "the file holds no network", "begin with the line netfault: 1; docs/network-file.md shows a whole file");

    public static Problem TooLarge(long limit) =>
        new("NF004", Error, FormattableString.Invariant($"the file is larger than {limit} bytes, the most that is read"));

    public static Problem NotYaml(string message, string? remedy) =>
        new("NF005", Error, message, remedy);

    public static Problem TabIndentation() =>
        new("NF006", Error, "this line is indented with a tab, which YAML does not allow", "indent with blanks");

    public static Problem Anchor() =>
        new("NF007", Error, "anchors (&) are not read: a network file says everything where it stands", "remove the anchor");

    public static Problem Alias() =>
        new("NF008", Error, "aliases (*) and merge keys (<<) are not read: a network file says everything where it stands",
            "write the values themselves here");

    public static Problem Tag() =>
        new("NF009", Error, "tags (!) are not read: the key decides what kind its value is", "remove the tag");

    public static Problem SeveralDocuments() =>
        new("NF010", Error, "a second YAML document begins here, and a file holds one network", "put each network into a file of its own");

    public static Problem ControlCharacter(char character) =>
        new("NF011", Error, $"the character U+{(int)character:X4} does not belong into text", "remove it");

    public static Problem TooDeep(int limit) =>
        new("NF012", Error, FormattableString.Invariant($"values are nested more than {limit} deep; reading stopped here"));

    public static Problem TooMany(int limit) =>
        new("NF013", Error, FormattableString.Invariant($"there are more than {limit} problems; not all are listed"),
            "correct these first");

    public static Problem NotANetworkFile(string kind) =>
        new("NF014", Error, $"the file holds {kind}, and a network file is a mapping of keys to values",
            "begin with the line netfault: 1; docs/network-file.md shows a whole file");

    public static Problem UnknownSection(string key, string? nearest) =>
        new("NF101", Error, "is not a key or section of a network file", KeyHint(key) ?? nearest);

    public static Problem UnknownKey(string key, string? nearest, string allowed) =>
        new("NF102", Error, "is not a known key", KeyHint(key) ?? nearest ?? "the keys here are " + allowed);

    public static Problem RepeatedKey() =>
        new("NF103", Error, "stands twice", "keep one of the two");

    public static Problem MissingKey() =>
        new("NF104", Error, "is missing", "add the key");

    public static Problem MappingNeeded(string kind, string shape) =>
        new("NF105", Error, $"{kind} stands where a mapping belongs", $"write {shape}");

    public static Problem ValueNeeded(string kind, string needed) =>
        new("NF106", Error, $"{kind} stands where {needed} belongs");

    public static Problem Blank(string needed) =>
        new("NF107", Error, $"has no value, and {needed} belongs here", "give the value, or leave the key out if it is not required");

    public static Problem Null(string text, string needed) =>
        new("NF108", Error, $"{Quoted(text)} stands where {needed} belongs", "give the value, or leave the key out if it is not required");

    public static Problem NotANumber(string text) =>
        new("NF109", Error, $"{Quoted(text)} is not a number");

    public static Problem NumberWithUnit(string text, string number) =>
        new("NF110", Error, $"{Quoted(text)} is a number with a unit", $"write {number} alone; the unit is that of the key");

    public static Problem NotFinite(string text) =>
        new("NF111", Error, $"{Quoted(text)} is not a finite number");

    public static Problem OutOfRange(string text) =>
        new("NF112", Error, $"{Quoted(text)} is beyond what a number can hold (about 1e-308 to 1e308)");

    public static Problem LeadingZero(string text) =>
        new("NF113", Error, $"{Quoted(text)} has a leading zero, which some programs read as an octal or hexadecimal number",
            "write the number in decimal without a leading zero");

    public static Problem Base60(string text) =>
        new("NF114", Error, $"{Quoted(text)} is not a number; some programs read it in base 60", "write one decimal number");

    public static Problem Underscore(string text) =>
        new("NF115", Error, $"{Quoted(text)} holds an underscore", $"write {Shortened(text.Replace("_", string.Empty))}");

    public static Problem DecimalComma(string text) =>
        new("NF116", Error, $"{Quoted(text)} holds a comma", "write a decimal point, and no mark between thousands");

    public static Problem QuotedNumber(string text) =>
        new("NF117", Error, $"{Quoted(text)} is text in quotes or a text block, and a number belongs here", "write the number without quotes");

    public static Problem MissingDigit(string text) =>
        new("NF118", Error, $"{Quoted(text)} lacks a digit beside its point", "write a digit before and after the point");

    public static Problem NotWhole(string text) =>
        new("NF119", Error, FormattableString.Invariant($"{Quoted(text)} is not a whole number up to {int.MaxValue}"));

    public static Problem NotTrueOrFalse(string text, string? remedy) =>
        new("NF120", Error, $"{Quoted(text)} is neither true nor false", remedy ?? "write true or false");

    public static Problem NotAChoice(string text, string choices, string? nearest) =>
        new("NF121", Error, $"{Quoted(text)} is not one of {choices}", ChoiceHint(text) ?? nearest);

    // NF122 said that circuit_breakers was a reserved section; the id is not used again.

    public static Problem OtherFormat(int format, int known) =>
        new("NF123", Error, FormattableString.Invariant($"the file is of format {format}, and this version reads format {known}"),
            "use a version of NetFault that reads this format");

    public static Problem KeyIsNotText(string kind) =>
        new("NF124", Error, $"{kind} stands where a key belongs", "a key is a single text before a colon");

    /// <summary>The kind of a value, in the words of the messages above.</summary>
    public static string KindName(FieldKind kind) => kind switch
    {
        FieldKind.Mapping => "a mapping",
        FieldKind.List => "a list",
        _ => "a single value",
    };

    /// <summary>A text of the file in quotes, without line breaks and no longer than a line can show.</summary>
    internal static string Quoted(string text) => $"\"{Shortened(text)}\"";

    private static string Shortened(string text) => Problems.Shown(text);

    /// <summary>Two standards whose numbers differ by a zero: the nearest word would be the wrong one.</summary>
    private static string? ChoiceHint(string text) =>
        text == "ieee_c37_013" ? "IEEE C37.013 is now iec_ieee_62271_37_013; ieee_c37_13 is for low voltage" : null;

    /// <summary>What a key that is none suggests: a blank missing after the colon, the second half of a decimal comma.</summary>
    private static string? KeyHint(string key)
    {
        var colon = key.IndexOf(':');
        if (colon > 0)
            return $"write a blank after the colon: {Shortened(key.Substring(0, colon))}: {Shortened(key.Substring(colon + 1))}";
        return key.Length > 0 && key.All(one => one is >= '0' and <= '9')
            ? "if the number before it has a decimal comma, write a decimal point"
            : null;
    }
}
