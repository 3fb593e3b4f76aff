using System.Globalization;

namespace NetFault;

/// <summary>The checks that a network passes before it is one, the same for a file and for a builder.</summary>
internal static class NetworkCheck
{
    /// <summary>The most characters an id may have.</summary>
    private const int LongestId = 200;

    /// <summary>All problems of a draft's elements, one by one.</summary>
    /// <param name="draft">The draft.</param>
    /// <param name="reportedKeys">The keys of an element that the reader has complained about; null where there is no reader.</param>
    public static List<Diagnostic> Elements(NetworkDraft draft, Func<NetworkElement, IReadOnlyCollection<string>?>? reportedKeys = null)
    {
        var found = new List<Diagnostic>();
        if (draft.Elements.Count == 0)
            return found;
        var check = new ElementCheck(draft, found, draft.Elements[0]);
        for (var i = 0; i < draft.Elements.Count; i++)
        {
            var element = draft.Elements[i];
            if (element.Id.Length == 0)
                found.Add(Problems.BlankId(element.Section).At(element.Section, null, null));
            else if (!IsLine(element.Id))
                found.Add(Problems.BadId(LongestId).At(element.Section, element.Id, null));
            check.Run(element, reportedKeys?.Invoke(element));
        }
        return found;
    }

    /// <summary>Whether an id can stand in one cell of a table: not too long, and nothing in it that breaks the line or cannot be seen.</summary>
    private static bool IsLine(string id)
    {
        for (var i = 0; i < id.Length; i++)
        {
            if (char.IsHighSurrogate(id[i]) && i + 1 < id.Length && char.IsLowSurrogate(id[i + 1]))
                i++;
            else if (!IsSeen(id[i]))
                return false;
        }
        return id.Length <= LongestId && id.Trim().Length > 0;
    }

    private static bool IsSeen(char one) => one == ' ' || CharUnicodeInfo.GetUnicodeCategory(one) is not (UnicodeCategory.Control
        or UnicodeCategory.Format or UnicodeCategory.Surrogate or UnicodeCategory.OtherNotAssigned or UnicodeCategory.LineSeparator
        or UnicodeCategory.ParagraphSeparator or UnicodeCategory.SpaceSeparator);

    /// <summary>The problems of the values that belong to the network as a whole.</summary>
    public static IEnumerable<Diagnostic> Header(NetworkDraft draft)
    {
        if (double.IsNaN(draft.FrequencyHz) || draft.FrequencyHz <= 0 || draft.FrequencyHz > 1000)
            yield return Problems.OutOfFrequency(draft.FrequencyHz).At(null, null, "frequency_hz");
        else if (draft.FrequencyHz is not (50.0 or 60.0))
            yield return Problems.UnusualFrequency(draft.FrequencyHz).At(null, null, "frequency_hz");
        if (double.IsNaN(draft.BaseMva) || double.IsInfinity(draft.BaseMva))
            yield return Problems.NotFinite(draft.BaseMva).At(null, null, "base_mva");
        else if (draft.BaseMva <= 0)
            yield return Problems.NotPositive(draft.BaseMva).At(null, null, "base_mva");
    }

    /// <summary>The problems of the network's graph: no source at all, buses without a path to one. For drafts without errors.</summary>
    public static IEnumerable<Diagnostic> Connections(Network network)
    {
        var topology = network.Topology;
        if (!topology.HasSource)
        {
            yield return Problems.NoSource().At(null, null, null);
            yield break;
        }
        for (var bus = 0; bus < network.Buses.Count; bus++)
        {
            if (!topology.IsEnergised(bus) && network.Buses[bus].InService)
                yield return Problems.DeEnergised().At("buses", network.Buses[bus].Id, null);
        }
    }
}
