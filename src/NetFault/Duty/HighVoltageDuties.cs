namespace NetFault;

/// <summary>The duties of circuit-breakers above 1 kV.</summary>
internal static class HighVoltageDuties
{
    /// <summary>IEC 62271-100: making, AC and DC component at contact separation and both together, peak and short-time withstand.</summary>
    public static void Iec(CircuitBreaker breaker, DutySheet sheet)
    {
        var parting = ContactParting.Of(breaker, sheet);
        var rated = breaker.ShortCircuitBreakingCurrentKa;
        sheet.Judge(DutyKind.Making, Making(breaker, sheet), "short_circuit_making_current_ka", sheet.Both, side => side.PeakKa,
            "peak through the breaker against the rated short-circuit making current (IEC 62271-100)");
        Symmetrical(DutyKind.BreakingSymmetrical, rated, "short_circuit_breaking_current_ka", sheet.Both, parting, sheet);
        var share = RatedDcComponent.Of(breaker, parting, StandardRatings.StandardTimeConstantSeconds, sheet);
        if (sheet.Options.DcCriterion != DcCriterion.ByTotalCurrent)
            Direct(DutyKind.BreakingDcComponent, rated, share, "short_circuit_breaking_current_ka", sheet.Both, parting, sheet);
        Total(rated, share, parting, sheet);
        WithstandDuties.OfBreaker(breaker, Making(breaker, sheet), sheet);
    }

    /// <summary>IEEE C37.04: closing and latching; the symmetrical current with the multiplying factor of C37.010; short-time withstand.</summary>
    public static void Ieee(CircuitBreaker breaker, DutySheet sheet)
    {
        sheet.Judge(DutyKind.Making, ClosingAndLatching(breaker, sheet), "closing_and_latching_current_ka", sheet.Both, side => side.PeakKa,
            "peak through the breaker against the rated closing and latching current (IEEE C37.04)");
        const string Formula = "max(Iac, √(Iac² + i_dc²)/S) at contact parting, which is the symmetrical current times the multiplying factor "
            + "with DC decrement only, against the rated symmetrical short-circuit current (IEEE C37.010, C37.04)";
        var parting = ContactParting.Of(breaker, sheet);
        if (parting.Seconds is not { } seconds)
            sheet.CannotSay(DutyKind.BreakingSymmetrical, "no contact parting time: neither contact_parting_time_cycles nor minimum_opening_time_s nor "
                + "rated_interrupting_time_cycles is given", Formula);
        else
        {
            double time = sheet.WithinHorizon(seconds), s = RatioS(breaker, parting, sheet);
            sheet.Judge(DutyKind.BreakingSymmetrical, breaker.ShortCircuitBreakingCurrentKa, "short_circuit_breaking_current_ka", sheet.Both,
                side => Math.Max(side.SymmetricalRmsKa(time), side.AsymmetricalRmsKa(time) / s),
                Formula + FormattableString.Invariant($"; contacts part after {seconds * sheet.FrequencyHz:0.##} cycles, S = {s:0.###}"));
        }
        WithstandDuties.OfBreaker(breaker, ClosingAndLatching(breaker, sheet), sheet);
    }

    /// <summary>IEC/IEEE 62271-37-013: what comes from the system and what comes from the generator, each against its rating.</summary>
    public static void Generator(CircuitBreaker breaker, DutySheet sheet)
    {
        var parting = ContactParting.Of(breaker, sheet);
        sheet.Judge(DutyKind.Making, GeneratorMaking(breaker, sheet), "short_circuit_making_current_ka", sheet.Both, side => side.PeakKa,
            "peak through the breaker, from either side, against the rated making current (IEC/IEEE 62271-37-013)");
        var rated = breaker.ShortCircuitBreakingCurrentKa;
        var fromGenerator = GeneratorSide.Of(breaker, sheet);
        var system = fromGenerator is null ? sheet.Both : [fromGenerator.Side == FaultSide.AtBus ? sheet.Currents.BeyondDevice : sheet.Currents.AtBus];
        Symmetrical(DutyKind.BreakingSymmetrical, rated, "short_circuit_breaking_current_ka", system, parting, sheet);
        Direct(DutyKind.BreakingDcComponent, rated,
            RatedDcComponent.Of(breaker, parting, StandardRatings.GeneratorBreakerTimeConstantSeconds, sheet),
            "short_circuit_breaking_current_ka", system, parting, sheet);
        if (fromGenerator is null)
            sheet.Remark("it is not clear on which side the generator is: the larger current is held against the system-source rating");
        else
            FromGenerator(breaker, fromGenerator, parting, sheet);
        WithstandDuties.OfBreaker(breaker, GeneratorMaking(breaker, sheet), sheet);
    }

    private static void FromGenerator(CircuitBreaker breaker, ThroughCurrent fromGenerator, ContactParting parting, DutySheet sheet)
    {
        var rated = breaker.GeneratorSourceBreakingCurrentKa;
        if (breaker.GeneratorSourceDcComponentPercent is null)
            sheet.Assume("generator_source_dc_component_percent", "110 % assumed, the value of IEEE C37.013");
        var percent = breaker.GeneratorSourceDcComponentPercent ?? StandardRatings.GeneratorSourceDcPercent;
        Symmetrical(DutyKind.GeneratorSourceSymmetrical, rated, "generator_source_breaking_current_ka", [fromGenerator], parting, sheet);
        Direct(DutyKind.GeneratorSourceDcComponent, rated, percent / 100.0, "generator_source_breaking_current_ka", [fromGenerator], parting, sheet);
    }

    /// <summary>Without a contact parting time the initial current, which is not smaller.</summary>
    private static void Symmetrical(
        DutyKind kind, double? rated, string key, IReadOnlyList<ThroughCurrent> sides, ContactParting parting, DutySheet sheet)
    {
        if (parting.Seconds is { } seconds)
        {
            var time = sheet.WithinHorizon(seconds);
            sheet.Judge(kind, rated, key, sides, side => side.SymmetricalRmsKa(time), FormattableString.Invariant(
                $"AC component at contact separation, {seconds:0.####} s, against the AC component of the rated breaking current"));
        }
        else
            sheet.Judge(kind, rated, key, sides, side => side.InitialSymmetricalKa,
                "I″k, for no contact parting time is given, against the AC component of the rated breaking current");
    }

    private static void Direct(
        DutyKind kind, double? rated, double? share, string key, IReadOnlyList<ThroughCurrent> sides, ContactParting parting, DutySheet sheet)
    {
        if (parting.Seconds is not { } seconds || share is not { } beta)
        {
            sheet.CannotSay(kind, NoTime, "i_dc at contact separation against the DC component of the rated breaking current");
            return;
        }
        var time = sheet.WithinHorizon(seconds);
        var given = FormattableString.Invariant($"at contact separation, {seconds:0.####} s; rated {100.0 * beta:0.#} %");
        if (sheet.Options.DcCriterion == DcCriterion.ByPercent)
        {
            sheet.Judge(kind, rated is null ? null : 100.0 * beta, key, sides, side => Percent(side, time),
                "i_dc in percent of √2·Iac against the rated percentage, " + given, "%");
            return;
        }
        var percent = sides.Max(side => Percent(side, time));
        sheet.Judge(kind, PerUnit.Sqrt2 * rated * beta, key, sides, side => side.DcComponentKa(time), FormattableString.Invariant(
            $"i_dc in kA against √2 times the rated breaking current times its DC share, {given}; here up to {percent:0.#} % of the AC component"));
        if (percent > 100.0 * beta * (1.0 + 1e-9))
        {
            sheet.Remark("the DC component is a larger part of the AC component than in the rated current: it is judged in kA, while the standard's words "
                + "speak of percent; ask the maker");
        }
    }

    private static void Total(double? rated, double? share, ContactParting parting, DutySheet sheet)
    {
        const string Formula = "√(Iac² + i_dc²) at contact separation against the rated breaking current times √(1 + 2β²), β its DC share";
        if (parting.Seconds is not { } seconds || share is not { } beta)
        {
            sheet.CannotSay(DutyKind.BreakingAsymmetrical, NoTime, Formula);
            return;
        }
        var time = sheet.WithinHorizon(seconds);
        sheet.Judge(DutyKind.BreakingAsymmetrical, rated * Math.Sqrt(1.0 + 2.0 * beta * beta), "short_circuit_breaking_current_ka", sheet.Both,
            side => side.AsymmetricalRmsKa(time), Formula);
    }

    private const string NoTime = "no contact parting time: minimum_opening_time_s is not given";

    private static double Percent(ThroughCurrent side, double seconds) =>
        side.SymmetricalRmsKa(seconds) is var ac && ac > 0.0 ? 100.0 * side.DcComponentKa(seconds) / (PerUnit.Sqrt2 * ac) : 0.0;

    private static double? Making(CircuitBreaker breaker, DutySheet sheet)
    {
        if (breaker.ShortCircuitMakingCurrentKa.HasValue || breaker.ShortCircuitBreakingCurrentKa is not { } rated)
            return breaker.ShortCircuitMakingCurrentKa;
        var factor = StandardRatings.MakingFactor(sheet.FrequencyHz, breaker.DcTimeConstantSeconds ?? StandardRatings.StandardTimeConstantSeconds);
        sheet.Assume("short_circuit_making_current_ka", FormattableString.Invariant(
            $"{factor} times the rated breaking current assumed, the standard value of IEC 62271-100"));
        return factor * rated;
    }

    private static double? GeneratorMaking(CircuitBreaker breaker, DutySheet sheet)
    {
        if (breaker.ShortCircuitMakingCurrentKa.HasValue || breaker.ShortCircuitBreakingCurrentKa is not { } rated)
            return breaker.ShortCircuitMakingCurrentKa;
        sheet.Assume("short_circuit_making_current_ka", FormattableString.Invariant(
            $"{StandardRatings.GeneratorBreakerMakingFactor} times the system-source breaking current assumed (IEC/IEEE 62271-37-013)"));
        return StandardRatings.GeneratorBreakerMakingFactor * rated;
    }

    private static double? ClosingAndLatching(CircuitBreaker breaker, DutySheet sheet)
    {
        if (breaker.ClosingAndLatchingCurrentKa.HasValue || breaker.ShortCircuitBreakingCurrentKa is not { } rated)
            return breaker.ClosingAndLatchingCurrentKa;
        var factor = sheet.FrequencyHz > 50.0 ? IeeeMultiplyingFactors.CloseAndLatchPeakMultiplier : 2.5;
        sheet.Assume("closing_and_latching_current_ka", FormattableString.Invariant(
            $"{factor} times the rated symmetrical short-circuit current assumed (IEEE C37.04-1999)"));
        return factor * rated;
    }

    /// <summary>S from the rated DC component where it is given, else by the table.</summary>
    private static double RatioS(CircuitBreaker breaker, ContactParting parting, DutySheet sheet)
    {
        if (breaker.DcComponentPercent is { } percent)
            return Math.Sqrt(1.0 + 2.0 * percent * percent / 1e4);
        if (breaker.DcTimeConstantSeconds is { } tau)
            return Math.Sqrt(1.0 + 2.0 * Math.Exp(-2.0 * parting.RatedSeconds.GetValueOrDefault() / tau));
        return IeeeMultiplyingFactors.RatioS(parting.Seconds.GetValueOrDefault() * sheet.FrequencyHz);
    }
}

/// <summary>Finds on which side of a generator circuit-breaker its generator is.</summary>
internal static class GeneratorSide
{
    /// <summary>The current that comes from the generator; null where it is not clear which it is.</summary>
    public static ThroughCurrent? Of(CircuitBreaker breaker, DutySheet sheet)
    {
        var network = sheet.Context.Network;
        switch (network.ElementBehind(breaker))
        {
            case SynchronousMachine:
                return sheet.Currents.AtBus;
            case Transformer transformer when network.SynchronousMachines.Any(machine => machine.InService && machine.UnitTransformer == transformer.Id):
                return sheet.Currents.BeyondDevice;
            case BusCoupler coupler:
                var far = coupler.From == breaker.Bus ? coupler.To : coupler.From;
                bool here = HasMachine(network, breaker.Bus), there = HasMachine(network, far);
                return here == there ? null : there ? sheet.Currents.AtBus : sheet.Currents.BeyondDevice;
            default:
                return null;
        }
    }

    private static bool HasMachine(Network network, string bus) =>
        network.SynchronousMachines.Any(machine => machine.InService && machine.Bus == bus && machine.Service == SynchronousService.Generator);
}
