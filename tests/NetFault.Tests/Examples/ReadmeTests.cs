using System.Text.RegularExpressions;

namespace NetFault.Tests.Examples;

/// <summary>What README.md shows is what runs.</summary>
public class ReadmeTests
{
    private static readonly string Readme = Repository.Text("README.md");

    [Fact]
    public void The_code_in_the_readme_is_the_code_that_this_test_runs()
    {
        var source = Repository.Text("tests/NetFault.Tests/Examples/ReadmeSample.cs");
        var marked = Regex.Match(source, "// <sample>\n(.*?)\n *// </sample>", RegexOptions.Singleline).Groups[1].Value;
        var unindented = string.Join("\n", marked.Split('\n').Select(line => line.Length > 8 ? line[8..] : ""));

        Block("csharp").Should().Be("using NetFault;\n\n" + unindented);
    }

    [Fact]
    public void The_output_in_the_readme_is_the_output_of_its_code()
    {
        var output = new StringWriter { NewLine = "\n" };
        ReadmeSample.Run(output, new ReadmeSample.FilesFromTheRoot());

        Block("text").Should().Be(output.ToString().TrimEnd());
    }

    [Fact]
    public void Every_file_that_the_readme_names_is_there()
    {
        var links = Regex.Matches(Readme, @"\]\(([^)#:]+)\)").Select(match => match.Groups[1].Value);
        var commands = Regex.Matches(Readme, @"\bexamples/[\w-]+\.(cs|yaml)\b").Select(match => match.Value);

        links.Concat(commands).Distinct().Where(name => !Exists(Repository.PathOf(name))).Should().BeEmpty();
    }

    private static bool Exists(string path) => File.Exists(path) || Directory.Exists(path);

    private static string Block(string language) =>
        Regex.Match(Readme, $"```{language}\n(.*?)\n```", RegexOptions.Singleline).Groups[1].Value;
}
