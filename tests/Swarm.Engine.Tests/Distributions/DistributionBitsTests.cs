using Swarm.Engine.Distributions;
using Swarm.Engine.Numerics;

namespace Swarm.Engine.Tests.Distributions;

public sealed class DistributionBitsTests
{
    private const int Trials = 2048;

    public static TheoryData<string> Names => [.. Distributions.Keys];

    private static Dictionary<string, Distribution> Distributions { get; } = new()
    {
        ["normal"] = new Normal(1, 2),
        ["lognormal"] = new Lognormal(0.5, 1.2),
        ["uniform"] = new ContinuousUniform(-3, 5),
        ["gamma below 1"] = new Gamma(0.4, 2),
        ["gamma"] = new Gamma(3, 2),
        ["one_of"] = new OneOf([1, 2, 3], [0.2, 0.3, 0.5]),
    };

    [Theory]
    [MemberData(nameof(Names))]
    public void Values_are_equal_to_the_bit_at_every_vector_width(string name)
    {
        Distribution distribution = Distributions[name];
        double[] expected = Sample.Of(distribution, Trials, LaneWidth.Scalar);

        Assert.Equal(expected, Sample.Of(distribution, Trials, LaneWidth.Vector128));
        Assert.Equal(expected, Sample.Of(distribution, Trials, LaneWidth.Vector256));
        Assert.Equal(expected, Sample.Of(distribution, Trials, LaneWidth.Vector512));
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void A_trial_has_its_value_wherever_the_run_of_trials_begins(string name)
    {
        Distribution distribution = Distributions[name];
        double[] expected = Sample.Of(distribution, Trials);

        foreach (int first in (int[])[16, 128, 1008])
        {
            Assert.Equal(expected[first..(first + 16)], Sample.Of(distribution, 16, null, first));
        }
    }
}
