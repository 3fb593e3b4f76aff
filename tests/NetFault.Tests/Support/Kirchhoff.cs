using System.Numerics;

namespace NetFault.Tests.Support;

/// <summary>Kirchhoff's current law at every bus of a fault's flows, the fault among them.</summary>
internal static class Kirchhoff
{
    /// <summary>
    /// Asserts that all currents sum to zero at each bus, to 1e-9 of what meets there, and to the rounding that a voltage behind the network's
    /// largest admittance makes: a branch current is an admittance times a difference of voltages.
    /// </summary>
    public static void AssertAtEveryBus(FaultStudy study, FaultFlows flows)
    {
        var sums = study.Network.Buses.ToDictionary(bus => bus.Id, _ => Complex.Zero);
        var sizes = study.Network.Buses.ToDictionary(bus => bus.Id, _ => 0.0);
        foreach (var (bus, current) in Currents(flows))
        {
            sums[bus] += current;
            sizes[bus] += current.Magnitude;
        }
        var admittance = study.AdmittanceMatrix(flows.Instant ?? FaultInstant.Initial).Diagonal().Select(Complex.Abs).DefaultIfEmpty().Max();
        foreach (var bus in study.Network.Buses)
        {
            var baseKa = study.Network.BaseMva / (Math.Sqrt(3) * bus.NominalKv);
            sums[bus.Id].Magnitude.Should().BeLessThan(1e-9 * sizes[bus.Id] + 1e-13 * admittance * baseKa + 1e-300, bus.Id);
        }
    }

    /// <summary>Every current into a bus.</summary>
    private static IEnumerable<(string Bus, Complex Into)> Currents(FaultFlows flows) =>
        flows.Sources.Select(one => (one.BusId, one.IntoBusKa))
            .Concat(flows.Branches.SelectMany(one => one.Ends).Select(end => (end.BusId, -end.IntoBranchKa)))
            .Concat(flows.Couplers.Select(one => (one.FromBusId, -one.FromToKa!.Value)))
            .Concat(flows.Couplers.Select(one => (one.ToBusId, one.FromToKa!.Value)))
            .Append((flows.BusId, -flows.FaultCurrentKa));
}
