namespace NetFault;

/// <summary>The duties of one device as they are written down.</summary>
internal sealed class DutySheet
{
    /// <summary>Relative difference of required and rated that is rounding.</summary>
    private const double Rounding = 1e-9;

    private readonly List<Duty> _duties = [];
    private readonly List<Assumption> _assumptions = [];
    private readonly List<string> _remarks = [];

    public DutySheet(StudyContext context, DutyOptions options, RatedDevice device, DeviceCurrents currents)
    {
        Context = context;
        Options = options;
        Device = device;
        Currents = currents;
        Both = device is Busbar ? [currents.BeyondDevice] : [currents.AtBus, currents.BeyondDevice];
    }

    /// <summary>The study.</summary>
    public StudyContext Context { get; }

    /// <summary>How to judge.</summary>
    public DutyOptions Options { get; }

    /// <summary>The device.</summary>
    public RatedDevice Device { get; }

    /// <summary>The currents through it.</summary>
    public DeviceCurrents Currents { get; }

    /// <summary>Both sides; for a busbar the whole fault.</summary>
    public IReadOnlyList<ThroughCurrent> Both { get; }

    /// <summary>The rated frequency in Hz.</summary>
    public double FrequencyHz => Context.Network.FrequencyHz;

    /// <summary>What was written.</summary>
    public DeviceDuty Finished() => new(
        Context, Device, Currents, _duties.AsReadOnly(), _assumptions.Distinct().ToList().AsReadOnly(), _remarks.Distinct().ToList().AsReadOnly());

    /// <summary>Notes a value that was assumed.</summary>
    public void Assume(string key, string text) => _assumptions.Add(new Assumption(Device.Section, Device.Id, key, text));

    /// <summary>Notes what a reader must know.</summary>
    public void Remark(string text) => _remarks.Add(text);

    /// <summary>Judges a duty by its worst side.</summary>
    /// <param name="kind">The duty.</param>
    /// <param name="rated">The rating; null where it is missing.</param>
    /// <param name="missing">The key that would give it.</param>
    /// <param name="sides">The currents that may flow.</param>
    /// <param name="required">What a current asks for.</param>
    /// <param name="formula">Both in words.</param>
    /// <param name="unit">The unit of both.</param>
    public void Judge(
        DutyKind kind, double? rated, string missing, IReadOnlyList<ThroughCurrent> sides, Func<ThroughCurrent, double> required, string formula,
        string unit = "kA")
    {
        var (worst, value) = (sides[0], required(sides[0]));
        foreach (var side in sides.Skip(1))
        {
            if (required(side) is var other && other > value)
                (worst, value) = (side, other);
        }
        var faultSide = Device is Busbar ? (FaultSide?)null : worst.Side;
        if (rated is not { } rating)
        {
            _duties.Add(new Duty(kind, DutyVerdict.CannotSay, value, null, unit, formula, $"{missing} is not given", worst.BusId, faultSide, false));
            return;
        }
        var passes = value <= rating * (1.0 + Rounding);
        var isMarginal = passes && value > 0.0 && 100.0 * (rating / value - 1.0) < Options.MarginalPercent;
        _duties.Add(new Duty(kind, passes ? DutyVerdict.Pass : DutyVerdict.Fail, value, rating, unit, formula, null, worst.BusId, faultSide, isMarginal));
    }

    /// <summary>Notes a duty that cannot be judged.</summary>
    public void CannotSay(DutyKind kind, string reason, string formula) =>
        _duties.Add(new Duty(kind, DutyVerdict.CannotSay, null, null, "kA", formula, reason, null, null, false));

    /// <summary>A time for which the method gives currents: not beyond its horizon, where the currents are not smaller.</summary>
    public double WithinHorizon(double seconds)
    {
        if (Context.Method is not MachineDecrement method || seconds <= method.HorizonSeconds)
            return seconds;
        Remark(FormattableString.Invariant(
            $"contacts part at {seconds:0.###} s, beyond the method's horizon: the currents are those at {method.HorizonSeconds} s, no smaller ones"));
        return method.HorizonSeconds;
    }
}
