using System.Globalization;
using CsCheck;

namespace NetFault.Tests.Yaml;

public class NumberTests
{
    [Theory]
    [InlineData("0", 0.0)]
    [InlineData("-0", 0.0)]
    [InlineData("11", 11.0)]
    [InlineData("+11", 11.0)]
    [InlineData("-0.25", -0.25)]
    [InlineData("0.1", 0.1)]
    [InlineData("1e3", 1000.0)]
    [InlineData("1E+3", 1000.0)]
    [InlineData("2.5e-3", 0.0025)]
    [InlineData("123456789.123456789", 123456789.123456789)]
    [InlineData("9007199254740993", 9007199254740992.0)]
    [InlineData("0.000000000000000000000000000001", 1e-30)]
    [InlineData("1.7976931348623157e308", double.MaxValue)]
    public void What_a_number_is(string text, double expected)
    {
        StrictNumber.TryParse(text.AsSpan(), out var value).Should().BeTrue();
        value.Should().Be(expected);
        StrictNumber.IsInRange(text.AsSpan(), value).Should().BeTrue();
    }

    [Theory]
    [InlineData("")]
    [InlineData("-")]
    [InlineData("--1")]
    [InlineData("01")]
    [InlineData("-01.5")]
    [InlineData("1.")]
    [InlineData(".1")]
    [InlineData("1.e3")]
    [InlineData("1e")]
    [InlineData("1e+")]
    [InlineData("1e3.5")]
    [InlineData("1_0")]
    [InlineData("1,0")]
    [InlineData("1:0")]
    [InlineData("0x1")]
    [InlineData("1 ")]
    [InlineData(" 1")]
    [InlineData("1f")]
    [InlineData("１")]
    [InlineData("NaN")]
    [InlineData("∞")]
    public void What_no_number_is(string text) => StrictNumber.TryParse(text.AsSpan(), out _).Should().BeFalse();

    [Theory]
    [InlineData("1e309")]
    [InlineData("-1e309")]
    [InlineData("1e-400")]
    [InlineData("0.0e5", true)]
    public void What_a_double_cannot_hold_is_out_of_range(string text, bool inRange = false)
    {
        StrictNumber.TryParse(text.AsSpan(), out var value).Should().BeTrue();
        StrictNumber.IsInRange(text.AsSpan(), value).Should().Be(inRange);
    }

    [Fact]
    public void Every_double_reads_back_as_itself() =>
        Gen.Double.Where(value => !double.IsNaN(value) && !double.IsInfinity(value)).Sample(value =>
        {
            var text = YamlScalar.Number(value);
            return StrictNumber.TryParse(text.AsSpan(), out var back) && back.Equals(value);
        });

    /// <summary>The quick way for short numbers agrees with the framework's parser.</summary>
    [Fact]
    public void Short_decimals_are_read_exactly() =>
        Gen.Select(Gen.Long[-999_999_999_999_999, 999_999_999_999_999], Gen.Int[0, 15]).Sample((digits, point) =>
        {
            var magnitude = Math.Abs(digits).ToString(CultureInfo.InvariantCulture).PadLeft(point + 1, '0');
            var text = (digits < 0 ? "-" : "") + magnitude.Insert(magnitude.Length - point, point == 0 ? "" : ".");
            return StrictNumber.TryParse(text.AsSpan(), out var value) && value.Equals(double.Parse(text, CultureInfo.InvariantCulture));
        });
}
