namespace Swarm.Engine.Reserving;

/// <summary>What the over-dispersed Poisson model asks of amounts.</summary>
/// <remarks>
/// Single negative increments are allowed: quasi-likelihood needs only that the increments of each development period, and of
/// each origin, sum to more than 0 (England &amp; Verrall 2002, section 2.3). A period whose increments are all 0 is fitted by 0.
/// </remarks>
internal static class OdpRules
{
    /// <summary>Adds a finding for each rule that is broken; true if none is.</summary>
    public static bool Hold(ChainLadder chainLadder, ICollection<Finding> findings)
    {
        Finding[] errors = [.. BadDevelopments(chainLadder), .. BadOrigins(chainLadder.Triangle)];
        foreach (Finding error in errors)
        {
            findings.Add(error);
        }

        if (errors.Length == 0)
        {
            WarnOfNegatives(chainLadder.Triangle, findings);
        }

        return errors.Length == 0;
    }

    /// <summary>
    /// Residuals of all cells sum to about 0, those that are left after exclusions need not: every pseudo increment is then shifted the
    /// same way, and with them the mean of the bootstrap.
    /// </summary>
    public static void WarnOfDrift(OdpFit fit, ICollection<Finding> findings)
    {
        if (!fit.ChainLadder.Ratios.AllCount && !fit.Options.CentreResiduals)
        {
            findings.Add(Finding.Warning(
                $"with link ratios left out, the residuals that are resampled have a mean of {fit.PoolMean:G3}, not 0, which moves the "
                + "bootstrap's mean away from the chain ladder",
                "write centre: true"));
        }
    }

    private static IEnumerable<Finding> BadDevelopments(ChainLadder chainLadder)
    {
        Triangle triangle = chainLadder.Triangle;
        for (int j = 1; j < triangle.Developments; j++)
        {
            int[] counted = [.. chainLadder.Ratios.CountedAt(j - 1)];
            if (chainLadder.Factors[j - 1] > 1 || Array.TrueForAll(counted, i => triangle.Incremental(i, j) == 0))
            {
                continue;
            }

            int worst = counted.MinBy(i => triangle.Incremental(i, j));
            yield return Finding.Error(
                $"the increments at development {j + 1} do not grow the amounts in total (factor {chainLadder.Factors[j - 1]}; "
                + $"most negative: {triangle.Incremental(worst, j)} at {triangle.CellName(worst, j)}), so an over-dispersed Poisson "
                + "model has no mean for them",
                "use method: mack, exclude that cell's link ratio, or join this development period with its neighbour in the data");
        }
    }

    private static IEnumerable<Finding> BadOrigins(Triangle triangle)
    {
        for (int i = 0; i < triangle.Origins.Count; i++)
        {
            double latest = triangle.Latest(i);
            bool isAllZero = Enumerable.Range(0, triangle.Known(i)).All(j => triangle.Incremental(i, j) == 0);
            if (!(latest > 0) && !isAllZero)
            {
                yield return Finding.Error(
                    $"the amount to date of {triangle.CellName(i, triangle.Known(i) - 1)} is {latest}, so an over-dispersed Poisson "
                    + "model has no mean for this origin",
                    "check the signs, use method: mack, or leave the origin out");
            }
        }
    }

    private static void WarnOfNegatives(Triangle triangle, ICollection<Finding> findings)
    {
        (int Origin, int Development)[] negatives =
        [
            .. from i in Enumerable.Range(0, triangle.Origins.Count)
               from j in Enumerable.Range(0, triangle.Known(i))
               where triangle.Incremental(i, j) < 0
               select (i, j),
        ];
        if (negatives.Length > 0)
        {
            (int i, int j) = negatives[0];
            findings.Add(Finding.Warning(
                $"{negatives.Length} negative increment{(negatives.Length > 1 ? "s" : "")}, the first {triangle.Incremental(i, j)} at "
                + $"{triangle.CellName(i, j)}",
                "the fitted means stay positive, so the model holds; a large one makes a large residual that is resampled everywhere"));
        }
    }
}
