using CsCheck;
using Swarm.Engine.Numerics;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Summaries;

public class MomentsTests
{
    private static readonly LaneWidth[] _widths = [LaneWidth.Scalar, LaneWidth.Vector128, LaneWidth.Vector256, LaneWidth.Vector512];

    [Fact]
    public void Small_samples_have_the_moments_computed_by_hand()
    {
        // 1, 2, 3, 4, 10: mean 4, deviations -3 -2 -1 0 6.
        var moments = MomentKernel.Of([1, 2, 3, 4, 10], LaneWidth.Scalar);

        Assert.Equal(5, moments.Count);
        Assert.Equal(4, moments.Mean);
        Assert.Equal(9 + 4 + 1 + 0 + 36, moments.M2);
        Assert.Equal(-27 - 8 - 1 + 0 + 216, moments.M3);
        Assert.Equal(81 + 16 + 1 + 0 + 1296, moments.M4);
        Assert.Equal(-243 - 32 - 1 + 0 + 7776, moments.M5);
        Assert.Equal(729 + 64 + 1 + 0 + 46656, moments.M6);
        Assert.Equal((1.0, 10.0), (moments.Min, moments.Max));
        Assert.Equal(Math.Sqrt(12.5), moments.Sd);
        Assert.Equal(36 / Math.Pow(10, 1.5), moments.Skewness, 1e-15);
    }

    [Fact]
    public void Every_width_gives_the_same_bits() =>
        SampleGen.Values(1, 3000).Sample(
            values =>
            {
                var scalar = MomentKernel.Of(values, LaneWidth.Scalar);
                foreach (var width in _widths) Assert.Equal(scalar, MomentKernel.Of(values, width));
            },
            iter: 200);

    [Fact]
    public void Merged_parts_agree_with_the_whole_to_fourteen_digits() =>
        Gen.Select(Gen.Double[-5, 50].Array[2, 400], Gen.Int[1, 399]).Sample(
            (values, at) =>
            {
                var cut = Math.Min(at, values.Length - 1);
                var merged = Moments.Merge(
                    MomentKernel.Of(values.AsSpan(0, cut), LaneWidth.Scalar), MomentKernel.Of(values.AsSpan(cut), LaneWidth.Scalar));
                var whole = MomentKernel.Of(values, LaneWidth.Scalar);

                Assert.Equal(whole.Count, merged.Count);
                Assert.Equal(whole.Mean, merged.Mean, 1e-12);
                for (var order = 2; order <= Moments.HighestOrder; order++)
                {
                    var scale = values.Sum(x => Math.Pow(Math.Abs(x - whole.Mean), order));
                    Assert.Equal(whole.PowerSum(order), merged.PowerSum(order), 1e-13 * scale);
                }
            },
            iter: 300);

    [Fact]
    public void Merging_with_nothing_changes_nothing()
    {
        var moments = MomentKernel.Of([3, 1, 4, 1, 5], LaneWidth.Scalar);

        Assert.Equal(moments, Moments.Merge(default, moments));
        Assert.Equal(moments, Moments.Merge(moments, default));
    }

    [Fact]
    public void The_mean_of_values_at_the_end_of_the_range_is_finite()
    {
        var values = Enumerable.Repeat(1.5e308, 100).Append(1.4e308).ToArray();

        var moments = MomentKernel.Of(values, LaneWidth.Scalar);

        Assert.Equal(((100 * 1.5) + 1.4) / 101, moments.Mean / 1e308, 1e-12);
        Assert.Equal(double.PositiveInfinity, moments.M2);
    }

    [Fact]
    public void Equal_values_have_no_spread_whatever_rounding_their_sum_suffers()
    {
        var tenths = MomentKernel.Of(Enumerable.Repeat(0.1, 1001).ToArray(), LaneWidths.OfThisMachine);

        Assert.Equal(0.1, tenths.Mean);
        Assert.Equal(0, Moments.Merge(tenths, tenths).M2);
    }

    [Fact]
    public void A_threshold_itself_is_not_above_it() =>
        Assert.All(_widths, width => Assert.Equal(2, MomentKernel.CountAbove([1, 2, 2, 2, 2, 2, 2, 3, 2, 2, 4], 2, width)));
}
