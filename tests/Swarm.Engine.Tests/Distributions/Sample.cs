using Swarm.Engine.Distributions;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Tests.Distributions;

/// <summary>Values drawn with a fixed key.</summary>
internal static class Sample
{
    public static double[] Of(Distribution distribution, int trials, LaneWidth? width = null, long firstTrial = 0)
    {
        double[] values = new double[trials];
        StreamKey key = StreamKey.Of(20251231, StreamRoles.Draw, "sample");
        distribution.Fill(new DrawSlice(key, firstTrial, 3, width ?? LaneWidths.OfThisMachine), values);
        return values;
    }
}
