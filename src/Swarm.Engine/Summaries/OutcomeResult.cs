namespace Swarm.Engine.Summaries;

/// <summary>Everything a finished run knows of one outcome.</summary>
/// <param name="Request">What was asked.</param>
/// <param name="Summary">The summary of all trials.</param>
/// <param name="TrialsPerBatch">Trials of each whole batch.</param>
/// <param name="Batches">The whole batches, in order of their trials.</param>
public sealed record OutcomeResult(
    OutcomeRequest Request, OutcomeSummary Summary, long TrialsPerBatch, IReadOnlyList<BatchFigures> Batches)
{
    /// <summary>Reads a finished result back from its parts.</summary>
    /// <exception cref="ArgumentException">The batches are not those of a run of so many trials, or of other questions.</exception>
    public static OutcomeResult FromParts(OutcomeRequest request, OutcomeSummary summary, IReadOnlyList<BatchFigures> batches)
    {
        var shape = new RunShape(summary.Trials);
        if (batches.Count != shape.WholeBatches)
            throw new ArgumentException($"A run of {shape.Trials} trials has {shape.WholeBatches} whole batches, not {batches.Count}.");
        if (summary.Exceedances.Length != request.Thresholds.Count)
            throw new ArgumentException($"{summary.Exceedances.Length} exceedance counts for {request.Thresholds.Count} thresholds.");
        var levels = BatchLevels.For(request).Length;
        for (var k = 0; k < batches.Count; k++)
        {
            if (batches[k].Moments.Count != shape.TrialsPerBatch || batches[k].Exceedances.Count != request.Thresholds.Count
                || batches[k].Var.Count != levels || batches[k].Tvar.Count != levels)
                throw new ArgumentException($"Batch {k} has other trials, thresholds or levels than the run.");
        }

        return new OutcomeResult(request, summary, shape.TrialsPerBatch, batches);
    }
}
