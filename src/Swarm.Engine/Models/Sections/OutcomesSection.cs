using Swarm.Engine.Models.Documents;
using Swarm.Engine.Models.Names;
using Swarm.Engine.Models.Shapes;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Models.Sections;

/// <summary><c>outcomes</c>: what the model reports on.</summary>
/// <param name="context">What the sections share.</param>
/// <param name="truths">Tells probabilities from amounts.</param>
internal sealed class OutcomesSection(ReadingContext context, TruthInference truths)
{
    private readonly HashSet<QuantityName> _seen = [];
    private long _values;

    public static MapShape Shape { get; } = new(
        "Quantities that are reported: x, x[t] for all steps, x[30] for one step, x[horizon] for the last.",
        NameForm.Outcome,
        new ObjectShape(
            "How the outcome is reported; {} or nothing for the defaults.",
            [
                new Field("levels", new ListShape(
                    "Probability levels of VaR and TVaR, as in [50%, 99.5%]; by default 50%, 75%, 90%, 95%, 99% and 99.5%.",
                    new NumberShape("A probability between 0 and 1, as in 99.5%.") { Above = 0, Below = 1 }) { Least = 1, Most = 100 }),
                new Field("above", new ListShape(
                    "Thresholds whose probability to be exceeded is reported.",
                    new NumberShape("A threshold.")) { Most = 100 }),
                new Field("adverse", new ChoiceShape(
                    "Which end hurts; tail figures look there.",
                    [
                        new("high", "Large values hurt, as of claims (the default)."),
                        new("low", "Small values hurt, as of a fund."),
                    ])),
                new Field("fan", ChoiceShape.Truth("Asks for a picture over the steps; for x[t] only.")),
                new Field("by", new ListShape(
                    "How a triangle's unpaid claims are broken down; by default both ways.",
                    new ChoiceShape(
                        "A breakdown.",
                        [
                            new("origin", "By origin period."),
                            new("calendar", "By future calendar period, the payment pattern."),
                        ])) { Most = 2 }),
                new Field("unit", new ChoiceShape(
                    "Whether figures are shown with the unit of money.",
                    [
                        new("money", "An amount of money (the default, but for comparisons)."),
                        new("none", "A rate, a count, a probability."),
                    ])),
            ])
        { MayBeNothing = true })
    { Least = 1 };

    public IReadOnlyList<Outcome> Read(MappingNode root)
    {
        List<Outcome> outcomes = [];
        foreach (MappingEntry entry in root.Entries("outcomes"))
        {
            if (context.Diagnostics.IsFull)
            {
                break;
            }

            if (NameForm.Outcome.Read(entry.Key.Text) is QuantityName written && Known(Resolved(written), entry.Key) is { } known)
            {
                outcomes.Add(Read(Resolved(written), known, entry));
            }
        }

        return outcomes;
    }

    private QuantityName Resolved(QuantityName name) => name.Step < 0 ? name with { Step = context.Horizon ?? 0 } : name;

    private KnownQuantity? Known(QuantityName name, ScalarNode key)
    {
        if (context.Names.Find(name.Name, name.Kind != QuantityKind.PerTrial) is not { } known)
        {
            if (!context.Names.MayExist(name.Name))
            {
                context.Diagnostics.Error(
                    key.Position, $"{DiagnosticList.Quote(name.Name)} is not known", ReferenceCheck.Suggestion(name.Name, context.Names));
            }

            return null;
        }

        if (Mistake(name, known) is (string message, string hint))
        {
            context.Diagnostics.Error(key.Position, message, hint);
            return null;
        }

        if (!_seen.Add(name))
        {
            context.Diagnostics.Error(key.Position, $"'{name}' is reported twice", "keep one of them");
            return null;
        }

        return known;
    }

    private (string Message, string Hint)? Mistake(QuantityName name, KnownQuantity known)
    {
        if (known.IsStepped != (name.Kind != QuantityKind.PerTrial))
        {
            return known.IsStepped
                ? ($"'{name.Name}' exists for each step", $"write {name.Name}[t] for all steps, or {name.Name}[horizon] for the last")
                : ($"'{name.Name}' exists once per trial and has no steps", $"write {name.Name}");
        }

        if (name.Kind != QuantityKind.AtStep || context.Horizon is not int horizon)
        {
            return null;
        }

        if (name.Step == 0 && horizon > 0 && !known.HasStart)
        {
            return ($"'{name.Name}' has no value at step 0", $"write a step from 1 to {horizon}");
        }

        return name.Step > horizon && horizon > 0
            ? ($"step {name.Step} lies beyond the horizon, {horizon}", $"write {name.Name}[horizon] for the last step")
            : null;
    }

    private Outcome Read(QuantityName name, KnownQuantity known, MappingEntry entry)
    {
        MappingNode? options = entry.Value as MappingNode;
        CheckCount(name, entry.Key);
        if (options.Truth("fan") == true && options?.Entry("fan") is { } fan && name.Kind != QuantityKind.PerStep)
        {
            context.Diagnostics.Error(
                fan.Key.Position,
                $"'{name}' has one value, and no fan over steps",
                $"report {name.Name}[t], or remove 'fan'");
        }

        bool isMoney = options.Text("unit") is { } unit ? unit == "money" : !truths.IsTruth(name.Name);
        return new Outcome
        {
            Name = name.Name,
            Kind = name.Kind,
            Step = name.Step,
            Adverse = options.Text("adverse") == "low" ? Adverse.Low : Adverse.High,
            Levels = Distinct(options, "levels") ?? Outcome.DefaultLevels,
            Above = Distinct(options, "above") ?? [],
            By = Breakdowns(name, known, options),
            Fan = options.Truth("fan") ?? false,
            IsMoney = isMoney,
            Position = entry.Key.Position,
        };
    }

    private void CheckCount(QuantityName name, ScalarNode key)
    {
        long before = _values;
        _values += name.Kind == QuantityKind.PerStep ? (context.Horizon ?? 0) + 1 : 1;
        if (before <= ModelBounds.ReportedValues && _values > ModelBounds.ReportedValues)
        {
            context.Diagnostics.Error(
                key.Position, $"more than {ModelBounds.ReportedValues:N0} values are reported, each step counted", "report x[horizon] or single steps instead of x[t]");
        }
    }

    /// <summary>The numbers of a list in its order; one that stands twice is told and taken once.</summary>
    private List<double>? Distinct(MappingNode? options, string key)
    {
        if (options.Items(key) is not { } items)
        {
            return null;
        }

        List<double> numbers = [];
        HashSet<double> seen = [];
        foreach (DocumentNode item in items)
        {
            if (NodeValues.Number(item) is not double number)
            {
                continue;
            }

            if (!seen.Add(number))
            {
                context.Diagnostics.Warning(item.Position, $"{((ScalarNode)item).Text} stands twice in '{key}'", "remove one");
                continue;
            }

            numbers.Add(number);
        }

        return numbers;
    }

    private IReadOnlyList<Breakdown> Breakdowns(QuantityName name, KnownQuantity known, MappingNode? options)
    {
        bool isUnpaid = known.Origin == QuantityOrigin.Component && context.Names.ComponentOf(name.Name) is { } component
            && name.Name == component + ".unpaid";
        if (options?.Entry("by") is not { } by)
        {
            return isUnpaid ? [Breakdown.Origin, Breakdown.Calendar] : [];
        }

        if (!isUnpaid)
        {
            context.Diagnostics.Error(
                by.Key.Position,
                $"'{name}' cannot be broken down",
                "'by' goes with the unpaid claims of a triangle, as in motor.unpaid");
        }

        return
        [
            .. (options.Items("by") ?? [])
                .Select(item => (item as ScalarNode)?.Text == "calendar" ? Breakdown.Calendar : Breakdown.Origin)
                .Distinct(),
        ];
    }
}
