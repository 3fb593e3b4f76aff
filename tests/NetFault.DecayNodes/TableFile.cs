using System.Globalization;
using System.Numerics;
using System.Text;

namespace NetFault.NodeTables;

/// <summary>Writes the library's file DecayNodes.cs.</summary>
internal static class TableFile
{
    private const int NodesALine = 4;

    /// <summary>The text of the file.</summary>
    public static string Text(IEnumerable<(TablePlan Plan, NodeTable[] Tables)> windows)
    {
        var properties = windows.Select(window => Property(window.Plan, window.Tables));
        return $$"""
            using System.Numerics;

            namespace NetFault;

            /// <summary>
            /// Nodes of the quadratures, in units of ω, found by the program in tests/NetFault.DecayNodes; its output stands here as it is.
            /// Beside each table is the largest error over its class of networks, relative to the sum of the residues. Usual networks have
            /// R/X up to 10 and time constants from 16 ms at 50 Hz; the whole class has R-L modes that decay with up to 100·ω and time
            /// constants from 10 ms.
            /// </summary>
            internal static class DecayNodes
            {
            {{string.Join("\n\n", properties)}}
            }

            """;
    }

    private static string Property(TablePlan plan, NodeTable[] tables)
    {
        var text = new StringBuilder();
        double first = plan.Window.FirstAngle, last = plan.Window.LastAngle;
        text.Append(CultureInfo.InvariantCulture, $"    /// <summary>For ω·t from {first:0} to {last:0}.</summary>\n");
        text.Append(CultureInfo.InvariantCulture, $"    public static IReadOnlyList<Complex[]> {plan.Name} {{ get; }} =\n    [\n");
        foreach (var table in tables)
        {
            text.Append(CultureInfo.InvariantCulture, $"        // {Line(plan, table)}\n        [\n");
            foreach (var line in table.Nodes.Chunk(NodesALine))
                text.Append("            ").AppendJoin(", ", line.Select(Constructor)).Append(",\n");
            text.Append("        ],\n");
        }
        return text.Append("    ];").ToString();
    }

    /// <summary>What a table is and reaches.</summary>
    public static string Line(TablePlan plan, NodeTable table)
    {
        var dc = plan.QuasiStatic ? "" : FormattableString.Invariant($", DC within {table.Errors.Dc:0.0e+0}");
        return FormattableString.Invariant($"{table.Kind.Count} nodes for {table.Kind.Networks}: AC within {table.Errors.Ac:0.0e+0}{dc}.");
    }

    private static string Constructor(Complex node) => FormattableString.Invariant($"new({node.Real:G6}, {node.Imaginary:G6})");
}
