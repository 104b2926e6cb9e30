namespace Swarm.Engine.Reserving;

/// <summary>
/// The over-dispersed Poisson model of incremental amounts (mean m, variance scale times m), fitted through the chain ladder
/// (Renshaw &amp; Verrall 1998), with the residuals that its bootstrap resamples (England &amp; Verrall 1999, England 2002).
/// </summary>
public sealed class OdpFit
{
    private readonly double[][] _means;

    private OdpFit(ChainLadder chainLadder, double[][] means, IReadOnlyList<Residual> residuals)
    {
        ChainLadder = chainLadder;
        _means = means;
        Count = residuals.Count(r => r.IsCounted);
        Parameters = ParametersOf(residuals);
        BiasAdjustment = Math.Sqrt((double)Count / (Count - Parameters));
        Scales = ScaleParameters.Of(
            residuals, Options.Scale, Triangle.Developments, (double)Count / (Count - Parameters));
        Residuals = [.. residuals.Select(r => r with { Scaled = Scale(r.Development) > 0 ? r.Pearson / Math.Sqrt(Scale(r.Development)) : 0 })];
        Pool = PoolOf();
    }

    /// <summary>The chain ladder behind the fit.</summary>
    public ChainLadder ChainLadder { get; }

    /// <summary>The triangle.</summary>
    public Triangle Triangle => ChainLadder.Triangle;

    /// <summary>The options in use.</summary>
    public ReservingOptions Options => ChainLadder.Options;

    /// <summary>n: the residuals that count; all known cells unless link ratios are left out or a fitted mean is 0.</summary>
    public int Count { get; }

    /// <summary>
    /// p: one for each development after the first that has a counted cell, and one for each counted cell at the first
    /// development, which is origins plus developments less one where everything counts. n - p is then the number of link ratios
    /// less the number of factors.
    /// </summary>
    public int Parameters { get; }

    /// <summary>The root of n / (n - p), which residuals are multiplied by before they are resampled.</summary>
    public double BiasAdjustment { get; }

    /// <summary>Scale parameters with the number of residuals behind each.</summary>
    public IReadOnlyList<ScaleGroup> Scales { get; }

    /// <summary>Residuals of all known cells, in order of development, then origin.</summary>
    public IReadOnlyList<Residual> Residuals { get; }

    /// <summary>
    /// What is resampled, in the order of <see cref="Residuals"/>: adjusted residuals, divided by the root of their scale unless
    /// that is constant.
    /// </summary>
    public IReadOnlyList<double> Pool { get; }

    /// <summary>Mean of the <see cref="Pool"/>; pseudo increments lie above their means by this times their spread, on average.</summary>
    public double PoolMean => MeanOf(Pool);

    /// <summary>True where the chain ladder gives the model's maximum quasi-likelihood.</summary>
    public bool IsMaximumLikelihood =>
        Options.Average == LinkRatioAverage.VolumeWeighted && ChainLadder.Ratios.AllCount && Options.Scale == ScaleForm.Constant;

    /// <summary>Fitted mean of a known increment.</summary>
    public double Mean(int origin, int development) => _means[origin][development];

    /// <summary>
    /// What a residual of the <see cref="Pool"/> is multiplied by in a known cell: the pseudo increment is the mean plus this times
    /// the residual.
    /// </summary>
    public double Spread(int origin, int development)
    {
        double variance = Math.Abs(Mean(origin, development));
        return Math.Sqrt(Options.Scale == ScaleForm.Constant ? variance : Scale(development) * variance);
    }

    /// <summary>Scale parameter of a development (from 0); beyond the triangle that of the last one.</summary>
    public double Scale(int development)
    {
        int column = Math.Min(development, Triangle.Developments - 1);
        return Scales.First(group => column <= group.Last).Scale;
    }

    /// <summary>The fit, or null after an error was added to the findings.</summary>
    public static OdpFit? Fit(ChainLadder chainLadder, ICollection<Finding> findings)
    {
        if (!OdpRules.Hold(chainLadder, findings))
        {
            return null;
        }

        double[][] means = FittedMeans(chainLadder);
        List<Residual> residuals = ResidualsOf(chainLadder, means);
        int count = residuals.Count(r => r.IsCounted);
        int parameters = ParametersOf(residuals);
        if (count > parameters)
        {
            var fit = new OdpFit(chainLadder, means, residuals);
            OdpRules.WarnOfDrift(fit, findings);
            return fit;
        }

        findings.Add(Finding.Error(
            $"{count} residuals for {parameters} parameters leave no degree of freedom to measure the scale",
            "give more origins, exclude fewer link ratios, or let more of the last periods count"));
        return null;
    }

    /// <summary>Backward from the latest diagonal: dividing by the factors gives the fitted cumulative amounts.</summary>
    private static double[][] FittedMeans(ChainLadder chainLadder)
    {
        Triangle triangle = chainLadder.Triangle;
        double[][] means = new double[triangle.Origins.Count][];
        for (int i = 0; i < means.Length; i++)
        {
            means[i] = new double[triangle.Known(i)];
            double cumulative = chainLadder.Ratios.Cumulative(i, triangle.Known(i) - 1);
            for (int j = means[i].Length - 1; j > 0; j--)
            {
                double before = cumulative / chainLadder.Factors[j - 1];
                means[i][j] = cumulative - before;
                cumulative = before;
            }

            means[i][0] = cumulative;
        }

        return means;
    }

    private static List<Residual> ResidualsOf(ChainLadder chainLadder, double[][] means)
    {
        Triangle triangle = chainLadder.Triangle;
        List<Residual> residuals = [];
        for (int j = 0; j < triangle.Developments; j++)
        {
            for (int i = 0; i < triangle.RowsAt(j); i++)
            {
                double observed = triangle.Incremental(i, j);
                double mean = means[i][j];
                bool isZero = IsZeroByConstruction(chainLadder.Ratios, i, j);
                double pearson = isZero || mean == 0 ? 0 : (observed - mean) / Math.Sqrt(Math.Abs(mean));
                bool isCounted = IsCounted(chainLadder.Ratios, i, j) && mean != 0;
                residuals.Add(new Residual(i, j, observed, mean, pearson, 0, isCounted, isZero));
            }
        }

        return residuals;
    }

    private static bool IsZeroByConstruction(LinkRatios ratios, int origin, int development) =>
        ratios.Triangle.Known(origin) == 1
        || (development == ratios.Triangle.Developments - 1
            && ratios.CountAt(development - 1) == 1
            && ratios.IsCounted(origin, development - 1));

    /// <summary>A cell counts if the ratio into it does; one at the first development, if the ratio out of it does.</summary>
    private static bool IsCounted(LinkRatios ratios, int origin, int development) =>
        development > 0
            ? ratios.IsCounted(origin, development - 1)
            : ratios.Triangle.Known(origin) == 1 || ratios.IsCounted(origin, 0);

    private static int ParametersOf(IReadOnlyList<Residual> residuals) =>
        residuals.Count(r => r.IsCounted && r.Development == 0)
        + residuals.Where(r => r.IsCounted && r.Development > 0).Select(r => r.Development).Distinct().Count();

    private double[] PoolOf()
    {
        double[] pool =
        [
            .. from r in Residuals
               where r.IsCounted && (Options.KeepZeroResiduals || !r.IsZeroByConstruction)
               select BiasAdjustment * (Options.Scale == ScaleForm.Constant ? r.Pearson : r.Scaled),
        ];
        return Options.CentreResiduals ? Centred(pool) : pool;
    }

    private static double[] Centred(double[] pool)
    {
        double mean = MeanOf(pool);
        return [.. pool.Select(residual => residual - mean)];
    }

    private static double MeanOf(IReadOnlyList<double> pool)
    {
        double sum = 0;
        foreach (double residual in pool)
        {
            sum += residual;
        }

        return sum / pool.Count;
    }
}
