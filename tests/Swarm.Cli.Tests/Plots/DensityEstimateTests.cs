using CsCheck;
using Swarm.Cli.Plots;
using Swarm.Cli.Tests.Samples;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Tests.Plots;

public sealed class DensityEstimateTests(SampleRecord sample) : IClassFixture<SampleRecord>
{
    [Fact]
    public void A_density_covers_an_area_of_one()
    {
        var estimate = DensityEstimate.Of(DigestOf("motor.unpaid"));
        var width = estimate.Values[1] - estimate.Values[0];

        Assert.Empty(estimate.Atoms);
        Assert.Equal(1, estimate.Densities.Sum() * width, 0.01);
    }

    [Fact]
    public void A_density_stands_where_the_trials_are()
    {
        var digest = DigestOf("motor.unpaid");
        var estimate = DensityEstimate.Of(digest);
        var width = estimate.Values[1] - estimate.Values[0];
        var (low, high) = (digest.Quantile(0.25), digest.Quantile(0.75));

        var inside = estimate.Values.Zip(estimate.Densities).Where(point => point.First > low && point.First < high).Sum(point => point.Second) * width;

        Assert.Equal(0.5, inside, 0.02);
    }

    [Fact]
    public void A_value_that_many_trials_share_stands_apart()
    {
        var digest = DigestOf("shortfall");
        var estimate = DensityEstimate.Of(digest);

        var (value, share) = Assert.Single(estimate.Atoms);
        Assert.Equal(0, value);
        Assert.Equal(digest.Cdf(0), share, 1e-12);
        Assert.NotEmpty(estimate.Densities);
    }

    [Fact]
    public void A_yes_or_no_is_atoms_alone()
    {
        var estimate = DensityEstimate.Of(TDigest.FromClusters([0, 1], [900, 100], [true, true], 1000));

        Assert.Equal([(0.0, 0.9), (1.0, 0.1)], estimate.Atoms);
        Assert.Empty(estimate.Values);
    }

    [Fact]
    public void The_curve_through_rising_points_rises_and_meets_them() =>
        Gen.Select(Gen.Double[0.01, 10].Array[3, 12], Gen.Double[0, 10].Array[12]).Sample(
            (gaps, rises) =>
            {
                double[] x = [.. Running(gaps)];
                double[] y = [.. Running(rises[..x.Length])];
                var curve = new MonotoneCubic(x, y);
                double[] heights = [.. Enumerable.Range(0, 400).Select(i => curve.At(x[0] + ((x[^1] - x[0]) * i / 399)))];
                return heights.Zip(heights.Skip(1)).All(pair => pair.Second >= pair.First - 1e-9)
                    && x.Zip(y).All(point => Math.Abs(curve.At(point.First) - point.Second) < 1e-9);
            },
            seed: "0000KqV0Zz3f");

    private static IEnumerable<double> Running(IEnumerable<double> steps)
    {
        var sum = 0.0;
        foreach (var step in steps) yield return sum += step;
    }

    private TDigest DigestOf(string name) => sample.Record.Outcomes.Single(outcome => outcome.Result.Request.Name == name).Result.Summary.Digest;
}
