using System.Text.RegularExpressions;

namespace NetFault.Tests.Yaml;

/// <summary>docs/errors.md lists every problem that the catalogues know, once, with what to do.</summary>
public class ErrorsDocumentTests
{
    private static readonly string[] Catalogues = ["src/NetFault/Model/Checks/Problems.cs", "src/NetFault/Yaml/FileProblems.cs"];

    [Fact]
    public void Every_problem_of_the_catalogues_is_documented() => Documented().Should().BeEquivalentTo(InCatalogues());

    [Fact]
    public void Every_problem_has_its_own_id() => InCatalogues().Should().OnlyHaveUniqueItems();

    [Fact]
    public void Every_problem_says_when_it_comes_and_what_to_do()
    {
        var rows = File.ReadAllLines(TestFiles.Repository("docs/errors.md")).Where(line => line.StartsWith("| NF", StringComparison.Ordinal));
        rows.Where(row => row.Split('|') is not [_, _, { Length: > 5 }, _, { Length: > 5 }, _]).Should().BeEmpty();
    }

    /// <summary>Problems that only a program can make, or that a snapshot would have to be too large for.</summary>
    [Fact]
    public void Every_problem_of_a_file_has_a_snapshot()
    {
        var shown = Directory.GetFiles(TestFiles.Folder("invalid"), "*.txt").SelectMany(path => Ids(File.ReadAllText(path), "(?:error|warning) (NF[0-9]{3}): ")).Distinct();
        InCatalogues().Except(shown).Should().BeEquivalentTo("NF004", "NF013", "NF201", "NF221");
    }

    private static IEnumerable<string> Documented() => Ids(File.ReadAllText(TestFiles.Repository("docs/errors.md")), @"\n\| (NF[0-9]{3}) \|");

    private static IReadOnlyList<string> InCatalogues() =>
        [.. Catalogues.SelectMany(path => Ids(File.ReadAllText(TestFiles.Repository(path)), "new\\(\"(NF[0-9]{3})\""))];

    private static IEnumerable<string> Ids(string text, string pattern) =>
        Regex.Matches(text, pattern).Select(one => one.Groups[1].Value);
}
