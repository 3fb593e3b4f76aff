using System.Numerics;

namespace NetFault;

/// <summary>
/// The currents and voltages during a fault, by superposition: one column of Zbus gives the voltage change ΔV = −Z(:,k)·If of every node,
/// and all currents follow from ΔV. Never from total voltages: with off-nominal ratios a flat pre-fault profile is not a solution of the
/// circuit, and currents from it would be wrong. Made for one fault, used once.
/// </summary>
internal sealed class FlowSolution
{
    private readonly StudyContext _context;
    private readonly Circuit _circuit;
    private readonly Network _network;
    private readonly int _bus;
    private readonly Complex[] _change;             // ΔV by node
    private readonly Complex[] _sourceCurrents;     // into the node, by source of the circuit
    private readonly Complex[] _branchCurrents;     // y·(ta·ΔVa − tb·ΔVb), by branch of the circuit
    private Complex _fault;                         // into the fault
    private double _residual;
    private double _before;                         // voltage before the fault

    public FlowSolution(StudyContext context, Circuit circuit, int bus)
    {
        _context = context;
        _circuit = circuit;
        _network = context.Network;
        _bus = bus;
        _before = context.Method.DrivingVoltagePu(_network.Buses[bus]);
        _change = new Complex[circuit.NodeCount];
        _sourceCurrents = new Complex[circuit.Sources.Length];
        _branchCurrents = new Complex[circuit.Branches.Length];
    }

    /// <summary>The flows of a fault through an impedance in ohm, at an instant.</summary>
    public FaultFlows AtInstant(FaultInstant instant, Complex faultImpedanceOhm)
    {
        if (IsEnergised)
            Add(_context.Currents.FlowsAt(_context, _bus, instant), faultImpedanceOhm);
        return Flows(instant, null);
    }

    /// <summary>The flows of a fault through an impedance in ohm, at a time.</summary>
    public FaultFlows AtTime(double seconds, Complex faultImpedanceOhm)
    {
        var faultPu = faultImpedanceOhm / _context.BaseOhm(_network.Buses[_bus]);
        foreach (var basis in _context.Currents.FlowsAtTime(_context, _bus, seconds, faultPu))
        {
            if (IsEnergised)
                Add(basis, faultImpedanceOhm);
        }
        return Flows(null, seconds);
    }

    private bool IsEnergised => _circuit.NodeOfBus[_bus] >= 0;

    /// <summary>
    /// ΔV = −Z(:,k)·If, and for each source that feeds a current of its own Z(:,j)·Ij less what flows off into the fault; such a current
    /// is taken in phase with If at the fault, as IEC 60909-0 adds its magnitude.
    /// </summary>
    private void Add(FlowBasis basis, Complex faultImpedanceOhm)
    {
        var node = _circuit.NodeOfBus[_bus];
        var column = basis.Network.Column(node, out var residual);
        var zk = column[node] + basis.Network.Variant.OfFault(faultImpedanceOhm / _context.BaseOhm(_network.Buses[_bus]));
        var fault = basis.Weight * basis.DrivingVoltagePu / zk;
        var change = new Complex[column.Length];
        foreach (var (source, magnitude) in basis.Injections)
            fault += AddInjection(basis.Network, source, magnitude, column, zk, change);
        for (var i = 0; i < column.Length; i++)
            change[i] -= column[i] * fault;
        AddFlows(basis.Network.Values, change);
        _before = basis.DrivingVoltagePu;
        _fault += fault;
        _residual = Math.Max(_residual, residual);
    }

    /// <summary>Adds the change of voltage that a source's own current makes, and gives what of it flows into the fault.</summary>
    private Complex AddInjection(SolvedNetwork network, int source, double magnitude, Complex[] column, Complex zk, Complex[] change)
    {
        var at = _circuit.Sources[source].Node;
        var share = column[at] / zk;
        var phase = Complex.Abs(zk) / zk;
        var current = share == Complex.Zero ? Complex.Zero : magnitude * phase * Complex.Abs(share) / share;
        var own = network.Column(at, out _);
        for (var i = 0; i < own.Length; i++)
            change[i] += own[i] * current;
        _sourceCurrents[source] += current;
        return share * current;
    }

    private void AddFlows(AdmittanceValues values, Complex[] change)
    {
        for (var i = 0; i < change.Length; i++)
            _change[i] += change[i];
        for (var i = 0; i < _sourceCurrents.Length; i++)
            _sourceCurrents[i] -= change[_circuit.Sources[i].Node] * values.Sources[i];
        for (var i = 0; i < _branchCurrents.Length; i++)
        {
            var branch = _circuit.Branches[i];
            _branchCurrents[i] += values.Branches[i] * (branch.FromRatio * change[branch.From] - branch.ToRatio * change[branch.To]);
        }
    }

    private FaultFlows Flows(FaultInstant? instant, double? seconds)
    {
        var injections = new Complex[_network.Buses.Count];
        injections[_bus] -= _fault;
        var sources = Sources(injections);
        var branches = Branches(injections);
        return new FaultFlows(_network.Buses[_bus].Id, instant, seconds)
        {
            AcComponentRule = seconds is null ? null : _context.Currents.AcRuleOfFlows,
            FaultCurrentKa = _fault * _context.BaseKa(_network.Buses[_bus]),
            SolutionResidual = _residual,
            Voltages = Voltages(),
            Branches = branches,
            Sources = sources,
            Couplers = CouplerFlows.Of(_context, injections),
        };
    }

    private IReadOnlyList<BusVoltage> Voltages()
    {
        var voltages = new BusVoltage[_network.Buses.Count];
        for (var bus = 0; bus < voltages.Length; bus++)
        {
            var at = _network.Buses[bus];
            var node = _circuit.NodeOfBus[bus];
            var voltage = node < 0 ? Complex.Zero : _before + _change[node];
            voltages[bus] = new BusVoltage(at.Id, voltage, Complex.Abs(voltage) * at.NominalKv);
        }
        return Array.AsReadOnly(voltages);
    }

    private IReadOnlyList<SourceFlow> Sources(Complex[] injections)
    {
        var flows = new List<SourceFlow>(_circuit.Sources.Length);
        for (var i = 0; i < _circuit.Sources.Length; i++)
        {
            var source = _circuit.Sources[i];
            var element = (ShuntElement)_network.Elements[source.Element];
            var bus = _network.Topology.TerminalBus(source.Element, 0);
            var current = _sourceCurrents[i];
            injections[bus] += current;
            flows.Add(new SourceFlow(element.Section, element.Id, element.Bus, current * _context.BaseKa(_network.Buses[bus])));
        }
        foreach (var element in DeEnergised(role => role is ElementRole.Source or ElementRole.Follower))
            flows.Add(new SourceFlow(element.Section, element.Id, ((ShuntElement)element).Bus, Complex.Zero));
        return flows.AsReadOnly();
    }

    /// <summary>What is in service in parts without a source: it carries nothing.</summary>
    private IEnumerable<NetworkElement> DeEnergised(Func<ElementRole, bool> ofRole)
    {
        for (var i = 0; i < _network.Elements.Count; i++)
        {
            if (ofRole(_network.Elements[i].Role) && _network.Topology.IsActive(i) && _circuit.NodeOfBus[_network.Topology.FirstBus(i)] < 0)
                yield return _network.Elements[i];
        }
    }

    /// <summary>A star's three branches belong to one element and stand side by side, so that its ends gather in one go.</summary>
    private IReadOnlyList<BranchFlow> Branches(Complex[] injections)
    {
        var flows = new List<BranchFlow>(_circuit.Branches.Length);
        for (var i = 0; i < _circuit.Branches.Length;)
        {
            var element = _circuit.Branches[i].Element;
            var intoTerminal = new Complex?[3];
            for (; i < _circuit.Branches.Length && _circuit.Branches[i].Element == element; i++)
                AddCurrents(i, intoTerminal);
            flows.Add(BranchFlow(element, intoTerminal, injections));
        }
        foreach (var element in DeEnergised(role => role == ElementRole.Branch))
        {
            var ends = element.Terminals.OfType<string>().Select(bus => new BranchEnd(bus, Complex.Zero)).ToList();
            flows.Add(new BranchFlow(element.Section, element.Id, ends.AsReadOnly()));
        }
        return flows.AsReadOnly();
    }

    private void AddCurrents(int index, Complex?[] intoTerminal)
    {
        var branch = _circuit.Branches[index];
        var current = _branchCurrents[index];
        intoTerminal[branch.FromTerminal] = (intoTerminal[branch.FromTerminal] ?? Complex.Zero) + branch.FromRatio * current;
        intoTerminal[branch.ToTerminal] = (intoTerminal[branch.ToTerminal] ?? Complex.Zero) - branch.ToRatio * current;
    }

    private BranchFlow BranchFlow(int element, Complex?[] intoTerminal, Complex[] injections)
    {
        var ends = new List<BranchEnd>(2);
        for (var terminal = 0; terminal < intoTerminal.Length; terminal++)
        {
            if (intoTerminal[terminal] is not { } current)
                continue;
            var bus = _network.Topology.TerminalBus(element, terminal);
            injections[bus] -= current;
            ends.Add(new BranchEnd(_network.Buses[bus].Id, current * _context.BaseKa(_network.Buses[bus])));
        }
        return new BranchFlow(_network.Elements[element].Section, _network.Elements[element].Id, ends.AsReadOnly());
    }
}
