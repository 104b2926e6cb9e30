using Swarm.Engine.Distributions;
using Swarm.Engine.Models;

namespace Swarm.Cli.Output;

/// <summary>What a model holds, without simulating it.</summary>
internal static class ModelSummary
{
    private const int Width = RunReportOptions.Width;

    public static void Write(TextWriter output, Model model)
    {
        Paragraph.Write(output, Width, model.Title);
        if (model.Money is { } money) Paragraph.Write(output, Width, $"in {UnitText.Of(money)}", "  money    ");
        if (model.Horizon > 0) Paragraph.Write(output, Width, $"1 to {model.Horizon}", "  steps    ");
        WriteDraws(output, model.Draws);
        WriteTriangles(output, model.Triangles);
        WriteNames(output, "Formulas", model.Formulas.Select(formula => formula.Name.ToString()));
        WriteNames(output, "Outcomes", model.Outcomes.Select(outcome => $"{new QuantityName(outcome.Name, outcome.Kind, outcome.Step)}"));
    }

    private static void WriteDraws(TextWriter output, IReadOnlyList<Draw> draws)
    {
        if (draws.Count == 0) return;
        output.WriteLine();
        output.WriteLine("Draws, by closed form");
        var table = new TextTable(
            new TextColumn("", false),
            new TextColumn("distribution", false),
            new TextColumn("mean"),
            new TextColumn("sd"),
            new TextColumn("skewness"));
        foreach (var draw in draws)
        {
            var drawn = draw.Distribution;
            table.Add($"{draw.Name}", NameOf(drawn), Number(drawn.Mean), Number(drawn.Sd), Number(drawn.Skewness));
        }

        table.Write(output, Width);
    }

    private static void WriteTriangles(TextWriter output, IReadOnlyList<TriangleInput> triangles)
    {
        if (triangles.Count == 0) return;
        output.WriteLine();
        output.WriteLine("Triangles");
        foreach (var input in triangles)
        {
            var triangle = input.Triangle;
            Paragraph.Write(
                output,
                Width,
                $"{input.Name}: {triangle.Origins.Count} origin periods, {triangle.Origins[0]} to {triangle.Origins[^1]}, "
                    + $"{triangle.Developments} development periods of {triangle.MonthsPerPeriod} months",
                "  ");
        }
    }

    private static void WriteNames(TextWriter output, string title, IEnumerable<string> names)
    {
        var list = string.Join(", ", names);
        if (list.Length == 0) return;
        output.WriteLine();
        output.WriteLine(title);
        Paragraph.Write(output, Width, list, "  ");
    }

    private static string Number(double value) => double.IsNaN(value) ? "none" : NumberText.Plain(value);

    /// <summary>The type's own name in plain words: OneOf is "one of".</summary>
    private static string NameOf(Distribution distribution) => string.Concat(distribution.GetType().Name.Select(
        (letter, i) => char.IsUpper(letter) && i > 0 ? $" {char.ToLowerInvariant(letter)}" : $"{char.ToLowerInvariant(letter)}"));
}
