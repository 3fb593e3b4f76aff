namespace NetFault.Tests.Support;

/// <summary>Large invented grids for tests of scale and speed.</summary>
internal static class Grids
{
    /// <summary>
    /// A rectangle of 110 kV buses: lines along the rows, and down from every fourth bus, so that the mesh is about as dense as that of
    /// real grids; a machine at every tenth bus.
    /// </summary>
    public static Network Meshed(int rows, int columns)
    {
        var builder = new NetworkBuilder { FrequencyHz = 50 };
        for (var i = 0; i < rows * columns; i++)
            builder.Add(new Bus { Id = $"B{i}", NominalKv = 110 });
        for (var i = 0; i < rows * columns; i++)
        {
            if (i % columns < columns - 1)
                builder.Add(MakeLine(i, i + 1));
            if (i % 4 == i / columns % 4 && i + columns < rows * columns)
                builder.Add(MakeLine(i, i + columns));
            if (i % 10 == 0)
                builder.Add(MakeMachine(i));
        }
        return builder.Build();
    }

    private static Line MakeLine(int from, int to) => new()
    {
        Id = $"L{from}-{to}", From = $"B{from}", To = $"B{to}", LengthKm = 5 + from * 7919 % 30, OhmPerKm = new Impedance(0.1, 0.4),
    };

    private static SynchronousMachine MakeMachine(int bus) => new()
    {
        Id = $"G{bus}", Bus = $"B{bus}", RatedMva = 60, ReactancePu = new MachineReactances(0.2, 0.3, 1.8), ArmatureResistancePu = 0.004,
    };
}
