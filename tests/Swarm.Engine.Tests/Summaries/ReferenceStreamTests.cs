namespace Swarm.Engine.Tests.Summaries;

/// <summary>
/// A million trials of each awkward stream against values that an independent program computed by a full sort: the mean, the mean
/// of the trials beyond rank ceil(0.99 n), and the type 1 quantiles x_(ceil(n q)) (Hyndman &amp; Fan 1996).
/// </summary>
public class ReferenceStreamTests
{
    private static readonly double[] _levels = [0.001, 0.01, 0.5, 0.99, 0.995, 0.999, 0.9999];

    // The reference's own targets, which tighten towards the tails (relative-error idea: Dunning & Ertl 2019; Cormode et al. 2021).
    private static readonly double[] _rankErrors = [0.0002, 0.001, 0.005, 0.001, 0.0005, 0.0002, 0.00005];

    public static TheoryData<string, double, double, double[]> Streams => new()
    {
        { "sorted", 499999.5, 994999.5, [999.0, 9999.0, 499999.0, 989999.0, 994999.0, 998999.0, 999899.0] },
        { "reversed", 499999.5, 994999.5, [999.0, 9999.0, 499999.0, 989999.0, 994999.0, 998999.0, 999899.0] },
        { "all_equal", 42.5, 42.5, [42.5, 42.5, 42.5, 42.5, 42.5, 42.5, 42.5] },
        { "two_point", 2562.0, 256200.0, [0.0, 0.0, 0.0, 0.0, 0.0, 1000000.0, 1000000.0] },
        { "uniform", 0.500624053589556, 0.9950347712845602, [0.0010026444697051606, 0.010022644414047044, 0.5008573325045806, 0.9900417791869158, 0.9950722163233594, 0.9989997566149813, 0.9999093213775494] },
        { "pareto_1.1", 8.504542652924128, 475.19910178632404, [1.0009071989587872, 1.0091394106265263, 1.8749342646734388, 65.65574308735884, 121.9082784084943, 532.157030668695, 4271.393282254588] },
        { "normal_with_outlier", 1000000000000.0022, 100000000000002.66, [-3.089447870350573, -2.325499084200948, 0.002152812019302638, 2.3279349677909558, 2.580859966680016, 3.0911336943211927, 3.744182198141339] },
        { "zeros_then_lognormal", 83709.5353325897, 5845312.052351505, [0.0, 0.0, 0.0, 1648624.8829967214, 3183667.0097037917, 10661426.687873987, 41850635.51526513] },
        { "two_sided_pareto_1.1", -0.14132522979152104, 225.31906202518041, [-295.31166515531993, -35.2635677102988, 1.001503150595206, 35.182524840540815, 66.17850090487454, 272.93701091568323, 2268.6020695266975] },
        { "rounded_ties", 41.69010025, 123.700125, [0.0, 0.0, 31.25, 122.5, 123.75, 124.75, 124.875] },
    };

    [Theory]
    [MemberData(nameof(Streams))]
    public void The_summary_of_a_million_trials_agrees_with_a_full_sort(string stream, double mean, double tailMean, double[] quantiles)
    {
        var values = AwkwardStreams.Create(stream, 1_000_000);

        var result = FoldedRuns.Fold(values, FoldedRuns.Plain);

        Array.Sort(values);
        var figures = Swarm.Engine.Summaries.Figures.Of(result, Swarm.Engine.Summaries.ErrorMethod.ClosedForm);
        Assert.Equal(mean, figures.Mean.Value, Math.Abs(mean) * 1e-10);

        // Of a mass of 10,000 the sketch blurs two or three trials at the edge.
        Assert.Equal(tailMean, figures.Levels[0].Tvar.Value, Math.Abs(tailMean) * 2e-5);
        for (var k = 0; k < _levels.Length; k++)
        {
            // The stream is the reference's own (to the last bits of pow, exp and the inverse normal).
            var exact = values[(int)Math.Ceiling(values.Length * _levels[k] * (1 - 1e-15)) - 1];
            Assert.Equal(quantiles[k], exact, Math.Abs(quantiles[k]) * 1e-10);

            Assert.InRange(RankErrors.Of(values, result.Summary.Digest.Quantile(_levels[k]), _levels[k]), 0, _rankErrors[k]);
        }
    }
}
