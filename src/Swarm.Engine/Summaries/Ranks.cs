namespace Swarm.Engine.Summaries;

/// <summary>Which order statistic a level asks for.</summary>
internal static class Ranks
{
    // 0.995 * 1,000,000 in doubles may miss the whole number that is meant by some ulp.
    private const double Slack = 1e-12;

    /// <summary>ceil(n p), the rank of the lower inverse, 1 to n; a product within 1e-12 of a whole number counts as whole.</summary>
    public static long OfLevel(double p, long count)
    {
        var product = p * count;
        var floor = Math.Floor(product);
        var rank = product - floor <= Slack * product ? floor : floor + 1;
        return Math.Clamp((long)rank, 1, count);
    }

    /// <summary>The number of trials n (1 - p), not whole in general, that a tail beyond a level holds.</summary>
    public static double TailMass(double p, long count)
    {
        var mass = count - (p * count);
        var whole = Math.Floor(mass + 0.5);
        return Math.Abs(mass - whole) <= Slack * count ? whole : mass;
    }
}
