using System.Numerics;

namespace NetFault;

/// <summary>The impedances seen from the place of a fault in each of the networks that the method's results need, per unit.</summary>
internal readonly struct SeenImpedances
{
    private readonly IReadOnlyList<NetworkVariant> _variants;
    private readonly DrivingPointImpedances[] _networks;
    private readonly int _index;
    private readonly Complex _faultPu;

    /// <summary>The current through one device: by the part of the fault current that flows there.</summary>
    /// <param name="variants">The networks.</param>
    /// <param name="through">What gives the part in each network.</param>
    public SeenImpedances(IReadOnlyList<NetworkVariant> variants, ThroughView through)
    {
        Node = through.Node;
        Through = through;
        _variants = variants;
        _networks = [];
    }

    /// <param name="variants">The networks.</param>
    /// <param name="networks">Their impedances, in the same order.</param>
    /// <param name="index">Where the node stands in them.</param>
    /// <param name="node">The node with the fault.</param>
    /// <param name="faultPu">The impedance of the fault itself.</param>
    public SeenImpedances(
        IReadOnlyList<NetworkVariant> variants, DrivingPointImpedances[] networks, int index, int node, Complex faultPu)
    {
        Node = node;
        _variants = variants;
        _networks = networks;
        _index = index;
        _faultPu = faultPu;
    }

    /// <summary>The impedance in the network that stands at a place of the method's list.</summary>
    public Complex this[int network] => Through is { } through
        ? through.Impedance(_variants[network])
        : _networks[network].Impedances[_index] + _variants[network].OfFault(_faultPu);

    /// <summary>The impedance in the network of a variant; null where the method's list does not have it.</summary>
    public Complex? Find(NetworkVariant variant)
    {
        for (var i = 0; i < _variants.Count; i++)
        {
            if (ReferenceEquals(_variants[i], variant))
                return this[i];
        }
        return null;
    }

    /// <summary>
    /// Where these are of the current through one device: what knows its share. The impedances then are Zkk over the share, through which the
    /// driving voltage sends that current, so that all of the method's formulas hold for it. Null for a fault's whole current.
    /// </summary>
    public ThroughView? Through { get; }

    /// <summary>The node with the fault.</summary>
    public int Node { get; }

    /// <summary>Whether this is one of the results at every bus, so that what takes one pass for all of them is worth it.</summary>
    public bool CoversEveryBus => Through is null && _networks[0].Impedances.Length > 1;

    /// <summary>The impedance of the fault itself per unit.</summary>
    public Complex FaultPu => _faultPu;

    /// <summary>The largest residual of the solutions these come from.</summary>
    public double Residual
    {
        get
        {
            var worst = Through?.Residual ?? 0.0;
            foreach (var network in _networks)
                worst = Math.Max(worst, network.WorstResidual);
            return worst;
        }
    }
}
