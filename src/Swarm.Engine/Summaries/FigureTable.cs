namespace Swarm.Engine.Summaries;

/// <summary>
/// Asks for each figure's error unless there is a reason against it. An error rests on twice the figure's own order: the mean's
/// on the sum of squares, that of the standard deviation on fourth powers, the skewness's on sixth powers; where a handful of
/// trials carries over half of that sum, the figure is shown without an error. A rank needs no moments, so VaR and probabilities
/// always have one.
/// </summary>
internal sealed class FigureTable(OutcomeResult result, DigestIndex index, IFigureErrors errors, string? reasonAgainstAll)
{
    private const double FewestTailTrials = 10;
    private readonly Moments _moments = result.Summary.Moments;

    public OutcomeFigures Figures() => new()
    {
        Name = result.Request.Name,
        Mean = OfMoments(_moments.Mean, 2, errors.Mean, Confidence.Even(_moments.Mean, 0)),
        Sd = OfMoments(_moments.Sd, 4, errors.Sd, Confidence.Even(0, 0)),
        Skewness = OfMoments(_moments.Skewness, 6, errors.Skewness, Estimate.Without(0, FigureReasons.NoSpread)),
        Min = _moments.Min,
        Max = _moments.Max,
        Levels = [.. result.Request.Levels.Select(AtLevel)],
        Above = [.. result.Request.Thresholds.Select(Above)],
    };

    private Estimate OfMoments(double value, int order, Func<Estimate> withError, Estimate ofConstant)
    {
        if (reasonAgainstAll is not null) return Estimate.Without(value, reasonAgainstAll);
        if (_moments.Min == _moments.Max) return ofConstant;
        if (!double.IsFinite(_moments.PowerSum(order))) return Estimate.Without(value, FigureReasons.Range);
        return Dominating(order) is int trials ? Estimate.Without(value, Dominance.Reason(trials)) : withError();
    }

    private int? Dominating(int order) =>
        Dominance.Dominating(index, _moments.Mean, order, 0, index.Count - 1, Dominance.Handful);

    private LevelFigures AtLevel(double level)
    {
        var adverse = result.Request.Adverse;
        var value = TailFigures.Var(index, level, adverse);
        var tail = TailFigures.Tvar(index, level, adverse);
        if (ReasonAgainst(level) is string reason)
            return new LevelFigures(level, Estimate.Without(value, reason), Estimate.Without(tail, reason));
        return new LevelFigures(level, errors.Var(level), DominatingTail(level, value) is int trials
            ? Estimate.Without(tail, Dominance.Reason(trials))
            : errors.Tvar(level));
    }

    private string? ReasonAgainst(double level)
    {
        if (reasonAgainstAll is not null) return reasonAgainstAll;
        var beyond = Ranks.TailMass(level, _moments.Count);
        return Math.Min(beyond, _moments.Count - beyond) < FewestTailTrials ? FigureReasons.FewTailTrials : null;
    }

    /// <summary>TVaR rests on the squares, as the mean does: those of the whole sample and those of its tail.</summary>
    private int? DominatingTail(double level, double edge)
    {
        if (Dominating(2) is int trials) return trials;
        var rank = TailFigures.RankOf(index, level, result.Request.Adverse);
        var cluster = index.ClusterAt(rank - 0.5);
        return result.Request.Adverse == Adverse.High
            ? Dominance.Dominating(index, edge, 2, cluster, index.Count - 1, Dominance.TailHandful)
            : Dominance.Dominating(index, edge, 2, 0, cluster, Dominance.TailHandful);
    }

    private ExceedanceFigure Above(double threshold, int position)
    {
        var share = (double)result.Summary.Exceedances[position] / _moments.Count;
        return new ExceedanceFigure(threshold, reasonAgainstAll is null
            ? errors.Exceedance(position)
            : Estimate.Without(share, reasonAgainstAll));
    }
}
