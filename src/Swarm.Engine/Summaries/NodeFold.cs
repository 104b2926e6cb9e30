namespace Swarm.Engine.Summaries;

/// <summary>
/// Folds the consecutive leaves of a chunk into its one node, in the same tree as <see cref="RunReduction"/>, so with the same
/// bits. One a thread.
/// </summary>
public sealed class NodeFold
{
    private readonly List<(int Level, OutcomeSummary[] Node)> _open = [];
    private readonly NodeMerge _merge;

    /// <summary>An empty fold; merged summaries go back to the pool.</summary>
    public NodeFold(SummaryPool pool) => _merge = new NodeMerge(pool);

    /// <summary>Takes the next leaf, one summary for each outcome. The fold owns the array and its summaries from now on.</summary>
    public void Add(OutcomeSummary[] leaf)
    {
        _open.Add((0, leaf));
        while (_open.Count > 1 && _open[^1].Level == _open[^2].Level) MergeLast();
    }

    /// <summary>The node of all leaves since the last call. A lone right edge is passed up unchanged.</summary>
    /// <exception cref="InvalidOperationException">No leaf was added.</exception>
    public OutcomeSummary[] Finish()
    {
        if (_open.Count == 0) throw new InvalidOperationException("A node has at least one leaf.");
        while (_open.Count > 1) MergeLast();
        var node = _open[0].Node;
        _open.Clear();
        return node;
    }

    private void MergeLast()
    {
        var (level, left) = _open[^2];
        _merge.MergeInto(left, _open[^1].Node);
        _open.RemoveAt(_open.Count - 1);
        _open[^1] = (level + 1, left);
    }
}
