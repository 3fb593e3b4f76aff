namespace NetFault;

/// <summary>The checks that a network passes before it is one, the same for a file and for a builder.</summary>
internal static class NetworkCheck
{
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
            check.Run(element, reportedKeys?.Invoke(element));
        }
        return found;
    }

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
