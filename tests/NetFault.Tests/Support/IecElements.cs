using System.Numerics;

namespace NetFault.Tests.Support;

/// <summary>
/// The impedances of elements by IEC 60909-0:2016, clause 6, in ohm at their own rated voltage: the second implementation that generated
/// networks are checked with.
/// </summary>
internal sealed class IecElements
{
    private readonly Network _network;
    private readonly bool _maximum;

    public IecElements(Network network, ShortCircuitCase which) => (_network, _maximum) = (network, which == ShortCircuitCase.Maximum);

    /// <summary>Table 1, cmax: 1.05 at +6 %, 1.10 at +10 % up to 1 kV; 1.10 above.</summary>
    public double CMax(string bus) => Bus(bus) is { NominalKv: <= 1, LowVoltageTolerancePercent: 6 } ? 1.05 : 1.10;

    /// <summary>Table 1, c of the case.</summary>
    public double C(string bus) => _maximum ? CMax(bus)
        : Bus(bus).NominalKv > 1 ? 1.00
        : Bus(bus).LowVoltageTolerancePercent == 6 ? 0.95 : 0.90;

    /// <summary>Equation for ZQ: c·Un/(√3·I″kQ) = c·Un²/S″kQ.</summary>
    public Complex Feeder(NetworkFeeder feeder)
    {
        double Of(MaxMin value) => _maximum ? value.Max : value.Min ?? value.Max;
        var kv = Kv(feeder.Bus);
        var mva = feeder.ShortCircuitMva is { } power ? Of(power) : Math.Sqrt(3) * kv * Of(feeder.ShortCircuitKa!.Value);
        return Polar(C(feeder.Bus) * kv * kv / mva, feeder.ROverX ?? 1 / feeder.XOverR!.Value);
    }

    /// <summary>6.4: R at 20 °C in the maximum case, times 1 + 0.004·(θe − 20) in the minimum case.</summary>
    public Complex Line(Line line)
    {
        var one = line.Ohm is { } ohm
            ? new Complex(ohm.R, ohm.X)
            : new Complex(line.OhmPerKm!.Value.R, line.OhmPerKm.Value.X) * line.LengthKm!.Value;
        var warmer = _maximum ? 1 : 1 + 0.004 * ((line.EndTemperatureC ?? 80) - 20);
        return new Complex(one.Real * warmer, one.Imaginary) / line.Parallel;
    }

    /// <summary>6.5.</summary>
    public Complex Reactor(SeriesReactor reactor)
    {
        var x = reactor.ReactancePercent!.Value / 100 * (reactor.RatedKv ?? Kv(reactor.From)) / Math.Sqrt(3) / reactor.RatedKa!.Value;
        return new Complex(reactor.XOverR is { } ratio ? x / ratio : 0, x);
    }

    /// <summary>6.3.1 and 6.3.3: ZT on the high-voltage side with K_T; unit transformers with K_S, K_SO, K_T,S or K_T,SO.</summary>
    public Complex Transformer(Transformer t, string? insideMachine)
    {
        var own = Percent(t.ShortCircuitVoltagePercent, t.ResistivePercent!.Value);
        var unit = _network.SynchronousMachines.FirstOrDefault(one => one.InService && one.UnitTransformer == t.Id);
        var factor = unit is null
            ? 0.95 * CMax(t.Lv) / (1 + 0.6 * own.Imaginary)
            : unit.Id == insideMachine ? CMax(unit.Bus) / (1 - own.Imaginary * SinPhi(unit)) / Raised(unit, t) : Unit(unit, t);
        return own * factor * t.RatedHvKv * t.RatedHvKv / t.RatedMva;
    }

    /// <summary>6.3.2 and 6.3.3: a pair of windings on the rated voltage of the HV winding, with the pair's own K_T.</summary>
    public Complex Windings(double percent, double resistive, double mva, double hvKv, string lowerBus)
    {
        var own = Percent(percent, resistive);
        return own * (0.95 * CMax(lowerBus) / (1 + 0.6 * own.Imaginary)) * hvKv * hvKv / mva;
    }

    /// <summary>6.6 and 6.7: K·(R + jX″d), with R_Gf for the peak.</summary>
    public Complex Machine(SynchronousMachine machine, bool fictitious, bool inside)
    {
        var kv = machine.RatedKv ?? Kv(machine.Bus);
        var x = machine.ReactancePu.Subtransient;
        var r = fictitious
            ? x * (kv <= 1 ? 0.15 : machine.RatedMva >= 100 ? 0.05 : 0.07)
            : machine.ArmatureResistancePu ?? machine.ArmatureResistanceOhm!.Value / (kv * kv / machine.RatedMva);
        return new Complex(r, x) * (kv * kv / machine.RatedMva * MachineFactor(machine, inside));
    }

    /// <summary>6.10: ZM = (1/(ILR/IrM))·UrM²/SrM; R/X by size where not given.</summary>
    public Complex Motor(AsynchronousMotor motor)
    {
        var kv = motor.RatedKv ?? Kv(motor.Bus);
        var ratio = motor.ROverX ?? (motor.XOverR is { } inverse ? 1 / inverse : kv <= 1 ? 0.42
            : motor.RatedKw / 1000 / motor.PolePairs!.Value >= 1 ? 0.10 : 0.15);
        return Polar(kv * kv / RatedMva(motor) / motor.LockedRotorCurrentRatio, ratio);
    }

    /// <summary>6.11: as a motor with ILR/IrM = 3, R/X = 0.10.</summary>
    public Complex Drive(ConverterFedDrive drive)
    {
        var kv = drive.RatedKv ?? Kv(drive.Bus);
        return Polar(kv * kv / drive.RatedMva / 3, 0.10);
    }

    /// <summary>6.8: Z_WD = √2·κ_WD·UrTHV/(√3·i_WDmax); κ_WD 1.7 and R/X 0.1 where not given.</summary>
    public Complex DoublyFed(DoublyFedGenerator one) =>
        Polar(Math.Sqrt(2) * (one.PeakFactor ?? 1.7) * (one.RatedKv ?? Kv(one.Bus)) / (Math.Sqrt(3) * one.HighestInstantaneousKa),
            one.ROverX ?? 0.1);

    /// <summary>Rated current in kA of a machine or of the whole group; null for what is none.</summary>
    public double? RatedKa(ShuntElement element) => element switch
    {
        SynchronousMachine one => one.RatedMva / Math.Sqrt(3) / (one.RatedKv ?? Kv(one.Bus)),
        AsynchronousMotor one => RatedMva(one) / Math.Sqrt(3) / (one.RatedKv ?? Kv(one.Bus)),
        ConverterFedDrive one => one.RatedMva / Math.Sqrt(3) / (one.RatedKv ?? Kv(one.Bus)),
        _ => null,
    };

    public double Kv(string bus) => Bus(bus).NominalKv;

    private double MachineFactor(SynchronousMachine machine, bool inside)
    {
        var unit = _network.Transformers.FirstOrDefault(one =>
            one.InService && one.Id == machine.UnitTransformer && Bus(one.Hv).InService && Bus(one.Lv).InService);
        var plain = 1 + machine.ReactancePu.Subtransient * SinPhi(machine);
        if (unit is null)
            return Kv(machine.Bus) / ((machine.RatedKv ?? Kv(machine.Bus)) * (1 + (machine.VoltageRegulationPercent ?? 0) / 100))
                * CMax(machine.Bus) / plain;
        return inside ? CMax(machine.Bus) / plain / Raised(machine, unit) : Unit(machine, unit);
    }

    /// <summary>6.7.1 K_S with on-load tap changer, 6.7.2 K_SO without.</summary>
    private double Unit(SynchronousMachine g, Transformer t)
    {
        double unQ = Kv(t.Hv), urG = g.RatedKv ?? Kv(g.Bus), tr = t.RatedHvKv / t.RatedLvKv, xd = g.ReactancePu.Subtransient;
        if (t.OnLoadTapChanger!.Value)
        {
            var xT = Percent(t.ShortCircuitVoltagePercent, t.ResistivePercent!.Value).Imaginary;
            return unQ * unQ / (urG * urG) / (tr * tr) * CMax(t.Hv) / (1 + Math.Abs(xd - xT) * SinPhi(g));
        }
        var tap = (t.OffLoadTapRangePercent ?? 0) / 100 * (_maximum ? -1 : 1);
        return unQ / (urG * Raised(g, t)) / tr * (1 + tap) * CMax(t.Hv) / (1 + xd * SinPhi(g));
    }

    /// <summary>1 + pG for a unit without on-load tap changer, else 1.</summary>
    private static double Raised(SynchronousMachine g, Transformer t) =>
        t.OnLoadTapChanger!.Value ? 1 : 1 + (g.VoltageRegulationPercent ?? 0) / 100;

    private static double SinPhi(SynchronousMachine machine) => Math.Sin(Math.Acos(machine.RatedPowerFactor!.Value));

    private static double RatedMva(AsynchronousMotor motor) =>
        motor.Count * motor.RatedKw / 1000 / motor.RatedPowerFactor / motor.Efficiency;

    private static Complex Percent(double uk, double ur) => new(ur / 100, Math.Sqrt(uk * uk - ur * ur) / 100);

    private static Complex Polar(double ohm, double rOverX) => Complex.FromPolarCoordinates(ohm, Math.Atan2(1, rOverX));

    private Bus Bus(string id) => _network.Find<Bus>(id);
}
