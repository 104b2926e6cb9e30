namespace Swarm.Engine.Summaries;

/// <summary>
/// How many trials carry a power sum. Where a handful carries more than half of it, the sum, and every error that rests on it,
/// is chance: the next run may see none of them, or one that is larger still.
/// </summary>
internal static class Dominance
{
    /// <summary>Fewer trials than this dominate a moment of the whole sample.</summary>
    public const int Handful = 5;

    /// <summary>Fewer than this dominate a tail, which is few trials anyway, and whose interval leans with its skewness.</summary>
    public const int TailHandful = 2;

    /// <summary>
    /// The least number of trials that carry over half of the sum of |x - center|^order over a range of clusters, if that is
    /// below a given handful; otherwise null.
    /// </summary>
    public static int? Dominating(DigestIndex index, double center, int order, int first, int last, int handful)
    {
        var total = 0.0;
        for (var i = first; i <= last; i++) total += index.WeightAt(i) * Power(index.MeanAt(i) - center, order);
        if (total == 0) return null;
        var carried = 0.0;
        long trials = 0;
        while (first <= last)
        {
            var low = Math.Abs(index.MeanAt(first) - center);
            var high = Math.Abs(index.MeanAt(last) - center);
            var cluster = high >= low ? last-- : first++;
            var weight = index.WeightAt(cluster);
            var each = Power(Math.Max(low, high), order);
            for (var k = 0L; k < weight; k++)
            {
                carried += each;
                trials++;
                if (trials >= handful) return null;
                if (!(carried <= total / 2)) return (int)trials;
            }
        }

        return null;
    }

    public static string Reason(int trials) => trials == 1 ? "moments dominated by 1 trial" : $"moments dominated by {trials} trials";

    private static double Power(double distance, int order)
    {
        var size = Math.Abs(distance);
        var power = 1.0;
        for (var k = 0; k < order; k++) power *= size;
        return power;
    }
}
