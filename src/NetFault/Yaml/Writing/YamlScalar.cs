using System.Globalization;
using System.Text;

namespace NetFault;

/// <summary>Single values as YAML text.</summary>
internal static class YamlScalar
{
    /// <summary>The shortest text that reads back as the same number.</summary>
    public static string Number(double value)
    {
        var text = value.ToString("R", CultureInfo.InvariantCulture);
        // .NET Framework's shortest form is not always exact.
        return double.Parse(text, CultureInfo.InvariantCulture).Equals(value) ? text : value.ToString("G17", CultureInfo.InvariantCulture);
    }

    /// <summary>A text, in quotes where it needs them.</summary>
    public static string Text(string text) => IsPlain(text) ? text : Quoted(text);

    /// <summary>Narrower than YAML: letters, digits and a few marks, so that no reader can take the text for anything else.</summary>
    private static bool IsPlain(string text)
    {
        if (text.Length == 0 || !(char.IsLetterOrDigit(text[0]) || text[0] == '_') || text[text.Length - 1] == ' ')
            return false;
        return text.All(one => char.IsLetterOrDigit(one) || one is '_' or '-' or '.' or '/' or '+' or '(' or ')' or ' ')
            && !NumberProblems.IsNull(text);
    }

    private static string Quoted(string text)
    {
        var quoted = new StringBuilder("\"", text.Length + 2);
        foreach (var one in text)
            quoted.Append(Escaped(one));
        return quoted.Append('"').ToString();
    }

    private static string Escaped(char one) => one switch
    {
        '"' => "\\\"",
        '\\' => "\\\\",
        '\n' => "\\n",
        '\r' => "\\r",
        '\t' => "\\t",
        _ when char.IsControl(one) || one is '\u2028' or '\u2029' or '\uFEFF' or '\uFFFE' or '\uFFFF' => $"\\u{(int)one:X4}",
        _ => one.ToString(),
    };
}
