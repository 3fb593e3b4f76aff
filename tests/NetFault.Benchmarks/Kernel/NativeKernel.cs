using System.Diagnostics;
using System.Numerics;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;

namespace NetFault.Benchmarks.Kernel;

/// <summary>The same steps in plain C, compiled by gcc when the benchmark runs.</summary>
internal sealed unsafe class NativeKernel
{
    private readonly delegate* unmanaged[Cdecl]<int, int*, int*, Complex*, Complex*, Complex*, Complex*, int> run;

    private NativeKernel(nint library)
    {
        run = (delegate* unmanaged[Cdecl]<int, int*, int*, Complex*, Complex*, Complex*, Complex*, int>)
            NativeLibrary.GetExport(library, "nf_kernel");
        ((delegate* unmanaged[Cdecl]<void>)NativeLibrary.GetExport(library, "nf_keep_memory"))();
    }

    /// <summary>Compiles and loads it; says why if it cannot.</summary>
    public static NativeKernel? TryLoad()
    {
        string source = Path.Combine(SourceFolder(), "native", "kernel.c");
        string target = Path.Combine(AppContext.BaseDirectory, "netfault-kernel.so");
        try
        {
            using Process? gcc = Process.Start("gcc", ["-O3", "-march=native", "-shared", "-fPIC", source, "-o", target, "-lm"]);
            gcc!.WaitForExit();
            if (gcc.ExitCode == 0)
            {
                return new NativeKernel(NativeLibrary.Load(target));
            }

            Console.WriteLine("skipped: plain C (gcc failed)");
        }
        catch (System.ComponentModel.Win32Exception)
        {
            Console.WriteLine("skipped: plain C (there is no gcc)");
        }

        return null;
    }

    /// <summary>Everything from the pattern to the selected inverse.</summary>
    /// <returns>Entries of L; negative if a pivot was small, which the C code does not treat.</returns>
    public int Run(GridMatrix grid, Complex[] diagonal, Complex[] offDiagonal)
    {
        fixed (int* columns = grid.Pattern.ColumnStart, rows = grid.Pattern.RowIndex)
        fixed (Complex* d = grid.Diagonal, off = grid.OffDiagonal, zd = diagonal, zo = offDiagonal)
        {
            return run(grid.Order, columns, rows, d, off, zd, zo);
        }
    }

    private static string SourceFolder([CallerFilePath] string file = "") => Path.GetDirectoryName(Path.GetDirectoryName(file))!;
}
