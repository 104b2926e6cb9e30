using Swarm.Engine.Plans;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Output;

/// <summary>The parts of an outcome, a line each: by origin, by calendar period, by step.</summary>
internal static class GroupTable
{
    public static void Write(TextWriter output, int width, OutcomeGroup group, IReadOnlyList<(string Label, OutcomeFigures Figures)> parts)
    {
        IReadOnlyList<double> levels = [.. parts[0].Figures.Levels.Select(level => level.P).TakeLast(1)];
        var table = new TextTable(
        [
            new TextColumn(Heading(group), false),
            new TextColumn("mean ± error"),
            new TextColumn("sd ± error"),
            .. levels.Select(level => new TextColumn($"VaR {NumberText.Percent(level)} ± error")),
        ]);
        foreach (var (label, figures) in parts)
        {
            table.Add(
            [
                label,
                FigureText.Of(figures.Mean).Joined,
                FigureText.Of(figures.Sd).Joined,
                .. figures.Levels.TakeLast(levels.Count).Select(level => FigureText.Of(level.Var).Joined),
            ]);
        }

        table.Write(output, width);
    }

    /// <summary>What the labels of a group are, in one word or two.</summary>
    public static string Heading(OutcomeGroup group) => group switch
    {
        OutcomeGroup.Origin => "origin",
        OutcomeGroup.Calendar => "paid in",
        _ => "step",
    };
}
