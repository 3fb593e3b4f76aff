using YamlDotNet.Core;
using YamlDotNet.Core.Events;

namespace NetFault;

/// <summary>The kind of a value as it stands in the file.</summary>
internal enum FieldKind : byte
{
    /// <summary>Nothing after the colon.</summary>
    Blank,

    /// <summary>A single value without quotes.</summary>
    Plain,

    /// <summary>A single value in quotes, or a text block.</summary>
    Quoted,

    /// <summary>A mapping of keys to values.</summary>
    Mapping,

    /// <summary>A list.</summary>
    List,

    /// <summary>Something that has been reported already.</summary>
    Refused,
}

/// <summary>
/// A known key with its value, as offsets into the text: 16 bytes. Without references on purpose: the fields of a whole file stand in one
/// array while it is scanned, and the garbage collector need not look at them.
/// </summary>
internal readonly struct Field
{
    /// <summary>The position of the key in its <see cref="KeySet"/>; there are at most 127 keys in one.</summary>
    public required sbyte Key { get; init; }

    /// <summary>The position, among the element's fields, of the mapping that holds this key; −1 for the element itself.</summary>
    public required sbyte Parent { get; init; }

    public required FieldKind Kind { get; init; }

    /// <summary>The length of the key as it is written, in quotes perhaps; longer keys are none that is known.</summary>
    public required byte KeyLength { get; init; }

    public required int KeyOffset { get; init; }

    public required int Offset { get; init; }

    public required int Length { get; init; }

    /// <summary>Where to show the field: a single value itself, the key where there is more or less than that.</summary>
    public (int Offset, int Length) Place =>
        Kind is FieldKind.Plain or FieldKind.Quoted ? (Offset, Length) : (KeyOffset, KeyLength);

    /// <summary>The kind of value that an event starts.</summary>
    public static FieldKind KindOf(ParsingEvent value) => value switch
    {
        Scalar { Style: ScalarStyle.Plain } scalar => scalar.Value.Length == 0 ? FieldKind.Blank : FieldKind.Plain,
        Scalar => FieldKind.Quoted,
        MappingStart => FieldKind.Mapping,
        SequenceStart => FieldKind.List,
        _ => FieldKind.Refused,
    };
}
