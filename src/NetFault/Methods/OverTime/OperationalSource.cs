using System.Numerics;

namespace NetFault;

/// <summary>
/// A source in the Laplace plane, in the frame that rotates with ω. With p over ω and s = p + j (s = j where reactances are kept at rated
/// frequency), a feeder or machine is R + s·X(p), 1/X(p) = (1/X)·[y0 + y1·p/(p + g1) + y2·p/(p + g2)] with y0 + y1 + y2 = 1: the operational
/// admittance in parallel form, g = 1/(ω·T) with the short-circuit time constants T. A motor is (R + s·X)·(p + g)/p: its AC component dies
/// out. Impedances are per unit; X is the subtransient reactance.
/// </summary>
internal sealed record OperationalSource
{
    /// <summary>R per unit.</summary>
    public required double Resistance { get; init; }

    /// <summary>X per unit, the reactance at the beginning.</summary>
    public required double Reactance { get; init; }

    /// <summary>y1: the share of the current that decays with the transient time constant.</summary>
    public double TransientShare { get; init; }

    /// <summary>g1 = 1/(ω·T′d); 0 where that share is held.</summary>
    public double TransientRate { get; init; }

    /// <summary>y2: the share of the current that decays with the subtransient time constant.</summary>
    public double SubtransientShare { get; init; }

    /// <summary>g2 = 1/(ω·T″d); 0 where that share is held.</summary>
    public double SubtransientRate { get; init; }

    /// <summary>g of a motor, whose whole current decays; 0 for what is no motor or is held.</summary>
    public double MotorRate { get; init; }

    /// <summary>R/X at the beginning.</summary>
    public double ResistanceRatio => Resistance / Reactance;

    /// <summary>Whether nothing of it decays.</summary>
    public bool IsConstant => TransientRate == 0.0 && SubtransientRate == 0.0 && MotorRate == 0.0;

    /// <summary>
    /// What a machine has its rates on open circuit from, −h: (p + g1)(p + g2) − y1·g1·(p + g2) − y2·g2·(p + g1) = p² + Linear·p + Constant = 0.
    /// </summary>
    public (double Constant, double Linear) OpenCircuit => (
        TransientRate * SubtransientRate * (1.0 - TransientShare - SubtransientShare),
        TransientRate + SubtransientRate - TransientShare * TransientRate - SubtransientShare * SubtransientRate);

    /// <summary>The impedance at a point of the plane.</summary>
    /// <param name="p">p over ω, not 0 and not a pole.</param>
    /// <param name="s">p + j, or j where reactances are kept at rated frequency.</param>
    public Complex ImpedancePu(Complex p, Complex s)
    {
        if (MotorRate > 0.0)
            return (Resistance + s * Reactance) * (p + MotorRate) / p;
        return IsConstant ? Resistance + s * Reactance : Resistance + s * Reactance / RelativeAdmittance(p);
    }

    /// <summary>y0 + y1·p/(p + g1) + y2·p/(p + g2).</summary>
    private Complex RelativeAdmittance(Complex p) =>
        1.0 - TransientShare * TransientRate / (p + TransientRate) - SubtransientShare * SubtransientRate / (p + SubtransientRate);
}
