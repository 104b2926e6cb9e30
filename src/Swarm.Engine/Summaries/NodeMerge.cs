namespace Swarm.Engine.Summaries;

/// <summary>Merges summaries of neighbouring nodes, with the scratch memory for it: one a thread.</summary>
/// <param name="pool">Where merged summaries come from and go to; null allocates, and leaves the arguments alone.</param>
internal sealed class NodeMerge(SummaryPool? pool)
{
    private readonly DigestBuilder _builder = new();

    /// <summary>Whether merging consumes its arguments.</summary>
    public bool Recycles => pool is not null;

    /// <summary>The summary of both nodes; the arguments stay as they are.</summary>
    public OutcomeSummary Merge(OutcomeSummary left, OutcomeSummary right)
    {
        if (left.Exceedances.Length != right.Exceedances.Length)
            throw new ArgumentException("Summaries that count different thresholds are not of the same outcome.");
        var clusters = _builder.Merge(left.Digest, right.Digest);
        var merged = pool?.Rent(clusters) ?? new OutcomeSummary(clusters);
        _builder.CopyTo(merged.Digest);
        merged.Moments = Moments.Merge(left.Moments, right.Moments);
        var exceedances = merged.ExceedancesFor(left.Exceedances.Length);
        for (var i = 0; i < exceedances.Length; i++) exceedances[i] = left.Exceedances[i] + right.Exceedances[i];
        if (left.Blocks.Count + right.Blocks.Count > 0) merged.Blocks = [.. left.Blocks, .. right.Blocks];
        return merged;
    }

    /// <summary>Merges right into left, outcome by outcome, and gives what is no longer needed back to the pool.</summary>
    public void MergeInto(OutcomeSummary[] left, OutcomeSummary[] right)
    {
        if (left.Length != right.Length) throw new ArgumentException("Nodes with different numbers of outcomes are not of the same run.");
        for (var outcome = 0; outcome < left.Length; outcome++)
        {
            var merged = Merge(left[outcome], right[outcome]);
            pool?.Return(left[outcome]);
            pool?.Return(right[outcome]);
            left[outcome] = merged;
        }
    }
}
