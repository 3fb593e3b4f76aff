using System.Numerics;

namespace NetFault;

/// <summary>Conversions between engineering units and per unit on the network's base power and a bus's nominal voltage.</summary>
internal static class PerUnit
{
    /// <summary>√3.</summary>
    public static readonly double Sqrt3 = Math.Sqrt(3.0);

    /// <summary>√2.</summary>
    public static readonly double Sqrt2 = Math.Sqrt(2.0);

    /// <summary>Base impedance Un²/Sbase in ohm.</summary>
    public static double BaseOhm(double nominalKv, double baseMva) => nominalKv * nominalKv / baseMva;

    /// <summary>Base current Sbase/(√3·Un) in kA.</summary>
    public static double BaseKa(double nominalKv, double baseMva) => baseMva / (Sqrt3 * nominalKv);

    /// <summary>The impedance with magnitude <paramref name="z"/> and the given ratio R/X.</summary>
    public static Complex FromROverX(double z, double rOverX)
    {
        var x = z / Math.Sqrt(1.0 + rOverX * rOverX);
        return new Complex(rOverX * x, x);
    }

    /// <summary>The impedance with magnitude <paramref name="z"/> and real part <paramref name="r"/>.</summary>
    public static Complex FromResistance(double z, double r) => new(r, Math.Sqrt(Math.Max(0.0, z * z - r * r)));
}
