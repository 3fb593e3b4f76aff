namespace NetFault.Tests.Support;

/// <summary>
/// Invented networks with all that IEC 60909-0 asks of the data, made from a seed: power station units with auxiliaries, generators,
/// motors, drives, doubly fed generators, series capacitors, low-voltage buses, couplers, islands.
/// </summary>
internal sealed class IecRandomNetworks
{
    private static readonly double[] Levels = [220, 110, 33, 11, 6, 0.4];

    private readonly Random _random;
    private readonly double? _tolerance;    // one for all, for couplers may join any two
    private readonly NetworkBuilder _builder;
    private readonly List<Bus> _buses = [];
    private readonly Dictionary<double, double> _ratedShare = [];
    private readonly bool _equalRatios;
    private readonly bool _drives;
    private int _next;

    private IecRandomNetworks(int seed, bool equalRatios, bool drives)
    {
        _random = new Random(seed);
        _tolerance = _random.Next(3) switch { 0 => 6, 1 => 10, _ => null };
        _equalRatios = equalRatios;
        _drives = drives;
        _builder = new NetworkBuilder { FrequencyHz = _random.Next(2) == 0 ? 50 : 60, BaseMva = 1 + _random.Next(200) };
        foreach (var level in Levels)
            _ratedShare[level] = Between(0.95, 1.06);
    }

    /// <summary>The network of a seed.</summary>
    /// <param name="seed">The seed.</param>
    /// <param name="buses">Buses of the grid; units bring their own in addition.</param>
    /// <param name="equalRatios">Whether all transformers between two levels have the same ratio, so that loops carry no current of
    /// their own.</param>
    /// <param name="drives">Whether converter-fed drives may be among the sources.</param>
    public static Network Make(int seed, int buses, bool equalRatios, bool drives = true) =>
        new IecRandomNetworks(seed, equalRatios, drives).Build(buses);

    private Network Build(int count)
    {
        for (var i = 0; i < count; i++)
            _buses.Add(AddBus(Levels[_random.Next(Levels.Length)], i == 0));
        for (var i = 1; i < count; i++)
            Connect(_buses[i], _buses[_random.Next(i)]);
        for (var i = _random.Next(1 + count / 3); i > 0; i--)
            Connect(Any(), Any());
        for (var i = 0; i < count / 8; i++)
            AddThreeWinding();
        AddFeeder(_buses[0]);
        if (_random.Next(3) == 0)
            AddFeeder(Any());
        for (var i = _random.Next(1 + count / 6); i >= 0; i--)
            AddUnit();
        for (var i = _random.Next(2 + count / 3); i > 0; i--)
            AddSource(Any());
        return _builder.Build();
    }

    private Bus AddBus(double kv, bool certain)
    {
        var bus = new Bus
        {
            Id = Id("B"), NominalKv = kv, InService = certain || _random.Next(40) > 0,
            LowVoltageTolerancePercent = kv > 1 ? null : _tolerance,
        };
        _builder.Add(bus);
        return bus;
    }

    private void Connect(Bus one, Bus other)
    {
        if (one.Id == other.Id)
            return;
        if (one.NominalKv.Equals(other.NominalKv))
            AddSameVoltage(one, other);
        else
            AddTransformer(one.NominalKv > other.NominalKv ? one : other, one.NominalKv > other.NominalKv ? other : one);
    }

    private void AddSameVoltage(Bus one, Bus other)
    {
        var ohm = one.NominalKv * one.NominalKv / Between(200, 5000);
        switch (_random.Next(7))
        {
            case 0:
                _builder.Add(new BusCoupler { Id = Id("K"), From = one.Id, To = other.Id, Closed = _random.Next(3) > 0,
                    InService = InService() });
                break;
            case 1:
                _builder.Add(new SeriesReactor
                {
                    Id = Id("R"), From = one.Id, To = other.Id, RatedKa = Between(0.5, 3), ReactancePercent = Between(3, 10),
                    XOverR = Between(20, 100), InService = InService(),
                });
                break;
            case 2:
                AddCompensatedLine(one, other, ohm);
                break;
            default:
                AddLine(one, other, ohm);
                break;
        }
    }

    private void AddLine(Bus one, Bus other, double ohm) => _builder.Add(new Line
    {
        Id = Id("L"), From = one.Id, To = other.Id, LengthKm = Between(0.5, 2), Parallel = 1 + _random.Next(3), InService = InService(),
        OhmPerKm = new Impedance(ohm * Between(0.05, 1), ohm * Between(0.2, 1.5)), EndTemperatureC = _random.Next(2) == 0 ? null
        : Between(60, 250),
    });

    /// <summary>The capacitor is small enough to leave most buses inductive at the lowest equivalent frequency.</summary>
    private void AddCompensatedLine(Bus one, Bus other, double ohm)
    {
        var between = AddBus(one.NominalKv, certain: true);
        _builder.Add(
            new Line { Id = Id("L"), From = one.Id, To = between.Id,
                Ohm = new Impedance(ohm * Between(0.05, 0.2), ohm * Between(0.5, 1.5)) },
            new SeriesCapacitor
            {
                Id = Id("C"), From = between.Id, To = other.Id, ReactanceOhm = ohm * Between(2e-4, 1e-3),
                VoltageLimited = _random.Next(2) == 0,
            });
    }

    private Transformer AddTransformer(Bus hv, Bus lv, bool inService = false)
    {
        var transformer = new Transformer
        {
            Id = Id("T"), Hv = hv.Id, Lv = lv.Id, RatedMva = Between(0.5, 100), RatedHvKv = RatedKv(hv), RatedLvKv = RatedKv(lv),
            ShortCircuitVoltagePercent = Between(4, 16), ResistivePercent = Between(0.2, 1.5), InService = inService || InService(),
            OnLoadTapChanger = _random.Next(2) == 0, OffLoadTapRangePercent = _random.Next(2) == 0 ? null : Between(2, 8),
        };
        _builder.Add(transformer);
        return transformer;
    }

    private double RatedKv(Bus bus) => bus.NominalKv * (_equalRatios ? _ratedShare[bus.NominalKv] : Between(0.95, 1.06));

    private void AddThreeWinding()
    {
        var buses = new[] { Any(), Any(), Any() }.OrderByDescending(bus => bus.NominalKv).ToArray();
        if (buses.Select(bus => bus.NominalKv).Distinct().Count() < 3)
            return;
        var mva = Between(10, 60);
        _builder.Add(new ThreeWindingTransformer
        {
            Id = Id("W"), Hv = buses[0].Id, Mv = buses[1].Id, Lv = _random.Next(4) == 0 ? null : buses[2].Id,
            RatedMva = new WindingValues(mva, mva, mva),
            RatedKv = new WindingValues(RatedKv(buses[0]), RatedKv(buses[1]), RatedKv(buses[2])),
            ShortCircuitVoltagePercent = new WindingPairValues(Between(9, 12), Between(14, 18), Between(6, 9)),
            ResistivePercent = new WindingPairValues(Between(0.2, 0.6), Between(0.2, 0.6), Between(0.2, 0.6)), InService = InService(),
        });
    }

    private void AddFeeder(Bus bus)
    {
        var strength = Between(200, 8000);
        var value = new MaxMin(strength, _random.Next(3) == 0 ? null : strength * Between(0.4, 1));
        _builder.Add(_random.Next(2) == 0
            ? new NetworkFeeder { Id = Id("Q"), Bus = bus.Id, ShortCircuitMva = value, XOverR = Between(3, 30) }
            : new NetworkFeeder
            {
                Id = Id("Q"), Bus = bus.Id, ROverX = Between(0.03, 0.3),
                ShortCircuitKa = new MaxMin(value.Max / Math.Sqrt(3) / bus.NominalKv, value.Min / Math.Sqrt(3) / bus.NominalKv),
            });
    }

    /// <summary>A power station unit, with auxiliaries at its terminals, which sometimes have a second way to the grid.</summary>
    private void AddUnit()
    {
        var hv = Any();
        if (hv.NominalKv < 30 || !hv.InService)
            return;
        var terminals = AddBus(_random.Next(2) == 0 ? 11 : 6, certain: true);
        var transformer = AddTransformer(hv, terminals);
        AddMachine(terminals, transformer.Id);
        if (_random.Next(2) == 0)
            return;
        var auxiliaries = AddBus(0.4, certain: true);
        AddTransformer(terminals, auxiliaries);
        if (_random.Next(4) == 0)
            AddTransformer(hv, auxiliaries);
        for (var i = _random.Next(3); i > 0; i--)
            AddMotor(auxiliaries);
    }

    private void AddMachine(Bus bus, string? unitTransformer) => _builder.Add(new SynchronousMachine
    {
        Id = Id("G"), Bus = bus.Id, RatedMva = Between(1, 180), RatedKv = bus.NominalKv * Between(0.95, 1.05),
        UnitTransformer = unitTransformer,
        InService = InService(), RatedPowerFactor = Between(0.75, 1), VoltageRegulationPercent = _random.Next(2) == 0 ? null
        : Between(2, 8),
        ReactancePu = new MachineReactances(Between(0.1, 0.25), Between(0.25, 0.4), Between(1, 2.2)),
        ArmatureResistancePu = Between(0.002, 0.02),
    });

    private void AddSource(Bus bus)
    {
        switch (_random.Next(6))
        {
            case 0 or 1:
                AddMachine(bus, null);
                break;
            case 2 when _drives:
                _builder.Add(new ConverterFedDrive { Id = Id("D"), Bus = bus.Id, RatedMva = Between(0.5, 8), InService = InService() });
                break;
            case 3:
                _builder.Add(new DoublyFedGenerator
                {
                    Id = Id("W"), Bus = bus.Id, HighestInstantaneousKa = Between(5, 60) / bus.NominalKv, InService = InService(),
                    PeakFactor = _random.Next(2) == 0 ? null : Between(1.5, 1.9), ROverX = _random.Next(2) == 0 ? null : Between(0.05, 0.2),
                });
                break;
            default:
                AddMotor(bus);
                break;
        }
    }

    private void AddMotor(Bus bus) => _builder.Add(new AsynchronousMotor
    {
        Id = Id("M"), Bus = bus.Id, RatedKw = Between(50, 6000), RatedPowerFactor = Between(0.8, 0.92), Efficiency = Between(0.9, 0.97),
        LockedRotorCurrentRatio = Between(4, 7), ROverX = _random.Next(2) == 0 ? null : Between(0.1, 0.42), PolePairs = 1 + _random.Next(4),
        Count = 1 + _random.Next(4), InService = InService(),
    });

    private bool InService() => _random.Next(25) > 0;

    private Bus Any() => _buses[_random.Next(_buses.Count)];

    private double Between(double low, double high) => low + (high - low) * _random.NextDouble();

    private string Id(string kind) => $"{kind}{_next++}";
}
