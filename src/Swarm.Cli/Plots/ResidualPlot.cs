using ScottPlot;
using Swarm.Engine.Records;

namespace Swarm.Cli.Plots;

/// <summary>Residuals against one of their directions, with the mean of each place.</summary>
internal static class ResidualPlot
{
    public static Plot Draw(ReportTable table, string direction)
    {
        var residuals = table.Column(ResidualColumns.Residual)!.Numbers;
        var names = Names(table.Column(direction)!);
        IReadOnlyList<string> places = [.. names.Distinct().Order(PlaceOrder)];
        double[] where = [.. names.Select(name => (double)Index(places, name))];
        var plot = Sheet.Create($"{table.Component}: residuals by {direction} period", $"{direction} period", "residual");
        plot.Add.HorizontalLine(0, 1, Palette.Ink);
        var dots = plot.Add.ScatterPoints(where, [.. residuals], Palette.Blue);
        dots.MarkerSize = 7;
        dots.MarkerShape = MarkerShape.OpenCircle;
        dots.MarkerLineWidth = 1.5f;
        dots.LegendText = "residual of a cell";
        double[] means = [.. places.Select((_, place) => residuals.Where((_, i) => (int)where[i] == place).Average())];
        var line = plot.Add.Scatter([.. Enumerable.Range(0, places.Count).Select(i => (double)i)], means, Palette.Vermilion);
        line.LineWidth = 2;
        line.LegendText = "mean";
        Sheet.Name(plot, places);
        plot.Axes.SetLimitsX(-0.5, places.Count - 0.5);
        plot.ShowLegend(Edge.Right);
        return plot;
    }

    private static readonly Comparer<string> PlaceOrder = Comparer<string>.Create(
        (left, right) => double.TryParse(left, out var a) && double.TryParse(right, out var b)
            ? a.CompareTo(b)
            : string.CompareOrdinal(left, right));

    private static int Index(IReadOnlyList<string> places, string name) => places.TakeWhile(place => place != name).Count();

    private static IReadOnlyList<string> Names(ReportColumn column) =>
        column.Kind == ColumnKind.Label ? column.Labels : [.. column.Numbers.Select(number => Output.NumberText.AtPlace(number, 0))];
}
