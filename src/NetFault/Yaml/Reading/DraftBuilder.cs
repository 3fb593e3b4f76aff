namespace NetFault;

/// <summary>
/// Makes the elements of what a file held. After the whole file was scanned, on purpose: elements that live on while the parser makes its
/// short-lived garbage cost more in the collector than in the making.
/// </summary>
internal static class DraftBuilder
{
    /// <summary>Adds all elements to the draft, and their problems to the list.</summary>
    /// <exception cref="StopReadingException">There are too many problems to go on.</exception>
    public static void AddElements(GatheredFile gathered, ProblemList problems)
    {
        var table = gathered.Elements;
        var fields = new ElementFields(problems, table.Fields) { SameText = gathered.Draft.SameText };
        for (var i = 0; i < AllSections.InOrder.Count; i++)
            gathered.Draft.Expect(AllSections.InOrder[i].Name, table.CountOf(i));
        for (var i = 0; i < table.Count; i++)
        {
            var entry = table[i];
            var section = AllSections.InOrder[entry.Section];
            var id = table.IdOf(i);
            if (entry.Kind != FieldKind.Mapping)
            {
                ReportNoKeys(section, id, entry, problems);
                gathered.Draft.Declare(section.Name, id);
                continue;
            }
            fields.Start(section.Name, id, table.PlaceOf(i), section.Keys, (entry.FirstField, entry.EndField), table.Mistyped(i));
            Add(section.Read(fields.Root), i, fields.Reported, gathered);
        }
    }

    private static void Add(NetworkElement element, int place, HashSet<string>? reported, GatheredFile gathered)
    {
        if (!gathered.Draft.Add(element))
            gathered.Duplicates.Add((element, place));
        if (reported is not null)
            gathered.AddReported(element, reported);
    }

    private static void ReportNoKeys(Section section, string id, ElementEntry entry, ProblemList problems)
    {
        if (entry.Kind == FieldKind.Refused)
            return;
        var problem = entry.Kind == FieldKind.Blank
            ? FileProblems.Blank("a mapping such as " + section.Shape)
            : FileProblems.MappingNeeded(FileProblems.KindName(entry.Kind), "a mapping such as " + section.Shape);
        problems.Add(problem.At(section.Name, id, null), entry.IdOffset, entry.IdLength);
    }
}
