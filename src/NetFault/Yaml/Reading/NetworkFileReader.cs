using YamlDotNet.Core.Events;

namespace NetFault;

/// <summary>Reads the text of a network file into a draft of a network, and gathers what is wrong with it.</summary>
internal sealed class NetworkFileReader
{
    private readonly ProblemList _problems;
    private readonly GatheredFile _gathered;
    private readonly EventReader _events;
    private readonly FileHeader _header;
    private readonly SectionReader _sections;

    private NetworkFileReader(ProblemList problems, GatheredFile gathered)
    {
        _problems = problems;
        _gathered = gathered;
        _events = new EventReader(problems);
        _header = new FileHeader(_events, problems);
        _sections = new SectionReader(_events, problems, gathered);
    }

    /// <summary>Reads a file's text; the problems go to the list.</summary>
    public static GatheredFile Read(ProblemList problems)
    {
        var gathered = new GatheredFile(problems.Source);
        var reader = new NetworkFileReader(problems, gathered);
        try
        {
            Characters.Check(problems);
            reader.ReadStream();
            gathered.IsComplete = gathered.HasRoot;
        }
        catch (StopReadingException)
        {
            gathered.IsComplete = false;
        }
        reader.Take();
        return gathered;
    }

    private void ReadStream()
    {
        while (_events.Next() is StreamStart or DocumentStart)
        {
        }
        if (_events.Current is not MappingStart)
        {
            ReportRoot();
            return;
        }
        _gathered.HasRoot = true;
        ReadRoot();
        _events.Next();
        if (_events.Next() is DocumentStart second)
            _problems.Add(FileProblems.SeveralDocuments(), EventReader.Offset(second), 3);
    }

    private void ReportRoot()
    {
        var kind = Field.KindOf(_events.Current);
        if (_events.Current is StreamEnd || kind == FieldKind.Blank)
            _problems.Add(FileProblems.Empty(), 0, 1);
        else if (kind != FieldKind.Refused)
            _problems.Add(FileProblems.NotANetworkFile(FileProblems.KindName(kind)), EventReader.Offset(_events.Current), 1);
    }

    private void ReadRoot()
    {
        _header.Start(EventReader.Offset(_events.Current));
        while (_events.Next() is not MappingEnd)
        {
            if (_events.Current is not Scalar key)
                _events.PassKeyWithoutText(null, null);
            else if (!_header.TryRead(key))
                ReadSection(key);
        }
    }

    private void ReadSection(Scalar key)
    {
        var (offset, length) = (EventReader.Offset(key), EventReader.Length(key));
        var section = AllSections.Find(key.Value);
        if (section is null)
            section = Refuse(key.Value, offset, length);
        else if (_gathered.TopLevel.TryGetValue(section.Name, out var first))
            ReportRepeated(section.Name, offset, length, _problems.Source.Locate(first.Offset, first.Length));
        else
            _gathered.TopLevel.Add(section.Name, (offset, length));
        _events.Next();
        if (section is null)
            _events.SkipValue();
        else
            _sections.Read(section, offset, length);
    }

    private void ReportRepeated(string name, int offset, int length, SourceLocation first) =>
        _problems.Add(FileProblems.RepeatedKey().At(null, null, name), offset, length, first);

    /// <summary>Reports a key that is no section; the one it was probably meant to be, so that its elements are not missed elsewhere.</summary>
    private Section? Refuse(string key, int offset, int length)
    {
        var names = FileHeader.Keys.Names.Concat(AllSections.InOrder.Select(one => one.Name)).ToList();
        var problem = FileProblems.UnknownSection(key, NearestNames.Suggestion(key, names));
        _problems.Add(problem.At(null, null, Problems.Shown(key)), offset, length);
        if (NearestNames.Find(key, names, 1) is not [var nearest])
            return null;
        if (AllSections.Find(nearest) is not { } section)
        {
            _header.AddMistyped(nearest);
            return null;
        }
        _gathered.ReportedTopLevel.Add(nearest);
        return section;
    }

    /// <summary>Makes the draft of what was read, be it all of the file or its first part.</summary>
    private void Take()
    {
        if (!_gathered.HasRoot)
            return;
        try
        {
            _header.Take(_gathered);
            DraftBuilder.AddElements(_gathered, _problems);
        }
        catch (StopReadingException)
        {
            _gathered.IsComplete = false;
        }
    }
}
