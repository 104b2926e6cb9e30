using Swarm.Engine.Records;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Records;

public class ErrorPartsTests
{
    [Fact]
    public void Both_squares_add_up_to_the_squared_sd()
    {
        var parts = ErrorParts.Of(Run(5, _ => 5), Run(3, _ => 3), ErrorMethod.ClosedForm);

        Assert.Equal(3, parts.Parameter.Value, 1e-12);
        Assert.Equal(4, parts.Process.Value, 1e-12);
    }

    [Fact]
    public void The_process_error_has_the_spread_between_batches()
    {
        // 25 batches of a twenty-fifth of the trials each; every second one a process sd of 4.1, the others 3.9.
        var whole = Run(5, i => Math.Sqrt(9 + Math.Pow(i % 2 == 0 ? 4.1 : 3.9, 2)));
        var parts = ErrorParts.Of(whole, Run(3, _ => 3), ErrorMethod.ClosedForm);

        Assert.Equal(Math.Sqrt(25 * 0.01 / 24 / 25), parts.Process.StandardError!.Value, 1e-9);
        Assert.Equal(4 + (2.0639 * parts.Process.StandardError.Value), parts.Process.High!.Value, 1e-5);
    }

    [Fact]
    public void Too_few_batches_give_a_reason()
    {
        var whole = Run(5, _ => 5);
        var few = whole with { Batches = [.. whole.Batches.Take(19)] };

        var process = ErrorParts.Of(few, Run(3, _ => 3), ErrorMethod.ClosedForm).Process;

        Assert.Null(process.StandardError);
        Assert.Equal("fewer than 20 whole batches (19)", process.Reason);
    }

    /// <summary>A two-point run of 25 batches with a given sd of all trials and of each batch.</summary>
    private static OutcomeResult Run(double sd, Func<int, double> sdOfBatch)
    {
        const int Batches = 25;
        const long PerBatch = 4096;
        const long Trials = Batches * PerBatch;
        var digest = TDigest.FromClusters([-10, 10], [Trials / 2, Trials / 2], [true, true], Trials);
        var request = new OutcomeRequest("x", Adverse.High, [0.5], []);
        double[] tails = [.. BatchLevels.For(request).Select(_ => 0.0)];
        BatchFigures[] batches = [.. Enumerable.Range(0, Batches).Select(i => new BatchFigures(Of(PerBatch, sdOfBatch(i)), [], tails, tails))];
        return new OutcomeResult(request, OutcomeSummary.FromParts(Of(Trials, sd), [], digest, []), PerBatch, batches);
    }

    private static Moments Of(long count, double sd) => new()
    {
        Count = count,
        M2 = sd * sd * (count - 1),
        M4 = sd * sd * sd * sd * count,
        M6 = sd * sd * sd * sd * sd * sd * count,
        Min = -10,
        Max = 10,
    };
}
