using System.Numerics;

namespace NetFault.Tests.Support;

/// <summary>
/// Generated networks with every machine that IEEE Std C37.010 tells apart, and the three networks of that standard as networks of their
/// own: the multipliers are put into the machines' data, so that <see cref="DenseOracle"/> can solve them without knowing the method.
/// </summary>
internal static class IeeeNetworks
{
    /// <summary>What is taken of an impedance in the network of the reactances alone.</summary>
    public static readonly Func<Complex, Complex> Reactance = z => new Complex(0, z.Imaginary);

    /// <summary>The same for the resistances; R = |X|/200 where there is none.</summary>
    public static readonly Func<Complex, Complex> Resistance = z => z.Real == 0 ? Math.Abs(z.Imaginary) / 200 : z.Real;

    /// <summary>The network of a seed, its machines made generators, motors or condensers, its motors of all sizes and speeds.</summary>
    public static Network Make(int seed, int buses, bool threeWindings = true)
    {
        var network = RandomNetworks.Make(seed, buses);
        var random = new Random(seed ^ 0x2b5);
        var elements = network.Elements.Where(one => threeWindings || one is not ThreeWindingTransformer).Select(one => one switch
        {
            SynchronousMachine machine => machine with { Service = (SynchronousService)random.Next(3) },
            AsynchronousMotor motor => motor with
            {
                RatedKw = random.Next(4) switch
                {
                    0 => random.Next(5, 36),
                    1 => random.Next(38, 180),
                    2 => random.Next(190, 740),
                    _ => random.Next(760, 6000),
                },
                PolePairs = random.Next(4) is var pairs and > 0 ? pairs : null,
            },
            _ => one,
        });
        return new NetworkBuilder { FrequencyHz = network.FrequencyHz, BaseMva = network.BaseMva }.Add([.. elements]).Build();
    }

    /// <summary>The first-cycle network.</summary>
    public static Network FirstCycle(Network network) => With(network, one => one switch
    {
        AsynchronousMotor motor => Weakened(motor, FirstCycleMultiplier(motor, network.FrequencyHz)),
        _ => one,
    });

    /// <summary>The interrupting network.</summary>
    public static Network Interrupting(Network network) => With(network, one => one switch
    {
        SynchronousMachine { Service: SynchronousService.Motor } motor => motor with
        {
            ReactancePu = new MachineReactances(1.5 * motor.ReactancePu.Subtransient),
            ArmatureResistancePu = 1.5 * motor.ArmatureResistancePu,
        },
        AsynchronousMotor { RatedKw: < 37.3 } => null,
        AsynchronousMotor motor => Weakened(motor, FirstCycleMultiplier(motor, network.FrequencyHz) == 1.0 ? 1.5 : 3.0),
        _ => one,
    });

    /// <summary>The 30-cycle network.</summary>
    public static Network ThirtyCycle(Network network) => With(network, one => one switch
    {
        SynchronousMachine { Service: SynchronousService.Generator } machine => machine with
        {
            ReactancePu = new MachineReactances(machine.ReactancePu.Transient!.Value),
        },
        SynchronousMachine or AsynchronousMotor => null,
        _ => one,
    });

    /// <summary>The standard's table, in horsepower and r/min, from memory of it; an unknown speed counts as the higher one.</summary>
    private static double FirstCycleMultiplier(AsynchronousMotor motor, double frequencyHz)
    {
        var hp = motor.RatedKw / 0.746;
        var rpm = 60 * frequencyHz / (motor.PolePairs ?? 1);
        if (hp < 50)
            return 1.67;
        return hp > 1000 || (rpm > 1800 && hp > 250) ? 1.0 : 1.2;
    }

    /// <summary>|Z| is in inverse proportion to the locked-rotor current.</summary>
    private static AsynchronousMotor Weakened(AsynchronousMotor motor, double multiplier) =>
        motor with { LockedRotorCurrentRatio = motor.LockedRotorCurrentRatio / multiplier };

    private static Network With(Network network, Func<NetworkElement, NetworkElement?> change) =>
        new NetworkBuilder { FrequencyHz = network.FrequencyHz, BaseMva = network.BaseMva }
            .Add([.. network.Elements.Select(change).OfType<NetworkElement>()]).Build();
}
