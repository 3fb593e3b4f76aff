namespace NetFault;

/// <summary>The standard by which a circuit-breaker is rated: which ratings it has and what they mean.</summary>
public enum CircuitBreakerStandard
{
    /// <summary>IEC 62271-100, circuit-breakers above 1 kV.</summary>
    Iec62271_100,

    /// <summary>IEEE C37.04 with the preferred ratings of C37.06: circuit-breakers above 1 kV rated on a symmetrical current basis.</summary>
    IeeeC37_04,

    /// <summary>IEC/IEEE 62271-37-013, formerly IEEE C37.013: generator circuit-breakers.</summary>
    IecIeee62271_37_013,

    /// <summary>IEC 60947-2, low-voltage circuit-breakers.</summary>
    Iec60947_2,

    /// <summary>IEEE C37.13, low-voltage power circuit-breakers.</summary>
    IeeeC37_13,
}
