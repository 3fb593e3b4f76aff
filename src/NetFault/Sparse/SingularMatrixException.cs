namespace NetFault.Sparse;

/// <summary>The matrix is singular to working precision, or a value in it is not finite.</summary>
internal sealed class SingularMatrixException : Exception
{
    public SingularMatrixException(int node, double relativePivot)
        : base($"The matrix is singular to working precision at node {node} (relative pivot {relativePivot:g3}).")
    {
        Node = node;
        RelativePivot = relativePivot;
    }

    /// <summary>The node, in original numbering, at which elimination broke down. It lies in the part of the graph that is singular.</summary>
    public int Node { get; }

    /// <summary>What is left of the pivot, relative to what it was made of; NaN where a value was not finite.</summary>
    public double RelativePivot { get; }
}
