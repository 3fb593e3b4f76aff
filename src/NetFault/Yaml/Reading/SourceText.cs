namespace NetFault;

/// <summary>The text of a network file, which turns offsets into places. Lines are counted only when a place is asked for.</summary>
internal sealed class SourceText
{
    private int[]? _lineStarts;
    private int _cachedLine = -1;
    private string _cachedText = string.Empty;

    public SourceText(string file, string text)
    {
        File = file;
        Text = text;
    }

    /// <summary>The file's name as it was given.</summary>
    public string File { get; }

    /// <summary>The whole text, without a byte order mark.</summary>
    public string Text { get; }

    /// <summary>The place of a piece of the text; its length ends with its first line.</summary>
    public SourceLocation Locate(int offset, int length)
    {
        offset = Math.Max(0, Math.Min(offset, Text.Length));
        var line = LineOf(offset) - 1;
        var text = LineText(line);
        var column = offset - _lineStarts![line];
        return new SourceLocation(File, line + 1, column + 1, Math.Max(1, Math.Min(length, text.Length - column)), text);
    }

    /// <summary>The line of an offset, counted from 1.</summary>
    public int LineOf(int offset)
    {
        _lineStarts ??= FindLines(Text);
        var line = Array.BinarySearch(_lineStarts, offset);
        return line < 0 ? ~line : line + 1;
    }

    /// <summary>Offset of the start of the line that holds an offset.</summary>
    public int LineStart(int offset)
    {
        while (offset > 0 && Text[offset - 1] is not ('\n' or '\r'))
            offset--;
        return offset;
    }

    /// <summary>The text of a line; the last one is kept, since many problems of one long line share it.</summary>
    private string LineText(int line)
    {
        if (line == _cachedLine)
            return _cachedText;
        var start = _lineStarts![line];
        var end = line + 1 < _lineStarts.Length ? _lineStarts[line + 1] : Text.Length;
        while (end > start && Text[end - 1] is '\n' or '\r')
            end--;
        _cachedLine = line;
        return _cachedText = Text.Substring(start, end - start);
    }

    /// <summary>Offsets at which lines start; a line ends with LF, CR LF or CR alone.</summary>
    private static int[] FindLines(string text)
    {
        var starts = new List<int> { 0 };
        var rest = text.AsSpan();
        for (int end; (end = rest.IndexOfAny('\n', '\r')) >= 0;)
        {
            var isPair = rest[end] == '\r' && end + 1 < rest.Length && rest[end + 1] == '\n';
            rest = rest.Slice(isPair ? end + 2 : end + 1);
            starts.Add(text.Length - rest.Length);
        }
        return starts.ToArray();
    }
}
