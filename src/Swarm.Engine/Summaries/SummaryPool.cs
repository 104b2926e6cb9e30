using System.Numerics;

namespace Swarm.Engine.Summaries;

/// <summary>
/// Summaries that are no longer needed and serve again, so that a run allocates nothing in steady state. Shared by all threads
/// of a run. Never needed for right results.
/// </summary>
public sealed class SummaryPool
{
    private const int SmallestBits = 8;
    private const int LargestBits = 30;
    private readonly Stack<OutcomeSummary>[] _free;
    private readonly Lock _lock = new();

    /// <summary>An empty pool.</summary>
    public SummaryPool()
    {
        _free = new Stack<OutcomeSummary>[LargestBits + 1];
        for (var i = 0; i < _free.Length; i++) _free[i] = new Stack<OutcomeSummary>();
    }

    /// <summary>Takes back summaries that nobody reads any more; the caller must drop them.</summary>
    public void Return(IReadOnlyList<OutcomeSummary> summaries)
    {
        for (var i = 0; i < summaries.Count; i++) Return(summaries[i]);
    }

    internal void Return(OutcomeSummary summary)
    {
        // Rounded down: a summary that was read back may have any capacity.
        var bits = BitOperations.Log2((uint)Math.Max(1, summary.Digest.Capacity));
        if (bits < SmallestBits) return;
        summary.Blocks = [];
        lock (_lock) _free[bits].Push(summary);
    }

    /// <summary>A summary whose digest has room for so many clusters.</summary>
    internal OutcomeSummary Rent(int clusters)
    {
        var bits = Math.Max(SmallestBits, BitOperations.Log2((uint)Math.Max(1, clusters - 1)) + 1);
        lock (_lock)
        {
            if (_free[bits].TryPop(out var summary)) return summary;
        }

        return new OutcomeSummary(1 << bits);
    }
}
