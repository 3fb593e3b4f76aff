namespace NetFault;

/// <summary>An asynchronous motor, or a group of equal ones.</summary>
public sealed record AsynchronousMotor : ShuntElement
{
    /// <summary>Rated mechanical power PrM of one motor in kW, greater than 0.</summary>
    public required double RatedKw { get; init; }

    /// <summary>Rated line-to-line voltage UrM in kV; null takes the bus's nominal voltage.</summary>
    public double? RatedKv { get; init; }

    /// <summary>Rated power factor cos φrM, above 0 and at most 1.</summary>
    public required double RatedPowerFactor { get; init; }

    /// <summary>Rated efficiency ηrM as a fraction, above 0 and at most 1.</summary>
    public required double Efficiency { get; init; }

    /// <summary>Ratio ILR/IrM of the locked-rotor current to the rated current, greater than 0.</summary>
    public required double LockedRotorCurrentRatio { get; init; }

    /// <summary>Number of pole pairs p, 1 or more; null where it is not known.</summary>
    public int? PolePairs { get; init; }

    /// <summary>How many equal motors stand side by side, 1 or more. Default 1.</summary>
    public int Count { get; init; } = 1;

    /// <summary>Ratio X/R of the locked-rotor impedance, greater than 0; this, <see cref="ROverX"/>, or neither: then it is assumed by size.</summary>
    public double? XOverR { get; init; }

    /// <summary>Ratio R/X of the locked-rotor impedance, not negative; this, <see cref="XOverR"/>, or neither: then it is assumed by size.</summary>
    public double? ROverX { get; init; }

    /// <summary>Rated slip in percent, above 0 and at most 100; null where it is not known.</summary>
    public double? RatedSlipPercent { get; init; }

    /// <summary>Rated apparent power SrM = PrM/(ηrM·cos φrM) of one motor, in MVA.</summary>
    public double RatedMvaOfOne => RatedKw / 1000.0 / (Efficiency * RatedPowerFactor);

    /// <inheritdoc/>
    public override string Section => "asynchronous_motors";

    internal override ElementRole Role => ElementRole.Follower;

    internal override void Check(ElementCheck check)
    {
        check.BusReference("bus", Bus);
        check.Positive("rated_kw", RatedKw);
        check.RatedVoltage("rated_kv", RatedKv, Bus);
        check.AboveZeroUpToOne("rated_power_factor", RatedPowerFactor);
        check.AboveZeroUpToOne("efficiency", Efficiency);
        check.Positive("locked_rotor_current_ratio", LockedRotorCurrentRatio);
        check.Unusual("locked_rotor_current_ratio", LockedRotorCurrentRatio, 2.0, 12.0, "times the rated current");
        check.AtLeastOne("pole_pairs", PolePairs);
        check.AtLeastOne("count", Count);
        check.AtMostOne(("x_over_r", XOverR.HasValue), ("r_over_x", ROverX.HasValue));
        check.ReactanceRatio(XOverR, ROverX);
        check.WithinPercent("rated_slip_percent", RatedSlipPercent);
        check.Positive("rated_slip_percent", RatedSlipPercent);
    }
}
