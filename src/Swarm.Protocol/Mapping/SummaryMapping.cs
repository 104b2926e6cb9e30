using Google.Protobuf.Collections;
using Swarm.Engine.Summaries;
using Proto = Swarm.Protocol.V1;

namespace Swarm.Protocol.Mapping;

/// <summary>Summaries and batches of outcomes.</summary>
internal static class SummaryMapping
{
    public static Proto.OutcomeSummary ToMessage(OutcomeSummary summary)
    {
        var message = new Proto.OutcomeSummary { Moments = MomentsMapping.ToMessage(summary.Moments), Digest = new Proto.Digest() };
        foreach (var count in summary.Exceedances) message.Exceedances.Add((ulong)count);
        var digest = summary.Digest;
        for (var i = 0; i < digest.Count; i++)
        {
            message.Digest.Means.Add(digest.Means[i]);
            message.Digest.Weights.Add((ulong)digest.WeightAt(i));
            message.Digest.Atoms.Add(digest.IsAtomAt(i));
        }

        return message;
    }

    public static OutcomeSummary FromMessage(Proto.OutcomeSummary message, int thresholds)
    {
        var moments = MomentsMapping.FromMessage(Expect.Present(message.Moments, "a summary's moments"));
        var digest = FromMessage(Expect.Present(message.Digest, "a summary's digest"), moments.Count);
        try
        {
            return OutcomeSummary.FromParts(moments, Exceedances(message.Exceedances, thresholds), digest, []);
        }
        catch (ArgumentException contradiction)
        {
            throw new InvalidDataException(contradiction.Message, contradiction);
        }
    }

    public static Proto.BatchFigures ToMessage(BatchFigures batch)
    {
        var message = new Proto.BatchFigures { Moments = MomentsMapping.ToMessage(batch.Moments) };
        message.Exceedances.AddRange(batch.Exceedances.Select(count => (ulong)count));
        message.ValueAtRisk.AddRange(batch.Var);
        message.TailValueAtRisk.AddRange(batch.Tvar);
        return message;
    }

    public static BatchFigures FromMessage(Proto.BatchFigures message, int levels, int thresholds)
    {
        var moments = MomentsMapping.FromMessage(Expect.Present(message.Moments, "a batch's moments"));
        Expect.That(
            message.ValueAtRisk.Count == levels && message.TailValueAtRisk.Count == levels,
            $"a batch has {message.ValueAtRisk.Count} and {message.TailValueAtRisk.Count} tail figures, not {levels} of each");
        Expect.Finite(message.ValueAtRisk.Concat(message.TailValueAtRisk), "a tail figure of a batch");
        var exceedances = Exceedances(message.Exceedances, thresholds);
        Expect.That(exceedances.All(count => count <= moments.Count), "a batch has more exceedances than trials");
        return new BatchFigures(moments, exceedances, [.. message.ValueAtRisk], [.. message.TailValueAtRisk]);
    }

    private static TDigest FromMessage(Proto.Digest message, long trials)
    {
        Expect.That(
            message.Weights.Count == message.Means.Count && message.Atoms.Count == message.Means.Count,
            "a digest has not as many weights and atom flags as means");
        Expect.That(message.Means.Count <= trials, "a digest has more clusters than trials");
        try
        {
            long[] weights = [.. message.Weights.Select(weight => Expect.Count(weight, "a weight"))];
            return TDigest.FromClusters([.. message.Means], weights, [.. message.Atoms], trials);
        }
        catch (ArgumentException contradiction)
        {
            throw new InvalidDataException(contradiction.Message, contradiction);
        }
    }

    private static long[] Exceedances(RepeatedField<ulong> counts, int thresholds)
    {
        Expect.That(counts.Count == thresholds, $"{counts.Count} exceedance counts for {thresholds} thresholds");
        return [.. counts.Select(count => Expect.Count(count, "an exceedance count"))];
    }
}
