namespace Swarm.Engine.Reserving;

/// <summary>
/// Mack's test for calendar year effects (Mack 1994, appendix H). Link ratios are split at the median of their development; on a
/// diagonal without an effect, small and large ones are equally likely, so that the smaller of the two counts is rarely very small.
/// </summary>
public sealed class CalendarYearTest
{
    private CalendarYearTest(IReadOnlyList<CalendarYearCount> years)
    {
        Years = years;
        foreach (CalendarYearCount year in years)
        {
            Statistic += Math.Min(year.Small, year.Large);
            Mean += year.Mean;
            Variance += year.Variance;
        }
    }

    /// <summary>Counts of each calendar period, oldest first.</summary>
    public IReadOnlyList<CalendarYearCount> Years { get; }

    /// <summary>Z, the sum over calendar periods of the smaller of the two counts.</summary>
    public double Statistic { get; }

    /// <summary>Mean of Z without an effect.</summary>
    public double Mean { get; }

    /// <summary>Variance of Z without an effect, taking calendar periods as independent.</summary>
    public double Variance { get; }

    /// <summary>Lower end of Mack's range, two standard deviations below the mean: about 95 % lie within.</summary>
    public double Low => Mean - (2 * Math.Sqrt(Variance));

    /// <summary>Upper end of the range.</summary>
    public double High => Mean + (2 * Math.Sqrt(Variance));

    /// <summary>True if Z is outside the range: below it, calendar periods push ratios the same way.</summary>
    public bool IsRejected => Statistic < Low || Statistic > High;

    /// <summary>The test on the link ratios that count.</summary>
    public static CalendarYearTest Of(LinkRatios ratios)
    {
        Triangle triangle = ratios.Triangle;
        int periods = triangle.Origins.Count + triangle.Developments;
        int[] small = new int[periods];
        int[] large = new int[periods];
        for (int j = 0; j < triangle.Developments - 1; j++)
        {
            int[] origins = [.. ratios.CountedAt(j).Where(i => ratios.Cumulative(i, j) > 0)];
            double median = Median([.. origins.Select(i => ratios.Ratio(i, j)).Order()]);
            foreach (int i in origins)
            {
                small[i + j + 1] += ratios.Ratio(i, j) < median ? 1 : 0;
                large[i + j + 1] += ratios.Ratio(i, j) > median ? 1 : 0;
            }
        }

        return new CalendarYearTest(
        [
            .. Enumerable.Range(0, periods)
                .Where(c => small[c] + large[c] > 0)
                .Select(c => CalendarYearCount.Of(PeriodLabel.Add(triangle.Origins[0], c), small[c], large[c])),
        ]);
    }

    private static double Median(double[] sorted)
    {
        int middle = sorted.Length / 2;
        return sorted.Length == 0 ? double.NaN
            : sorted.Length % 2 == 1 ? sorted[middle]
            : 0.5 * (sorted[middle - 1] + sorted[middle]);
    }
}
