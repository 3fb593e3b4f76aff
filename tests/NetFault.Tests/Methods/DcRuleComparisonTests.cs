using NetFault.Tests.Support;

namespace NetFault.Tests.Methods;

/// <summary>The usual rules for the DC component beside the exact one.</summary>
public class DcRuleComparisonTests
{
    private static readonly XOverRRule[] Rules = [XOverRRule.ComplexImpedance, XOverRRule.SeparateNetworks, XOverRRule.EquivalentFrequency];

    [Theory]
    [InlineData(0.04)]
    [InlineData(0.5)]
    public void Where_one_series_path_feeds_the_fault_every_rule_is_exact(double ratio)
    {
        var study = new FaultStudy(Plants.OneFeeder(ratio), new MachineDecrement());
        foreach (var t in new[] { 0.01, 0.03, 0.1, 0.3 })
        {
            var bus = study.CompareDcRules(t).Buses.Single();
            bus.ExactDcComponentKa.Should().BeApproximately(Math.Sqrt(2) * 10 * Math.Exp(-2 * Math.PI * 50 * t * ratio), 1e-5);
            bus.Rules.Select(one => one.Rule).Should().Equal(Rules);
            foreach (var rule in bus.Rules)
            {
                rule.XOverR.Should().BeApproximately(1 / ratio, 1e-9 / ratio);
                rule.DifferencePercent.Should().BeApproximately(0, 1e-4);
                rule.PeakDifferencePercent.Should().BeApproximately(0, 1e-4);
                rule.IsOnUnsafeSide.Should().BeFalse();
            }
        }
    }

    [Fact]
    public void Where_sources_of_unlike_ratios_meet_the_impedance_at_the_fault_gives_too_little()
    {
        // The exact DC component is the simulated one of TwoSources, to its printed digits; X/R = Im Zk/Re Zk from the study.
        var study = new FaultStudy(TwoSources.Make(), new MachineDecrement());
        var comparison = study.CompareDcRules(0.05);
        var bus = comparison.Buses.Single(one => one.BusId == "BUS");
        bus.ExactDcComponentKa.Should().BeApproximately(20.9133087, 5e-6);
        bus.ExactPeakKa.Should().BeApproximately(76.7282768, 5e-6);
        var z = study.At("BUS").ImpedancePu!.Value;
        var dc = Math.Sqrt(2) * 34.1001879 * Math.Exp(-2 * Math.PI * 60 * 0.05 * z.Real / z.Imaginary);
        var rule = bus.By(XOverRRule.ComplexImpedance);
        rule.DcComponentKa.Should().BeApproximately(dc, 1e-6);
        rule.DifferencePercent.Should().BeApproximately(100 * (dc - 20.9133087) / (Math.Sqrt(2) * 34.1001879), 1e-4);
        rule.IsOnUnsafeSide.Should().BeTrue();
        var summary = comparison.Summaries.Single(one => one.Rule == XOverRRule.ComplexImpedance);
        summary.LowestPercent.Should().BeLessThanOrEqualTo(rule.DifferencePercent);
        comparison.Buses.Single(one => one.BusId == summary.LowestBusId).By(summary.Rule).DifferencePercent.Should().Be(summary.LowestPercent);
        summary.UnsafeBuses.Should().Be(comparison.Buses.Count(one => one.By(summary.Rule).IsOnUnsafeSide));
    }

    [Fact]
    public void The_comparison_does_not_depend_on_the_rules_of_the_study()
    {
        var usual = new FaultStudy(TwoSources.Make(), new MachineDecrement()).CompareDcRules(0.02);
        var exact = new FaultStudy(TwoSources.Make(), new MachineDecrement
        {
            AcComponentRule = AcComponentRule.Exact, DcDecayRule = DcDecayRule.Exact, XOverRRule = XOverRRule.SeparateNetworks,
        }).CompareDcRules(0.02);
        usual.Buses.Select(one => one.ExactDcComponentKa).Should().Equal(exact.Buses.Select(one => one.ExactDcComponentKa));
    }

    [Fact]
    public void The_table_names_each_rule_and_its_worst_bus_and_carries_the_caution()
    {
        var comparison = new FaultStudy(TwoSources.Make(), new MachineDecrement()).CompareDcRules(0.05);
        var text = FaultReport.ToTable(comparison);
        text.Should().Contain("a: X/R of the complex impedance").And.Contain("separate R and X networks").And.Contain("the equivalent frequency");
        text.Should().Contain("unsafe side").And.Contain("licensed");
        text.Split('\n').Count(line => line.StartsWith("WEAK", StringComparison.Ordinal)).Should().Be(1);
    }

    [Fact]
    public void The_file_has_a_row_for_each_bus_and_rule()
    {
        var comparison = new FaultStudy(TwoSources.Make(), new MachineDecrement()).CompareDcRules(0.05);
        var writer = new StringWriter();
        FaultReport.WriteCsv(writer, comparison);
        var lines = writer.ToString().TrimEnd().Split(["\r\n"], StringSplitOptions.None);
        lines.Should().HaveCount(1 + 3 * comparison.Buses.Count);
        lines[0].Split(',').Should().HaveCount(12).And.Contain("dc_difference_percent");
        lines[1].Should().StartWith("HV,0.05,").And.Contain(",complex_impedance,");
    }

    [Fact]
    public void An_unknown_rule_is_refused_with_those_there_are()
    {
        var bus = new FaultStudy(Plants.OneFeeder(0.1), new MachineDecrement()).CompareDcRules(0.05).Buses[0];
        bus.Invoking(one => one.By(XOverRRule.SmallestRatio)).Should().Throw<ArgumentOutOfRangeException>().WithMessage("*SeparateNetworks*");
    }
}
