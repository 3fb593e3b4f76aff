namespace NetFault;

/// <summary>
/// A section of the network file: how elements of one kind are read and written. A subclass names each key once in
/// <see cref="Read"/> and once in <see cref="Write"/>; the keys that are known, required and suggested follow from
/// <see cref="Read"/> itself.
/// </summary>
internal abstract class Section
{
    private readonly Lazy<KeySet> _keys;

    protected Section()
    {
        _keys = new Lazy<KeySet>(() => KeyRecorder.Record(Read));
    }

    /// <summary>The name of the section in the file.</summary>
    public abstract string Name { get; }

    /// <summary>What an element of it looks like, for messages.</summary>
    public abstract string Shape { get; }

    /// <summary>The keys of an element.</summary>
    public KeySet Keys => _keys.Value;

    /// <summary>
    /// Makes an element of the fields; asks for every key, whatever the others say. Where a value is bad or missing, the fields have
    /// reported it and give a stand-in.
    /// </summary>
    public abstract NetworkElement Read(IFields fields);

    /// <summary>The elements of this kind.</summary>
    public abstract IReadOnlyList<NetworkElement> Of(Network network);

    /// <summary>Writes the keys of an element.</summary>
    public abstract void Write(NetworkElement element, FieldWriter fields);
}

/// <inheritdoc/>
internal abstract class Section<T> : Section where T : NetworkElement
{
    /// <inheritdoc/>
    public sealed override void Write(NetworkElement element, FieldWriter fields)
    {
        Write((T)element, fields);
        fields.Flag("in_service", element.InService ? null : false);
        fields.Text("note", element.Note);
    }

    /// <summary>Writes the keys that elements of this kind have beside <c>in_service</c> and <c>note</c>.</summary>
    protected abstract void Write(T element, FieldWriter fields);
}
