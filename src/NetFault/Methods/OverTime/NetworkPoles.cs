using System.Numerics;

namespace NetFault;

/// <summary>
/// Finds what bounds the poles of a network, and refuses networks whose poles nothing bounds. The argument of <see cref="PoleRegion"/> holds for
/// elements with R ≥ 0 and X &gt; 0, three-winding transformers as one three-port; where one is not so, <see cref="NetworkForms"/> shows it for
/// the network as a whole, or cannot.
/// </summary>
internal sealed class NetworkPoles
{
    /// <summary>Machines whose shares and rates differ by less than this are alike to the region.</summary>
    private const double SharesAlike = 0.02, RatesAlike = 1.0 / 16.0;

    private readonly Circuit _circuit;
    private readonly OperationalSource[] _sources;
    private readonly bool _quasiStatic;
    private double _largestRatio;
    private bool _needsProof;

    private NetworkPoles(Circuit circuit, IEnumerable<OperationalSource?> sources, bool quasiStatic)
    {
        _circuit = circuit;
        _sources = sources.OfType<OperationalSource>().ToArray();
        _quasiStatic = quasiStatic;
    }

    /// <summary>The limits of a network's poles.</summary>
    /// <param name="networks">The study's networks.</param>
    /// <param name="sources">Its operational sources.</param>
    /// <param name="quasiStatic">Whether reactances are kept at rated frequency.</param>
    /// <exception cref="CurrentOverTimeException">Nothing bounds them.</exception>
    public static PoleLimits LimitsOf(StudyNetworks networks, OperationalSource?[] sources, bool quasiStatic)
    {
        var work = new NetworkPoles(networks.Circuit, sources, quasiStatic);
        work.ReadBranches();
        foreach (var source in work._sources)
            work.TakeRatio(source.ResistanceRatio);
        var whole = work._needsProof ? NetworkForms.Of(networks, sources, work._largestRatio) : new NetworkForms.Bounds(0.0, work._largestRatio, 1.0);
        return new PoleLimits
        {
            SmallestResistanceRatio = whole.Smallest,
            LargestResistanceRatio = whole.Largest,
            HoldAsAWhole = work._needsProof,
            ReactanceLeft = whole.ReactanceLeft,
            Machines = work.DifferentMachines(),
            LargestMachineResistanceRatio = work.Machines.Select(machine => machine.ResistanceRatio).DefaultIfEmpty().Max(),
            MotorRates = work.DifferentMotorRates(),
            LargestMotorResistanceRatio = work.Motors.Select(motor => motor.ResistanceRatio).DefaultIfEmpty().Max(),
        };
    }

    private IEnumerable<OperationalSource> Machines => _sources.Where(source => source.TransientRate > 0.0 || source.SubtransientRate > 0.0);

    private IEnumerable<OperationalSource> Motors => _sources.Where(source => source.MotorRate > 0.0);

    private void ReadBranches()
    {
        for (var i = 0; i < _circuit.Branches.Length; i++)
        {
            switch (_circuit.Branches[i].Kind)
            {
                case BranchKind.Series:
                    ReadSeries(i);
                    break;
                case BranchKind.StarFirst:
                    ReadStar(i);
                    break;
                case BranchKind.Capacitor when _quasiStatic:
                    _needsProof = true;
                    break;
                case BranchKind.Capacitor:
                    throw CurrentOverTimeException.Of(_circuit, [i],
                        "a series capacitor oscillates with the network's inductances, so that AC and DC component are not the only ones",
                        "take AcComponentRule.QuasiStatic and DcDecayRule.ByXOverR, or set voltage_limited where its protection bridges it");
            }
        }
    }

    private void ReadSeries(int branch)
    {
        var z = _circuit.BranchImpedances[branch];
        if (z.Real < 0.0 || z.Imaginary < 0.0)
            _needsProof = true;
        else
            TakeRatio(z.Real / z.Imaginary);
    }

    /// <summary>
    /// The star as the matrices R and X of its two independent currents: where X is positive definite and R not negative, its R/X lie between the
    /// eigenvalues of R against X, λ²·det X − λ·t + det R = 0.
    /// </summary>
    private void ReadStar(int first)
    {
        Complex a = _circuit.BranchImpedances[first], b = _circuit.BranchImpedances[first + 1], c = _circuit.BranchImpedances[first + 2];
        if (NetworkForms.NegativesOf(_circuit, first, z => z.Imaginary) > 0 || NetworkForms.NegativesOf(_circuit, first, z => z.Real) > 0)
        {
            _needsProof = true;
            return;
        }
        double x11 = a.Imaginary + c.Imaginary, x22 = b.Imaginary + c.Imaginary, x12 = c.Imaginary;
        double r11 = a.Real + c.Real, r22 = b.Real + c.Real, r12 = c.Real;
        double ofX = x11 * x22 - x12 * x12, ofR = r11 * r22 - r12 * r12;
        var t = r11 * x22 + r22 * x11 - 2.0 * r12 * x12;
        TakeRatio((t + Math.Sqrt(Math.Max(0.0, t * t - 4.0 * ofX * ofR))) / (2.0 * ofX));
    }

    private void TakeRatio(double ratio) => _largestRatio = Math.Max(_largestRatio, ratio);

    private List<OperationalSource> DifferentMachines() => Machines
        .GroupBy(source => (
            Math.Round(source.TransientShare / SharesAlike), Math.Round(source.SubtransientShare / SharesAlike),
            Ring(source.TransientRate), Ring(source.SubtransientRate)))
        .Select(group => group.First())
        .ToList();

    private List<double> DifferentMotorRates() =>
        Motors.Select(motor => motor.MotorRate).GroupBy(Ring).Select(group => group.Max()).ToList();

    private static double Ring(double rate) => rate > 0.0 ? Math.Round(Math.Log(rate) / RatesAlike) : double.NegativeInfinity;
}
