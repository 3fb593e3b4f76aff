namespace NetFault;

/// <summary>Finds the known names that look most like a mistyped one.</summary>
internal static class NearestNames
{
    /// <summary>Names longer than this are not compared: nobody mistypes a whole sentence.</summary>
    private const int LongestName = 64;

    /// <summary>A remedy that names the nearest of the known names, or null where none is near.</summary>
    public static string? Suggestion(string name, IEnumerable<string> known)
    {
        var nearest = Find(name, known, 3);
        return nearest.Count == 0 ? null : "did you mean " + string.Join(" or ", nearest.Select(one => $"\"{one}\"")) + "?";
    }

    /// <summary>
    /// At most <paramref name="most"/> of the known names, nearest first: those that differ in case alone, or by an optimal string
    /// alignment distance of at most a third of the name's length.
    /// </summary>
    public static IReadOnlyList<string> Find(string name, IEnumerable<string> known, int most)
    {
        if (name.Length is 0 or > LongestName)
            return [];
        var limit = name.Length == 1 ? 0 : Math.Max(1, name.Length / 3);
        return known
            .Where(other => Math.Abs(other.Length - name.Length) <= limit)
            .Select(other => (Name: other, Distance: Distance(name, other)))
            .Where(pair => pair.Distance <= limit)
            .OrderBy(pair => pair.Distance)
            .ThenBy(pair => pair.Name, StringComparer.Ordinal)
            .Take(most)
            .Select(pair => pair.Name)
            .ToList();
    }

    /// <summary>Insertions, deletions, replacements and swaps of neighbours that lead from one to the other, letters' case apart.</summary>
    internal static int Distance(string one, string other)
    {
        int[] twoBack = new int[other.Length + 1], last = new int[other.Length + 1], row = new int[other.Length + 1];
        for (var j = 0; j <= other.Length; j++)
            last[j] = j;
        for (var i = 1; i <= one.Length; i++)
        {
            row[0] = i;
            for (var j = 1; j <= other.Length; j++)
            {
                row[j] = Math.Min(Math.Min(row[j - 1], last[j]) + 1, last[j - 1] + (Same(one[i - 1], other[j - 1]) ? 0 : 1));
                if (i > 1 && j > 1 && Same(one[i - 1], other[j - 2]) && Same(one[i - 2], other[j - 1]))
                    row[j] = Math.Min(row[j], twoBack[j - 2] + 1);
            }
            (twoBack, last, row) = (last, row, twoBack);
        }
        return last[other.Length];
    }

    private static bool Same(char one, char other) => char.ToUpperInvariant(one) == char.ToUpperInvariant(other);
}
