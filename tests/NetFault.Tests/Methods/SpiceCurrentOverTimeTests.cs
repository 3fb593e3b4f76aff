using NetFault.Tests.Support;
using Xunit.Abstractions;

namespace NetFault.Tests.Methods;

/// <summary>
/// The library's current over time against a circuit simulation of the same network of resistances and reactances by ngspice.
/// </summary>
public class SpiceCurrentOverTimeTests(ITestOutputHelper output)
{
    [Theory]
    [InlineData("BUS")]
    [InlineData("GT")]
    [InlineData("DIST")]
    public void Two_sources_of_different_X_over_R_agree_with_a_circuit_simulation(string bus) => AssertAgreement(TwoSources.Make(), bus);

    [Theory]
    [InlineData(43, 10, 3)]
    [InlineData(42, 30, 8)]
    public void Generated_networks_of_resistances_and_reactances_agree_with_a_circuit_simulation(int seed, int buses, int machines)
    {
        var network = RandomDecayPlants.WithoutDecay(RandomDecayPlants.Make(seed, buses, machines));
        AssertAgreement(network, network.Buses[buses / 2].Id);
        AssertAgreement(network, network.Buses[buses - 1].Id);
    }

    private void AssertAgreement(Network network, string bus)
    {
        if (Spice.Missing is { } reason)
        {
            output.WriteLine($"Not checked: {reason}.");
            return;
        }
        var simulated = new SpiceFault(network, bus, 0.1);
        var method = new MachineDecrement { AcComponentRule = AcComponentRule.Exact, DcDecayRule = DcDecayRule.Exact };
        var fault = new FaultStudy(network, method).At(bus);
        var most = 1e-5 * fault.InitialSymmetricalKa;
        fault.WorstPeak!.Ka.Should().BeApproximately(simulated.WorstPeak().Ka, most);
        fault.WorstPeak!.Seconds.Should().BeApproximately(simulated.WorstPeak().Seconds, 2e-5);
        foreach (var t in new[] { 0.01, 0.02, 0.05, 0.1 })
        {
            fault.SymmetricalRmsKa(t).Should().BeApproximately(simulated.AcRmsKa, most);
            fault.DcComponentKa(t).Should().BeApproximately(simulated.DcEnvelopeKa(t), most);
            fault.InstantaneousKa(t, 0).Should().BeApproximately(simulated.InstantaneousKa(t, 0), most);
            fault.InstantaneousKa(t, 90).Should().BeApproximately(simulated.InstantaneousKa(t, 90), most);
        }
    }
}
