using System.Globalization;
using System.Numerics;

namespace NetFault;

/// <summary>A wind power station unit with a doubly fed generator (IEC 60909-0:2016), seen from its transformer's high-voltage side.</summary>
internal static class DoublyFedGeneratorCircuit
{
    private const double StandardPeakFactor = 1.7;
    private const double StandardROverX = 0.1;

    /// <summary>|ZWD| = √2·κWD·UrTHV/(√3·iWDmax) per unit on the bus's nominal voltage.</summary>
    public static Complex ImpedancePu(DoublyFedGenerator generator, double nominalKv, double baseMva, AssumptionLog? log)
    {
        if (generator.RatedKv is null)
            log?.Add(generator, "rated_kv", AssumptionTexts.RatedVoltageOfBus);
        if (generator.PeakFactor is null)
            log?.Add(generator, "peak_factor", Assumed("kappa_WD", StandardPeakFactor));
        if (generator.ROverX is null)
            log?.Add(generator, "r_over_x", Assumed("R/X", StandardROverX));
        var ohm = PerUnit.Sqrt2 * (generator.PeakFactor ?? StandardPeakFactor) * (generator.RatedKv ?? nominalKv)
            / (PerUnit.Sqrt3 * generator.HighestInstantaneousKa);
        return PerUnit.FromROverX(ohm / PerUnit.BaseOhm(nominalKv, baseMva), generator.ROverX ?? StandardROverX);
    }

    private static string Assumed(string symbol, double value) =>
        string.Format(CultureInfo.InvariantCulture, "{0} = {1} assumed (IEC 60909-0:2016)", symbol, value);
}
