using System.Numerics;

namespace NetFault;

/// <summary>A series reactor in the positive-sequence circuit (IEC 60909-0, 6.5 short-circuit limiting reactors).</summary>
internal static class SeriesReactorCircuit
{
    /// <summary>Series impedance per unit on the nominal voltage of the from bus.</summary>
    public static Complex SeriesPu(SeriesReactor reactor, double fromKv, double baseMva, AssumptionLog? log)
    {
        var baseOhm = PerUnit.BaseOhm(fromKv, baseMva);
        if (reactor.Ohm is { } ohm)
            return new Complex(ohm.R, ohm.X) / baseOhm;
        if (reactor.RatedKv is null)
            log?.Add(reactor, "rated_kv", AssumptionTexts.RatedVoltageOfBus);
        if (reactor.XOverR is null)
            log?.Add(reactor, "x_over_r", "no resistance is given; R = 0 assumed");
        var ratedOhm = (reactor.RatedKv ?? fromKv) / (PerUnit.Sqrt3 * reactor.RatedKa.GetValueOrDefault());
        var x = reactor.ReactancePercent.GetValueOrDefault() / 100.0 * ratedOhm / baseOhm;
        return new Complex(reactor.XOverR is { } ratio ? x / ratio : 0.0, x);
    }
}

/// <summary>Wordings of assumptions that several elements share.</summary>
internal static class AssumptionTexts
{
    /// <summary>For a rated voltage that is not given.</summary>
    public const string RatedVoltageOfBus = "the nominal voltage of the bus is taken as the rated voltage";
}
