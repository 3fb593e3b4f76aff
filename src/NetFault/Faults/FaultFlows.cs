using System.Numerics;

namespace NetFault;

/// <summary>
/// The currents and voltages everywhere during a three-phase short circuit at one bus, as complex RMS phasors of the AC component; the
/// pre-fault voltage is the reference of the angles, phase shifts of vector groups are left out. Immutable. Load currents are not in
/// them: by superposition these are the currents that the fault causes.
/// </summary>
public sealed class FaultFlows
{
    private readonly Lazy<Dictionary<string, BusVoltage>> _voltages;

    internal FaultFlows(string busId, FaultInstant? instant, double? seconds)
    {
        BusId = busId;
        Instant = instant;
        Seconds = seconds;
        _voltages = new(() => Voltages.ToDictionary(one => one.BusId, StringComparer.Ordinal));
    }

    /// <summary>The bus with the fault.</summary>
    public string BusId { get; }

    /// <summary>Which instant's network these belong to; null where they are those of a time.</summary>
    public FaultInstant? Instant { get; }

    /// <summary>The time after the beginning of the fault to which these belong, in seconds; null where they are those of an instant.</summary>
    public double? Seconds { get; }

    /// <summary>How the AC component was found, where these are the flows of a time; null where they are those of an instant.</summary>
    public AcComponentRule? AcComponentRule { get; internal init; }

    /// <summary>The current into the fault in kA; 0 where the bus is de-energised.</summary>
    public Complex FaultCurrentKa { get; internal init; }

    /// <summary>The voltage of every bus, in the order of the network.</summary>
    public IReadOnlyList<BusVoltage> Voltages { get; internal init; } = [];

    /// <summary>The currents of every branch in service: transformers, lines, reactors, capacitors that are not bridged.</summary>
    public IReadOnlyList<BranchFlow> Branches { get; internal init; } = [];

    /// <summary>The current of every feeder, machine, motor and converter in service.</summary>
    public IReadOnlyList<SourceFlow> Sources { get; internal init; } = [];

    /// <summary>The current through every closed coupler and every bridged series capacitor in service.</summary>
    public IReadOnlyList<CouplerFlow> Couplers { get; internal init; } = [];

    /// <summary>How good the solution is, as <see cref="BusFault.SolutionResidual"/> says; about 1e-16 for a good one.</summary>
    public double SolutionResidual { get; internal init; }

    /// <summary>The voltage of a bus.</summary>
    /// <exception cref="UnknownIdException">There is no such bus.</exception>
    public BusVoltage Voltage(string busId) => _voltages.Value.TryGetValue(Guard.NotNull(busId), out var voltage)
        ? voltage
        : throw new UnknownIdException("buses", busId, _voltages.Value.Keys);

    /// <summary>The flow of a branch, by its id; where sections share the id, name the section too.</summary>
    /// <exception cref="UnknownIdException">There is no such branch in service.</exception>
    /// <exception cref="ArgumentException">Branches of several sections have the id.</exception>
    public BranchFlow Branch(string id, string? section = null) =>
        Find("branches in service", id, section, Branches, one => (one.Section, one.Id));

    /// <summary>The flow of a source, by its id; where sections share the id, name the section too.</summary>
    /// <exception cref="UnknownIdException">There is no such source in service.</exception>
    /// <exception cref="ArgumentException">Sources of several sections have the id.</exception>
    public SourceFlow Source(string id, string? section = null) =>
        Find("sources in service", id, section, Sources, one => (one.Section, one.Id));

    /// <summary>The flow of a closed coupler or a bridged series capacitor, by its id; where both share it, name the section too.</summary>
    /// <exception cref="UnknownIdException">There is no such coupler closed and in service.</exception>
    /// <exception cref="ArgumentException">A coupler and a capacitor have the id.</exception>
    public CouplerFlow Coupler(string id, string? section = null) =>
        Find("closed couplers", id, section, Couplers, one => (one.Section, one.Id));

    private static T Find<T>(string kind, string id, string? section, IReadOnlyList<T> among, Func<T, (string Section, string Id)> address)
    {
        Guard.NotNull(id);
        var found = among.Where(one => address(one).Id == id && (section is null || address(one).Section == section)).ToList();
        return found.Count switch
        {
            1 => found[0],
            0 => throw new UnknownIdException(section ?? kind, id, among.Select(one => address(one).Id)),
            _ => throw new ArgumentException(
                $"\"{id}\" stands in {string.Join(" and ", found.Select(one => address(one).Section))}: name the section too", nameof(id)),
        };
    }
}

/// <summary>The voltage of a bus during a fault.</summary>
/// <param name="BusId">The bus.</param>
/// <param name="PerUnit">Line-to-earth voltage per unit on the nominal one: pre-fault voltage plus change; 0 at a de-energised bus.</param>
/// <param name="LineToLineKv">Magnitude of the line-to-line voltage in kV.</param>
public sealed record BusVoltage(string BusId, Complex PerUnit, double LineToLineKv);

/// <summary>The currents at the ends of a branch.</summary>
/// <param name="Section">The branch's section, such as <c>lines</c>.</param>
/// <param name="Id">The branch's id.</param>
/// <param name="Ends">Its ends, in the order of the network file: from and to; HV and LV; HV, MV and LV without open windings.</param>
public sealed record BranchFlow(string Section, string Id, IReadOnlyList<BranchEnd> Ends)
{
    /// <summary>The current from a bus into this branch in kA.</summary>
    /// <exception cref="UnknownIdException">The branch does not end at that bus.</exception>
    public Complex FromBusKa(string busId) =>
        (Ends.FirstOrDefault(end => end.BusId == busId)
            ?? throw new UnknownIdException($"the ends of {Section} {Id}", busId, Ends.Select(end => end.BusId))).IntoBranchKa;
}

/// <summary>One end of a branch.</summary>
/// <param name="BusId">The bus.</param>
/// <param name="IntoBranchKa">The current from the bus into the branch in kA.</param>
public sealed record BranchEnd(string BusId, Complex IntoBranchKa);

/// <summary>The current of a feeder, machine or motor.</summary>
/// <param name="Section">The source's section, such as <c>network_feeders</c>.</param>
/// <param name="Id">The source's id.</param>
/// <param name="BusId">Its bus.</param>
/// <param name="IntoBusKa">The current from the source into the bus in kA.</param>
public sealed record SourceFlow(string Section, string Id, string BusId, Complex IntoBusKa);

/// <summary>The current through a closed coupler, or through a series capacitor that its voltage-limiting device bridges.</summary>
/// <param name="Section">Its section: <c>bus_couplers</c> or <c>series_capacitors</c>.</param>
/// <param name="Id">Its id.</param>
/// <param name="FromBusId">Its from bus.</param>
/// <param name="ToBusId">Its to bus.</param>
/// <param name="FromToKa">
/// The current from the from bus to the to bus in kA; null where joints make a ring, in which it divides by impedances that are not known.
/// </param>
public sealed record CouplerFlow(string Section, string Id, string FromBusId, string ToBusId, Complex? FromToKa);
