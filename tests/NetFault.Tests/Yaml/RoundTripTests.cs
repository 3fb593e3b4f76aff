using System.Globalization;
using CsCheck;
using NetFault.Tests.Support;

namespace NetFault.Tests.Yaml;

/// <summary>A network written and read back is the same: elements, order, forms of data, notes, title.</summary>
public class RoundTripTests
{
    private static readonly string[] Awkward =
    [
        "null", "~", "yes", "1", " ", "", "a: b", "#", "- x", "'", "\"", "\\", "a\nb", "\r\n", "\t", "---", "{", "\u0085\u2028\uFEFF", "ünï 😀", "&a", "*a", "!x", "%", "@", "`",
    ];

    private static readonly Gen<double> Positive = Gen.OneOf(Gen.Double[1e-3, 1e4], Gen.Const(1e-20), Gen.Const(1.0 / 3), Gen.Const(1e21));

    private static readonly Gen<string> Texts = Gen.OneOf(
        Gen.Int[0, Awkward.Length - 1].Select(i => Awkward[i]),
        Gen.String[0, 40].Where(IsWhole));

    /// <summary>What NF219 lets through: something to be seen, and nothing that cannot be.</summary>
    private static readonly Gen<string> Ids = Texts.Where(text => text.Trim().Length > 0 && text.All(one => one == ' ' || char.IsSurrogate(one)
        || char.GetUnicodeCategory(one) is not (UnicodeCategory.Control or UnicodeCategory.Format or UnicodeCategory.OtherNotAssigned
            or UnicodeCategory.LineSeparator or UnicodeCategory.ParagraphSeparator or UnicodeCategory.SpaceSeparator)));

    [Fact]
    public void Generated_networks_come_back() =>
        RandomNetworks.Cases(60).Sample(
            one => SameNetworks.Compare(Back(RandomNetworks.Make(one.Seed, one.Buses, negativeReactances: true)), RandomNetworks.Make(one.Seed, one.Buses, negativeReactances: true)),
            iter: 100);

    [Fact]
    public void Any_text_and_number_comes_back() =>
        Gen.Select(Ids, Texts, Texts, Positive, Positive).Sample((id, note, title, one, other) =>
        {
            var network = Make(id, note, title, one, other);
            SameNetworks.Compare(Back(network), network);
        });

    [Fact]
    public void Half_a_character_is_not_written_in_silence()
    {
        var network = Make("A", "half \uD800", "t", 1, 1);
        ((Action)(() => NetworkFile.ToText(network))).Should().Throw<ArgumentException>().WithMessage("*surrogate*");
    }

    private static Network Back(Network network) => NetworkFile.Parse(NetworkFile.ToText(network));

    private static Network Make(string id, string note, string title, double one, double other) =>
        new NetworkBuilder { Title = title, FrequencyHz = 50, BaseMva = one }.Add(
            new Bus { Id = id, NominalKv = one, Note = note },
            new Bus { Id = id + "-2", NominalKv = one, InService = false },
            new NetworkFeeder { Id = id, Bus = id, ShortCircuitMva = new(one, one / 2), XOverR = other, Note = note },
            new Line { Id = id, From = id, To = id + "-2", Ohm = new(other, -one), Note = note },
            new BusCoupler { Id = id, From = id, To = id + "-2", Closed = one > other },
            new CircuitBreaker { Id = id, Bus = id + "-2", Feeds = id, FeedsSection = "lines", Standard = CircuitBreakerStandard.Iec62271_100, RatedKv = other, Note = note },
            new Switch { Id = id, Bus = id + "-2", Feeds = id, FeedsSection = "bus_couplers", PeakWithstandCurrentKa = one, Note = note },
            new Busbar { Id = id, Bus = id, PeakWithstandCurrentKa = one, ShortTimeWithstandCurrentKa = one / 2, Note = note },
            new Fuse { Id = id, Bus = id, Feeds = id, FeedsSection = "network_feeders", BreakingCapacityKa = other, Note = note }).Build();

    private static bool IsWhole(string text)
    {
        for (var i = 0; i < text.Length; i++)
        {
            if (char.IsHighSurrogate(text[i]) && i + 1 < text.Length && char.IsLowSurrogate(text[i + 1]))
                i++;
            else if (char.IsSurrogate(text[i]) || text[i] is '\uFFFE' or '\uFFFF')
                return false;
        }
        return true;
    }
}
