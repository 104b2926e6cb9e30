using MathNet.Numerics.Distributions;
using Swarm.Engine.Distributions;
using Gamma = Swarm.Engine.Distributions.Gamma;
using Normal = Swarm.Engine.Distributions.Normal;

namespace Swarm.Engine.Tests.Distributions;

/// <summary>Samples against the distribution functions of MathNet.Numerics 5.0, an independent library.</summary>
public sealed class DrawnDistributionTests
{
    private const int Trials = 1 << 20;

    // Kolmogorov's distribution: exceeded with probability 1 in 1,000 under the null. Seeds are fixed.
    private const double KolmogorovLimit = 1.95;

    [Fact]
    public void Normal_values_are_normal() =>
        AssertDistribution(new Normal(0.07, 0.035), x => MathNet.Numerics.Distributions.Normal.CDF(0.07, 0.035, x));

    [Fact]
    public void Lognormal_values_are_lognormal() =>
        AssertDistribution(new Lognormal(6.8, 0.47), x => LogNormal.CDF(6.8, 0.47, x));

    [Fact]
    public void Uniform_values_are_uniform() =>
        AssertDistribution(new Swarm.Engine.Distributions.ContinuousUniform(2, 5), x => (x - 2) / 3);

    [Theory]
    [InlineData(0.05)]
    [InlineData(0.3)]
    [InlineData(0.999)]
    [InlineData(1)]
    [InlineData(1.29)]
    [InlineData(2.5)]
    [InlineData(20)]
    [InlineData(400)]
    [InlineData(1e6)]
    public void Gamma_values_are_gamma(double shape) =>
        AssertDistribution(new Gamma(shape, 400), x => GammaCdf(shape, x / 400));

    [Fact]
    public void Discrete_values_come_with_their_chances()
    {
        double[] values = [0, 100, 250, 1000, 5000];
        double[] chances = [0.6, 0.2, 0.12, 0.07, 0.01];

        double[] sample = Sample.Of(new OneOf(values, chances), Trials);

        for (int i = 0; i < values.Length; i++)
        {
            double share = sample.Count(x => x == values[i]) / (double)Trials;
            double error = Math.Sqrt(chances[i] * (1 - chances[i]) / Trials);
            Assert.InRange((share - chances[i]) / error, -4, 4);
        }
    }

    [Fact]
    public void A_value_without_chance_never_comes()
    {
        double[] sample = Sample.Of(new OneOf([1, 2, 3], [0.5, 0, 0.5]), Trials);

        Assert.DoesNotContain(2.0, sample);
    }

    /// <summary>The library takes arguments below 1e-15 for zero; there the first term of the series is exact to a double.</summary>
    private static double GammaCdf(double shape, double x) => x < 1e-12
        ? Math.Pow(x, shape) / MathNet.Numerics.SpecialFunctions.Gamma(shape + 1)
        : MathNet.Numerics.Distributions.Gamma.CDF(shape, 1, x);

    private static void AssertDistribution(Distribution distribution, Func<double, double> cdf)
    {
        double[] sample = Sample.Of(distribution, Trials);
        AssertMoments(distribution, sample);
        Array.Sort(sample);
        double distance = 0;
        for (int i = 0; i < Trials; i++)
        {
            double p = cdf(sample[i]);
            distance = Math.Max(distance, Math.Max(p - ((double)i / Trials), ((double)(i + 1) / Trials) - p));
        }

        Assert.InRange(distance * Math.Sqrt(Trials), 0, KolmogorovLimit);
    }

    /// <summary>Mean within 4 standard errors; the standard deviation within 4 of its own (from the fourth moment).</summary>
    private static void AssertMoments(Distribution distribution, double[] sample)
    {
        double mean = sample.Average();
        double variance = sample.Average(x => (x - mean) * (x - mean));
        double fourth = sample.Average(x => Math.Pow(x - mean, 4));
        double sdError = Math.Sqrt((fourth - (variance * variance)) / Trials) / (2 * Math.Sqrt(variance));
        Assert.InRange((mean - distribution.Mean) / (distribution.Sd / Math.Sqrt(Trials)), -4, 4);
        Assert.InRange((Math.Sqrt(variance) - distribution.Sd) / sdError, -4, 4);
    }
}
