using Swarm.Engine.Numerics;

namespace Swarm.Engine.Reserving;

/// <summary>
/// An exponential decay of the development factors: log(f_j - 1) = a + b j, least squares over the factors above 1, after
/// Sherman (1984), "Extrapolating, smoothing and interpolating development factors".
/// </summary>
/// <param name="Intercept">a, with j counted from 0.</param>
/// <param name="Slope">b; a decay only where negative.</param>
/// <param name="Points">Number of factors behind the fit.</param>
public sealed record DecayFit(double Intercept, double Slope, int Points)
{
    private const int MaxPeriods = 1_000;
    private const double Negligible = 1e-12;

    /// <summary>What f - 1 is multiplied by from one period to the next.</summary>
    public double Ratio => Elementary.Exp(Slope);

    /// <summary>The fit, or null with fewer than three factors above 1.</summary>
    internal static DecayFit? Of(IReadOnlyList<double> factors)
    {
        double n = 0, meanX = 0, meanY = 0;
        for (int j = 0; j < factors.Count; j++)
        {
            if (factors[j] > 1)
            {
                n++;
                meanX += j;
                meanY += Elementary.Log(factors[j] - 1);
            }
        }

        if (n < 3)
        {
            return null;
        }

        meanX /= n;
        meanY /= n;
        double xx = 0, xy = 0;
        for (int j = 0; j < factors.Count; j++)
        {
            if (factors[j] > 1)
            {
                xx += (j - meanX) * (j - meanX);
                xy += (j - meanX) * (Elementary.Log(factors[j] - 1) - meanY);
            }
        }

        double slope = xy / xx;
        return new DecayFit(meanY - (slope * meanX), slope, (int)n);
    }

    /// <summary>The product of the fitted factors from a development on, or null where it does not settle.</summary>
    internal double? TailFactor(int development)
    {
        if (!(Slope < 0))
        {
            return null;
        }

        double excess = Elementary.Exp(Intercept + (Slope * development));
        double ratio = Ratio;
        double factor = 1;
        for (int k = 0; k < MaxPeriods; k++)
        {
            factor *= 1 + excess;
            excess *= ratio;
            if (excess < Negligible)
            {
                return factor;
            }
        }

        return null;
    }
}
