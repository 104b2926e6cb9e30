namespace Swarm.Engine.Summaries;

/// <summary>Standard errors and 95 % intervals of figures from independent trials.</summary>
internal sealed class ClosedFormErrors(OutcomeRequest request, OutcomeSummary summary, DigestIndex index) : IFigureErrors
{
    private readonly Moments _moments = summary.Moments;

    /// <summary>s / sqrt(n), with an interval that leans as the values are skewed.</summary>
    public Estimate Mean()
    {
        var se = _moments.Sd / Math.Sqrt(_moments.Count);
        if (!double.IsFinite(_moments.M3) || !double.IsFinite(_moments.M4)) return Confidence.Even(_moments.Mean, se);
        var variance = _moments.Central(2);
        return SkewedMean.Interval(
            _moments.Mean, se, _moments.Count, _moments.Skewness, _moments.Central(4) / (variance * variance));
    }

    /// <summary>Delta method: Var(s) = (m4 - m2^2) / (4 m2 n) (Cramér 1946, 27.7).</summary>
    public Estimate Sd()
    {
        var variance = _moments.Central(2);
        var ofVariance = Math.Max(0, _moments.Central(4) - (variance * variance)) / _moments.Count;
        return Confidence.Even(_moments.Sd, Math.Sqrt(ofVariance) / (2 * Math.Sqrt(variance)));
    }

    /// <summary>Delta method from the standardised moments up to the sixth (Cramér 1946, 28.4).</summary>
    public Estimate Skewness()
    {
        var sd = Math.Sqrt(_moments.Central(2));
        var g = _moments.Skewness;
        var k4 = _moments.Central(4) / (sd * sd * sd * sd);
        var k5 = _moments.Central(5) / (sd * sd * sd * sd * sd);
        var k6 = _moments.Central(6) / (sd * sd * sd * sd * sd * sd);
        var variance = k6 - (6 * k4) + 9 - (3 * g * k5) + (g * g * ((2.25 * k4) + 8.75));
        return Confidence.Even(g, Math.Sqrt(Math.Max(0, variance) / _moments.Count));
    }

    /// <summary>
    /// Order statistics (David &amp; Nagaraja 2003, 7.1): the number of trials beyond the true VaR is binomial, so two ranks
    /// enclose it whatever the distribution. The sketch's own uncertainty of a rank widens them.
    /// </summary>
    public Estimate Var(double level)
    {
        const double Z = Confidence.Normal;
        var value = TailFigures.Var(index, level, request.Adverse);
        var n = _moments.Count;
        var beyond = Ranks.TailMass(level, n);
        var blur = index.BlurAt(TailFigures.RankOf(index, level, request.Adverse));
        var spread = Math.Sqrt((n * level * (1 - level)) + (blur * blur));

        // Cornish & Fisher (1938): the binomial's skewness moves both quantiles by (z^2 - 1) (2p - 1) / 6.
        var center = beyond + (((Z * Z) - 1) / 6 * ((2 * level) - 1));
        var few = Math.Max(1, (long)Math.Floor(center - (Z * spread) + 0.5));
        var many = Math.Min(n, (long)Math.Ceiling(center + (Z * spread) + 0.5));
        var outer = AtTailRank(few);
        var inner = AtTailRank(many);
        var (low, high) = request.Adverse == Adverse.High ? (inner, outer) : (outer, inner);
        return new Estimate(value, (high - low) / (2 * Z), low, high, null);
    }

    /// <summary>
    /// Influence function (Manistre &amp; Hancock 2005): TVaR is the mean of VaR + (x - VaR)+ / (1 - p), whose values are skewed.
    /// </summary>
    public Estimate Tvar(double level)
    {
        var value = TailFigures.Tvar(index, level, request.Adverse);
        var n = _moments.Count;
        var edge = TailFigures.Var(index, level, request.Adverse);
        var tail = TailMoments.Beyond(index, edge, request.Adverse);
        var m = tail.First;
        var variance = tail.Second - (m * m);
        if (!(variance > 0)) return variance == 0 ? Confidence.Even(value, 0) : Estimate.Without(value, FigureReasons.Range);
        var third = tail.Third - (3 * m * tail.Second) + (2 * m * m * m);
        var fourth = tail.Fourth - (4 * m * tail.Third) + (6 * m * m * tail.Second) - (3 * m * m * m * m);
        var skewness = third / (variance * Math.Sqrt(variance));
        var sign = request.Adverse == Adverse.High ? 1 : -1;
        var se = Math.Sqrt(variance / n) / (1 - level);
        return SkewedMean.Interval(value, se, n, sign * skewness, fourth / (variance * variance));
    }

    /// <summary>Binomial.</summary>
    public Estimate Exceedance(int threshold) => WilsonInterval.Of(summary.Exceedances[threshold], _moments.Count);

    private double AtTailRank(long rank) => index.ValueAt(request.Adverse == Adverse.High ? index.Total + 1 - rank : rank);
}
