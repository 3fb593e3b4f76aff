using System.Globalization;

namespace NetFault;

/// <summary>
/// The multipliers of a rotating machine's subtransient impedance (IEEE Std C37.010, table of rotating machine reactances; motors below
/// 50 hp in the first cycle by the combined network of IEEE Std 141 and C37.13). All from memory of the standards.
/// </summary>
/// <param name="FirstCycle">In the first-cycle network.</param>
/// <param name="Interrupting">In the interrupting network; null where the machine is left out of it.</param>
internal readonly record struct ReactanceMultipliers(double FirstCycle, double? Interrupting)
{
    private const double KilowattsPerHorsepower = 0.746;

    /// <summary>
    /// Motors of 50 hp and above. 50 hp are 37.3 kW; the metric size that goes by 50 hp is 37 kW, and it is counted as such, which is on
    /// the safe side.
    /// </summary>
    private const double FiftyHorsepowerKw = 37.0;

    /// <summary>
    /// The standard's speeds are those of 60 Hz: 1800 r/min or less, and 3600 r/min. What is faster than the first is as the second.
    /// </summary>
    private const double SlowRpm = 1800.0;
    private const double LargeAndSlowHp = 1000.0;
    private const double LargeAndFastHp = 250.0;

    private static readonly ReactanceMultipliers Undiminished = new(1.0, 1.0);
    private static readonly ReactanceMultipliers Large = new(1.0, 1.5);
    private static readonly ReactanceMultipliers Medium = new(1.2, 3.0);
    private static readonly ReactanceMultipliers Small = new(1.67, null);

    /// <summary>Generators and condensers 1.0 and 1.0, synchronous motors 1.0 and 1.5.</summary>
    public static ReactanceMultipliers Of(SynchronousMachine machine) =>
        machine.Service == SynchronousService.Motor ? Large : Undiminished;

    /// <summary>By the size of one motor and its synchronous speed.</summary>
    public static ReactanceMultipliers Of(AsynchronousMotor motor, double frequencyHz, AssumptionLog? log)
    {
        if (motor.RatedKw < FiftyHorsepowerKw)
            return Small;
        var horsepower = motor.RatedKw / KilowattsPerHorsepower;
        if (motor.PolePairs is null && horsepower is > LargeAndFastHp and <= LargeAndSlowHp)
        {
            log?.Add(motor, "pole_pairs", string.Format(CultureInfo.InvariantCulture,
                "pole_pairs is not given; 1 assumed, the larger contribution ({0:0} hp is large at 3600 r/min, not at 1800)", horsepower));
        }
        var isFast = 60.0 * frequencyHz / (motor.PolePairs ?? 1) > SlowRpm;
        return horsepower > (isFast ? LargeAndFastHp : LargeAndSlowHp) ? Large : Medium;
    }

    /// <summary>The standard has no drives fed by converters: as the largest motors.</summary>
    public static ReactanceMultipliers Of(ConverterFedDrive drive, AssumptionLog? log)
    {
        log?.Add(drive, "rated_mva", "IEEE C37.010 has no converter-fed drives; multipliers 1.0 and 1.5 taken as for the largest motors");
        return Large;
    }

    /// <summary>Nor doubly fed generators: no decrement is credited.</summary>
    public static ReactanceMultipliers Of(DoublyFedGenerator generator, AssumptionLog? log)
    {
        log?.Add(generator, "highest_instantaneous_ka",
            "IEEE C37.010 has no doubly fed generators; the impedance of IEC 60909-0 taken in the first-cycle and interrupting networks");
        return Undiminished;
    }
}
