using System.Globalization;
using System.Numerics;
using System.Text.RegularExpressions;

namespace NetFault.Benchmarks.Kernel;

/// <summary>Takes branches and machines out of a network file, line by line: enough for a realistic matrix, no more.</summary>
internal static partial class CaseFile
{
    public static GridMatrix? TryRead(string folder, string name)
    {
        string path = Path.Combine(folder, name + ".yaml");
        if (!File.Exists(path))
        {
            Console.WriteLine($"skipped: {name}.yaml is not in {folder} (give the folder as argument or in NETFAULT_NETWORKS)");
            return null;
        }

        var reader = new Reader();
        foreach (string line in File.ReadLines(path))
        {
            reader.Take(line);
        }

        return new GridMatrix(name, reader.Buses.Count, reader.Branches, reader.ToGround());
    }

    [GeneratedRegex(@"([a-z_]+): ([^\s,{}]+)")]
    private static partial Regex Pairs();

    private sealed class Reader
    {
        private const double BaseMva = 100;
        private readonly List<(int Bus, Complex Admittance)> machines = [];
        private string section = "";

        public Dictionary<string, int> Buses { get; } = [];

        public List<(int From, int To, Complex Admittance)> Branches { get; } = [];

        public void Take(string line)
        {
            if (!line.StartsWith("  ", StringComparison.Ordinal))
            {
                section = line.TrimEnd(':', ' ');
                return;
            }

            Dictionary<string, string> keys = [];
            foreach (Match pair in Pairs().Matches(line))
            {
                keys.TryAdd(pair.Groups[1].Value, pair.Groups[2].Value); // hv and lv again inside rated_kv: the first is the bus
            }

            Take(line.TrimStart().Split(':')[0], keys);
        }

        public Complex[] ToGround()
        {
            Complex[] toGround = new Complex[Buses.Count];
            foreach ((int bus, Complex admittance) in machines)
            {
                toGround[bus] += admittance;
            }

            return toGround;
        }

        private void Take(string id, Dictionary<string, string> keys)
        {
            switch (section)
            {
                case "buses":
                    Buses.Add(id, Buses.Count);
                    break;
                case "lines":
                    Branches.Add((Buses[keys["from"]], Buses[keys["to"]], 1 / new Complex(Number(keys, "r"), Number(keys, "x"))));
                    break;
                case "transformers":
                    double z = Number(keys, "short_circuit_voltage_percent") / 100 * BaseMva / Number(keys, "rated_mva");
                    double ratio = keys.ContainsKey("x_over_r") ? Number(keys, "x_over_r") : 40;
                    double r = z / Math.Sqrt(1 + ratio * ratio);
                    Branches.Add((Buses[keys["hv"]], Buses[keys["lv"]], 1 / new Complex(r, r * ratio)));
                    break;
                case "synchronous_machines":
                    double perUnit = BaseMva / Number(keys, "rated_mva");
                    machines.Add((Buses[keys["bus"]],
                        1 / (perUnit * new Complex(Number(keys, "armature_resistance_pu"), Number(keys, "subtransient")))));
                    break;
            }
        }

        private static double Number(Dictionary<string, string> keys, string key) =>
            double.Parse(keys[key], CultureInfo.InvariantCulture);
    }
}
