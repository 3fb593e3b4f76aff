namespace NetFault;

/// <summary>Finds the element that a device at a terminal connects with its bus.</summary>
internal static class FedElements
{
    /// <summary>The sections of those elements: all that have terminals.</summary>
    public static readonly string[] Sections =
    [
        "network_feeders", "synchronous_machines", "asynchronous_motors", "converter_fed_drives", "full_converter_sources",
        "doubly_fed_generators",
        "transformers", "three_winding_transformers", "lines", "series_reactors", "series_capacitors", "bus_couplers",
    ];

    /// <summary>The elements of an id, in one section or in all; null for one that is declared but could not be read.</summary>
    public static IEnumerable<NetworkElement?> Named(NetworkDraft draft, string id, string? section) =>
        Sections.Where(one => (section is null || one == section) && draft.Declares(one, id)).Select(one => draft.Find(one, id));

    /// <summary>The ids of the elements that have a terminal at each bus, in the order of the network.</summary>
    public static Dictionary<string, List<string>> IdsByBus(NetworkDraft draft)
    {
        var byBus = new Dictionary<string, List<string>>(StringComparer.Ordinal);
        var seen = new HashSet<(string Bus, string Id)>();
        foreach (var element in draft.Elements)
        {
            foreach (var bus in element.Terminals)
            {
                if (bus is null || !seen.Add((bus, element.Id)))
                    continue;
                if (!byBus.TryGetValue(bus, out var ids))
                    byBus.Add(bus, ids = []);
                ids.Add(element.Id);
            }
        }
        return byBus;
    }

    /// <summary>Reports a device that names no element, one at another bus, or two at once.</summary>
    public static void Check(TerminalDevice device, ElementCheck check)
    {
        if (device.FeedsSection is { } section && !Sections.Contains(section))
            check.Say("feeds_section", Problems.NotOneOf(section, "the section of a branch, source or coupler, such as lines"));
        else if (device.Feeds is null)
            check.Say("feeds", Problems.NoReference("element"));
        else if (!check.IsReported("feeds") && !check.IsReported("feeds_section"))
            CheckNamed(device, Named(check.Draft, device.Feeds, device.FeedsSection).ToList(), check);
    }

    private static void CheckNamed(TerminalDevice device, List<NetworkElement?> named, ElementCheck check)
    {
        if (named.Count == 0)
        {
            check.Say("feeds", Problems.UnknownFed(device.Feeds, device.FeedsSection, Nearest(device, check)));
            return;
        }
        // What is wrong with the bus or the element has been said where it stands.
        if (!check.Draft.HasBus(device.Bus) || named.Exists(one => one is null || !IsWhole(one, check.Draft)))
            return;
        var here = named.Where(one => one!.Terminals.Contains(device.Bus)).ToList();
        if (here.Count == 0)
            check.Say("feeds", Elsewhere(device, named[0]!, check));
        else if (here.Count > 1)
            check.Say("feeds", Problems.SeveralFed(device.Feeds, device.Bus, string.Join(" and in ", here.Select(one => one!.Section))));
    }

    private static bool IsWhole(NetworkElement element, NetworkDraft draft) =>
        element.Terminals.All(bus => bus is null || draft.HasBus(bus));

    /// <summary>The nearest ids: of elements at the device's bus, else of all.</summary>
    private static string? Nearest(TerminalDevice device, ElementCheck check)
    {
        if (check.Nearest(device.Feeds, check.IdsAt(device.Bus)) is { } here)
            return here;
        var sections = Sections.Where(one => device.FeedsSection is null || one == device.FeedsSection).ToList();
        return check.MayCompare(sections.Sum(one => check.Draft.IdsOf(one).Count))
            ? check.Nearest(device.Feeds, sections.SelectMany(check.Draft.IdsOf).Distinct().ToList())
            : null;
    }

    private static Problem Elsewhere(TerminalDevice device, NetworkElement named, ElementCheck check)
    {
        var ends = string.Join(" and ", named.Terminals.Where(bus => bus is not null).Select(bus => $"\"{Problems.Shown(bus!)}\""));
        return Problems.NotAtBus(named.Section, named.Id, ends, device.Bus, Choices(device, check));
    }

    /// <summary>What a device at its bus can feed: all of it, or the nearest ids, or the first few.</summary>
    private static string Choices(TerminalDevice device, ElementCheck check)
    {
        const int most = 5;
        var ids = check.IdsAt(device.Bus);
        if (ids.Count == 0)
            return "nothing is connected to this bus";
        var first = "connected there: " + string.Join(", ", ids.Take(most).Select(id => $"\"{Problems.Shown(id)}\""));
        return ids.Count <= most
            ? first
            : check.Nearest(device.Feeds, ids) ?? FormattableString.Invariant($"{first} and {ids.Count - most} more");
    }
}
