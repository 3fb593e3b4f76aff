using System.Numerics;

namespace NetFault;

/// <summary>
/// The currents and voltages during a fault, by superposition: one column of Zbus gives the voltage change ΔV = −Z(:,k)·If of every node,
/// and all currents follow from ΔV. Never from total voltages: with off-nominal ratios a flat pre-fault profile is not a solution of the
/// circuit, and currents from it would be wrong.
/// </summary>
internal sealed class FlowSolution
{
    private readonly StudyContext _context;
    private readonly Circuit _circuit;
    private readonly FaultInstant _instant;
    private readonly Network _network;

    public FlowSolution(StudyContext context, Circuit circuit, FaultInstant instant)
    {
        _context = context;
        _circuit = circuit;
        _instant = instant;
        _network = context.Network;
    }

    /// <summary>Solves for a fault at a bus through an impedance in ohm.</summary>
    public FaultFlows Solve(int bus, Complex faultImpedanceOhm)
    {
        var node = _circuit.NodeOfBus[bus];
        var basis = node < 0
            ? new FlowBasis(_context.Networks.At(_instant), _context.Method.DrivingVoltagePu(_network.Buses[bus]), [])
            : _context.Currents.FlowsAt(_context, bus, _instant);
        var state = new State(basis, new Complex[_circuit.NodeCount], new Complex[_circuit.Sources.Length]);
        if (node >= 0)
            SolveChange(state, node, faultImpedanceOhm / _context.BaseOhm(_network.Buses[bus]));
        return Flows(bus, state);
    }

    /// <summary>
    /// ΔV = −Z(:,k)·If, and for each source that feeds a current of its own Z(:,j)·Ij less what flows off into the fault; such a current
    /// is taken in phase with If at the fault, as IEC 60909-0 adds its magnitude.
    /// </summary>
    private void SolveChange(State state, int node, Complex faultImpedancePu)
    {
        var solved = state.Basis.Network;
        var column = solved.Column(node, out var residual);
        var zk = column[node] + solved.Variant.OfFault(faultImpedancePu);
        state.Residual = residual;
        state.Fault = state.Basis.DrivingVoltagePu / zk;
        var phase = state.Fault / Complex.Abs(state.Fault);
        foreach (var (source, magnitude) in state.Basis.Injections)
        {
            var at = _circuit.Sources[source].Node;
            var share = column[at] / zk;
            var current = share == Complex.Zero ? Complex.Zero : magnitude * phase * Complex.Abs(share) / share;
            var own = solved.Column(at, out _);
            for (var i = 0; i < own.Length; i++)
                state.Change[i] += own[i] * current;
            state.Injected[source] += current;
            state.Fault += share * current;
        }
        for (var i = 0; i < column.Length; i++)
            state.Change[i] -= column[i] * state.Fault;
    }

    private FaultFlows Flows(int bus, State state)
    {
        var injections = new Complex[_network.Buses.Count];
        injections[bus] -= state.Fault;
        var sources = Sources(state, injections);
        var branches = Branches(state, injections);
        return new FaultFlows(_network.Buses[bus].Id, _instant)
        {
            FaultCurrentKa = state.Fault * _context.BaseKa(_network.Buses[bus]),
            SolutionResidual = state.Residual,
            Voltages = Voltages(state),
            Branches = branches,
            Sources = sources,
            Couplers = CouplerFlows.Of(_context, injections),
        };
    }

    private IReadOnlyList<BusVoltage> Voltages(State state)
    {
        var voltages = new BusVoltage[_network.Buses.Count];
        for (var bus = 0; bus < voltages.Length; bus++)
        {
            var at = _network.Buses[bus];
            var node = _circuit.NodeOfBus[bus];
            var voltage = node < 0 ? Complex.Zero : state.Basis.DrivingVoltagePu + state.Change[node];
            voltages[bus] = new BusVoltage(at.Id, voltage, Complex.Abs(voltage) * at.NominalKv);
        }
        return Array.AsReadOnly(voltages);
    }

    private IReadOnlyList<SourceFlow> Sources(State state, Complex[] injections)
    {
        var flows = new List<SourceFlow>(_circuit.Sources.Length);
        for (var i = 0; i < _circuit.Sources.Length; i++)
        {
            var source = _circuit.Sources[i];
            var element = (ShuntElement)_network.Elements[source.Element];
            var bus = _network.Topology.TerminalBus(source.Element, 0);
            var current = state.Injected[i] - state.Change[source.Node] * state.Basis.Network.Values.Sources[i];
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
    private IReadOnlyList<BranchFlow> Branches(State state, Complex[] injections)
    {
        var flows = new List<BranchFlow>(_circuit.Branches.Length);
        for (var i = 0; i < _circuit.Branches.Length;)
        {
            var element = _circuit.Branches[i].Element;
            var intoTerminal = new Complex?[3];
            for (; i < _circuit.Branches.Length && _circuit.Branches[i].Element == element; i++)
                AddCurrents(i, state, intoTerminal);
            flows.Add(BranchFlow(element, intoTerminal, injections));
        }
        foreach (var element in DeEnergised(role => role == ElementRole.Branch))
        {
            var ends = element.Terminals.OfType<string>().Select(bus => new BranchEnd(bus, Complex.Zero)).ToList();
            flows.Add(new BranchFlow(element.Section, element.Id, ends.AsReadOnly()));
        }
        return flows.AsReadOnly();
    }

    private void AddCurrents(int index, State state, Complex?[] intoTerminal)
    {
        var branch = _circuit.Branches[index];
        var current = state.Basis.Network.Values.Branches[index]
            * (branch.FromRatio * state.Change[branch.From] - branch.ToRatio * state.Change[branch.To]);
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

    /// <summary>What is found on the way.</summary>
    private sealed class State(FlowBasis basis, Complex[] change, Complex[] injected)
    {
        public FlowBasis Basis { get; } = basis;

        /// <summary>ΔV by node.</summary>
        public Complex[] Change { get; } = change;

        /// <summary>Currents of their own by source.</summary>
        public Complex[] Injected { get; } = injected;

        /// <summary>The current into the fault.</summary>
        public Complex Fault { get; set; }

        public double Residual { get; set; }
    }
}
