using Swarm.Engine.Summaries;

namespace Swarm.Engine.Records;

/// <summary>The probability of an outcome that says yes or no.</summary>
public static class Chance
{
    /// <summary>The probability that an outcome is true, or null if it has other values than 0 and 1.</summary>
    /// <param name="outcome">Summary and batches.</param>
    /// <param name="isMoney">Money is never a yes or no, whatever its values were.</param>
    /// <param name="method">Where the standard error comes from; the closed form's interval is Wilson's, which holds without a single hit.</param>
    public static Estimate? Of(OutcomeResult outcome, bool isMoney, ErrorMethod method)
    {
        TDigest digest = outcome.Summary.Digest;
        if (isMoney || digest.Count > 2)
        {
            return null;
        }

        long hits = 0;
        for (int i = 0; i < digest.Count; i++)
        {
            if (digest.Means[i] is not (0 or 1))
            {
                return null;
            }

            hits += digest.Means[i] == 1 ? digest.WeightAt(i) : 0;
        }

        return method == ErrorMethod.ClosedForm ? WilsonInterval.Of(hits, digest.TotalWeight) : Figures.Of(outcome, method).Mean;
    }
}
