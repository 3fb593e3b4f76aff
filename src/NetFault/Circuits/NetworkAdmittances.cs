using System.Numerics;

namespace NetFault;

/// <summary>Which parts of the impedances a calculation looks at.</summary>
internal enum ImpedancePart
{
    /// <summary>R + jX.</summary>
    Complex,

    /// <summary>The reactances alone.</summary>
    Reactance,

    /// <summary>The resistances alone, as real numbers.</summary>
    Resistance,
}

/// <summary>Makes the admittances of a circuit's branches and sources from their impedances.</summary>
internal static class NetworkAdmittances
{
    /// <summary>
    /// In the network of the resistances alone an element without resistance would be a short circuit, so it gets this share of its
    /// reactance, and the other way round in the network of the reactances.
    /// </summary>
    public const double AssumedShare = 1.0 / 200.0;

    /// <summary>The admittance of each branch.</summary>
    public static Complex[] OfBranches(Circuit circuit, Complex[] branchImpedances, NetworkVariant variant)
    {
        var part = variant.Part;
        var impedances = AtFrequency(circuit, branchImpedances, variant);
        var admittances = new Complex[circuit.Branches.Length];
        for (var i = 0; i < admittances.Length; i++)
        {
            switch (circuit.Branches[i].Kind)
            {
                case BranchKind.Series or BranchKind.Capacitor:
                    admittances[i] = Reciprocal(Part(impedances[i], part));
                    break;
                case BranchKind.StarFirst:
                    StarToDelta(impedances, admittances, i, part);
                    break;
            }
        }
        return admittances;
    }

    /// <summary>The admittance of one series impedance, not a capacitor's, in a network.</summary>
    public static Complex OfSeries(Complex z, NetworkVariant variant) => Reciprocal(Part(
        variant.ReactanceFactor is { } s ? z.Real + z.Imaginary * s : AtFrequency(z, BranchKind.Series, variant.FrequencyRatio), variant.Part));

    /// <summary>The branch impedances with their reactances at the variant's frequency.</summary>
    private static Complex[] AtFrequency(Circuit circuit, Complex[] branchImpedances, NetworkVariant variant)
    {
        if (variant.ReactanceFactor is { } s)
            return Each(circuit, branchImpedances, (z, kind) => kind == BranchKind.Capacitor ? z.Real - z.Imaginary / s : z.Real + z.Imaginary * s);
        var ratio = variant.FrequencyRatio;
        return ratio.Equals(1.0) ? branchImpedances : Each(circuit, branchImpedances, (z, kind) => AtFrequency(z, kind, ratio));
    }

    private static Complex[] Each(Circuit circuit, Complex[] branchImpedances, Func<Complex, BranchKind, Complex> change)
    {
        var impedances = new Complex[branchImpedances.Length];
        for (var i = 0; i < impedances.Length; i++)
            impedances[i] = change(branchImpedances[i], circuit.Branches[i].Kind);
        return impedances;
    }

    /// <summary>A branch impedance with its reactance at another frequency.</summary>
    public static Complex AtFrequency(Complex z, BranchKind kind, double ratio) =>
        new(z.Real, kind == BranchKind.Capacitor ? z.Imaginary / ratio : z.Imaginary * ratio);

    /// <summary>The admittance of a source; 0 where it is not in the network at the instant.</summary>
    public static Complex OfSource(Complex? impedance, ImpedancePart part) =>
        impedance is { } z ? Reciprocal(Part(z, part)) : Complex.Zero;

    /// <summary>Whether the element's share of a network had to be assumed.</summary>
    public static bool IsAssumed(Complex impedance, ImpedancePart part) => part switch
    {
        ImpedancePart.Resistance => impedance.Real == 0.0,
        ImpedancePart.Reactance => impedance.Imaginary == 0.0,
        _ => false,
    };

    /// <summary>Whether a three-winding transformer is given without any resistance.</summary>
    public static bool StarHasNoResistance(Complex[] impedances, int first) =>
        impedances[first].Real == 0.0 && impedances[first + 1].Real == 0.0 && impedances[first + 2].Real == 0.0;

    private static Complex Part(Complex z, ImpedancePart part) => part switch
    {
        ImpedancePart.Reactance => new Complex(0.0, z.Imaginary == 0.0 ? z.Real * AssumedShare : z.Imaginary),
        ImpedancePart.Resistance => new Complex(z.Real == 0.0 ? Math.Abs(z.Imaginary) * AssumedShare : z.Real, 0.0),
        _ => z,
    };

    /// <summary>
    /// Three branches from three legs: y between two ends = z of the third leg / (za·zb + zb·zc + zc·za). A leg of 0 leaves them finite.
    /// </summary>
    private static void StarToDelta(Complex[] impedances, Complex[] admittances, int first, ImpedancePart part)
    {
        Complex hv = impedances[first], mv = impedances[first + 1], lv = impedances[first + 2];
        (hv, mv, lv) = part switch
        {
            ImpedancePart.Reactance => (ImaginaryOf(hv), ImaginaryOf(mv), ImaginaryOf(lv)),
            ImpedancePart.Resistance when StarHasNoResistance(impedances, first) =>
                (hv.Imaginary * AssumedShare, mv.Imaginary * AssumedShare, lv.Imaginary * AssumedShare),
            ImpedancePart.Resistance => (hv.Real, mv.Real, lv.Real),
            _ => (hv, mv, lv),
        };
        var scale = Reciprocal(hv * mv + mv * lv + lv * hv);
        admittances[first] = lv * scale;
        admittances[first + 1] = mv * scale;
        admittances[first + 2] = hv * scale;
    }

    private static Complex ImaginaryOf(Complex z) => new(0.0, z.Imaginary);

    /// <summary>1/z without the scaling of a general complex division: per-unit impedances are far from overflow.</summary>
    private static Complex Reciprocal(Complex z)
    {
        var scale = 1.0 / (z.Real * z.Real + z.Imaginary * z.Imaginary);
        return new Complex(z.Real * scale, -z.Imaginary * scale);
    }
}
