namespace NetFault.Tests;
public class PlaceholderTests(Xunit.Abstractions.ITestOutputHelper o)
{
    [Fact]
    public void A_plant_builds()
    {
        var n = new NetworkBuilder { FrequencyHz = 50 }.Add(
            new Bus { Id = "1", NominalKv = 10 }, new Bus { Id = "2", NominalKv = 10 }, new Bus { Id = "3", NominalKv = 10 },new Bus { Id = "4", NominalKv = 10 },
            new Bus { Id = "5", NominalKv = 10 },
            new NetworkFeeder { Id = "U1", Bus = "1", ShortCircuitMva = new(500), ROverX = 0 },
            new NetworkFeeder { Id = "U2", Bus = "2", ShortCircuitMva = new(250), ROverX = 0 },
            new Line {Id="12", From="1", To="2", PerUnit = new(0, 0.8)},
            new Line {Id="13", From="1", To="3", PerUnit = new(0, 0.4)},
            new Line {Id="23", From="2", To="3", PerUnit = new(0, 0.4)},
            new BusCoupler { Id = "T", From = "3", To = "4", Closed = true },
            new BusCoupler { Id = "T2", From = "4", To = "5", Closed = false }
            ).Build();
        foreach (var w in n.Warnings) o.WriteLine(w.ToString());
        var s = new FaultStudy(n, new MachineDecrement());
        foreach (var f in s.EveryBus()) o.WriteLine($"{f} {f.ImpedancePu} {f.XOverR} {f.XOverRStatus} {f.PeakKa} {f.TransientKa} {f.SteadyStateKa}  {f.DcComponentKa(0.1)} {f.SolutionResidual}");
        o.WriteLine(s.BusImpedanceMatrix().ToString());
        o.WriteLine(s.AdmittanceMatrix().ToString());
        var fl = s.FlowsAt("4", faultImpedanceOhm: new System.Numerics.Complex(0, 0.16));
        foreach (var b in fl.Branches) o.WriteLine($"{b.Id} {string.Join(" ", b.Ends)}");
        foreach (var b in fl.Sources) o.WriteLine($"{b}");
        foreach (var b in fl.Couplers) o.WriteLine($"{b}");
        foreach (var b in fl.Voltages) o.WriteLine($"{b}");
        o.WriteLine(string.Join(" | ", s.Nodes));
    }
}
