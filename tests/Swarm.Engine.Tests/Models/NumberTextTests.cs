using System.Globalization;
using CsCheck;
using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Tests.Models;

public class NumberTextTests
{
    [Theory]
    [InlineData("0", 0)]
    [InlineData("-0.5", -0.5)]
    [InlineData("+3", 3)]
    [InlineData(".25", 0.25)]
    [InlineData("1_000_000", 1e6)]
    [InlineData("1_0.0_1", 10.01)]
    [InlineData("7.5%", 0.075)]
    [InlineData("99.9%", 0.999)]
    [InlineData("1.1%", 0.011)]
    [InlineData("2e3%", 20)]
    [InlineData("1E-6", 1e-6)]
    [InlineData("0e0", 0)]
    public void Numbers_are_read_to_the_nearest_double(string text, double expected)
    {
        Assert.True(NumberText.TryRead(text, out double value));
        Assert.Equal(expected, value);
    }

    [Theory]
    [InlineData("")]
    [InlineData("-")]
    [InlineData("%")]
    [InlineData("1,000")]
    [InlineData("1__0")]
    [InlineData("_1")]
    [InlineData("1_")]
    [InlineData("1.")]
    [InlineData("1.5.2")]
    [InlineData("1e")]
    [InlineData("1e5.5")]
    [InlineData("5%%")]
    [InlineData("5 %")]
    [InlineData(" 5")]
    [InlineData("0x10")]
    [InlineData("nan")]
    [InlineData("inf")]
    [InlineData("1e999")]
    [InlineData("1e-999")]
    [InlineData("1e99999")]
    [InlineData("\u0661")]
    public void Other_texts_are_no_numbers(string text) => Assert.False(NumberText.TryRead(text, out _));

    [Fact]
    public void A_printed_double_is_read_back_to_the_bit() =>
        Gen.Double.Where(double.IsFinite).Sample(
            x => NumberText.TryRead(x.ToString("R", CultureInfo.InvariantCulture), out double read)
                && BitConverter.DoubleToInt64Bits(read) == BitConverter.DoubleToInt64Bits(x),
            seed: "0N0XIzNsQ0O2");

    [Fact]
    public void A_percentage_is_the_decimal_with_its_point_moved() =>
        Gen.Int[0, 99_999].Sample(
            n => NumberText.TryRead($"{n / 1000}.{n % 1000:000}%", out double percent)
                && NumberText.TryRead($"0.{n:00000}", out double plain)
                && percent == plain,
            seed: "0N0XIzNsQ0O2");
}
