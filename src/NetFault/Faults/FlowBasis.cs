namespace NetFault;

/// <summary>What the flows of one fault are found from, as the method has it.</summary>
/// <param name="Network">The network with the fault.</param>
/// <param name="DrivingVoltagePu">The voltage that drives the fault current, and stands at every bus before the fault.</param>
/// <param name="Injections">Sources that feed a current of their own, by place among the circuit's sources, with its magnitude per unit.</param>
internal sealed record FlowBasis(SolvedNetwork Network, double DrivingVoltagePu, IReadOnlyList<(int Source, double CurrentPu)> Injections);
