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
    private readonly SolvedNetwork _solved;
    private readonly FaultInstant _instant;
    private readonly Network _network;

    public FlowSolution(StudyContext context, Circuit circuit, SolvedNetwork solved, FaultInstant instant)
    {
        _context = context;
        _circuit = circuit;
        _solved = solved;
        _instant = instant;
        _network = context.Network;
    }

    /// <summary>Solves for a fault at a bus through an impedance in ohm.</summary>
    public FaultFlows Solve(int bus, Complex faultImpedanceOhm)
    {
        var residual = 0.0;
        var faultPu = Complex.Zero;
        var change = new Complex[_circuit.NodeCount];
        var node = _circuit.NodeOfBus[bus];
        if (node >= 0)
        {
            change = _solved.Column(node, out residual);
            var z = change[node] + faultImpedanceOhm / _context.BaseOhm(_network.Buses[bus]);
            faultPu = _context.Method.DrivingVoltagePu(_network.Buses[bus]) / z;
            for (var i = 0; i < change.Length; i++)
                change[i] *= -faultPu;
        }
        return Flows(bus, faultPu, change, residual);
    }

    private FaultFlows Flows(int bus, Complex faultPu, Complex[] change, double residual)
    {
        var injections = new Complex[_network.Buses.Count];
        injections[bus] -= faultPu;
        var sources = Sources(change, injections);
        var branches = Branches(change, injections);
        return new FaultFlows(_network.Buses[bus].Id, _instant)
        {
            FaultCurrentKa = faultPu * _context.BaseKa(_network.Buses[bus]),
            SolutionResidual = residual,
            Voltages = Voltages(change),
            Branches = branches,
            Sources = sources,
            Couplers = CouplerFlows.Of(_context, injections),
        };
    }

    private IReadOnlyList<BusVoltage> Voltages(Complex[] change)
    {
        var voltages = new BusVoltage[_network.Buses.Count];
        for (var bus = 0; bus < voltages.Length; bus++)
        {
            var at = _network.Buses[bus];
            var node = _circuit.NodeOfBus[bus];
            var voltage = node < 0 ? Complex.Zero : _context.Method.DrivingVoltagePu(at) + change[node];
            voltages[bus] = new BusVoltage(at.Id, voltage, Complex.Abs(voltage) * at.NominalKv);
        }
        return Array.AsReadOnly(voltages);
    }

    private IReadOnlyList<SourceFlow> Sources(Complex[] change, Complex[] injections)
    {
        var flows = new SourceFlow[_circuit.Sources.Length];
        for (var i = 0; i < flows.Length; i++)
        {
            var source = _circuit.Sources[i];
            var element = (ShuntElement)_network.Elements[source.Element];
            var bus = _network.Topology.TerminalBus(source.Element, 0);
            var current = -change[source.Node] * _solved.Values.Sources[i];
            injections[bus] += current;
            flows[i] = new SourceFlow(element.Section, element.Id, element.Bus, current * _context.BaseKa(_network.Buses[bus]));
        }
        return Array.AsReadOnly(flows);
    }

    /// <summary>A star's three branches belong to one element and stand side by side, so that its ends gather in one go.</summary>
    private IReadOnlyList<BranchFlow> Branches(Complex[] change, Complex[] injections)
    {
        var flows = new List<BranchFlow>(_circuit.Branches.Length);
        for (var i = 0; i < _circuit.Branches.Length;)
        {
            var element = _circuit.Branches[i].Element;
            var intoTerminal = new Complex?[3];
            for (; i < _circuit.Branches.Length && _circuit.Branches[i].Element == element; i++)
                AddCurrents(i, change, intoTerminal);
            flows.Add(BranchFlow(element, intoTerminal, injections));
        }
        return flows.AsReadOnly();
    }

    private void AddCurrents(int index, Complex[] change, Complex?[] intoTerminal)
    {
        var branch = _circuit.Branches[index];
        var current = _solved.Values.Branches[index]
            * (branch.FromRatio * change[branch.From] - branch.ToRatio * change[branch.To]);
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
