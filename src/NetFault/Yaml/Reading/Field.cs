namespace NetFault;

/// <summary>The kind of a value as it stands in the file.</summary>
internal enum FieldKind
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

/// <summary>A key of an element with its value, as it stands in the file.</summary>
internal struct Field
{
    public string Key;

    /// <summary>The text of a single value.</summary>
    public string Text;
    public FieldKind Kind;

    /// <summary>The position in the element's fields of the mapping that holds this key; −1 for the element itself.</summary>
    public int Parent;
    public int KeyOffset;
    public int KeyLength;
    public int Offset;
    public int Length;
}
