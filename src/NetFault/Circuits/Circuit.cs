using System.Numerics;

namespace NetFault;

/// <summary>
/// A positive-sequence circuit per unit on the network's base power and each node's nominal voltage: branches between the energised nodes
/// and places where sources stand. Buses joined by closed couplers are one node; what is out of service or de-energised is not in it.
/// </summary>
internal sealed class Circuit
{
    public Circuit(Network network, int[] nodeOfBus, int nodeCount, CircuitBranch[] branches, Complex[] impedances, CircuitSource[] sources)
    {
        Network = network;
        NodeOfBus = nodeOfBus;
        NodeCount = nodeCount;
        Branches = branches;
        BranchImpedances = impedances;
        Sources = sources;
        HasNegativeReactance = Array.Exists(impedances, z => z.Imaginary < 0.0);
    }

    /// <summary>The network it was built from.</summary>
    public Network Network { get; }

    /// <summary>The node of each bus of the network; −1 for a bus that is de-energised.</summary>
    public int[] NodeOfBus { get; }

    /// <summary>Number of nodes.</summary>
    public int NodeCount { get; }

    /// <summary>The branches.</summary>
    public CircuitBranch[] Branches { get; }

    /// <summary>
    /// One impedance for each branch, per unit. Of the three branches that make a three-winding transformer, these are the legs of its star
    /// in the order HV, MV, LV.
    /// </summary>
    public Complex[] BranchImpedances { get; }

    /// <summary>Whether reactances of opposite sign might cancel.</summary>
    public bool HasNegativeReactance { get; }

    /// <summary>Where sources stand: feeders, synchronous machines, asynchronous motors. Their impedances are the method's.</summary>
    public CircuitSource[] Sources { get; }
}

/// <summary>What the impedance of a branch stands for.</summary>
internal enum BranchKind : byte
{
    /// <summary>An impedance between the branch's two nodes.</summary>
    Series,

    /// <summary>The same, capacitive: its reactance falls with frequency.</summary>
    Capacitor,

    /// <summary>The first of three branches that make a star: HV–MV, HV–LV, MV–LV.</summary>
    StarFirst,

    /// <summary>The second or third branch of a star.</summary>
    StarNext,
}

/// <summary>
/// A branch: from node and ratio ta, to node and ratio tb. With its admittance y the current into it at the from end is
/// ta·y·(ta·Va − tb·Vb), so that its part of Ybus is [ta²·y, −ta·tb·y; −ta·tb·y, tb²·y].
/// </summary>
/// <param name="Element">The element, by its position among all of the network.</param>
/// <param name="From">From node.</param>
/// <param name="To">To node.</param>
/// <param name="FromTerminal">Which terminal of the element the from end is.</param>
/// <param name="ToTerminal">Which terminal of the element the to end is.</param>
/// <param name="FromRatio">ta.</param>
/// <param name="ToRatio">tb.</param>
/// <param name="Kind">What its impedance stands for.</param>
internal readonly record struct CircuitBranch(
    int Element, int From, int To, byte FromTerminal, byte ToTerminal, double FromRatio, double ToRatio, BranchKind Kind);

/// <summary>A place where a source stands.</summary>
/// <param name="Element">The element, by its position among all of the network.</param>
/// <param name="Node">Its node.</param>
internal readonly record struct CircuitSource(int Element, int Node);
