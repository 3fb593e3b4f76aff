using NetFault.Tests.Support;

namespace NetFault.Tests.Examples;

/// <summary>The networks in examples/ read as they stand and are what their comments say.</summary>
public class ExampleNetworkTests
{
    [Theory]
    [InlineData("examples/small-plant.yaml")]
    [InlineData("examples/industrial-plant.yaml")]
    public void An_example_network_has_no_errors_and_says_that_it_is_invented(string file)
    {
        NetworkFile.Check(Repository.PathOf(file)).Network.Should().NotBeNull();
        Repository.Text(file).Split('\n').TakeWhile(line => line.StartsWith('#')).Should().Contain(line => line.Contains("invented"));
    }

    [Fact]
    public void The_small_plant_warns_of_nothing_and_assumes_nothing()
    {
        var network = Small();
        network.Warnings.Should().BeEmpty();
        Study(network).Assumptions.Should().BeEmpty();
    }

    [Fact]
    public void The_industrial_plant_warns_of_its_standby_bus_alone() =>
        Industrial().Warnings.Should().ContainSingle().Which.ElementId.Should().Be("STANDBY-6");

    [Fact]
    public void The_industrial_plant_has_25_buses_at_four_voltages_and_an_element_of_every_kind()
    {
        var network = Industrial();
        network.Buses.Should().HaveCount(25);
        network.Buses.Select(bus => bus.NominalKv).Distinct().Should().BeEquivalentTo([110, 20, 6, 0.4]);
        network.Elements.Select(element => element.Section).Distinct().Should().HaveCount(13);
        network.SynchronousMachines.Select(machine => machine.Service).Should().Contain(SynchronousService.Motor);
    }

    /// <summary>
    /// Oracle: Math.NET's dense inverse of a matrix assembled in ohm by <see cref="DenseOracle"/>, from the plant restated by hand in the
    /// forms of data that it knows.
    /// </summary>
    [Fact]
    public void Every_bus_of_the_industrial_plant_agrees_with_a_dense_inverse()
    {
        var oracle = new DenseOracle(RestatedPlant.Of(Industrial()));
        foreach (var fault in Study(Industrial()).EveryBus().Where(one => one.IsEnergised))
        {
            var expectedKa = oracle.CurrentKa(fault.BusId);
            fault.InitialSymmetricalKa.Should().BeApproximately(expectedKa, 1e-9 * expectedKa, fault.BusId);
        }
    }

    [Fact]
    public void Closing_any_open_tie_of_the_industrial_plant_lowers_no_current()
    {
        var network = Industrial();
        var open = Study(network).EveryBus();
        foreach (var tie in network.BusCouplers.Where(one => !one.Closed))
        {
            var closed = Study(network.WithCoupler(tie.Id, closed: true)).EveryBus();
            var ratios = open.Zip(closed, (before, after) => after.InitialSymmetricalKa / before.InitialSymmetricalKa);
            ratios.Where(ratio => ratio < 1 - 1e-12).Should().BeEmpty(tie.Id);
        }
    }

    [Fact]
    public void Closing_the_standby_tie_energises_the_standby_bus()
    {
        var network = Industrial();
        Study(network).At("STANDBY-6").IsEnergised.Should().BeFalse();
        Study(network.WithCoupler("TIE-STANDBY", closed: true)).At("STANDBY-6").IsEnergised.Should().BeTrue();
    }

    private static FaultStudy Study(Network network) => new(network, new MachineDecrement());

    private static Network Small() => NetworkFile.Read(Repository.PathOf("examples/small-plant.yaml"));

    private static Network Industrial() => NetworkFile.Read(Repository.PathOf("examples/industrial-plant.yaml"));
}
