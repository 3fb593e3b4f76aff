using System.Numerics;

namespace NetFault;

/// <summary>The networks of a study, each factored when it is first asked for, all on one symbolic factor. Safe for many threads.</summary>
internal sealed class StudyNetworks
{
    private readonly Lazy<SolvedNetwork>[] _instants;
    private readonly Lazy<SolvedNetwork> _reactances;
    private readonly Lazy<SolvedNetwork> _resistances;

    public StudyNetworks(Network network, FaultMethod method)
    {
        Matrix = CircuitMatrix.Of(CircuitBuilder.Build(network, log: null));
        var sources = new Lazy<Complex?[]>(() => Sources(FaultInstant.Initial));
        _instants =
        [
            new(() => SolvedNetwork.Of(Matrix, sources.Value, ImpedancePart.Complex)),
            new(() => SolvedNetwork.Of(Matrix, Sources(FaultInstant.Transient), ImpedancePart.Complex)),
            new(() => SolvedNetwork.Of(Matrix, Sources(FaultInstant.SteadyState), ImpedancePart.Complex)),
        ];
        _reactances = new(() => SolvedNetwork.Of(Matrix, sources.Value, ImpedancePart.Reactance));
        _resistances = new(() => SolvedNetwork.Of(Matrix, sources.Value, ImpedancePart.Resistance));

        Complex?[] Sources(FaultInstant instant) => method.SourceImpedances(Matrix.Circuit, instant, log: null);
    }

    /// <summary>The circuit's matrix, shared by all networks.</summary>
    public CircuitMatrix Matrix { get; }

    /// <summary>The circuit.</summary>
    public Circuit Circuit => Matrix.Circuit;

    /// <summary>The network of the reactances alone, at the beginning of the short circuit.</summary>
    public SolvedNetwork Reactances => _reactances.Value;

    /// <summary>The network of the resistances alone, at the beginning of the short circuit.</summary>
    public SolvedNetwork Resistances => _resistances.Value;

    /// <summary>The network of an instant.</summary>
    public SolvedNetwork At(FaultInstant instant) => _instants[(int)instant].Value;
}
