namespace NetFault;

/// <summary>An element with one of its terminals at another bus.</summary>
internal static class MovedTerminal
{
    /// <summary>The copy.</summary>
    /// <param name="element">A branch, source or coupler.</param>
    /// <param name="from">The bus at which the terminal is.</param>
    /// <param name="to">The bus at which it is in the copy.</param>
    public static NetworkElement Of(NetworkElement element, string from, string to)
    {
        string At(string bus) => bus == from ? to : bus;
        string? AtOpen(string? bus) => bus == from ? to : bus;
        return element switch
        {
            ShuntElement source => source with { Bus = to },
            Transformer one when one.Hv == from => one with { Hv = to },
            Transformer one => one with { Lv = At(one.Lv) },
            ThreeWindingTransformer one => one with { Hv = AtOpen(one.Hv), Mv = AtOpen(one.Mv), Lv = AtOpen(one.Lv) },
            Line one => one with { From = At(one.From), To = At(one.To) },
            SeriesReactor one => one with { From = At(one.From), To = At(one.To) },
            SeriesCapacitor one => one with { From = At(one.From), To = At(one.To) },
            BusCoupler one => one with { From = At(one.From), To = At(one.To) },
            _ => throw new ArgumentException($"{element.Section} have no terminal", nameof(element)),
        };
    }
}
