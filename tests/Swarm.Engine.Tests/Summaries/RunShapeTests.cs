using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Summaries;

public class RunShapeTests
{
    private const long Leaf = Edition.TrialsPerLeaf;

    [Theory]
    [InlineData(1, 1, 0, 4096, 0)]
    [InlineData(81_920, 5, 3, 4096, 20)]
    [InlineData((20 * Leaf) - 1, 20, 5, 4096, 79)]
    [InlineData(20 * Leaf, 20, 5, Leaf, 20)]
    [InlineData(1_000_000, 62, 6, Leaf, 61)]
    [InlineData((128 * Leaf) - 1, 128, 7, Leaf, 127)]
    [InlineData(128 * Leaf, 128, 7, 2 * Leaf, 64)]
    [InlineData(100_000_000, 6104, 13, 64 * Leaf, 95)]
    public void The_number_of_trials_fixes_tree_and_batches(long trials, long leaves, int top, long perBatch, int batches)
    {
        var shape = new RunShape(trials);

        Assert.Equal((leaves, top, perBatch, batches), (shape.Leaves, shape.TopLevel, shape.TrialsPerBatch, shape.WholeBatches));
        Assert.Equal(1, shape.NodesAt(top));
        Assert.Equal(trials, Enumerable.Range(0, (int)leaves).Sum(leaf => shape.TrialsOf(0, leaf)));
    }

    [Fact]
    public void A_run_of_any_size_from_twenty_leaves_has_20_to_127_batches()
    {
        for (var trials = 20 * Leaf; trials < 1L << 44; trials += 1 + (trials / 7))
            Assert.InRange(new RunShape(trials).WholeBatches, 20, 127);
    }
}
