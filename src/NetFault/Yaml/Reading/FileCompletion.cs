namespace NetFault;

/// <summary>The network's own checks on what a file held, with each problem put to its place in the file.</summary>
internal sealed class FileCompletion
{
    private readonly GatheredFile _gathered;
    private readonly ProblemList _problems;

    private FileCompletion(GatheredFile gathered, ProblemList problems)
    {
        _gathered = gathered;
        _problems = problems;
    }

    /// <summary>Checks what was gathered.</summary>
    /// <returns>The network, or null where there is an error; and all problems in the order of the file.</returns>
    public static NetworkFileResult Complete(GatheredFile gathered, ProblemList problems)
    {
        if (gathered.OtherFormat is { } other)
            return new NetworkFileResult(null, [other]);
        return new FileCompletion(gathered, problems).Complete();
    }

    private NetworkFileResult Complete()
    {
        var network = default(Network);
        var found = new List<Diagnostic>();
        CheckDuplicates(found);
        if (_gathered.IsComplete)
            network = CheckAll(found);
        else
            CheckPart(found);
        if (network is not null)
            network.Origin = (_problems.Source.File, _gathered.Elements.Lines());
        if (found.Count == 0 && _problems.Found.Count == 0)
            return new NetworkFileResult(network, []);
        var all = InOrder(_problems.Found.Concat(found.Where(IsNews).Select(Locate)));
        if (network is not null)
            network.Warnings = all;
        return new NetworkFileResult(network, all);
    }

    private Network? CheckAll(List<Diagnostic> found)
    {
        var both = new List<Diagnostic>(_problems.Found);
        both.AddRange(found);
        var known = both.Count;
        var network = NetworkBuilder.Complete(_gathered.Draft, both, _gathered.ReportedKeys);
        found.AddRange(both.Skip(known));
        return network;
    }

    /// <summary>What can be said about the first part of a file: not that something is missing from it.</summary>
    private void CheckPart(List<Diagnostic> found) =>
        found.AddRange(NetworkCheck.Elements(_gathered.Draft, _gathered.ReportedKeys).Where(one => one.Id is not ("NF301" or "NF302" or "NF310" or "NF311")));

    /// <summary>Each second element of an id, with the problems of its own values.</summary>
    private void CheckDuplicates(List<Diagnostic> found)
    {
        foreach (var (element, place) in _gathered.Duplicates)
        {
            var duplicate = Problems.DuplicateId(element.Section, element.Id).At(element.Section, element.Id, null);
            var first = _gathered.Elements.Find(element.Section, element.Id).GetValueOrDefault();
            found.Add(Put(duplicate, _gathered.Elements.PlaceOf(place)) with { RelatedLocation = Place(_gathered.Elements.PlaceOf(first)) });
            var own = new List<Diagnostic>();
            new ElementCheck(_gathered.Draft, own, element).Run(element, _gathered.ReportedKeys(element));
            found.AddRange(own.Select(one => Put(one, _gathered.Elements.PlaceOf(place, one.Key))));
        }
    }

    /// <summary>Whether a problem of the network as a whole does not follow from one that was reported already.</summary>
    private bool IsNews(Diagnostic one) => one.Section is not null || one.Key is null || !_gathered.ReportedTopLevel.Contains(one.Key);

    private Diagnostic Locate(Diagnostic one)
    {
        if (one.Location is not null)
            return one;
        if (one.Section is not null && _gathered.Elements.Find(one.Section, one.ElementId ?? string.Empty) is { } element)
            return Put(one, _gathered.Elements.PlaceOf(element, one.Key));
        return _gathered.TopLevel.TryGetValue(one.Section ?? one.Key ?? "netfault", out var place) ? Put(one, place) : Put(one, (0, 1));
    }

    private Diagnostic Put(Diagnostic one, (int Offset, int Length) place) => one with { Location = Place(place) };

    private SourceLocation Place((int Offset, int Length) place) => _problems.Source.Locate(place.Offset, place.Length);

    /// <summary>In the order of the file; where there are too many, the errors before the warnings.</summary>
    private IReadOnlyList<Diagnostic> InOrder(IEnumerable<Diagnostic> problems)
    {
        var all = problems.ToList();
        if (all.Count > NetworkFile.MaximumProblems && all.Exists(one => one.Severity == DiagnosticSeverity.Error))
        {
            all = all.OrderByDescending(one => one.Severity).Take(NetworkFile.MaximumProblems).ToList();
            all.Add(Put(FileProblems.TooMany(NetworkFile.MaximumProblems).At(null, null, null), (0, 1)));
        }
        return all.OrderBy(one => one.Location!.Line).ThenBy(one => one.Location!.Column).ToList().AsReadOnly();
    }
}
