namespace NetFault;

/// <summary>The sections of format 1, in the order in which they are written.</summary>
internal static class AllSections
{
    public static IReadOnlyList<Section> InOrder { get; } =
    [
        new BusSection(), new NetworkFeederSection(), new SynchronousMachineSection(), new AsynchronousMotorSection(),
        new ConverterFedDriveSection(), new FullConverterSourceSection(), new DoublyFedGeneratorSection(),
        new TransformerSection(), new ThreeWindingTransformerSection(), new LineSection(), new SeriesReactorSection(),
        new SeriesCapacitorSection(), new BusCouplerSection(),
        new CircuitBreakerSection(), new SwitchSection(), new BusbarSection(), new FuseSection(),
    ];

    /// <summary>The position of a section in <see cref="InOrder"/>; −1 where it is none.</summary>
    public static int IndexOf(string name)
    {
        for (var i = 0; i < InOrder.Count; i++)
        {
            if (InOrder[i].Name == name)
                return i;
        }
        return -1;
    }

    public static Section? Find(string name) => InOrder.FirstOrDefault(one => one.Name == name);
}
