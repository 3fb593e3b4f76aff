using System.Numerics;
using MathNet.Numerics.LinearAlgebra;

namespace NetFault;

/// <summary>
/// Three-phase short circuits in one network by one method. The network's matrix is ordered and factored once; every question is
/// answered from its factors. Immutable: any number of threads may ask at once.
/// </summary>
/// <remarks>
/// The results are for study by qualified engineers, to be checked against the applicable standards and local codes. They do not replace
/// licensed practice and are not for live switching decisions.
/// </remarks>
public sealed class FaultStudy
{
    private readonly StudyNetworks _networks;
    private readonly StudyAssumptions _assumptions;
    private readonly StudyContext _context;
    private readonly Lazy<IReadOnlyList<StudyNode>> _nodes;

    /// <summary>Prepares a study: builds the circuit, orders and factors its admittance matrix.</summary>
    /// <param name="network">The network.</param>
    /// <param name="method">The method: <see cref="MachineDecrement"/>, <see cref="Iec60909"/> or <see cref="IeeeC37"/>.</param>
    /// <exception cref="ArgumentNullException">An argument is null.</exception>
    /// <exception cref="SingularNetworkException">The network's equations have no solution.</exception>
    /// <exception cref="MethodDataException">The network lacks data that the method needs.</exception>
    public FaultStudy(Network network, FaultMethod method)
    {
        Network = Guard.NotNull(network);
        Method = Guard.NotNull(method);
        _networks = new StudyNetworks(network, method);
        _assumptions = new StudyAssumptions(network, method);
        _context = new StudyContext(network, method, _networks, _assumptions);
        _nodes = new(() => StudyNode.Of(_networks.Circuit));
        _ = _networks.At(FaultInstant.Initial);
    }

    /// <summary>The network.</summary>
    public Network Network { get; }

    /// <summary>The method.</summary>
    public FaultMethod Method { get; }

    /// <summary>Every value that the study had to assume because the network does not give it.</summary>
    public IReadOnlyList<Assumption> Assumptions => _assumptions.All;

    /// <summary>
    /// The nodes of the circuit: the energised buses, those joined by closed couplers together. Rows and columns of
    /// <see cref="BusImpedanceMatrix"/> and <see cref="AdmittanceMatrix"/> are in this order.
    /// </summary>
    public IReadOnlyList<StudyNode> Nodes => _nodes.Value;

    /// <summary>
    /// The short-circuit currents at every bus, in the order of the network's buses. De-energised buses are in it, with zero current.
    /// </summary>
    /// <param name="progress">Told of each step done; may be null.</param>
    /// <param name="cancellationToken">Stops the work between steps.</param>
    /// <exception cref="OperationCanceledException">The work was stopped.</exception>
    /// <exception cref="SingularNetworkException">The network's equations have no solution at one of the method's instants.</exception>
    public IReadOnlyList<BusFault> EveryBus(IProgress<StudyProgress>? progress = null, CancellationToken cancellationToken = default) =>
        new EveryBusSolution(_context, _networks, progress, cancellationToken).Run();

    /// <summary>The short-circuit current at one bus.</summary>
    /// <param name="busId">The bus.</param>
    /// <param name="faultImpedanceOhm">Impedance of the fault itself in ohm; 0, a bolted fault, by default. Its parts must not be negative.</param>
    /// <exception cref="UnknownIdException">There is no such bus; the exception names the nearest ids.</exception>
    /// <exception cref="ArgumentOutOfRangeException">A part of the fault impedance is negative or not finite.</exception>
    public BusFault At(string busId, Complex faultImpedanceOhm = default)
    {
        var bus = BusIndex(busId);
        return new OneBusSolution(_context, _networks).Solve(bus, Passive(faultImpedanceOhm));
    }

    /// <summary>
    /// The currents of every branch, source and coupler, and the voltage of every bus, during a fault at one bus.
    /// </summary>
    /// <param name="busId">The bus with the fault.</param>
    /// <param name="instant">Which instant's network; the initial one by default.</param>
    /// <param name="faultImpedanceOhm">Impedance of the fault itself in ohm; 0, a bolted fault, by default. Its parts must not be negative.</param>
    /// <exception cref="UnknownIdException">There is no such bus; the exception names the nearest ids.</exception>
    /// <exception cref="ArgumentOutOfRangeException">
    /// A part of the fault impedance is negative or not finite; or the method knows no such instant, as IEC 60909-0 no transient one.
    /// </exception>
    public FaultFlows FlowsAt(string busId, FaultInstant instant = FaultInstant.Initial, Complex faultImpedanceOhm = default)
    {
        var bus = BusIndex(busId);
        Guard.OneOf(instant, FaultInstant.Initial, FaultInstant.Transient, FaultInstant.SteadyState);
        return new FlowSolution(_context, _networks.Circuit, bus).AtInstant(instant, Passive(faultImpedanceOhm));
    }

    /// <summary>
    /// The AC currents of every branch, source and coupler, and the voltage of every bus, at a time during a fault at one bus: what each
    /// contributes when contacts part. By <see cref="MachineDecrement"/>, as its <see cref="MachineDecrement.AcComponentRule"/> says; each
    /// node of the quadrature costs one factorisation and one solve.
    /// </summary>
    /// <param name="busId">The bus with the fault.</param>
    /// <param name="seconds">The time after the beginning of the fault in seconds, not negative, within the method's horizon.</param>
    /// <param name="faultImpedanceOhm">Impedance of the fault itself in ohm; 0, a bolted fault, by default. Its parts must not be negative.</param>
    /// <exception cref="UnknownIdException">There is no such bus; the exception names the nearest ids.</exception>
    /// <exception cref="ArgumentOutOfRangeException">The time, or a part of the fault impedance, is out of its range.</exception>
    /// <exception cref="CurrentOverTimeException">The current over time cannot be found within the error that the method accepts.</exception>
    /// <exception cref="NotSupportedException">The method gives no branch currents over time, as IEC 60909-0.</exception>
    public FaultFlows FlowsAtTime(string busId, double seconds, Complex faultImpedanceOhm = default)
    {
        var bus = BusIndex(busId);
        Guard.NotNegative(seconds);
        return new FlowSolution(_context, _networks.Circuit, bus).AtTime(seconds, Passive(faultImpedanceOhm));
    }

    /// <summary>
    /// The currents through one device for a fault at its bus and for one just beyond it: the fault's current less what does not flow through the
    /// device, with X/R and DC component of that current. <see cref="DutyCheck"/> does the same for all devices at once.
    /// </summary>
    /// <param name="device">A circuit-breaker, switch or fuse of this network.</param>
    /// <exception cref="UnknownIdException">The device's <see cref="TerminalDevice.Feeds"/> names nothing at its bus in this network.</exception>
    /// <exception cref="ArgumentException">The element that the device feeds, or the bus, is out of service, or it is an open coupler.</exception>
    public DeviceCurrents ThroughCurrents(TerminalDevice device)
    {
        var fed = Network.ElementBehind(Guard.NotNull(device));
        var places = new ThroughPlaces(_networks.Circuit);
        if (fed.Role == ElementRole.Gap || !Network.Topology.IsActive(places.ElementAt(fed)))
            throw new ArgumentException($"{fed.Section} \"{fed.Id}\" is open or out of service: no current flows through the device", nameof(device));
        return new ThroughStudy(_context, [places.Of(BusIndex(device.Bus), fed)]).Of(0);
    }

    /// <summary>
    /// Solves now what the currents over time of every bus need, which otherwise the first call for one does: to watch it, to stop it, or to have
    /// it refused at once. Nothing to do where the method's rules need no such solution.
    /// </summary>
    /// <param name="progress">Told of each step done; may be null.</param>
    /// <param name="cancellationToken">Stops the work between steps.</param>
    /// <exception cref="OperationCanceledException">The work was stopped; it can be taken up again.</exception>
    /// <exception cref="CurrentOverTimeException">The current over time cannot be found within the error that the method accepts.</exception>
    public void SolveOverTime(IProgress<StudyProgress>? progress = null, CancellationToken cancellationToken = default)
    {
        var parts = _context.Currents.PartsOverTime();
        var total = parts.Sum(part => part.Rule.Nodes.Length);
        var counter = new StepCounter(progress, total);
        foreach (var part in parts)
            part.SamplesOfEveryNode(() => counter.Done("node of the quadrature"), cancellationToken);
    }

    /// <summary>
    /// How far the rules for X/R lie from the exact DC component at a time and from the exact peak, at every bus: the impedance at the fault,
    /// separate networks, and the equivalent frequency of IEC 60909-0. By <see cref="MachineDecrement"/>, whatever its own rules are.
    /// </summary>
    /// <param name="seconds">The time after the beginning of the fault in seconds, not negative, within the method's horizon.</param>
    /// <param name="cancellationToken">Stops the work between steps.</param>
    /// <exception cref="ArgumentOutOfRangeException">The time is out of its range.</exception>
    /// <exception cref="CurrentOverTimeException">The current over time cannot be found within the error that the method accepts.</exception>
    /// <exception cref="NotSupportedException">The method is another one.</exception>
    /// <exception cref="OperationCanceledException">The work was stopped.</exception>
    public DcRuleComparison CompareDcRules(double seconds, CancellationToken cancellationToken = default) =>
        _context.Currents.CompareDcRules(_context, Guard.NotNegative(seconds), cancellationToken);

    /// <summary>
    /// The bus impedance matrix per unit, dense, one row for each of <see cref="Nodes"/>. It takes 16·n² bytes and n solves: for small
    /// networks; <see cref="EveryBus"/> never needs it.
    /// </summary>
    /// <param name="instant">Which instant's network; the initial one by default.</param>
    /// <param name="cancellationToken">Stops the work between columns.</param>
    /// <exception cref="InvalidOperationException">There are more than 20,000 nodes, which would take over 6 GB.</exception>
    /// <exception cref="OperationCanceledException">The work was stopped.</exception>
    public Matrix<Complex> BusImpedanceMatrix(FaultInstant instant = FaultInstant.Initial, CancellationToken cancellationToken = default) =>
        StudyMatrices.Impedance(_networks.Circuit, _networks.At(instant), cancellationToken);

    /// <summary>The bus admittance matrix per unit, sparse, one row for each of <see cref="Nodes"/>; complex symmetric.</summary>
    /// <param name="instant">Which instant's network; the initial one by default.</param>
    public Matrix<Complex> AdmittanceMatrix(FaultInstant instant = FaultInstant.Initial) =>
        StudyMatrices.Admittance(_networks.Matrix, _networks.At(instant));

    /// <summary>
    /// An estimate, from below, of the condition number of the admittance matrix in the 1-norm (Hager 1984, Higham 1988); its decimal logarithm
    /// is about the number of digits that data or rounding errors may cost. Large where very small and very large impedances meet. Costs a
    /// handful of solves.
    /// </summary>
    /// <param name="instant">Which instant's network; the initial one by default.</param>
    public double ConditionEstimate(FaultInstant instant = FaultInstant.Initial) => _networks.At(instant).ConditionEstimate();

    /// <summary>What the study's results share.</summary>
    internal StudyContext Context => _context;

    private int BusIndex(string busId)
    {
        var bus = Network.Topology.FindBus(Guard.NotNull(busId));
        return bus >= 0 ? bus : throw new UnknownIdException("buses", busId, Network.Buses.Select(one => one.Id));
    }

    private static Complex Passive(Complex faultImpedanceOhm)
    {
        Guard.NotNegative(faultImpedanceOhm.Real, nameof(faultImpedanceOhm));
        Guard.NotNegative(faultImpedanceOhm.Imaginary, nameof(faultImpedanceOhm));
        return faultImpedanceOhm;
    }
}

/// <summary>How far a long calculation has come.</summary>
/// <param name="Done">Steps done.</param>
/// <param name="Total">Steps in all.</param>
/// <param name="Step">What was done last.</param>
public readonly record struct StudyProgress(int Done, int Total, string Step);
