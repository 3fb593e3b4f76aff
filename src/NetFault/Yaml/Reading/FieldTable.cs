using System.Buffers;
using YamlDotNet.Core.Events;

namespace NetFault;

/// <summary>The fields of many elements one after the other, with their texts.</summary>
internal sealed class FieldTable : IDisposable
{
    private readonly string _text;

    /// <summary>Values that are not a piece of the text as it stands: in quotes, over several lines.</summary>
    private readonly Dictionary<int, string> _unlike = [];
    private Field[] _fields;

    public FieldTable(string text, int capacity)
    {
        _text = text;
        _fields = ArrayPool<Field>.Shared.Rent(capacity);
    }

    public int Count { get; private set; }

    public ref readonly Field this[int index] => ref _fields[index];

    /// <summary>Adds a field; its text is that of the event where it is a single value.</summary>
    public int Add(in Field field, ParsingEvent value)
    {
        if (Count == _fields.Length)
            Grow();
        if (value is Scalar scalar && !IsSlice(scalar.Value, field.Offset, field.Length))
            _unlike.Add(Count, scalar.Value);
        _fields[Count] = field;
        return Count++;
    }

    /// <summary>The text of a single value.</summary>
    public ReadOnlySpan<char> Span(int index) =>
        _unlike.Count > 0 && _unlike.TryGetValue(index, out var text)
            ? text.AsSpan()
            : _text.AsSpan(_fields[index].Offset, _fields[index].Length);

    /// <summary>The text of a single value.</summary>
    public string Text(int index) => Span(index).ToString();

    /// <summary>The field of a key within a range of fields; −1 where there is none.</summary>
    public int Find(int start, int end, int parent, int key)
    {
        for (var i = start; i < end; i++)
        {
            if (_fields[i].Key == key && _fields[i].Parent == parent)
                return i;
        }
        return -1;
    }

    /// <summary>Gives the array back: one that large would otherwise bring on a collection of everything for each file that is read.</summary>
    public void Dispose()
    {
        ArrayPool<Field>.Shared.Return(_fields);
        _fields = [];
        Count = 0;
    }

    private void Grow()
    {
        var larger = ArrayPool<Field>.Shared.Rent(2 * Count);
        Array.Copy(_fields, larger, Count);
        ArrayPool<Field>.Shared.Return(_fields);
        _fields = larger;
    }

    private bool IsSlice(string value, int offset, int length) =>
        value.Length == length && string.CompareOrdinal(value, 0, _text, offset, length) == 0;
}
