using Swarm.Engine.Models.Names;

namespace Swarm.Engine.Models.Sections;

/// <summary>Checks formulas against each other: steps, references, size, circles.</summary>
internal static class FormulaSetCheck
{
    public static void Check(IReadOnlyList<Formula> formulas, ReadingContext context)
    {
        context.Names.CheckSteps(context.Horizon);
        ReferenceCheck references = new(context.Names, context.Horizon, context.Diagnostics);
        foreach (Formula formula in formulas)
        {
            references.Check(formula);
        }

        int horizon = context.Horizon ?? 1;
        if (IsWithinBounds(horizon, context))
        {
            CheckCircles(formulas, horizon, context);
        }
    }

    private static bool IsWithinBounds(int horizon, ReadingContext context)
    {
        int quantities = context.Names.All.Count();
        if (quantities > ModelBounds.Quantities)
        {
            ReportSize(context, $"the model has {quantities:N0} quantities, and {ModelBounds.Quantities:N0} are allowed");
            return false;
        }

        long steps = context.Names.All.Count(quantity => quantity.IsStepped) * (horizon + 1L);
        if (steps > ModelBounds.QuantitySteps)
        {
            ReportSize(
                context,
                $"quantities with [t] times steps are {steps:N0}, and {ModelBounds.QuantitySteps:N0} are allowed");
            return false;
        }

        return true;
    }

    private static void CheckCircles(IReadOnlyList<Formula> formulas, int horizon, ReadingContext context)
    {
        DependencyGraph graph = new(formulas, horizon);
        long cost = graph.Units.Sum(unit => unit.Cost(horizon));
        if (cost > ModelBounds.ReferenceSteps)
        {
            ReportSize(
                context,
                $"references of formulas times steps are {cost:N0}, and {ModelBounds.ReferenceSteps:N0} are allowed");
            return;
        }

        new CircleSearch(graph, context.Diagnostics).Run();
    }

    private static void ReportSize(ReadingContext context, string message) =>
        context.Diagnostics.Error(context.Start, message, "split the model, or shorten the horizon");
}
