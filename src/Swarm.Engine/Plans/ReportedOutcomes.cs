using System.Globalization;
using Swarm.Engine.Models;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Plans;

/// <summary>From the outcomes that a model names to the list of what is reported.</summary>
internal static class ReportedOutcomes
{
    /// <summary>Outcomes in the order of the model, each followed by its parts.</summary>
    public static IReadOnlyList<ReportedOutcome> Of(Model model) => [.. model.Outcomes.SelectMany(outcome => Of(model, outcome))];

    private static IEnumerable<ReportedOutcome> Of(Model model, Outcome outcome) => outcome.Kind switch
    {
        QuantityKind.PerStep => Steps(model, outcome),
        QuantityKind.AtStep => [Whole(outcome, outcome.Step)],
        _ => [Whole(outcome, Instance.PerTrial)],
    };

    private static ReportedOutcome Whole(Outcome outcome, int step)
    {
        var instance = new Instance(outcome.Name, step);
        return Report(outcome, instance, OutcomeGroup.Whole, instance.ToString(), "");
    }

    /// <summary>Every step, step 0 included where the quantity has one.</summary>
    private static IEnumerable<ReportedOutcome> Steps(Model model, Outcome outcome)
    {
        bool hasStart = model.Formulas.Any(formula =>
            formula.Name.Name == outcome.Name && formula.Name is { Kind: QuantityKind.AtStep, Step: 0 });
        int first = hasStart ? 0 : 1;
        return Enumerable.Range(first, model.Horizon - first + 1).Select(step => Report(
            outcome,
            new Instance(outcome.Name, step),
            OutcomeGroup.Step,
            $"{outcome.Name}[t]",
            step.ToString(CultureInfo.InvariantCulture)));
    }

    private static ReportedOutcome Report(Outcome outcome, Instance instance, OutcomeGroup group, string parent, string label)
    {
        var request = new OutcomeRequest(instance.ToString(), outcome.Adverse, outcome.Levels, outcome.Above);
        return new ReportedOutcome(request, instance, group, parent, label, outcome.IsMoney);
    }
}
