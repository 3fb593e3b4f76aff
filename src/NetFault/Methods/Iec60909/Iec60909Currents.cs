using System.Numerics;

namespace NetFault;

/// <summary>The currents of one fault by <see cref="Iec60909"/>. Currents that full-size converters add stand apart: they have no DC component.</summary>
internal sealed class Iec60909Currents : FaultCurrents
{
    private readonly Iec60909AtWork _work;
    private readonly StudyContext _context;
    private readonly SeenImpedances _seen;

    // Made when first asked for; two threads may make the same twice, and either is right.
    private SteadyStateCurrent? _steadyState;
    private BreakingCurrent? _breaking;
    private Iec60909Currents? _whole;

    public Iec60909Currents(Iec60909AtWork work, StudyContext context, Bus bus, in SeenImpedances seen)
    {
        _work = work;
        _context = context;
        _seen = seen;
        Bus = bus;
        DrivingVoltagePu = work.DrivingVoltagePu(seen.Node, bus);
        WithoutMotorsPu = Impedance(Iec60909.WithoutMotors, 1);
        var withMotors = Impedance(Iec60909.Initial, 0);
        MotorsLeftOut = work.LeavesMotorsOut(seen.Node, DrivingVoltagePu, seen.Through?.Whole(Iec60909.WithoutMotors) ?? WithoutMotorsPu);
        ImpedancePu = MotorsLeftOut ? WithoutMotorsPu : withMotors;
        ImpedancePartKa = Ka(DrivingVoltagePu / Complex.Abs(ImpedancePu));
        ConverterPartKa = Ka(
            work.Converters.At(seen.Node, FaultInstant.Initial, Network, work.Inside.Of(seen.Node))
                / Complex.Abs(seen.Through?.Whole(Network) ?? ImpedancePu));
    }

    /// <summary>The bus.</summary>
    public Bus Bus { get; }

    /// <summary>The node.</summary>
    public int Node => _seen.Node;

    /// <summary>c, or c·UrG/Un at a machine's terminals inside a power station unit.</summary>
    public double DrivingVoltagePu { get; }

    /// <summary>Zk without motors.</summary>
    public Complex WithoutMotorsPu { get; }

    /// <summary>Whether the motors were left out here as small.</summary>
    public bool MotorsLeftOut { get; }

    /// <summary>The network that the initial current is found in.</summary>
    public NetworkVariant Network => MotorsLeftOut ? Iec60909.WithoutMotors : Iec60909.Initial;

    /// <summary>The current through the impedance at the fault, per unit.</summary>
    public Complex CurrentPu => DrivingVoltagePu / ImpedancePu;

    /// <summary>What flows through the impedance at the fault, in kA.</summary>
    public double ImpedancePartKa { get; }

    /// <summary>
    /// What full-size converters add at the beginning, in kA. To the current through a device all that they add to the fault: no more of it can come
    /// from one side.
    /// </summary>
    public double ConverterPartKa { get; }

    /// <summary>Whether this is one of the results at every bus.</summary>
    public bool CoversEveryBus => _seen.CoversEveryBus;

    public override Complex ImpedancePu { get; }

    public override double InitialSymmetricalKa => ImpedancePartKa + ConverterPartKa;

    public override double? TransientKa => null;

    public override double? SteadyStateKa => SteadyState.Ka;

    public override ReactanceRatio Ratio => _work.Method.PeakNetwork is { } network
        ? EquivalentFrequency.Ratio(
            MotorsLeftOut ? _work.Seen(WithoutMotors(network), _seen) : Impedance(network, 2), network.FrequencyRatio)
        : _work.Smallest.At(Node, withMotors: !MotorsLeftOut);

    /// <summary>By the real resistances: those of κ are fictitious.</summary>
    public override DcDecayRule DcDecayRule =>
        ReactanceRatio.Of(ImpedancePu.Real, ImpedancePu.Imaginary).XOverR.HasValue ? DcDecayRule.ByXOverR : DcDecayRule.Undamped;

    public override AcComponentRule AcComponentRule => AcComponentRule.BreakingCurrent;

    public override double PeakKa => PerUnit.Sqrt2 * (Kappa * ImpedancePartKa + ConverterPartKa);

    public override double Residual => _seen.Residual;

    public override Iec60909Result Standard => new(this, _context);

    /// <summary>κ, with the margin 1.15 of method (b) unless all branches have R/X below 0.3.</summary>
    public double Kappa
    {
        get
        {
            var kappa = PeakFactorKappa.Of(Ratio);
            return _work.Method.XOverRRule == XOverRRule.ComplexImpedance && !_work.Smallest.AllBelow(Node, 0.3, withMotors: !MotorsLeftOut)
                ? PeakFactorKappa.WithMargin(kappa, VoltageFactor.IsLowVoltage(Bus))
                : kappa;
        }
    }

    /// <summary>Ik with the rule it came by.</summary>
    public SteadyStateCurrent SteadyState => _steadyState ??= SteadyStateCurrent.Of(_work, this);

    public override double DcComponentKa(double seconds)
    {
        var frequencyRatio = EquivalentFrequency.OfDcComponent(seconds * _context.Network.FrequencyHz);
        var variant = Iec60909.DcNetwork(frequencyRatio);
        var ratio = EquivalentFrequency.Ratio(_work.Seen(MotorsLeftOut ? WithoutMotors(variant) : variant, _seen), frequencyRatio);
        return DcComponent.Ka(ImpedancePartKa, ratio, _context.Omega * seconds);
    }

    public override double SymmetricalRmsKa(double seconds)
    {
        if (seconds < DecrementFactors.ShortestDelaySeconds)
            return InitialSymmetricalKa;
        return _seen.Through is null ? Breaking.Ka(seconds) : NotAboveWhole(InitialSymmetricalKa, whole => whole.SymmetricalRmsKa(seconds));
    }

    public override double ThermalEquivalentKa(double durationSeconds, double omega)
    {
        var m = ThermalFactors.M(Kappa, durationSeconds * _context.Network.FrequencyHz);
        return _seen.Through is null
            ? InitialSymmetricalKa * Math.Sqrt(m + ThermalFactors.N(InitialSymmetricalKa / SteadyState.Ka, durationSeconds))
            : NotAboveWhole(InitialSymmetricalKa * Math.Sqrt(m + 1.0), whole => whole.ThermalEquivalentKa(durationSeconds, omega));
    }

    /// <summary>
    /// The standard gives Ib and the heat of the AC component at the fault, not of a part of the current. A part has no decrement credited, but it
    /// is not taken above the whole, which it is one of several in phase of; a part that is larger than the whole from the beginning is.
    /// </summary>
    private double NotAboveWhole(double partKa, Func<Iec60909Currents, double> ofWhole)
    {
        if (_seen.Through is not { } through || Complex.Abs(through.Share(Network)) > 1.0 + 1e-9 || through.WholeSeen() is not { } seen)
            return partKa;
        try
        {
            return Math.Min(partKa, ofWhole(_whole ??= new Iec60909Currents(_work, _context, Bus, seen)));
        }
        catch (MethodDataException)
        {
            return partKa;      // without the data of the decrement there is none
        }
    }

    /// <summary>An impedance of the method's list, with the factors for faults inside a power station unit.</summary>
    private Complex Impedance(NetworkVariant variant, int place) =>
        _seen.Through is null ? _work.Corrected(variant, Node, _seen[place]) : _seen[place];

    /// <summary>Ib with the rule it comes by.</summary>
    public BreakingCurrent Breaking => _breaking ??= BreakingCurrent.Of(_work, this);

    private static NetworkVariant WithoutMotors(NetworkVariant variant) => variant with { Instant = FaultInstant.SteadyState };

    /// <summary>A per-unit current at this bus in kA.</summary>
    public double Ka(double perUnit) => perUnit * _context.BaseKa(Bus);
}
