using YamlDotNet.Core;
using YamlDotNet.Core.Events;

namespace NetFault;

/// <summary>
/// YamlDotNet's events, one at a time, with what a network file refuses of YAML reported on the way: anchors, aliases, tags, too deep
/// nesting, text that is not YAML.
/// </summary>
internal sealed class EventReader
{
    /// <summary>A network file is four levels deep; the parser's work grows with the square of the depth.</summary>
    public const int MaximumDepth = 64;

    private readonly Scanner _scanner;
    private readonly Parser _parser;
    private readonly ProblemList _problems;

    /// <summary>Offset of each open mapping and list; −1 where it has no bracket.</summary>
    private readonly int[] _openBracket = new int[MaximumDepth];
    private int _depth;

    public EventReader(ProblemList problems)
    {
        _problems = problems;
        _scanner = new Scanner(new StringReader(problems.Source.Text), skipComments: true);
        _parser = new Parser(_scanner);
    }

    public ParsingEvent Current { get; private set; } = new StreamStart();

    /// <summary>Goes to the next event.</summary>
    /// <exception cref="StopReadingException">The text is no YAML from here on, or too deep; the problem has been added.</exception>
    public ParsingEvent Next()
    {
        try
        {
            _parser.MoveNext();
        }
        catch (Exception exception) when (exception is not OutOfMemoryException)
        {
            // The parser throws an InvalidOperationException for some texts that are no YAML, such as a bracket that is never closed.
            throw Refuse(exception);
        }
        Current = _parser.Current!;
        if (Current is NodeEvent node)
            Enter(node);
        else if (Current is MappingEnd or SequenceEnd)
            _depth--;
        else if (Current is AnchorAlias)
            _problems.Add(FileProblems.Alias(), Offset(Current), Length(Current));
        return Current;
    }

    /// <summary>Goes from the first event of a value to its last.</summary>
    public void SkipValue()
    {
        if (Current is not (MappingStart or SequenceStart))
            return;
        for (var outer = _depth - 1; _depth > outer;)
            Next();
    }

    /// <summary>Reports a key that is a mapping or a list, and passes over it and its value.</summary>
    public void PassKeyWithoutText(string? section, string? id)
    {
        var key = Current;
        if (key is not AnchorAlias)
        {
            var problem = FileProblems.KeyIsNotText(FileProblems.KindName(Field.KindOf(key)));
            _problems.Add(problem.At(section, id, null), Offset(key), 1);
        }
        SkipValue();
        Next();
        SkipValue();
    }

    public static int Offset(ParsingEvent one) => (int)one.Start.Index;

    public static int Length(ParsingEvent one) => (int)(one.End.Index - one.Start.Index);

    private void Enter(NodeEvent node)
    {
        if (!node.Anchor.IsEmpty)
            _problems.Add(FileProblems.Anchor(), Offset(node), node.Anchor.Value.Length + 1);
        if (!node.Tag.IsEmpty)
            _problems.Add(FileProblems.Tag(), Offset(node), Math.Max(1, TagLength(Offset(node))));
        if (node is Scalar)
            return;
        if (_depth == MaximumDepth)
        {
            _problems.Add(FileProblems.TooDeep(MaximumDepth), Offset(node), 1);
            throw new StopReadingException();
        }
        var isFlow = node is MappingStart { Style: MappingStyle.Flow } or SequenceStart { Style: SequenceStyle.Flow };
        _openBracket[_depth++] = isFlow ? Offset(node) : -1;
    }

    private int TagLength(int offset) => _problems.Source.Text.Skip(offset).TakeWhile(one => !char.IsWhiteSpace(one)).Count();

    private StopReadingException Refuse(Exception exception)
    {
        var bracket = _depth > 0 ? _openBracket[_depth - 1] : -1;
        var at = (int)((exception as YamlException)?.Start.Index ?? _scanner.CurrentPosition.Index);
        // A zero character is the end of the text for the parser; what it says of that is beside the point.
        if (_problems.Found.Exists(one => one.Id == FileProblems.ControlCharacter(default).Id))
            return new StopReadingException();
        SyntaxErrors.Report(_problems, exception.Message, at, (int)_scanner.CurrentPosition.Index, bracket);
        return new StopReadingException();
    }
}
