using System.Numerics;

namespace NetFault;

/// <summary>By which rule of IEC 60909-0:2016, clause 10, a symmetrical breaking current was found.</summary>
public enum BreakingCurrentRule
{
    /// <summary>No machine feeds the fault with more than twice its rated current: Ib = I″k (far from generators).</summary>
    FarFromMachines,

    /// <summary>
    /// Non-meshed: with the faulted node taken out, no connected part holds more than one source. Ib is the sum of the parts, each machine
    /// with its μ, or μ·q.
    /// </summary>
    Radial,

    /// <summary>Meshed: I″k less Σ(ΔU″/(c·Un/√3))·(1 − μ)·I″kG and Σ(ΔU″/(c·Un/√3))·(1 − μ·q)·I″kM.</summary>
    Meshed,
}

/// <summary>The symmetrical breaking current at a fault.</summary>
internal sealed class BreakingCurrent
{
    private readonly Iec60909AtWork _work;
    private readonly Iec60909Currents _fault;
    private readonly IReadOnlyList<PartialCurrent> _shares;

    private BreakingCurrent(Iec60909AtWork work, Iec60909Currents fault)
    {
        _work = work;
        _fault = fault;
        _shares = work.Partial.Of(fault);
    }

    /// <summary>The rule.</summary>
    public BreakingCurrentRule Rule => _shares.Count == 0
        ? BreakingCurrentRule.FarFromMachines
        : _work.IsRadial(_fault.Node, withMotors: !_fault.MotorsLeftOut) ? BreakingCurrentRule.Radial : BreakingCurrentRule.Meshed;

    public static BreakingCurrent Of(Iec60909AtWork work, Iec60909Currents fault) => new(work, fault);

    /// <summary>The machines that count, for the result.</summary>
    public IReadOnlyList<MachineShare> Machines() => _shares.Select(share => MachineShare.Of(_work.Circuit, share)).ToList().AsReadOnly();

    /// <summary>Ib in kA at a minimum time delay, with what full-size converters add.</summary>
    public double Ka(double delaySeconds)
    {
        var current = _fault.CurrentPu;
        var meshed = Rule == BreakingCurrentRule.Meshed;
        foreach (var share in _shares)
        {
            var lost = 1.0 - Kept(share, delaySeconds);
            current -= lost * share.Current * (meshed
                ? new Complex(0.0, share.Impedance.Imaginary) * share.Current / _fault.DrivingVoltagePu
                : _work.Transfer(_fault, share, _fault.Network));
        }
        return _fault.Ka(Complex.Abs(current)) + _fault.ConverterPartKa;
    }

    /// <summary>μ, or μ·q, or 0 for a converter-fed drive, which contributes to I″k and ip alone.</summary>
    private double Kept(in PartialCurrent share, double delaySeconds) => _work.Circuit.Network.Elements[_work.Circuit.Sources[share.Source].Element] switch
    {
        ConverterFedDrive => 0.0,
        SynchronousMachine => DecrementFactors.MuAt(share.Ratio, delaySeconds),
        _ => MachineShare.Of(_work.Circuit, share).Kept(delaySeconds),
    };
}
