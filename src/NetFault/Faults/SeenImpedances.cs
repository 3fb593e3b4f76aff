using System.Numerics;

namespace NetFault;

/// <summary>The impedances seen from the place of a fault in each of the networks that the method's results need, per unit.</summary>
internal readonly struct SeenImpedances
{
    private readonly IReadOnlyList<NetworkVariant> _variants;
    private readonly DrivingPointImpedances[] _networks;
    private readonly int _index;
    private readonly Complex _faultPu;

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
    public Complex this[int network] => _networks[network].Impedances[_index] + _variants[network].OfFault(_faultPu);

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

    /// <summary>The node with the fault.</summary>
    public int Node { get; }

    /// <summary>Whether this is one of the results at every bus, so that what takes one pass for all of them is worth it.</summary>
    public bool CoversEveryBus => _networks[0].Impedances.Length > 1;

    /// <summary>The impedance of the fault itself per unit.</summary>
    public Complex FaultPu => _faultPu;

    /// <summary>The largest residual of the solutions these come from.</summary>
    public double Residual
    {
        get
        {
            var worst = 0.0;
            foreach (var network in _networks)
                worst = Math.Max(worst, network.WorstResidual);
            return worst;
        }
    }
}
