namespace NetFault;

/// <summary>A value that differs between the maximum and the minimum short-circuit case.</summary>
/// <param name="Max">The value in the maximum case; positive.</param>
/// <param name="Min">The value in the minimum case; null where only one value is known.</param>
public readonly record struct MaxMin(double Max, double? Min = null);

/// <summary>A series impedance R + jX; the unit is that of the property it stands in.</summary>
/// <param name="R">The resistance; not negative.</param>
/// <param name="X">The reactance; negative for series compensation and equivalent legs.</param>
public readonly record struct Impedance(double R, double X);

/// <summary>One value for each winding of a three-winding transformer; null for a winding that is open.</summary>
/// <param name="Hv">The high-voltage winding.</param>
/// <param name="Mv">The medium-voltage winding.</param>
/// <param name="Lv">The low-voltage winding.</param>
public readonly record struct WindingValues(double? Hv, double? Mv, double? Lv);

/// <summary>One value for each pair of windings of a three-winding transformer; null where a winding of the pair is open.</summary>
/// <param name="HvMv">Between the high-voltage and the medium-voltage winding.</param>
/// <param name="HvLv">Between the high-voltage and the low-voltage winding.</param>
/// <param name="MvLv">Between the medium-voltage and the low-voltage winding.</param>
public readonly record struct WindingPairValues(double? HvMv, double? HvLv, double? MvLv);

/// <summary>Reactances of a synchronous machine's d-axis, per unit on its rated apparent power and rated voltage.</summary>
/// <param name="Subtransient">x″d, greater than 0.</param>
/// <param name="Transient">x′d, not below x″d; null where it is not known.</param>
/// <param name="Synchronous">xd, not below x′d; null where it is not known.</param>
/// <param name="Negative">x2, the negative-sequence reactance; null where it is not known.</param>
public readonly record struct MachineReactances(double Subtransient, double? Transient = null, double? Synchronous = null, double? Negative = null);

/// <summary>Short-circuit time constants of a synchronous machine, in seconds.</summary>
/// <param name="Subtransient">T″d; null where it is not known.</param>
/// <param name="Transient">T′d; null where it is not known.</param>
/// <param name="Armature">Ta, of the DC component; null where it is not known.</param>
public readonly record struct MachineTimeConstants(double? Subtransient = null, double? Transient = null, double? Armature = null);
