namespace NetFault.Tests.Yaml;

/// <summary>docs/network-file.md explains every key of every section, and its examples read.</summary>
public class FileDocumentTests
{
    private static readonly string Document = File.ReadAllText(TestFiles.Repository("docs/network-file.md"));

    [Fact]
    public void Every_section_and_key_is_explained()
    {
        var missing = AllSections.InOrder.SelectMany(section => section.Keys.Names
            .Where(key => key is not ("in_service" or "note") && !Part(section.Name).Contains($"`{key}`"))
            .Select(key => $"{section.Name}.{key}"));
        missing.Should().BeEmpty();
        FileHeader.Keys.Names.Where(key => !Part("The head").Contains($"`{key}`")).Should().BeEmpty();
    }

    [Fact]
    public void The_first_example_reads()
    {
        var start = Document.IndexOf("```yaml", StringComparison.Ordinal) + 8;
        var text = Document.Substring(start, Document.IndexOf("```", start, StringComparison.Ordinal) - start);
        NetworkFile.Parse(text).Lines.Should().ContainSingle();
    }

    [Fact]
    public void The_example_of_docs_errors_is_what_the_library_says()
    {
        const string text = "netfault: 1\nfrequency_hz: 50\n\nbuses:\n  GRID: {nominal_kv: 110}\n  MV-A: {nominal_kv: 11}\n  MV-B: {nominal_kv: 11}\n\n" +
            "network_feeders:\n  Utility: {bus: GRID, short_circuit_mva: 3500, x_over_r: 12}\n\ntransformers:\n" +
            "  T1: {hv: GRID, lv: MV-A, rated_mva: 25 MVA, rated_kv: {hv: 110, lv: 11}, short_circuit_voltage_percent: 10, x_over_r: 25}\n\n" +
            "lines:\n  C1: {from: MV-A, to: MV-D, ohm: {r: 0.1, x: 0.2}}\n";
        var thrown = ((Action)(() => NetworkFile.Parse(text, "plant.yaml"))).Should().Throw<NetworkFileException>().Which;
        File.ReadAllText(TestFiles.Repository("docs/errors.md")).Should().Contain("```text\n" + thrown.Message + "\n```");
    }

    private static string Part(string heading)
    {
        var start = Document.IndexOf("\n## " + heading, StringComparison.Ordinal);
        start.Should().BePositive(heading);
        var end = Document.IndexOf("\n## ", start + 4, StringComparison.Ordinal);
        return Document.Substring(start, end - start);
    }
}
