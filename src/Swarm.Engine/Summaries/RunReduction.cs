namespace Swarm.Engine.Summaries;

/// <summary>
/// Folds the nodes of a run, which arrive in any order and from any thread, in one fixed tree: equal bits whatever the chunks.
/// Siblings are merged as soon as both are there, so memory holds the nodes that wait for a neighbour alone.
/// </summary>
public sealed class RunReduction
{
    private readonly IReadOnlyList<OutcomeRequest> _outcomes;
    private readonly double[][] _levels;
    private readonly SortedDictionary<long, BatchFigures[]> _batches = [];
    private readonly Dictionary<(int Level, long Index), OutcomeSummary[]> _waiting = [];
    private readonly DigestIndex _index = new();
    private readonly NodeMerge _merge;
    private readonly Lock _lock = new();

    /// <summary>A reduction that nothing has arrived at.</summary>
    /// <param name="trials">Trials of the run.</param>
    /// <param name="outcomes">The outcomes, in the order of the summaries of each node.</param>
    /// <param name="pool">The pool that merged summaries go back to; null lets them go to the garbage collector.</param>
    public RunReduction(long trials, IReadOnlyList<OutcomeRequest> outcomes, SummaryPool? pool = null)
    {
        Shape = new RunShape(trials);
        _outcomes = outcomes;
        _levels = [.. outcomes.Select(BatchLevels.For)];
        _merge = new NodeMerge(pool);
    }

    /// <summary>The run's tree.</summary>
    public RunShape Shape { get; }

    /// <summary>Trials that have arrived.</summary>
    public long TrialsSeen { get; private set; }

    /// <summary>
    /// Takes a node: level 0 is a leaf, level k the node of 2^k leaves, index counted from 0 at its level. With a pool, the
    /// reduction owns the array and its summaries from now on.
    /// </summary>
    /// <exception cref="ArgumentException">The node does not fit the run, or its trials were handed in before.</exception>
    public void Accept(int level, long index, OutcomeSummary[] node)
    {
        lock (_lock)
        {
            Verify(level, index, node);
            TrialsSeen += node[0].Trials;
            if (Shape.BatchesAreBlocks) HarvestBlocks(level, index, node);
            Settle(level, index, _merge.Recycles ? node : [.. node]);
        }
    }

    /// <summary>The figures of one outcome from what has arrived so far; null before anything has.</summary>
    public OutcomeFigures? Preview(int outcome, ErrorMethod method)
    {
        lock (_lock)
        {
            OutcomeSummary? folded = null;
            var merge = new NodeMerge(null);
            foreach (var (_, node) in _waiting.OrderByDescending(entry => entry.Key.Index << entry.Key.Level))
                folded = folded is null ? node[outcome] : merge.Merge(node[outcome], folded);
            return folded is null ? null : Figures.Of(ResultOf(outcome, folded), method);
        }
    }

    /// <summary>The results of all outcomes. Their summaries belong to the caller.</summary>
    /// <exception cref="InvalidOperationException">Trials are missing.</exception>
    public OutcomeResult[] Finish()
    {
        lock (_lock)
        {
            if (TrialsSeen != Shape.Trials)
                throw new InvalidOperationException($"{Shape.Trials - TrialsSeen} of {Shape.Trials} trials have not arrived.");
            var root = _waiting[(Shape.TopLevel, 0)];
            return [.. Enumerable.Range(0, _outcomes.Count).Select(outcome => ResultOf(outcome, root[outcome]))];
        }
    }

    private OutcomeResult ResultOf(int outcome, OutcomeSummary summary) => new(
        _outcomes[outcome], summary, Shape.TrialsPerBatch, [.. _batches.Values.Select(batch => batch[outcome])]);

    private void Verify(int level, long index, OutcomeSummary[] node)
    {
        if (level < 0 || level > Shape.HighestChunkLevel || index < 0 || index >= Shape.NodesAt(level))
            throw new ArgumentException($"The run has no chunk {index} at level {level}.");
        if (node.Length != _outcomes.Count)
            throw new ArgumentException($"The node has {node.Length} outcomes, the run {_outcomes.Count}.");
        var trials = Shape.TrialsOf(level, index);
        if (node.Any(summary => summary.Trials != trials))
            throw new ArgumentException($"Node {index} at level {level} has {trials} trials, not {node[0].Trials}.");
        if (Overlaps(level, index))
            throw new ArgumentException($"Trials of node {index} at level {level} were handed in before.");
    }

    private bool Overlaps(int level, long index)
    {
        for (var up = level; up <= Shape.TopLevel; up++)
        {
            if (_waiting.ContainsKey((up, index >> (up - level)))) return true;
        }

        foreach (var waiting in _waiting.Keys)
        {
            if (waiting.Level < level && waiting.Index >> (level - waiting.Level) == index) return true;
        }

        return false;
    }

    /// <summary>Puts a node in its place and merges upwards as far as siblings are there.</summary>
    private void Settle(int level, long index, OutcomeSummary[] node)
    {
        while (true)
        {
            HarvestBatch(level, index, node);
            if (level == Shape.TopLevel) break;
            var sibling = index ^ 1;
            if (sibling < Shape.NodesAt(level))
            {
                if (!_waiting.Remove((level, sibling), out var other)) break;
                var (left, right) = sibling < index ? (other, node) : (node, other);
                _merge.MergeInto(left, right);
                node = left;
            }

            level++;
            index >>= 1;
        }

        _waiting.Add((level, index), node);
    }

    private void HarvestBatch(int level, long index, OutcomeSummary[] node)
    {
        if (Shape.BatchesAreBlocks || level != Shape.BatchLevel || node[0].Trials != Shape.TrialsPerBatch) return;
        var figures = new BatchFigures[node.Length];
        for (var outcome = 0; outcome < node.Length; outcome++)
        {
            _index.Read(node[outcome].Digest);
            figures[outcome] = BatchFigures.Of(node[outcome], _index, _outcomes[outcome], _levels[outcome]);
        }

        _batches.Add(index, figures);
    }

    private void HarvestBlocks(int level, long index, OutcomeSummary[] node)
    {
        var first = (index << level) * Edition.BlocksPerLeaf;
        var blocks = Shape.TrialsOf(level, index) / Edition.TrialsPerBlock;
        if (node.Any(summary => summary.Blocks.Count != blocks))
            throw new ArgumentException($"Node {index} at level {level} of a small run lacks the figures of its {blocks} blocks.");
        for (var block = 0; block < blocks; block++)
            _batches.Add(first + block, [.. node.Select(summary => summary.Blocks[block])]);
    }
}
