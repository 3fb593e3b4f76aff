using System.Numerics;

namespace NetFault;

/// <summary>A two-winding transformer in the positive-sequence circuit: a series impedance and an off-nominal ratio.</summary>
internal static class TransformerCircuit
{
    /// <summary>Short-circuit impedance per unit on the nominal voltage of the high-voltage bus (IEC 60909-0, 6.3 equations for ZT).</summary>
    public static Complex SeriesPu(Transformer transformer, double hvKv, double baseMva)
    {
        var ratedToBase = transformer.RatedHvKv * transformer.RatedHvKv / transformer.RatedMva / PerUnit.BaseOhm(hvKv, baseMva);
        return ShortCircuitImpedance(transformer) * ratedToBase;
    }

    /// <summary>Off-nominal ratio t = (UrHV/UrLV)·(UnLV/UnHV); 1 where the rated voltages stand to each other as the nominal ones.</summary>
    public static double Ratio(Transformer transformer, double hvKv, double lvKv) =>
        transformer.RatedHvKv / transformer.RatedLvKv * (lvKv / hvKv);

    /// <summary>Relative reactance xT = XT/(UrT²/SrT).</summary>
    public static double RelativeReactance(Transformer transformer) => ShortCircuitImpedance(transformer).Imaginary;

    /// <summary>Short-circuit impedance per unit on the transformer's rating.</summary>
    private static Complex ShortCircuitImpedance(Transformer transformer)
    {
        var z = transformer.ShortCircuitVoltagePercent / 100.0;
        if (transformer.XOverR is { } ratio)
            return PerUnit.FromROverX(z, 1.0 / ratio);
        var r = transformer.ResistivePercent is { } percent
            ? percent / 100.0
            : transformer.LoadLossKw.GetValueOrDefault() / 1000.0 / transformer.RatedMva;
        return PerUnit.FromResistance(z, r);
    }
}
