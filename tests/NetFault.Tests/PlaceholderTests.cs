namespace NetFault.Tests;
public class PlaceholderTests
{
    [Fact]
    public void A_plant_builds()
    {
        var n = new NetworkBuilder { FrequencyHz = 50 }.Add(
            new Bus { Id = "A", NominalKv = 11 }, new Bus { Id = "B", NominalKv = 11 }, new Bus { Id = "C", NominalKv = 11 },
            new NetworkFeeder { Id = "U", Bus = "A", ShortCircuitMva = new(500), XOverR = 10 },
            new BusCoupler { Id = "T", From = "A", To = "B", Closed = false }).Build();
        foreach (var w in n.Warnings) Console.WriteLine(w);
        n.Topology.NodeCount.Should().Be(3);
        n.WithCoupler("T", true).Topology.NodeCount.Should().Be(2);
        ((Action)(() => n.WithCoupler("t", true))).Should().Throw<UnknownIdException>().Which.NearestIds.Should().Equal("T");
    }
}
