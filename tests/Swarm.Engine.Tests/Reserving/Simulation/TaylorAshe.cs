using Swarm.Engine.Models;
using Swarm.Engine.Plans;
using Swarm.Engine.Reserving;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Reserving.Simulation;

/// <summary>The triangle of Taylor &amp; Ashe (1983) and runs on it.</summary>
internal static class TaylorAshe
{
    public static Triangle Triangle { get; } = TriangleReader.Read(new TriangleRequest
    {
        FileName = "reserving-taylor-ashe.csv",
        Content = File.ReadAllBytes(TestFile.Path("reserving-taylor-ashe.csv")),
        Layout = TriangleLayout.Square,
        Amounts = TriangleAmounts.Cumulative,
    }).Triangle!;

    /// <summary>Figures by quantity: <c>t.unpaid</c>, <c>t.unpaid.2007</c>, <c>t.expected</c>, <c>t.paid.2012</c>.</summary>
    public static Dictionary<string, OutcomeFigures> Figures(ReservingOptions options, long trials, ulong seed = 1) =>
        Run(options, trials, seed).Results.ToDictionary(
            result => result.Result.Request.Name, result => Swarm.Engine.Summaries.Figures.Of(result.Result, ErrorMethod.ClosedForm));

    public static RunOutcome Run(ReservingOptions options, long trials, ulong seed = 1) =>
        LocalRun.Execute(Model(options), new RunSettings { Seed = seed, Trials = trials, Threads = 2 }, null, CancellationToken.None);

    public static Model Model(ReservingOptions options) => new()
    {
        Title = "Taylor & Ashe (1983)",
        Triangles = [new TriangleInput { Name = "t", Stream = "t", Triangle = Triangle, Options = options }],
        Outcomes =
        [
            new Outcome
            {
                Name = "t.unpaid",
                Kind = QuantityKind.PerTrial,
                Levels = [0.75, 0.9, 0.95, 0.99, 0.995],
                By = [Breakdown.Origin, Breakdown.Calendar],
            },
        ],
    };
}
