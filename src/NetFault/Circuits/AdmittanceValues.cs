using System.Numerics;

namespace NetFault;

/// <summary>The values of one network: the admittances of its branches and sources, and Ybus made of them.</summary>
internal sealed class AdmittanceValues
{
    private AdmittanceValues(Complex[] branches, Complex[] sources, Complex[] diagonal, Complex[] offDiagonal)
    {
        Branches = branches;
        Sources = sources;
        Diagonal = diagonal;
        OffDiagonal = offDiagonal;
    }

    /// <summary>Admittance of each branch of the circuit, per unit.</summary>
    public Complex[] Branches { get; }

    /// <summary>Admittance of each source of the circuit, per unit; 0 where it is not in this network.</summary>
    public Complex[] Sources { get; }

    /// <summary>Diagonal of Ybus, by node.</summary>
    public Complex[] Diagonal { get; }

    /// <summary>Ybus below the diagonal, by slot of the pattern.</summary>
    public Complex[] OffDiagonal { get; }

    /// <summary>The values of a network: the sources' impedances as they are in it, the branches' at rated frequency.</summary>
    public static AdmittanceValues Of(CircuitMatrix matrix, Complex?[] sourceImpedances, Complex[] branchImpedances, NetworkVariant variant)
    {
        var circuit = matrix.Circuit;
        var branches = NetworkAdmittances.OfBranches(circuit, branchImpedances, variant);
        var sources = new Complex[sourceImpedances.Length];
        var diagonal = new Complex[circuit.NodeCount];
        var offDiagonal = new Complex[matrix.Symbolic.Pattern.SlotCount];
        for (var i = 0; i < branches.Length; i++)
            Stamp(circuit.Branches[i], branches[i], matrix.SlotOfBranch[i], diagonal, offDiagonal);
        for (var i = 0; i < sources.Length; i++)
        {
            sources[i] = NetworkAdmittances.OfSource(sourceImpedances[i], variant.Part);
            diagonal[circuit.Sources[i].Node] += sources[i];
        }
        return new AdmittanceValues(branches, sources, diagonal, offDiagonal);
    }

    /// <summary>The largest admittance of a branch or source at each node.</summary>
    public double[] LargestAdmittances(Circuit circuit)
    {
        var largest = new double[circuit.NodeCount];
        for (var i = 0; i < Branches.Length; i++)
        {
            var size = Complex.Abs(Branches[i]);
            largest[circuit.Branches[i].From] = Math.Max(largest[circuit.Branches[i].From], size);
            largest[circuit.Branches[i].To] = Math.Max(largest[circuit.Branches[i].To], size);
        }
        for (var i = 0; i < Sources.Length; i++)
            largest[circuit.Sources[i].Node] = Math.Max(largest[circuit.Sources[i].Node], Complex.Abs(Sources[i]));
        return largest;
    }

    private static void Stamp(in CircuitBranch branch, Complex y, int slot, Complex[] diagonal, Complex[] offDiagonal)
    {
        double a = branch.FromRatio, b = branch.ToRatio;
        if (slot < 0)
        {
            diagonal[branch.From] += Scaled(y, (a - b) * (a - b));
            return;
        }
        diagonal[branch.From] += Scaled(y, a * a);
        diagonal[branch.To] += Scaled(y, b * b);
        offDiagonal[slot] -= Scaled(y, a * b);
    }

    private static Complex Scaled(Complex y, double factor) => new(y.Real * factor, y.Imaginary * factor);
}
