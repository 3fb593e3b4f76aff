namespace NetFault;

/// <summary>
/// The keys of an element or of a mapping within it, asked for by name. Two things stand behind it: an element of a file, and the recorder
/// that learns from the asking which keys there are.
/// </summary>
internal interface IFields
{
    /// <summary>The element's id.</summary>
    string Id { get; }

    /// <summary>A number that must be there; NaN in place of a bad one.</summary>
    double RequiredNumber(string key);

    /// <summary>A number; null where there is none, NaN in place of a bad one.</summary>
    double? Number(string key);

    /// <summary>A whole number that must be there; null in place of a bad one.</summary>
    int? RequiredWhole(string key);

    /// <summary>A whole number; null where there is none or a bad one.</summary>
    int? Whole(string key);

    /// <summary>The id of another element, which must be there.</summary>
    string RequiredReference(string key);

    /// <summary>The id of another element; null where there is none.</summary>
    string? Reference(string key);

    /// <summary>Free text; null where there is none.</summary>
    string? Text(string key);

    /// <summary>true or false, which must be there.</summary>
    bool RequiredFlag(string key);

    /// <summary>true or false; null where there is none.</summary>
    bool? Flag(string key);

    /// <summary>The position of the word among the choices, which must be there; null in place of a bad one.</summary>
    int? RequiredChoice(string key, params string[] words);

    /// <summary>The position of the word among the choices; null where there is none.</summary>
    int? Choice(string key, params string[] words);

    /// <summary>A mapping of further keys. Where there is none its keys are absent; those it requires are missed only where it stands.</summary>
    IFields Group(string key, bool required, out bool given);

    /// <summary>A number, or a mapping of further keys with the same meaning in different cases.</summary>
    IFields NumberOrGroup(string key, out double? number, out bool given);
}

/// <summary>Values that several kinds of elements have.</summary>
internal static class FieldsExtensions
{
    public static bool InService(this IFields fields) => fields.Flag("in_service") ?? true;

    public static string? Note(this IFields fields) => fields.Text("note");

    /// <summary>The section of the element that a device feeds; null where there is none.</summary>
    public static string? FeedsSection(this IFields fields) =>
        fields.Choice("feeds_section", FedElements.Sections) is { } choice ? FedElements.Sections[choice] : null;

    /// <summary>A mapping of <c>r</c> and <c>x</c>.</summary>
    public static Impedance? Impedance(this IFields fields, string key)
    {
        var group = fields.Group(key, required: false, out var given);
        var value = new Impedance(group.RequiredNumber("r"), group.RequiredNumber("x"));
        return given ? value : null;
    }

    /// <summary>A number, or a mapping of <c>max</c> and <c>min</c>.</summary>
    public static MaxMin? MaxMin(this IFields fields, string key)
    {
        var group = fields.NumberOrGroup(key, out var number, out var given);
        var value = new MaxMin(group.RequiredNumber("max"), group.RequiredNumber("min"));
        return number.HasValue ? new MaxMin(number.GetValueOrDefault()) : given ? value : null;
    }

    /// <summary>A mapping with one number for each winding.</summary>
    public static WindingValues WindingValues(this IFields fields, string key)
    {
        var group = fields.Group(key, required: true, out _);
        return new WindingValues(group.Number("hv"), group.Number("mv"), group.Number("lv"));
    }

    /// <summary>A mapping with one number for each pair of windings.</summary>
    public static WindingPairValues WindingPairValues(this IFields fields, string key)
    {
        var group = fields.Group(key, required: true, out _);
        return new WindingPairValues(group.Number("hv_mv"), group.Number("hv_lv"), group.Number("mv_lv"));
    }
}
