using System.Numerics;

namespace NetFault.Tests.Examples;

/// <summary>
/// The small plant by hand, as the comment at its top has it: a radial network needs no matrix, only impedances in series and in parallel.
/// Oracle: that arithmetic, per unit on 100 MVA, typed from the data of the file.
/// </summary>
public class SmallPlantByHandTests
{
    private static readonly Complex Utility = Ratio(100.0 / 500, xOverR: 10);
    private static readonly Complex T1 = Ratio(0.10 * 100 / 20, xOverR: 20);
    private static readonly Complex T2 = Resistance(0.05 * 100 / 1, r: 0.010 * 100 / 1);
    private static readonly Complex C1 = new Complex(0.06, 0.105) * 0.5 / (11.0 * 11 / 100);
    private static readonly Complex Motors = Ratio(1.0 / 6 * 100 / (4 * 1.1 / (0.96 * 0.91667)), xOverR: 8);

    /// <summary>x″d, with Ra = x2/(ω·Ta) on the machine's 10 MVA.</summary>
    private static readonly Complex G1 = new Complex(0.16 / (2 * Math.PI * 50 * 0.16), 0.15) * 100 / 10;

    private static readonly Complex AtMain = Parallel(Utility + T1, G1, C1 + Motors);

    public static TheoryData<string, double, Complex> Faults => new()
    {
        { "GRID", 33, Parallel(Utility, T1 + Parallel(G1, C1 + Motors)) },
        { "MAIN", 11, AtMain },
        { "GEN", 11, AtMain },
        { "PUMPS", 11, Parallel(Motors, C1 + Parallel(G1, Utility + T1)) },
        { "LOW", 0.4, T2 + AtMain },
    };

    [Theory]
    [MemberData(nameof(Faults))]
    public void A_fault_in_the_small_plant_is_what_series_and_parallel_impedances_give(string bus, double kv, Complex impedancePu)
    {
        var network = NetworkFile.Read(Repository.PathOf("examples/small-plant.yaml"));
        var fault = new FaultStudy(network, new MachineDecrement()).At(bus);
        var expectedKa = 100 / (Math.Sqrt(3) * kv) / impedancePu.Magnitude;

        fault.InitialSymmetricalKa.Should().BeApproximately(expectedKa, 1e-12 * expectedKa);
        fault.XOverR.Should().BeApproximately(impedancePu.Imaginary / impedancePu.Real, 1e-10);
    }

    [Fact]
    public void The_estimate_in_the_comment_of_the_small_plant_is_near() =>
        (100 / (Math.Sqrt(3) * 11) / AtMain.Magnitude).Should().BeApproximately(12.6, 0.1);

    private static Complex Parallel(params Complex[] impedances) => 1 / impedances.Aggregate(Complex.Zero, (sum, z) => sum + 1 / z);

    private static Complex Ratio(double z, double xOverR) => z * new Complex(1, xOverR) / Math.Sqrt(1 + xOverR * xOverR);

    private static Complex Resistance(double z, double r) => new(r, Math.Sqrt(z * z - r * r));
}
