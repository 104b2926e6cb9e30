namespace Swarm.Engine.Summaries;

/// <summary>Powers of the excess beyond VaR, from zero at VaR upwards, averaged over all trials of the sample.</summary>
/// <param name="First">Mean excess.</param>
/// <param name="Second">Mean squared excess.</param>
/// <param name="Third">Mean cubed excess.</param>
/// <param name="Fourth">Mean fourth power.</param>
internal readonly record struct TailMoments(double First, double Second, double Third, double Fourth)
{
    public static TailMoments Beyond(DigestIndex index, double edge, Adverse adverse)
    {
        double s1 = 0, s2 = 0, s3 = 0, s4 = 0;
        var high = adverse == Adverse.High;
        for (var step = 0; step < index.Count; step++)
        {
            var i = high ? index.Count - 1 - step : step;
            var excess = high ? index.MeanAt(i) - edge : edge - index.MeanAt(i);
            if (!(excess > 0)) break;
            var square = excess * excess;
            var weight = index.WeightAt(i);
            s1 += weight * excess;
            s2 += weight * square;
            s3 += weight * square * excess;
            s4 += weight * square * square;
        }

        double n = index.Total;
        return new TailMoments(s1 / n, s2 / n, s3 / n, s4 / n);
    }
}
