namespace NetFault;

/// <summary>A synchronous machine with its unit transformer, and the factors that hold for them together.</summary>
/// <param name="Machine">The machine.</param>
/// <param name="Transformer">Its unit transformer.</param>
/// <param name="Factor">K_S or K_SO, for machine and transformer alike.</param>
/// <param name="MachineInside">K_G,S or K_G,SO: the machine's factor for faults between machine and transformer.</param>
/// <param name="TransformerInside">K_T,S or K_T,SO: the transformer's factor for these faults.</param>
internal sealed record PowerStationUnit(
    SynchronousMachine Machine, Transformer Transformer, double Factor, double MachineInside, double TransformerInside);

/// <summary>Finds the power station units of a network (IEC 60909-0:2016, 6.7).</summary>
internal sealed class PowerStationUnits
{
    private readonly Dictionary<string, PowerStationUnit> _byTransformer = new(StringComparer.Ordinal);
    private readonly Dictionary<string, PowerStationUnit> _byMachine = new(StringComparer.Ordinal);

    /// <summary>The units in service.</summary>
    /// <exception cref="MethodDataException">A unit lacks what its factors need, or two machines share a unit transformer.</exception>
    public PowerStationUnits(Network network, ShortCircuitCase which)
    {
        foreach (var machine in network.SynchronousMachines)
        {
            if (machine.UnitTransformer is not { } id || !IsInService(network, machine))
                continue;
            var transformer = network.Find<Transformer>(id);
            if (!IsInService(network, transformer) || TerminalWinding(network, machine, transformer) is not { } winding)
                continue;
            if (_byTransformer.TryGetValue(id, out var other))
                throw MethodDataException.SharedUnitTransformer(network, machine, other.Machine);
            var unit = Of(network, machine, transformer, winding, which);
            _byTransformer.Add(id, unit);
            _byMachine.Add(machine.Id, unit);
        }
    }

    /// <summary>All of them.</summary>
    public IReadOnlyCollection<PowerStationUnit> All => _byMachine.Values;

    /// <summary>The unit of a transformer, or null where it is a network transformer.</summary>
    public PowerStationUnit? Of(Transformer transformer) => _byTransformer.TryGetValue(transformer.Id, out var unit) ? unit : null;

    /// <summary>The unit of a machine, or null where it is connected directly.</summary>
    public PowerStationUnit? Of(SynchronousMachine machine) => _byMachine.TryGetValue(machine.Id, out var unit) ? unit : null;

    private static bool IsInService(Network network, NetworkElement element) =>
        element.InService && element.Terminals.All(bus => network.Find<Bus>(bus!).InService);

    /// <summary>
    /// The winding at the machine's terminals, behind a closed generator breaker too: 0 for HV, 1 for LV. Null where the breaker is open: then
    /// machine and transformer are no unit.
    /// </summary>
    private static int? TerminalWinding(Network network, SynchronousMachine machine, Transformer transformer)
    {
        int Node(string bus) => network.Topology.NodeOfBus[network.Topology.FindBus(bus)];
        if (Node(transformer.Lv) == Node(machine.Bus))
            return 1;
        return Node(transformer.Hv) == Node(machine.Bus) ? 0 : null;
    }

    private static PowerStationUnit Of(
        Network network, SynchronousMachine machine, Transformer transformer, int winding, ShortCircuitCase which)
    {
        var terminals = network.Find<Bus>(machine.Bus);
        var atLv = winding == 1;
        var highSide = network.Find<Bus>(atLv ? transformer.Hv : transformer.Lv);
        var ratio = atLv ? transformer.RatedHvKv / transformer.RatedLvKv : transformer.RatedLvKv / transformer.RatedHvKv;
        var xT = TransformerCircuit.RelativeReactance(transformer);
        double xd = machine.ReactancePu.Subtransient, sinPhi = SinPhi.Of(network, machine), ratedKv = machine.RatedKv ?? terminals.NominalKv;
        double cMax = VoltageFactor.Max(highSide), cMaxInside = VoltageFactor.Max(terminals);
        var hasTapChanger = transformer.OnLoadTapChanger ?? throw MethodDataException.Missing(
            network, transformer, "on_load_tap_changer", "it decides between K_S and K_SO of the power station unit");
        if (hasTapChanger)
        {
            var factor = CorrectionFactors.UnitWithTapChanger(highSide.NominalKv, ratedKv, ratio, cMax, xd, xT, sinPhi);
            return Inside(machine, transformer, factor, 0.0, cMaxInside, xT, sinPhi);
        }
        var regulation = machine.VoltageRegulationPercent.GetValueOrDefault() / 100.0;
        var tap = (which == ShortCircuitCase.Maximum ? -1.0 : 1.0) * transformer.OffLoadTapRangePercent.GetValueOrDefault() / 100.0;
        var withoutTapChanger = CorrectionFactors.UnitWithoutTapChanger(
            highSide.NominalKv, ratedKv, ratio, regulation, tap, cMax, xd, sinPhi);
        return Inside(machine, transformer, withoutTapChanger, regulation, cMaxInside, xT, sinPhi);
    }

    private static PowerStationUnit Inside(
        SynchronousMachine machine, Transformer transformer, double factor, double regulation, double cMax, double xT, double sinPhi) => new(
        machine, transformer, factor,
        CorrectionFactors.GeneratorInsideUnit(regulation, cMax, machine.ReactancePu.Subtransient, sinPhi),
        CorrectionFactors.TransformerInsideUnit(regulation, cMax, xT, sinPhi));
}

/// <summary>sin φrG of a synchronous machine.</summary>
internal static class SinPhi
{
    /// <summary>From the rated power factor; 1 for a condenser that does not give one.</summary>
    /// <exception cref="MethodDataException">The power factor is missing.</exception>
    public static double Of(Network network, SynchronousMachine machine)
    {
        if (machine.RatedPowerFactor is { } cosPhi)
            return Math.Sqrt(1.0 - cosPhi * cosPhi);
        return machine.Service == SynchronousService.Condenser
            ? 1.0
            : throw MethodDataException.Missing(network, machine, "rated_power_factor", "the factor K_G, K_S or K_SO needs sin φrG");
    }
}
