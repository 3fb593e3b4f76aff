using System.Numerics;

namespace NetFault.Sparse;

/// <summary>What was added to one pivot to keep elimination stable.</summary>
/// <param name="Place">Where, in elimination order.</param>
/// <param name="Amount">How much.</param>
/// <param name="Uncertainty">The rounding error that the pivot may carry, as a share of the shifted pivot.</param>
internal readonly record struct PivotShift(int Place, Complex Amount, double Uncertainty);
