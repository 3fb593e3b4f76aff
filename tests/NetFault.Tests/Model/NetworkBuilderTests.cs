using System.Text.RegularExpressions;
using NetFault.Tests.Yaml;

namespace NetFault.Tests.Model;

/// <summary>Every rule of the network's checks, through the builder: what is wrong or odd, and at which key.</summary>
public class NetworkBuilderTests
{
    private static readonly Bus A = new() { Id = "A", NominalKv = 11 };
    private static readonly Bus B = new() { Id = "B", NominalKv = 11 };
    private static readonly Bus H = new() { Id = "H", NominalKv = 110 };
    private static readonly NetworkFeeder Feeder = new() { Id = "Q", Bus = "A", ShortCircuitMva = new(500), XOverR = 10 };
    private static readonly Line Cable = new() { Id = "C", From = "A", To = "B", Ohm = new(0.1, 0.2) };

    private static readonly SynchronousMachine Machine = new()
    {
        Id = "G", Bus = "A", RatedMva = 10, ReactancePu = new(0.14, 0.22, 1.9), TimeConstantSeconds = new(0.03, 0.9, 0.12), UnitTransformer = "T",
    };

    private static readonly AsynchronousMotor Motor = new()
    {
        Id = "M", Bus = "A", RatedKw = 500, RatedPowerFactor = 0.88, Efficiency = 0.95, LockedRotorCurrentRatio = 5,
    };

    private static readonly Transformer Unit = new()
    {
        Id = "T", Hv = "H", Lv = "A", RatedMva = 10, RatedHvKv = 110, RatedLvKv = 11, ShortCircuitVoltagePercent = 10, XOverR = 20,
    };

    private static readonly ThreeWindingTransformer Three = new()
    {
        Id = "W", Hv = "H", Mv = "A", RatedMva = new(30, 30, null), RatedKv = new(110, 11, null), ShortCircuitVoltagePercent = new(12, null, null),
        ResistivePercent = new(0.3, null, null),
    };

    private static readonly SeriesReactor Reactor = new() { Id = "R", From = "A", To = "B", RatedKa = 1, ReactancePercent = 6 };
    private static readonly CircuitBreaker Breaker = new() { Id = "CB", Bus = "A", Feeds = "C", Standard = CircuitBreakerStandard.Iec62271_100 };
    private static readonly CircuitBreaker LvBreaker = new() { Id = "LB", Bus = "L", Feeds = "to L", Standard = CircuitBreakerStandard.Iec60947_2 };
    private static readonly CircuitBreaker IeeeBreaker = Breaker with { Standard = CircuitBreakerStandard.IeeeC37_04 };
    private static readonly CircuitBreaker GeneratorBreaker = Breaker with { Standard = CircuitBreakerStandard.IecIeee62271_37_013 };
    private static readonly Switch Disconnector = new() { Id = "Q", Bus = "A", Feeds = "C" };
    private static readonly Busbar Bar = new() { Id = "BB", Bus = "A" };
    private static readonly Fuse Link = new() { Id = "F", Bus = "A", Feeds = "C" };
    private static readonly BusCoupler Coupler = new() { Id = "K", From = "A", To = "B", Closed = true };

    /// <summary>One changed element; the problem it makes, and the key at which it stands.</summary>
    private static readonly (string Id, string? Key, NetworkElement Element)[] Rules =
    [
        ("NF201", "nominal_kv", A with { NominalKv = double.NaN }),
        ("NF201", "ohm.x", Cable with { Ohm = new(0, double.PositiveInfinity) }),
        ("NF202", "nominal_kv", A with { NominalKv = -11 }),
        ("NF202", "short_circuit_mva", Feeder with { ShortCircuitMva = new(0) }),
        ("NF202", "short_circuit_mva.max", Feeder with { ShortCircuitMva = new(-1, -2) }),
        ("NF202", "x_over_r", Feeder with { XOverR = 0 }),
        ("NF202", "rated_mva", Machine with { RatedMva = 0 }),
        ("NF202", "rated_kv", Machine with { RatedKv = 0 }),
        ("NF202", "reactance_pu.negative", Machine with { ReactancePu = new(0.14, Negative: -0.1) }),
        ("NF202", "time_constant_s.armature", Machine with { TimeConstantSeconds = new(Armature: 0) }),
        ("NF202", "rated_kw", Motor with { RatedKw = 0 }),
        ("NF202", "rated_slip_percent", Motor with { RatedSlipPercent = 0 }),
        ("NF202", "rated_kv.lv", Unit with { RatedLvKv = 0 }),
        ("NF202", "short_circuit_voltage_percent.hv_mv", Three with { ShortCircuitVoltagePercent = new(-1, null, null) }),
        ("NF202", "length_km", Cable with { LengthKm = 0 }),
        ("NF202", "rated_ka", Reactor with { RatedKa = 0 }),
        ("NF203", "r_over_x", Feeder with { XOverR = null, ROverX = -0.1 }),
        ("NF203", "armature_resistance_ohm", Machine with { ArmatureResistanceOhm = -1 }),
        ("NF203", "load_loss_kw", Unit with { XOverR = null, LoadLossKw = -1 }),
        ("NF203", "ohm.r", Cable with { Ohm = new(-0.1, 1) }),
        ("NF204", "voltage_regulation_percent", Machine with { VoltageRegulationPercent = 101 }),
        ("NF204", "rated_slip_percent", Motor with { RatedSlipPercent = 101 }),
        ("NF205", "rated_power_factor", Machine with { RatedPowerFactor = 1.01 }),
        ("NF205", "efficiency", Motor with { Efficiency = 96 }),
        ("NF206", "low_voltage_tolerance_percent", A with { NominalKv = 0.4, LowVoltageTolerancePercent = 5 }),
        ("NF206", "service", Machine with { Service = (SynchronousService)7 }),
        ("NF207", "parallel", Cable with { Parallel = 0 }),
        ("NF207", "pole_pairs", Motor with { PolePairs = 0 }),
        ("NF207", "count", Motor with { Count = -1 }),
        ("NF208", "reactance_pu.subtransient", Machine with { ReactancePu = new(0.3, 0.2, 1.9) }),
        ("NF208", "reactance_pu.subtransient", Machine with { ReactancePu = new(0.3, null, 0.2) }),
        ("NF208", "reactance_pu.transient", Machine with { ReactancePu = new(0.1, 0.3, 0.2) }),
        ("NF208", "time_constant_s.subtransient", Machine with { TimeConstantSeconds = new(1, 0.9) }),
        ("NF208", "resistive_percent", Unit with { XOverR = null, ResistivePercent = 11 }),
        ("NF209", "ohm", Cable with { PerUnit = null, LengthKm = 1, OhmPerKm = new(0.1, 0.2) }),
        ("NF209", "armature_resistance_ohm", Machine with { ArmatureResistancePu = 0.1, ArmatureResistanceOhm = 0.1 }),
        ("NF209", "r_over_x", Motor with { XOverR = 10, ROverX = 0.1 }),
        ("NF209", "x_over_r", Reactor with { ReactancePercent = null, Ohm = new(0, 1), XOverR = 10 }),
        ("NF210", null, Cable with { Ohm = null }),
        ("NF210", null, Feeder with { XOverR = null }),
        ("NF210", null, Unit with { XOverR = null }),
        ("NF211", "length_km", Cable with { Ohm = null, OhmPerKm = new(0.1, 0.2) }),
        ("NF211", "rated_ka", Reactor with { RatedKa = null }),
        ("NF211", "rated_mva.mv", Three with { RatedMva = new(30, null, null) }),
        ("NF211", "resistive_percent.hv_mv", Three with { ResistivePercent = default }),
        ("NF212", "ohm", Cable with { Ohm = new(0, 0) }),
        ("NF213", "load_loss_kw", Unit with { XOverR = null, LoadLossKw = 2000 }),
        ("NF214", "low_voltage_tolerance_percent", A with { LowVoltageTolerancePercent = 6 }),
        ("NF215", null, Three with { Mv = null }),
        ("NF216", "short_circuit_mva.min", Feeder with { ShortCircuitMva = new(300, 400) }),
        ("NF217", null, Cable with { Id = "" }),
        ("NF219", null, Cable with { Id = "C\n1" }),
        ("NF219", null, Cable with { Id = new string('C', 201) }),
        ("NF220", "end_temperature_c", Cable with { EndTemperatureC = 19 }),
        ("NF220", "peak_factor", new DoublyFedGenerator { Id = "WD", Bus = "A", HighestInstantaneousKa = 1, PeakFactor = 2.1 }),
        ("NF202", "reactance_ohm", new SeriesCapacitor { Id = "SC", From = "A", To = "B", ReactanceOhm = 0, VoltageLimited = false }),
        ("NF202", "rated_mva", new ConverterFedDrive { Id = "D", Bus = "A", RatedMva = 0 }),
        ("NF203", "source_current_ka", new FullConverterSource { Id = "F", Bus = "A", SourceCurrentKa = -1 }),
        ("NF301", "bus", Feeder with { Bus = "a" }),
        ("NF301", "to", Cable with { To = "BB" }),
        ("NF221", "bus", Feeder with { Bus = null! }),
        ("NF221", "from", Cable with { From = null! }),
        ("NF301", "mv", Three with { Mv = "X" }),
        ("NF302", "unit_transformer", Machine with { UnitTransformer = "TT" }),
        ("NF303", "unit_transformer", Machine with { Bus = "Far" }),
        ("NF304", "to", Coupler with { To = "A" }),
        ("NF304", "lv", Unit with { Lv = "H", RatedLvKv = 110 }),
        ("NF304", "mv", Three with { Mv = "H", RatedKv = new(110, 110, null) }),
        ("NF305", null, Cable with { To = "H" }),
        ("NF305", null, Coupler with { To = "H" }),
        ("NF305", null, Reactor with { To = "H" }),
        ("NF401", null, Cable with { To = "H", Ohm = null, PerUnit = new(0, 0.1) }),
        ("NF402", "rated_kv", Motor with { RatedKv = 6 }),
        ("NF402", "rated_kv.hv", Unit with { RatedHvKv = 160 }),
        ("NF403", "reactance_pu.subtransient", Machine with { ReactancePu = new(0.02) }),
        ("NF403", "locked_rotor_current_ratio", Motor with { LockedRotorCurrentRatio = 15 }),
        ("NF403", "short_circuit_voltage_percent", Unit with { ShortCircuitVoltagePercent = 101 }),
        ("NF404", "rated_kv.hv", Unit with { RatedHvKv = 10 }),
        ("NF201", "rated_kv", Bar with { RatedKv = double.NaN }),
        ("NF202", "rated_kv", Breaker with { RatedKv = 0 }),
        ("NF202", "short_circuit_breaking_current_ka", Breaker with { ShortCircuitBreakingCurrentKa = 0 }),
        ("NF202", "short_circuit_making_current_ka", Breaker with { ShortCircuitMakingCurrentKa = 0 }),
        ("NF202", "ultimate_short_circuit_breaking_capacity_ka", LvBreaker with { UltimateShortCircuitBreakingCapacityKa = 0 }),
        ("NF202", "service_short_circuit_breaking_capacity_ka", LvBreaker with { ServiceShortCircuitBreakingCapacityKa = 0 }),
        ("NF202", "short_circuit_making_capacity_ka", LvBreaker with { ShortCircuitMakingCapacityKa = 0 }),
        ("NF202", "closing_and_latching_current_ka", IeeeBreaker with { ClosingAndLatchingCurrentKa = 0 }),
        ("NF202", "generator_source_breaking_current_ka", GeneratorBreaker with { GeneratorSourceBreakingCurrentKa = 0 }),
        ("NF202", "short_circuit_making_current_ka", Disconnector with { ShortCircuitMakingCurrentKa = -1 }),
        ("NF202", "peak_withstand_current_ka", Bar with { PeakWithstandCurrentKa = 0 }),
        ("NF202", "short_time_withstand_current_ka", Bar with { ShortTimeWithstandCurrentKa = 0 }),
        ("NF202", "breaking_capacity_ka", Link with { BreakingCapacityKa = 0 }),
        ("NF202", "test_x_over_r", Link with { TestXOverR = 0 }),
        ("NF204", "dc_component_percent", Breaker with { DcComponentPercent = 101 }),
        ("NF205", "test_power_factor", LvBreaker with { TestPowerFactor = 25 }),
        ("NF205", "test_power_factor", Link with { TestPowerFactor = 0 }),
        ("NF206", "standard", Breaker with { Standard = (CircuitBreakerStandard)9 }),
        ("NF206", "feeds_section", Breaker with { FeedsSection = "buses" }),
        ("NF208", "short_circuit_breaking_current_ka", Breaker with { ShortCircuitBreakingCurrentKa = 63, ShortCircuitMakingCurrentKa = 25 }),
        ("NF208", "short_circuit_breaking_current_ka", IeeeBreaker with { ShortCircuitBreakingCurrentKa = 65, ClosingAndLatchingCurrentKa = 25 }),
        ("NF208", "ultimate_short_circuit_breaking_capacity_ka",
            LvBreaker with { UltimateShortCircuitBreakingCapacityKa = 105, ShortCircuitMakingCapacityKa = 50 }),
        ("NF208", "service_short_circuit_breaking_capacity_ka",
            LvBreaker with { UltimateShortCircuitBreakingCapacityKa = 36, ServiceShortCircuitBreakingCapacityKa = 50 }),
        ("NF208", "short_time_withstand_current_ka", Disconnector with { ShortTimeWithstandCurrentKa = 63, PeakWithstandCurrentKa = 25 }),
        ("NF209", "dc_time_constant_s", Breaker with { DcComponentPercent = 36, DcTimeConstantSeconds = 0.045 }),
        ("NF209", "minimum_opening_time_s", IeeeBreaker with { ContactPartingTimeCycles = 3, MinimumOpeningTimeSeconds = 0.04 }),
        ("NF209", "relay_time_s", IeeeBreaker with { ContactPartingTimeCycles = 3, RelayTimeSeconds = 0.01 }),
        ("NF209", "test_x_over_r", Link with { TestPowerFactor = 0.1, TestXOverR = 10 }),
        ("NF220", "dc_time_constant_s", Breaker with { DcTimeConstantSeconds = 45 }),
        ("NF220", "generator_source_dc_component_percent", GeneratorBreaker with { GeneratorSourceDcComponentPercent = 201 }),
        ("NF220", "minimum_opening_time_s", Breaker with { MinimumOpeningTimeSeconds = 40 }),
        ("NF220", "relay_time_s", Breaker with { RelayTimeSeconds = -0.01 }),
        ("NF220", "rated_interrupting_time_cycles", IeeeBreaker with { RatedInterruptingTimeCycles = 83 }),
        ("NF220", "contact_parting_time_cycles", IeeeBreaker with { ContactPartingTimeCycles = 0 }),
        ("NF220", "short_time_duration_s", Disconnector with { ShortTimeDurationSeconds = 1000 }),
        ("NF221", "feeds", Disconnector with { Feeds = null! }),
        ("NF221", "bus", Bar with { Bus = null! }),
        ("NF222", "test_power_factor", Breaker with { TestPowerFactor = 0.15 }),
        ("NF301", "bus", Bar with { Bus = "a" }),
        ("NF310", "feeds", Breaker with { Feeds = "c" }),
        ("NF310", "feeds", Breaker with { FeedsSection = "transformers" }),
        ("NF310", "feeds", Link with { Feeds = "Q-1" }),
        ("NF311", "feeds", Breaker with { Bus = "H" }),
        ("NF311", "feeds", Disconnector with { Feeds = "to Far" }),
        ("NF312", "feeds", Link with { Bus = "B", Feeds = "twice" }),
        ("NF407", "rated_kv", Breaker with { RatedKv = 10.99 }),
        ("NF407", "rated_kv", Bar with { RatedKv = 7.2 }),
        ("NF407", "rated_kv", Link with { RatedKv = 7.2 }),
        ("NF408", "standard", Breaker with { Standard = CircuitBreakerStandard.IeeeC37_13 }),
        ("NF408", "standard", LvBreaker with { Standard = CircuitBreakerStandard.IecIeee62271_37_013 }),
    ];

    public static IEnumerable<object?[]> Cases => Rules.Select((rule, i) => new object?[] { i, rule.Id, rule.Key });

    [Theory]
    [MemberData(nameof(Cases))]
    public void A_wrong_or_odd_value_is_found_at_its_key(int rule, string id, string? key)
    {
        var element = Rules[rule].Element;
        var found = Problems(builder => builder.Set(element));
        if (element.Id is "" or not { Length: < 200 } or "C\n1")
            found = Problems(builder => builder.Add(element));
        found.Should().Contain(one => one.Id == id && one.Key == key && one.Section == element.Section);
    }

    [Fact]
    public void A_sound_network_has_no_problems() => Problems(_ => { }).Should().BeEmpty();

    [Fact]
    public void Problems_of_the_whole_network_are_found()
    {
        Problems(builder => builder.FrequencyHz = 0).Should().ContainSingle().Which.Id.Should().Be("NF218");
        Problems(builder => builder.FrequencyHz = double.NaN).Should().ContainSingle().Which.Id.Should().Be("NF218");
        Problems(builder => builder.BaseMva = 0).Should().ContainSingle().Which.Key.Should().Be("base_mva");
        Problems(builder => builder.FrequencyHz = 400).Should().ContainSingle().Which.Id.Should().Be("NF406");
        Problems(builder => builder.Add(A)).Should().ContainSingle().Which.Id.Should().Be("NF306");
        Problems(builder => builder.Add(new Bus { Id = "Z", NominalKv = 11 })).Should().ContainSingle().Which.Id.Should().Be("NF405");
        Problems(builder => builder.Set(Feeder with { InService = false }, Machine with { InService = false })).Should().ContainSingle().Which.Id.Should().Be("NF308");
        Of(new NetworkBuilder { FrequencyHz = 50 }).Should().ContainSingle().Which.Id.Should().Be("NF307");
    }

    [Fact]
    public void A_network_without_buses_is_one_problem_not_one_for_each_reference() =>
        Of(new NetworkBuilder { FrequencyHz = 50 }.Add(Feeder, Motor, Machine with { UnitTransformer = null })).Should().ContainSingle().Which.Id.Should().Be("NF307");

    [Fact]
    public void Every_rule_of_the_catalogue_is_tested()
    {
        var catalogue = File.ReadAllText(TestFiles.Repository("src/NetFault/Model/Checks/Problems.cs"));
        var ids = Regex.Matches(catalogue, "new\\(\"(NF[0-9]{3})\"").Select(one => one.Groups[1].Value);
        ids.Except(Rules.Select(rule => rule.Id)).Should().BeEquivalentTo(
            "NF218", "NF306", "NF307", "NF308", "NF309", "NF405", "NF406");
    }

    [Fact]
    public void The_exception_shows_every_problem_with_its_remedy()
    {
        var builder = Sound().Set(Feeder with { Bus = "a" }, Motor with { Efficiency = 95 });
        var thrown = ((Action)(() => builder.Build())).Should().Throw<InvalidNetworkException>().Which;
        thrown.Message.Should().Be(
            "The network is not valid.\n\nerror NF301: network_feeders Q, bus: there is no bus \"a\"\n    did you mean \"A\"?\n\n" +
            "error NF205: asynchronous_motors M, efficiency: 95 must be greater than 0 and at most 1\n    if 95 is in percent, write 0.95");
    }

    private static NetworkBuilder Sound() =>
        new NetworkBuilder { FrequencyHz = 50 }.Add(
            A, B, H, Feeder, Machine, Motor, Unit, Three, Cable, Reactor, Coupler, Breaker, LvBreaker, Disconnector, Bar, Link,
            new Bus { Id = "L", NominalKv = 0.4 },
            new Transformer { Id = "to L", Hv = "A", Lv = "L", RatedMva = 1, RatedHvKv = 11, RatedLvKv = 0.4, ShortCircuitVoltagePercent = 6, XOverR = 6 },
            Cable with { Id = "twice" }, Reactor with { Id = "twice" },
            new Bus { Id = "Far", NominalKv = 11 }, Cable with { Id = "to Far", From = "B", To = "Far" });

    private static IReadOnlyList<Diagnostic> Problems(Action<NetworkBuilder> change)
    {
        var builder = Sound();
        change(builder);
        return Of(builder);
    }

    private static IReadOnlyList<Diagnostic> Of(NetworkBuilder builder)
    {
        try
        {
            return builder.Build().Warnings;
        }
        catch (InvalidNetworkException exception)
        {
            return exception.Diagnostics;
        }
    }
}
