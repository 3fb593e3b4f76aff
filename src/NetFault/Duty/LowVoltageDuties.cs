namespace NetFault;

/// <summary>The duties of low-voltage circuit-breakers and of fuses.</summary>
internal static class LowVoltageDuties
{
    /// <summary>
    /// IEC 60947-2: making capacity; breaking capacity, the current raised by the ratio of the peaks where its power factor is below that of the
    /// test; short-time withstand where the breaker has a rating for it.
    /// </summary>
    public static void Iec(CircuitBreaker breaker, DutySheet sheet)
    {
        var useService = sheet.Options.LowVoltageRating == LowVoltageBreakingRating.Service;
        var rated = useService ? breaker.ServiceShortCircuitBreakingCapacityKa : breaker.UltimateShortCircuitBreakingCapacityKa;
        sheet.Judge(DutyKind.Making, Making(breaker, sheet), "short_circuit_making_capacity_ka", sheet.Both, side => side.PeakKa,
            "peak through the breaker against Icm (IEC 60947-2)");
        var powerFactor = breaker.TestPowerFactor;
        if (powerFactor is null && rated is { } capacity)
        {
            powerFactor = StandardRatings.LowVoltageTestPowerFactor(capacity);
            sheet.Assume("test_power_factor", FormattableString.Invariant($"{powerFactor} assumed, that of IEC 60947-2 table 11"));
        }
        var testPeak = PeakFactorOf(powerFactor ?? 1.0);
        sheet.Judge(DutyKind.BreakingSymmetrical, rated,
            useService ? "service_short_circuit_breaking_capacity_ka" : "ultimate_short_circuit_breaking_capacity_ka", sheet.Both,
            side => side.InitialSymmetricalKa * Math.Max(1.0, PeakFactorOf(side) / testPeak),
            FormattableString.Invariant($"I″k, times the ratio of the peak factors where the power factor is below that of the test ({powerFactor:0.##}), ")
            + $"against {(useService ? "Ics" : "Icu")} (IEC 60947-2; the factor is common practice, after IEEE C37.13)");
        if (breaker.ShortTimeWithstandCurrentKa is { } shortTime)
            WithstandDuties.Thermal(shortTime, breaker.ShortTimeDurationSeconds, 1.0, sheet);
    }

    /// <summary>IEEE C37.13: the first-cycle current times the multiplying factor of an unfused breaker; short-time current where it has one.</summary>
    public static void Ieee(CircuitBreaker breaker, DutySheet sheet)
    {
        if (breaker.TestPowerFactor is null)
            sheet.Assume("test_power_factor", "0.15 assumed (X/R of 6.6), that of unfused power circuit-breakers of IEEE C37.13");
        var test = breaker.TestPowerFactor is { } given ? StandardRatings.XOverROfPowerFactor(given) : IeeeMultiplyingFactors.UnfusedTestXOverR;
        sheet.Judge(DutyKind.BreakingSymmetrical, breaker.ShortCircuitBreakingCurrentKa, "short_circuit_breaking_current_ka", sheet.Both,
            side => side.InitialSymmetricalKa * IeeeMultiplyingFactors.LowVoltageUnfused(Undamped(side), Math.Max(test, 1e-3)),
            FormattableString.Invariant($"I″k times the multiplying factor by the peak above the test's X/R of {test:0.#}, ")
            + "against the rated short-circuit current (IEEE C37.13)");
        if (breaker.ShortTimeWithstandCurrentKa is { } shortTime)
            WithstandDuties.Thermal(shortTime, breaker.ShortTimeDurationSeconds, 0.5, sheet);
    }

    /// <summary>Fuses: the prospective current, raised by the ratio of the total RMS currents at half a cycle above the X/R of the test.</summary>
    public static void OfFuse(Fuse fuse, DutySheet sheet)
    {
        var test = fuse.TestXOverR ?? (fuse.TestPowerFactor is { } given ? StandardRatings.XOverROfPowerFactor(given) : (double?)null);
        if (test is null)
        {
            var isLow = sheet.Context.Network.Find<Bus>(fuse.Bus).NominalKv <= 1.0;
            var powerFactor = isLow ? 0.2 : 0.15;
            test = StandardRatings.XOverROfPowerFactor(powerFactor);
            sheet.Assume("test_power_factor", FormattableString.Invariant(
                $"{powerFactor} assumed, the highest that {(isLow ? "IEC 60269-1" : "IEC 60282-1")} tests the breaking capacity at"));
        }
        sheet.Judge(DutyKind.BreakingSymmetrical, fuse.BreakingCapacityKa, "breaking_capacity_ka", sheet.Both,
            side => side.InitialSymmetricalKa * IeeeMultiplyingFactors.LowVoltageFused(Undamped(side), Math.Max(test.Value, 1e-3)),
            FormattableString.Invariant($"I″k, times the ratio of the total RMS currents at half a cycle above the test's X/R of {test:0.#}, ")
            + "against the breaking capacity");
    }

    private static double? Making(CircuitBreaker breaker, DutySheet sheet)
    {
        if (breaker.ShortCircuitMakingCapacityKa.HasValue || breaker.UltimateShortCircuitBreakingCapacityKa is not { } rated)
            return breaker.ShortCircuitMakingCapacityKa;
        var factor = StandardRatings.LowVoltagePeakFactor(rated);
        sheet.Assume("short_circuit_making_capacity_ka", FormattableString.Invariant($"{factor} times Icu assumed (IEC 60947-2 table 2)"));
        return factor * rated;
    }

    /// <summary>The peak over I″k by the study's method.</summary>
    private static double PeakFactorOf(ThroughCurrent side) => side.InitialSymmetricalKa > 0.0 ? side.PeakKa / side.InitialSymmetricalKa : 0.0;

    private static double PeakFactorOf(double powerFactor) => PeakFactor.Of(Math.Max(StandardRatings.XOverROfPowerFactor(powerFactor), 1e-3));

    private static double Undamped(ThroughCurrent side) => side.XOverR ?? double.PositiveInfinity;
}
