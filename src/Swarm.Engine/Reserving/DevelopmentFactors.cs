namespace Swarm.Engine.Reserving;

/// <summary>Averages of link ratios.</summary>
internal static class DevelopmentFactors
{
    /// <summary>One factor a development, or null after an error was added to the findings.</summary>
    public static double[]? Of(LinkRatios ratios, LinkRatioAverage average, ICollection<Finding> findings)
    {
        double[] factors = new double[ratios.Triangle.Developments - 1];
        bool isGood = true;
        for (int j = 0; j < factors.Length; j++)
        {
            if (!IsPossible(ratios, j, average, findings))
            {
                isGood = false;
                continue;
            }

            factors[j] = average == LinkRatioAverage.Simple ? Simple(ratios, j) : VolumeWeighted(ratios, j);
            if (!(factors[j] > 0))
            {
                isGood = false;
                findings.Add(Finding.Error(
                    $"the factor from {Step(j)} is {factors[j]}, not above 0",
                    "a paid or incurred amount must stay positive in total; check the signs, or exclude link ratios"));
            }
        }

        return isGood ? factors : null;
    }

    private static bool IsPossible(LinkRatios ratios, int development, LinkRatioAverage average, ICollection<Finding> findings)
    {
        if (ratios.CountAt(development) == 0)
        {
            findings.Add(Finding.Error(
                $"no link ratio is left from {Step(development)}", "exclude fewer, or let more of the last periods count"));
            return false;
        }

        if (average == LinkRatioAverage.VolumeWeighted)
        {
            double sum = 0;
            foreach (int i in ratios.CountedAt(development))
            {
                sum += ratios.Cumulative(i, development);
            }

            if (!(sum > 0))
            {
                findings.Add(Finding.Error(
                    $"the cumulative amounts at development {development + 1} sum to {sum}, so there is no factor from it",
                    "check the signs, or join the first development periods"));
            }

            return sum > 0;
        }

        int[] bad = [.. ratios.CountedAt(development).Where(i => !(ratios.Cumulative(i, development) > 0))];
        foreach (int i in bad)
        {
            findings.Add(Finding.Error(
                $"the cumulative amount of {ratios.Triangle.CellName(i, development)} is {ratios.Cumulative(i, development)}, "
                + "so its link ratio cannot enter a simple average",
                "exclude this link ratio, or average: volume_weighted"));
        }

        return bad.Length == 0;
    }

    private static double VolumeWeighted(LinkRatios ratios, int development)
    {
        double after = 0;
        double before = 0;
        foreach (int i in ratios.CountedAt(development))
        {
            after += ratios.Cumulative(i, development + 1);
            before += ratios.Cumulative(i, development);
        }

        return after / before;
    }

    private static double Simple(LinkRatios ratios, int development)
    {
        double sum = 0;
        foreach (int i in ratios.CountedAt(development))
        {
            sum += ratios.Ratio(i, development);
        }

        return sum / ratios.CountAt(development);
    }

    private static string Step(int development) => $"development {development + 1} to {development + 2}";
}
