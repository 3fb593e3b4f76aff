using System.Globalization;

namespace NetFault;

/// <summary>
/// The one way to write a number in a network file: an optional sign, digits without a leading zero, an optional fraction, an optional
/// exponent. Narrower than YAML on purpose: what YAML versions read differently (010, 1:30, 1_000, .5) is no number here.
/// </summary>
internal static class StrictNumber
{
    /// <summary>Decimal numbers of up to 15 digits are exact as a double (2^53 is about 9.007e15).</summary>
    private const int ExactDigits = 15;

    /// <summary>Powers of ten that are exact as a double: 10^22 is the last. One division of two exact doubles rounds once (Clinger 1990).</summary>
    private static readonly double[] ExactPowers =
    [
        1e0, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15, 1e16, 1e17, 1e18, 1e19, 1e20, 1e21, 1e22,
    ];

    /// <summary>The number that the text is; false where it is none by the grammar. May be infinite, see <see cref="IsInRange"/>.</summary>
    public static bool TryParse(ReadOnlySpan<char> text, out double value)
    {
        value = 0;
        var at = text.Length > 0 && text[0] is '-' or '+' ? 1 : 0;
        var start = at;
        long digits = 0;
        if (!Digits(text, ref at, ref digits) || (text[start] == '0' && at - start > 1))
            return false;
        var digitCount = at - start;
        var fraction = 0;
        if (at < text.Length && text[at] == '.')
        {
            var point = at++;
            if (!Digits(text, ref at, ref digits))
                return false;
            fraction = at - point - 1;
        }
        var hasExponent = at < text.Length;
        if (hasExponent && !Exponent(text, at))
            return false;
        if (hasExponent || digitCount + fraction > ExactDigits)
            return double.TryParse(text.ToString(), NumberStyles.Float, CultureInfo.InvariantCulture, out value) || Overflown(text, out value);
        value = digits / ExactPowers[fraction];
        if (text[0] == '-')
            value = -value;
        return true;
    }

    /// <summary>Whether a parsed number is what its text says: neither infinite nor, unless the text is a zero, vanished.</summary>
    public static bool IsInRange(ReadOnlySpan<char> text, double value)
    {
        if (value != 0)
            return !double.IsInfinity(value);
        var exponent = text.IndexOfAny('e', 'E');
        return text.Slice(0, exponent < 0 ? text.Length : exponent).IndexOfAny("123456789".AsSpan()) < 0;
    }

    /// <summary>The whole number that the text is; false where it has anything but a sign and digits, or does not fit.</summary>
    public static bool TryParseWhole(ReadOnlySpan<char> text, out int value)
    {
        value = 0;
        return TryParse(text, out _) && int.TryParse(text.ToString(), NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out value);
    }

    /// <summary>Reads at least one digit; the digits' value counts only up to <see cref="ExactDigits"/> of them.</summary>
    private static bool Digits(ReadOnlySpan<char> text, ref int at, ref long value)
    {
        var start = at;
        for (; at < text.Length && text[at] is >= '0' and <= '9'; at++)
            value = unchecked(10 * value + (text[at] - '0'));
        return at > start;
    }

    private static bool Exponent(ReadOnlySpan<char> text, int at)
    {
        if (text[at++] is not ('e' or 'E'))
            return false;
        if (at < text.Length && text[at] is '-' or '+')
            at++;
        long unused = 0;
        return Digits(text, ref at, ref unused) && at == text.Length;
    }

    /// <summary>.NET Framework refuses what is beyond a double, later versions give infinity: here it is infinity.</summary>
    private static bool Overflown(ReadOnlySpan<char> text, out double value)
    {
        value = text[0] == '-' ? double.NegativeInfinity : double.PositiveInfinity;
        return true;
    }
}
