using System.Numerics;

namespace NetFault;

/// <summary>
/// The quadratures of one study and what they need of its networks: for each window of time that is asked for, a rule that meets the error
/// asked for, and at each of its nodes p the network factored and Zkk(p) of every bus taken. Made when first asked for; safe for many threads.
/// </summary>
internal sealed class DecaySolution
{
    private readonly StudyNetworks _networks;
    private readonly bool _quasiStatic;
    private readonly double _errorLimit;
    private readonly double _horizonAngle;
    private readonly OperationalSource?[] _sources;
    private readonly Lazy<PoleLimits> _limits;
    private readonly Lazy<DecaySolution> _throughResistance;
    private readonly Lazy<PoleRegion> _region;
    private readonly DecayPart[] _parts;

    /// <param name="networks">The study's networks.</param>
    /// <param name="quasiStatic">Whether reactances are kept at rated frequency.</param>
    /// <param name="horizonAngle">ω times the horizon.</param>
    /// <param name="errorLimit">The largest bound of the error that is accepted.</param>
    /// <param name="faultRatio">The largest R/X of the fault's own impedance.</param>
    public DecaySolution(StudyNetworks networks, bool quasiStatic, double horizonAngle, double errorLimit, double faultRatio = 0.0)
    {
        _networks = networks;
        _quasiStatic = quasiStatic;
        _horizonAngle = horizonAngle;
        _errorLimit = errorLimit;
        _sources = OperationalSources.Of(networks.Circuit, log: null);
        _limits = new(() => NetworkPoles.LimitsOf(networks, _sources, quasiStatic).WithRatio(faultRatio));
        _throughResistance = new(() => new DecaySolution(networks, quasiStatic, horizonAngle, errorLimit, double.PositiveInfinity));
        _region = new(() => new PoleRegion(_limits.Value, quasiStatic));
        var windows = quasiStatic ? DecayWindow.QuasiStatic : DecayWindow.Exact;
        _parts = windows.Select(window => new DecayPart(this, window)).ToArray();
    }

    /// <summary>
    /// The solution for a fault through an impedance. One of larger R/X than all of the network moves the poles' limits; a rule for it takes no
    /// R/X for granted.
    /// </summary>
    public DecaySolution For(Complex faultPu) =>
        faultPu == Complex.Zero || faultPu.Real <= _limits.Value.LargestResistanceRatio * faultPu.Imaginary ? this : _throughResistance.Value;

    /// <summary>The window's part for a time.</summary>
    /// <param name="angle">ω·t, within the horizon.</param>
    public DecayPart PartAt(double angle) => _parts.First(part => angle <= part.Window.LastAngle);

    /// <summary>The parts that a horizon needs.</summary>
    public IEnumerable<DecayPart> PartsOfHorizon => PartsUpTo(_horizonAngle);

    /// <summary>The parts that begin before a time.</summary>
    /// <param name="angle">ω·t.</param>
    public IEnumerable<DecayPart> PartsUpTo(double angle) => _parts.Where(part => part.Window.FirstAngle <= angle);

    /// <summary>The network at a node of the quadrature.</summary>
    public SolvedNetwork NetworkAt(Complex node)
    {
        var s = _quasiStatic ? Complex.ImaginaryOne : node + Complex.ImaginaryOne;
        var impedances = Array.ConvertAll(_sources, source => source?.ImpedancePu(node, s));
        return SolvedNetwork.Of(_networks.Matrix, impedances, _networks.Circuit.BranchImpedances, VariantAt(node));
    }

    /// <summary>The network's description at a node; the fault's impedance follows from it.</summary>
    public NetworkVariant VariantAt(Complex node) => new()
    {
        Name = "network at a node of the quadrature",
        ReactanceFactor = _quasiStatic ? null : node + Complex.ImaginaryOne,
        IsAtNode = true,
    };

    /// <summary>The first rule of a window that meets the error asked for.</summary>
    /// <exception cref="CurrentOverTimeException">None does.</exception>
    public QuadratureRule RuleOf(DecayWindow window)
    {
        for (var i = 0; ; i++)
        {
            var rule = new QuadratureRule(window.Tables[i], _region.Value);
            var isLast = i == window.Tables.Count - 1;
            var error = ErrorOf(rule, window, isLast ? double.PositiveInfinity : WantedError);
            if (error <= WantedError || (isLast && error <= _errorLimit))
                return rule;
            if (isLast)
                throw TooLarge(error);
        }
    }

    /// <summary>The largest error bound of a rule in its window, or one above what is good enough to go on.</summary>
    private double ErrorOf(QuadratureRule rule, DecayWindow window, double enough)
    {
        var worst = 0.0;
        foreach (var angle in window.Probes(_horizonAngle))
        {
            worst = Math.Max(worst, rule.At(angle).Error);
            if (worst > enough)
                break;
        }
        return worst;
    }

    /// <summary>Refuses a time at which the bound is above what is accepted, which the times that were probed did not show.</summary>
    public void RefuseAbove(double bound)
    {
        if (bound > _errorLimit)
            throw TooLarge(bound);
    }

    /// <summary>Quasi-static decay is cheap to have nearly to rounding; the inductances' transients are held to what was asked for.</summary>
    private double WantedError => _quasiStatic ? Math.Min(_errorLimit, 1e-9) : 0.4 * _errorLimit;

    private CurrentOverTimeException TooLarge(double bound) => CurrentOverTimeException.Because(
        FormattableString.Invariant($"the error bound is {bound:0.#e+0} of I″k, above the {_errorLimit:0.#e+0} that MachineDecrement.DecayErrorLimit accepts"),
        $"raise DecayErrorLimit, shorten HorizonSeconds, or look at what spreads the poles so far: {_limits.Value}");
}
