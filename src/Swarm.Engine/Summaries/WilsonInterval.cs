namespace Swarm.Engine.Summaries;

/// <summary>The score interval of a probability (Wilson 1927); holds with no hit, and with nothing but hits.</summary>
internal static class WilsonInterval
{
    public static Estimate Of(long hits, long trials)
    {
        const double Z = Confidence.Normal;
        var share = (double)hits / trials;
        var shrink = 1 / (1 + (Z * Z / trials));
        var center = shrink * (share + (Z * Z / (2.0 * trials)));
        var half = shrink * Z * Math.Sqrt((share * (1 - share) / trials) + (Z * Z / (4.0 * trials * trials)));
        var low = hits == 0 ? 0 : Math.Max(0, center - half);
        var high = hits == trials ? 1 : Math.Min(1, center + half);
        return new Estimate(share, half / Z, low, high, null);
    }
}
