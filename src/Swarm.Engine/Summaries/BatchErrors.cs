namespace Swarm.Engine.Summaries;

/// <summary>
/// Standard errors from whole batches by sectioning (Asmussen &amp; Glynn 2007, III.5): the spread of the batches' figures around
/// that of the whole run, and Student-t. The ragged rest is in the estimate, but not in the spread.
/// </summary>
internal sealed class BatchErrors : IFigureErrors
{
    /// <summary>Fewer batches than this give no error.</summary>
    public const int FewestBatches = 20;
    private readonly OutcomeResult _result;
    private readonly DigestIndex _index;
    private readonly double[] _levels;
    private readonly double _quantile;

    public BatchErrors(OutcomeResult result, DigestIndex index)
    {
        _result = result;
        _index = index;
        _levels = BatchLevels.For(result.Request);
        _quantile = Confidence.StudentT(result.Batches.Count - 1);
    }

    public Estimate Mean() => Of(_result.Summary.Moments.Mean, batch => batch.Moments.Mean);

    public Estimate Sd() => Of(_result.Summary.Moments.Sd, batch => batch.Moments.Sd);

    public Estimate Skewness() => Of(_result.Summary.Moments.Skewness, batch => batch.Moments.Skewness);

    public Estimate Var(double level)
    {
        var at = Array.IndexOf(_levels, level);
        var adverse = _result.Request.Adverse;
        var blur = _index.BlurOfValueAt(TailFigures.RankOf(_index, level, adverse));
        return Of(TailFigures.Var(_index, level, adverse), batch => batch.Var[at], blur);
    }

    public Estimate Tvar(double level)
    {
        var at = Array.IndexOf(_levels, level);
        return Of(TailFigures.Tvar(_index, level, _result.Request.Adverse), batch => batch.Tvar[at]);
    }

    public Estimate Exceedance(int threshold)
    {
        var share = (double)_result.Summary.Exceedances[threshold] / _result.Summary.Trials;
        var estimate = Of(share, batch => (double)batch.Exceedances[threshold] / batch.Moments.Count);
        if (estimate.StandardError == 0) return Estimate.Without(share, FigureReasons.NoBatchSpread);
        return estimate with { Low = Math.Max(0, estimate.Low!.Value), High = Math.Min(1, estimate.High!.Value) };
    }

    /// <param name="value">The full run's figure.</param>
    /// <param name="figure">The same figure of a batch.</param>
    /// <param name="blur">A standard error that the batches do not show.</param>
    private Estimate Of(double value, Func<BatchFigures, double> figure, double blur = 0)
    {
        var squares = 0.0;
        foreach (var batch in _result.Batches)
        {
            var distance = figure(batch) - value;
            squares += distance * distance;
        }

        var ofOneBatch = squares / (_result.Batches.Count - 1);
        var se = Math.Sqrt((ofOneBatch * _result.TrialsPerBatch / _result.Summary.Trials) + (blur * blur));
        return double.IsFinite(se) ? Confidence.Even(value, se, _quantile) : Estimate.Without(value, FigureReasons.Range);
    }
}
