namespace NetFault;

/// <summary>Whether a fault has an X/R, and if not, why.</summary>
public enum XOverRStatus
{
    /// <summary>X/R is known.</summary>
    Known,

    /// <summary>The resistance at the fault is 0 or negative: the DC component does not decay, or the data are not physical.</summary>
    NoResistance,

    /// <summary>The reactance at the fault is 0 or negative: the network looks capacitive from there.</summary>
    NotInductive,

    /// <summary>The bus is de-energised.</summary>
    DeEnergised,
}

/// <summary>How the DC component is taken to decay.</summary>
public enum DcDecayRule
{
    /// <summary>With the time constant (X/R)/ω.</summary>
    ByXOverR,

    /// <summary>
    /// As the network's inductances and resistances have it: the sum of all its time constants at the bus, the envelope of the worst closing angle.
    /// </summary>
    Exact,

    /// <summary>Not at all: the upper bound that is taken where there is no X/R.</summary>
    Undamped,

    /// <summary>There is no current: the bus is de-energised.</summary>
    NoCurrent,
}

/// <summary>How the AC component is taken over time.</summary>
public enum AcComponentRule
{
    /// <summary>Held at I″k: on the safe side, for the machines' AC decrement is not credited.</summary>
    HeldAtInitial,

    /// <summary>
    /// By IEC 60909-0: at a time t it is the breaking current Ib of the minimum time delay t, and I″k before the 0.02 s at which the
    /// standard's curves begin.
    /// </summary>
    BreakingCurrent,

    /// <summary>
    /// By the decay of all machines of the network together, with the network's reactances at rated frequency: the textbook's way. At t = 0 it
    /// is I″k.
    /// </summary>
    QuasiStatic,

    /// <summary>
    /// The same with the network's inductances in place of reactances: the AC component of the exact solution. At t = 0 it differs a little from
    /// I″k, commonly by less than 1 percent.
    /// </summary>
    Exact,

    /// <summary>
    /// By IEEE Std C37.010, the network of the time: first-cycle before 1.5 cycles, then interrupting, from 30 cycles the 30-cycle network.
    /// </summary>
    NetworkOfTime,
}

/// <summary>X/R at a fault by a named rule.</summary>
/// <param name="XOverR">X/R, or null.</param>
/// <param name="Status">Why there is none, where there is none.</param>
internal readonly record struct ReactanceRatio(double? XOverR, XOverRStatus Status)
{
    /// <summary>A resistance below this share of |Zk| is rounding: elements without resistance leave it, and X/R would be noise.</summary>
    private const double NoResistance = 1e-12;

    /// <summary>X/R of a resistance and a reactance.</summary>
    public static ReactanceRatio Of(double r, double x)
    {
        if (x <= NoResistance * Math.Abs(r))
            return new ReactanceRatio(null, XOverRStatus.NotInductive);
        return r <= NoResistance * x
            ? new ReactanceRatio(null, XOverRStatus.NoResistance)
            : new ReactanceRatio(x / r, XOverRStatus.Known);
    }
}
