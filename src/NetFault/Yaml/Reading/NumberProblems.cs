namespace NetFault;

/// <summary>Says why a text is not a number, as precisely as its writer would want to know.</summary>
internal static class NumberProblems
{
    /// <summary>What is wrong with a plain text that <see cref="StrictNumber"/> did not take.</summary>
    public static Problem Explain(string text)
    {
        if (IsNull(text))
            return FileProblems.Null(text, "a number");
        if (IsNotFinite(text))
            return FileProblems.NotFinite(text);
        return ExplainDigits(text) ?? FileProblems.NotANumber(text);
    }

    /// <summary>Whether YAML reads a plain text as nothing.</summary>
    public static bool IsNull(string text) => text is "~" or "null" or "Null" or "NULL";

    private static bool IsNotFinite(string text) =>
        text.TrimStart('+', '-').TrimStart('.').ToUpperInvariant() is "NAN" or "INF" or "INFINITY";

    private static Problem? ExplainDigits(string text)
    {
        var bare = text.TrimStart('+', '-');
        if (!bare.Any(IsDigit) || !(IsDigit(bare[0]) || bare[0] == '.'))
            return null;
        if (bare.All(one => IsDigit(one) || one is '_' or '.') && bare.Contains('_'))
            return FileProblems.Underscore(text);
        if (bare.All(one => IsDigit(one) || one is ',' or '.') && bare.Contains(','))
            return FileProblems.DecimalComma(text);
        if (bare.All(one => IsDigit(one) || one is ':' or '.') && bare.Contains(':'))
            return FileProblems.Base60(text);
        if (bare.Length > 1 && bare[0] == '0' && IsDigit(bare[1]) || IsPrefixed(bare))
            return FileProblems.LeadingZero(text);
        return ExplainTail(text);
    }

    private static bool IsPrefixed(string bare) =>
        bare.Length > 2 && bare[0] == '0' && bare[1] is 'x' or 'X' or 'o' or 'O' or 'b' or 'B' && bare.Skip(2).All(Uri.IsHexDigit);

    /// <summary>A number that lacks a digit beside its point, or one with something behind it.</summary>
    private static Problem? ExplainTail(string text)
    {
        if (IsNumber(text.Replace(".", ".0")) || IsNumber(text.Replace(".", "0.")))
            return FileProblems.MissingDigit(text);
        var end = text.Length;
        while (end > 0 && !IsNumber(text.Substring(0, end)))
            end--;
        var rest = text.Substring(end).TrimStart();
        return end > 0 && rest.Length > 0 && (char.IsLetter(rest[0]) || rest[0] is '%' or '°' or '\'' or 'Ω')
            ? FileProblems.NumberWithUnit(text, text.Substring(0, end))
            : null;
    }

    private static bool IsNumber(string text) => StrictNumber.TryParse(text.AsSpan(), out _);

    private static bool IsDigit(char one) => one is >= '0' and <= '9';
}
