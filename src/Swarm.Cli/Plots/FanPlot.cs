using ScottPlot;
using Swarm.Engine.Plans;

namespace Swarm.Cli.Plots;

/// <summary>A quantity over periods or steps: its mean, and bands that hold half, nine tenths and 99 % of the trials.</summary>
internal static class FanPlot
{
    private const double Headroom = 1.08;

    private static readonly (double Tail, string Name, double Alpha)[] Bands =
        [(0.005, "99 % of trials", 0.25), (0.05, "90 %", 0.35), (0.25, "50 %", 0.5)];

    public static Plot Draw(IReadOnlyList<ReportedResult> parts, string title, string horizontal, string vertical)
    {
        var plot = Sheet.Create(title, horizontal, vertical);
        double[] places = [.. Enumerable.Range(0, parts.Count).Select(i => (double)i)];
        foreach (var (tail, name, alpha) in Bands)
        {
            var band = plot.Add.FillY(places, Quantiles(parts, tail), Quantiles(parts, 1 - tail));
            band.FillColor = Palette.SkyBlue.WithAlpha(alpha);
            band.LineWidth = 0;
            band.LegendText = name;
        }

        var median = plot.Add.Scatter(places, Quantiles(parts, 0.5), Palette.Blue);
        median.LineWidth = 2;
        median.LegendText = "median";
        var mean = plot.Add.Scatter(places, [.. parts.Select(part => part.Result.Summary.Moments.Mean)], Palette.Vermilion);
        mean.LineWidth = 2;
        mean.LinePattern = LinePattern.DenselyDashed;
        mean.MarkerShape = MarkerShape.OpenCircle;
        mean.LegendText = "mean";
        Sheet.Name(plot, [.. parts.Select(part => part.Label)]);
        plot.Axes.SetLimitsX(-0.3, parts.Count - 0.7);
        if (parts.All(part => part.Result.Summary.Moments.Min >= 0))
            plot.Axes.SetLimitsY(0, Quantiles(parts, 1 - Bands[0].Tail).Max() * Headroom);
        plot.ShowLegend(Edge.Right);
        return plot;
    }

    private static double[] Quantiles(IReadOnlyList<ReportedResult> parts, double p) =>
        [.. parts.Select(part => part.Result.Summary.Digest.Quantile(p))];
}
