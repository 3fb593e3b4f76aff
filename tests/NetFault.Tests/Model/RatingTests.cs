using NetFault.Tests.Support;

namespace NetFault.Tests.Model;

/// <summary>Devices with ratings: where they stand, which standard has which rating, and that they change nothing else.</summary>
public class RatingTests
{
    private static readonly CircuitBreaker Breaker = new()
    {
        Id = "CB1", Bus = "A", Feeds = "C1", Standard = CircuitBreakerStandard.Iec62271_100, RatedKv = 12, ShortCircuitBreakingCurrentKa = 25,
    };

    private static readonly NetworkElement[] Plant =
    [
        new Bus { Id = "A", NominalKv = 11 }, new Bus { Id = "B", NominalKv = 11 }, new Bus { Id = "L", NominalKv = 0.4 },
        new NetworkFeeder { Id = "Q", Bus = "A", ShortCircuitMva = new(500), XOverR = 10 },
        new Transformer { Id = "C1", Hv = "B", Lv = "L", RatedMva = 1, RatedHvKv = 11, RatedLvKv = 0.4, ShortCircuitVoltagePercent = 6, XOverR = 6 },
        new Line { Id = "C1", From = "A", To = "B", Ohm = new(0.1, 0.2) },
        new BusCoupler { Id = "K", From = "A", To = "B", Closed = false },
    ];

    private static readonly NetworkElement[] Devices =
    [
        Breaker, Breaker with { Id = "CB2" },
        new CircuitBreaker { Id = "CB-K", Bus = "B", Feeds = "K", Standard = CircuitBreakerStandard.IeeeC37_04, ContactPartingTimeCycles = 3 },
        new Switch { Id = "CB1", Bus = "A", Feeds = "Q", PeakWithstandCurrentKa = 63 },
        new Busbar { Id = "A", Bus = "A", ShortTimeWithstandCurrentKa = 25, ShortTimeDurationSeconds = 1 },
        new Fuse { Id = "F1", Bus = "B", Feeds = "C1", FeedsSection = "transformers", BreakingCapacityKa = 63, InService = false },
    ];

    [Fact]
    public void Devices_are_lists_of_the_network_and_found_by_id()
    {
        var network = Make();
        network.CircuitBreakers.Select(one => one.Id).Should().Equal("CB1", "CB2", "CB-K");
        network.Switches.Should().ContainSingle();
        network.Busbars.Should().ContainSingle();
        network.Fuses.Should().ContainSingle();
        network.Elements.Should().HaveCount(Plant.Length + Devices.Length).And.EndWith(Devices);
        network.Find<CircuitBreaker>("CB-K").ContactPartingTimeCycles.Should().Be(3);
        network.Find<Switch>("CB1").Feeds.Should().Be("Q");
        network.Find<Busbar>("A").ShortTimeDurationSeconds.Should().Be(1);
        network.Find<Fuse>("F1").InService.Should().BeFalse();
        ((Action)(() => network.Find<CircuitBreaker>("CB3"))).Should().Throw<UnknownIdException>().Which.NearestIds.Should().Equal("CB1", "CB2");
    }

    [Fact]
    public void A_network_without_devices_finds_none() =>
        ((Action)(() => Of(Plant).Find<Fuse>("F1"))).Should().Throw<UnknownIdException>();

    [Fact]
    public void Devices_stay_when_the_network_is_changed()
    {
        var network = Make().WithCoupler("K", closed: true);
        network.Elements.Skip(Plant.Length).Should().Equal(Devices);
        network.With(Breaker with { ShortCircuitBreakingCurrentKa = 31.5 }).Find<CircuitBreaker>("CB1").ShortCircuitBreakingCurrentKa.Should().Be(31.5);
        network.With(new Busbar { Id = "L", Bus = "L" }).Busbars.Select(one => one.Id).Should().Equal("A", "L");
    }

    [Fact]
    public void A_line_that_moves_away_from_its_circuit_breaker_is_an_error()
    {
        var away = new Line { Id = "C1", From = "B", To = "D", Ohm = new(0.1, 0.2) };
        var change = () => Make().With(new Bus { Id = "D", NominalKv = 11 }, away);
        change.Should().Throw<InvalidNetworkException>().Which.Diagnostics.Where(one => one.Id == "NF311").Select(one => one.ElementId).Should().Equal("CB1", "CB2");
    }

    /// <summary>Law: a rating is no impedance. The same numbers, not only nearly.</summary>
    [Fact]
    public void Devices_change_no_current_in_a_generated_network()
    {
        var bare = RandomNetworks.Make(7, 40);
        NetworkElement[] devices =
        [
            .. bare.Buses.Select(bus => new Busbar { Id = bus.Id, Bus = bus.Id }),
            .. bare.Lines.Select(line => new CircuitBreaker { Id = line.Id, Bus = line.From, Feeds = line.Id, FeedsSection = "lines", Standard = default }),
            .. bare.Transformers.Select(one => new Fuse { Id = one.Id, Bus = one.Hv, Feeds = one.Id, FeedsSection = "transformers" }),
            .. bare.BusCouplers.Select(one => new Switch { Id = one.Id, Bus = one.To, Feeds = one.Id, FeedsSection = "bus_couplers" }),
        ];
        var rated = bare.With(devices);
        rated.Elements.Count.Should().BeGreaterThan(bare.Elements.Count + 40);
        Currents(rated).Should().Equal(Currents(bare));
        var bus = bare.Buses[0].Id;
        new FaultStudy(rated, new MachineDecrement()).FlowsAt(bus).Branches.Should().HaveCount(new FaultStudy(bare, new MachineDecrement()).FlowsAt(bus).Branches.Count);
    }

    [Fact]
    public void The_element_behind_a_device_is_the_one_at_its_bus_whatever_else_has_the_id()
    {
        var network = Make();
        network.ElementBehind(network.Find<CircuitBreaker>("CB1")).Should().BeOfType<Line>();
        network.ElementBehind(network.Find<CircuitBreaker>("CB-K")).Should().BeOfType<BusCoupler>();
        network.ElementBehind(network.Find<Switch>("CB1")).Should().BeOfType<NetworkFeeder>();
        network.ElementBehind(network.Find<Fuse>("F1")).Should().BeOfType<Transformer>();
        var other = () => network.ElementBehind(Breaker with { Feeds = "C2" });
        other.Should().Throw<UnknownIdException>().Which.NearestIds.Should().Equal("C1");
    }

    [Fact]
    public void Every_section_whose_elements_have_terminals_can_be_fed() =>
        FedElements.Sections.Should().BeEquivalentTo(AllSections.InOrder.Select(one => one.Name).Except(["buses", "circuit_breakers", "switches", "busbars", "fuses"]));

    /// <summary>IEC 60947-2 rates in capacities (Icu, Ics, Icm), IEC 62271-100 in currents, IEEE C37.04 closes and latches, C37.13 has no making rating.</summary>
    [Theory]
    [InlineData(CircuitBreakerStandard.Iec62271_100, "Isc Ima %dc tau Ip")]
    [InlineData(CircuitBreakerStandard.IeeeC37_04, "Isc C&L %dc tau Ip cycles parting")]
    [InlineData(CircuitBreakerStandard.IecIeee62271_37_013, "Isc Ima %dc tau Ip gen gen%")]
    [InlineData(CircuitBreakerStandard.Iec60947_2, "Icu Ics Icm cos")]
    [InlineData(CircuitBreakerStandard.IeeeC37_13, "Isc cos")]
    public void Each_standard_has_its_own_ratings(CircuitBreakerStandard standard, string ratings)
    {
        var bare = new CircuitBreaker { Id = "X", Bus = "A", Feeds = "C1", Standard = standard };
        var all = new (string Name, CircuitBreaker Breaker)[]
        {
            ("Isc", bare with { ShortCircuitBreakingCurrentKa = 25 }), ("Icu", bare with { UltimateShortCircuitBreakingCapacityKa = 50 }),
            ("Ics", bare with { ServiceShortCircuitBreakingCapacityKa = 25 }), ("Ima", bare with { ShortCircuitMakingCurrentKa = 63 }),
            ("Icm", bare with { ShortCircuitMakingCapacityKa = 105 }), ("C&L", bare with { ClosingAndLatchingCurrentKa = 65 }),
            ("%dc", bare with { DcComponentPercent = 36 }), ("tau", bare with { DcTimeConstantSeconds = 0.045 }),
            ("gen", bare with { GeneratorSourceBreakingCurrentKa = 20 }), ("gen%", bare with { GeneratorSourceDcComponentPercent = 110 }),
            ("Ip", bare with { PeakWithstandCurrentKa = 63 }), ("cycles", bare with { RatedInterruptingTimeCycles = 5 }),
            ("parting", bare with { ContactPartingTimeCycles = 3 }), ("cos", bare with { TestPowerFactor = 0.25 }),
        };
        all.Where(one => Problems(one.Breaker).All(problem => problem.Id != "NF222")).Select(one => one.Name).Should().BeEquivalentTo(ratings.Split(' '));
        Problems(bare with { RatedKv = 12, ShortTimeWithstandCurrentKa = 25, ShortTimeDurationSeconds = 1, MinimumOpeningTimeSeconds = 0.04, RelayTimeSeconds = 0 })
            .Should().NotContain(one => one.Severity == DiagnosticSeverity.Error);
    }

    [Fact]
    public void A_rated_voltage_above_the_nominal_one_is_ordinary()
    {
        Problems(Breaker with { RatedKv = 24 }).Should().BeEmpty();
        Problems(new CircuitBreaker { Id = "X", Bus = "L", Feeds = "C1", Standard = CircuitBreakerStandard.Iec60947_2, RatedKv = 0.69 }).Should().BeEmpty();
    }

    [Fact]
    public void What_a_device_feeds_may_stand_behind_text_that_could_not_be_read()
    {
        const string text = "netfault: 1\nfrequency_hz: 50\nbuses:\n  A: {nominal_kv: 11}\n  B: {nominal_kv: 11}\n"
            + "network_feeders:\n  T1: {bus: B, short_circuit_ka: 5, x_over_r: 10}\n"
            + "switches:\n  Q1: {bus: A, feeds: C1}\n  Q2: {bus: A, feeds: T1}\nlines:\n  C1: {from: A: B}\n";
        NetworkFile.CheckText(text).Diagnostics.Should().ContainSingle().Which.Id.Should().Be("NF005");
    }

    [Fact]
    public void A_thousand_devices_with_dangling_references_are_all_found()
    {
        var builder = new NetworkBuilder { FrequencyHz = 50 }.Add(Plant);
        for (var i = 0; i < 1_000; i++)
            builder.Add(new Bus { Id = $"Busbar-{i}", NominalKv = 11 }, new Line { Id = $"Line-{i}", From = "A", To = $"Busbar-{i}", Ohm = new(1, 1) });
        for (var i = 0; i < 500; i++)
            builder.Add(new Switch { Id = $"Q{i}", Bus = "A", Feeds = $"Line-{i}x" }, new Switch { Id = $"R{i}", Bus = "B", Feeds = $"Line-{i}" });
        var thrown = ((Action)(() => builder.Build())).Should().Throw<InvalidNetworkException>().Which;
        thrown.Diagnostics.Where(one => one.Id is "NF310" or "NF311").Should().HaveCount(1_000);
    }

    private static IEnumerable<double> Currents(Network network) =>
        new FaultStudy(network, new MachineDecrement()).EveryBus().SelectMany(one => new[] { one.InitialSymmetricalKa, one.PeakKa });

    private static IReadOnlyList<Diagnostic> Problems(NetworkElement device)
    {
        try
        {
            return Of([.. Plant, device]).Warnings;
        }
        catch (InvalidNetworkException exception)
        {
            return exception.Diagnostics;
        }
    }

    private static Network Make() => Of([.. Plant, .. Devices]);

    private static Network Of(NetworkElement[] elements) => new NetworkBuilder { FrequencyHz = 50 }.Add(elements).Build();
}
