using Swarm.Engine.Summaries;

namespace Swarm.Engine.Plans;

/// <summary>How far a run is.</summary>
/// <param name="TrialsDone">Trials computed and merged.</param>
/// <param name="Trials">Trials asked for.</param>
/// <param name="Preview">Figures of an outcome (by its place in the run's list) from what is merged so far.</param>
public sealed record RunProgress(long TrialsDone, long Trials, Func<int, OutcomeFigures?> Preview);
