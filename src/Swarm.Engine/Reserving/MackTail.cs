namespace Swarm.Engine.Reserving;

/// <summary>The process variance of a tail factor.</summary>
internal static class MackTail
{
    /// <summary>
    /// sigma of the tail, read off the developments whose factors enclose the tail factor, linear in between (Mack 1999, section 3:
    /// a factor between two others should have an error between theirs). Below all factors the minimum rule goes on by one
    /// period; above all, the largest factor's sigma is taken.
    /// </summary>
    public static double SigmaSquared(double tailFactor, IReadOnlyList<double> factors, IReadOnlyList<double> sigmaSquared)
    {
        if (factors.All(factor => factor > tailFactor))
        {
            return MackVariance.MinimumRule(sigmaSquared, sigmaSquared.Count);
        }

        // From the end, because a triangle's factors fall towards it.
        for (int j = factors.Count - 1; j > 0; j--)
        {
            if (factors[j - 1] >= tailFactor && tailFactor >= factors[j])
            {
                double span = factors[j - 1] - factors[j];
                double share = span > 0 ? (tailFactor - factors[j]) / span : 0;
                double sigma = Math.Sqrt(sigmaSquared[j]);
                sigma += share * (Math.Sqrt(sigmaSquared[j - 1]) - sigma);
                return sigma * sigma;
            }
        }

        int largest = Enumerable.Range(0, factors.Count).MaxBy(j => factors[j]);
        return sigmaSquared[largest];
    }
}
