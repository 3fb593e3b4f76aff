using YamlDotNet.Core.Events;

namespace NetFault;

/// <summary>Reads the elements of a section into the draft.</summary>
internal sealed class SectionReader
{
    private readonly EventReader _events;
    private readonly ProblemList _problems;
    private readonly GatheredFile _gathered;
    private readonly ElementReader _element;

    public SectionReader(EventReader events, ProblemList problems, GatheredFile gathered)
    {
        _events = events;
        _problems = problems;
        _gathered = gathered;
        _element = new ElementReader(events, problems);
    }

    /// <summary>Reads the section whose value the current event starts.</summary>
    public void Read(Section section, int keyOffset, int keyLength)
    {
        if (_events.Current is MappingStart)
        {
            while (_events.Next() is not MappingEnd)
            {
                if (_events.Current is Scalar id)
                    ReadElement(section, id);
                else
                    _events.PassKeyWithoutText(section.Name, null);
            }
            return;
        }
        _gathered.ReportedTopLevel.Add(section.Name);
        var kind = ElementReader.KindOf(_events.Current);
        _events.SkipValue();
        if (kind != FieldKind.Refused)
            _problems.Add(NoElements(kind, section.Shape).At(section.Name, null, null), keyOffset, keyLength);
    }

    private void ReadElement(Section section, Scalar id)
    {
        var (offset, length) = (EventReader.Offset(id), EventReader.Length(id));
        var place = _gathered.Places.AddElement(section.Name, id.Value, offset, length);
        _element.Start(section.Name, id.Value, offset, length);
        if (_events.Next() is MappingStart)
        {
            _element.Fill(section.Keys);
            Add(section.Read(_element.Root), place);
            _element.Remember(_gathered.Places);
            return;
        }
        var kind = ElementReader.KindOf(_events.Current);
        _events.SkipValue();
        _gathered.Draft.Declare(section.Name, id.Value);
        if (kind != FieldKind.Refused)
            _problems.Add(NoKeys(kind, section.Shape).At(section.Name, id.Value, null), offset, length);
    }

    private void Add(NetworkElement element, int place)
    {
        if (!_gathered.Draft.Add(element))
            _gathered.Duplicates.Add((element, place));
        if (_element.Reported is { } reported)
            _gathered.AddReported(element, reported);
    }

    private static Problem NoElements(FieldKind kind, string shape) => kind == FieldKind.Blank
        ? FileProblems.Blank("a mapping of ids to elements")
        : FileProblems.MappingNeeded(FileProblems.KindName(kind), "a mapping of ids to elements, such as id: " + shape);

    private static Problem NoKeys(FieldKind kind, string shape) => kind == FieldKind.Blank
        ? FileProblems.Blank("a mapping such as " + shape)
        : FileProblems.MappingNeeded(FileProblems.KindName(kind), "a mapping such as " + shape);
}
