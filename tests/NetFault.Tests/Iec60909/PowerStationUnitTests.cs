using System.Numerics;
using static NetFault.Tests.Support.IecCases;

namespace NetFault.Tests.ByIec60909;

/// <summary>
/// Oracle: IEC 60909-0:2016, 6.7 (K_S, K_SO) and 7.2.2, 7.2.3 (short circuits inside a power station unit), evaluated by hand. An invented
/// unit of 150 MVA: 21 kV machine, 16 % transformer 115/21 kV, at a 110 kV bus with a feeder of 20 kA.
/// </summary>
public class PowerStationUnitTests
{
    private const double Xd = 0.17;
    private const double SinPhi = 0.5267826876426369;   // cos φ = 0.85

    private static readonly double Xt = Math.Sqrt(0.16 * 0.16 - 0.005 * 0.005);
    private static readonly Complex ZgRated = new Complex(0.002, Xd) * (21.0 * 21 / 150);
    private static readonly Complex ZtHigh = new Complex(0.005, Xt) * (115.0 * 115 / 150);
    private static readonly Complex ZtLow = new Complex(0.005, Xt) * (21.0 * 21 / 150);
    private static readonly double Tr = 115.0 / 21;

    [Theory]
    [InlineData(ShortCircuitCase.Maximum, 1.1)]
    [InlineData(ShortCircuitCase.Minimum, 1.0)]
    public void K_S_holds_for_machine_and_transformer_with_on_load_tap_changer_by_6_7_1(ShortCircuitCase which, double c)
    {
        var kS = 110.0 * 110 / (21 * 21) / (Tr * Tr) * 1.1 / (1 + Math.Abs(Xd - Xt) * SinPhi);
        var unit = kS * (Tr * Tr * ZgRated + ZtHigh);
        var fault = Unit(onLoad: true).At("H", which);
        ShouldBeClose(fault.ImpedanceOhm!.Value, Parallel(unit, FeederOhm(c)));
        fault.InitialSymmetricalKa.ShouldBe(Ka(c, 110, Parallel(unit, FeederOhm(c))));
    }

    [Theory]
    [InlineData(ShortCircuitCase.Maximum, 1.1, 5.0, 4.0)]
    [InlineData(ShortCircuitCase.Minimum, 1.0, 5.0, 4.0)]
    [InlineData(ShortCircuitCase.Maximum, 1.1, 0.0, 0.0)]
    [InlineData(ShortCircuitCase.Maximum, 1.1, 7.5, 0.0)]
    public void K_SO_holds_with_pG_and_pT_without_on_load_tap_changer_by_6_7_2(ShortCircuitCase which, double c, double pG, double pT)
    {
        var tap = which == ShortCircuitCase.Maximum ? 1 - pT / 100 : 1 + pT / 100;
        var kSo = 110 / (21 * (1 + pG / 100)) / Tr * tap * 1.1 / (1 + Xd * SinPhi);
        var expected = Parallel(kSo * (Tr * Tr * ZgRated + ZtHigh), FeederOhm(c));
        ShouldBeClose(Unit(onLoad: false, pG, pT).At("H", which).ImpedanceOhm!.Value, expected);
    }

    [Theory]
    [InlineData(true, 0.0)]
    [InlineData(false, 0.0)]
    [InlineData(false, 5.0)]
    public void Inside_the_unit_the_machine_has_K_GS_and_the_transformer_K_TS_by_7_2(bool onLoad, double pG)
    {
        foreach (var (which, c) in new[] { (ShortCircuitCase.Maximum, 1.1), (ShortCircuitCase.Minimum, 1.0) })
        {
            var expected = InsideOhm(c, pG);
            foreach (var fault in new[] { Unit(onLoad, pG).At("G", which), Unit(onLoad, pG).AmongAll("G", which) })
            {
                ShouldBeClose(fault.ImpedanceOhm!.Value, expected);
                fault.InitialSymmetricalKa.ShouldBe(Ka(c, 21, expected));
            }
        }
    }

    /// <summary>7.2.2: the driving voltage at the terminals is c·UrG/√3, not c·Un/√3.</summary>
    [Fact]
    public void Terminals_of_another_nominal_voltage_are_driven_by_the_machines_rated_voltage()
    {
        var network = Unit(onLoad: true).With(Bus("G", 20));
        network.At("G").InitialSymmetricalKa.ShouldBe(Ka(1.1, 21, InsideOhm(1.1, 0)));
    }

    /// <summary>7.2.2, figure of the auxiliary busbar: Zrsl at the terminals serves faults behind the auxiliary transformer.</summary>
    [Fact]
    public void A_bus_behind_an_auxiliary_transformer_sees_the_impedance_inside_the_unit()
    {
        var network = WithAuxiliaries();
        var xA = Math.Sqrt(0.07 * 0.07 - 0.005 * 0.005);
        var auxiliary = 0.95 * 1.1 / (1 + 0.6 * xA) * new Complex(0.005, xA) * (6.3 * 6.3 / 12);
        var expected = InsideOhm(1.1, 0) * (6.3 / 21 * 6.3 / 21) + auxiliary;
        foreach (var fault in new[] { network.At("A"), network.AmongAll("A") })
        {
            ShouldBeClose(fault.ImpedanceOhm!.Value, expected);
            fault.InitialSymmetricalKa.ShouldBe(Ka(1.1, 6, expected));
        }
    }

    [Fact]
    public void The_grid_beyond_sees_K_S_with_the_auxiliaries_motors_at_the_terminals()
    {
        var network = WithAuxiliaries().With(Motor("A") with { RatedKv = 6, ROverX = 0.1 });
        var xA = Math.Sqrt(0.07 * 0.07 - 0.005 * 0.005);
        var auxiliary = 0.95 * 1.1 / (1 + 0.6 * xA) * new Complex(0.005, xA) * (21.0 * 21 / 12);
        var motor = Polar(36.0 / (2.0 / 0.95 / 0.88) / 5.5, 0.1) * (21 / 6.3 * 21 / 6.3);
        var kS = 110.0 * 110 / (21 * 21) / (Tr * Tr) * 1.1 / (1 + Math.Abs(Xd - Xt) * SinPhi);
        var expected = Parallel(FeederOhm(1.1), Tr * Tr * Parallel(kS * ZgRated, auxiliary + motor) + kS * ZtHigh);
        ShouldBeClose(network.At("H").ImpedanceOhm!.Value, expected);
    }

    /// <summary>10.1.2: the machine's own current inside the unit is c·UrG/(√3·K_G,S·ZG).</summary>
    [Fact]
    public void Inside_the_unit_the_breaking_current_takes_the_machines_share_with_K_GS()
    {
        var zg = 1.1 / (1 + Xd * SinPhi) * ZgRated;
        var own = Ka(1.1, 21, zg);
        var ratio = own / (150 / Sqrt3 / 21);
        var fault = Unit(onLoad: true).At("G");
        var machine = fault.Iec60909!.Machines.Should().ContainSingle().Subject;
        machine.InitialKa.ShouldBe(own);
        machine.RatioToRated.ShouldBe(ratio);
        var mu = 0.62 + 0.72 * Math.Exp(-0.32 * ratio);
        var grid = 1.1 * 21 / Sqrt3 / (1.1 / (1 - Xt * SinPhi) * ZtLow + FeederOhm(1.1) / (Tr * Tr));
        fault.Iec60909.BreakingKa(0.1).ShouldBe((grid + mu * 1.1 * 21 / Sqrt3 / zg).Magnitude);
    }

    /// <summary>6.6.1: with its unit transformer switched off, the machine is one connected directly, with K_G.</summary>
    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void A_machine_cut_off_from_its_unit_transformer_has_K_G(bool byItsBus)
    {
        var unit = Unit(onLoad: true);
        var cutOff = byItsBus ? unit.With(Bus("H", 110) with { InService = false })
            : unit.With(unit.Transformers[0] with { InService = false });
        ShouldBeClose(cutOff.At("G").ImpedanceOhm!.Value, 1.1 / (1 + Xd * SinPhi) * ZgRated);
    }

    [Fact]
    public void Auxiliaries_with_a_second_way_to_the_grid_leave_the_terminals_inside_the_unit()
    {
        var network = WithAuxiliaries().With(Feeder("A", 5));
        var xA = Math.Sqrt(0.07 * 0.07 - 0.005 * 0.005);
        var way = 0.95 * 1.1 / (1 + 0.6 * xA) * new Complex(0.005, xA) * (21.0 * 21 / 12)
            + Polar(1.1 * 6 / (Sqrt3 * 5), 0.1) * (21 / 6.3 * 21 / 6.3);
        ShouldBeClose(network.At("G").ImpedanceOhm!.Value, Parallel(InsideOhm(1.1, 0), way));
    }

    private static Complex InsideOhm(double c, double pG)
    {
        var kGs = 1.1 / (1 + Xd * SinPhi) / (1 + pG / 100);
        var kTs = 1.1 / (1 - Xt * SinPhi) / (1 + pG / 100);
        return Parallel(kGs * ZgRated, kTs * ZtLow + FeederOhm(c) / (Tr * Tr));
    }

    private static Network Unit(bool onLoad, double? pG = null, double? pT = null) => Of(
        Bus("H", 110), Bus("G", 21), Feeder("H", 20),
        new SynchronousMachine
        {
            Id = "G1", Bus = "G", RatedMva = 150, RatedKv = 21, RatedPowerFactor = 0.85, ReactancePu = new MachineReactances(Xd),
            ArmatureResistancePu = 0.002, VoltageRegulationPercent = pG, UnitTransformer = "T1",
        },
        new Transformer
        {
            Id = "T1", Hv = "H", Lv = "G", RatedMva = 150, RatedHvKv = 115, RatedLvKv = 21, ShortCircuitVoltagePercent = 16,
            ResistivePercent = 0.5, OnLoadTapChanger = onLoad, OffLoadTapRangePercent = pT,
        });

    private static Network WithAuxiliaries() => Unit(onLoad: true).With(
        Bus("A", 6),
        new Transformer
        {
            Id = "TA", Hv = "G", Lv = "A", RatedMva = 12, RatedHvKv = 21, RatedLvKv = 6.3, ShortCircuitVoltagePercent = 7,
            ResistivePercent = 0.5,
        });

    private static Complex FeederOhm(double c) => Polar(c * 110 / (Sqrt3 * 20), 0.1);

    private static Complex Parallel(Complex one, Complex other) => one * other / (one + other);

    private static void ShouldBeClose(Complex actual, Complex expected) =>
        (actual - expected).Magnitude.Should().BeLessThan(1e-11 * expected.Magnitude, $"{actual} should be {expected}");
}
