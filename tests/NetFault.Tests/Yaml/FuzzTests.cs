using System.Text;
using CsCheck;

namespace NetFault.Tests.Yaml;

/// <summary>Damaged files: whatever happens to the text, the answer is a network or problems with places, never another exception.</summary>
public class FuzzTests
{
    private const string Marks = "{}[]:,-?&*!|>'\"%@`#~ \t\n\r\\.0123456789eE_\u0000\u0085\u2028\uFEFF\uD800abcdefgx";

    private static readonly string[] Texts =
        [.. new[] { "every-key.yaml", "iec-tr-60909-4-test-network.yaml" }.Select(name => File.ReadAllText(Path.Combine(TestFiles.Folder("valid"), name)))];

    private static readonly Gen<string> Damaged =
        from text in Gen.Int[0, Texts.Length - 1].Select(i => Texts[i])
        from edits in Gen.Select(Gen.Int[0, 5], Gen.Int[0, 100_000], Gen.Int[0, 100_000], Gen.Int[0, Marks.Length - 1]).Array[1, 6]
        select edits.Aggregate(text, Damage);

    [Fact]
    public void A_damaged_text_gives_a_network_or_problems_with_places() => Damaged.Sample(IsAnswered, iter: 3_000);

    [Fact]
    public void Damaged_bytes_give_a_network_or_problems_with_places() =>
        Gen.Select(Gen.Int[0, 100_000], Gen.Byte).Array[1, 4].Sample(
            edits =>
            {
                var bytes = Encoding.UTF8.GetBytes(Texts[0]);
                foreach (var (at, value) in edits)
                    bytes[at % bytes.Length] = value;
                using var stream = new MemoryStream(bytes);
                return HasPlaces(NetworkFile.Check(stream));
            },
            iter: 1_000);

    private static bool IsAnswered(string text)
    {
        var result = NetworkFile.CheckText(text);
        if (result.Network is null)
            ((Action)(() => NetworkFile.Parse(text))).Should().Throw<NetworkFileException>();
        return HasPlaces(result);
    }

    private static bool HasPlaces(NetworkFileResult result)
    {
        foreach (var one in result.Diagnostics)
        {
            one.Location.Should().NotBeNull();
            one.ToString().Should().NotBeEmpty();
        }
        return result.Network is not null != result.Diagnostics.Any(one => one.Severity == DiagnosticSeverity.Error);
    }

    private static string Damage(string text, (int Kind, int At, int Other, int Mark) edit)
    {
        if (text.Length == 0)
            return text;
        var at = edit.At % text.Length;
        var lines = text.Split('\n');
        return edit.Kind switch
        {
            0 => text.Remove(at, 1),
            1 => text.Insert(at, Marks[edit.Mark].ToString()),
            2 => text.Remove(at, 1).Insert(at, Marks[edit.Mark].ToString()),
            3 => string.Join("\n", lines.Where((_, i) => i != edit.At % lines.Length)),
            4 => string.Join("\n", lines.Take(edit.At % lines.Length).Append(lines[edit.Other % lines.Length]).Concat(lines.Skip(edit.At % lines.Length))),
            _ => text.Substring(0, at),
        };
    }
}
