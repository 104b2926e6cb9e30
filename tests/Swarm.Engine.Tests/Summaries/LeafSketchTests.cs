using CsCheck;
using Swarm.Engine.Numerics;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Summaries;

public class LeafSketchTests
{
    public static TheoryData<string> Streams => [.. AwkwardStreams.Names];

    [Fact]
    public void Every_width_gives_the_same_digest() =>
        SampleGen.Leaves.Sample(
            values =>
            {
                var scalar = DigestLawTests.DigestOf(values, LaneWidth.Scalar);
                foreach (var width in new[] { LaneWidth.Vector128, LaneWidth.Vector256, LaneWidth.Vector512 })
                    DigestLawTests.AssertSame(scalar, DigestLawTests.DigestOf(values, width));
            },
            iter: 60);

    [Fact]
    public void A_leaf_does_not_depend_on_the_leaves_before_it() =>
        Gen.Select(SampleGen.Leaves, SampleGen.Leaves).Sample(
            (earlier, leaf) =>
            {
                var pool = new SummaryPool();
                var used = new LeafSummariser(new RunShape(1 << 24), pool);
                pool.Return([used.Summarise(earlier, FoldedRuns.Plain)]);

                DigestLawTests.AssertSame(DigestLawTests.DigestOf(leaf), used.Summarise(leaf, FoldedRuns.Plain).Digest);
            },
            iter: 60);

    [Theory]
    [MemberData(nameof(Streams))]
    public void The_outermost_percent_of_a_leaf_is_kept_trial_by_trial(string stream)
    {
        var values = AwkwardStreams.Create(stream, Edition.TrialsPerLeaf);

        var digest = DigestLawTests.DigestOf(values);

        Array.Sort(values);
        for (var rank = 1; rank <= values.Length / 160; rank++)
        {
            Assert.Equal(values[rank - 1], digest.Quantile((rank - 0.5) / values.Length));
            Assert.Equal(values[^rank], digest.Quantile((values.Length - rank + 0.5) / values.Length));
        }
    }

    [Theory]
    [MemberData(nameof(Streams))]
    public void The_median_of_a_leaf_errs_by_less_than_a_third_of_its_sampling_error(string stream)
    {
        var values = AwkwardStreams.Create(stream, Edition.TrialsPerLeaf);

        var median = DigestLawTests.DigestOf(values).Quantile(0.5);

        Array.Sort(values);
        Assert.InRange(RankErrors.Of(values, median, 0.5) * Math.Sqrt(values.Length) / 0.5, 0, 0.33);
    }

    [Fact]
    public void An_atom_in_the_middle_of_a_leaf_keeps_its_exact_weight()
    {
        var values = AwkwardStreams.Create("normal", Edition.TrialsPerLeaf);
        for (var i = 0; i < values.Length; i += 5) values[i] = 0.25;

        var digest = DigestLawTests.DigestOf(values);

        var atom = digest.Means.IndexOf(0.25);
        Assert.True(digest.IsAtomAt(atom));
        Assert.Equal((values.Length + 4) / 5, digest.WeightAt(atom));
    }

    [Fact]
    public void Values_that_are_not_finite_are_refused()
    {
        var summariser = new LeafSummariser(new RunShape(1 << 24), new SummaryPool());

        foreach (var bad in new[] { double.NaN, double.PositiveInfinity, double.NegativeInfinity })
        {
            foreach (var place in new[] { 0, 77, 99 })
            {
                var values = Enumerable.Repeat(1.0, 100).ToArray();
                values[place] = bad;
                Assert.Throws<ArgumentException>(() => summariser.Summarise(values, FoldedRuns.Plain));
            }
        }
    }
}
