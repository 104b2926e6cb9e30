using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Summaries;

/// <summary>
/// The sketch after the full merge tree of 2^27 (134 million) trials. Each stream is a permutation of 0 .. n - 1 put through a
/// monotone function, so exact ranks are known without sorting.
/// </summary>
[Trait("Category", "Slow")]
public sealed class LargeSketchTests(ITestOutputHelper output)
{
    private const int Bits = 27;
    private const long Trials = 1L << Bits;
    private const double Allowed = 0.2;

    [Theory]
    [InlineData("sorted")]
    [InlineData("reversed")]
    [InlineData("scrambled uniform")]
    [InlineData("scrambled Pareto 1.1")]
    [InlineData("scrambled, 90 % zeros")]
    public void Tail_ranks_err_by_less_than_a_fifth_of_the_sampling_error(string stream)
    {
        TDigest digest = Sketch(OrderOf(stream), ValueOf(stream));

        foreach (double p in (double[])[0.001, 0.005, 0.995, 0.999])
        {
            double ratio = RankError(digest.Quantile(p), p, ValueOf(stream)) / Math.Sqrt(p * (1 - p) * Trials);
            output.WriteLine($"{stream} {p}: {ratio:F4} of the sampling error, {digest.Count} clusters");
            Assert.InRange(ratio, 0, Allowed);
        }
    }

    private static Func<long, long> OrderOf(string stream) => stream switch
    {
        "sorted" => trial => trial,
        "reversed" => trial => Trials - 1 - trial,
        _ => Scramble,
    };

    private static Func<long, double> ValueOf(string stream) => stream switch
    {
        "scrambled Pareto 1.1" => rank => Math.Pow(1 - ((rank + 0.5) / Trials), -1 / 1.1),
        "scrambled, 90 % zeros" => rank => Math.Max(0, rank - (0.9 * Trials)),
        _ => rank => rank,
    };

    /// <summary>A bijection on 27 bits: shifts and odd multipliers.</summary>
    private static long Scramble(long x)
    {
        const long Mask = Trials - 1;
        x ^= x >> 13;
        x = (x * 0x5851F42D) & Mask;
        x ^= x >> 11;
        x = (x * 0x2545F491) & Mask;
        return x ^ (x >> 14);
    }

    private static TDigest Sketch(Func<long, long> order, Func<long, double> value)
    {
        OutcomeRequest request = new("x", Adverse.High, [0.995], []);
        var pool = new SummaryPool();
        var reduction = new RunReduction(Trials, [request], pool);
        var summariser = new LeafSummariser(reduction.Shape, pool);
        double[] values = new double[Edition.TrialsPerLeaf];
        for (long leaf = 0; leaf < Trials / Edition.TrialsPerLeaf; leaf++)
        {
            for (int i = 0; i < values.Length; i++)
            {
                values[i] = value(order((leaf * Edition.TrialsPerLeaf) + i));
            }

            reduction.Accept(0, leaf, [summariser.Summarise(values, request)]);
        }

        return reduction.Finish()[0].Summary.Digest;
    }

    /// <summary>How far the rank asked for lies outside the ranks that the estimate has in the stream.</summary>
    private static double RankError(double estimate, double p, Func<long, double> value)
    {
        double asked = p * Trials;
        long below = CountBelow(estimate, value, orEqual: false);
        long upTo = CountBelow(estimate, value, orEqual: true);
        return asked < below ? below - asked : Math.Max(0, asked - Math.Max(upTo, below + 1));
    }

    private static long CountBelow(double bound, Func<long, double> value, bool orEqual)
    {
        long low = 0;
        long high = Trials;
        while (low < high)
        {
            long middle = (low + high) / 2;
            double x = value(middle);
            (low, high) = x < bound || (orEqual && x == bound) ? (middle + 1, high) : (low, middle);
        }

        return low;
    }
}
