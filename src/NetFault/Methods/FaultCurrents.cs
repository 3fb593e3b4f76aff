using System.Numerics;

namespace NetFault;

/// <summary>The currents of one fault by one method. Immutable.</summary>
internal abstract class FaultCurrents
{
    /// <summary>I″k in kA.</summary>
    public abstract double InitialSymmetricalKa { get; }

    /// <summary>I′k in kA; null where the method does not give it or was not asked for it.</summary>
    public abstract double? TransientKa { get; }

    /// <summary>Ik in kA; null where the method was not asked for it.</summary>
    public abstract double? SteadyStateKa { get; }

    /// <summary>Zk of the initial network with the fault's own impedance, per unit.</summary>
    public abstract Complex ImpedancePu { get; }

    /// <summary>X/R at the fault.</summary>
    public abstract ReactanceRatio Ratio { get; }

    /// <summary>How the DC component decays.</summary>
    public virtual DcDecayRule DcDecayRule => Ratio.XOverR.HasValue ? DcDecayRule.ByXOverR : DcDecayRule.Undamped;

    /// <summary>How the AC component is taken over time.</summary>
    public abstract AcComponentRule AcComponentRule { get; }

    /// <summary>ip in kA.</summary>
    public abstract double PeakKa { get; }

    /// <summary>The largest residual of the solutions behind these currents.</summary>
    public abstract double Residual { get; }

    /// <summary>What the method gives beyond the quantities that all methods share, where it is IEC 60909-0.</summary>
    public virtual Iec60909Result? Standard => null;

    /// <summary>The same, where it is IEEE Std C37.010.</summary>
    public virtual IeeeC37Result? Ieee => null;

    /// <summary>The current of a phase in kA at a closing angle in radians; null where the method gives no waveform.</summary>
    public virtual double? InstantaneousKa(double seconds, double closingAngle) => null;

    /// <summary>The DC component of that phase; null where the method gives no waveform.</summary>
    public virtual double? DcOfPhaseKa(double seconds, double closingAngle) => null;

    /// <summary>The largest instantaneous current over time and closing angle; null where the method gives no waveform.</summary>
    public virtual PeakCurrent? WorstPeak => null;

    /// <summary>The bound of the error with which a time's currents were found, relative to I″k; 0 for closed formulas.</summary>
    public virtual double ErrorBoundAt(double seconds) => 0.0;

    /// <summary>
    /// The thermal equivalent current in kA: the current whose heat in the time is that of AC and DC component together. Here the AC component is
    /// held at I″k.
    /// </summary>
    /// <param name="durationSeconds">Tk.</param>
    /// <param name="omega">ω in rad/s.</param>
    public virtual double ThermalEquivalentKa(double durationSeconds, double omega) =>
        InitialSymmetricalKa * Math.Sqrt(1.0 + ThermalHeat.OfDc(Ratio, durationSeconds, omega));

    /// <summary>i_dc(t) in kA.</summary>
    public abstract double DcComponentKa(double seconds);

    /// <summary>Iac(t) in kA.</summary>
    public abstract double SymmetricalRmsKa(double seconds);
}

/// <summary>A method at work on one study: makes the currents of each fault. Immutable, or safe for many threads.</summary>
internal abstract class CurrentsOfMethod
{
    /// <summary>The currents of a fault at a bus, from the impedances seen there in the method's networks.</summary>
    public abstract FaultCurrents At(StudyContext context, int bus, in SeenImpedances seen);

    /// <summary>
    /// The network of a variant as a fault at a node sees it, where that is another one than elsewhere (IEC 60909-0 inside power station units);
    /// else null.
    /// </summary>
    /// <param name="node">The node with the fault.</param>
    /// <param name="variant">The variant.</param>
    /// <param name="forTransformer">For the part through a unit transformer, which the standard takes uncorrected.</param>
    public virtual SolvedNetwork? NetworkSeenFrom(int node, NetworkVariant variant, bool forTransformer = false) => null;

    /// <summary>What the flows of a fault at a bus are found from.</summary>
    public abstract FlowBasis FlowsAt(StudyContext context, int bus, FaultInstant instant);

    /// <summary>How the AC component of these flows is found.</summary>
    public virtual AcComponentRule? AcRuleOfFlows => null;

    /// <summary>What the flows of a fault at a bus at a time are summed from, one after the other.</summary>
    public virtual IEnumerable<FlowBasis> FlowsAtTime(StudyContext context, int bus, double seconds, Complex faultPu) =>
        throw new NotSupportedException($"{context.Method.Name} gives no branch currents over time; ask for those of an instant, or take MachineDecrement");

    /// <summary>The rules for the DC component beside the exact one.</summary>
    public virtual DcRuleComparison CompareDcRules(StudyContext context, double seconds, CancellationToken cancellation) =>
        throw new NotSupportedException($"{context.Method.Name} has its own rule for the DC component; compare rules by MachineDecrement");

    /// <summary>What the currents over time of every bus are found from, beside the method's networks.</summary>
    public virtual IReadOnlyList<DecayPart> PartsOverTime() => [];
}

/// <summary>The heat of a current's DC component.</summary>
internal static class ThermalHeat
{
    /// <summary>
    /// Over that of I″k in the same time: (1/(I″k²·Tk))·∫i_dc² dt = (τ/Tk)·(1 − e^(−2·Tk/τ)), τ = (X/R)/ω; 2 without decay. With τ of κ it is m of
    /// IEC 60909-0.
    /// </summary>
    public static double OfDc(in ReactanceRatio ratio, double durationSeconds, double omega)
    {
        if (ratio.XOverR is not { } xOverR)
            return 2.0;
        var share = xOverR / (omega * durationSeconds);
        return share * (1.0 - Math.Exp(-2.0 / share));
    }
}
