using System.Numerics;

namespace NetFault;

/// <summary>A line in the positive-sequence circuit: its series impedance; charging is left out (IEC 60909-0 neglects it).</summary>
internal static class LineCircuit
{
    /// <summary>Series impedance of all parallel circuits, per unit on the nominal voltage of the from bus.</summary>
    public static Complex SeriesPu(Line line, double fromKv, double baseMva)
    {
        var oneCircuit = line.PerUnit is { } perUnit
            ? new Complex(perUnit.R, perUnit.X)
            : Ohm(line) / PerUnit.BaseOhm(fromKv, baseMva);
        return oneCircuit / line.Parallel;
    }

    /// <summary>Impedance of one circuit over its whole length in ohm.</summary>
    private static Complex Ohm(Line line)
    {
        if (line.Ohm is { } total)
            return new Complex(total.R, total.X);
        var perKm = line.OhmPerKm.GetValueOrDefault();
        return new Complex(perKm.R, perKm.X) * line.LengthKm.GetValueOrDefault();
    }
}
