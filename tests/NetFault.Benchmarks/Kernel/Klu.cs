using System.Numerics;
using System.Runtime.InteropServices;
using NetFault.Sparse;

namespace NetFault.Benchmarks.Kernel;

/// <summary>The general-purpose sparse LU library that the goal names, by its public C interface, if it is installed.</summary>
internal sealed unsafe class Klu
{
    private readonly delegate* unmanaged[Cdecl]<void*, int> defaults;
    private readonly delegate* unmanaged[Cdecl]<int, int*, int*, void*, void*> analyze;
    private readonly delegate* unmanaged[Cdecl]<int*, int*, Complex*, void*, void*, void*> factor;
    private readonly delegate* unmanaged[Cdecl]<void*, void*, int, int, Complex*, void*, int> solve;
    private readonly delegate* unmanaged[Cdecl]<void**, void*, int> freeSymbolic;
    private readonly delegate* unmanaged[Cdecl]<void**, void*, int> freeNumeric;

    private Klu(nint library)
    {
        defaults = (delegate* unmanaged[Cdecl]<void*, int>)NativeLibrary.GetExport(library, "klu_defaults");
        analyze = (delegate* unmanaged[Cdecl]<int, int*, int*, void*, void*>)NativeLibrary.GetExport(library, "klu_analyze");
        factor = (delegate* unmanaged[Cdecl]<int*, int*, Complex*, void*, void*, void*>)NativeLibrary.GetExport(library, "klu_z_factor");
        solve = (delegate* unmanaged[Cdecl]<void*, void*, int, int, Complex*, void*, int>)NativeLibrary.GetExport(library, "klu_z_solve");
        freeSymbolic = (delegate* unmanaged[Cdecl]<void**, void*, int>)NativeLibrary.GetExport(library, "klu_free_symbolic");
        freeNumeric = (delegate* unmanaged[Cdecl]<void**, void*, int>)NativeLibrary.GetExport(library, "klu_z_free_numeric");
    }

    public static Klu? TryLoad()
    {
        foreach (string name in (string[])["libklu.so.1", "libklu.so.2", "libklu.so"])
        {
            if (NativeLibrary.TryLoad(name, out nint library))
            {
                return new Klu(library);
            }
        }

        Console.WriteLine("skipped: KLU (libklu is not installed; on Debian: apt-get install libsuitesparse-dev)");
        return null;
    }

    /// <summary>Full storage in compressed columns, as KLU takes it.</summary>
    public static (int[] Columns, int[] Rows, Complex[] Values) Expand(GridMatrix grid)
    {
        var graph = new Adjacency(grid.Pattern);
        int n = grid.Order;
        int[] columns = new int[n + 1];
        var rows = new List<int>();
        var values = new List<Complex>();
        for (int j = 0; j < n; j++)
        {
            var entries = new List<(int Row, Complex Value)> { (j, grid.Diagonal[j]) };
            for (int p = graph.Start[j]; p < graph.Start[j + 1]; p++)
            {
                entries.Add((graph.Neighbour[p], grid.OffDiagonal[graph.Slot[p]]));
            }

            entries.Sort((a, b) => a.Row.CompareTo(b.Row));
            rows.AddRange(entries.Select(e => e.Row));
            values.AddRange(entries.Select(e => e.Value));
            columns[j + 1] = rows.Count;
        }

        return (columns, [.. rows], [.. values]);
    }

    /// <summary>Analyses, factors and solves once for each node asked for, keeping the diagonal of the inverse.</summary>
    public void Diagonal((int[] Columns, int[] Rows, Complex[] Values) matrix, Complex[] diagonal, int solves)
    {
        int n = diagonal.Length;
        Complex[] x = new Complex[n];
        byte* common = stackalloc byte[1024]; // klu_common is 216 bytes in version 1.3; klu_defaults fills it
        fixed (int* columns = matrix.Columns, rows = matrix.Rows)
        fixed (Complex* values = matrix.Values, b = x)
        {
            defaults(common);
            void* symbolic = analyze(n, columns, rows, common);
            void* numeric = factor(columns, rows, values, symbolic, common);
            for (int k = 0; k < solves; k++)
            {
                Array.Clear(x);
                x[k] = Complex.One;
                solve(symbolic, numeric, n, 1, b, common);
                diagonal[k] = x[k];
            }

            freeNumeric(&numeric, common);
            freeSymbolic(&symbolic, common);
        }
    }
}
