using YamlDotNet.Core.Events;

namespace NetFault;

/// <summary>The fields of many elements one after the other, with their texts.</summary>
internal sealed class FieldTable
{
    private readonly string _text;

    /// <summary>Values that are not a piece of the text as it stands: in quotes, over several lines.</summary>
    private readonly Dictionary<int, string> _unlike = [];
    private Field[] _fields;

    public FieldTable(string text, int capacity)
    {
        _text = text;
        _fields = new Field[capacity];
    }

    public int Count { get; private set; }

    public ref readonly Field this[int index] => ref _fields[index];

    /// <summary>Adds a field; its text is that of the event where it is a single value.</summary>
    public int Add(in Field field, ParsingEvent value)
    {
        if (Count == _fields.Length)
            Array.Resize(ref _fields, 2 * Count);
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

    private bool IsSlice(string value, int offset, int length) =>
        value.Length == length && string.CompareOrdinal(value, 0, _text, offset, length) == 0;
}
