using CsCheck;
using NetFault.Tests.Support;

namespace NetFault.Tests.ByIeeeC37;

/// <summary>
/// Oracle: Math.NET's dense inverse of networks with the multipliers in the machines' data (<see cref="IeeeNetworks"/>), on generated
/// networks; and laws that hold for every network.
/// </summary>
public class GeneratedNetworkTests
{
    [Fact]
    public void All_three_currents_by_E_over_Z_agree_with_a_dense_inverse() =>
        RandomNetworks.Cases(40).Sample((seed, buses) => AssertCurrents(IeeeNetworks.Make(seed, buses), IeeeCurrentRule.EOverZ), iter: 80);

    [Fact]
    public void All_three_currents_by_E_over_X_agree_with_a_dense_inverse_of_the_reactances() =>
        RandomNetworks.Cases(40).Sample((seed, buses) => AssertCurrents(IeeeNetworks.Make(seed, buses), IeeeCurrentRule.EOverX), iter: 80);

    [Fact]
    public void X_over_R_is_that_of_dense_inverses_of_reactances_and_of_resistances() =>
        RandomNetworks.Cases(30).Sample((seed, buses) =>
        {
            var network = IeeeNetworks.Make(seed, buses);
            Network first = IeeeNetworks.FirstCycle(network), interrupting = IeeeNetworks.Interrupting(network);
            DenseOracle firstX = new(first, part: IeeeNetworks.Reactance), firstR = new(first, part: IeeeNetworks.Resistance);
            DenseOracle laterX = new(interrupting, part: IeeeNetworks.Reactance), laterR = new(interrupting, part: IeeeNetworks.Resistance);
            foreach (var fault in Solve(network, IeeeCurrentRule.EOverZ).Where(one => one.IsEnergised))
            {
                var bus = fault.BusId;
                AssertRatio(fault.XOverR, firstX.ImpedanceOhm[bus].Imaginary, firstR.ImpedanceOhm[bus].Real);
                AssertRatio(fault.IeeeC37!.InterruptingXOverR, laterX.ImpedanceOhm[bus].Imaginary, laterR.ImpedanceOhm[bus].Real);
            }
        }, iter: 40);

    /// <summary>
    /// Without star legs that may be negative: energy in a network of resistors can only grow when currents of another kind join.
    /// </summary>
    [Fact]
    public void E_over_X_is_never_below_E_over_Z_and_no_later_network_gives_more() =>
        RandomNetworks.Cases(40).Sample((seed, buses) =>
        {
            var network = IeeeNetworks.Make(seed, buses, threeWindings: false);
            IReadOnlyList<BusFault> byZ = Solve(network, IeeeCurrentRule.EOverZ), byX = Solve(network, IeeeCurrentRule.EOverX);
            for (var i = 0; i < byZ.Count; i++)
            {
                if (!byZ[i].IsEnergised)
                    continue;
                IeeeC37Result z = byZ[i].IeeeC37!, x = byX[i].IeeeC37!;
                byX[i].InitialSymmetricalKa.Should().BeGreaterThanOrEqualTo(byZ[i].InitialSymmetricalKa * (1 - 1e-9));
                x.InterruptingSymmetricalKa.Should().BeGreaterThanOrEqualTo(z.InterruptingSymmetricalKa * (1 - 1e-9));
                x.InterruptingSymmetricalKa.Should().BeLessThanOrEqualTo(byX[i].InitialSymmetricalKa * (1 + 1e-9));
                x.ThirtyCycleSymmetricalKa.Should().BeLessThanOrEqualTo(x.InterruptingSymmetricalKa * (1 + 1e-9));
                x.InterruptingXOverR.Should().BeApproximately(z.InterruptingXOverR!.Value, 1e-9 * z.InterruptingXOverR.Value);
            }
        }, iter: 60);

    [Fact]
    public void One_bus_alone_and_its_flows_give_the_same_as_every_bus() =>
        RandomNetworks.Cases(20).Sample((seed, buses) =>
        {
            var network = IeeeNetworks.Make(seed, buses);
            foreach (var rule in new[] { IeeeCurrentRule.EOverZ, IeeeCurrentRule.EOverX })
            {
                var fresh = new FaultStudy(network, new IeeeC37 { CurrentRule = rule, PrefaultVoltagePu = 1.05 });
                foreach (var fault in new FaultStudy(network, fresh.Method).EveryBus().Where(one => one.IsEnergised))
                {
                    var one = fresh.At(fault.BusId);
                    AssertClose(one.InitialSymmetricalKa, fault.InitialSymmetricalKa);
                    AssertClose(one.PeakKa, fault.PeakKa);
                    AssertClose(one.IeeeC37!.InterruptingDutyKa(3), fault.IeeeC37!.InterruptingDutyKa(3));
                    double Flow(FaultInstant instant) => fresh.FlowsAt(fault.BusId, instant).FaultCurrentKa.Magnitude;
                    AssertClose(Flow(FaultInstant.Initial), fault.InitialSymmetricalKa);
                    AssertClose(Flow(FaultInstant.Transient), fault.IeeeC37.InterruptingSymmetricalKa);
                    AssertClose(Flow(FaultInstant.SteadyState), fault.IeeeC37.ThirtyCycleSymmetricalKa);
                }
            }
        }, iter: 30);

    [Fact]
    public void Contributions_are_the_flows_of_the_interrupting_network_and_their_shares_add_to_one() =>
        RandomNetworks.Cases(20).Sample((seed, buses) =>
        {
            var study = new FaultStudy(IeeeNetworks.Make(seed, buses), new IeeeC37());
            foreach (var fault in study.EveryBus().Where(one => one.IsEnergised))
            {
                var result = fault.IeeeC37!;
                var flows = study.FlowsAt(fault.BusId, FaultInstant.Transient);
                result.Contributions.Sum(one => one.Share).Should().BeApproximately(1, 1e-9);
                (result.LocalGeneratorShare + result.RemoteShare + result.MotorShare).Should().BeApproximately(1, 1e-9);
                foreach (var one in result.Contributions)
                {
                    var flow = flows.Source(one.Id, one.Section).IntoBusKa.Magnitude;
                    one.CurrentKa.Should().BeApproximately(flow, 1e-9 * flow + 1e-12);
                }
            }
        }, iter: 30);

    private static void AssertCurrents(Network network, IeeeCurrentRule rule)
    {
        var part = rule == IeeeCurrentRule.EOverX ? IeeeNetworks.Reactance : null;
        var first = new DenseOracle(IeeeNetworks.FirstCycle(network), part: part);
        var interrupting = new DenseOracle(IeeeNetworks.Interrupting(network), part: part);
        var thirty = new DenseOracle(IeeeNetworks.ThirtyCycle(network), part: part);
        foreach (var fault in Solve(network, rule))
        {
            fault.IsEnergised.Should().Be(first.ImpedanceOhm.ContainsKey(fault.BusId));
            if (!fault.IsEnergised)
            {
                fault.IeeeC37.Should().BeNull();
                continue;
            }
            AssertClose(fault.InitialSymmetricalKa, first.CurrentKa(fault.BusId));
            AssertClose(fault.IeeeC37!.InterruptingSymmetricalKa, interrupting.CurrentKa(fault.BusId));
            var isHeld = thirty.ImpedanceOhm.ContainsKey(fault.BusId);
            AssertClose(fault.IeeeC37.ThirtyCycleSymmetricalKa, isHeld ? thirty.CurrentKa(fault.BusId) : 0);
        }
    }

    private static IReadOnlyList<BusFault> Solve(Network network, IeeeCurrentRule rule) =>
        new FaultStudy(network, new IeeeC37 { CurrentRule = rule }).EveryBus();

    private static void AssertRatio(double? actual, double x, double r)
    {
        // Star legs of negative resistance or reactance may leave no ratio at all.
        if (x > 1e-9 * Math.Abs(r) && r > 1e-9 * Math.Abs(x))
            actual!.Value.Should().BeApproximately(x / r, 1e-8 * x / r);
    }

    private static void AssertClose(double actual, double expected) =>
        actual.Should().BeApproximately(expected, 1e-9 * Math.Abs(expected) + 1e-300);
}
