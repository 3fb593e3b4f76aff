using System.Numerics;

namespace NetFault.Sparse;

/// <summary>
/// What the pattern alone says about a factorisation L·D·Lᵀ = P·A·Pᵀ: the elimination order P, the elimination tree and the pattern of L.
/// Immutable; serves any number of factorisations with other values, from any number of threads.
/// </summary>
internal sealed unsafe class SymbolicFactor
{
    private SymbolicFactor(SymmetricPattern pattern, int[] nodeAt, int[] placeOf, int[] parent, int[] columnStart)
    {
        Pattern = pattern;
        NodeAt = nodeAt;
        PlaceOf = placeOf;
        Parent = parent;
        ColumnStart = columnStart;
        RowIndex = new int[columnStart[columnStart.Length - 1]];
        PositionOfSlot = new int[pattern.SlotCount];
        Supernodes = Supernodes.Find(parent, columnStart);
    }

    /// <summary>The pattern that was analysed.</summary>
    public SymmetricPattern Pattern { get; }

    /// <summary>Number of rows.</summary>
    public int Order => Pattern.Order;

    /// <summary>Entries of L below the diagonal.</summary>
    public int FactorEntries => RowIndex.Length;

    /// <summary>The original node at each place of the elimination order, a postorder of the elimination tree.</summary>
    public int[] NodeAt { get; }

    /// <summary>The place of each original node in the elimination order.</summary>
    public int[] PlaceOf { get; }

    /// <summary>The elimination tree, by place; −1 at a root.</summary>
    public int[] Parent { get; }

    /// <summary>Starts of the columns of L, length <see cref="Order"/> + 1, by place.</summary>
    public int[] ColumnStart { get; }

    /// <summary>Rows of L below the diagonal, ascending in each column, by place.</summary>
    public int[] RowIndex { get; }

    /// <summary>The position in <see cref="RowIndex"/> of each slot of the pattern.</summary>
    public int[] PositionOfSlot { get; }

    /// <summary>The dense blocks of L.</summary>
    public Supernodes Supernodes { get; }

    /// <summary>Orders the nodes for little fill and works out the pattern of L. O(entries of L), but for the ordering.</summary>
    public static SymbolicFactor Analyze(SymmetricPattern pattern)
    {
        var graph = new Adjacency(pattern);
        return Analyze(pattern, graph, MinimumDegree.Order(graph));
    }

    /// <summary>Works out the pattern of L for a given order of elimination, which is relabelled to a postorder of the same fill.</summary>
    public static SymbolicFactor Analyze(SymmetricPattern pattern, Adjacency graph, int[] order)
    {
        int n = pattern.Order;
        using var work = new Scratch<int>(4 * n + 1);
        Span<int> parent = work.Span.Slice(0, n), count = work.Span.Slice(n, n), postorder = work.Span.Slice(2 * n, n);
        Span<int> place = work.Span.Slice(3 * n, n);
        Invert(order, place);
        EliminationTree.Build(graph, order, place, parent, count);
        EliminationTree.Postorder(parent, postorder);
        var symbolic = Relabel(pattern, order, parent, count, postorder);
        symbolic.FillPattern(graph);
        symbolic.LocateSlots(graph);
        return symbolic;
    }

    /// <summary>Factors a matrix with this pattern.</summary>
    /// <param name="diagonal">The diagonal, by node.</param>
    /// <param name="offDiagonal">Entries below it, by slot of <see cref="Pattern"/>.</param>
    /// <exception cref="SingularMatrixException">Singular to working precision, or a value is not finite.</exception>
    public LdlFactor Factor(ReadOnlySpan<Complex> diagonal, ReadOnlySpan<Complex> offDiagonal) =>
        LdlFactorization.Run(this, diagonal, offDiagonal);

    private static SymbolicFactor Relabel(
        SymmetricPattern pattern, ReadOnlySpan<int> order, ReadOnlySpan<int> parent, ReadOnlySpan<int> count, ReadOnlySpan<int> postorder)
    {
        int n = order.Length;
        int[] newPlace = new int[n], nodeAt = new int[n], newParent = new int[n], columnStart = new int[n + 1];
        Invert(postorder, newPlace);
        for (int k = 0; k < n; k++)
        {
            int old = postorder[k];
            nodeAt[k] = order[old];
            newParent[k] = parent[old] < 0 ? EliminationTree.None : newPlace[parent[old]];
            columnStart[k + 1] = checked(columnStart[k] + count[old]);
        }

        Invert(nodeAt, newPlace);
        return new SymbolicFactor(pattern, nodeAt, newPlace, newParent, columnStart);
    }

    private static void Invert(ReadOnlySpan<int> permutation, Span<int> inverse)
    {
        for (int k = 0; k < permutation.Length; k++)
        {
            inverse[permutation[k]] = k;
        }
    }

    /// <summary>Row by row as in <see cref="EliminationTree.Build"/>, which leaves each column's rows ascending.</summary>
    private void FillPattern(Adjacency graph)
    {
        int n = Order;
        using var next = new Scratch<int>(n + 1);
        using var visitedFor = new Scratch<int>(n + 1);
        ColumnStart.CopyTo(next.Span);
        fixed (int* start = graph.Start, neighbour = graph.Neighbour, at = PlaceOf, up = Parent, end = next, visited = visitedFor,
            rows = RowIndex)
        {
            for (int k = 0; k < n; k++)
            {
                int node = NodeAt[k];
                visited[k] = k; // before any later row looks at it, so the array need not be cleared
                for (int p = start[node], last = start[node + 1]; p < last; p++)
                {
                    for (int i = at[neighbour[p]]; i < k && visited[i] != k; i = up[i])
                    {
                        rows[end[i]++] = k;
                        visited[i] = k;
                    }
                }
            }
        }
    }

    /// <summary>Finds each slot of A in L: a slot belongs to the column of its end that is eliminated first.</summary>
    private void LocateSlots(Adjacency graph)
    {
        int n = Order;
        using var positionOfRow = new Scratch<int>(n + 1);
        fixed (int* start = graph.Start, neighbour = graph.Neighbour, slotOf = graph.Slot, at = PlaceOf, columns = ColumnStart,
            rows = RowIndex, position = positionOfRow, positionOfSlot = PositionOfSlot)
        {
            for (int j = 0; j < n; j++)
            {
                for (int p = columns[j]; p < columns[j + 1]; p++)
                {
                    position[rows[p]] = p;
                }

                int node = NodeAt[j];
                for (int p = start[node]; p < start[node + 1]; p++)
                {
                    int i = at[neighbour[p]];
                    if (i > j)
                    {
                        positionOfSlot[slotOf[p]] = position[i];
                    }
                }
            }
        }
    }
}
