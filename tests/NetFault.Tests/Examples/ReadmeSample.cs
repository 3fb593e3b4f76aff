namespace NetFault.Tests.Examples;

/// <summary>
/// The sample of README.md, word for word: <see cref="ReadmeTests"/> compares the lines between the two marks with the README's C# block.
/// The parameters stand in for the console and for paths from the repository's root.
/// </summary>
internal static class ReadmeSample
{
    public static void Run(TextWriter Console, FilesFromTheRoot NetworkFile)
    {
        // <sample>
        Network network = NetworkFile.Read("examples/small-plant.yaml");
        var study = new FaultStudy(network, new MachineDecrement());

        foreach (BusFault fault in study.EveryBus())
            Console.WriteLine($"{fault.BusId,-5}  I″k {fault.InitialSymmetricalKa,5:0.00} kA   ip {fault.PeakKa,5:0.0} kA"
                + $"   at 60 ms: AC {fault.SymmetricalRmsKa(0.06),5:0.00}, DC {fault.DcComponentKa(0.06):0.00}, total {fault.AsymmetricalRmsKa(0.06),5:0.00} kA");

        Console.WriteLine($"CB-G1 carries {study.FlowsAt("MAIN").Coupler("CB-G1").FromToKa?.Magnitude:0.00} kA to a fault at MAIN");
        var withoutG1 = new FaultStudy(network.WithCoupler("CB-G1", closed: false), study.Method);
        Console.WriteLine($"MAIN with CB-G1 open: {withoutG1.At("MAIN").InitialSymmetricalKa:0.00} kA");
        // </sample>
    }

    /// <summary>Reads network files by their path from the repository's root.</summary>
    public sealed class FilesFromTheRoot
    {
        public Network Read(string path) => NetworkFile.Read(Repository.PathOf(path));
    }
}
