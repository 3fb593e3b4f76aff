namespace NetFault.Tests.Published;

/// <summary>
/// Source: V. Pangonilo, "MVA Method Short Circuit Calculation" (web tutorial, pages 1 and 4); reactances only, no voltage factor. The
/// generator has 4 MVA in the source's results and text, though its list prints 3 MVA.
/// </summary>
public class RadialIndustrialTests
{
    private const string File = """
        netfault: 1
        frequency_hz: 50
        buses:
          HV: {nominal_kv: 33}
          MV: {nominal_kv: 11}
          PLANT: {nominal_kv: 6.6}
          LV: {nominal_kv: 0.4}
        network_feeders:
          Utility: {bus: HV, short_circuit_mva: 250, r_over_x: 0}
        synchronous_machines:
          G: {bus: MV, rated_mva: 4, reactance_pu: {subtransient: 0.113}, armature_resistance_pu: 0}
          M11: {bus: MV, service: motor, rated_mva: 5, reactance_pu: {subtransient: 0.17}, armature_resistance_pu: 0}
          M6: {bus: PLANT, service: motor, rated_mva: 6.8, reactance_pu: {subtransient: 0.17}, armature_resistance_pu: 0}
          M04a: {bus: LV, service: motor, rated_mva: 0.3, reactance_pu: {subtransient: 0.17}, armature_resistance_pu: 0}
          M04b: {bus: LV, service: motor, rated_mva: 0.596, reactance_pu: {subtransient: 0.25}, armature_resistance_pu: 0}
        transformers:
          T1: {hv: HV, lv: MV, rated_mva: 10, rated_kv: {hv: 33, lv: 11}, short_circuit_voltage_percent: 9, resistive_percent: 0}
          T2: {hv: MV, lv: PLANT, rated_mva: 5, rated_kv: {hv: 11, lv: 6.6}, short_circuit_voltage_percent: 7, resistive_percent: 0}
          T3: {hv: PLANT, lv: LV, rated_mva: 2, rated_kv: {hv: 6.6, lv: 0.4}, short_circuit_voltage_percent: 6, resistive_percent: 0}
        """;

    [Theory]
    [InlineData("HV", 5.25395)]
    [InlineData("MV", 8.86188)]
    [InlineData("PLANT", 7.97644)]
    [InlineData("LV", 40.82753)]
    public void Currents_are_those_of_the_tutorial_recalculated(string bus, double currentKa)
    {
        var fault = new FaultStudy(NetworkFile.Parse(File), new MachineDecrement()).At(bus);
        Math.Round(fault.InitialSymmetricalKa, 5).Should().Be(currentKa);
    }

    [Fact]
    public void The_fault_level_at_11_kV_is_the_printed_one_but_for_its_slip_of_0_05_MVA()
    {
        var fault = new FaultStudy(NetworkFile.Parse(File), new MachineDecrement()).At("MV");
        Math.Round(fault.ShortCircuitMva, 4).Should().Be(168.8416);
        fault.ShortCircuitMva.Should().BeApproximately(168.79, 0.06);
        Math.Round(fault.InitialSymmetricalKa, 2).Should().Be(8.86);
    }
}
