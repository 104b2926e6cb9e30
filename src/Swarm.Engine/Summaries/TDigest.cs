namespace Swarm.Engine.Summaries;

/// <summary>
/// A mergeable t-digest (Dunning &amp; Ertl 2019): the sorted sample, cut into clusters of neighbours that are narrow in the
/// tails and wide in the bulk. An atom holds copies of one value, so repeated values and the extremes stay exact.
/// Immutable to readers.
/// </summary>
public sealed class TDigest
{
    private const long MixedFlag = 1;
    private double[] _means;
    private long[] _marks;

    internal TDigest(int capacity)
    {
        _means = new double[capacity + 1];
        _marks = new long[capacity + 1];
        _means[0] = double.PositiveInfinity;
    }

    /// <summary>Clusters.</summary>
    public int Count { get; private set; }

    /// <summary>Trials: the sum of the clusters' weights.</summary>
    public long TotalWeight { get; private set; }

    /// <summary>Means of the clusters, ascending.</summary>
    public ReadOnlySpan<double> Means => _means.AsSpan(0, Count);

    /// <summary>The least value; not a number in an empty digest.</summary>
    public double Min => Count == 0 ? double.NaN : _means[0];

    /// <summary>The greatest value; not a number in an empty digest.</summary>
    public double Max => Count == 0 ? double.NaN : _means[Count - 1];

    /// <summary>For each cluster twice its weight, plus one unless it is an atom.</summary>
    internal ReadOnlySpan<long> Marks => _marks.AsSpan(0, Count);

    /// <summary>The means and one more, infinite, that ends a merge.</summary>
    internal ReadOnlySpan<double> GuardedMeans => _means.AsSpan(0, Count + 1);

    /// <summary>The marks and one more.</summary>
    internal ReadOnlySpan<long> GuardedMarks => _marks.AsSpan(0, Count + 1);

    internal int Capacity => _means.Length - 1;

    /// <summary>Trials of a cluster.</summary>
    public long WeightAt(int index) => Marks[index] >> 1;

    /// <summary>True where all trials of a cluster have the same value.</summary>
    public bool IsAtomAt(int index) => (Marks[index] & MixedFlag) == 0;

    /// <summary>The trials' value at a level: an estimate of the lower inverse inf{x: F(x) &gt;= p}, exact at atoms.</summary>
    /// <param name="p">0 to 1, both included.</param>
    public double Quantile(double p)
    {
        if (!(p >= 0 && p <= 1)) throw new ArgumentOutOfRangeException(nameof(p), p, "A level lies between 0 and 1.");
        return DigestIndex.Of(this).ValueAt(Ranks.OfLevel(p, TotalWeight));
    }

    /// <summary>The share of trials at or below a value.</summary>
    public double Cdf(double value) => DigestIndex.Of(this).WeightAtOrBelow(value) / TotalWeight;

    /// <summary>Reads a digest back from its clusters.</summary>
    /// <param name="means">Finite, ascending.</param>
    /// <param name="weights">At least 1 each.</param>
    /// <param name="atoms">Which clusters hold one value alone; a weight of 1 must, the first and the last must.</param>
    /// <param name="totalWeight">The sum of the weights.</param>
    /// <exception cref="ArgumentException">The clusters are not those of a digest; the message says where.</exception>
    public static TDigest FromClusters(
        ReadOnlySpan<double> means, ReadOnlySpan<long> weights, ReadOnlySpan<bool> atoms, long totalWeight)
    {
        if (means.Length != weights.Length || means.Length != atoms.Length)
            throw new ArgumentException("A digest has as many weights and atom flags as means.");
        var digest = new TDigest(means.Length);
        var total = 0L;
        for (var i = 0; i < means.Length; i++)
        {
            var fault = FaultOf(means, weights[i], atoms[i], i, totalWeight - total);
            if (fault is not null) throw new ArgumentException($"Cluster {i} of the digest: {fault}.");
            total += weights[i];
            digest._means[i] = means[i];
            digest._marks[i] = Mark(weights[i], atoms[i]);
        }

        if (total != totalWeight) throw new ArgumentException($"The digest's weights add up to {total}, not {totalWeight}.");
        digest.Count = means.Length;
        digest._means[means.Length] = double.PositiveInfinity;
        digest.TotalWeight = total;
        return digest;
    }

    internal static long Mark(long weight, bool atom) => (weight << 1) | (atom ? 0 : MixedFlag);

    internal void Assign(ReadOnlySpan<double> means, ReadOnlySpan<long> marks, long totalWeight)
    {
        if (means.Length > Capacity)
        {
            _means = new double[means.Length + 1];
            _marks = new long[means.Length + 1];
        }

        means.CopyTo(_means);
        marks.CopyTo(_marks);
        _means[means.Length] = double.PositiveInfinity;
        Count = means.Length;
        TotalWeight = totalWeight;
    }

    private static string? FaultOf(ReadOnlySpan<double> means, long weight, bool atom, int i, long weightLeft)
    {
        if (!double.IsFinite(means[i])) return "the mean is not finite";
        if (i > 0 && means[i] < means[i - 1]) return "the means do not ascend";
        if (weight < 1) return "the weight is below 1";
        if (weight > weightLeft) return "the weights exceed the total";
        if (!atom && (weight == 1 || i == 0 || i == means.Length - 1)) return "it must be an atom";
        return null;
    }
}
