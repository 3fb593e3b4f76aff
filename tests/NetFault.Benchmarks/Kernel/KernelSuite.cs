using System.Numerics;
using NetFault.Sparse;

namespace NetFault.Benchmarks.Kernel;

/// <summary>The numerical kernel against the same steps in plain C, and against KLU with one solve a node.</summary>
internal static class KernelSuite
{
    public static int Run(string[] args)
    {
        bool quick = args.Contains("--quick");
        string folder = args.FirstOrDefault(a => !a.StartsWith("--", StringComparison.Ordinal))
            ?? Environment.GetEnvironmentVariable("NETFAULT_NETWORKS") ?? Path.Combine("..", "shared", "networks");
        GridMatrix?[] grids =
        [
            CaseFile.TryRead(folder, "case1354_pegase"), CaseFile.TryRead(folder, "case10000_goc"),
            GeneratedGrid.Create(1_000), GeneratedGrid.Create(10_000), GeneratedGrid.Create(100_000),
        ];
        var table = new ResultTable();
        NativeKernel? native = NativeKernel.TryLoad();
        Klu? klu = quick ? null : Klu.TryLoad();
        foreach (GridMatrix grid in grids.OfType<GridMatrix>())
        {
            Compare(grid, native, table);
            Steps(grid, table);
            if (klu is not null && grid.Order <= 10_000)
            {
                Compare(grid, klu, table);
            }
        }

        table.Print(Console.Out);
        return 0;
    }

    private static SelectedInverse Ours(GridMatrix grid) =>
        SelectedInverse.Of(SymbolicFactor.Analyze(grid.Pattern).Factor(grid.Diagonal, grid.OffDiagonal));

    private static void Compare(GridMatrix grid, NativeKernel? native, ResultTable table)
    {
        if (native is null)
        {
            return;
        }

        Complex[] diagonal = new Complex[grid.Order], offDiagonal = new Complex[grid.Pattern.SlotCount];
        int entries = native.Run(grid, diagonal, offDiagonal);
        Agree(grid, "plain C", diagonal, grid.Order);
        double[] times = Stopwatches.Medians(
            Rounds(grid), TimeSpan.FromSeconds(1.5), () => Ours(grid), () => native.Run(grid, diagonal, offDiagonal));
        table.Add($"{grid.Name}: ordering, LDLt, selected inverse ({Math.Abs(entries)} in L)",
            times[0], "plain C", times[1], times[0] / times[1], "<= 1.3", times[0] <= 1.3 * times[1]);
    }

    private static void Compare(GridMatrix grid, Klu klu, ResultTable table)
    {
        var matrix = Klu.Expand(grid);
        Complex[] diagonal = new Complex[grid.Order];
        klu.Diagonal(matrix, diagonal, grid.Order);
        Agree(grid, "KLU", diagonal, grid.Order);
        double[] times = Stopwatches.Medians(
            5, TimeSpan.Zero, () => Repeat(20, () => Ours(grid)), () => klu.Diagonal(matrix, diagonal, grid.Order));
        times[0] /= 20;
        double ratio = times[1] / times[0];
        bool counts = grid.Name.StartsWith("case10000", StringComparison.Ordinal);
        table.Add($"{grid.Name}: diagonal of the inverse", times[0], "KLU, one solve a node", times[1], ratio,
            counts ? ">= 200" : "", counts ? ratio >= 200 : null);
        times = Stopwatches.Medians(Rounds(grid), TimeSpan.FromSeconds(0.5),
            () => SymbolicFactor.Analyze(grid.Pattern).Factor(grid.Diagonal, grid.OffDiagonal), () => klu.Diagonal(matrix, diagonal, 0));
        table.Add($"{grid.Name}: analyse and factor alone", times[0], "KLU", times[1], times[1] / times[0], "", null);
    }

    private static void Steps(GridMatrix grid, ResultTable table)
    {
        SymbolicFactor symbolic = SymbolicFactor.Analyze(grid.Pattern);
        LdlFactor factor = symbolic.Factor(grid.Diagonal, grid.OffDiagonal);
        var scratch = new SolveScratch(grid.Order);
        Complex[] x = new Complex[grid.Order];
        double[] times = Stopwatches.Medians(
            Rounds(grid),
            TimeSpan.FromSeconds(0.5),
            () => MinimumDegree.Order(new Adjacency(grid.Pattern)),
            () => SymbolicFactor.Analyze(grid.Pattern),
            () => symbolic.Factor(grid.Diagonal, grid.OffDiagonal),
            () => SelectedInverse.Of(factor),
            () => factor.Solve(x, scratch),
            () => SelectedInverse.DiagonalOf(symbolic.Factor(grid.Diagonal, grid.OffDiagonal), x));
        table.AddAlone("  of which ordering", times[0]);
        table.AddAlone("  of which the rest of the analysis", times[1] - times[0]);
        table.AddAlone("  of which LDLt", times[2]);
        table.AddAlone("  of which selected inverse", times[3]);
        table.AddAlone("  one solve", times[4]);
        table.AddAlone("  other values, same pattern: diagonal alone", times[5]);
    }

    /// <summary>KLU's solves last seconds; ours is repeated so that one cold start does not stand for it, and the mean is taken.</summary>
    private static void Repeat(int times, Action work)
    {
        for (int i = 0; i < times; i++)
        {
            work();
        }
    }

    private static int Rounds(GridMatrix grid) => grid.Order > 50_000 ? 15 : 101;

    private static void Agree(GridMatrix grid, string other, Complex[] diagonal, int count)
    {
        SelectedInverse ours = Ours(grid);
        double worst = 0;
        for (int k = 0; k < count; k++)
        {
            worst = Math.Max(worst, (ours.Diagonal[k] - diagonal[k]).Magnitude / diagonal[k].Magnitude);
        }

        if (!(worst < 1e-9))
        {
            throw new InvalidOperationException($"{grid.Name}: the diagonal differs from {other} by {worst:0.0e0}; no time is worth printing.");
        }

        Console.WriteLine($"{grid.Name}: worst difference from {other} on the diagonal {worst:0.0e0} relative");
    }
}
