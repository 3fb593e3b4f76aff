using System.Numerics;

namespace NetFault;

/// <summary>One network from which the flows of a fault are found, as the method has it; flows of a time are a weighted sum over several.</summary>
/// <param name="Network">The network with the fault.</param>
/// <param name="DrivingVoltagePu">The voltage that drives the fault current, and stands at every bus before the fault.</param>
/// <param name="Weight">What its currents are multiplied with in the sum.</param>
/// <param name="Injections">Sources that feed a current of their own, by place among the circuit's sources, with its magnitude per unit.</param>
internal sealed record FlowBasis(
    SolvedNetwork Network, double DrivingVoltagePu, Complex Weight, IReadOnlyList<(int Source, double CurrentPu)> Injections)
{
    /// <summary>The network of an instant, alone.</summary>
    public static FlowBasis Of(
        SolvedNetwork network, double drivingVoltagePu, IReadOnlyList<(int Source, double CurrentPu)>? injections = null) =>
        new(network, drivingVoltagePu, Complex.One, injections ?? []);
}
