using System.Numerics;

namespace NetFault;

/// <summary>A series capacitor in the positive-sequence circuit: a negative reactance that falls with frequency.</summary>
internal static class SeriesCapacitorCircuit
{
    /// <summary>−jX per unit on the nominal voltage of the from bus.</summary>
    public static Complex SeriesPu(SeriesCapacitor capacitor, double fromKv, double baseMva) =>
        new(0.0, -capacitor.ReactanceOhm / PerUnit.BaseOhm(fromKv, baseMva));
}
