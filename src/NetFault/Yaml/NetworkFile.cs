using System.Buffers;
using System.Text;

namespace NetFault;

/// <summary>
/// Reads and writes network files, format 1: YAML text that <c>docs/network-file.md</c> describes key by key. All of a file's problems are
/// reported together, each with its line and column.
/// </summary>
public static class NetworkFile
{
    /// <summary>The largest file that is read, in bytes: 64 MiB. A network of 10,000 buses takes about 2.</summary>
    public const int MaximumBytes = 64 * 1024 * 1024;

    /// <summary>The most problems that are listed of one file; a file with more of them is not read further.</summary>
    public const int MaximumProblems = 10_000;

    /// <summary>Reads a network file.</summary>
    /// <param name="path">The file's path.</param>
    /// <returns>The network; what is odd but possible is in <see cref="Network.Warnings"/>.</returns>
    /// <exception cref="NetworkFileException">The file has errors; the exception lists every problem.</exception>
    /// <exception cref="FileNotFoundException">There is no such file.</exception>
    /// <exception cref="IOException">The file cannot be read.</exception>
    public static Network Read(string path) => NetworkOf(Check(path), path);

    /// <summary>Reads a network file from a stream, which stays open.</summary>
    /// <param name="stream">The stream, read to its end.</param>
    /// <param name="fileName">The file's name in messages.</param>
    /// <exception cref="NetworkFileException">The file has errors; the exception lists every problem.</exception>
    public static Network Read(Stream stream, string fileName = "network.yaml") => NetworkOf(Check(stream, fileName), fileName);

    /// <summary>Reads the text of a network file.</summary>
    /// <param name="text">The text.</param>
    /// <param name="fileName">The file's name in messages.</param>
    /// <exception cref="NetworkFileException">The text has errors; the exception lists every problem.</exception>
    public static Network Parse(string text, string fileName = "network.yaml") => NetworkOf(CheckText(text, fileName), fileName);

    /// <summary>Reads a network file and gives its problems as a result; for editors and checks of many files.</summary>
    /// <param name="path">The file's path.</param>
    /// <exception cref="FileNotFoundException">There is no such file.</exception>
    /// <exception cref="IOException">The file cannot be read.</exception>
    public static NetworkFileResult Check(string path)
    {
        using var stream = File.OpenRead(Guard.NotNull(path));
        return Check(stream, path);
    }

    /// <summary>Reads a network file from a stream, which stays open, and gives its problems as a result.</summary>
    /// <param name="stream">The stream, read to its end.</param>
    /// <param name="fileName">The file's name in messages.</param>
    public static NetworkFileResult Check(Stream stream, string fileName = "network.yaml")
    {
        Guard.NotNull(fileName);
        var bytes = FileBytes.ReadAll(Guard.NotNull(stream), MaximumBytes);
        var isTooLarge = bytes.Count > MaximumBytes;
        (Problem Problem, int Offset)? problem = isTooLarge ? (FileProblems.TooLarge(MaximumBytes), 0) : null;
        var text = isTooLarge ? string.Empty : FileBytes.Decode(bytes, out problem);
        ArrayPool<byte>.Shared.Return(bytes.Array!);
        return problem is var (what, offset) ? Refuse(fileName, text, what, offset) : CheckDecoded(text, fileName);
    }

    /// <summary>Reads the text of a network file and gives its problems as a result.</summary>
    /// <param name="text">The text.</param>
    /// <param name="fileName">The file's name in messages.</param>
    public static NetworkFileResult CheckText(string text, string fileName = "network.yaml")
    {
        Guard.NotNull(text);
        Guard.NotNull(fileName);
        if (text.Length > MaximumBytes)
            return Refuse(fileName, string.Empty, FileProblems.TooLarge(MaximumBytes), 0);
        return CheckDecoded(text.Length > 0 && text[0] == '\uFEFF' ? text.Substring(1) : text, fileName);
    }

    /// <summary>
    /// Writes a network as a file that reads back as the same: elements, order, forms of data, notes and title. Comments of a file that the
    /// network was read from are not kept. An existing file is replaced.
    /// </summary>
    /// <param name="network">The network.</param>
    /// <param name="path">The file's path.</param>
    /// <exception cref="ArgumentException">A text holds half a surrogate pair, which no file can hold.</exception>
    /// <exception cref="IOException">The file cannot be written.</exception>
    public static void Write(Network network, string path)
    {
        var text = ToText(network);
        File.WriteAllText(Guard.NotNull(path), text, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false));
    }

    /// <summary>The text of a network's file, with LF line ends; see <see cref="Write"/>.</summary>
    /// <param name="network">The network.</param>
    /// <exception cref="ArgumentException">A text holds half a surrogate pair, which no file can hold.</exception>
    public static string ToText(Network network) => NetworkFileWriter.Write(Guard.NotNull(network));

    private static NetworkFileResult CheckDecoded(string text, string fileName)
    {
        var problems = new ProblemList(new SourceText(fileName, text), MaximumProblems);
        var gathered = NetworkFileReader.Read(problems);
        using var fields = gathered.Elements.Fields;
        return FileCompletion.Complete(gathered, problems);
    }

    private static NetworkFileResult Refuse(string fileName, string text, Problem problem, int offset)
    {
        var place = new SourceText(fileName, text).Locate(offset, 1);
        return new NetworkFileResult(null, [problem.At(null, null, null) with { Location = place }]);
    }

    private static Network NetworkOf(NetworkFileResult result, string fileName) =>
        result.Network ?? throw new NetworkFileException(fileName, result.Diagnostics);
}
