namespace Swarm.Engine.Summaries;

/// <summary>
/// The interval of a mean of skewed values: Hall's (1992) monotone cubic transformation of the t-statistic, with a Student-t
/// quantile whose degrees of freedom follow from the kurtosis of the values (Satterthwaite 1946: 2 n / (kurtosis - 1)).
/// </summary>
internal static class SkewedMean
{
    private const double FewestDegrees = 9;

    public static Estimate Interval(double value, double standardError, double count, double skewness, double kurtosis)
    {
        if (standardError == 0) return Confidence.Even(value, 0);
        var quantile = Confidence.StudentT(Math.Max(FewestDegrees, 2 * count / Math.Max(1, kurtosis - 1)));
        var g = skewness / Math.Sqrt(count);
        var low = value - (standardError * Untransformed(quantile, g));
        var high = value - (standardError * Untransformed(-quantile, g));
        return new Estimate(value, standardError, low, high, null);
    }

    /// <summary>The t-statistic whose transform T + g T^2/3 + g^2 T^3/27 + g/6 is x.</summary>
    private static double Untransformed(double x, double g) =>
        Math.Abs(g) < 1e-6 ? x : 3 / g * (CubeRoot(1 + (g * (x - (g / 6)))) - 1);

    /// <summary>By Newton's method from above, which falls to the root; the platform's own differs between CPUs.</summary>
    private static double CubeRoot(double x)
    {
        if (x == 0) return 0;
        var size = Math.Abs(x);
        var root = Math.Max(1, size);
        while (true)
        {
            var next = ((2 * root) + (size / (root * root))) / 3;
            if (!(next < root)) return x < 0 ? -root : root;
            root = next;
        }
    }
}
