namespace NetFault.Tests.Published;

/// <summary>Worked examples of generators at or near their terminals, reactances only, from network files.</summary>
public class GeneratorExampleTests
{
    /// <summary>Source: V. K. and R. Mehta, Principles of Power System, chapter 17, example 17.1 (title inferred): printed 4330 A.</summary>
    [Fact]
    public void Two_alternators_in_parallel_give_the_printed_4330_A()
    {
        var fault = Solve("""
            buses: {T: {nominal_kv: 12}}
            synchronous_machines:
              A: {bus: T, rated_mva: 15, reactance_pu: {subtransient: 0.3}, armature_resistance_pu: 0}
              B: {bus: T, rated_mva: 20, reactance_pu: {subtransient: 0.5}, armature_resistance_pu: 0}
            """, "T");
        Math.Round(fault.InitialSymmetricalKa * 1000).Should().Be(4330);
    }

    /// <summary>Source: the same, example 17.2: 0.375 ohm a phase hold the fault to 8 times the rated current.</summary>
    [Fact]
    public void A_reactor_of_0_375_ohm_holds_the_fault_to_8_times_the_rated_current()
    {
        var fault = Solve("""
            buses: {T: {nominal_kv: 10}, OUT: {nominal_kv: 10}}
            synchronous_machines:
              A: {bus: T, rated_mva: 20, reactance_pu: {subtransient: 0.05}, armature_resistance_pu: 0}
            series_reactors:
              R: {from: T, to: OUT, ohm: {r: 0, x: 0.375}}
            """, "OUT");
        fault.InitialSymmetricalKa.Should().BeApproximately(8 * 20 / (Math.Sqrt(3) * 10), 1e-9);
    }

    /// <summary>
    /// Source: a textbook chapter on symmetrical faults, example 20.1 (book not named in the copy seen): 41.7 MVA, 3645 A; with 6.4 kV
    /// before the fault 3534.437 A.
    /// </summary>
    [Fact]
    public void A_generator_of_5_MVA_gives_the_printed_fault_level_and_current()
    {
        const string file = """
            buses: {T: {nominal_kv: 6.6}}
            synchronous_machines:
              A: {bus: T, rated_mva: 5, reactance_pu: {subtransient: 0.12}, armature_resistance_pu: 0}
            """;
        var fault = Solve(file, "T");
        Math.Round(fault.ShortCircuitMva, 1).Should().Be(41.7);
        Math.Round(fault.InitialSymmetricalKa * 1000).Should().Be(3645);
        Math.Round(Solve(file, "T", 6.4 / 6.6).InitialSymmetricalKa * 1000, 3).Should().Be(3534.437);
    }

    /// <summary>
    /// Source: Japanese third-class electrical engineer examination 2020, power, question 8: 20 MVA, 6.6 kV, 10.6 % and 1.1 % in series:
    /// 14 953 A from the rated 1749.5 A, both rounded in print.
    /// </summary>
    [Fact]
    public void Per_cent_impedances_in_series_give_the_printed_14953_A()
    {
        var fault = Solve("""
            base_mva: 20
            buses: {S: {nominal_kv: 6.6}, F: {nominal_kv: 6.6}}
            synchronous_machines:
              A: {bus: S, rated_mva: 20, reactance_pu: {subtransient: 0.106}, armature_resistance_pu: 0}
            lines:
              L: {from: S, to: F, per_unit: {r: 0, x: 0.011}}
            """, "F");
        (fault.InitialSymmetricalKa * 1000).Should().BeApproximately(14953, 1);
    }

    private static BusFault Solve(string sections, string bus, double prefaultPu = 1) =>
        new FaultStudy(NetworkFile.Parse("netfault: 1\nfrequency_hz: 50\n" + sections), new MachineDecrement { PrefaultVoltagePu = prefaultPu })
            .At(bus);
}
