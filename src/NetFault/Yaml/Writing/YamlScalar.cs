using System.Text;

namespace NetFault;

/// <summary>Single values as YAML text.</summary>
internal static class YamlScalar
{
    /// <summary>The shortest text that reads back as the same number.</summary>
    public static string Number(double value) => RoundTrip.Text(value);

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

    /// <exception cref="ArgumentException">The text holds half a character.</exception>
    private static string Quoted(string text)
    {
        var quoted = new StringBuilder("\"", text.Length + 2);
        for (var i = 0; i < text.Length; i++)
        {
            if (i + 1 < text.Length && char.IsSurrogatePair(text[i], text[i + 1]))
                quoted.Append(text[i++]).Append(text[i]);
            else if (char.IsSurrogate(text[i]))
                throw new ArgumentException($"the text \"{Problems.Shown(text)}\" holds half a surrogate pair, which no file can hold");
            else
                quoted.Append(Escaped(text[i]));
        }
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
