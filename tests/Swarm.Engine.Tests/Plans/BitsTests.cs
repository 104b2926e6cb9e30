using Swarm.Engine.Numerics;
using Swarm.Engine.Plans;
using Swarm.Engine.Records;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Plans;

/// <summary>The contract of bits: equal inputs, equal digest, however the work is cut, ordered and computed.</summary>
public sealed class BitsTests
{
    // Ten leaves and a ragged edge of a block and a bit.
    private const long Trials = (10 * Edition.TrialsPerLeaf) + Edition.TrialsPerBlock + 1234;

    private const string Model = """
        model: test
        horizon: 4
        draws:
          rate[t]: normal(mean=3%, sd=5%)
          loss: lognormal(mean=100, sd=250)
          share: gamma(shape=0.7, scale=2)
          event: one_of(values=[0, 50], chances=[0.9, 0.1])
          level: uniform(low=0, high=1)
        formulas:
          fund[0]: 1_000
          fund[t]: max(0, fund[t-1] * exp(rate[t]) - 0.1 * loss)
          paid: loss * share ^ 1.5 + event * (level > 0.5)
        outcomes:
          fund[t]:
            adverse: low
          paid:
            above: [0, 100, 1_000]
        """;

    private static readonly string Expected = DigestOfLocalRun(1);

    [Theory]
    [InlineData(2)]
    [InlineData(5)]
    public void Any_number_of_threads_gives_the_same_digest(int threads) => Assert.Equal(Expected, DigestOfLocalRun(threads));

    [Theory]
    [InlineData(0, 1)]
    [InlineData(0, 2)]
    [InlineData(1, 3)]
    [InlineData(2, 4)]
    [InlineData(3, 5)]
    public void Any_chunk_size_and_order_of_arrival_gives_the_same_digest(int level, int seed)
    {
        PreparedRun run = Prepare(LaneWidths.OfThisMachine);
        long leavesPerChunk = 1L << level;
        long[] chunks = [.. Enumerable.Range(0, (int)((run.Leaves + leavesPerChunk - 1) / leavesPerChunk)).Select(i => (long)i)];
        new Random(seed).Shuffle(chunks);
        var reduction = new RunReduction(Trials, [.. run.Outcomes.Select(outcome => outcome.Request)]);

        foreach (long chunk in chunks)
        {
            reduction.Accept(level, chunk, Fold(run, chunk * leavesPerChunk, Math.Min(run.Leaves, (chunk + 1) * leavesPerChunk)));
        }

        Assert.Equal(Expected, ResultDigest.Of(Edition.Number, 1, Trials, reduction.Finish()));
    }

    [Theory]
    [InlineData((int)LaneWidth.Vector512)]
    [InlineData((int)LaneWidth.Vector256)]
    [InlineData((int)LaneWidth.Vector128)]
    [InlineData((int)LaneWidth.Scalar)]
    public void Every_vector_width_gives_the_same_digest(int width)
    {
        RunOutcome outcome = LocalRun.Execute(Prepare((LaneWidth)width), null, CancellationToken.None);

        Assert.Equal(Expected, Digest(outcome));
    }

    [Fact]
    public void The_tile_does_not_show_in_the_values()
    {
        PreparedRun run = Prepare(LaneWidths.OfThisMachine);

        Assert.Equal(FirstTrials(run, 512), FirstTrials(run, 16));
        Assert.Equal(FirstTrials(run, 512), FirstTrials(run, 1024));
    }

    /// <summary>
    /// A golden digest of edition 1. Bits that change without a new edition fail here; a deliberate change raises
    /// <see cref="Edition.Number"/> and says so in the changelog.
    /// </summary>
    [Fact]
    public void The_golden_digest_of_edition_1_stands()
    {
        Assert.Equal(1, Edition.Number);
        Assert.True(TestFile.Lines("golden-digest-1.txt").First() == Expected, $"the digest of this build is {Expected}");
    }

    private static PreparedRun Prepare(LaneWidth width) =>
        new(TestModel.Read(Model), new RunSettings { Seed = 1, Trials = Trials, Threads = 1, Width = width });

    private static string DigestOfLocalRun(int threads) => Digest(TestModel.Run(Model, Trials, threads));

    private static string Digest(RunOutcome outcome) =>
        ResultDigest.Of(Edition.Number, 1, Trials, [.. outcome.Results.Select(result => result.Result)]);

    private static OutcomeSummary[] Fold(PreparedRun run, long from, long to)
    {
        using var runner = new LeafRunner(run);
        var fold = new NodeFold(run.Pool);
        for (long leaf = from; leaf < to; leaf++)
        {
            Assert.Null(runner.Compute(leaf));
            fold.Add(runner.Summarise(leaf));
        }

        return fold.Finish();
    }

    private static unsafe double[] FirstTrials(PreparedRun run, int tile)
    {
        const int Trials = 1024;
        double[] values = new double[run.Outcomes.Count * Trials];
        using var executor = PlanExecutor.Create(run.Compiled.Running, run.Settings.Width, tile);
        fixed (double* target = values)
        {
            for (int first = 0; first < Trials; first += tile)
            {
                executor.RunTile(first, tile, target + first, Trials);
            }
        }

        return values;
    }
}
