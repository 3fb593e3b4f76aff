using System.Text;

namespace NetFault.Tests.Yaml;

/// <summary>Files that nobody writes by hand: no time, memory or stack without bound, and still an answer.</summary>
public class HostileInputTests
{
    private const string Head = "netfault: 1\nfrequency_hz: 50\n";

    [Theory]
    [InlineData("[")]
    [InlineData("{a: ")]
    [InlineData("- ")]
    [InlineData("? ")]
    public void Deep_nesting_is_refused_without_recursion(string opening)
    {
        var text = Head + "buses: " + string.Concat(Enumerable.Repeat(opening, 200_000));
        NetworkFile.CheckText(text).Diagnostics.Should().NotBeEmpty().And.OnlyContain(one => one.Severity == DiagnosticSeverity.Error);
    }

    [Fact]
    public void A_hundred_thousand_problems_are_cut_off_and_the_message_is_short()
    {
        var text = new StringBuilder(Head).Append("buses:\n");
        for (var i = 0; i < 100_000; i++)
            text.Append("  B").Append(i).Append(": {nominal_kv: 11 kV}\n");
        var thrown = ((Action)(() => NetworkFile.Parse(text.ToString()))).Should().Throw<NetworkFileException>().Which;
        thrown.Diagnostics.Should().HaveCount(NetworkFile.MaximumProblems + 1);
        thrown.Diagnostics.Should().Contain(one => one.Id == "NF013");
        thrown.Message.Split("error NF").Should().HaveCount(51);
        thrown.Message.Should().EndWith("and 9951 more");
    }

    [Fact]
    public void A_thousand_dangling_references_in_a_large_network_are_found_soon()
    {
        var text = new StringBuilder(Head).Append("buses:\n");
        for (var i = 0; i < 20_000; i++)
            text.Append("  Busbar-").Append(i).Append(": {nominal_kv: 11}\n");
        text.Append("lines:\n");
        for (var i = 0; i < 5_000; i++)
            text.Append("  L").Append(i).Append(": {from: Busbar-").Append(i).Append("x, to: Busbar-1, ohm: {r: 1, x: 1}}\n");
        NetworkFile.CheckText(text.ToString()).Diagnostics.Where(one => one.Id == "NF301").Should().HaveCount(5_000);
    }

    [Fact]
    public void Problems_on_one_endless_line_share_its_text()
    {
        var text = Head + "buses: {" + string.Join(", ", Enumerable.Range(0, 5_000).Select(i => $"B{i}: {{nominal_kv: x}}")) + "}\n";
        var diagnostics = NetworkFile.CheckText(text).Diagnostics;
        diagnostics.Where(one => one.Id == "NF109").Should().HaveCount(5_000);
        diagnostics[1].Location!.LineText.Should().BeSameAs(diagnostics[2].Location!.LineText);
        diagnostics[1].ToString().Length.Should().BeLessThan(600);
    }

    [Fact]
    public void A_huge_value_is_shortened_in_the_message()
    {
        var text = Head + "buses:\n  A: {nominal_kv: " + new string('x', 1_000_000) + "}\n";
        NetworkFile.CheckText(text).Diagnostics.Should().Contain(one => one.Id == "NF109" && one.Message.Length < 200);
    }

    [Fact]
    public void A_file_beyond_the_limit_is_not_read()
    {
        using var stream = new MemoryStream(new byte[NetworkFile.MaximumBytes + 1]);
        NetworkFile.Check(stream).Diagnostics.Should().ContainSingle().Which.Id.Should().Be("NF004");
    }

    [Fact]
    public void An_id_cannot_paint_the_terminal()
    {
        var text = Head + "buses:\n  \"A\\e[31m\": {nominal_kv: 11}\n";
        var diagnostics = NetworkFile.CheckText(text).Diagnostics;
        diagnostics.Should().Contain(one => one.Id == "NF219");
        diagnostics.Should().OnlyContain(one => !one.ToString().Contains('\x1B'));
    }
}
