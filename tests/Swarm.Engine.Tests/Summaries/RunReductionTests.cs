using Swarm.Engine.Numerics;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Summaries;

public class RunReductionTests
{
    private static readonly OutcomeRequest[] _requests =
    [
        new("claims", Adverse.High, [0.9, 0.995], [0, 1.5]),
        new("fund", Adverse.Low, [0.99], []),
    ];

    public static TheoryData<int> Sizes => [700, 50_000, 81_921, 450_000, (128 * Edition.TrialsPerLeaf) + 5];

    [Theory]
    [MemberData(nameof(Sizes))]
    public void Chunks_of_any_size_in_any_order_give_the_same_bits(int trials)
    {
        var values = AwkwardStreams.Create("normal", trials);
        var shape = new RunShape(trials);
        var expected = Reduce(values, level: 0, seed: null);

        for (var level = 0; level <= shape.HighestChunkLevel; level++)
        {
            AssertSame(expected, Reduce(values, level, seed: null));
            AssertSame(expected, Reduce(values, level, seed: (ulong)level + 1));
        }
    }

    [Fact]
    public void Without_a_pool_the_same_bits_come_out_and_handed_in_nodes_stay_as_they_are()
    {
        var values = AwkwardStreams.Create("pareto_1.1", 300_000);
        var summariser = new LeafSummariser(new RunShape(values.Length), new SummaryPool());
        var reduction = new RunReduction(values.Length, _requests);
        var leaves = Enumerable.Range(0, (int)reduction.Shape.Leaves).Select(leaf => Leaf(summariser, values, leaf)).ToArray();
        var first = leaves[0].ToArray();

        for (var leaf = 0; leaf < leaves.Length; leaf++) reduction.Accept(0, leaf, leaves[leaf]);

        AssertSame(Reduce(values, level: 0, seed: null), reduction.Finish());
        Assert.Equal(first, leaves[0]);
        Assert.Equal(Edition.TrialsPerLeaf, first[0].Digest.TotalWeight);
    }

    [Fact]
    public void Trials_are_accepted_once_under_whatever_node()
    {
        var values = AwkwardStreams.Create("uniform", 128 * Edition.TrialsPerLeaf);
        var summariser = new LeafSummariser(new RunShape(values.Length), new SummaryPool());
        var reduction = new RunReduction(values.Length, _requests);
        reduction.Accept(0, 4, Leaf(summariser, values, 4));
        reduction.Accept(0, 2, Leaf(summariser, values, 2));
        reduction.Accept(0, 3, Leaf(summariser, values, 3));

        foreach (var (level, index) in new[] { (0, 4), (0, 2), (1, 2), (1, 1) })
        {
            var node = Fold(summariser, values, level, index);
            Assert.Contains("before", Assert.Throws<ArgumentException>(() => reduction.Accept(level, index, node)).Message, StringComparison.Ordinal);
        }

        Assert.Equal(3 * Edition.TrialsPerLeaf, reduction.TrialsSeen);
        Assert.Throws<InvalidOperationException>(reduction.Finish);
    }

    [Fact]
    public void A_node_that_does_not_fit_the_run_is_refused()
    {
        var values = AwkwardStreams.Create("uniform", 40 * Edition.TrialsPerLeaf);
        var summariser = new LeafSummariser(new RunShape(values.Length), new SummaryPool());
        var reduction = new RunReduction(values.Length, _requests);
        var leaf = Leaf(summariser, values, 0);

        Assert.Throws<ArgumentException>(() => reduction.Accept(0, 40, leaf));
        Assert.Throws<ArgumentException>(() => reduction.Accept(-1, 0, leaf));
        Assert.Throws<ArgumentException>(() => reduction.Accept(1, 0, Fold(summariser, values, 1, 0)));
        Assert.Throws<ArgumentException>(() => reduction.Accept(0, 0, leaf[..1]));
        Assert.Throws<ArgumentException>(() => reduction.Accept(0, 0, [summariser.Summarise([1.0], _requests[0]), leaf[1]]));
    }

    [Fact]
    public void A_preview_shows_what_has_arrived_and_changes_nothing()
    {
        var values = AwkwardStreams.Create("normal", 30 * Edition.TrialsPerLeaf);
        var pool = new SummaryPool();
        var summariser = new LeafSummariser(new RunShape(values.Length), pool);
        var reduction = new RunReduction(values.Length, _requests, pool);
        Assert.Null(reduction.Preview(0, ErrorMethod.ClosedForm));

        foreach (var leaf in new[] { 7, 3, 2, 29 }) reduction.Accept(0, leaf, Leaf(summariser, values, leaf));
        int[] arrived = [2, 3, 7, 29];
        var seen = arrived.SelectMany(leaf => FoldedRuns.LeafOf(values, leaf).ToArray()).ToArray();
        var preview = reduction.Preview(0, ErrorMethod.ClosedForm)!;
        Assert.Equal(seen.Average(), preview.Mean.Value, 1e-12);
        Assert.Equal((seen.Min(), seen.Max()), (preview.Min, preview.Max));
        Assert.Contains("batches (4)", reduction.Preview(0, ErrorMethod.Batches)!.Mean.Reason, StringComparison.Ordinal);

        for (var leaf = 0; leaf < 29; leaf++)
        {
            if (leaf is not (2 or 3 or 7)) reduction.Accept(0, leaf, Leaf(summariser, values, leaf));
        }

        AssertSame(Reduce(values, level: 0, seed: null), reduction.Finish());
    }

    [Fact]
    public void A_finished_result_read_back_from_its_parts_gives_the_same_figures()
    {
        var result = Reduce(AwkwardStreams.Create("normal", 400_000), level: 0, seed: null)[0];

        var summary = OutcomeSummary.FromParts(result.Summary.Moments, result.Summary.Exceedances, result.Summary.Digest, []);
        var back = OutcomeResult.FromParts(result.Request, summary, result.Batches);

        foreach (var method in new[] { ErrorMethod.ClosedForm, ErrorMethod.Batches })
            Assert.Equivalent(Figures.Of(result, method), Figures.Of(back, method), strict: true);
        Assert.Throws<ArgumentException>(() => OutcomeResult.FromParts(result.Request, summary, result.Batches.Take(3).ToArray()));
        Assert.Throws<ArgumentException>(
            () => OutcomeSummary.FromParts(result.Summary.Moments, [400_001, 0], result.Summary.Digest, []));
    }

    [Fact]
    public void Folding_leaves_allocates_nothing_in_steady_state()
    {
        const int Leaves = 16;
        var values = AwkwardStreams.Create("normal", Leaves * Edition.TrialsPerLeaf);
        var pool = new SummaryPool();
        var summariser = new LeafSummariser(new RunShape(1L << 30), pool);
        var fold = new NodeFold(pool);
        var nodes = Enumerable.Range(0, Leaves).Select(_ => new OutcomeSummary[1]).ToArray();
        void FoldAll()
        {
            for (var leaf = 0; leaf < Leaves; leaf++)
            {
                nodes[leaf][0] = summariser.Summarise(FoldedRuns.LeafOf(values, leaf), _requests[0]);
                fold.Add(nodes[leaf]);
            }

            pool.Return(fold.Finish());
        }

        for (var warm = 0; warm < 3; warm++) FoldAll();
        var before = GC.GetAllocatedBytesForCurrentThread();
        FoldAll();

        Assert.Equal(0, GC.GetAllocatedBytesForCurrentThread() - before);
    }

    private static OutcomeSummary[] Leaf(LeafSummariser summariser, double[] values, long leaf) =>
        [.. _requests.Select(request => summariser.Summarise(FoldedRuns.LeafOf(values, leaf), request))];

    private static OutcomeSummary[] Fold(LeafSummariser summariser, double[] values, int level, long index)
    {
        var fold = new NodeFold(new SummaryPool());
        var last = Math.Min(new RunShape(values.Length).Leaves, (index + 1) << level);
        for (var leaf = index << level; leaf < last; leaf++) fold.Add(Leaf(summariser, values, leaf));
        return fold.Finish();
    }

    private static OutcomeResult[] Reduce(double[] values, int level, ulong? seed)
    {
        var pool = new SummaryPool();
        var reduction = new RunReduction(values.Length, _requests, pool);
        var summariser = new LeafSummariser(reduction.Shape, pool, LaneWidths.OfThisMachine);
        var order = Enumerable.Range(0, (int)reduction.Shape.NodesAt(level));
        var random = new SplitMix(seed ?? 0);
        if (seed is not null) order = order.OrderBy(_ => random.NextBits()).ToArray();
        foreach (var index in order) reduction.Accept(level, index, Fold(summariser, values, level, index));
        return reduction.Finish();
    }

    private static void AssertSame(OutcomeResult[] expected, OutcomeResult[] actual)
    {
        foreach (var (a, b) in expected.Zip(actual))
        {
            Assert.Equal(a.Summary.Moments, b.Summary.Moments);
            Assert.True(a.Summary.Exceedances.SequenceEqual(b.Summary.Exceedances));
            DigestLawTests.AssertSame(a.Summary.Digest, b.Summary.Digest);
            Assert.Equal(a.Batches.Count, b.Batches.Count);
            foreach (var (x, y) in a.Batches.Zip(b.Batches))
            {
                Assert.Equal(x.Moments, y.Moments);
                Assert.Equal(x.Exceedances, y.Exceedances);
                Assert.Equal(x.Var, y.Var);
                Assert.Equal(x.Tvar, y.Tvar);
            }
        }
    }
}
