using System.Numerics;

namespace NetFault.Sparse;

/// <summary>What was added to one pivot to keep elimination stable.</summary>
/// <param name="Place">Where, in elimination order.</param>
/// <param name="Amount">How much.</param>
internal readonly record struct PivotShift(int Place, Complex Amount);
