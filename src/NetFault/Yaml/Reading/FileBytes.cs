using System.Buffers;
using System.Text;

namespace NetFault;

/// <summary>Turns the bytes of a file into text: UTF-8 with or without a byte order mark, and nothing else.</summary>
internal static class FileBytes
{
    private static readonly UTF8Encoding Strict = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    /// <summary>All bytes of a stream, in a rented array; where it has more than the limit, a few more than the limit.</summary>
    public static ArraySegment<byte> ReadAll(Stream stream, int limit)
    {
        var expected = stream.CanSeek ? Math.Min(stream.Length - stream.Position, limit) : 0;
        var bytes = ArrayPool<byte>.Shared.Rent((int)Math.Max(4096, expected + 1));
        var count = 0;
        for (int read; count <= limit && (read = stream.Read(bytes, count, bytes.Length - count)) > 0;)
        {
            count += read;
            if (count == bytes.Length)
                bytes = Larger(bytes);
        }
        return new ArraySegment<byte>(bytes, 0, count);
    }

    private static byte[] Larger(byte[] bytes)
    {
        var larger = ArrayPool<byte>.Shared.Rent(2 * bytes.Length);
        bytes.CopyTo(larger, 0);
        ArrayPool<byte>.Shared.Return(bytes);
        return larger;
    }

    /// <summary>The text that the bytes are, and a problem with its offset where they are not all of it.</summary>
    public static string Decode(ArraySegment<byte> bytes, out (Problem Problem, int Offset)? problem)
    {
        var array = bytes.Array!;
        problem = null;
        if (OtherEncoding(array, bytes.Count) is { } encoding)
        {
            problem = (FileProblems.OtherEncoding(encoding), 0);
            return string.Empty;
        }
        var start = bytes.Count >= 3 && array[0] == 0xEF && array[1] == 0xBB && array[2] == 0xBF ? 3 : 0;
        try
        {
            return Strict.GetString(array, start, bytes.Count - start);
        }
        catch (DecoderFallbackException exception)
        {
            var text = Encoding.UTF8.GetString(array, start, bytes.Count - start);
            var first = exception.BytesUnknown is { Length: > 0 } unknown ? unknown[0] : (byte)0;
            problem = (FileProblems.NotUtf8(first), Math.Max(0, text.IndexOf('\uFFFD')));
            return text;
        }
    }

    /// <summary>The name of the encoding, by its mark or by the zero bytes that western text has in it; null for what may be UTF-8.</summary>
    private static string? OtherEncoding(byte[] bytes, int count) => count < 2 ? null : (bytes[0], bytes[1]) switch
    {
        (0xFF, 0xFE) => "UTF-16 (little-endian)",
        (0xFE, 0xFF) => "UTF-16 (big-endian)",
        (>= (byte)' ', 0) => "UTF-16 (little-endian)",
        (0, >= (byte)' ') => "UTF-16 (big-endian)",
        _ => null,
    };
}
