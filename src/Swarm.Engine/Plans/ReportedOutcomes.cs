using System.Globalization;
using Swarm.Engine.Models;
using Swarm.Engine.Reserving.Simulation;
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
        _ => [Whole(outcome, Instance.PerTrial), .. Parts(model, outcome)],
    };

    private static ReportedOutcome Whole(Outcome outcome, int step)
    {
        var instance = new Instance(outcome.Name, step);
        return Report(outcome, instance, OutcomeGroup.Whole, instance.ToString(), "", outcome.Above);
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
            step.ToString(CultureInfo.InvariantCulture),
            outcome.Above));
    }

    /// <summary>What a triangle's unpaid claims are made of, as far as the model asks for it, and their conditional mean.</summary>
    private static IEnumerable<ReportedOutcome> Parts(Model model, Outcome outcome)
    {
        if (model.Triangles.FirstOrDefault(input => $"{input.Name}.unpaid" == outcome.Name) is not { } input)
        {
            yield break;
        }

        var names = new TriangleNames(input.Name, input.Triangle, new RunOffShape(input.Triangle, TriangleModels.TailPeriods(input)));
        if (outcome.By.Contains(Breakdown.Origin))
        {
            foreach (string origin in input.Triangle.Origins)
            {
                yield return Part(outcome, names.Unpaid(origin), OutcomeGroup.Origin, origin);
            }
        }

        if (outcome.By.Contains(Breakdown.Calendar))
        {
            foreach (string period in names.FuturePeriods)
            {
                yield return Part(outcome, names.Paid(period), OutcomeGroup.Calendar, period);
            }
        }

        yield return Part(outcome, names.Expected, OutcomeGroup.Expected, "");
    }

    private static ReportedOutcome Part(Outcome outcome, string name, OutcomeGroup group, string label) =>
        Report(outcome, new Instance(name, Instance.PerTrial), group, outcome.Name, label, []);

    private static ReportedOutcome Report(
        Outcome outcome, Instance instance, OutcomeGroup group, string parent, string label, IReadOnlyList<double> thresholds)
    {
        var request = new OutcomeRequest(instance.ToString(), outcome.Adverse, outcome.Levels, thresholds);
        return new ReportedOutcome(request, instance, group, parent, label, outcome.IsMoney);
    }
}
