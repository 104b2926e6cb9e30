using CsCheck;
using Swarm.Engine.Reserving;
using static Swarm.Engine.Tests.Reserving.ReferenceValues;

namespace Swarm.Engine.Tests.Reserving;

public sealed class ChainLadderTests
{
    private static readonly Triangle s_small = Triangles.OfCumulative([100, 200, 220], [300, 450], [200]);

    // Amounts to date and growth from period to period, of four origins.
    private static readonly Gen<Triangle> s_triangles =
        Gen.Select(Gen.Double[50, 5_000].Array[4], Gen.Double[1.01, 3].Array[3].Array[4], (starts, growth) =>
            Triangles.OfCumulative([.. starts.Select((start, i) => Grow(start, growth[i], 4 - i))]));

    [Fact]
    public void Volume_weighted_and_simple_averages_are_those_by_hand()
    {
        Assert.Equal([650.0 / 400, 1.1], Triangles.ChainLadder(s_small).Factors);
        Assert.Equal([1.75, 1.1], Triangles.ChainLadder(s_small, new ReservingOptions { Average = LinkRatioAverage.Simple }).Factors);
    }

    [Fact]
    public void Only_the_last_periods_count_when_asked()
    {
        ChainLadder fit = Triangles.ChainLadder(s_small, new ReservingOptions { LastPeriods = 1 });

        Assert.Equal([1.5, 1.1], fit.Factors);
        Assert.False(fit.Ratios.IsCounted(0, 0));
        Assert.True(fit.Ratios.IsCounted(1, 0));
    }

    [Fact]
    public void An_excluded_link_ratio_does_not_count() =>
        Assert.Equal([2, 1.1], Triangles.ChainLadder(s_small, new ReservingOptions { Excluded = [(1, 0)] }).Factors);

    [Fact]
    public void The_payment_pattern_holds_the_diagonals_of_the_future_cells()
    {
        ChainLadder fit = Triangles.ChainLadder(
            s_small, new ReservingOptions { Tail = new TailOptions { Factor = 1.2, Periods = 2 } });

        Assert.Equal(4, fit.FuturePeriods);
        for (int period = 0; period < fit.FuturePeriods; period++)
        {
            AssertClose(fit.FutureCells().Where(cell => cell.Period == period).Sum(cell => cell.Mean), fit.PaidIn(period), 1e-12);
        }

        AssertClose(fit.TotalReserve, Enumerable.Range(0, 4).Sum(fit.PaidIn), 1e-12);
    }

    [Fact]
    public void A_tail_adds_its_factor_less_one_of_every_origin()
    {
        ChainLadder fit = Triangles.ChainLadder(
            s_small, new ReservingOptions { Tail = new TailOptions { Factor = 1.2, Periods = 2 } });

        AssertClose(220 * 0.2, fit.Reserve(0), 1e-12);
        AssertClose(200 * 1.625 * 1.1 * 1.2, fit.Ultimate(2), 1e-12);
        // Two factors show no decay to go by, so the tail is paid in equal parts.
        AssertClose(22, fit.FutureIncrement(0, 3), 1e-12);
        AssertClose(22, fit.FutureIncrement(0, 4), 1e-12);
    }

    [Fact]
    public void An_exponential_decay_is_found_again_and_its_product_is_the_tail()
    {
        double[] factors = [.. Enumerable.Range(0, 6).Select(j => 1 + (0.8 * Math.Pow(0.5, j)))];
        double[] row = [.. factors.Aggregate(new List<double> { 1_000 }, (list, f) => [.. list, list[^1] * f])];
        Triangle triangle = Triangles.OfCumulative([.. Enumerable.Range(0, 7).Select(i => row[..(7 - i)])]);

        ChainLadder fit = Triangles.ChainLadder(
            triangle, new ReservingOptions { Tail = new TailOptions { Periods = 3 } });

        Tail tail = fit.Tail!;
        double beyond = Enumerable.Range(6, 60).Aggregate(1.0, (product, j) => product * (1 + (0.8 * Math.Pow(0.5, j))));
        Assert.True(tail.IsFitted);
        AssertClose(0.5, tail.Decay!.Ratio, 1e-12);
        AssertClose(beyond, tail.Factor, 1e-9);
        AssertClose([4 / 7.0, 2 / 7.0, 1 / 7.0], tail.Shares, 1e-12);
    }

    [Fact]
    public void Scaling_the_triangle_scales_the_reserves() =>
        Gen.Select(s_triangles, Gen.Double[0.1, 50]).Sample((triangle, scale) =>
        {
            Triangle scaled = new(triangle.Origins, [.. Enumerable.Range(0, 4).Select(i =>
                Enumerable.Range(0, 4 - i).Select(j => scale * triangle.Incremental(i, j)).ToArray())], 12);
            ChainLadder before = Triangles.ChainLadder(triangle);
            ChainLadder after = Triangles.ChainLadder(scaled);

            AssertClose(scale * before.TotalReserve, after.TotalReserve, 1e-9);
            // Where origins grow alike, errors are nothing but rounding.
            double rounding = 1e-7 * after.TotalReserve;
            AssertClose(
                scale * Triangles.Mack(triangle).Total.StandardError, Triangles.Mack(scaled).Total.StandardError, 1e-7, rounding);
            AssertClose(scale * Triangles.Odp(triangle).Scale(0), Triangles.Odp(scaled).Scale(0), 1e-7, rounding);
        });

    [Fact]
    public void Fitted_means_of_each_origin_and_development_sum_to_its_amounts() =>
        s_triangles.Sample(triangle =>
        {
            OdpFit fit = Triangles.Odp(triangle);
            for (int k = 0; k < 4; k++)
            {
                AssertClose(triangle.Latest(k), Enumerable.Range(0, 4 - k).Sum(j => fit.Mean(k, j)), 1e-9);
                AssertClose(
                    Enumerable.Range(0, 4 - k).Sum(i => triangle.Incremental(i, k)),
                    Enumerable.Range(0, 4 - k).Sum(i => fit.Mean(i, k)),
                    1e-9);
            }
        });

    [Fact]
    public void A_triangle_that_follows_the_chain_ladder_has_no_residuals_and_no_errors() =>
        Gen.Select(Gen.Double[50, 5_000].Array[4], Gen.Double[1.01, 3].Array[3]).Sample((starts, factors) =>
        {
            Triangle triangle = Triangles.OfCumulative([.. starts.Select((start, i) => Grow(start, factors, 4 - i))]);
            Mack mack = Triangles.Mack(triangle);

            AssertClose(factors, mack.ChainLadder.Factors, 1e-12);
            Assert.All(Triangles.Odp(triangle).Residuals, r => Assert.Equal(0, r.Pearson, 1e-9));
            Assert.Equal(0, mack.Total.StandardError / mack.ChainLadder.TotalReserve, 1e-6);
        });

    private static double[] Grow(double start, double[] growth, int known)
    {
        double[] row = new double[known];
        for (int j = 0; j < known; j++)
        {
            row[j] = j == 0 ? start : row[j - 1] * growth[j - 1];
        }

        return row;
    }
}
