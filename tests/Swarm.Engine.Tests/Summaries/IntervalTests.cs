using MathNet.Numerics.Distributions;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Summaries;

public class IntervalTests
{
    [Theory]
    [InlineData(9)]
    [InlineData(19)]
    [InlineData(63)]
    [InlineData(126)]
    [InlineData(1e9)]
    public void Student_t_quantiles_agree_with_an_independent_library(double degrees) =>
        Assert.Equal(StudentT.InvCDF(0, 1, degrees, 0.975), Confidence.StudentT(degrees), 1e-4);

    [Fact]
    public void A_printed_t_table_is_met()
    {
        // Student's t at 97.5 %, any printed table (e.g. Abramowitz & Stegun 1964, table 26.10).
        Assert.Equal(2.262, Confidence.StudentT(9), 0.0005);
        Assert.Equal(2.093, Confidence.StudentT(19), 0.0005);
        Assert.Equal(1.980, Confidence.StudentT(120), 0.0005);
    }

    [Fact]
    public void A_Wilson_interval_solves_the_score_equation()
    {
        var estimate = WilsonInterval.Of(15, 148);

        // Both ends p of the interval satisfy |p^ - p| = z sqrt(p (1 - p) / n) (Wilson 1927).
        foreach (var p in new[] { estimate.Low!.Value, estimate.High!.Value })
            Assert.Equal(1.959963984540054, Math.Abs((15.0 / 148) - p) / Math.Sqrt(p * (1 - p) / 148), 1e-9);
    }

    [Fact]
    public void A_Wilson_interval_covers_no_hit_and_nothing_but_hits()
    {
        var none = WilsonInterval.Of(0, 1000);
        var all = WilsonInterval.Of(1000, 1000);

        Assert.Equal((0.0, 0.0), (none.Value, none.Low));
        Assert.Equal((1.0, 1.0), (all.Value, all.High));
        Assert.Equal(none.High!.Value, 1 - all.Low!.Value, 1e-15);
        Assert.InRange(none.High.Value, 0.0035, 0.0041);
    }

    [Theory]
    [InlineData(0.0)]
    [InlineData(0.3)]
    [InlineData(-1.2)]
    [InlineData(4.0)]
    public void A_skewed_interval_ends_where_the_transformed_statistic_reaches_the_quantile(double g)
    {
        // Hall (1992): T + g T^2/3 + g^2 T^3/27 + g/6 at T = (estimate - end) / se.
        const double N = 10_000;
        var estimate = SkewedMean.Interval(7, 0.5, N, g * Math.Sqrt(N), kurtosis: 3);
        var quantile = Confidence.StudentT(N);

        foreach (var (end, sign) in new[] { (estimate.Low!.Value, 1), (estimate.High!.Value, -1) })
        {
            var t = (7 - end) / 0.5;
            Assert.Equal(sign * quantile, t + (g * t * t / 3) + (g * g * t * t * t / 27) + (g / 6), 1e-8);
        }
    }

    [Theory]
    [InlineData(0.995, 1_000_000, 995_000)]
    [InlineData(0.999, 1_000_000, 999_000)]
    [InlineData(0.005, 1_000_000, 5000)]
    [InlineData(0.1, 30, 3)]
    [InlineData(0.7, 10, 7)]
    [InlineData(0.701, 10, 8)]
    [InlineData(1, 10, 10)]
    [InlineData(0, 10, 1)]
    public void The_rank_of_a_level_is_not_moved_by_its_binary_rounding(double p, long count, long rank) =>
        Assert.Equal(rank, Ranks.OfLevel(p, count));
}
