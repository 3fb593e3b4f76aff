using YamlDotNet.Core.Events;

namespace NetFault;

/// <summary>Reads the elements of a section into the table.</summary>
internal sealed class SectionReader
{
    private readonly EventReader _events;
    private readonly ProblemList _problems;
    private readonly GatheredFile _gathered;
    private readonly MappingReader _mapping;

    public SectionReader(EventReader events, ProblemList problems, GatheredFile gathered)
    {
        _events = events;
        _problems = problems;
        _gathered = gathered;
        _mapping = new MappingReader(events, problems, gathered.Elements.Fields, AllSections.InOrder[0].Keys);
    }

    /// <summary>Reads the section whose value the current event starts.</summary>
    public void Read(Section section, int keyOffset, int keyLength)
    {
        if (_events.Current is MappingStart)
        {
            var index = AllSections.IndexOf(section.Name);
            while (_events.Next() is not MappingEnd)
            {
                if (_events.Current is Scalar id)
                    ReadElement(section, index, id);
                else
                    _events.PassKeyWithoutText(section.Name, null);
            }
            return;
        }
        _gathered.ReportedTopLevel.Add(section.Name);
        var kind = Field.KindOf(_events.Current);
        _events.SkipValue();
        if (kind != FieldKind.Refused)
            _problems.Add(NoElements(kind, section.Shape).At(section.Name, null, null), keyOffset, keyLength);
    }

    private void ReadElement(Section section, int index, Scalar id)
    {
        var fields = _gathered.Elements.Fields;
        var first = fields.Count;
        var kind = Field.KindOf(_events.Next());
        _mapping.Start(section, id.Value);
        if (kind == FieldKind.Mapping)
            _mapping.ReadAll();
        else
            _events.SkipValue();
        var entry = new ElementEntry(index, EventReader.Offset(id), EventReader.Length(id), kind, first, fields.Count);
        _gathered.Elements.Add(entry, id.Value, _mapping.Mistyped());
    }

    private static Problem NoElements(FieldKind kind, string shape) => kind == FieldKind.Blank
        ? FileProblems.Blank("a mapping of ids to elements")
        : FileProblems.MappingNeeded(FileProblems.KindName(kind), "a mapping of ids to elements, such as id: " + shape);
}
