using System.Numerics;

namespace NetFault;

/// <summary>What all results of a study share.</summary>
internal sealed record StudyContext(Network Network, FaultMethod Method, StudyNetworks Networks, StudyAssumptions Assumptions)
{
    private readonly Lazy<CurrentsOfMethod> _currents = new(() => Method.Begin(Networks));

    /// <summary>ω = 2πf in rad/s.</summary>
    public double Omega { get; } = 2.0 * Math.PI * Network.FrequencyHz;

    /// <summary>The method at work on this study.</summary>
    public CurrentsOfMethod Currents => _currents.Value;

    /// <summary>Base impedance at a bus in ohm.</summary>
    public double BaseOhm(Bus bus) => PerUnit.BaseOhm(bus.NominalKv, Network.BaseMva);

    /// <summary>Base current at a bus in kA.</summary>
    public double BaseKa(Bus bus) => PerUnit.BaseKa(bus.NominalKv, Network.BaseMva);

    /// <summary>The magnitude in kA of the current that the driving voltage sends through an impedance at a bus.</summary>
    public double CurrentKa(Bus bus, Complex impedancePu) =>
        Method.DrivingVoltagePu(bus) / Complex.Abs(impedancePu) * BaseKa(bus);
}
