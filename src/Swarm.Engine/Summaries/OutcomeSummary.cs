namespace Swarm.Engine.Summaries;

/// <summary>What one tree node knows of one outcome. Immutable to readers; lives in a <see cref="SummaryPool"/>.</summary>
public sealed class OutcomeSummary
{
    private long[] _exceedances = [];
    private int _thresholds;

    internal OutcomeSummary(int digestCapacity) => Digest = new TDigest(digestCapacity);

    private OutcomeSummary(Moments moments, TDigest digest)
    {
        Moments = moments;
        Digest = digest;
    }

    /// <summary>Count, mean, central power sums, least and greatest.</summary>
    public Moments Moments { get; internal set; }

    /// <summary>The sketch of the distribution.</summary>
    public TDigest Digest { get; }

    /// <summary>For each threshold the trials above it.</summary>
    public ReadOnlySpan<long> Exceedances => _exceedances.AsSpan(0, _thresholds);

    /// <summary>Figures of the node's single blocks, in order; empty unless the run is so small that its batches are blocks.</summary>
    public IReadOnlyList<BatchFigures> Blocks { get; internal set; } = [];

    /// <summary>Trials.</summary>
    public long Trials => Moments.Count;

    /// <summary>Reads a summary back from its parts.</summary>
    /// <exception cref="ArgumentException">The parts are not of the same trials, or no sample has them.</exception>
    public static OutcomeSummary FromParts(
        Moments moments, ReadOnlySpan<long> exceedances, TDigest digest, IReadOnlyList<BatchFigures> blocks)
    {
        if (moments.Count != digest.TotalWeight)
            throw new ArgumentException($"The moments are of {moments.Count} trials, the digest of {digest.TotalWeight}.");
        if (moments.Count < 1 || moments.Min != digest.Min || moments.Max != digest.Max)
            throw new ArgumentException("The moments and the digest disagree on the least or greatest value.");
        if (!double.IsFinite(moments.Mean) || moments.M2 < 0 || moments.M4 < 0 || moments.M6 < 0)
            throw new ArgumentException("The mean is not finite, or an even power sum is negative.");
        foreach (var count in exceedances)
        {
            if (count < 0 || count > moments.Count)
                throw new ArgumentException($"{count} exceedances in {moments.Count} trials.");
        }

        var summary = new OutcomeSummary(moments, digest) { Blocks = blocks };
        exceedances.CopyTo(summary.ExceedancesFor(exceedances.Length));
        return summary;
    }

    /// <summary>The summary of two neighbouring nodes. The left one holds the earlier trials.</summary>
    /// <exception cref="ArgumentException">The nodes count different thresholds.</exception>
    public static OutcomeSummary Merge(OutcomeSummary left, OutcomeSummary right) => new NodeMerge(null).Merge(left, right);

    internal Span<long> ExceedancesFor(int thresholds)
    {
        if (_exceedances.Length < thresholds) _exceedances = new long[thresholds];
        _thresholds = thresholds;
        return _exceedances.AsSpan(0, thresholds);
    }
}
