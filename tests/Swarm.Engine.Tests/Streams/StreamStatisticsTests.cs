using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Tests.Streams;

/// <summary>Statistical checks with fixed keys. A statistic that is standard normal under the null must lie within 4.</summary>
public sealed class StreamStatisticsTests
{
    private const int Trials = 1 << 20;
    private const double Limit = 4;

    [Theory]
    [InlineData("claims", 0)]
    [InlineData("claims", 29)]
    [InlineData("", 65535)]
    public void Uniforms_fill_1024_bins_evenly(string name, int step)
    {
        const int Bins = 1024;
        double[] counts = new double[Bins];
        foreach (double u in Draw(7, name, step))
        {
            counts[(int)(u * Bins)]++;
        }

        double expected = (double)Trials / Bins;
        double chiSquare = counts.Sum(count => (count - expected) * (count - expected) / expected);

        // Wilson & Hilferty (1931): the cube root of chi-square over its degrees of freedom is nearly normal.
        double degrees = Bins - 1;
        double z = (Math.Cbrt(chiSquare / degrees) - (1 - (2 / (9 * degrees)))) / Math.Sqrt(2 / (9 * degrees));
        Assert.InRange(z, -Limit, Limit);
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(7)]
    [InlineData(8)]
    [InlineData(16)]
    [InlineData(4096)]
    public void Neighbouring_trials_are_uncorrelated(int lag)
    {
        double[] u = Draw(7, "claims", 1);

        Assert.InRange(Correlation(u.AsSpan(lag), u.AsSpan(0, Trials - lag)), -Limit, Limit);
    }

    [Fact]
    public void Neighbouring_seeds_are_uncorrelated() =>
        Assert.InRange(Correlation(Draw(1, "claims", 1), Draw(2, "claims", 1)), -Limit, Limit);

    [Theory]
    [InlineData("equity1", "equity2")]
    [InlineData("a", "b")]
    [InlineData("rate", "Rate")]
    public void Similar_names_are_uncorrelated(string first, string second) =>
        Assert.InRange(Correlation(Draw(1, first, 1), Draw(1, second, 1)), -Limit, Limit);

    [Fact]
    public void Neighbouring_steps_are_uncorrelated() =>
        Assert.InRange(Correlation(Draw(1, "equity", 4), Draw(1, "equity", 5)), -Limit, Limit);

    [Fact]
    public void Squares_of_neighbouring_trials_are_uncorrelated()
    {
        double[] squares = [.. Draw(7, "claims", 1).Select(u => (u - 0.5) * (u - 0.5))];

        Assert.InRange(Correlation(squares.AsSpan(1), squares.AsSpan(0, Trials - 1)), -Limit, Limit);
    }

    [Fact]
    public void Every_bit_of_a_uniform_is_a_fair_coin()
    {
        double[] u = Draw(11, "bits", 0);
        for (int bit = 1; bit <= 52; bit++)
        {
            double scale = Math.ScaleB(1, bit);
            double ones = u.Count(x => ((long)(x * scale) & 1) == 1);
            Assert.InRange((ones - (Trials / 2.0)) / Math.Sqrt(Trials / 4.0), -Limit, Limit);
        }
    }

    [Fact]
    public void A_uniform_is_never_0_or_1_and_is_symmetric()
    {
        double least = Open(0, 0);
        double greatest = Open(uint.MaxValue, uint.MaxValue);

        Assert.Equal(Math.ScaleB(1, -53), least);
        Assert.Equal(1 - least, greatest);
    }

    private static double Open(uint low, uint high) => Uniform.Open(Lanes64.CreateBits(low), Lanes64.CreateBits(high)).Value;

    private static double[] Draw(ulong seed, string name, int step)
    {
        double[] values = new double[Trials];
        var slice = new DrawSlice(StreamKey.Of(seed, StreamRoles.Draw, name), 0, step, LaneWidths.OfThisMachine);
        UniformKernel.Fill(slice, default(Identity), values);
        return values;
    }

    /// <summary>Pearson's correlation times the root of the number of pairs: standard normal without correlation.</summary>
    private static double Correlation(ReadOnlySpan<double> x, ReadOnlySpan<double> y)
    {
        double sx = 0, sy = 0, sxx = 0, syy = 0, sxy = 0;
        for (int i = 0; i < x.Length; i++)
        {
            sx += x[i];
            sy += y[i];
            sxx += x[i] * x[i];
            syy += y[i] * y[i];
            sxy += x[i] * y[i];
        }

        double n = x.Length;
        double covariance = (sxy / n) - (sx / n * (sy / n));
        double r = covariance / Math.Sqrt(((sxx / n) - (sx / n * (sx / n))) * ((syy / n) - (sy / n * (sy / n))));
        return r * Math.Sqrt(n);
    }

    private readonly struct Identity : IUniformTransform
    {
        public V Of<V>(V uniform)
            where V : unmanaged, ILanes<V> => uniform;
    }
}
