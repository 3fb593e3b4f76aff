using CsCheck;

namespace NetFault.Tests.Support;

/// <summary>Invented networks of every kind of element, made from a seed: meshed, several voltages, off-nominal ratios, couplers, islands.</summary>
internal sealed class RandomNetworks
{
    private static readonly double[] Levels = [220, 110, 33, 11, 6, 0.4];

    private readonly Random _random;
    private readonly NetworkBuilder _builder;
    private readonly List<Bus> _buses = [];
    private readonly bool _negativeReactances;
    private int _next;

    private RandomNetworks(int seed, bool negativeReactances)
    {
        _random = new Random(seed);
        _negativeReactances = negativeReactances;
        _builder = new NetworkBuilder { FrequencyHz = _random.Next(2) == 0 ? 50 : 60, BaseMva = 1 + _random.Next(200) };
    }

    /// <summary>Seeds and sizes; a failing case shows both.</summary>
    public static Gen<(int Seed, int Buses)> Cases(int mostBuses) => Gen.Select(Gen.Int[0, int.MaxValue - 1], Gen.Int[1, mostBuses]);

    /// <summary>The network of a seed.</summary>
    public static Network Make(int seed, int buses, bool negativeReactances = false) =>
        new RandomNetworks(seed, negativeReactances).Build(buses);

    private Network Build(int count)
    {
        for (var i = 0; i < count; i++)
            AddBus();
        for (var i = 1; i < count; i++)
            Connect(_buses[i], _buses[_random.Next(i)]);
        for (var i = 0; i < count / 2; i++)
            Connect(Any(), Any());
        for (var i = 0; i < count / 8; i++)
            AddThreeWinding();
        _builder.Add(new NetworkFeeder
        {
            Id = Id(), Bus = _buses[0].Id, ShortCircuitMva = new MaxMin(Between(200, 8000)), XOverR = Between(3, 30),
        });
        for (var i = 0; i < 1 + count / 4; i++)
            AddSource();
        return _builder.Build();
    }

    private void AddBus()
    {
        var bus = new Bus { Id = Id(), NominalKv = Levels[_random.Next(Levels.Length)], InService = _random.Next(40) > 0 || _buses.Count == 0 };
        _buses.Add(bus);
        _builder.Add(bus);
    }

    private void Connect(Bus one, Bus other)
    {
        if (one.Id == other.Id)
            return;
        if (one.NominalKv.Equals(other.NominalKv))
            AddSameVoltage(one, other);
        else if (one.NominalKv > other.NominalKv)
            AddTransformer(one, other);
        else
            AddTransformer(other, one);
    }

    private void AddSameVoltage(Bus one, Bus other)
    {
        var ohm = one.NominalKv * one.NominalKv / Between(200, 5000);
        switch (_random.Next(6))
        {
            case 0:
                _builder.Add(new BusCoupler { Id = Id(), From = one.Id, To = other.Id, Closed = _random.Next(3) > 0, InService = InService() });
                break;
            case 1:
                _builder.Add(new SeriesReactor
                {
                    Id = Id(), From = one.Id, To = other.Id, RatedKa = Between(0.5, 3), ReactancePercent = Between(3, 10),
                    XOverR = _random.Next(2) == 0 ? null : Between(20, 100), InService = InService(),
                });
                break;
            default:
                _builder.Add(new Line
                {
                    Id = Id(), From = one.Id, To = other.Id, LengthKm = Between(0.5, 2), Parallel = 1 + _random.Next(3),
                    OhmPerKm = new Impedance(ohm * Between(0.05, 1), ohm * Reactance()), InService = InService(),
                });
                break;
        }
    }

    private double Reactance() => _negativeReactances && _random.Next(8) == 0 ? -Between(0.05, 0.4) : Between(0.2, 1.5);

    private void AddTransformer(Bus hv, Bus lv) => _builder.Add(new Transformer
    {
        Id = Id(), Hv = hv.Id, Lv = lv.Id, RatedMva = Between(0.5, 100), RatedHvKv = hv.NominalKv * Between(0.92, 1.08),
        RatedLvKv = lv.NominalKv * Between(0.97, 1.05), ShortCircuitVoltagePercent = Between(4, 16), ResistivePercent = Between(0.2, 1.5),
        InService = InService(),
    });

    private void AddThreeWinding()
    {
        var buses = new[] { Any(), Any(), Any() }.OrderByDescending(bus => bus.NominalKv).ToArray();
        if (buses.Select(bus => bus.Id).Distinct().Count() < 3)
            return;
        var open = _random.Next(5);
        _builder.Add(new ThreeWindingTransformer
        {
            Id = Id(), Hv = open == 0 ? null : buses[0].Id, Mv = open == 1 ? null : buses[1].Id, Lv = open == 2 ? null : buses[2].Id,
            RatedMva = new WindingValues(Between(20, 60), Between(20, 60), Between(5, 20)),
            RatedKv = new WindingValues(
                buses[0].NominalKv * Between(0.95, 1.05), buses[1].NominalKv * Between(0.95, 1.05), buses[2].NominalKv * Between(0.95, 1.05)),
            ShortCircuitVoltagePercent = new WindingPairValues(Between(8, 14), Between(14, 20), Between(5, 9)),
            ResistivePercent = new WindingPairValues(Between(0.2, 0.6), Between(0.2, 0.6), Between(0.2, 0.6)),
            InService = InService(),
        });
    }

    private void AddSource()
    {
        var bus = Any();
        if (_random.Next(2) == 0)
        {
            _builder.Add(new SynchronousMachine
            {
                Id = Id(), Bus = bus.Id, RatedMva = Between(1, 80), RatedKv = bus.NominalKv * Between(0.95, 1.05), InService = InService(),
                ReactancePu = new MachineReactances(Between(0.1, 0.25), Between(0.25, 0.4), Between(1, 2.2)),
                ArmatureResistancePu = Between(0.002, 0.02),
            });
            return;
        }
        _builder.Add(new AsynchronousMotor
        {
            Id = Id(), Bus = bus.Id, RatedKw = Between(50, 6000), RatedPowerFactor = Between(0.8, 0.92), Efficiency = Between(0.9, 0.97),
            LockedRotorCurrentRatio = Between(4, 7), ROverX = Between(0.1, 0.42), Count = 1 + _random.Next(4), InService = InService(),
        });
    }

    private bool InService() => _random.Next(25) > 0;

    private Bus Any() => _buses[_random.Next(_buses.Count)];

    private double Between(double low, double high) => low + (high - low) * _random.NextDouble();

    private string Id() => $"E{_next++}";
}
