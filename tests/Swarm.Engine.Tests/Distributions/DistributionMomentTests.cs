using Swarm.Engine.Distributions;

namespace Swarm.Engine.Tests.Distributions;

/// <summary>Moments in closed form (Johnson, Kotz &amp; Balakrishnan 1994), computed by an independent program with SciPy 1.10.</summary>
public sealed class DistributionMomentTests
{
    [Fact]
    public void A_lognormal_by_its_arithmetic_mean_and_sd_has_that_mean_and_sd()
    {
        Lognormal lognormal = Lognormal.OfMeanAndSd(1000, 500);

        Assert.Equal(1000, lognormal.Mean, 1e-9);
        Assert.Equal(500, lognormal.Sd, 1e-9);
        Assert.Equal(1.625, lognormal.Skewness, 1e-12);
    }

    [Theory]
    [InlineData(2.5, 400, 1000, 632.4555320336759, 1.2649110640673518)]
    [InlineData(0.3, 1000, 300, 547.722557505166, 3.6514837167011076)]
    public void A_gamma_has_the_moments_of_the_handbook(double shape, double scale, double mean, double sd, double skewness)
    {
        var gamma = new Gamma(shape, scale);

        Assert.Equal(mean, gamma.Mean, 1e-9);
        Assert.Equal(sd, gamma.Sd, 1e-9);
        Assert.Equal(skewness, gamma.Skewness, 1e-12);
    }

    [Fact]
    public void A_uniform_has_the_moments_of_the_handbook()
    {
        var uniform = new ContinuousUniform(2, 5);

        Assert.Equal(3.5, uniform.Mean, 1e-15);
        Assert.Equal(0.8660254037844387, uniform.Sd, 1e-15);
    }

    [Fact]
    public void A_list_of_values_has_the_moments_of_its_table()
    {
        var table = new OneOf([0, 100, 250, 1000, 5000], [0.6, 0.2, 0.12, 0.07, 0.01]);

        Assert.Equal(170, table.Mean, 1e-10);
        Assert.Equal(548.270006474912, table.Sd, 1e-9);
    }
}
