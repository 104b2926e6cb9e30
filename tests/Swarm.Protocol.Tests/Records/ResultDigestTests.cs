using Swarm.Engine.Records;

namespace Swarm.Protocol.Tests.Records;

public class ResultDigestTests
{
    private static readonly RunRecord Sample = SampleRecord.Build();

    [Fact]
    public void The_digest_of_the_sample_is_known() =>
        Assert.Equal("1c6b1eb4397f818e80d3fb04eea6c0b95f3964ab4abb0fafcd479704ef8c2e5f", Sample.Digest);

    [Fact]
    public void Nothing_but_results_counts()
    {
        var other = Sample with
        {
            ToolVersion = "9.9.9",
            Title = "Another",
            Money = null,
            Model = new RecordedModel("other.yaml", "other"),
            Data = [],
            Notes = [],
            Tables = [],
        };

        Assert.Equal(Sample.Digest, other.Digest);
    }

    [Fact]
    public void The_order_of_outcomes_does_not_count() =>
        Assert.Equal(Sample.Digest, (Sample with { Outcomes = [.. Sample.Outcomes.Reverse()] }).Digest);

    [Fact]
    public void Edition_seed_and_trials_count()
    {
        Assert.NotEqual(Sample.Digest, (Sample with { Edition = 2 }).Digest);
        Assert.NotEqual(Sample.Digest, (Sample with { Seed = 1 }).Digest);
        Assert.NotEqual(Sample.Digest, (Sample with { Trials = 9 }).Digest);
    }

    [Fact]
    public void A_last_bit_of_a_batch_counts()
    {
        var outcome = Sample.Outcomes[0];
        var batch = outcome.Result.Batches[1];
        double[] moved = [.. batch.Var];
        moved[3] = Math.BitIncrement(moved[3]);
        var result = outcome.Result with { Batches = [outcome.Result.Batches[0], batch with { Var = moved }] };

        Assert.NotEqual(Sample.Digest, (Sample with { Outcomes = [outcome with { Result = result }, .. Sample.Outcomes.Skip(1)] }).Digest);
    }

    [Fact]
    public void Every_not_a_number_is_the_same()
    {
        var positive = Digest(BitConverter.UInt64BitsToDouble(0x7FF8_0000_0000_0000));
        var negative = Digest(BitConverter.UInt64BitsToDouble(0xFFF8_0000_0000_0001));

        Assert.Equal(positive, negative);
    }

    [Fact]
    public void Zero_and_minus_zero_differ() => Assert.NotEqual(Digest(0.0), Digest(-0.0));

    [Fact]
    public void Line_ends_of_the_model_do_not_count_in_its_hash()
    {
        Assert.Equal(new RecordedModel("m", "a\r\nb\n").Sha256, new RecordedModel("m", "a\nb\r\n").Sha256);
        Assert.NotEqual(new RecordedModel("m", "a\nb").Sha256, new RecordedModel("m", "a\n\nb").Sha256);
    }

    private static string Digest(double sixthPowerSum)
    {
        var outcome = Sample.Outcomes[0].Result;
        var batch = outcome.Batches[0];
        var changed = outcome with { Batches = [batch with { Moments = batch.Moments with { M6 = sixthPowerSum } }] };
        return ResultDigest.Of(1, 1, 8, [changed]);
    }
}
