namespace Swarm.Engine.Tests.Summaries;

internal static class RankErrors
{
    /// <summary>Distance from p to the interval [#(x &lt; v)/n, #(x &lt;= v)/n] for the answer v.</summary>
    public static double Of(double[] sorted, double answer, double p)
    {
        var below = FirstNotBelow(sorted, answer) / (double)sorted.Length;
        var atOrBelow = FirstNotBelow(sorted, Math.BitIncrement(answer)) / (double)sorted.Length;
        return p < below ? below - p : p > atOrBelow ? p - atOrBelow : 0;
    }

    private static int FirstNotBelow(double[] sorted, double value)
    {
        int low = 0, high = sorted.Length;
        while (low < high)
        {
            var middle = (low + high) >>> 1;
            if (sorted[middle] < value) low = middle + 1;
            else high = middle;
        }

        return low;
    }
}
