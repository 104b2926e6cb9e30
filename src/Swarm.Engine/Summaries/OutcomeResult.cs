namespace Swarm.Engine.Summaries;

/// <summary>Everything a finished run knows of one outcome.</summary>
/// <param name="Request">What was asked.</param>
/// <param name="Summary">The summary of all trials.</param>
/// <param name="TrialsPerBatch">Trials of each whole batch.</param>
/// <param name="Batches">The whole batches, in order of their trials.</param>
public sealed record OutcomeResult(
    OutcomeRequest Request, OutcomeSummary Summary, long TrialsPerBatch, IReadOnlyList<BatchFigures> Batches);
