using System.Collections.Concurrent;

namespace NetFault;

/// <summary>The networks of a study, each factored when it is first asked for, all on one symbolic factor. Safe for many threads.</summary>
internal sealed class StudyNetworks
{
    private readonly FaultMethod _method;
    private readonly ConcurrentDictionary<NetworkVariant, Lazy<SolvedNetwork>> _solved = new();

    public StudyNetworks(Network network, FaultMethod method)
    {
        _method = method;
        Matrix = CircuitMatrix.Of(CircuitBuilder.Build(network, method.BranchRules(network), log: null));
    }

    /// <summary>The circuit's matrix, shared by all networks.</summary>
    public CircuitMatrix Matrix { get; }

    /// <summary>The circuit.</summary>
    public Circuit Circuit => Matrix.Circuit;

    /// <summary>The network of an instant.</summary>
    public SolvedNetwork At(FaultInstant instant) => Of(_method.NetworkAt(instant));

    /// <summary>The network of a variant.</summary>
    public SolvedNetwork Of(NetworkVariant variant) =>
        _solved.GetOrAdd(variant, one => new Lazy<SolvedNetwork>(() => SolvedNetwork.Of(Matrix, _method, one))).Value;
}
