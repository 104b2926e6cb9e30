using System.Text;
using ScottPlot;
using Swarm.Cli.Output;
using Swarm.Engine.Plans;
using Swarm.Engine.Records;
using Swarm.Engine.Summaries;
using Swarm.Protocol.Records;

namespace Swarm.Cli.Plots;

/// <summary>Draws the pictures of a run record into a folder, each as SVG and as PNG.</summary>
internal static class PlotFiles
{
    /// <summary>Draws and writes one picture after another, and gives the names of the files as they are written.</summary>
    public static IEnumerable<string> Write(RunRecord record, ErrorMethod errors, string folder, CancellationToken cancellation)
    {
        var taken = new HashSet<string>(StringComparer.OrdinalIgnoreCase);
        foreach (var (name, draw) in Pictures(record, errors))
        {
            if (cancellation.IsCancellationRequested) yield break;
            using var plot = draw();
            var file = Path.Combine(folder, Unused(FileName(name), taken));
            AtomicFile.Write($"{file}.svg", Encoding.UTF8.GetBytes(Typeface.WithFallback(plot.GetSvgXml(Sheet.Width, Sheet.Height))));
            yield return $"{file}.svg";
            AtomicFile.Write($"{file}.png", plot.GetImageBytes(Sheet.Width, Sheet.Height, ImageFormat.Png));
            yield return $"{file}.png";
        }
    }

    /// <summary>An outcome's name as the name of a file: letters, digits, dots and dashes alone.</summary>
    public static string FileName(string name) =>
        new string([.. name.Select(letter => IsPlain(letter) ? letter : '-')]).Trim('.', '-');

    private static bool IsPlain(char letter) => char.IsAsciiLetterOrDigit(letter) || letter is '.' or '-' or '_';

    private static string Unused(string name, HashSet<string> taken)
    {
        var unused = name.Length == 0 ? "picture" : name;
        for (var number = 2; !taken.Add(unused); number++) unused = $"{name}-{number}";
        return unused;
    }

    private static IEnumerable<(string Name, Func<Plot> Draw)> Pictures(RunRecord record, ErrorMethod errors)
    {
        foreach (var family in record.Outcomes.GroupBy(outcome => outcome.Parent))
        {
            foreach (var outcome in family.Where(part => part.Group == OutcomeGroup.Whole).Concat(LastStep(family)))
            {
                var result = outcome.Result;
                var name = result.Request.Name;
                var axis = AxisOf(record, outcome, name);
                yield return ($"{name}-density", () => DensityPlot.Draw(result, Figures.Of(result, errors), axis));
                if (result.Summary.Digest.Count > 2) yield return ($"{name}-exceedance", () => ExceedancePlot.Draw(result, errors, axis));
            }

            if (Fan(record, family, OutcomeGroup.Calendar, "payments", "calendar period") is { } payments) yield return payments;
            if (Fan(record, family, OutcomeGroup.Step, "steps", "step") is { } steps) yield return steps;
        }

        foreach (var table in record.Tables.Where(table => table.Code == ReportTableCodes.Residuals))
        {
            foreach (var direction in new[] { ResidualColumns.Origin, ResidualColumns.Development, ResidualColumns.Calendar })
                yield return ($"{table.Component}-residuals-by-{direction}", () => ResidualPlot.Draw(table, direction));
        }
    }

    private static IEnumerable<ReportedResult> LastStep(IEnumerable<ReportedResult> family) =>
        family.Where(part => part.Group == OutcomeGroup.Step).TakeLast(1);

    private static (string, Func<Plot>)? Fan(
        RunRecord record, IGrouping<string, ReportedResult> family, OutcomeGroup group, string suffix, string horizontal)
    {
        ReportedResult[] parts = [.. family.Where(part => part.Group == group)];
        if (parts.Length < 2) return null;
        var (title, quantity) = group == OutcomeGroup.Calendar
            ? ($"{family.Key}: payments by calendar period", "paid")
            : ($"{family.Key} over steps", family.Key);
        return ($"{family.Key}-{suffix}", () => FanPlot.Draw(parts, title, horizontal, AxisOf(record, parts[0], quantity)));
    }

    private static string AxisOf(RunRecord record, ReportedResult outcome, string quantity) =>
        record.Money is { } money && outcome.IsMoney ? $"{quantity}, in {UnitText.Of(money)}" : quantity;
}
