using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Summaries;

/// <summary>Streams too long to keep: drawn once to be folded, and once more to count the ranks of the answers.</summary>
internal static class LongStreams
{
    public static TDigest Fold(string stream, long trials)
    {
        var pool = new SummaryPool();
        var reduction = new RunReduction(trials, [FoldedRuns.Plain], pool);
        var summariser = new LeafSummariser(reduction.Shape, pool);
        var leaf = new double[Edition.TrialsPerLeaf];
        var random = new SplitMix(1);
        for (long index = 0; index < reduction.Shape.Leaves; index++)
        {
            var values = leaf.AsSpan(0, (int)reduction.Shape.TrialsOf(0, index));
            Draw(stream, random, values);
            reduction.Accept(0, index, [summariser.Summarise(values, FoldedRuns.Plain)]);
        }

        return reduction.Finish()[0].Summary.Digest;
    }

    public static (long[] Below, long[] AtOrBelow) CountRanks(string stream, long trials, double[] answers)
    {
        var below = new long[answers.Length];
        var atOrBelow = new long[answers.Length];
        var chunk = new double[Edition.TrialsPerLeaf];
        var random = new SplitMix(1);
        for (var left = trials; left > 0; left -= chunk.Length)
        {
            var values = chunk.AsSpan(0, (int)Math.Min(left, chunk.Length));
            Draw(stream, random, values);
            for (var k = 0; k < answers.Length; k++)
            {
                foreach (var x in values)
                {
                    below[k] += x < answers[k] ? 1 : 0;
                    atOrBelow[k] += x <= answers[k] ? 1 : 0;
                }
            }
        }

        return (below, atOrBelow);
    }

    private static void Draw(string stream, SplitMix random, Span<double> values)
    {
        for (var i = 0; i < values.Length; i++)
        {
            var u = random.Next();
            values[i] = stream switch
            {
                "uniform" => u,

                // Log-logistic: a tail of index 1 at the top, so its mean is infinite.
                "odds" => u / (1 - u),
                "90 % zeros" => u < 0.9 ? 0 : (u - 0.9) / (1 - u),
                _ => throw new ArgumentOutOfRangeException(nameof(stream)),
            };
        }
    }
}
