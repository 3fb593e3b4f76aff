using System.Numerics;

namespace NetFault;

/// <summary>
/// What a method changes about the impedances of branches: correction factors, temperatures. This base changes nothing; impedances are
/// the elements' own at rated values.
/// </summary>
internal class BranchRules
{
    /// <summary>The impedance of a line; <paramref name="z"/> is that of its data.</summary>
    public virtual Complex Line(Line line, Complex z, AssumptionLog? log) => z;

    /// <summary>The impedance of a two-winding transformer; <paramref name="z"/> is that of its data.</summary>
    public virtual Complex Transformer(Transformer transformer, Complex z) => z;

    /// <summary>The impedance of a pair of windings; <paramref name="z"/> is that of its data.</summary>
    /// <param name="pair">The pair.</param>
    /// <param name="lowerBus">The bus at the pair's winding of lower voltage.</param>
    /// <param name="z">The impedance by the data.</param>
    public virtual Complex Windings(ThreeWindingTransformerCircuit.Pair pair, Bus lowerBus, Complex z) => z;
}
