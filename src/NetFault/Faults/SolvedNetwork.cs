using System.Numerics;
using NetFault.Sparse;

namespace NetFault;

/// <summary>One network of a study, factored: the admittances of an instant or of a part of the impedances. Immutable.</summary>
internal sealed class SolvedNetwork
{
    private readonly CircuitMatrix _matrix;
    private readonly LdlFactor _factor;

    /// <summary>At another frequency than the rated one a resonance only means that there is no R/X to be had.</summary>
    private readonly bool _refusesResonance;
    private readonly Lazy<DrivingPointImpedances> _drivingPoints;
    private readonly Lazy<LocalImpedances> _local;

    private SolvedNetwork(CircuitMatrix matrix, AdmittanceValues values, NetworkVariant variant)
    {
        Variant = variant;
        _refusesResonance = variant.FrequencyRatio.Equals(1.0) && !variant.IsAtNode;
        _matrix = matrix;
        Values = values;
        _factor = matrix.Factor(values);
        _local = new Lazy<LocalImpedances>(FindLocal);
        _drivingPoints = new Lazy<DrivingPointImpedances>(() => _local.IsValueCreated ? _local.Value.DrivingPoints : FindDrivingPoints());
    }

    /// <summary>Which network it is.</summary>
    public NetworkVariant Variant { get; }

    /// <summary>The admittances that were factored.</summary>
    public AdmittanceValues Values { get; }

    /// <summary>Zkk of every node, with the quality of the solution.</summary>
    public DrivingPointImpedances DrivingPoints => _drivingPoints.Value;

    /// <summary>Zkk of every node and Zmk of its neighbours: what each element contributes to a fault at its own end.</summary>
    public LocalImpedances Local => _local.Value;

    /// <summary>Where the entries of <see cref="Local"/> stand.</summary>
    public CircuitMatrix Matrix => _matrix;

    /// <summary>Whether <see cref="DrivingPoints"/> are there already.</summary>
    public bool HasDrivingPoints => _drivingPoints.IsValueCreated;

    /// <summary>Factors a network of a method.</summary>
    public static SolvedNetwork Of(CircuitMatrix matrix, FaultMethod method, NetworkVariant variant) =>
        Of(matrix, method.SourceImpedances(matrix.Circuit, variant, log: null), matrix.Circuit.BranchImpedances, variant);

    /// <summary>Factors a network with these impedances.</summary>
    public static SolvedNetwork Of(CircuitMatrix matrix, Complex?[] sources, Complex[] branches, NetworkVariant variant) =>
        new(matrix, AdmittanceValues.Of(matrix, sources, branches, variant), variant);

    /// <summary>Column k of Zbus: the voltages of all nodes for a unit current into node k.</summary>
    /// <param name="node">k.</param>
    /// <param name="residual">Normwise backward error of the column, or what rounding of Ykk alone may cost where that is more.</param>
    public Complex[] Column(int node, out double residual)
    {
        var column = new Complex[_matrix.Circuit.NodeCount];
        column[node] = Complex.One;
        residual = _matrix.Guarded(() => _factor.SolveRefined(
            Values.Diagonal, Values.OffDiagonal, column, new SolveScratch(_factor.Order)));
        if (_refusesResonance)
            _matrix.RefuseResonance(Values, column.AsSpan(node, 1), node);
        residual = Math.Max(residual, 2.2e-16 * Complex.Abs(Values.Diagonal[node]) * Complex.Abs(column[node]));
        return column;
    }

    /// <summary>
    /// In a network of reactances alone, the negative eigenvalues of the matrix of the susceptances 1/x: by J. J. Sylvester's law of inertia as
    /// many as negative pivots. Null where pivots had to be shifted, so that they do not tell.
    /// </summary>
    public int? NegativeSusceptances => _factor.ShiftedPivots > 0 ? null : _factor.InversePivot.Count(pivot => pivot.Imaginary < 0.0);

    /// <summary>An estimate of the condition number of Ybus in the 1-norm, from below.</summary>
    public double ConditionEstimate() => Sparse.ConditionEstimate.Of(_factor, Values.Diagonal, Values.OffDiagonal);

    /// <summary>The columns of Zbus as far as their entries are large.</summary>
    public PrunedColumns PrunedColumns() => Sparse.PrunedColumns.Of(_factor, DrivingPoints.Impedances);

    private DrivingPointImpedances FindDrivingPoints() => _matrix.Guarded(() =>
    {
        var impedances = SelectedInverse.CheckedDiagonalOf(_factor, Values.Diagonal, Values.OffDiagonal, out var health);
        if (_refusesResonance)
            _matrix.RefuseResonance(Values, impedances);
        return new DrivingPointImpedances(impedances, Math.Max(health.WorstResidual, health.WorstRounding));
    });

    private LocalImpedances FindLocal() => _matrix.Guarded(() =>
    {
        var inverse = SelectedInverse.Of(_factor, Values.Diagonal, Values.OffDiagonal, out var health);
        if (_refusesResonance)
            _matrix.RefuseResonance(Values, inverse.Diagonal);
        var neighbours = new Complex[_matrix.Symbolic.Pattern.SlotCount];
        for (var slot = 0; slot < neighbours.Length; slot++)
            neighbours[slot] = inverse.OffDiagonal(slot);
        return new LocalImpedances(
            new DrivingPointImpedances(inverse.Diagonal.ToArray(), Math.Max(health.WorstResidual, health.WorstRounding)), neighbours);
    });
}

/// <summary>The entries of Zbus where Ybus is not zero.</summary>
/// <param name="DrivingPoints">Zkk of all nodes.</param>
/// <param name="Neighbours">Zmk by slot of the matrix's pattern, per unit.</param>
internal sealed record LocalImpedances(DrivingPointImpedances DrivingPoints, Complex[] Neighbours);

/// <summary>The driving-point impedances Zkk of all nodes.</summary>
/// <param name="Impedances">Zkk by node, per unit.</param>
/// <param name="WorstResidual">
/// The largest |Σj Ykj·Zjk − 1| over the nodes, or what rounding of the admittances alone may cost where that is more.
/// </param>
internal sealed record DrivingPointImpedances(Complex[] Impedances, double WorstResidual);
