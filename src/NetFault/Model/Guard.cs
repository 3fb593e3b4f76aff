using System.Runtime.CompilerServices;

namespace NetFault;

/// <summary>The guards of public entry points; inside, values are trusted.</summary>
internal static class Guard
{
    /// <summary>The value, or an <see cref="ArgumentNullException"/>.</summary>
    public static T NotNull<T>(T? value, [CallerArgumentExpression(nameof(value))] string name = "") where T : class =>
        value ?? throw new ArgumentNullException(name);

    /// <summary>The value, or an <see cref="ArgumentOutOfRangeException"/> where it is negative or not finite.</summary>
    public static double NotNegative(double value, [CallerArgumentExpression(nameof(value))] string name = "") =>
        value >= 0 && !double.IsInfinity(value)
            ? value
            : throw new ArgumentOutOfRangeException(name, value, "must be a finite number that is not negative");

    /// <summary>The value, or an <see cref="ArgumentOutOfRangeException"/> where it is not finite.</summary>
    public static double Finite(double value, [CallerArgumentExpression(nameof(value))] string name = "") =>
        !double.IsNaN(value) && !double.IsInfinity(value)
            ? value
            : throw new ArgumentOutOfRangeException(name, value, "must be a finite number");

    /// <summary>The value, or an <see cref="ArgumentOutOfRangeException"/> where it is not above 0 or not finite.</summary>
    public static double Positive(double value, [CallerArgumentExpression(nameof(value))] string name = "") =>
        value > 0 && !double.IsInfinity(value)
            ? value
            : throw new ArgumentOutOfRangeException(name, value, "must be a finite number above 0");

    /// <summary>The value, or an <see cref="ArgumentOutOfRangeException"/> where it is none of those allowed.</summary>
    public static T OneOf<T>(T value, params T[] allowed) where T : struct, Enum =>
        Array.IndexOf(allowed, value) >= 0
            ? value
            : throw new ArgumentOutOfRangeException(nameof(value), value, "must be " + string.Join(" or ", allowed));
}
