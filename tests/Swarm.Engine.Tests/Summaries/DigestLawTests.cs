using CsCheck;
using Swarm.Engine.Numerics;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Summaries;

public class DigestLawTests
{
    private static readonly double[] _levels = [0, 1e-6, 0.001, 0.005, 0.01, 0.1, 0.25, 0.5, 0.75, 0.9, 0.99, 0.995, 0.999, 1];

    [Fact]
    public void A_leaf_s_digest_keeps_the_weight_the_extremes_and_the_order() =>
        SampleGen.Leaves.Sample(values => AssertLaws(DigestOf(values), values.Length, values.Min(), values.Max()), iter: 150);

    [Fact]
    public void Merging_any_pair_keeps_the_weight_the_extremes_and_the_order() =>
        Gen.Select(SampleGen.Leaves, SampleGen.Leaves).Sample(
            (a, b) => AssertLaws(
                Merged(DigestOf(a), DigestOf(b)), a.Length + b.Length, Math.Min(a.Min(), b.Min()), Math.Max(a.Max(), b.Max())),
            iter: 100);

    [Fact]
    public void Merging_does_not_care_which_digest_is_left() =>
        Gen.Select(SampleGen.Leaves, SampleGen.Leaves).Sample(
            (a, b) => AssertSame(Merged(DigestOf(a), DigestOf(b)), Merged(DigestOf(b), DigestOf(a))), iter: 60);

    [Fact]
    public void A_digest_read_back_from_its_clusters_is_the_same() =>
        SampleGen.Leaves.Sample(values => AssertSame(DigestOf(values), ReadBack(DigestOf(values))), iter: 60);

    [Fact]
    public void Quantiles_and_shares_invert_each_other_at_atoms()
    {
        // 30 % zeros, 50 % ones, 20 % fives.
        var digest = DigestOf([.. Enumerable.Range(0, 1000).Select(i => i % 10 < 3 ? 0.0 : i % 10 < 8 ? 1 : 5)]);

        Assert.Equal([0, 0, 1, 1, 5, 5], new[] { 0.1, 0.3, 0.3001, 0.8, 0.8001, 1 }.Select(digest.Quantile));
        Assert.Equal([0, 0.3, 0.3, 0.8, 0.8, 1], new[] { -0.1, 0, 0.9, 1, 4.9, 5 }.Select(digest.Cdf));
    }

    [Theory]
    [InlineData("the mean is not finite", new[] { 1, double.NaN }, new[] { 1L, 1 }, new[] { true, true }, 2)]
    [InlineData("the means do not ascend", new[] { 2.0, 1 }, new[] { 1L, 1 }, new[] { true, true }, 2)]
    [InlineData("the weight is below 1", new[] { 1.0, 2 }, new[] { 2L, 0 }, new[] { true, true }, 2)]
    [InlineData("the weights exceed the total", new[] { 1.0, 2 }, new[] { 1L, long.MaxValue }, new[] { true, true }, 2)]
    [InlineData("add up to 2, not 3", new[] { 1.0, 2 }, new[] { 1L, 1 }, new[] { true, true }, 3)]
    [InlineData("it must be an atom", new[] { 1.0, 2 }, new[] { 1L, 2 }, new[] { true, false }, 3)]
    [InlineData("as many weights", new[] { 1.0, 2 }, new[] { 1L }, new[] { true, true }, 2)]
    public void Clusters_that_are_no_digest_are_refused(string fault, double[] means, long[] weights, bool[] atoms, long total)
    {
        var refusal = Assert.Throws<ArgumentException>(() => TDigest.FromClusters(means, weights, atoms, total));

        Assert.Contains(fault, refusal.Message, StringComparison.Ordinal);
    }

    internal static TDigest DigestOf(double[] values, LaneWidth? width = null)
    {
        var machine = width ?? LaneWidths.OfThisMachine;
        var builder = new DigestBuilder();
        var (min, max) = MomentKernel.ExtremesOf(values, machine);
        new LeafSketch(machine).Sketch(values, min, max, builder);
        var digest = new TDigest(builder.Join());
        builder.CopyTo(digest);
        return digest;
    }

    internal static void AssertSame(TDigest expected, TDigest actual)
    {
        Assert.Equal(expected.TotalWeight, actual.TotalWeight);
        Assert.True(expected.Marks.SequenceEqual(actual.Marks));
        Assert.Equal(expected.Means.ToArray().Select(BitConverter.DoubleToInt64Bits), actual.Means.ToArray().Select(BitConverter.DoubleToInt64Bits));
    }

    private static TDigest Merged(TDigest a, TDigest b)
    {
        var builder = new DigestBuilder();
        var digest = new TDigest(builder.Merge(a, b));
        builder.CopyTo(digest);
        return digest;
    }

    private static TDigest ReadBack(TDigest digest)
    {
        var clusters = Enumerable.Range(0, digest.Count).ToArray();
        return TDigest.FromClusters(
            digest.Means, clusters.Select(digest.WeightAt).ToArray(), clusters.Select(digest.IsAtomAt).ToArray(), digest.TotalWeight);
    }

    private static void AssertLaws(TDigest digest, long weight, double min, double max)
    {
        // Reading back checks finiteness, order, weights and the atoms at both ends.
        Assert.Equal(weight, ReadBack(digest).TotalWeight);
        Assert.Equal((min, max), (digest.Min, digest.Max));
        var quantiles = _levels.Select(digest.Quantile).ToArray();
        Assert.Equal(quantiles.Order(), quantiles);
        Assert.All(quantiles, q => Assert.InRange(q, min, max));
        var shares = quantiles.Select(digest.Cdf).ToArray();
        Assert.Equal(shares.Order(), shares);
        Assert.All(shares, share => Assert.InRange(share, 0, 1));
    }
}
