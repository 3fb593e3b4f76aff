namespace NetFault;

/// <summary>The problems of one file in the order in which they were found; ends the reading when there are too many.</summary>
internal sealed class ProblemList
{
    private readonly int _limit;

    public ProblemList(SourceText source, int limit)
    {
        Source = source;
        _limit = limit;
    }

    public SourceText Source { get; }

    public List<Diagnostic> Found { get; } = [];

    /// <summary>Adds a problem of the file as such.</summary>
    /// <exception cref="StopReadingException">There are too many to go on.</exception>
    public void Add(Problem problem, int offset, int length) => Add(problem.At(null, null, null), offset, length);

    /// <summary>Adds a problem at a place in the file.</summary>
    /// <exception cref="StopReadingException">There are too many to go on.</exception>
    public Diagnostic Add(Diagnostic diagnostic, int offset, int length, SourceLocation? related = null)
    {
        if (Found.Count == _limit)
        {
            Found.Add(FileProblems.TooMany(_limit).At(null, null, null) with { Location = Source.Locate(offset, length) });
            throw new StopReadingException();
        }
        var placed = diagnostic with { Location = Source.Locate(offset, length), RelatedLocation = related };
        Found.Add(placed);
        return placed;
    }
}

/// <summary>Reading cannot go on; what there is to say has been said. Never leaves the reader.</summary>
internal sealed class StopReadingException : Exception;
