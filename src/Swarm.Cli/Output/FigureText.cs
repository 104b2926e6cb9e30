using Swarm.Engine.Summaries;

namespace Swarm.Cli.Output;

/// <summary>
/// A figure in words: value, error and interval, all rounded at the second significant digit of the standard error, so that no
/// digit is shown that sampling has not settled. Rounding moves a figure by a twentieth of its error at most.
/// </summary>
/// <param name="Value">The value.</param>
/// <param name="Error">The standard error, or a dash.</param>
/// <param name="Interval">The 95 % interval; empty where there is none.</param>
internal readonly record struct FigureText(string Value, string Error, string Interval)
{
    /// <summary>What stands for an error that a figure does not have.</summary>
    public const string NoError = "-";

    private const int MostDigits = 12;

    /// <summary>The figure in its own unit.</summary>
    public static FigureText Of(Estimate figure) => Of(figure, "");

    /// <summary>The figure, a share of one, in per cent.</summary>
    public static FigureText InPercent(Estimate figure)
    {
        var (value, error, low, high, reason) = figure;
        return Of(new Estimate(value * 100, error * 100, low * 100, high * 100, reason), " %");
    }

    /// <summary>Value and error in one cell.</summary>
    public string Joined => Error == NoError ? Value : $"{Value} ± {Error}";

    /// <summary>The decimal place that a figure is rounded at: a power of ten.</summary>
    public static int PlaceOf(double value, double standardError)
    {
        var atLeast = NumberText.Magnitude(value) - MostDigits + 1;
        var place = NumberText.Magnitude(standardError) - 1;

        // 0.0996 rounds to 0.100: its second digit has moved up a place.
        if (Math.Round(standardError / Math.Pow(10, place)) >= 100) place++;
        return Math.Max(place, atLeast);
    }

    private static FigureText Of(Estimate figure, string unit)
    {
        if (figure.StandardError is not { } error) return new FigureText($"{NumberText.Plain(figure.Value)}{unit}", NoError, "");
        if (!(error > 0)) return Settled(figure, unit);
        var place = PlaceOf(figure.Value, error);
        var interval = figure is { Low: { } low, High: { } high }
            ? $"{NumberText.AtPlace(low, place)} to {NumberText.AtPlace(high, place)}{unit}"
            : "";
        return new FigureText($"{NumberText.AtPlace(figure.Value, place)}{unit}", $"{NumberText.AtPlace(error, place)}{unit}", interval);
    }

    /// <summary>A figure that is the same in all trials.</summary>
    private static FigureText Settled(Estimate figure, string unit) => new(
        $"{NumberText.Plain(figure.Value)}{unit}",
        $"0{unit}",
        $"{NumberText.Plain(figure.Low ?? figure.Value)} to {NumberText.Plain(figure.High ?? figure.Value)}{unit}");
}
