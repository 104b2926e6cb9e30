using Swarm.Engine;
using Swarm.Engine.Distributions;
using Swarm.Engine.Models;
using Swarm.Engine.Models.Formulas;
using Swarm.Engine.Plans;
using Swarm.Engine.Records;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Tests.Samples;

/// <summary>Small runs of models built by hand, so that what is shown can be tested apart from how models are read.</summary>
internal static class SampleRuns
{
    private static readonly SourcePosition Nowhere = new("sample.yaml", 1, 1);

    /// <summary>Unpaid claims with origins, payment years, a shortfall that is mostly nothing, and a fund by steps.</summary>
    public static RunRecord Build(long trials = 20_000)
    {
        var model = Model();
        var outcome = LocalRun.Execute(model, new RunSettings { Seed = 7, Trials = trials, Threads = 1 }, null, CancellationToken.None);
        return new RunRecord
        {
            Edition = Edition.Number,
            ToolVersion = "0.1.0",
            Seed = 7,
            Trials = trials,
            Title = model.Title,
            Money = model.Money,
            Model = new RecordedModel("sample.yaml", "model: a sample built by hand\n"),
            Outcomes = [.. outcome.Results.Select(Place)],
            Notes = [new Note("method", "motor: an invented note that is long enough to need a second line when it is shown on eighty columns.")],
            Tables = [Residuals()],
        };
    }

    public static Model Model() => new()
    {
        Title = "Larkfell Mutual, a sample of everything that is shown",
        Money = new Money("crown", 1000),
        Horizon = 5,
        Draws =
        [
            .. Years().Select((year, i) => Draw($"motor.unpaid.{year}", Lognormal.OfMeanAndSd(1000 * (i + 1) * (i + 1), 300 * (i + 1)))),
            .. Enumerable.Range(0, 6).Select(i => Draw($"motor.paid.{2026 + i}", Lognormal.OfMeanAndSd(21_000 / (1 << i), 4000 / (i + 1)))),
            new Draw(new QuantityName("growth", QuantityKind.PerStep, 0), Lognormal.OfMeanAndSd(1.05, 0.15), "growth", Nowhere),
        ],
        Formulas =
        [
            Formula("motor.unpaid", Sum([.. Years().Select(year => Value($"motor.unpaid.{year}"))])),
            Formula("motor.expected", new BinaryExpression(BinaryOperator.Add, Value("motor.unpaid.2025"), Number(55_000), Nowhere)),
            Formula("shortfall", new CallExpression(Function.Max, [Number(0), Difference(Value("motor.unpaid"), Number(93_000))], Nowhere)),
            new Formula(new QuantityName("fund", QuantityKind.AtStep, 0), Number(100), Nowhere),
            new Formula(new QuantityName("fund", QuantityKind.PerStep, 0), Fund(), Nowhere),
        ],
        Outcomes =
        [
            new Outcome { Name = "motor.unpaid", Kind = QuantityKind.PerTrial, Above = [100_000], Levels = [0.5, 0.75, 0.9, 0.995] },
            new Outcome { Name = "motor.expected", Kind = QuantityKind.PerTrial },
            .. Years().Select(year => new Outcome { Name = $"motor.unpaid.{year}", Kind = QuantityKind.PerTrial }),
            .. Enumerable.Range(0, 6).Select(i => new Outcome { Name = $"motor.paid.{2026 + i}", Kind = QuantityKind.PerTrial }),
            new Outcome { Name = "shortfall", Kind = QuantityKind.PerTrial, Above = [0, 5000, 20_000] },
            new Outcome { Name = "fund", Kind = QuantityKind.PerStep, Adverse = Adverse.Low, IsMoney = false },
        ],
    };

    /// <summary>Calls an outcome by name what a triangle would call it.</summary>
    private static ReportedResult Place(ReportedResult outcome) => outcome.Result.Request.Name.Split('.') switch
    {
        ["motor", "expected"] => outcome with { Group = OutcomeGroup.Expected, Parent = "motor.unpaid" },
        ["motor", "unpaid", var origin] => outcome with { Group = OutcomeGroup.Origin, Parent = "motor.unpaid", Label = origin },
        ["motor", "paid", var calendar] => outcome with { Group = OutcomeGroup.Calendar, Parent = "motor.unpaid", Label = calendar },
        _ => outcome,
    };

    private static ReportTable Residuals()
    {
        var cells = (from i in Enumerable.Range(0, 6) from j in Enumerable.Range(0, 6 - i) select (Origin: i, Development: j)).ToArray();
        return new ReportTable(
            ReportTableCodes.Residuals,
            "motor",
            "Residuals by cell",
            [
                ReportColumn.OfLabels(ResidualColumns.Origin, [.. cells.Select(cell => $"{2020 + cell.Origin}")]),
                ReportColumn.OfNumbers(ResidualColumns.Development, ColumnKind.Count, [.. cells.Select(cell => cell.Development + 1.0)]),
                ReportColumn.OfLabels(ResidualColumns.Calendar, [.. cells.Select(cell => $"{2020 + cell.Origin + cell.Development}")]),
                ReportColumn.OfNumbers(ResidualColumns.Residual, ColumnKind.Number, [.. cells.Select(cell => (((cell.Origin * 7) + (cell.Development * 5)) % 11 / 3.0) - 1.6)]),
            ]);
    }

    private static IEnumerable<int> Years() => Enumerable.Range(2020, 6);

    private static Draw Draw(string name, Distribution distribution) => new(Name(name), distribution, name, Nowhere);

    private static Formula Formula(string name, Expression body) => new(Name(name), body, Nowhere);

    private static QuantityName Name(string name) => new(name, QuantityKind.PerTrial, 0);

    private static ReferenceExpression Value(string name) => new(name, StepIndex.None, 0, Nowhere);

    private static NumberExpression Number(double value) => new(value, Nowhere);

    private static BinaryExpression Difference(Expression left, Expression right) => new(BinaryOperator.Subtract, left, right, Nowhere);

    private static Expression Sum(IReadOnlyList<Expression> terms) =>
        terms.Aggregate((left, right) => new BinaryExpression(BinaryOperator.Add, left, right, Nowhere));

    private static BinaryExpression Fund() => Difference(
        new BinaryExpression(
            BinaryOperator.Multiply,
            new ReferenceExpression("fund", StepIndex.Previous, 0, Nowhere),
            new ReferenceExpression("growth", StepIndex.Current, 0, Nowhere),
            Nowhere),
        Number(8));
}
