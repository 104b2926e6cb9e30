using System.Numerics;

namespace Swarm.Engine.Summaries;

/// <summary>
/// The dyadic tree over the leaves of a run. A node without a right neighbour is passed up unchanged, so the shape depends on
/// the number of trials alone.
/// </summary>
public readonly record struct RunShape
{
    private const int FewestBatches = 20;
    private const int MostBatches = 127;

    /// <summary>The tree of a run of so many trials.</summary>
    public RunShape(long trials)
    {
        if (trials < 1) throw new ArgumentOutOfRangeException(nameof(trials), trials, "A run has at least one trial.");
        Trials = trials;
        Leaves = ((trials - 1) / Edition.TrialsPerLeaf) + 1;
        var wholeLeaves = trials / Edition.TrialsPerLeaf;
        BatchesAreBlocks = wholeLeaves < FewestBatches;
        BatchLevel = BatchesAreBlocks ? 0 : Math.Max(0, BitOperations.Log2((ulong)wholeLeaves) - BitOperations.Log2(MostBatches));
    }

    /// <summary>Trials of the run.</summary>
    public long Trials { get; }

    /// <summary>Leaves, a partial last one included.</summary>
    public long Leaves { get; }

    /// <summary>True in a small run, whose batches are single blocks, so that there are enough of them.</summary>
    public bool BatchesAreBlocks { get; }

    /// <summary>The level whose whole nodes are the batches: 64 to 127 of them if there are that many leaves. A chunk lies at or below it.</summary>
    public int BatchLevel { get; }

    /// <summary>Trials of a whole batch.</summary>
    public long TrialsPerBatch => BatchesAreBlocks ? Edition.TrialsPerBlock : (long)Edition.TrialsPerLeaf << BatchLevel;

    /// <summary>Whole batches; what is left over is in the estimates, but not in the spread.</summary>
    public int WholeBatches => (int)(Trials / TrialsPerBatch);

    /// <summary>The level of the root.</summary>
    public int TopLevel => Leaves == 1 ? 0 : BitOperations.Log2((ulong)(Leaves - 1)) + 1;

    /// <summary>The highest level at which a chunk may be handed in: a batch, or the root of a small run.</summary>
    public int HighestChunkLevel => BatchesAreBlocks ? TopLevel : BatchLevel;

    /// <summary>Nodes of a level.</summary>
    public long NodesAt(int level) => ((Leaves - 1) >> level) + 1;

    /// <summary>Trials below a node: all of its leaves, or what the run's end leaves of them.</summary>
    public long TrialsOf(int level, long index)
    {
        var whole = (long)Edition.TrialsPerLeaf << level;
        return Math.Min(whole, Trials - (index * whole));
    }
}
