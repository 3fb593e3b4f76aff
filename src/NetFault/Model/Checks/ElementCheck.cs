namespace NetFault;

/// <summary>
/// What an element's <see cref="NetworkElement.Check"/> speaks to: simple rules on one key or a few. A key that the reader has already
/// complained about is passed over, so that one mistake is reported once.
/// </summary>
internal sealed class ElementCheck
{
    private readonly List<Diagnostic> _found;

    /// <summary>How many letters may still be compared for suggestions; about a second's work in all.</summary>
    private long _comparisons = 200_000_000;
    private NetworkElement _element;
    private IReadOnlyCollection<string>? _reported;
    private Dictionary<string, List<string>>? _idsByBus;

    public ElementCheck(NetworkDraft draft, List<Diagnostic> found, NetworkElement first)
    {
        Draft = draft;
        _found = found;
        _element = first;
    }

    /// <summary>The network that is being checked.</summary>
    public NetworkDraft Draft { get; }

    /// <summary>Runs the rules of one element.</summary>
    public void Run(NetworkElement element, IReadOnlyCollection<string>? reportedKeys)
    {
        _element = element;
        _reported = reportedKeys;
        element.Check(this);
    }

    /// <summary>Reports a problem of a key; of the element as a whole where the key is null.</summary>
    public void Say(string? key, Problem problem)
    {
        if (!IsReported(key))
            _found.Add(problem.At(_element.Section, _element.Id, key));
    }

    public void Positive(string key, double? value)
    {
        if (Finite(key, value) && value <= 0)
            Say(key, Problems.NotPositive(value.GetValueOrDefault()));
    }

    public void NotNegative(string key, double? value)
    {
        if (Finite(key, value) && value < 0)
            Say(key, Problems.Negative(value.GetValueOrDefault()));
    }

    public void WithinPercent(string key, double? value)
    {
        if (Finite(key, value) && value is < 0 or > 100)
            Say(key, Problems.OutsidePercent(value.GetValueOrDefault()));
    }

    public void Within(string key, double? value, double low, double high)
    {
        if (Finite(key, value) && (value < low || value > high))
            Say(key, Problems.OutsideRange(value.GetValueOrDefault(), low, high));
    }

    public void AboveZeroUpToOne(string key, double? value)
    {
        if (Finite(key, value) && value is <= 0 or > 1)
            Say(key, Problems.NotAFraction(value.GetValueOrDefault()));
    }

    public void AtLeastOne(string key, int? value)
    {
        if (value < 1)
            Say(key, Problems.LessThanOne(value.GetValueOrDefault()));
    }

    public void OneOf<T>(string key, T value, string allowed) where T : struct, Enum
    {
        if (!Enum.IsDefined(typeof(T), value))
            Say(key, Problems.NotOneOf(value, allowed));
    }

    public void NotAbove(string key, double? value, string otherKey, double? other)
    {
        if (value > other && !IsReported(otherKey))
            Say(key, Problems.Above(value.GetValueOrDefault(), otherKey, other.GetValueOrDefault()));
    }

    /// <summary>Warns of a value outside what is common; what is impossible is left to the other rules.</summary>
    public void Unusual(string key, double value, double low, double high, string unit)
    {
        if (value > 0 && (value < low || value > high) && !double.IsInfinity(value))
            Say(key, Problems.UnusualValue(value, low, high, unit));
    }

    /// <summary>
    /// Warns of an impedance above 100 percent: it does not exist in a real winding, but in data that was converted from per-unit values on
    /// a nominal rated power it does.
    /// </summary>
    public void UnusualPercent(string key, double? value) => Unusual(key, value ?? 0, 0.1, 100, "percent of the rated values");

    public void PositiveMaxMin(string key, MaxMin? value)
    {
        if (value is not { } pair)
            return;
        Positive(pair.Min is null ? key : key + ".max", pair.Max);
        Positive(key + ".min", pair.Min);
        if (pair.Min > pair.Max)
            Say(key + ".min", Problems.MinimumAboveMaximum(pair.Min.GetValueOrDefault(), pair.Max));
    }

    public void ReactanceRatio(double? xOverR, double? rOverX)
    {
        Positive("x_over_r", xOverR);
        NotNegative("r_over_x", rOverX);
    }

    public void SeriesImpedance(string key, Impedance? impedance)
    {
        if (impedance is not { } z)
            return;
        NotNegative(key + ".r", z.R);
        Finite(key + ".x", z.X);
        if (z is { R: 0, X: 0 } && !IsReported(key + ".r") && !IsReported(key + ".x"))
            Say(key, Problems.NoImpedance());
    }

    public void Needed(string key, double? value, string reason)
    {
        if (value is null)
            Say(key, Problems.NeededFor(reason));
    }

    public void ExactlyOne(params ReadOnlySpan<(string Key, bool Given)> forms)
    {
        if (FirstGiven(forms) is null)
            Say(null, Problems.NoForm(string.Join(", ", forms.ToArray().Select(form => form.Key))));
        else
            AtMostOne(forms);
    }

    public void AtMostOne(params ReadOnlySpan<(string Key, bool Given)> forms)
    {
        var first = FirstGiven(forms);
        foreach (var (key, given) in forms)
        {
            if (given && first != key)
                Say(key, Problems.BothForms(first!, key));
        }
    }

    /// <summary>The first of the forms that stands, well or badly.</summary>
    private string? FirstGiven(ReadOnlySpan<(string Key, bool Given)> forms)
    {
        foreach (var (key, given) in forms)
        {
            if (given || IsReported(key))
                return key;
        }
        return null;
    }

    public void RatedVoltage(string key, double? ratedKv, string? bus)
    {
        Positive(key, ratedKv);
        if (ratedKv is { } rated && bus is not null && Draft.FindBus(bus) is { NominalKv: > 0 } at && OffByMoreThan(1.3, rated, at.NominalKv))
            Say(key, Problems.RatedVoltageFarOff(rated, bus, at.NominalKv));
    }

    /// <summary>
    /// The rated voltage of a device: anything above the nominal voltage is ordinary (12 kV in an 11 kV network, 690 V in one of 400 V),
    /// anything below it is not.
    /// </summary>
    public void DeviceVoltage(string key, double? ratedKv, string? bus)
    {
        Positive(key, ratedKv);
        if (ratedKv is > 0 and var rated && Draft.FindBus(bus) is { } at && rated < at.NominalKv)
            Say(key, Problems.RatedVoltageBelow(rated, bus!, at.NominalKv));
    }

    /// <summary>What carries a short circuit: its peak, and its heat for a time.</summary>
    public void Withstand(double? peakKa, double? shortTimeKa, double? durationSeconds)
    {
        Positive("peak_withstand_current_ka", peakKa);
        Positive("short_time_withstand_current_ka", shortTimeKa);
        NotAbove("short_time_withstand_current_ka", shortTimeKa, "peak_withstand_current_ka", peakKa);
        Within("short_time_duration_s", durationSeconds, 0.01, 10.0);
    }

    public void HighVoltageFirst(string hvKey, double hvKv, string lvKey, double lvKv)
    {
        if (hvKv < lvKv && !IsReported(lvKey))
            Say(hvKey, Problems.WindingsSwapped(hvKv, lvKv));
    }

    public void BusReference(string key, string? bus)
    {
        if (bus is null)
        {
            Say(key, Problems.NoReference("bus"));
            return;
        }
        if (!Draft.HasBus(bus) && Draft.BusIds.Count > 0)
            Say(key, Problems.UnknownBus(bus, Nearest(bus, Draft.BusIds)));
    }

    public void TransformerReference(string key, string id, string bus)
    {
        if (!Draft.Declares("transformers", id))
            Say(key, Problems.UnknownTransformer(id, Nearest(id, Draft.IdsOf("transformers"))));
        else if (Draft.HasBus(bus) && Draft.Find("transformers", id) is Transformer transformer && !IsAt(transformer, bus))
            Say(key, Problems.UnitTransformerElsewhere(id, bus));
    }

    /// <summary>Whether a winding is at a bus, or behind one coupler from it: a generator breaker.</summary>
    private bool IsAt(Transformer transformer, string bus)
    {
        if (transformer.Hv == bus || transformer.Lv == bus)
            return true;
        foreach (var coupler in Draft.Elements.OfType<BusCoupler>())
        {
            if (coupler.From != bus && coupler.To != bus)
                continue;
            var other = coupler.From == bus ? coupler.To : coupler.From;
            if (transformer.Hv == other || transformer.Lv == other)
                return true;
        }
        return false;
    }

    public void DifferentBuses(string oneKey, string one, string otherKey, string other)
    {
        if (one == other && !IsReported(oneKey))
            Say(otherKey, Problems.SameBus(one));
    }

    public void SameNominalVoltage(string from, string to, bool perUnit)
    {
        if (Draft.FindBus(from) is not { NominalKv: > 0 } one || Draft.FindBus(to) is not { NominalKv: > 0 } other || one.NominalKv.Equals(other.NominalKv))
            return;
        Say(null, perUnit
            ? Problems.UnitRatio(from, one.NominalKv, to, other.NominalKv)
            : Problems.UnequalVoltages(from, one.NominalKv, to, other.NominalKv));
    }

    /// <summary>The nearest ids, as long as looking for them does not take too long: a file may have a thousand mistakes in a large network.</summary>
    public string? Nearest(string id, IReadOnlyCollection<string> known)
    {
        return MayCompare((long)known.Count * id.Length * id.Length) ? NearestNames.Suggestion(id, known) : null;
    }

    /// <summary>The ids of the elements that have a terminal at a bus; gathered when they are first asked for.</summary>
    public IReadOnlyList<string> IdsAt(string? bus) =>
        bus is not null && (_idsByBus ??= FedElements.IdsByBus(Draft)).TryGetValue(bus, out var ids) ? ids : [];

    /// <summary>Whether as many steps may still be spent on suggestions.</summary>
    public bool MayCompare(long steps)
    {
        _comparisons -= steps;
        return _comparisons >= 0;
    }

    /// <summary>Buses that a closed coupler makes one node have one voltage factor c.</summary>
    public void SameTolerance(string from, string to)
    {
        if (Draft.FindBus(from) is not { NominalKv: <= 1.0 } one || Draft.FindBus(to) is not { NominalKv: <= 1.0 } other)
            return;
        double oneTolerance = one.LowVoltageTolerancePercent ?? 10.0, otherTolerance = other.LowVoltageTolerancePercent ?? 10.0;
        if (!oneTolerance.Equals(otherTolerance))
            Say(null, Problems.UnequalTolerances(from, oneTolerance, to, otherTolerance));
    }

    private static bool OffByMoreThan(double factor, double one, double other) => one > factor * other || other > factor * one;

    private bool Finite(string key, double? value)
    {
        if (value is not { } number)
            return false;
        if (!double.IsNaN(number) && !double.IsInfinity(number))
            return true;
        Say(key, Problems.NotFinite(number));
        return false;
    }

    /// <summary>Whether the reader has complained about this key or about the mapping it stands in.</summary>
    public bool IsReported(string? key)
    {
        if (_reported is null || key is null)
            return false;
        var dot = key.IndexOf('.');
        return _reported.Contains(key) || (dot > 0 && _reported.Contains(key.Substring(0, dot)));
    }
}
