using System.Runtime.CompilerServices;
using NetFault.Tests.Support;

namespace NetFault.Tests.ByIec60909;

/// <summary>
/// Source: IEC TR 60909-4:2000, clause 6, test network for the calculation of short-circuit currents with digital programs; data
/// (iec-tr-60909-4.yaml) and published results from memory of the standard.
/// </summary>
public class TestNetworkTests
{
    private static readonly Network TestNetwork = NetworkFile.Read(Path.Combine(Path.GetDirectoryName(Here())!, "iec-tr-60909-4.yaml"));

    [Theory]
    [InlineData("1", 40.6447)]
    [InlineData("2", 31.7831)]
    [InlineData("3", 19.6730)]
    [InlineData("4", 16.2277)]
    [InlineData("5", 33.1894)]
    [InlineData("6", 37.5629)]
    [InlineData("7", 25.5895)]
    [InlineData("8", 13.5778)]
    public void Maximum_initial_current_is_the_published_one_to_every_printed_digit(string bus, double published)
    {
        var study = new FaultStudy(TestNetwork, new Iec60909());
        Math.Round(study.At(bus).InitialSymmetricalKa, 4).Should().Be(published);
        Math.Round(study.EveryBus().Single(fault => fault.BusId == bus).InitialSymmetricalKa, 4).Should().Be(published);
    }

    [Theory]
    [InlineData(ShortCircuitCase.Maximum)]
    [InlineData(ShortCircuitCase.Minimum)]
    public void All_quantities_agree_with_the_second_implementation(ShortCircuitCase which)
    {
        var oracle = new IecOracle(TestNetwork, which);
        foreach (var fault in new FaultStudy(TestNetwork, new Iec60909 { Case = which }).EveryBus())
        {
            Close(fault.InitialSymmetricalKa, oracle.InitialKa(fault.BusId));
            Close(fault.PeakKa, oracle.PeakKa(fault.BusId));
            Close(fault.DcComponentKa(0.1), oracle.DcKa(fault.BusId, 0.1));
            Close(fault.Iec60909!.BreakingKa(0.1), oracle.BreakingKa(fault.BusId, 0.1));
            Close(fault.SteadyStateKa!.Value, oracle.SteadyWithoutMotorsKa(fault.BusId));
        }
    }

    private static void Close(double actual, double expected) => actual.Should().BeApproximately(expected, 1e-9 * expected);

    private static string Here([CallerFilePath] string path = "") => path;
}
