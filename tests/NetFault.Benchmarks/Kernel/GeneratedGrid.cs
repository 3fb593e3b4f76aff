using System.Numerics;

namespace NetFault.Benchmarks.Kernel;

/// <summary>
/// Invented transmission-like grids from a fixed seed: two thirds of the nodes on a plane, joined to near neighbours with holes in the
/// mesh, the rest on radial spurs of one to four nodes. Average degree 2.6 to 2.8.
/// </summary>
internal static class GeneratedGrid
{
    public static GridMatrix Create(int order, int seed = 20240601)
    {
        var random = new Random(seed);
        int width = (int)Math.Sqrt(order * 2 / 3.0), meshed = width * width;
        var branches = new List<(int, int, Complex)>();
        AddMesh(width, branches, random);
        for (int node = meshed; node < order; node++)
        {
            bool startsSpur = node == meshed || random.NextDouble() < 0.4;
            branches.Add((node, startsSpur ? random.Next(meshed) : node - 1, Branch(random)));
        }

        Complex[] toGround = new Complex[order];
        for (int source = 0; source < Math.Max(1, order / 8); source++)
        {
            toGround[random.Next(order)] += 1 / new Complex(0.005, 0.1 + random.NextDouble());
        }

        return new GridMatrix($"generated grid of {order} nodes", order, branches, toGround);
    }

    /// <summary>A spanning comb keeps it in one piece; of the other mesh edges, somewhat more than half are there.</summary>
    private static void AddMesh(int width, List<(int, int, Complex)> branches, Random random)
    {
        for (int row = 0; row < width; row++)
        {
            for (int column = 0; column < width; column++)
            {
                int node = row * width + column;
                if (column + 1 < width && (row == 0 || random.NextDouble() < 0.6))
                {
                    branches.Add((node, node + 1, Branch(random)));
                }

                if (row + 1 < width)
                {
                    branches.Add((node, node + width, Branch(random)));
                }
            }
        }
    }

    private static Complex Branch(Random random)
    {
        double x = 0.005 + 0.2 * random.NextDouble() * random.NextDouble();
        return 1 / new Complex(x * (0.05 + 0.3 * random.NextDouble()), x);
    }
}
