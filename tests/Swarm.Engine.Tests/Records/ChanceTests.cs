using Swarm.Engine.Records;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Records;

public class ChanceTests
{
    [Fact]
    public void A_yes_or_no_has_the_share_of_yes()
    {
        var chance = Chance.Of(Outcome([0, 1], [9_900, 100]), isMoney: false, ErrorMethod.ClosedForm);

        Assert.Equal(0.01, chance!.Value.Value);
        Assert.Equal(0.0081, chance.Value.Low!.Value, 0.0002);
        Assert.Equal(0.0122, chance.Value.High!.Value, 0.0002);
    }

    [Fact]
    public void What_was_never_seen_has_an_upper_bound()
    {
        var chance = Chance.Of(Outcome([0], [10_000]), isMoney: false, ErrorMethod.ClosedForm);

        // Wilson (1927) without a hit: z^2 / (n + z^2).
        Assert.Equal((0.0, 0.0, 3.8415 / 10_003.8415), (chance!.Value.Value, chance.Value.Low!.Value, Math.Round(chance.Value.High!.Value, 12)), Close);
    }

    [Fact]
    public void Money_and_other_values_are_no_chances()
    {
        Assert.Null(Chance.Of(Outcome([0, 1], [9_900, 100]), isMoney: true, ErrorMethod.ClosedForm));
        Assert.Null(Chance.Of(Outcome([0, 2], [9_900, 100]), isMoney: false, ErrorMethod.ClosedForm));
        Assert.Null(Chance.Of(Outcome([0, 0.5, 1], [9_800, 100, 100]), isMoney: false, ErrorMethod.ClosedForm));
    }

    private static bool Close((double, double, double) left, (double, double, double) right) =>
        left.Item1 == right.Item1 && left.Item2 == right.Item2 && Math.Abs(left.Item3 - right.Item3) < 1e-7;

    private static OutcomeResult Outcome(double[] values, long[] counts)
    {
        var trials = counts.Sum();
        var mean = values.Zip(counts).Sum(pair => pair.First * pair.Second) / trials;
        var moments = new Moments
        {
            Count = trials,
            Mean = mean,
            M2 = values.Zip(counts).Sum(pair => Math.Pow(pair.First - mean, 2) * pair.Second),
            Min = values[0],
            Max = values[^1],
        };
        var digest = TDigest.FromClusters(values, counts, [.. values.Select(_ => true)], trials);
        return new OutcomeResult(new OutcomeRequest("ruined", Adverse.High, [0.5], []), OutcomeSummary.FromParts(moments, [], digest, []), 4096, []);
    }
}
