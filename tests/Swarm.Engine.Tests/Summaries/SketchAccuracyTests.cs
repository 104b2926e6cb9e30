namespace Swarm.Engine.Tests.Summaries;

public class SketchAccuracyTests(ITestOutputHelper output)
{
    private static readonly double[] _tailLevels = [0.001, 0.005, 0.995, 0.999];

    public static TheoryData<string> Streams => [.. AwkwardStreams.Names];

    [Theory]
    [MemberData(nameof(Streams))]
    public void Tail_ranks_of_a_million_trials_err_by_less_than_a_twentieth_of_the_sampling_error(string stream)
    {
        var values = AwkwardStreams.Create(stream, 1_000_000);

        var digest = FoldedRuns.Fold(values, FoldedRuns.Plain).Summary.Digest;

        Array.Sort(values);
        foreach (var p in _tailLevels)
        {
            var samplingError = Math.Sqrt(p * (1 - p) / values.Length);
            var ratio = RankErrors.Of(values, digest.Quantile(p), p) / samplingError;
            output.WriteLine($"{stream} {p}: {ratio:f4} of the sampling error");
            Assert.InRange(ratio, 0, 0.05);
        }

        output.WriteLine($"{stream}: {digest.Count} clusters");
    }

    [Theory]
    [Trait("Category", "Slow")]
    [InlineData("uniform")]
    [InlineData("odds")]
    [InlineData("90 % zeros")]
    public void Tail_ranks_of_100_million_trials_err_by_less_than_a_fifth_of_the_sampling_error(string stream)
    {
        const long N = 100_000_000;
        var digest = LongStreams.Fold(stream, N);

        var answers = _tailLevels.Select(digest.Quantile).ToArray();
        var (below, atOrBelow) = LongStreams.CountRanks(stream, N, answers);
        for (var k = 0; k < answers.Length; k++)
        {
            var p = _tailLevels[k];
            var error = Math.Max(0, Math.Max(below[k] - (p * N), (p * N) - atOrBelow[k]));
            var ratio = error / Math.Sqrt(p * (1 - p) * N);
            output.WriteLine($"{stream} {p}: {ratio:f4} of the sampling error");
            Assert.InRange(ratio, 0, 0.2);
        }

        output.WriteLine($"{stream}: {digest.Count} clusters");
    }
}
