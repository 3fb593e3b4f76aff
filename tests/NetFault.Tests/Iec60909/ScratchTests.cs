using NetFault.Tests.Support;
using Xunit.Abstractions;
namespace NetFault.Tests.ByIec60909;
public class ScratchTests(ITestOutputHelper o)
{
    [Fact]
    public void A()
    {
        var n = IecRandomNetworks.Make(1291244672, 33, equalRatios: true);
        var d = new IecDenseNetwork(n, new IecElements(n, ShortCircuitCase.Maximum), ShortCircuitCase.Maximum);
        var k = d.Node("B25");
        foreach (var r in new[] { 1, 0.4, 0.27 }) o.WriteLine($"{r} {d.Invert(new IecVariant(r, true))(k, k)}");
        foreach (var b in d.Branches(new IecVariant()).Where(b => b.From == k || b.To == k)) o.WriteLine(b.ToString());
        var f = new FaultStudy(n, new Iec60909()).At("B25");
        o.WriteLine($"{f.ImpedanceOhm} {f.XOverR} {f.Iec60909!.Kappa} {f.InitialSymmetricalKa} {f.SolutionResidual}");
        n = IecRandomNetworks.Make(774679247, 30, equalRatios: false);
        d = new IecDenseNetwork(n, new IecElements(n, ShortCircuitCase.Minimum), ShortCircuitCase.Minimum);
        k = d.Node("B5");
        foreach (var b in d.Branches(new IecVariant()).Where(b => b.From == k || b.To == k)) o.WriteLine(b.ToString());
        var z = d.Invert(new IecVariant());
        o.WriteLine($"{z(k, k)}");
        foreach (var b in d.Branches(new IecVariant())) o.WriteLine($"{b.Element.Id} {b.From} {b.To} {b.Ohm} {b.Ratio}");
        f = new FaultStudy(n, new Iec60909 { Case = ShortCircuitCase.Minimum }).At("B5");
        o.WriteLine($"{f.ImpedanceOhm} {f.SolutionResidual}");
    }
}
