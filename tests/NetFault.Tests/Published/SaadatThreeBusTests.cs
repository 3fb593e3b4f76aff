using System.Numerics;

namespace NetFault.Tests.Published;

/// <summary>
/// Source: H. Saadat, Power System Analysis, examples 9.1 to 9.3 (from memory), per unit on 100 MVA. Sources of j0.2 at bus 1 and j0.4 at
/// bus 2, lines 1-2 j0.8, 1-3 j0.4, 2-3 j0.4, fault through j0.16. The kV of the file are of no matter to per-unit results.
/// </summary>
public class SaadatThreeBusTests
{
    private const string File = """
        netfault: 1
        frequency_hz: 60
        base_mva: 100
        buses:
          1: {nominal_kv: 100}
          2: {nominal_kv: 100}
          3: {nominal_kv: 100}
        network_feeders:
          S1: {bus: 1, short_circuit_mva: 500, r_over_x: 0}
          S2: {bus: 2, short_circuit_mva: 250, r_over_x: 0}
        lines:
          1-2: {from: 1, to: 2, per_unit: {r: 0, x: 0.8}}
          1-3: {from: 1, to: 3, per_unit: {r: 0, x: 0.4}}
          2-3: {from: 2, to: 3, per_unit: {r: 0, x: 0.4}}
        """;

    /// <summary>j0.16 per unit in ohm.</summary>
    private static readonly Complex FaultOhm = new(0, 0.16 * 100 * 100 / 100);

    private static readonly double BaseKa = 100 / (Math.Sqrt(3) * 100);

    private readonly FaultStudy _study = new(NetworkFile.Parse(File), new MachineDecrement());

    [Fact]
    public void The_bus_impedance_matrix_is_the_printed_one()
    {
        double[,] printed = { { 0.16, 0.08, 0.12 }, { 0.08, 0.24, 0.16 }, { 0.12, 0.16, 0.34 } };
        var z = _study.BusImpedanceMatrix();
        for (var i = 0; i < 3; i++)
        {
            for (var j = 0; j < 3; j++)
                (z[i, j] - new Complex(0, printed[i, j])).Magnitude.Should().BeLessThan(1e-12);
        }
    }

    [Theory]
    [InlineData("3", 2.0, 0.76, 0.68, 0.32)]
    [InlineData("2", 2.5, 0.80, 0.40, 0.60)]
    [InlineData("1", 3.125, 0.50, 0.75, 0.625)]
    public void Fault_current_and_bus_voltages_are_the_printed_ones(string bus, double current, double v1, double v2, double v3)
    {
        _study.At(bus, FaultOhm).InitialSymmetricalKa.Should().BeApproximately(current * BaseKa, 1e-12);
        var flows = _study.FlowsAt(bus, faultImpedanceOhm: FaultOhm);
        (flows.FaultCurrentKa - new Complex(0, -current * BaseKa)).Magnitude.Should().BeLessThan(1e-12);
        flows.Voltages.Select(one => Math.Round(one.PerUnit.Real, 12)).Should().Equal(v1, v2, v3);
        flows.Voltages.Should().OnlyContain(one => Math.Abs(one.PerUnit.Imaginary) < 1e-12);
    }

    [Theory]
    [InlineData("1-2", "1", 0.1)]
    [InlineData("1-3", "1", 1.1)]
    [InlineData("2-3", "2", 0.9)]
    public void Line_currents_for_the_fault_at_bus_3_are_the_printed_ones(string line, string from, double current)
    {
        var into = _study.FlowsAt("3", faultImpedanceOhm: FaultOhm).Branch(line).FromBusKa(from);
        (into - new Complex(0, -current * BaseKa)).Magnitude.Should().BeLessThan(1e-12);
    }
}
