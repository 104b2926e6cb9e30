using System.Globalization;
using CsCheck;
using Swarm.Cli.Output;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Tests.Output;

public class FigureTextTests
{
    private static readonly Gen<(double Value, double Error)> Figures =
        from value in Gen.Double[-1e9, 1e9]
        from magnitude in Gen.Double[-4, 6]
        select (value, Math.Pow(10, magnitude));

    [Theory]
    [InlineData(18_680_856, 3_021, "18,680,900", "3,000")]
    [InlineData(18_680_856, 302.1, "18,680,860", "300")]
    [InlineData(0.45128, 0.00391, "0.4513", "0.0039")]
    [InlineData(0.45128, 0.00999, "0.451", "0.010")]
    [InlineData(-12.3456, 0.5, "-12.35", "0.50")]
    [InlineData(0.0004, 12, "0", "12")]
    [InlineData(-0.0004, 12, "0", "12")]
    [InlineData(2.5e17, 3e12, "2.500000e+17", "3,000,000,000,000")]
    public void Value_and_error_end_at_the_errors_second_digit(double value, double error, string shown, string shownError)
    {
        var text = FigureText.Of(new Estimate(value, error, value - (2 * error), value + (2 * error), null));

        Assert.Equal((shown, shownError), (text.Value, text.Error));
    }

    [Fact]
    public void Rounding_moves_a_figure_by_a_twentieth_of_its_error_at_most() =>
        Figures.Sample(
            figure =>
            {
                var text = FigureText.Of(new Estimate(figure.Value, figure.Error, figure.Value, figure.Value, null));
                return Math.Abs(Parse(text.Value) - figure.Value) <= (figure.Error / 20 * (1 + 1e-9)) + (1e-11 * Math.Abs(figure.Value))
                    && Math.Abs(Parse(text.Error) - figure.Error) <= (figure.Error / 20 * (1 + 1e-9)) + (1e-11 * Math.Abs(figure.Value));
            },
            seed: "0000KqV0Zz3f");

    [Fact]
    public void A_figure_without_error_keeps_its_whole_digits_and_five_significant_ones()
    {
        Assert.Equal(new FigureText("18,680,856", "-", ""), FigureText.Of(Estimate.Without(18_680_856.4, "too few")));
        Assert.Equal("0.10416", FigureText.Of(Estimate.Without(0.104163, "too few")).Value);
        Assert.Equal("0.2", FigureText.Of(Estimate.Without(0.2, "too few")).Value);
    }

    [Fact]
    public void What_never_varies_has_an_error_of_zero() =>
        Assert.Equal(new FigureText("100", "0", "100 to 100"), FigureText.Of(new Estimate(100, 0, 100, 100, null)));

    [Fact]
    public void A_share_is_shown_in_per_cent_with_the_unit_on_value_error_and_interval() =>
        Assert.Equal(
            new FigureText("0.403 %", "0.012 %", "0.381 to 0.426 %"),
            FigureText.InPercent(new Estimate(0.00403, 0.000117, 0.003811, 0.004258, null)));

    [Fact]
    public void A_figure_beyond_all_bounds_is_still_shown() =>
        Assert.Equal("Infinity", FigureText.Of(Estimate.Without(double.PositiveInfinity, "moments exceed the range")).Value);

    private static double Parse(string text) => double.Parse(text, NumberStyles.Float | NumberStyles.AllowThousands, CultureInfo.InvariantCulture);
}
