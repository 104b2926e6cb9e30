namespace Swarm.Engine.Reserving;

/// <summary>Development beyond the triangle, ready for use.</summary>
/// <param name="Factor">From the last development period to ultimate.</param>
/// <param name="Sd">Standard deviation of the factor.</param>
/// <param name="Shares">Share of the tail that is paid in each period after the triangle; they sum to 1.</param>
/// <param name="IsFitted">True if the factor is the product of a fitted decay.</param>
/// <param name="Decay">The decay behind the factor or the shares; null where the shares are equal.</param>
public sealed record Tail(double Factor, double Sd, IReadOnlyList<double> Shares, bool IsFitted, DecayFit? Decay)
{
    /// <summary>
    /// The tail that the options ask for. Payments decline from period to period by the fitted decay's ratio; they are equal
    /// where the triangle's factors give no decay.
    /// </summary>
    internal static Tail? Of(TailOptions options, IReadOnlyList<double> factors, ICollection<Finding> findings)
    {
        DecayFit? decay = DecayFit.Of(factors);
        decay = decay?.Slope < 0 ? decay : null;
        if (options.Factor is { } given)
        {
            return new Tail(given, options.Sd, SharesOf(decay, options.Periods), false, decay);
        }

        if (decay?.TailFactor(factors.Count) is { } fitted)
        {
            return new Tail(fitted, options.Sd, SharesOf(decay, options.Periods), true, decay);
        }

        findings.Add(Finding.Error(
            "the development factors show no exponential decay that settles, so no tail can be fitted",
            "give the tail a factor"));
        return null;
    }

    private static double[] SharesOf(DecayFit? decay, int periods)
    {
        double[] shares = new double[periods];
        double ratio = decay?.Ratio ?? 1;
        double part = 1;
        double sum = 0;
        for (int k = 0; k < periods; k++)
        {
            shares[k] = part;
            sum += part;
            part *= ratio;
        }

        for (int k = 0; k < periods; k++)
        {
            shares[k] /= sum;
        }

        return shares;
    }
}
