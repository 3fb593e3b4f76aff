namespace NetFault;

/// <summary>Finds the characters that no YAML text may hold. The parser itself takes a zero character for the end of the file.</summary>
internal static class Characters
{
    /// <summary>Reports each control character and each half of a surrogate pair.</summary>
    public static void Check(ProblemList problems)
    {
        var text = problems.Source.Text;
        for (var i = 0; i < text.Length; i++)
        {
            var one = text[i];
            if (one is >= ' ' and < '\x7F' or '\n' or '\r' or '\t')
                continue;
            if (char.IsHighSurrogate(one) && i + 1 < text.Length && char.IsLowSurrogate(text[i + 1]))
                i++;
            else if (IsRefused(one))
                problems.Add(FileProblems.ControlCharacter(one), i, 1);
        }
    }

    /// <summary>YAML 1.2.2, 5.1: printable characters; U+0085 is one.</summary>
    private static bool IsRefused(char one) =>
        (char.IsControl(one) && one != '\u0085') || char.IsSurrogate(one) || one is '\uFFFE' or '\uFFFF';
}
