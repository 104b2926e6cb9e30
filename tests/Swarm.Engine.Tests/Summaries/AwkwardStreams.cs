namespace Swarm.Engine.Tests.Summaries;

/// <summary>The awkward streams of the shared reference, from SplitMix64 (Steele, Lea &amp; Flood 2014).</summary>
internal static class AwkwardStreams
{
    public static readonly string[] Names =
    [
        "sorted", "reversed", "all_equal", "two_point", "uniform", "pareto_1.1", "normal_with_outlier", "zeros_then_lognormal",
        "two_sided_pareto_1.1", "rounded_ties", "normal",
    ];

    public static double[] Create(string name, int count)
    {
        var u = new SplitMix(1);
        var v = new SplitMix(2);
        var values = new double[count];
        for (var i = 0; i < count; i++) values[i] = Value(name, i, count, u.Next(), v);
        return values;
    }

    private static double Value(string name, int i, int count, double u, SplitMix v) => name switch
    {
        "sorted" => i,
        "reversed" => count - 1 - i,
        "all_equal" => 42.5,
        "two_point" => u < 0.9975 ? 0 : 1_000_000,
        "uniform" => u,
        "pareto_1.1" => Math.Pow(u, -1 / 1.1),
        "normal" => Normal(u),
        "normal_with_outlier" => i == count / 3 ? 1e18 : Normal(u),
        "zeros_then_lognormal" => Lognormal(u, v.Next()),
        "two_sided_pareto_1.1" => (u < 0.5 ? -1 : 1) * Math.Pow(v.Next(), -1 / 1.1),
        "rounded_ties" => Math.Floor(1000 * u * u) / 8,
        _ => throw new ArgumentOutOfRangeException(nameof(name)),
    };

    private static double Lognormal(double u, double v) => u < 0.9 ? 0 : Math.Exp(12 + (1.8 * Normal(v)));

    private static double Normal(double u) => MathNet.Numerics.Distributions.Normal.InvCDF(0, 1, u);
}

/// <summary>Uniform numbers in (0, 1) from SplitMix64.</summary>
internal sealed class SplitMix(ulong seed)
{
    private ulong _state = seed;

    public double Next() => ((NextBits() >> 11) + 0.5) * (1.0 / (1UL << 53));

    public ulong NextBits()
    {
        _state += 0x9E3779B97F4A7C15;
        var z = _state;
        z = (z ^ (z >> 30)) * 0xBF58476D1CE4E5B9;
        z = (z ^ (z >> 27)) * 0x94D049BB133111EB;
        return z ^ (z >> 31);
    }
}
