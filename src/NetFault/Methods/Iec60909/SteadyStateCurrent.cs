using System.Numerics;

namespace NetFault;

/// <summary>By which rule of IEC 60909-0:2016, clause 11, a steady-state current was found.</summary>
public enum SteadyStateCurrentRule
{
    /// <summary>Ik = I″k without asynchronous motors: meshed networks, and wherever no machine feeds the fault on its own way.</summary>
    WithoutMotors,

    /// <summary>Non-meshed: each machine feeds λ·IrG, with λ from the network file, the feeders their initial current, motors nothing.</summary>
    RadialByFactor,

    /// <summary>
    /// Non-meshed, but a machine does not give its <c>steady_state_factor</c>: its initial current is kept, which is too large at a
    /// maximum and of no use as a minimum.
    /// </summary>
    RadialFactorMissing,
}

/// <summary>The steady-state current at a fault.</summary>
/// <param name="Ka">Ik in kA.</param>
/// <param name="Rule">The rule.</param>
internal sealed record SteadyStateCurrent(double Ka, SteadyStateCurrentRule Rule)
{
    public static SteadyStateCurrent Of(Iec60909AtWork work, Iec60909Currents fault)
    {
        var current = fault.DrivingVoltagePu / fault.WithoutMotorsPu;
        var converters = fault.Ka(work.Converters.At(
            fault.Node, FaultInstant.SteadyState, Iec60909.WithoutMotors, work.Inside.Of(fault.Node)) / Complex.Abs(fault.WithoutMotorsPu));
        var machines = work.MachinesAround(fault.Node);
        if (machines.Count == 0 || !work.IsRadial(fault.Node, withMotors: false))
            return new(fault.Ka(Complex.Abs(current)) + converters, SteadyStateCurrentRule.WithoutMotors);
        if (!machines.Exists(one => Factor(one, work.Method.Case).HasValue))
            return new(fault.Ka(Complex.Abs(current)) + converters, SteadyStateCurrentRule.RadialFactorMissing);
        return new(fault.Ka(ByFactors(work, fault, current)) + converters, machines.TrueForAll(one => Factor(one, work.Method.Case).HasValue)
            ? SteadyStateCurrentRule.RadialByFactor
            : SteadyStateCurrentRule.RadialFactorMissing);
    }

    /// <summary>Takes each machine's initial current out of the whole and puts λ·IrG in its place.</summary>
    private static double ByFactors(Iec60909AtWork work, Iec60909Currents fault, Complex current)
    {
        var steady = 0.0;
        foreach (var share in work.Partial.WithoutMotors(fault))
        {
            var source = work.Circuit.Sources[share.Source];
            var machine = (SynchronousMachine)work.Circuit.Network.Elements[source.Element];
            if (share.Current == Complex.Zero || Factor(machine, work.Method.Case) is not { } factor)
                continue;
            var transfer = work.Transfer(fault, share, Iec60909.WithoutMotors);
            current -= transfer * share.Current;
            steady += factor * share.Rated * Complex.Abs(transfer);
        }
        return Complex.Abs(current) + steady;
    }

    /// <summary>λ of the case; a machine that gives no λmin has none in the minimum case.</summary>
    private static double? Factor(SynchronousMachine machine, ShortCircuitCase which) =>
        which == ShortCircuitCase.Maximum ? machine.SteadyStateFactor?.Max : machine.SteadyStateFactor?.Min;
}
