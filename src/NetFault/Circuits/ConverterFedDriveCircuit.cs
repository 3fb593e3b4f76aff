using System.Numerics;

namespace NetFault;

/// <summary>A drive fed by a static converter: like an asynchronous motor with ILR/IrM = 3 and R/X = 0.1 (IEC 60909-0).</summary>
internal static class ConverterFedDriveCircuit
{
    private const double LockedRotorRatio = 3.0;
    private const double ROverX = 0.10;

    /// <summary>|Z| = (1/3)·UrM²/SrM per unit on the bus's nominal voltage.</summary>
    public static Complex ImpedancePu(ConverterFedDrive drive, double nominalKv, double baseMva, AssumptionLog? log)
    {
        if (drive.RatedKv is null)
            log?.Add(drive, "rated_kv", AssumptionTexts.RatedVoltageOfBus);
        var kv = drive.RatedKv ?? nominalKv;
        return PerUnit.FromROverX(kv * kv / (LockedRotorRatio * drive.RatedMva) / PerUnit.BaseOhm(nominalKv, baseMva), ROverX);
    }
}
