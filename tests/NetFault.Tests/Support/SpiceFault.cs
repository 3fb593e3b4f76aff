using System.Numerics;
using System.Text;

namespace NetFault.Tests.Support;

/// <summary>
/// The fault current of a network of resistances and reactances by the circuit simulator ngspice. By superposition it is the current of a
/// source V·sin(ωt + α) that is applied to the network without its own sources at the faulted bus at t = 0. The network stands there
/// twice, for α = 0 and 90°; the two make i(t)·e^(jωt) = i90 + j·i0. The AC component comes from the simulator's AC analysis, the DC one is
/// the rest. Which branches there are, it shares with <see cref="DecayOracle"/>.
/// </summary>
internal sealed class SpiceFault
{
    private readonly IReadOnlyList<double[]> _samples;
    private readonly double _baseKa;
    private readonly Complex _ac;

    public SpiceFault(Network network, string bus, double seconds)
    {
        var circuit = new DecayCircuit(network, bus);
        Omega = circuit.Omega;
        _baseKa = circuit.BaseKa(bus);
        var results = Spice.Run(Netlist(circuit, network.FrequencyHz, seconds), "transient.txt", "ac.txt");
        _samples = results[0];
        if (_samples.Count == 0 || _samples[_samples.Count - 1][0] < seconds)
            throw new InvalidOperationException("ngspice gave up before the end");
        _ac = new Complex(results[1][0][1], results[1][0][2]) * _baseKa;
    }

    public double Omega { get; }

    public double AcRmsKa => _ac.Magnitude;

    public double DcEnvelopeKa(double seconds) => Math.Sqrt(2) * (CurrentKa(seconds) - _ac).Magnitude;

    public double InstantaneousKa(double seconds, double closingAngleDegrees) => Math.Sqrt(2)
        * (CurrentKa(seconds) * Complex.FromPolarCoordinates(1, Omega * seconds + closingAngleDegrees * Math.PI / 180)).Imaginary;

    /// <summary>
    /// √2·max |i|: the largest sample, with the parabola through it and its neighbours. The first millisecond does not count: there the
    /// simulator feels for its step.
    /// </summary>
    public (double Ka, double Seconds) WorstPeak()
    {
        var at = Enumerable.Range(1, _samples.Count - 2).Where(i => _samples[i][0] > 1e-3).OrderByDescending(Size).First();
        double t0 = _samples[at - 1][0], t1 = _samples[at][0], t2 = _samples[at + 1][0];
        double left = (Size(at) - Size(at - 1)) / (t1 - t0), right = (Size(at + 1) - Size(at)) / (t2 - t1);
        var curvature = (right - left) / (t2 - t0);
        var top = (t0 + t1) / 2 - left / (2 * curvature);
        return (Math.Sqrt(2) * _baseKa * (Size(at) + (top - t1) * (left + curvature * (top - t0))), top);

        double Size(int i) => new Complex(_samples[i][1], _samples[i][3]).Magnitude;
    }

    /// <summary>In the rotating frame, by the cubic through the four nearest samples.</summary>
    private Complex CurrentKa(double seconds)
    {
        var after = 0;
        while (after < _samples.Count - 3 && _samples[after][0] < seconds)
            after++;
        var nearest = Enumerable.Range(Math.Max(0, after - 2), 4).Select(i => _samples[i]).ToList();
        var sum = Complex.Zero;
        foreach (var one in nearest)
        {
            var weight = nearest.Where(other => other != one)
                .Aggregate(1.0, (product, other) => product * (seconds - other[0]) / (one[0] - other[0]));
            sum += weight * new Complex(one[3], one[1]);
        }
        return _baseKa * sum * Complex.FromPolarCoordinates(1, -Omega * seconds);
    }

    private static string Netlist(DecayCircuit circuit, double frequencyHz, double seconds)
    {
        var text = new StringBuilder("fault current, per unit\n");
        foreach (var (copy, degrees) in new[] { ("a", 0), ("b", 90) })
        {
            text.AppendLine(
                FormattableString.Invariant($"Vf{copy} {copy}{circuit.FaultedNode} 0 DC 0 AC 1 SIN(0 1 {frequencyHz:R} 0 0 {degrees})"));
            for (var i = 0; i < circuit.Branches.Count; i++)
                Append(text, copy, i, circuit.Branches[i], circuit.Omega);
        }
        // Tolerances well above the rounding of voltages behind 2L/step: the circuit is linear, the step alone makes the error.
        var step = 1 / frequencyHz / 4000;
        return text.AppendLine(FormattableString.Invariant($"""
            .options reltol=1e-6 abstol=1e-6 vntol=1e-6 method=trap
            .control
            set numdgt=15
            ac lin 1 {frequencyHz:R} {frequencyHz:R}
            let ia = -i(vfa)
            wrdata ac.txt ia
            tran {step:R} {seconds + 5 * step:R} 0 {step:R} uic
            let ia = -i(vfa)
            let ib = -i(vfb)
            wrdata transient.txt ia ib
            quit 0
            .endc
            .end
            """)).ToString();
    }

    /// <summary>
    /// Resistance and inductance in series between the nodes; an end with a ratio other than 1 sits behind an ideal transformer.
    /// </summary>
    private static void Append(StringBuilder text, string copy, int number, DecayBranch branch, double omega)
    {
        var name = $"{copy}x{number}";
        var ends = branch.Ends.Select((end, i) => End(text, copy, $"{name}e{i}", end)).ToList();
        var (from, to) = (ends[0], ends.Count > 1 ? ends[1] : "0");
        var (hasR, hasX) = (Math.Abs(branch.R) > 0, Math.Abs(branch.X) > 0);
        if (hasR)
            text.AppendLine(FormattableString.Invariant($"R{name} {from} {(hasX ? name + "m" : to)} {branch.R:R}"));
        if (hasX)
            text.AppendLine(FormattableString.Invariant($"L{name} {(hasR ? name + "m" : from)} {to} {branch.X / omega:R}"));
    }

    /// <summary>Voltage |share| times the node's, current |share| times the branch's.</summary>
    private static string End(StringBuilder text, string copy, string name, DecayEnd end)
    {
        var share = Math.Abs(end.Share);
        if (share.Equals(1.0))
            return $"{copy}{end.Node}";
        text.AppendLine(FormattableString.Invariant($"E{name} {name}s 0 {copy}{end.Node} 0 {share:R}"));
        text.AppendLine($"V{name} {name}s {name}p 0");
        text.AppendLine(FormattableString.Invariant($"F{name} {copy}{end.Node} 0 V{name} {share:R}"));
        return $"{name}p";
    }
}
