namespace NetFault.Tests.Yaml;

public class IdTests
{
    [Theory]
    [InlineData("1")]
    [InlineData("01")]
    [InlineData("1.0")]
    [InlineData("1e3")]
    [InlineData("no")]
    [InlineData("yes")]
    [InlineData("null")]
    [InlineData("true")]
    [InlineData("0x1F")]
    [InlineData("12:30")]
    [InlineData("2026-01-01")]
    [InlineData("MV switchboard (north)")]
    [InlineData("'~'", "~")]
    [InlineData("\"a: b\"", "a: b")]
    [InlineData("'#1'", "#1")]
    [InlineData("Łódź-Ω")]
    public void An_id_is_text_and_stays_what_it_is(string written, string? id = null)
    {
        id ??= written;
        var network = NetworkFile.Parse(
            $"netfault: 1\nfrequency_hz: 50\nbuses:\n  {written}: {{nominal_kv: 11}}\nnetwork_feeders:\n  Q: {{bus: {written}, short_circuit_ka: 5, x_over_r: 10}}\n");
        network.Buses.Should().ContainSingle().Which.Id.Should().Be(id);
        network.NetworkFeeders[0].Bus.Should().Be(id);
        NetworkFile.Parse(NetworkFile.ToText(network)).Elements.Should().Equal(network.Elements);
    }

    [Fact]
    public void Ids_that_a_program_might_take_for_one_number_stay_apart()
    {
        var network = NetworkFile.Parse(
            "netfault: 1\nfrequency_hz: 50\nbuses:\n  1: {nominal_kv: 11}\n  01: {nominal_kv: 11}\n  1.0: {nominal_kv: 11}\n" +
            "network_feeders:\n  1: {bus: 01, short_circuit_ka: 5, x_over_r: 10}\n");
        network.Buses.Select(bus => bus.Id).Should().Equal("1", "01", "1.0");
        network.NetworkFeeders[0].Bus.Should().Be("01");
    }
}
