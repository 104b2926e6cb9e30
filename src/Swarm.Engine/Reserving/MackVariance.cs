namespace Swarm.Engine.Reserving;

/// <summary>The variance parameters of Mack's model.</summary>
internal static class MackVariance
{
    /// <summary>
    /// sigma^2 of each development: squared deviations of the link ratios from their factor, weighted by C^alpha, over their number
    /// less 1 (Mack 1999); by the minimum rule where one ratio is left (Mack 1993).
    /// </summary>
    /// <param name="ratios">Link ratios; those that count lead from amounts above 0.</param>
    /// <param name="factors">Their averages.</param>
    /// <param name="alpha">1 for volume-weighted, 0 for simple averages.</param>
    /// <returns>The parameters, or null if the first development has one ratio, so that there is nothing to go by.</returns>
    public static double[]? Of(LinkRatios ratios, IReadOnlyList<double> factors, int alpha)
    {
        double[] sigmaSquared = new double[factors.Count];
        for (int j = 0; j < sigmaSquared.Length; j++)
        {
            int count = ratios.CountAt(j);
            if (count == 1 && j == 0)
            {
                return null;
            }

            sigmaSquared[j] = count > 1 ? Estimated(ratios, j, factors[j], alpha, count) : MinimumRule(sigmaSquared, j);
        }

        return sigmaSquared;
    }

    /// <summary>Sum of C^alpha over the counted ratios: what sigma^2 is divided by to give a factor's squared error.</summary>
    public static double WeightSum(LinkRatios ratios, int development, int alpha)
    {
        double sum = 0;
        foreach (int i in ratios.CountedAt(development))
        {
            sum += Weight(ratios.Cumulative(i, development), alpha);
        }

        return sum;
    }

    /// <summary>C^alpha for the exponents in use.</summary>
    public static double Weight(double cumulative, int alpha) => alpha == 0 ? 1 : cumulative;

    /// <summary>From the two developments before: min(sigma4(j-1) / sigma2(j-2), sigma2(j-2), sigma2(j-1)).</summary>
    public static double MinimumRule(IReadOnlyList<double> sigmaSquared, int development)
    {
        double last = sigmaSquared[development - 1];
        if (development == 1)
        {
            return last;
        }

        double before = sigmaSquared[development - 2];
        return before == 0 ? 0 : Math.Min(last * last / before, Math.Min(before, last));
    }

    private static double Estimated(LinkRatios ratios, int development, double factor, int alpha, int count)
    {
        double sum = 0;
        foreach (int i in ratios.CountedAt(development))
        {
            double deviation = ratios.Ratio(i, development) - factor;
            sum += Weight(ratios.Cumulative(i, development), alpha) * (deviation * deviation);
        }

        return sum / (count - 1);
    }
}
