using CsCheck;

namespace Swarm.Engine.Tests.Summaries;

/// <summary>Samples that try a sketch: repeats, zeros of both signs, tiny, huge and ordinary values.</summary>
internal static class SampleGen
{
    private static readonly double[] _extremes = [0.0, -0.0, double.Epsilon, -double.Epsilon, 1e308, -1e308, 1e18, 0.1];

    private static readonly Gen<double> _value = Gen.Frequency(
        (5, Gen.Double[-100, 100]),
        (2, Gen.Int[-3, 3].Select(i => (double)i)),
        (1, Gen.Int[0, 7].Select(i => _extremes[i])),
        (1, Gen.Double[0, 1].Select(u => Math.Pow(1.000001 - u, -2))));

    public static Gen<double[]> Values(int fewest, int most) => _value.Array[fewest, most];

    /// <summary>Samples of a few repeated values and samples of any, up to a whole leaf.</summary>
    public static Gen<double[]> Leaves => Gen.OneOf(
        Values(1, 200),
        Values(1000, Edition.TrialsPerLeaf),
        Gen.Int[0, 40].Select(i => i * 0.25).Array[1000, Edition.TrialsPerLeaf],
        Gen.Select(Gen.Double[0, 1].Array[1000, Edition.TrialsPerLeaf], Gen.Double[0, 1], (u, share) => u.Select(x => x < share ? 7 : x).ToArray()),
        Gen.Double[0, 1].Array[1000, Edition.TrialsPerLeaf].Select(u => u.Select(x => Math.Pow(1.000001 - x, -3)).ToArray()));
}
