namespace NetFault;

/// <summary>
/// Builds a <see cref="Network"/> by program, with the same checks as the network file. Problems are named by the file's keys:
/// <c>RatedMva</c> is <c>rated_mva</c>. Not for use from several threads.
/// </summary>
public sealed class NetworkBuilder
{
    private readonly List<NetworkElement> _elements = [];

    /// <summary>A title for people.</summary>
    public string? Title { get; set; }

    /// <summary>The rated frequency in Hz, above 0; must be set.</summary>
    public double FrequencyHz { get; set; } = double.NaN;

    /// <summary>The base power of per-unit values in MVA, greater than 0. Default 100.</summary>
    public double BaseMva { get; set; } = 100;

    /// <summary>Adds elements. A second one of the same section and id is a problem that <see cref="Build"/> reports.</summary>
    /// <returns>This builder.</returns>
    /// <exception cref="ArgumentNullException">An element is null.</exception>
    public NetworkBuilder Add(params NetworkElement[] elements)
    {
        foreach (var element in Guard.NotNull(elements))
            _elements.Add(Guard.NotNull(element, nameof(elements)));
        return this;
    }

    /// <summary>Puts elements in the place of those of the same section and id, and adds those that are new.</summary>
    /// <returns>This builder.</returns>
    /// <exception cref="ArgumentNullException">An element is null.</exception>
    public NetworkBuilder Set(params NetworkElement[] elements)
    {
        var places = new Dictionary<(string Section, string? Id), int>();
        for (var i = _elements.Count - 1; i >= 0; i--)
            places[(_elements[i].Section, _elements[i].Id)] = i;
        foreach (var element in Guard.NotNull(elements))
        {
            if (places.TryGetValue((Guard.NotNull(element, nameof(elements)).Section, element.Id), out var at))
            {
                _elements[at] = element;
                continue;
            }
            places.Add((element.Section, element.Id), _elements.Count);
            _elements.Add(element);
        }
        return this;
    }

    /// <summary>Checks everything and makes the network.</summary>
    /// <exception cref="InvalidNetworkException">Something is wrong; the exception lists every problem.</exception>
    public Network Build()
    {
        var draft = new NetworkDraft { Title = Title, FrequencyHz = FrequencyHz, BaseMva = BaseMva };
        var found = new List<Diagnostic>();
        foreach (var element in _elements)
        {
            if (element.Id is null)
                found.Add(Problems.BlankId(element.Section).At(element.Section, null, null));
            else if (!draft.Add(element))
                found.Add(Problems.DuplicateId(element.Section, element.Id).At(element.Section, element.Id, null));
        }
        var network = Complete(draft, found, reportedKeys: null);
        return network ?? throw new InvalidNetworkException(found);
    }

    /// <summary>The last steps, the same for builder and reader: all checks, then the network where there is no error.</summary>
    /// <param name="draft">What was gathered.</param>
    /// <param name="found">The problems so far; those found here are added.</param>
    /// <param name="reportedKeys">Keys of an element about which there is a problem already.</param>
    internal static Network? Complete(
        NetworkDraft draft, List<Diagnostic> found, Func<NetworkElement, IReadOnlyCollection<string>?>? reportedKeys)
    {
        found.AddRange(NetworkCheck.Header(draft));
        if (!draft.BusIds.Any())
            found.Add(Problems.NoBuses().At(null, null, "buses"));
        found.AddRange(NetworkCheck.Elements(draft, reportedKeys));
        if (found.Exists(one => one.Severity == DiagnosticSeverity.Error))
            return null;
        var network = new Network(draft);
        found.AddRange(NetworkCheck.Connections(network));
        if (found.Exists(one => one.Severity == DiagnosticSeverity.Error))
            return null;
        network.Warnings = found.AsReadOnly();
        return network;
    }
}
