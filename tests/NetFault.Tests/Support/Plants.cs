namespace NetFault.Tests.Support;

/// <summary>Small invented networks that several tests share.</summary>
internal static class Plants
{
    /// <summary>Buses A and B at 20 kV, each with a feeder (QA, QB), and the line AB of 0.4 + j1.6 ohm between them.</summary>
    public static Network TwoFeedersAndALine() => new NetworkBuilder { FrequencyHz = 50 }.Add(
        new Bus { Id = "A", NominalKv = 20 },
        new Bus { Id = "B", NominalKv = 20 },
        new NetworkFeeder { Id = "QA", Bus = "A", ShortCircuitMva = new MaxMin(400), XOverR = 10 },
        new NetworkFeeder { Id = "QB", Bus = "B", ShortCircuitMva = new MaxMin(250), XOverR = 4 },
        new Line { Id = "AB", From = "A", To = "B", Ohm = new Impedance(0.4, 1.6) }).Build();

    /// <summary>One bus, T at 10 kV, with one generator G of 25 MVA at its terminals; Ra = 0 unless given.</summary>
    public static Network OneGenerator(
        MachineReactances reactances, double? armatureResistancePu = 0, MachineTimeConstants timeConstants = default, double frequencyHz = 50) =>
        new NetworkBuilder { FrequencyHz = frequencyHz }.Add(
            new Bus { Id = "T", NominalKv = 10 },
            new SynchronousMachine
            {
                Id = "G", Bus = "T", RatedMva = 25, RatedKv = 10, ReactancePu = reactances, ArmatureResistancePu = armatureResistancePu,
                TimeConstantSeconds = timeConstants,
            }).Build();

    /// <summary>One bus at 20 kV behind one feeder of 346.41 MVA, I″k = 10 kA, with the given R/X.</summary>
    public static Network OneFeeder(double rOverX, double frequencyHz = 50) => new NetworkBuilder { FrequencyHz = frequencyHz }.Add(
        new Bus { Id = "Q", NominalKv = 20 },
        new NetworkFeeder { Id = "U", Bus = "Q", ShortCircuitKa = new MaxMin(10), ROverX = rOverX }).Build();
}
