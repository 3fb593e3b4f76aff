using System.Diagnostics;
using System.Globalization;

namespace NetFault.Tests.Support;

/// <summary>
/// Runs the circuit simulator ngspice. Where it is not on the path and the tests run as root on a system with apt-get, it is installed from
/// the distribution's packages, once; else there is none and a test passes with a message.
/// </summary>
internal static class Spice
{
    private static readonly Lazy<string> Found = new(FindOrInstall);

    /// <summary>Why there is no simulator; null where there is one.</summary>
    public static string? Missing => Found.Value.Length == 0 ? null : Found.Value;

    /// <summary>Runs a netlist that writes its results into files, and gives the numbers of each.</summary>
    public static IReadOnlyList<double[]>[] Run(string netlist, params string[] results)
    {
        var folder = Directory.CreateTempSubdirectory("netfault-spice-");
        try
        {
            File.WriteAllText(Path.Combine(folder.FullName, "network.cir"), netlist);
            var (code, output) = Execute("ngspice", "-n -b network.cir", 120, folder.FullName);
            if (code != 0 || results.Any(name => !File.Exists(Path.Combine(folder.FullName, name))))
                throw new InvalidOperationException($"ngspice ended with {code}: {output}");
            return results.Select(name => (IReadOnlyList<double[]>)Lines(folder, name).Select(Numbers).ToList()).ToArray();
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }

    private static IEnumerable<string> Lines(DirectoryInfo folder, string name) => File.ReadLines(Path.Combine(folder.FullName, name));

    private static double[] Numbers(string line) => line.Split(' ', StringSplitOptions.RemoveEmptyEntries)
        .Select(text => double.Parse(text, CultureInfo.InvariantCulture)).ToArray();

    /// <summary>Empty where ngspice runs, else the reason why it does not.</summary>
    private static string FindOrInstall()
    {
        if (Runs())
            return "";
        if (!OperatingSystem.IsLinux() || Environment.UserName != "root")
            return "ngspice is not on the path, and only root installs it";
        const string install = "-qq -y -o DPkg::Lock::Timeout=120 install --no-install-recommends ngspice";
        if (Execute("apt-get", install, 180).Code != 0)
        {
            Execute("apt-get", "-qq update", 120);
            Execute("apt-get", install, 180);
        }
        return Runs() ? "" : "ngspice is not on the path and could not be installed by apt-get";
    }

    private static bool Runs() => Execute("ngspice", "--version", 20).Code == 0;

    /// <summary>The exit code and what was written; −1 where the program is not there or takes too long.</summary>
    private static (int Code, string Output) Execute(string program, string arguments, int seconds, string? folder = null)
    {
        try
        {
            var start = new ProcessStartInfo(program, arguments)
            {
                RedirectStandardOutput = true, RedirectStandardError = true, RedirectStandardInput = true, WorkingDirectory = folder ?? "",
            };
            start.Environment["DEBIAN_FRONTEND"] = "noninteractive";
            using var process = Process.Start(start)!;
            process.StandardInput.Close();
            var output = process.StandardOutput.ReadToEndAsync();
            var errors = process.StandardError.ReadToEndAsync();
            if (!process.WaitForExit(TimeSpan.FromSeconds(seconds)))
            {
                process.Kill(entireProcessTree: true);
                return (-1, $"stopped after {seconds} s");
            }
            return (process.ExitCode, output.Result + errors.Result);
        }
        catch (System.ComponentModel.Win32Exception missing)
        {
            return (-1, missing.Message);
        }
    }
}
