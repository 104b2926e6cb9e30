using Swarm.Engine.Models;
using Swarm.Engine.Plans;
using Swarm.Engine.Reserving;

namespace Swarm.Engine.Records;

/// <summary>Tables that a model's components report beside the simulated figures.</summary>
public static class RunTables
{
    /// <summary>Tables in the order of the model's components.</summary>
    public static IReadOnlyList<ReportTable> Of(Model model, RunOutcome outcome) => [.. model.Triangles.SelectMany(input => Of(input, outcome))];

    private static IEnumerable<ReportTable> Of(TriangleInput input, RunOutcome outcome)
    {
        if (ReservingFit.Of(input.Triangle, input.Options, []) is not { } fit) yield break;
        yield return ReserveTables.Reserves(input.Name, fit);
        if (ReserveTables.Comparison(input.Name, fit, outcome) is { } comparison) yield return comparison;
        yield return DevelopmentTable.Of(input.Name, fit);
        foreach (ReportTable table in ResidualTables.Of(input.Name, fit)) yield return table;
    }
}
