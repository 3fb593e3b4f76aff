using System.Runtime.CompilerServices;

namespace NetFault.Tests.Yaml;

/// <summary>The files beside these tests, found by the place of this source.</summary>
internal static class TestFiles
{
    public static string Folder(string name) => Path.Combine(Here(), name);

    public static string Repository(string path) => Path.Combine(Here(), "..", "..", "..", path);

    public static IEnumerable<object[]> Names(string folder) =>
        Directory.GetFiles(Folder(folder), "*.yaml").Order(StringComparer.Ordinal).Select(path => new object[] { Path.GetFileName(path) });

    private static string Here([CallerFilePath] string source = "") => Path.GetDirectoryName(source)!;
}
