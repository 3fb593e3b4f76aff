using System.Numerics;
using CsCheck;
using NetFault.Tests.Support;

namespace NetFault.Tests.Methods;

/// <summary>
/// The bound that a result states for the error of its quadrature, against the error itself: the difference from <see cref="DecayOracle"/>, the
/// eigenvalues of the state matrix.
/// </summary>
public class DecayErrorBoundTests
{
    private static readonly double[] Times = [0, 0.0003, 0.001, 0.004, 0.01, 0.05, 0.2, 0.29, 0.5, 2, 5];

    [Theory]
    [InlineData(1e-3)]
    [InlineData(1e-5)]
    [InlineData(5e-7)]
    public void The_error_is_within_the_bound_that_is_stated_and_that_within_what_was_accepted(double limit)
    {
        var method = new MachineDecrement
        {
            AcComponentRule = AcComponentRule.Exact, DcDecayRule = DcDecayRule.Exact, HorizonSeconds = 5, DecayErrorLimit = limit,
        };
        RandomDecayPlants.Cases(16).Sample((seed, buses, machines) =>
        {
            var network = RandomDecayPlants.Make(seed, buses, machines);
            var bus = network.Buses[Math.Abs(seed % buses)].Id;
            var fault = new FaultStudy(network, method).At(bus);
            var oracle = new DecayOracle(network, bus, DecayMode.Exact);
            foreach (var t in Times)
            {
                var bound = fault.DecayErrorBound(t);
                bound.Should().BeLessThanOrEqualTo(limit);
                var most = (bound + 1e-10) * oracle.InitialKa;
                fault.SymmetricalRmsKa(t).Should().BeApproximately(oracle.AcRmsKa(t), most, $"AC at {bus} at {t} s");
                (fault.DcComponentKa(t) / Math.Sqrt(2)).Should().BeApproximately(oracle.DcEnvelopeKa(t) / Math.Sqrt(2), most, $"DC at {bus} at {t} s");
            }
        }, iter: 5);
    }

    [Fact]
    public void The_residues_together_are_within_the_multiple_of_the_initial_current_that_the_bound_takes() =>
        // QuadratureRule takes Σ|residues| ≤ 3·I″k in each cluster.
        RandomDecayPlants.Cases(12).Sample((seed, buses, machines) =>
        {
            var network = RandomDecayPlants.Make(seed, buses, machines);
            var oracle = new DecayOracle(network, network.Buses[Math.Abs(seed % buses)].Id, DecayMode.Exact);
            var parts = oracle.Poles.Zip(oracle.Residues)
                .ToLookup(one => one.First.Imaginary > -oracle.Omega / 2, one => one.Second);
            var ac = parts[true].Aggregate(Complex.Zero, (sum, residue) => sum + residue).Magnitude;
            var most = 3 * ac * oracle.InitialKa / oracle.AcKa(0).Magnitude;
            parts[true].Sum(residue => residue.Magnitude).Should().BeLessThan(most);
            parts[false].Sum(residue => residue.Magnitude).Should().BeLessThan(most);
        }, iter: 150);
}
