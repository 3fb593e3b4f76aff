using System.Numerics;

namespace NetFault.Tests.Support;

/// <summary>Assertions on complex numbers: relative to the magnitude expected.</summary>
internal static class ComplexAssertions
{
    public static ComplexSubject Should(this Complex actual) => new(actual);

    internal readonly record struct ComplexSubject(Complex Actual)
    {
        public void BeCloseTo(Complex expected, double relative = 1e-12) =>
            (Actual - expected).Magnitude.Should().BeLessThanOrEqualTo(relative * expected.Magnitude, $"{Actual} should be {expected}");

        public void Be(Complex expected) => Actual.Equals(expected).Should().BeTrue($"{Actual} should be {expected}");
    }
}
