using ScottPlot;
using Swarm.Cli.Output;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Plots;

/// <summary>The density of an outcome with its mean and levels.</summary>
internal static class DensityPlot
{
    private const double Headroom = 1.08;

    private static readonly (Color Color, LinePattern Pattern)[] LevelLines =
    [
        (Palette.Vermilion, LinePattern.Dotted),
        (Palette.Vermilion, LinePattern.DenselyDashed),
        (Palette.Vermilion, LinePattern.Solid),
        (Palette.Orange, LinePattern.Dotted),
        (Palette.Orange, LinePattern.DenselyDashed),
        (Palette.Orange, LinePattern.Solid),
    ];

    public static Plot Draw(OutcomeResult result, OutcomeFigures figures, string axis)
    {
        var estimate = DensityEstimate.Of(result.Summary.Digest);
        var onlyAtoms = estimate.Values.Count == 0;
        var title = $"{figures.Name}: distribution of {NumberText.Count(result.Summary.Trials)} trials";
        var plot = Sheet.Create(title, axis, onlyAtoms ? "share of trials" : "density");
        var top = onlyAtoms ? estimate.Atoms.Select(atom => atom.Share).DefaultIfEmpty(1).Max() : estimate.Densities.Max();
        if (!onlyAtoms) DrawCurve(plot, estimate);
        foreach (var (value, share) in estimate.Atoms) DrawAtom(plot, value, share, onlyAtoms ? share : top);
        DrawLine(plot, figures.Mean.Value, $"mean {FigureText.Of(figures.Mean).Value}", (Palette.Ink, LinePattern.Solid));
        DrawLevels(plot, figures);
        plot.Axes.SetLimitsY(0, top * Headroom);
        plot.ShowLegend(Edge.Right);
        return plot;
    }

    private static void DrawCurve(Plot plot, DensityEstimate estimate)
    {
        var curve = plot.Add.FillY([.. estimate.Values], new double[estimate.Values.Count], [.. estimate.Densities]);
        curve.FillColor = Palette.SkyBlue.WithAlpha(0.35);
        curve.LineColor = Palette.Blue;
        curve.LineWidth = 2;
        Sheet.HideHeights(plot);
        if (estimate.Atoms.Count == 0) return;
        var elsewhere = Math.Round(1 - estimate.Atoms.Sum(atom => atom.Share), 4);
        curve.LegendText = $"{NumberText.Percent(elsewhere)} of trials elsewhere";
    }

    /// <summary>Levels at one value share a line.</summary>
    private static void DrawLevels(Plot plot, OutcomeFigures figures)
    {
        var next = 0;
        foreach (var line in figures.Levels.GroupBy(level => level.Var.Value))
        {
            var levels = string.Join(", ", line.Select(level => NumberText.Percent(level.P)));
            DrawLine(plot, line.Key, $"{levels}: {FigureText.Of(line.First().Var).Value}", LevelLines[next++ % LevelLines.Length]);
        }
    }

    private static void DrawLine(Plot plot, double value, string name, (Color Color, LinePattern Pattern) look)
    {
        var line = plot.Add.VerticalLine(value);
        line.LegendText = name;
        line.Color = look.Color;
        line.LinePattern = look.Pattern;
        line.LineWidth = 2;
    }

    private static void DrawAtom(Plot plot, double value, double share, double height)
    {
        var stem = plot.Add.Line(value, 0, value, height);
        stem.LegendText = $"{NumberText.Percent(Math.Round(share, 4))} of trials at {NumberText.Short(value)}";
        stem.Color = Palette.Green;
        stem.LineWidth = 5;
    }
}
