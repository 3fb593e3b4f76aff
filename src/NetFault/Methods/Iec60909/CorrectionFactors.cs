namespace NetFault;

/// <summary>
/// The impedance correction factors of IEC 60909-0:2016, clause 6. All take cmax of table 1, in the minimum case too. Reactances are per
/// unit on the element's own rating.
/// </summary>
internal static class CorrectionFactors
{
    /// <summary>K_T of a network transformer (6.3.3): 0.95·cmax/(1 + 0.6·xT).</summary>
    /// <param name="cMax">cmax of the network at the low-voltage side.</param>
    /// <param name="xT">Relative reactance of the transformer, or of a pair of windings.</param>
    public static double Transformer(double cMax, double xT) => 0.95 * cMax / (1.0 + 0.6 * xT);

    /// <summary>K_G of a generator connected directly (6.6.1): (Un/UrG)·cmax/(1 + x″d·sin φrG).</summary>
    /// <param name="nominalKv">Un.</param>
    /// <param name="terminalKv">UrG, or UG = UrG·(1 + pG) where the terminal voltage differs for good.</param>
    /// <param name="cMax">cmax.</param>
    /// <param name="xd">x″d.</param>
    /// <param name="sinPhi">sin φrG.</param>
    public static double Generator(double nominalKv, double terminalKv, double cMax, double xd, double sinPhi) =>
        nominalKv / terminalKv * cMax / (1.0 + xd * sinPhi);

    /// <summary>K_S of a power station unit with on-load tap changer (6.7.1): (UnQ²/UrG²)·(UrTLV²/UrTHV²)·cmax/(1 + |x″d − xT|·sin φrG).</summary>
    public static double UnitWithTapChanger(double nominalKv, double generatorKv, double ratio, double cMax, double xd, double xT, double sinPhi)
    {
        var voltage = nominalKv / (generatorKv * ratio);
        return voltage * voltage * cMax / (1.0 + Math.Abs(xd - xT) * sinPhi);
    }

    /// <summary>
    /// K_SO of a power station unit without on-load tap changer (6.7.2):
    /// UnQ/(UrG·(1 + pG))·(UrTLV/UrTHV)·(1 ± pT)·cmax/(1 + x″d·sin φrG).
    /// </summary>
    public static double UnitWithoutTapChanger(
        double nominalKv, double generatorKv, double ratio, double regulation, double tap, double cMax, double xd, double sinPhi) =>
        nominalKv / (generatorKv * (1.0 + regulation) * ratio) * (1.0 + tap) * cMax / (1.0 + xd * sinPhi);

    /// <summary>
    /// K_G,S, or K_G,SO with 1/(1 + pG), of the generator for faults between it and its unit transformer (7.2, short circuits inside the
    /// power station unit): cmax/(1 + x″d·sin φrG).
    /// </summary>
    public static double GeneratorInsideUnit(double regulation, double cMax, double xd, double sinPhi) =>
        cMax / (1.0 + xd * sinPhi) / (1.0 + regulation);

    /// <summary>
    /// K_T,S, or K_T,SO with 1/(1 + pG), of the unit transformer for faults between it and the generator: cmax/(1 − xT·sin φrG).
    /// </summary>
    public static double TransformerInsideUnit(double regulation, double cMax, double xT, double sinPhi) =>
        cMax / (1.0 - xT * sinPhi) / (1.0 + regulation);
}
