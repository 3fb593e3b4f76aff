using System.Buffers;

namespace NetFault.Sparse;

/// <summary>An array from the shared pool for the time of a <c>using</c>; what was in it is anything.</summary>
internal readonly ref struct Scratch<T>
{
    private readonly T[] array;
    private readonly int length;

    /// <param name="length">Elements wanted.</param>
    public Scratch(int length)
    {
        array = ArrayPool<T>.Shared.Rent(length);
        this.length = length;
    }

    /// <summary>The elements asked for.</summary>
    public Span<T> Span => array.AsSpan(0, length);

    /// <summary>For <c>fixed</c>.</summary>
    public ref T GetPinnableReference() => ref array[0];

    /// <summary>Gives the array back.</summary>
    public void Dispose() => ArrayPool<T>.Shared.Return(array);
}
