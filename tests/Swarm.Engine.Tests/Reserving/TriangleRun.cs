using Swarm.Engine.Models;
using Swarm.Engine.Plans;
using Swarm.Engine.Reserving;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Reserving;

/// <summary>Short runs of a model with one triangle.</summary>
internal static class TriangleRun
{
    private const long Trials = 40_000;

    /// <summary>Figures of all that is unpaid, seed 7.</summary>
    public static OutcomeFigures Unpaid(Triangle triangle, ReservingOptions options)
    {
        var model = new Model
        {
            Title = "variant",
            Triangles = [new TriangleInput { Name = "motor", Stream = "motor", Triangle = triangle, Options = options }],
            Outcomes = [new Outcome { Name = "motor.unpaid", Kind = QuantityKind.PerTrial }],
        };
        RunOutcome run = LocalRun.Execute(
            model, new RunSettings { Seed = 7, Trials = Trials, Threads = 2 }, null, CancellationToken.None);
        Assert.Null(run.Fault);
        Assert.Null(run.Refusal);
        return Figures.Of(
            run.Results.Single(result => result.Result.Request.Name == "motor.unpaid").Result, ErrorMethod.ClosedForm);
    }
}
