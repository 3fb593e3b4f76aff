namespace NetFault.Tests.Yaml;

public class InvalidFileTests
{
    public static IEnumerable<object[]> Files => TestFiles.Names("invalid");

    [Theory]
    [MemberData(nameof(Files))]
    public void A_bad_file_is_answered_word_for_word(string name)
    {
        var path = Path.Combine(TestFiles.Folder("invalid"), name);
        using var stream = File.OpenRead(path);
        var diagnostics = NetworkFile.Check(stream, name).Diagnostics;
        var expected = File.ReadAllText(Path.ChangeExtension(path, ".txt"));
        (string.Join("\n\n", diagnostics) + "\n").Should().Be(expected);
    }

    [Theory]
    [MemberData(nameof(Files))]
    public void Every_problem_has_a_place(string name)
    {
        var diagnostics = NetworkFile.Check(Path.Combine(TestFiles.Folder("invalid"), name)).Diagnostics;
        diagnostics.Should().NotBeEmpty();
        diagnostics.Should().OnlyContain(one => one.Location != null && one.Location.Line >= 1 && one.Location.Column >= 1 && one.Location.Length >= 1);
    }

    [Fact]
    public void Every_expected_text_has_its_file()
    {
        var texts = Directory.GetFiles(TestFiles.Folder("invalid"), "*.txt").Select(Path.GetFileNameWithoutExtension);
        texts.Should().BeEquivalentTo(TestFiles.Names("invalid").Select(one => Path.GetFileNameWithoutExtension((string)one[0])));
    }

    [Fact]
    public void The_exception_carries_all_problems_and_its_message_shows_them()
    {
        var path = Path.Combine(TestFiles.Folder("invalid"), "number-with-unit.yaml");
        var thrown = ((Action)(() => NetworkFile.Read(path))).Should().Throw<NetworkFileException>().Which;
        thrown.Diagnostics.Should().HaveCount(4).And.OnlyContain(one => one.Id == "NF110");
        thrown.Message.Should().StartWith("The network file ").And.Contain("(5,20): error NF110: buses B1, nominal_kv: \"11 kV\" is a number with a unit");
        thrown.Message.Should().Contain("buses B4");
    }

    [Fact]
    public void A_missing_file_is_not_a_problem_of_its_content() =>
        ((Action)(() => NetworkFile.Read("there-is-no-such-file.yaml"))).Should().Throw<FileNotFoundException>();

    [Fact]
    public void A_diagnostic_is_data()
    {
        var text = "netfault: 1\nfrequency_hz: 50\nbuses:\n  A: {nominal_kv: 11}\n  A: {nominal_kv: 10}\nnetwork_feeders:\n  Q: {bus: A, short_circuit_ka: 5, x_over_r: 10}\n";
        var one = NetworkFile.CheckText(text, "plant.yaml").Diagnostics.Should().ContainSingle().Which;
        one.Should().BeEquivalentTo(
            new { Id = "NF306", Severity = DiagnosticSeverity.Error, Section = "buses", ElementId = "A", Key = (string?)null });
        one.Location.Should().Be(new SourceLocation("plant.yaml", 5, 3, 1, "  A: {nominal_kv: 10}"));
        one.RelatedLocation.Should().Be(new SourceLocation("plant.yaml", 4, 3, 1, "  A: {nominal_kv: 11}"));
    }
}
