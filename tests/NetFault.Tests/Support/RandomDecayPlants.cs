using CsCheck;

namespace NetFault.Tests.Support;

/// <summary>
/// Invented plants for the current over time, made from a seed: two or three voltage levels, meshed, off-nominal ratios, closed couplers,
/// feeders, up to 20 machines, motors. R/X from 0.01 to 5; T″ 0.01 to 0.05 s, T′ 0.3 to 10 s, motors' T 0.01 to 0.2 s; 50 or 60 Hz. Now
/// and then a machine lacks a time constant, or a motor its slip.
/// </summary>
internal sealed class RandomDecayPlants
{
    private static readonly double[][] Levels = [[33, 6.6], [110, 11, 0.69], [20, 0.4], [132, 33, 6]];

    private readonly Random _random;
    private readonly NetworkBuilder _builder;
    private readonly List<List<Bus>> _levels = [];
    private int _next;

    private RandomDecayPlants(int seed)
    {
        _random = new Random(seed);
        _builder = new NetworkBuilder { FrequencyHz = _random.Next(2) == 0 ? 50 : 60, BaseMva = 10 * (1 + _random.Next(20)) };
    }

    /// <summary>Seeds, buses (up to 60) and machines (up to 20); a failing case shows all three.</summary>
    public static Gen<(int Seed, int Buses, int Machines)> Cases(int mostBuses = 60, int mostMachines = 20) =>
        Gen.Select(Gen.Int[0, int.MaxValue - 1], Gen.Int[1, mostBuses], Gen.Int[0, mostMachines]);

    /// <summary>The plant of a seed.</summary>
    public static Network Make(int seed, int buses, int machines) => new RandomDecayPlants(seed).Build(buses, machines);

    /// <summary>The plant as a circuit of resistances and reactances: machines held at x″d, no motors.</summary>
    public static Network WithoutDecay(Network plant) => plant.With(
    [
        .. plant.SynchronousMachines.Select(one => one with
        {
            ReactancePu = new MachineReactances(one.ReactancePu.Subtransient), TimeConstantSeconds = default,
        }),
        .. plant.AsynchronousMotors.Select(one => one with { InService = false }),
    ]);

    private Network Build(int count, int machines)
    {
        AddBuses(count, Levels[_random.Next(Levels.Length)]);
        AddFeeder(_levels[0][0]);
        for (var i = 0; i < count / 20; i++)
            AddFeeder(Any(_levels[_random.Next(Math.Min(2, _levels.Count))]));
        for (var i = 0; i < machines; i++)
            AddMachine(Any(_levels[_random.Next(_levels.Count)]));
        for (var i = 0; i < count / 4; i++)
            AddMotor(Any(_levels[^1]));
        return _builder.Build();
    }

    /// <summary>Each level is a tree with further lines; each hangs on the one above by one to three transformers.</summary>
    private void AddBuses(int count, double[] kilovolts)
    {
        var levels = Math.Min(count, kilovolts.Length);
        for (var level = 0; level < levels; level++)
        {
            var here = count / levels + (level < count % levels ? 1 : 0);
            _levels.Add(Enumerable.Range(0, here).Select(_ => new Bus { Id = Id(), NominalKv = kilovolts[level] }).ToList());
            _builder.Add([.. _levels[level]]);
            for (var i = 1; i < here; i++)
                AddLine(_levels[level][i], _levels[level][_random.Next(i)], mayJoin: true);
            for (var i = 0; i < here / 2; i++)
                AddLine(Any(_levels[level]), Any(_levels[level]), mayJoin: false);
            for (var i = 0; level > 0 && i < 1 + here / 8; i++)
                AddTransformer(Any(_levels[level - 1]), Any(_levels[level]));
        }
        if (levels == 3 && _levels.Min(level => level.Count) > 1)
            AddThreeWindings(Any(_levels[0]), Any(_levels[1]), Any(_levels[2]));
    }

    private void AddLine(Bus one, Bus other, bool mayJoin)
    {
        if (one.Id == other.Id)
            return;
        var kind = _random.Next(10);
        if (kind == 0 && mayJoin)
        {
            _builder.Add(new BusCoupler { Id = Id(), From = one.Id, To = other.Id, Closed = true });
            return;
        }
        var x = one.NominalKv * one.NominalKv / PowerMva(one) * Between(0.003, 0.06);
        if (kind == 1)
        {
            _builder.Add(new SeriesReactor { Id = Id(), From = one.Id, To = other.Id, Ohm = new Impedance(x * LogBetween(0.01, 0.05), x) });
            return;
        }
        _builder.Add(new Line
        {
            Id = Id(), From = one.Id, To = other.Id, LengthKm = Between(0.2, 3), Parallel = 1 + _random.Next(2),
            OhmPerKm = new Impedance(x * LogBetween(0.05, 5), x),
        });
    }

    private void AddTransformer(Bus hv, Bus lv) => _builder.Add(new Transformer
    {
        Id = Id(), Hv = hv.Id, Lv = lv.Id, RatedMva = PowerMva(lv) * Between(0.5, 1.5), RatedHvKv = hv.NominalKv * Between(0.95, 1.05),
        RatedLvKv = lv.NominalKv * Between(0.98, 1.04), ShortCircuitVoltagePercent = Between(5, 14), XOverR = 1 / LogBetween(0.01, 0.3),
    });

    /// <summary>
    /// A passive one: the two impedances of the low-voltage winding differ by less than that of the other pair, all on one rating, and so do the
    /// resistances. The medium-voltage leg may be negative.
    /// </summary>
    private void AddThreeWindings(Bus hv, Bus mv, Bus lv)
    {
        double low = PowerMva(lv), high = low + Between(5, 40), medium = low + Between(5, 40);
        double hvMv = Between(8, 12), hvLv = Between(6, 9), part = Between(0.1, 0.8), onLow = low / Math.Min(high, medium);
        double hvMvLosses = Between(0.2, 0.6), hvLvLosses = Between(0.3, 0.6);
        _builder.Add(new ThreeWindingTransformer
        {
            Id = Id(), Hv = hv.Id, Mv = mv.Id, Lv = lv.Id, RatedMva = new WindingValues(high, medium, low),
            RatedKv = new WindingValues(hv.NominalKv * Between(0.97, 1.03), mv.NominalKv * Between(0.97, 1.03), lv.NominalKv),
            ShortCircuitVoltagePercent = new WindingPairValues(hvMv, hvLv, hvLv - part * Math.Min(5, hvMv * onLow)),
            ResistivePercent = new WindingPairValues(hvMvLosses, hvLvLosses, hvLvLosses - part * Math.Min(0.25, hvMvLosses * onLow)),
        });
    }

    private void AddFeeder(Bus bus) => _builder.Add(new NetworkFeeder
    {
        Id = Id(), Bus = bus.Id, ShortCircuitMva = new MaxMin(PowerMva(bus) * Between(10, 60)), ROverX = LogBetween(0.01, 1),
    });

    private void AddMachine(Bus bus)
    {
        double first = Between(0.1, 0.25), second = first * Between(1.2, 2), third = second * Between(3, 10);
        _builder.Add(new SynchronousMachine
        {
            Id = Id(), Bus = bus.Id, RatedMva = PowerMva(bus) * Between(0.2, 1.2), RatedKv = bus.NominalKv * Between(0.95, 1.05),
            ReactancePu = new MachineReactances(first, second, third), ArmatureResistancePu = first * LogBetween(0.01, 0.3),
            TimeConstantSeconds = new MachineTimeConstants(NowAndThenNull(LogBetween(0.01, 0.05)), NowAndThenNull(LogBetween(0.3, 10))),
        });
    }

    /// <summary>The slip is that of the wanted time constant: T = x/(ω·r2), r2 the slip, x on the motor's own rating.</summary>
    private void AddMotor(Bus bus)
    {
        double ratio = Between(4, 7), rOverX = Between(0.05, 0.45);
        var x = 1 / ratio / Math.Sqrt(1 + rOverX * rOverX);
        _builder.Add(new AsynchronousMotor
        {
            Id = Id(), Bus = bus.Id, RatedKw = 1000 * PowerMva(bus) * Between(0.02, 0.3), RatedPowerFactor = Between(0.8, 0.92),
            Efficiency = Between(0.9, 0.97), LockedRotorCurrentRatio = ratio, ROverX = rOverX, Count = 1 + _random.Next(3),
            RatedSlipPercent = NowAndThenNull(100 * x / (2 * Math.PI * _builder.FrequencyHz * LogBetween(0.01, 0.2))),
        });
    }

    /// <summary>A power that is usual at the bus's voltage.</summary>
    private static double PowerMva(Bus bus) => bus.NominalKv switch { > 50 => 80, > 15 => 30, > 3 => 10, _ => 1 };

    private double? NowAndThenNull(double value) => _random.Next(12) == 0 ? null : value;

    private Bus Any(List<Bus> among) => among[_random.Next(among.Count)];

    private double Between(double low, double high) => low + (high - low) * _random.NextDouble();

    private double LogBetween(double low, double high) => low * Math.Pow(high / low, _random.NextDouble());

    private string Id() => $"E{_next++}";
}
