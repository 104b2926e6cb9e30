namespace Swarm.Engine.Reserving;

/// <summary>Link ratios into one calendar period.</summary>
/// <param name="Label">The calendar period.</param>
/// <param name="Small">How many are below the median of their development.</param>
/// <param name="Large">How many are above it.</param>
/// <param name="Mean">Mean of the smaller count if small and large are equally likely.</param>
/// <param name="Variance">Its variance.</param>
public sealed record CalendarYearCount(string Label, int Small, int Large, double Mean, double Variance)
{
    /// <summary>
    /// With n ratios and m = floor((n - 1) / 2): mean n/2 - B, variance n (n - 1) / 4 - B (n - 1) + mean - mean^2, where B is
    /// n / 2^n times (n - 1 over m).
    /// </summary>
    internal static CalendarYearCount Of(string label, int small, int large)
    {
        int n = small + large;
        double correction = n;
        for (int k = 0; k < n; k++)
        {
            correction *= 0.5;
        }

        int m = (n - 1) / 2;
        for (int k = 1; k <= m; k++)
        {
            correction = correction * (n - k) / k;
        }

        double mean = (0.5 * n) - correction;
        double variance = (0.25 * n * (n - 1)) - (correction * (n - 1)) + mean - (mean * mean);
        return new CalendarYearCount(label, small, large, mean, variance);
    }
}
