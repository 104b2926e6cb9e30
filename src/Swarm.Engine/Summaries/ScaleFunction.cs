namespace Swarm.Engine.Summaries;

/// <summary>
/// How many trials a cluster may hold at a rank: a fraction of the sampling error of that rank, sqrt(n q (1 - q)), small in the
/// tails, where VaR and TVaR are read, and larger in the bulk (in the place of the scale functions of Dunning &amp; Ertl 2019,
/// section 2). So a small node has a small digest, and the sketch errs by a fixed fraction of the sampling error.
/// </summary>
/// <remarks>
/// The error of each level of the tree adds up, so small nodes keep finer tails than they need for themselves; large ones let
/// their clusters grow with n, which bounds the digest. Fractions and sizes are measured: docs/figures.md.
/// </remarks>
internal readonly struct ScaleFunction
{
    private const double TailFraction = 0.06;
    private const double BulkFraction = 0.9;
    private const double TailEnds = 0.006;
    private const double BulkBegins = 0.03;
    private const double WholeBelow = 4;
    private const double FineTailsUpTo = 1 << 20;
    private const double TailsBoundedFrom = 1 << 23;
    private const double BulkBoundedFrom = 1 << 20;
    private readonly double _count;
    private readonly double _inverse;
    private readonly double _tail;
    private readonly double _slope;
    private readonly double _bulk;

    public ScaleFunction(long count)
    {
        _count = count;
        _inverse = 1.0 / count;
        _tail = TailFraction * Math.Sqrt(Math.Min(1, count / FineTailsUpTo) * Math.Max(1, count / TailsBoundedFrom));
        _bulk = BulkFraction * Math.Sqrt(Math.Max(1, count / BulkBoundedFrom));
        _slope = (_bulk - _tail) / (BulkBegins - TailEnds);
    }

    /// <summary>The greatest weight at a rank between 0 and n, at least 1.</summary>
    public double LimitAt(double rank)
    {
        var above = _count - rank;
        var q = (rank < above ? rank : above) * _inverse;
        if (!(q > 0)) return 1;
        var fraction = q <= TailEnds ? _tail : q >= BulkBegins ? _bulk : _tail + (_slope * (q - TailEnds));
        var limit = fraction * Math.Sqrt(_count * q * (1 - q));
        return limit < 1 ? 1 : limit < WholeBelow ? Math.Floor(limit) : limit;
    }
}
