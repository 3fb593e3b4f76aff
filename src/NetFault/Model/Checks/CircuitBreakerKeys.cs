using static NetFault.CircuitBreakerStandard;

namespace NetFault;

/// <summary>
/// Which ratings a circuit-breaker has by which standard. A rating under a key of another standard is an error: the same word means another
/// thing there (a peak or an RMS value, one DC component or another).
/// </summary>
internal static class CircuitBreakerKeys
{
    private static readonly CircuitBreakerStandard[] HighVoltage = [Iec62271_100, IeeeC37_04, IecIeee62271_37_013];

    private static readonly CircuitBreakerStandard[] LowVoltage = [Iec60947_2, IeeeC37_13];

    /// <summary>Reports the ratings that the breaker's standard does not have, and a standard of another voltage than the bus's.</summary>
    public static void Check(CircuitBreaker breaker, ElementCheck check)
    {
        if (check.IsReported("standard") || !Enum.IsDefined(typeof(CircuitBreakerStandard), breaker.Standard))
            return;
        CheckVoltage(breaker, check);
        CheckBreakingAndMaking(breaker, check);
        void Only(string key, double? value, params CircuitBreakerStandard[] standards)
        {
            if (value.HasValue && !standards.Contains(breaker.Standard))
                check.Say(key, Problems.NotOfStandard(Name(breaker.Standard), "it is one by " + string.Join(", ", standards.Select(Name))));
        }

        Only("service_short_circuit_breaking_capacity_ka", breaker.ServiceShortCircuitBreakingCapacityKa, Iec60947_2);
        Only("dc_component_percent", breaker.DcComponentPercent, HighVoltage);
        Only("dc_time_constant_s", breaker.DcTimeConstantSeconds, HighVoltage);
        Only("generator_source_breaking_current_ka", breaker.GeneratorSourceBreakingCurrentKa, IecIeee62271_37_013);
        Only("generator_source_dc_component_percent", breaker.GeneratorSourceDcComponentPercent, IecIeee62271_37_013);
        Only("peak_withstand_current_ka", breaker.PeakWithstandCurrentKa, HighVoltage);
        Only("rated_interrupting_time_cycles", breaker.RatedInterruptingTimeCycles, IeeeC37_04);
        Only("contact_parting_time_cycles", breaker.ContactPartingTimeCycles, IeeeC37_04);
        Only("test_power_factor", breaker.TestPowerFactor, LowVoltage);
    }

    /// <summary>A standard's name the way it is cited.</summary>
    public static string Name(CircuitBreakerStandard standard) => standard switch
    {
        Iec62271_100 => "IEC 62271-100",
        IeeeC37_04 => "IEEE C37.04",
        IecIeee62271_37_013 => "IEC/IEEE 62271-37-013",
        Iec60947_2 => "IEC 60947-2",
        _ => "IEEE C37.13",
    };

    /// <summary>The limit is that of the scopes of IEC 60947-2 and IEC 62271-1, 1 kV AC; IEEE's is the same (from memory).</summary>
    private static void CheckVoltage(CircuitBreaker breaker, ElementCheck check)
    {
        if (breaker.Bus is null || check.Draft.FindBus(breaker.Bus) is not { NominalKv: > 0 } bus)
            return;
        var isLow = LowVoltage.Contains(breaker.Standard);
        if (isLow != bus.NominalKv <= 1.0)
            check.Say("standard", Problems.StandardOfOtherVoltage(Name(breaker.Standard), isLow, bus.Id, bus.NominalKv));
    }

    /// <summary>Each standard has one key for what the breaker interrupts, and at most one for what it closes onto.</summary>
    private static void CheckBreakingAndMaking(CircuitBreaker breaker, ElementCheck check)
    {
        var breaking = breaker.Standard == Iec60947_2 ? "ultimate_short_circuit_breaking_capacity_ka" : "short_circuit_breaking_current_ka";
        var making = breaker.Standard switch
        {
            Iec62271_100 or IecIeee62271_37_013 => "short_circuit_making_current_ka",
            IeeeC37_04 => "closing_and_latching_current_ka",
            Iec60947_2 => "short_circuit_making_capacity_ka",
            _ => null,
        };
        void Named(string? right, string key, double? value)
        {
            if (!value.HasValue || key == right)
                return;
            var name = Name(breaker.Standard);
            check.Say(key, Problems.NotOfStandard(name, right is null ? $"{name} has no making rating: remove it" : $"{name} has {right}"));
        }

        Named(breaking, "short_circuit_breaking_current_ka", breaker.ShortCircuitBreakingCurrentKa);
        Named(breaking, "ultimate_short_circuit_breaking_capacity_ka", breaker.UltimateShortCircuitBreakingCapacityKa);
        Named(making, "short_circuit_making_current_ka", breaker.ShortCircuitMakingCurrentKa);
        Named(making, "short_circuit_making_capacity_ka", breaker.ShortCircuitMakingCapacityKa);
        Named(making, "closing_and_latching_current_ka", breaker.ClosingAndLatchingCurrentKa);
    }
}
