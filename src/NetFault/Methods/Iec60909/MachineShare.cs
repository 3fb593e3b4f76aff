using System.Numerics;

namespace NetFault;

/// <summary>A machine's share of a short-circuit current, and what of it is left at contact parting (IEC 60909-0:2016, clause 10).</summary>
public sealed class MachineShare
{
    private readonly Network _network;
    private readonly NetworkElement _element;

    private MachineShare(Network network, NetworkElement element, double initialKa, double ratedKa)
    {
        _network = network;
        _element = element;
        InitialKa = initialKa;
        RatedKa = ratedKa;
    }

    /// <summary>The machine's section, such as <c>synchronous_machines</c>.</summary>
    public string Section => _element.Section;

    /// <summary>The machine's id.</summary>
    public string Id => _element.Id;

    /// <summary>I″kG or I″kM, the machine's own initial current in kA at its terminals.</summary>
    public double InitialKa { get; }

    /// <summary>IrG or IrM, the rated current of the machine, or of the whole group, in kA.</summary>
    public double RatedKa { get; }

    /// <summary>I″kG/IrG or I″kM/IrM.</summary>
    public double RatioToRated => InitialKa / RatedKa;

    /// <summary>μ at a minimum time delay.</summary>
    /// <param name="minimumTimeDelaySeconds">tmin in seconds, at least 0.02.</param>
    public double Mu(double minimumTimeDelaySeconds) => DecrementFactors.MuAt(RatioToRated, Delay(minimumTimeDelaySeconds));

    /// <summary>q of an asynchronous motor at a minimum time delay; 1 for other machines, and where the ratio to the rated current is not above 2.</summary>
    /// <param name="minimumTimeDelaySeconds">tmin in seconds, at least 0.02.</param>
    /// <exception cref="MethodDataException">The motor does not give its pole pairs.</exception>
    public double Q(double minimumTimeDelaySeconds)
    {
        if (_element is not AsynchronousMotor motor || RatioToRated <= 2.0)
            return 1.0;
        var pairs = motor.PolePairs ?? throw MethodDataException.Missing(_network, motor, "pole_pairs", "the factor q needs the power of one pole pair");
        return DecrementFactors.QAt(motor.RatedKw / 1000.0 / pairs, Delay(minimumTimeDelaySeconds));
    }

    /// <summary>The share of the machine's current that is left at contact parting: μ·q; 0 for a converter-fed drive.</summary>
    internal double Kept(double delaySeconds) => Mu(delaySeconds) * Q(delaySeconds);

    internal static MachineShare Of(Circuit circuit, in PartialCurrent share)
    {
        var element = circuit.Sources[share.Source].Element;
        var bus = circuit.Network.Buses[circuit.Network.Topology.TerminalBus(element, 0)];
        var baseKa = PerUnit.BaseKa(bus.NominalKv, circuit.Network.BaseMva);
        return new MachineShare(circuit.Network, circuit.Network.Elements[element], Complex.Abs(share.Current) * baseKa, share.Rated * baseKa);
    }

    private static double Delay(double seconds) =>
        seconds >= DecrementFactors.ShortestDelaySeconds && !double.IsInfinity(seconds)
            ? seconds
            : throw new ArgumentOutOfRangeException(nameof(seconds), seconds, "IEC 60909-0 gives no decrement below a minimum time delay of 0.02 s");
}
