using Swarm.Engine.Numerics;

namespace Swarm.Engine.Reserving;

/// <summary>
/// Mack's distribution-free standard errors of chain-ladder reserves (Mack 1993), in the recursive form that takes other averages
/// and a tail factor (Mack 1999).
/// </summary>
public sealed class Mack
{
    private readonly double[] _factors;
    private readonly double[] _sigmaSquared;
    private readonly double[] _factorErrors;
    private readonly PredictionError[] _origins;

    private Mack(ChainLadder chainLadder, double[] sigmaSquared)
    {
        ChainLadder = chainLadder;
        Tail? tail = chainLadder.Tail;
        LinkRatios ratios = chainLadder.Ratios;
        double[] errors =
        [
            .. sigmaSquared.Select((s, j) => Math.Sqrt(s / MackVariance.WeightSum(ratios, j, Alpha))),
        ];
        _factors = tail is null ? [.. chainLadder.Factors] : [.. chainLadder.Factors, tail.Factor];
        _factorErrors = tail is null ? errors : [.. errors, tail.Sd];
        _sigmaSquared = tail is null
            ? sigmaSquared
            : [.. sigmaSquared, MackTail.SigmaSquared(tail.Factor, chainLadder.Factors, sigmaSquared)];
        _origins = new PredictionError[Triangle.Origins.Count];
        Total = Develop();
    }

    /// <summary>The chain ladder behind the errors.</summary>
    public ChainLadder ChainLadder { get; }

    /// <summary>The triangle.</summary>
    public Triangle Triangle => ChainLadder.Triangle;

    /// <summary>
    /// The exponent of Mack (1999): link ratios are weighted by C^alpha and vary as sigma^2 / C^alpha. 1 for volume-weighted,
    /// 0 for simple averages.
    /// </summary>
    public int Alpha => ChainLadder.Options.Average == LinkRatioAverage.VolumeWeighted ? 1 : 0;

    /// <summary>Factor j leads from development j to j + 1, both from 0; with a tail, its factor is the last.</summary>
    public IReadOnlyList<double> Factors => _factors;

    /// <summary>Variance parameter of each factor.</summary>
    public IReadOnlyList<double> SigmaSquared => _sigmaSquared;

    /// <summary>Standard error of each factor's estimate; the given standard deviation for the tail.</summary>
    public IReadOnlyList<double> FactorErrors => _factorErrors;

    /// <summary>Standard error of the total reserve, in its parts.</summary>
    public PredictionError Total { get; }

    /// <summary>Standard error of an origin's reserve, in its parts.</summary>
    public PredictionError Origin(int origin) => _origins[origin];

    /// <summary>
    /// The total reserve's quantile under a lognormal distribution with its mean and standard error, as Mack (1993) suggests.
    /// </summary>
    /// <param name="p">Probability, between 0 and 1 exclusive.</param>
    public double LognormalQuantile(double p)
    {
        double mean = ChainLadder.TotalReserve;
        double cv = Total.StandardError / mean;
        double variance = Elementary.Log1p(cv * cv);
        double z = NormalFunctions.Quantile(Lanes64.Create(p)).Value;
        return mean * Elementary.Exp((Math.Sqrt(variance) * z) - (0.5 * variance));
    }

    /// <summary>The errors, or null after an error was added to the findings.</summary>
    public static Mack? Fit(ChainLadder chainLadder, ICollection<Finding> findings)
    {
        if (!ArePositive(chainLadder, findings))
        {
            return null;
        }

        int alpha = chainLadder.Options.Average == LinkRatioAverage.VolumeWeighted ? 1 : 0;
        double[]? sigmaSquared = MackVariance.Of(chainLadder.Ratios, chainLadder.Factors, alpha);
        if (sigmaSquared is null)
        {
            findings.Add(Finding.Error(
                "one link ratio from development 1 to 2 leaves nothing to measure its variance by",
                "give more origins, exclude fewer link ratios, or let more of the last periods count"));
            return null;
        }

        return new Mack(chainLadder, sigmaSquared);
    }

    private static bool ArePositive(ChainLadder chainLadder, ICollection<Finding> findings)
    {
        Triangle triangle = chainLadder.Triangle;
        int before = findings.Count;
        for (int j = 0; j < chainLadder.Factors.Count; j++)
        {
            foreach (int i in chainLadder.Ratios.CountedAt(j).Where(i => !(chainLadder.Ratios.Cumulative(i, j) > 0)))
            {
                findings.Add(Finding.Error(
                    $"the cumulative amount of {triangle.CellName(i, j)} is {chainLadder.Ratios.Cumulative(i, j)}, and Mack's model "
                    + "divides by it",
                    "exclude this link ratio, or use method: odp_bootstrap"));
            }
        }

        for (int i = 0; i < triangle.Origins.Count; i++)
        {
            if (triangle.Latest(i) < 0)
            {
                findings.Add(Finding.Error(
                    $"the amount to date of {triangle.CellName(i, triangle.Known(i) - 1)} is {triangle.Latest(i)}, below 0",
                    "check the signs, or leave the origin out"));
            }
        }

        return findings.Count == before;
    }

    /// <summary>
    /// From period to period: process' = process f^2 + C^(2-alpha) sigma^2, parameter' = parameter f^2 + C^2 se(f)^2; for the total
    /// the parameter recursion runs over the sum of C, since all origins share the factor.
    /// </summary>
    private PredictionError Develop()
    {
        int origins = Triangle.Origins.Count;
        double[] cumulative = [.. Enumerable.Range(0, origins).Select(Triangle.Latest)];
        double[] process = new double[origins];
        double[] parameter = new double[origins];
        double totalParameter = 0;
        for (int k = 0; k < _factors.Length; k++)
        {
            double squaredFactor = _factors[k] * _factors[k];
            double squaredError = _factorErrors[k] * _factorErrors[k];
            double sum = 0;
            for (int i = 0; i < origins; i++)
            {
                if (Triangle.Known(i) > k + 1)
                {
                    continue;
                }

                double c = cumulative[i];
                sum += c;
                double spread = Alpha == 1 ? c : c * c;
                process[i] = (process[i] * squaredFactor) + (spread * _sigmaSquared[k]);
                parameter[i] = (parameter[i] * squaredFactor) + (c * c * squaredError);
                cumulative[i] = c * _factors[k];
            }

            totalParameter = (totalParameter * squaredFactor) + (sum * sum * squaredError);
        }

        double totalProcess = 0;
        for (int i = 0; i < origins; i++)
        {
            totalProcess += process[i];
            _origins[i] = PredictionError.OfVariances(process[i], parameter[i]);
        }

        return PredictionError.OfVariances(totalProcess, totalParameter);
    }
}
