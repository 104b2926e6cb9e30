using Swarm.Cli.Inputs;
using Swarm.Cli.Running;
using Swarm.Engine.Distributions;
using Swarm.Engine.Models;
using Swarm.Engine.Models.Formulas;
using Swarm.Engine.Plans;
using Swarm.Engine.Records;
using Swarm.Engine.Reserving;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Tests.Samples;

/// <summary>Small runs of a model built by hand, so that what is shown is tested apart from how models are read.</summary>
internal static class SampleRuns
{
    private static readonly SourcePosition Nowhere = new("sample.yaml", 1, 1);

    /// <summary>An invented triangle, its shortfall that is mostly nothing, a fund by steps and a yes or no.</summary>
    public static RunRecord Build(long trials)
    {
        var model = Model();
        var settings = new RunSettings { Seed = 7, Trials = trials, Threads = 1 };
        var outcome = LocalRun.Execute(model, settings, null, CancellationToken.None);
        var source = new RecordedModel("sample.yaml", "model: a sample built by hand\n");
        var reading = new ModelReading(model, [], [new DataFile("motor-paid.csv", [1, 2, 3])]);
        return RecordOfRun.Build(new ModelInput(source, reading), settings, outcome);
    }

    public static Model Model() => new()
    {
        Title = "Larkfell Mutual, a sample of everything that is shown",
        Money = new Money("crown", 1000),
        Horizon = 5,
        Draws = [new Draw(new QuantityName("growth", QuantityKind.PerStep, 0), Lognormal.OfMeanAndSd(1.05, 0.15), "growth", Nowhere)],
        Triangles = [new TriangleInput { Name = "motor", Stream = "motor", Triangle = Triangle(), Options = new ReservingOptions() }],
        Formulas =
        [
            Formula("shortfall", new CallExpression(Function.Max, [Number(0), Minus(Value("motor.unpaid"), Number(2_600))], Nowhere)),
            Formula("ruined", new BinaryExpression(BinaryOperator.Less, LastFund(), Number(20), Nowhere)),
            new Formula(new QuantityName("fund", QuantityKind.AtStep, 0), Number(100), Nowhere),
            new Formula(new QuantityName("fund", QuantityKind.PerStep, 0), Fund(), Nowhere),
        ],
        Outcomes =
        [
            new Outcome
            {
                Name = "motor.unpaid",
                Kind = QuantityKind.PerTrial,
                Above = [2_700],
                Levels = [0.5, 0.75, 0.9, 0.995],
                By = [Breakdown.Origin, Breakdown.Calendar],
            },
            new Outcome { Name = "shortfall", Kind = QuantityKind.PerTrial, Above = [0, 200, 50_000] },
            new Outcome { Name = "fund", Kind = QuantityKind.PerStep, Adverse = Adverse.Low },
            new Outcome { Name = "ruined", Kind = QuantityKind.PerTrial, IsMoney = false },
        ],
    };

    private static Triangle Triangle() => new(
        ["2020", "2021", "2022", "2023", "2024", "2025"],
        [
            [1010, 620, 240, 130, 60, 25],
            [1105, 600, 310, 120, 45],
            [1180, 735, 250, 165],
            [1260, 690, 330],
            [1330, 845],
            [1405],
        ],
        12);

    private static BinaryExpression Fund() => Minus(
        new BinaryExpression(
            BinaryOperator.Multiply,
            new ReferenceExpression("fund", StepIndex.Previous, 0, Nowhere),
            new ReferenceExpression("growth", StepIndex.Current, 0, Nowhere),
            Nowhere),
        Number(8));

    private static ReferenceExpression LastFund() => new("fund", StepIndex.Horizon, 0, Nowhere);

    private static Formula Formula(string name, Expression body) => new(new QuantityName(name, QuantityKind.PerTrial, 0), body, Nowhere);

    private static ReferenceExpression Value(string name) => new(name, StepIndex.None, 0, Nowhere);

    private static NumberExpression Number(double value) => new(value, Nowhere);

    private static BinaryExpression Minus(Expression left, Expression right) => new(BinaryOperator.Subtract, left, right, Nowhere);
}
