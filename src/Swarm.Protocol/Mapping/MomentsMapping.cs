using Swarm.Engine.Summaries;
using Proto = Swarm.Protocol.V1;

namespace Swarm.Protocol.Mapping;

internal static class MomentsMapping
{
    private const int LowestOrder = 2;
    private const int PowerSums = Moments.HighestOrder - LowestOrder + 1;

    public static Proto.Moments ToMessage(in Moments moments)
    {
        var message = new Proto.Moments { Count = (ulong)moments.Count, Mean = moments.Mean, Min = moments.Min, Max = moments.Max };
        for (var order = LowestOrder; order <= Moments.HighestOrder; order++) message.PowerSums.Add(moments.PowerSum(order));
        return message;
    }

    public static Moments FromMessage(Proto.Moments message)
    {
        Expect.That(message.PowerSums.Count == PowerSums, $"moments have {message.PowerSums.Count} power sums, not {PowerSums}");
        Expect.Finite([message.Mean, message.Min, message.Max], "a mean or an extreme");
        Expect.That(message.Count > 0 && message.Min <= message.Max, "moments are of no trials, or the least value exceeds the greatest");
        return new Moments
        {
            Count = Expect.Count(message.Count, "a number of trials"),
            Mean = message.Mean,
            M2 = message.PowerSums[0],
            M3 = message.PowerSums[1],
            M4 = message.PowerSums[2],
            M5 = message.PowerSums[3],
            M6 = message.PowerSums[4],
            Min = message.Min,
            Max = message.Max,
        };
    }
}
