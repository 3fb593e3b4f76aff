using System.Globalization;

namespace NetFault;

/// <summary>Numbers as text that reads back to the same number.</summary>
internal static class RoundTrip
{
    /// <summary>The shortest such text.</summary>
    public static string Text(double value)
    {
        var text = value.ToString("R", CultureInfo.InvariantCulture);
        // .NET Framework's shortest form is not always exact.
        return double.Parse(text, CultureInfo.InvariantCulture).Equals(value) ? text : value.ToString("G17", CultureInfo.InvariantCulture);
    }
}
