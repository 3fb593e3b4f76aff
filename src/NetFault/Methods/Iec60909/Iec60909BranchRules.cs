using System.Numerics;

namespace NetFault;

/// <summary>What IEC 60909-0:2016 changes about branches: K_T, K_S, the conductor temperature of the minimum case.</summary>
internal sealed class Iec60909BranchRules : BranchRules
{
    /// <summary>Temperature coefficient of resistance for copper and aluminium, 1/K (6.4).</summary>
    private const double PerKelvin = 0.004;

    /// <summary>End temperature where a line does not give one, in °C; common practice for thermoplastic cables and overhead lines.</summary>
    private const double AssumedEndTemperatureC = 80.0;

    private readonly Network _network;
    private readonly PowerStationUnits _units;
    private readonly ShortCircuitCase _case;

    public Iec60909BranchRules(Network network, PowerStationUnits units, ShortCircuitCase which)
    {
        _network = network;
        _units = units;
        _case = which;
    }

    public override Complex Line(Line line, Complex z, AssumptionLog? log)
    {
        if (_case == ShortCircuitCase.Maximum || z.Real == 0.0)
            return z;
        if (line.EndTemperatureC is null)
            log?.Add(line, "end_temperature_c", "80 °C assumed at the end of the short circuit, for the resistance in the minimum case");
        var factor = 1.0 + PerKelvin * ((line.EndTemperatureC ?? AssumedEndTemperatureC) - 20.0);
        return new Complex(z.Real * factor, z.Imaginary);
    }

    public override Complex Transformer(Transformer transformer, Complex z)
    {
        if (_units.Of(transformer) is { } unit)
            return z * unit.Factor;
        var lowSide = transformer.RatedLvKv <= transformer.RatedHvKv ? transformer.Lv : transformer.Hv;
        return z * CorrectionFactors.Transformer(
            VoltageFactor.Max(_network.Find<Bus>(lowSide)), TransformerCircuit.RelativeReactance(transformer));
    }

    public override Complex Windings(ThreeWindingTransformerCircuit.Pair pair, Bus lowerBus, Complex z) =>
        z * CorrectionFactors.Transformer(VoltageFactor.Max(lowerBus), pair.RelativeReactance);
}
