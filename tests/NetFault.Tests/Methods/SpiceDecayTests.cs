using NetFault.Tests.Support;
using Xunit.Abstractions;

namespace NetFault.Tests.Methods;

/// <summary>
/// The oracle of the current over time against a circuit simulation of the same network by ngspice. The trapezoidal rule with 4,000 steps a
/// cycle is within 1e-6 of the solution: (2π/4000)²/12 = 2e-7 of each reactance.
/// </summary>
public class SpiceDecayTests(ITestOutputHelper output)
{
    [Theory]
    [InlineData("BUS")]
    [InlineData("GT")]
    [InlineData("DIST")]
    public void Two_sources_of_different_X_over_R_agree_with_a_circuit_simulation(string bus) => AssertAgreement(TwoSources.Make(), bus);

    [Theory]
    [InlineData(1, 8, 2)]
    [InlineData(2, 15, 4)]
    [InlineData(3, 24, 8)]
    public void Generated_networks_of_resistances_and_reactances_agree_with_a_circuit_simulation(int seed, int buses, int machines)
    {
        var network = RandomDecayPlants.WithoutDecay(RandomDecayPlants.Make(seed, buses, machines));
        AssertAgreement(network, network.Buses[buses / 2].Id);
    }

    private void AssertAgreement(Network network, string bus)
    {
        if (Spice.Missing is { } reason)
        {
            output.WriteLine($"Not checked: {reason}.");
            return;
        }
        var simulated = new SpiceFault(network, bus, 0.1);
        var oracle = new DecayOracle(network, bus, DecayMode.Exact);
        var most = 1e-6 * oracle.InitialKa;
        oracle.AcRmsKa(0).Should().BeApproximately(simulated.AcRmsKa, 1e-9 * oracle.InitialKa);
        oracle.WorstPeak().Ka.Should().BeApproximately(simulated.WorstPeak().Ka, most);
        oracle.WorstPeak().Seconds.Should().BeApproximately(simulated.WorstPeak().Seconds, 1e-7);
        foreach (var t in new[] { 0.01, 0.02, 0.05, 0.1 })
        {
            oracle.DcEnvelopeKa(t).Should().BeApproximately(simulated.DcEnvelopeKa(t), most);
            oracle.InstantaneousKa(t, 0).Should().BeApproximately(simulated.InstantaneousKa(t, 0), most);
            oracle.InstantaneousKa(t, 90).Should().BeApproximately(simulated.InstantaneousKa(t, 90), most);
        }
    }
}
