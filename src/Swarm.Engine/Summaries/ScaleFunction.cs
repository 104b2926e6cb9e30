namespace Swarm.Engine.Summaries;

/// <summary>
/// How many trials a cluster may hold at a rank: a fraction of the sampling error of that rank, sqrt(n q (1 - q)), small in the
/// tails, where VaR and TVaR are read, and larger in the bulk (in the place of the scale functions of Dunning &amp; Ertl 2019,
/// section 2). So a small node has a small digest, and the error of the sketch stays a fixed fraction of the sampling error.
/// Beyond <see cref="FullSize"/> trials the clusters grow with n, and the digest stays bounded.
/// </summary>
internal readonly struct ScaleFunction
{
    private const double TailFraction = 0.08;
    private const double BulkFraction = 1.0;
    private const double TailEnds = 0.006;
    private const double BulkBegins = 0.03;
    private const double FullSize = 1 << 20;
    private readonly double _count;
    private readonly double _inverse;
    private readonly double _growth;

    public ScaleFunction(long count)
    {
        _count = count;
        _inverse = 1.0 / count;
        _growth = count > FullSize ? Math.Sqrt(count / FullSize) : 1;
    }

    /// <summary>The greatest weight at a rank between 0 and n, at least 1.</summary>
    public double LimitAt(double rank)
    {
        var above = _count - rank;
        var q = (rank < above ? rank : above) * _inverse;
        if (!(q > 0)) return 1;
        var limit = FractionAt(q) * _growth * Math.Sqrt(_count * q * (1 - q));
        return limit > 1 ? limit : 1;
    }

    private static double FractionAt(double q)
    {
        if (q <= TailEnds) return TailFraction;
        if (q >= BulkBegins) return BulkFraction;
        return TailFraction + ((BulkFraction - TailFraction) / (BulkBegins - TailEnds) * (q - TailEnds));
    }
}
