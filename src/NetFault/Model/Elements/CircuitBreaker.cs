namespace NetFault;

/// <summary>
/// A circuit-breaker at a terminal, by its ratings. Which of them it has depends on its standard; a value that is not known is null, and
/// nothing is assumed here.
/// </summary>
public sealed record CircuitBreaker : TerminalDevice
{
    /// <summary>The standard by which it is rated.</summary>
    public required CircuitBreakerStandard Standard { get; init; }

    /// <summary>
    /// Rated short-circuit breaking current Isc in kA, RMS of the AC component at contact separation, greater than 0 (IEC 62271-100; for
    /// IEC/IEEE 62271-37-013 that from the system source). By IEEE C37.04 and C37.13 the rated symmetrical short-circuit current.
    /// </summary>
    public double? ShortCircuitBreakingCurrentKa { get; init; }

    /// <summary>Rated ultimate short-circuit breaking capacity Icu in kA, RMS of the AC component, greater than 0 (IEC 60947-2).</summary>
    public double? UltimateShortCircuitBreakingCapacityKa { get; init; }

    /// <summary>Rated service short-circuit breaking capacity Ics in kA, RMS of the AC component, not above Icu (IEC 60947-2).</summary>
    public double? ServiceShortCircuitBreakingCapacityKa { get; init; }

    /// <summary>
    /// DC component at contact separation that goes with the breaking current, in percent of the AC component's peak, 0 to 100; this or
    /// <see cref="DcTimeConstantSeconds"/>.
    /// </summary>
    public double? DcComponentPercent { get; init; }

    /// <summary>
    /// Time constant of the DC component of the rated breaking current in seconds, 0.001 to 1 (0.045 is the standard value of IEC
    /// 62271-100); this or <see cref="DcComponentPercent"/>.
    /// </summary>
    public double? DcTimeConstantSeconds { get; init; }

    /// <summary>Rated generator-source short-circuit breaking current in kA, RMS of the AC component, greater than 0 (IEC/IEEE 62271-37-013).</summary>
    public double? GeneratorSourceBreakingCurrentKa { get; init; }

    /// <summary>
    /// DC component at contact separation that goes with the generator-source breaking current, in percent of the AC component's peak, 0 to
    /// 200: above 100 the current misses its zeros (IEC/IEEE 62271-37-013).
    /// </summary>
    public double? GeneratorSourceDcComponentPercent { get; init; }

    /// <summary>Rated short-circuit making current in kA, the peak onto which it may be closed, greater than 0 (IEC 62271-100).</summary>
    public double? ShortCircuitMakingCurrentKa { get; init; }

    /// <summary>Rated short-circuit making capacity Icm in kA, the peak onto which it may be closed, greater than 0 (IEC 60947-2).</summary>
    public double? ShortCircuitMakingCapacityKa { get; init; }

    /// <summary>
    /// Rated closing and latching current in kA, as a peak, greater than 0 (IEEE C37.04; older ones state an asymmetrical RMS value
    /// instead).
    /// </summary>
    public double? ClosingAndLatchingCurrentKa { get; init; }

    /// <summary>Rated peak withstand current Ip in kA, an instantaneous value, greater than 0 (IEC 62271-1, IEEE C37.100.1).</summary>
    public double? PeakWithstandCurrentKa { get; init; }

    /// <summary>Rated short-time withstand current Ik (Icw of IEC 60947-2) in kA, RMS, greater than 0.</summary>
    public double? ShortTimeWithstandCurrentKa { get; init; }

    /// <summary>
    /// Rated duration of short circuit tk in seconds, for which the short-time withstand current may flow, 0.01 to 10.
    /// </summary>
    public double? ShortTimeDurationSeconds { get; init; }

    /// <summary>
    /// Minimum opening time in seconds: from the trip command to contact separation, 0.001 to 1 (IEC 62271-100). With
    /// <see cref="RelayTimeSeconds"/> it gives the contact parting time.
    /// </summary>
    public double? MinimumOpeningTimeSeconds { get; init; }

    /// <summary>Time in seconds from the beginning of the short circuit to the trip command, at the fastest protection, 0 to 10.</summary>
    public double? RelayTimeSeconds { get; init; }

    /// <summary>Rated interrupting time in cycles of rated frequency, 0.5 to 30, such as 2, 3, 5 or 8 (IEEE C37.04).</summary>
    public double? RatedInterruptingTimeCycles { get; init; }

    /// <summary>
    /// Contact parting time in cycles of rated frequency from the beginning of the short circuit, relay time included, 0.5 to 30 (IEEE
    /// C37.010); this, or <see cref="MinimumOpeningTimeSeconds"/> and <see cref="RelayTimeSeconds"/>.
    /// </summary>
    public double? ContactPartingTimeCycles { get; init; }

    /// <summary>
    /// Power factor of the circuit in which the breaking capacity was tested, above 0 and at most 1 (IEC 60947-2, IEEE C37.13).
    /// </summary>
    public double? TestPowerFactor { get; init; }

    /// <inheritdoc/>
    public override string Section => "circuit_breakers";

    internal override void Check(ElementCheck check)
    {
        CheckPlace(check);
        check.OneOf("standard", Standard, "one of the standards that circuit-breakers are rated by");
        CheckCurrents(check);
        CheckDirectCurrent(check);
        CheckTimes(check);
        CircuitBreakerKeys.Check(this, check);
    }

    private void CheckCurrents(ElementCheck check)
    {
        check.Positive("short_circuit_breaking_current_ka", ShortCircuitBreakingCurrentKa);
        check.Positive("ultimate_short_circuit_breaking_capacity_ka", UltimateShortCircuitBreakingCapacityKa);
        check.Positive("service_short_circuit_breaking_capacity_ka", ServiceShortCircuitBreakingCapacityKa);
        check.NotAbove("service_short_circuit_breaking_capacity_ka", ServiceShortCircuitBreakingCapacityKa,
            "ultimate_short_circuit_breaking_capacity_ka", UltimateShortCircuitBreakingCapacityKa);
        check.Positive("generator_source_breaking_current_ka", GeneratorSourceBreakingCurrentKa);
        check.Positive("short_circuit_making_current_ka", ShortCircuitMakingCurrentKa);
        check.Positive("short_circuit_making_capacity_ka", ShortCircuitMakingCapacityKa);
        check.Positive("closing_and_latching_current_ka", ClosingAndLatchingCurrentKa);
        // A peak is above the RMS value that goes with it: this finds swapped values.
        check.NotAbove("short_circuit_breaking_current_ka", ShortCircuitBreakingCurrentKa, "short_circuit_making_current_ka", ShortCircuitMakingCurrentKa);
        check.NotAbove("short_circuit_breaking_current_ka", ShortCircuitBreakingCurrentKa, "closing_and_latching_current_ka", ClosingAndLatchingCurrentKa);
        check.NotAbove("ultimate_short_circuit_breaking_capacity_ka", UltimateShortCircuitBreakingCapacityKa,
            "short_circuit_making_capacity_ka", ShortCircuitMakingCapacityKa);
        check.Withstand(PeakWithstandCurrentKa, ShortTimeWithstandCurrentKa, ShortTimeDurationSeconds);
        check.AboveZeroUpToOne("test_power_factor", TestPowerFactor);
    }

    private void CheckDirectCurrent(ElementCheck check)
    {
        check.AtMostOne(("dc_component_percent", DcComponentPercent.HasValue), ("dc_time_constant_s", DcTimeConstantSeconds.HasValue));
        check.WithinPercent("dc_component_percent", DcComponentPercent);
        check.Within("dc_time_constant_s", DcTimeConstantSeconds, 0.001, 1.0);
        check.Within("generator_source_dc_component_percent", GeneratorSourceDcComponentPercent, 0.0, 200.0);
    }

    private void CheckTimes(ElementCheck check)
    {
        check.Within("minimum_opening_time_s", MinimumOpeningTimeSeconds, 0.001, 1.0);
        check.Within("relay_time_s", RelayTimeSeconds, 0.0, 10.0);
        check.Within("rated_interrupting_time_cycles", RatedInterruptingTimeCycles, 0.5, 30.0);
        check.Within("contact_parting_time_cycles", ContactPartingTimeCycles, 0.5, 30.0);
        check.AtMostOne(("contact_parting_time_cycles", ContactPartingTimeCycles.HasValue), ("minimum_opening_time_s", MinimumOpeningTimeSeconds.HasValue));
        check.AtMostOne(("contact_parting_time_cycles", ContactPartingTimeCycles.HasValue), ("relay_time_s", RelayTimeSeconds.HasValue));
    }
}
