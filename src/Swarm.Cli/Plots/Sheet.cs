using System.Globalization;
using ScottPlot;
using ScottPlot.TickGenerators;

namespace Swarm.Cli.Plots;

/// <summary>An empty picture in the one style that all pictures share.</summary>
internal static class Sheet
{
    public const int Width = 1000;
    public const int Height = 560;

    private const float LabelSize = 16;
    private const float TickSize = 14;
    private const float TitleSize = 18;
    private const float LeftSize = 100;
    private const float RightSize = 24;
    private const float BareLeftSize = 50;
    private const float LegendSwatch = 40;

    public static Plot Create(string title, string horizontal, string vertical)
    {
        Typeface.Choose();
        var plot = new Plot();
        plot.Title(title);
        plot.XLabel(horizontal);
        plot.YLabel(vertical);
        plot.Axes.Title.Label.FontSize = TitleSize;
        plot.Axes.Title.Label.Bold = false;
        plot.Grid.MajorLineColor = Palette.Grid;
        foreach (var axis in new[] { (IAxis)plot.Axes.Bottom, plot.Axes.Left })
        {
            axis.Label.FontSize = LabelSize;
            axis.Label.Bold = false;
            axis.TickLabelStyle.FontSize = TickSize;
        }

        plot.Axes.Left.MinimumSize = LeftSize;
        plot.Axes.Bottom.TickGenerator = Thousands();
        plot.Axes.Left.TickGenerator = Thousands();
        plot.Axes.Right.MinimumSize = RightSize;
        plot.Axes.Top.IsVisible = false;
        plot.Axes.Right.IsVisible = false;
        plot.Legend.FontSize = TickSize;
        plot.Legend.SymbolWidth = LegendSwatch;
        plot.Legend.OutlineColor = Palette.Grid;
        plot.Legend.ShadowColor = Colors.Transparent;
        plot.Axes.Color(Palette.Ink);
        return plot;
    }

    /// <summary>Names in place of numbers along the horizontal axis; only as many as there is room for.</summary>
    public static void Name(Plot plot, IReadOnlyList<string> names)
    {
        const int MostCharacters = 90;
        var longest = names.Max(name => name.Length) + 2;
        var every = Math.Max(1, (int)Math.Ceiling((double)names.Count * longest / MostCharacters));
        var shown = Enumerable.Range(0, names.Count).Where(i => i % every == 0).ToArray();
        plot.Axes.Bottom.TickGenerator = new NumericManual([.. shown.Select(i => (double)i)], [.. shown.Select(i => names[i])]);
    }

    /// <summary>Takes the numbers from the vertical axis where only the shape counts.</summary>
    public static void HideHeights(Plot plot)
    {
        plot.Axes.Left.TickGenerator = new NumericManual();
        plot.Axes.Left.MinimumSize = BareLeftSize;
    }

    private static NumericAutomatic Thousands() => new()
    {
        LabelFormatter = value => Math.Abs(value) >= 1e15
            ? value.ToString("0.##e+0", CultureInfo.InvariantCulture)
            : value.ToString("#,##0.########", CultureInfo.InvariantCulture),
    };
}
