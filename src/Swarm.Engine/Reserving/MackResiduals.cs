namespace Swarm.Engine.Reserving;

/// <summary>Residuals of Mack's model.</summary>
internal static class MackResiduals
{
    /// <summary>
    /// Of every cell after the first development: the increment less its mean (f - 1) C, over the root of C^(2 - alpha); scaled by
    /// sigma (Mack 1994).
    /// </summary>
    public static IReadOnlyList<Residual> Of(Mack mack)
    {
        Triangle triangle = mack.Triangle;
        LinkRatios ratios = mack.ChainLadder.Ratios;
        List<Residual> residuals = [];
        for (int j = 1; j < triangle.Developments; j++)
        {
            double sigma = Math.Sqrt(mack.SigmaSquared[j - 1]);
            bool isAlone = ratios.CountAt(j - 1) == 1;
            for (int i = 0; i < triangle.RowsAt(j); i++)
            {
                double before = ratios.Cumulative(i, j - 1);
                double fitted = (mack.Factors[j - 1] - 1) * before;
                double observed = triangle.Incremental(i, j);
                bool isCounted = ratios.IsCounted(i, j - 1);
                double root = mack.Alpha == 1 ? Math.Sqrt(before) : before;
                double pearson = before > 0 && !(isAlone && isCounted) ? (observed - fitted) / root : 0;
                residuals.Add(new Residual(
                    i, j, observed, fitted, pearson, sigma > 0 ? pearson / sigma : 0, isCounted, isAlone && isCounted));
            }
        }

        return residuals;
    }
}
