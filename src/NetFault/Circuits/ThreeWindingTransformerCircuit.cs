using System.Numerics;

namespace NetFault;

/// <summary>
/// A three-winding transformer in the positive-sequence circuit. Its impedances are known by pairs of windings; with all three windings
/// connected they make a star (IEC 60909-0, 6.3.2), with one open only the pair in use counts.
/// </summary>
internal static class ThreeWindingTransformerCircuit
{
    /// <summary>The impedance of a pair of windings as a fraction of the rated impedance of the smaller one's rating.</summary>
    public readonly record struct Pair(double RatedMva, double ShortCircuitVoltagePercent, double ResistivePercent)
    {
        /// <summary>Relative reactance of the pair on its own rating.</summary>
        public double RelativeReactance => OnOwnRating.Imaginary;

        private Complex OnOwnRating => PerUnit.FromResistance(ShortCircuitVoltagePercent / 100.0, ResistivePercent / 100.0);

        /// <summary>The pair's impedance per unit on <paramref name="ratedKv"/>² / baseMva of the winding it is referred to.</summary>
        public Complex PerUnitOn(double ratedKv, double nominalKv, double baseMva) =>
            OnOwnRating * (ratedKv * ratedKv / RatedMva / PerUnit.BaseOhm(nominalKv, baseMva));
    }

    /// <summary>The pair of windings <paramref name="one"/> and <paramref name="other"/>, each 0 for HV, 1 for MV, 2 for LV.</summary>
    public static Pair PairOf(ThreeWindingTransformer transformer, int one, int other)
    {
        var mva = Math.Min(Winding(transformer.RatedMva, one), Winding(transformer.RatedMva, other));
        return new Pair(
            mva, PairValue(transformer.ShortCircuitVoltagePercent, one, other), PairValue(transformer.ResistivePercent, one, other));
    }

    /// <summary>
    /// The three legs of the star, HV, MV, LV, from the impedances of the pairs on one base. A leg may be 0 or negative: the medium winding
    /// often lies between the two others.
    /// </summary>
    public static (Complex Hv, Complex Mv, Complex Lv) Legs(Complex hvMv, Complex hvLv, Complex mvLv) =>
        ((hvMv + hvLv - mvLv) / 2.0, (hvMv + mvLv - hvLv) / 2.0, (hvLv + mvLv - hvMv) / 2.0);

    /// <summary>The value of a winding: 0 for HV, 1 for MV, 2 for LV.</summary>
    public static double Winding(WindingValues values, int winding) =>
        (winding switch { 0 => values.Hv, 1 => values.Mv, _ => values.Lv }).GetValueOrDefault();

    private static double PairValue(WindingPairValues values, int one, int other) =>
        ((one, other) switch { (0, 1) => values.HvMv, (0, 2) => values.HvLv, _ => values.MvLv }).GetValueOrDefault();
}
