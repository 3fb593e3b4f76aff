using System.Numerics;
using NetFault.Sparse;

namespace NetFault;

/// <summary>A rotating machine's share of a fault current, per unit at the machine.</summary>
/// <param name="Source">The machine, by its place among the circuit's sources.</param>
/// <param name="Current">Its current in the fault, with the fault current's sign.</param>
/// <param name="Impedance">Its impedance with its factor.</param>
/// <param name="Rated">Its rated current.</param>
internal readonly record struct PartialCurrent(int Source, Complex Current, Complex Impedance, double Rated)
{
    /// <summary>I″kG/IrG, or I″kM/IrM.</summary>
    public double Ratio => Complex.Abs(Current) / Rated;
}

/// <summary>
/// The machines whose share of a fault's current exceeds twice their rated current: only these have a decrement (IEC 60909-0:2016, clause 10).
/// For all buses together, only the entries of Zbus that can exceed that are computed.
/// </summary>
internal sealed class PartialCurrents
{
    /// <summary>Decrement begins above this ratio to the rated current.</summary>
    private const double SmallestRatio = 2.0;

    /// <summary>
    /// Converter-fed drives do not contribute to Ib at all, so their share counts however small; below this share of Zkk it is left in,
    /// which is on the safe side.
    /// </summary>
    private const double SmallestShareOfDrives = 1e-3;

    private readonly Iec60909AtWork _work;
    private readonly Lazy<Machine[]> _machines;
    private readonly Lazy<EntryTable> _table;
    private readonly Lazy<EntryTable> _tableWithoutMotors;

    public PartialCurrents(Iec60909AtWork work)
    {
        _work = work;
        _machines = new(FindMachines);
        _table = new(() => new EntryTable(work.Circuit.NodeCount, FindEntries(Iec60909.Initial)));
        _tableWithoutMotors = new(() => new EntryTable(work.Circuit.NodeCount, FindEntries(Iec60909.WithoutMotors)));
    }

    /// <summary>The shares that count at a fault.</summary>
    public IReadOnlyList<PartialCurrent> Of(Iec60909Currents fault)
    {
        if (_machines.Value.Length == 0)
            return [];
        var inside = _work.Inside.Of(fault.Node);
        var shares = inside is null && fault.CoversEveryBus
            ? FromTable(fault)
            : FromColumn(fault, inside, fault.Network, fault.CurrentPu);
        return shares.Where(share => share.Ratio > SmallestRatio || IsDrive(share.Source)).ToList();
    }

    /// <summary>All synchronous machines' shares of the current without motors at one fault, from one column of Zbus.</summary>
    public IEnumerable<PartialCurrent> WithoutMotors(Iec60909Currents fault) => FromColumn(
        fault, _work.Inside.Of(fault.Node), Iec60909.WithoutMotors, fault.DrivingVoltagePu / fault.WithoutMotorsPu);

    /// <summary>Whether a source is a converter-fed drive.</summary>
    public bool IsDrive(int source) => Element(source) is ConverterFedDrive;

    private IEnumerable<PartialCurrent> FromTable(Iec60909Currents fault) =>
        (fault.MotorsLeftOut ? _tableWithoutMotors : _table).Value.At(fault.Node)
            .Select(entry => Share(fault.CurrentPu, _machines.Value[entry.Machine], entry.Impedance));

    private IEnumerable<PartialCurrent> FromColumn(Iec60909Currents fault, InsideUnit? inside, NetworkVariant variant, Complex current)
    {
        var column = _work.Networks.Of(variant).Column(fault.Node, out _);
        foreach (var machine in _machines.Value)
        {
            if (variant.Instant != FaultInstant.Initial && Element(machine.Source) is not SynchronousMachine)
                continue;
            var own = inside?.Source == machine.Source ? machine with { Impedance = machine.Impedance * inside.MachineRatio } : machine;
            yield return Share(current, own, column[machine.Node] + (inside?.Change(variant, fault.Node, machine.Node) ?? Complex.Zero));
        }
    }

    /// <summary>I″k of a machine: the fault current times Zki over its own impedance.</summary>
    private static PartialCurrent Share(Complex faultCurrent, in Machine machine, Complex zki) =>
        new(machine.Source, faultCurrent * zki / machine.Impedance, machine.Impedance, machine.Rated);

    private Machine[] FindMachines()
    {
        var circuit = _work.Circuit;
        var machines = new List<Machine>();
        for (var i = 0; i < circuit.Sources.Length; i++)
        {
            if (Rated(i) is { } rated && _work.Sources.Impedance(circuit.Sources[i].Element, Iec60909.Initial, log: null) is { } z)
                machines.Add(new Machine(i, circuit.Sources[i].Node, z, rated));
        }
        return [.. machines];
    }

    /// <summary>The rated current per unit at the machine's bus; null for what is no rotating machine.</summary>
    private double? Rated(int source)
    {
        var network = _work.Circuit.Network;
        var nominalKv = network.Buses[network.Topology.TerminalBus(_work.Circuit.Sources[source].Element, 0)].NominalKv;
        return Element(source) switch
        {
            SynchronousMachine machine => machine.RatedMva / network.BaseMva * (nominalKv / (machine.RatedKv ?? nominalKv)),
            AsynchronousMotor motor => motor.RatedMvaOfOne * motor.Count / network.BaseMva * (nominalKv / (motor.RatedKv ?? nominalKv)),
            ConverterFedDrive drive => drive.RatedMva / network.BaseMva * (nominalKv / (drive.RatedKv ?? nominalKv)),
            _ => null,
        };
    }

    private NetworkElement Element(int source) => _work.Circuit.Network.Elements[_work.Circuit.Sources[source].Element];

    private List<MachineEntry> FindEntries(NetworkVariant variant)
    {
        var solved = _work.Networks.Of(variant);
        var columns = solved.PrunedColumns();
        var all = new List<MachineEntry>();
        Parallel.For(
            0, _machines.Value.Length,
            () => (Scratch: new PrunedColumns.Scratch(_work.Circuit.NodeCount), Found: new List<(int Node, Complex Value)>(), Own: new List<MachineEntry>()),
            (i, _, local) =>
            {
                var machine = _machines.Value[i];
                if (variant.Instant != FaultInstant.Initial && Element(machine.Source) is not SynchronousMachine)
                    return local;
                columns.Find(machine.Node, LeastShare(machine), local.Found, local.Scratch);
                foreach (var (node, value) in local.Found)
                    local.Own.Add(new MachineEntry(node, i, value));
                local.Found.Clear();
                return local;
            },
            local =>
            {
                lock (all)
                    all.AddRange(local.Own);
            });
        return all;
    }

    /// <summary>The least |Zki|/|Zkk| at which the current can exceed twice the rated one, with the largest c there is.</summary>
    private double LeastShare(in Machine machine) => IsDrive(machine.Source)
        ? SmallestShareOfDrives
        : 0.999 * SmallestRatio * machine.Rated * Complex.Abs(machine.Impedance) / 1.10;

    private readonly record struct Machine(int Source, int Node, Complex Impedance, double Rated);
}

/// <summary>An entry of Zbus: machine's column, fault's node.</summary>
internal readonly record struct MachineEntry(int Node, int Machine, Complex Impedance);

/// <summary>Entries gathered by node, in the order of the machines.</summary>
internal sealed class EntryTable
{
    private readonly int[] _start;
    private readonly MachineEntry[] _entries;

    public EntryTable(int nodes, List<MachineEntry> entries)
    {
        _start = new int[nodes + 1];
        foreach (var entry in entries)
            _start[entry.Node + 1]++;
        for (var i = 1; i < _start.Length; i++)
            _start[i] += _start[i - 1];
        _entries = new MachineEntry[entries.Count];
        var next = (int[])_start.Clone();
        foreach (var entry in entries)
            _entries[next[entry.Node]++] = entry;
        for (var node = 0; node < nodes; node++)
            Array.Sort(_entries, _start[node], _start[node + 1] - _start[node], ByMachine);
    }

    private static IComparer<MachineEntry> ByMachine { get; } = Comparer<MachineEntry>.Create((one, other) => one.Machine.CompareTo(other.Machine));

    /// <summary>The entries of a node.</summary>
    public ArraySegment<MachineEntry> At(int node) => new(_entries, _start[node], _start[node + 1] - _start[node]);
}
