using System.Runtime.CompilerServices;

namespace NetFault.Tests.Examples;

/// <summary>The files of the repository in which the tests were built, found from this source file's place.</summary>
internal static class Repository
{
    /// <summary>The path of a file, given from the repository's root with slashes.</summary>
    public static string PathOf(string file) => Path.Combine([Root(), .. file.Split('/')]);

    /// <summary>The text of a file, with LF line ends whatever the checkout made of them.</summary>
    public static string Text(string file) => File.ReadAllText(PathOf(file)).Replace("\r\n", "\n");

    private static string Root([CallerFilePath] string thisFile = "") =>
        Path.GetFullPath(Path.Combine(Path.GetDirectoryName(thisFile)!, "..", "..", ".."));
}
