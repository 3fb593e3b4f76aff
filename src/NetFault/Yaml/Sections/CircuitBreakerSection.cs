namespace NetFault;

/// <summary>The section <c>circuit_breakers</c>.</summary>
internal sealed class CircuitBreakerSection : Section<CircuitBreaker>
{
    /// <summary>The words of <see cref="CircuitBreakerStandard"/>, in its order.</summary>
    private static readonly string[] Standards = ["iec_62271_100", "ieee_c37_04", "iec_ieee_62271_37_013", "iec_60947_2", "ieee_c37_13"];

    public override string Name => "circuit_breakers";

    public override string Shape => "{bus: MV-A, feeds: T1, standard: iec_62271_100, rated_kv: 12, short_circuit_breaking_current_ka: 25}";

    public override IReadOnlyList<NetworkElement> Of(Network network) => network.CircuitBreakers;

    public override NetworkElement Read(IFields fields) => new CircuitBreaker
    {
        Id = fields.Id,
        Bus = fields.RequiredReference("bus"),
        Feeds = fields.RequiredReference("feeds"),
        FeedsSection = fields.FeedsSection(),
        Standard = (CircuitBreakerStandard)(fields.RequiredChoice("standard", Standards) ?? 0),
        RatedKv = fields.Number("rated_kv"),
        ShortCircuitBreakingCurrentKa = fields.Number("short_circuit_breaking_current_ka"),
        UltimateShortCircuitBreakingCapacityKa = fields.Number("ultimate_short_circuit_breaking_capacity_ka"),
        ServiceShortCircuitBreakingCapacityKa = fields.Number("service_short_circuit_breaking_capacity_ka"),
        DcComponentPercent = fields.Number("dc_component_percent"),
        DcTimeConstantSeconds = fields.Number("dc_time_constant_s"),
        GeneratorSourceBreakingCurrentKa = fields.Number("generator_source_breaking_current_ka"),
        GeneratorSourceDcComponentPercent = fields.Number("generator_source_dc_component_percent"),
        ShortCircuitMakingCurrentKa = fields.Number("short_circuit_making_current_ka"),
        ShortCircuitMakingCapacityKa = fields.Number("short_circuit_making_capacity_ka"),
        ClosingAndLatchingCurrentKa = fields.Number("closing_and_latching_current_ka"),
        PeakWithstandCurrentKa = fields.Number("peak_withstand_current_ka"),
        ShortTimeWithstandCurrentKa = fields.Number("short_time_withstand_current_ka"),
        ShortTimeDurationSeconds = fields.Number("short_time_duration_s"),
        MinimumOpeningTimeSeconds = fields.Number("minimum_opening_time_s"),
        RelayTimeSeconds = fields.Number("relay_time_s"),
        RatedInterruptingTimeCycles = fields.Number("rated_interrupting_time_cycles"),
        ContactPartingTimeCycles = fields.Number("contact_parting_time_cycles"),
        TestPowerFactor = fields.Number("test_power_factor"),
        InService = fields.InService(),
        Note = fields.Note(),
    };

    protected override void Write(CircuitBreaker breaker, FieldWriter fields)
    {
        fields.Terminal(breaker);
        fields.Word("standard", Standards[(int)breaker.Standard]);
        fields.Number("rated_kv", breaker.RatedKv);
        fields.Number("short_circuit_breaking_current_ka", breaker.ShortCircuitBreakingCurrentKa);
        fields.Number("ultimate_short_circuit_breaking_capacity_ka", breaker.UltimateShortCircuitBreakingCapacityKa);
        fields.Number("service_short_circuit_breaking_capacity_ka", breaker.ServiceShortCircuitBreakingCapacityKa);
        fields.Number("dc_component_percent", breaker.DcComponentPercent);
        fields.Number("dc_time_constant_s", breaker.DcTimeConstantSeconds);
        fields.Number("generator_source_breaking_current_ka", breaker.GeneratorSourceBreakingCurrentKa);
        fields.Number("generator_source_dc_component_percent", breaker.GeneratorSourceDcComponentPercent);
        fields.Number("short_circuit_making_current_ka", breaker.ShortCircuitMakingCurrentKa);
        fields.Number("short_circuit_making_capacity_ka", breaker.ShortCircuitMakingCapacityKa);
        fields.Number("closing_and_latching_current_ka", breaker.ClosingAndLatchingCurrentKa);
        fields.Withstand(breaker.PeakWithstandCurrentKa, breaker.ShortTimeWithstandCurrentKa, breaker.ShortTimeDurationSeconds);
        fields.Number("minimum_opening_time_s", breaker.MinimumOpeningTimeSeconds);
        fields.Number("relay_time_s", breaker.RelayTimeSeconds);
        fields.Number("rated_interrupting_time_cycles", breaker.RatedInterruptingTimeCycles);
        fields.Number("contact_parting_time_cycles", breaker.ContactPartingTimeCycles);
        fields.Number("test_power_factor", breaker.TestPowerFactor);
    }
}
