namespace NetFault.Tests.Support;

/// <summary>
/// An invented 60 Hz network in which sources of very different X/R meet, with its currents by a circuit simulation of the same
/// R-L network (printed digits), the machine held at its subtransient reactance.
/// </summary>
internal static class TwoSources
{
    public static IReadOnlyList<(double Seconds, double Ka)> DcAtBus =>
        [(0.010, 27.3629524), (0.020, 25.2707431), (0.050, 20.9133087), (0.100, 15.4221873)];

    public static IReadOnlyList<(double Seconds, double Ka)> DcAtGenerator =>
        [(0.010, 27.3364395), (0.020, 25.2015332), (0.050, 21.0289849), (0.100, 15.7436514)];

    public const double AcAtBusKa = 34.1001879, PeakAtBusKa = 76.7282768, PeakAtBusSeconds = 0.007315;

    public const double AcAtGeneratorKa = 31.5197203, PeakAtGeneratorKa = 72.9961303;

    public static Network Make() => new NetworkBuilder { FrequencyHz = 60 }.Add(
        new Bus { Id = "HV", NominalKv = 69 },
        new Bus { Id = "GT", NominalKv = 13.8 },
        new Bus { Id = "BUS", NominalKv = 13.8 },
        new Bus { Id = "WEAK", NominalKv = 13.8 },
        new Bus { Id = "DIST", NominalKv = 13.8 },
        new NetworkFeeder { Id = "Strong", Bus = "HV", ShortCircuitMva = new MaxMin(2500), XOverR = 40 },
        new NetworkFeeder { Id = "Weak", Bus = "WEAK", ShortCircuitMva = new MaxMin(600), XOverR = 2 },
        new SynchronousMachine
        {
            Id = "G1", Bus = "GT", RatedMva = 30, RatedPowerFactor = 0.85, ReactancePu = new MachineReactances(0.13),
            ArmatureResistancePu = 0.0013,
        },
        new Transformer
        {
            Id = "T1", Hv = "HV", Lv = "BUS", RatedMva = 30, RatedHvKv = 69, RatedLvKv = 13.8, ShortCircuitVoltagePercent = 10, XOverR = 45,
        },
        new Line { Id = "CW", From = "WEAK", To = "BUS", LengthKm = 0.6, OhmPerKm = new Impedance(0.33, 0.11) },
        new Line { Id = "CD", From = "BUS", To = "DIST", LengthKm = 2.0, OhmPerKm = new Impedance(0.33, 0.11) },
        new SeriesReactor { Id = "XG", From = "GT", To = "BUS", Ohm = new Impedance(0.001, 0.05) }).Build();
}
