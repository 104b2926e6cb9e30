using System.Globalization;
using ScottPlot;
using ScottPlot.TickGenerators;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Plots;

/// <summary>The probability to be worse than a value, on a logarithmic axis, with the 95 % band of the value.</summary>
internal static class ExceedancePlot
{
    private const int PointsPerDecade = 24;
    private const double Common = 0.9;
    private const double FewestTailTrials = 10;

    public static Plot Draw(OutcomeResult result, ErrorMethod errors, string axis)
    {
        var low = result.Request.Adverse == Adverse.Low;
        var plot = Sheet.Create(
            $"{result.Request.Name}: probability of a {(low ? "smaller" : "larger")} value",
            axis,
            low ? "probability of less" : "probability of more");
        var grid = result with { Request = result.Request with { Levels = Grid(result, errors) } };
        var levels = Figures.Of(grid, errors).Levels;
        double[] heights = [.. levels.Select(level => Math.Log10(1 - level.P))];
        DrawBand(plot, [.. levels.Zip(heights).Where(pair => pair.First.Var is { Low: not null, High: not null })]);
        var curve = plot.Add.ScatterLine([.. levels.Select(level => level.Var.Value)], heights, Palette.Blue);
        curve.LineWidth = 2;
        curve.LegendText = "estimate";
        NameProbabilities(plot, heights.Min());
        plot.ShowLegend(Edge.Right);
        return plot;
    }

    /// <summary>Levels at which the curve is known: with batches the grid that they keep, else any.</summary>
    private static double[] Grid(OutcomeResult result, ErrorMethod errors)
    {
        if (errors == ErrorMethod.Batches) return BatchLevels.For(result.Request);
        var least = Math.Min(Common / 10, FewestTailTrials / result.Summary.Trials);
        var points = (int)Math.Ceiling(Math.Log10(Common / least) * PointsPerDecade);
        return [.. Enumerable.Range(0, points + 1).Select(i => 1 - (Common * Math.Pow(least / Common, (double)i / points)))];
    }

    private static void DrawBand(Plot plot, IReadOnlyList<(LevelFigures Level, double Height)> points)
    {
        if (points.Count < 2) return;
        Coordinates[] outline =
        [
            .. points.Select(point => new Coordinates(point.Level.Var.Low!.Value, point.Height)),
            .. points.Reverse().Select(point => new Coordinates(point.Level.Var.High!.Value, point.Height)),
        ];
        var band = plot.Add.Polygon(outline);
        band.FillColor = Palette.Orange.WithAlpha(0.55);
        band.LineColor = Palette.Orange;
        band.LineWidth = 1;
        band.LegendText = "95 % band";
    }

    private static void NameProbabilities(Plot plot, double lowest)
    {
        double[] probabilities = [0.9, 0.5, 0.25, 0.1, 0.05, 0.02, 0.01, 0.005, 0.002, 0.001, 1e-4, 1e-5, 1e-6, 1e-7];
        double[] shown = [.. probabilities.Where(p => Math.Log10(p) >= lowest - 0.01)];
        plot.Axes.Left.TickGenerator = new NumericManual(
            [.. shown.Select(Math.Log10)], [.. shown.Select(p => (p * 100).ToString("0.#######", CultureInfo.InvariantCulture) + " %")]);
        plot.Axes.SetLimitsY(lowest, 0);
    }
}
