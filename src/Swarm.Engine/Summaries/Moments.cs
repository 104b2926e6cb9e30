namespace Swarm.Engine.Summaries;

/// <summary>
/// Count, mean, central power sums of the orders 2 to 6, least and greatest value. Merged by the formulas of Chan, Golub &amp;
/// LeVeque (1983) and Pébay (2008). The orders 5 and 6 carry the error of the skewness.
/// </summary>
/// <remarks>A power sum beyond the range of a double is positive infinity or not a number; figures that rest on it say so.</remarks>
public readonly record struct Moments
{
    /// <summary>Highest order that is kept.</summary>
    public const int HighestOrder = 6;

    /// <summary>Trials.</summary>
    public long Count { get; init; }

    /// <summary>Mean.</summary>
    public double Mean { get; init; }

    /// <summary>Sum of (x - mean)^2.</summary>
    public double M2 { get; init; }

    /// <summary>Sum of (x - mean)^3.</summary>
    public double M3 { get; init; }

    /// <summary>Sum of (x - mean)^4.</summary>
    public double M4 { get; init; }

    /// <summary>Sum of (x - mean)^5.</summary>
    public double M5 { get; init; }

    /// <summary>Sum of (x - mean)^6.</summary>
    public double M6 { get; init; }

    /// <summary>Least value.</summary>
    public double Min { get; init; }

    /// <summary>Greatest value.</summary>
    public double Max { get; init; }

    /// <summary>Standard deviation of the trials, divisor n - 1; zero for a single trial.</summary>
    public double Sd => Count > 1 ? Math.Sqrt(M2 / (Count - 1)) : 0;

    /// <summary>Skewness m3 / m2^1.5 with the divisor n in both; zero where nothing varies.</summary>
    public double Skewness => Min == Max ? 0 : Central(3) / (Central(2) * Math.Sqrt(Central(2)));

    /// <summary>The central moment of an order: the power sum over n.</summary>
    /// <param name="order">0 to 6.</param>
    public double Central(int order) => PowerSum(order) / Count;

    /// <summary>Sum of (x - mean)^order.</summary>
    /// <param name="order">0 to 6.</param>
    public double PowerSum(int order) => order switch
    {
        0 => Count,
        1 => 0,
        2 => M2,
        3 => M3,
        4 => M4,
        5 => M5,
        6 => M6,
        _ => throw new ArgumentOutOfRangeException(nameof(order)),
    };

    /// <summary>The moments of both samples together. Not symmetric in the last bit: the fixed tree says which is left.</summary>
    public static Moments Merge(in Moments left, in Moments right)
    {
        if (left.Count == 0) return right;
        if (right.Count == 0) return left;
        var count = left.Count + right.Count;
        var leftShare = (double)left.Count / count;
        var rightShare = (double)right.Count / count;
        var delta = right.Mean - left.Mean;
        Span<double> merged = stackalloc double[HighestOrder + 1];
        for (var order = 2; order <= HighestOrder; order++) merged[order] = MergedPowerSum(order, left, right, delta);
        return new Moments
        {
            Count = count,
            Mean = double.IsFinite(delta) ? left.Mean + (delta * rightShare) : (left.Mean * leftShare) + (right.Mean * rightShare),
            M2 = merged[2],
            M3 = merged[3],
            M4 = merged[4],
            M5 = merged[5],
            M6 = merged[6],
            Min = Math.Min(left.Min, right.Min),
            Max = Math.Max(left.Max, right.Max),
        };
    }

    /// <summary>Pébay (2008), equation 2.1, with both samples moved to the common mean.</summary>
    private static double MergedPowerSum(int order, in Moments left, in Moments right, double delta)
    {
        var count = (double)(left.Count + right.Count);
        var leftShift = -delta * (right.Count / count);
        var rightShift = delta * (left.Count / count);
        var sum = left.PowerSum(order) + right.PowerSum(order);
        var leftPower = 1.0;
        var rightPower = 1.0;
        var binomial = 1.0;
        for (var k = 1; k <= order; k++)
        {
            leftPower *= leftShift;
            rightPower *= rightShift;
            binomial = binomial * (order - k + 1) / k;
            if (k == order - 1) continue;
            sum += binomial * ((leftPower * left.PowerSum(order - k)) + (rightPower * right.PowerSum(order - k)));
        }

        return sum;
    }
}
