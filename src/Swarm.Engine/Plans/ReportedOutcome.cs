using Swarm.Engine.Summaries;

namespace Swarm.Engine.Plans;

/// <summary>One figure block of a run: an outcome of the model, or a part of one.</summary>
/// <param name="Request">Name, adverse end, levels, thresholds.</param>
/// <param name="Instance">The quantity and step.</param>
/// <param name="Group">What kind of part it is.</param>
/// <param name="Parent">The outcome as the model names it.</param>
/// <param name="Label">What tells it from its siblings: an origin, a calendar period, a step; empty for the outcome itself.</param>
/// <param name="IsMoney">True if it is in the model's unit of money.</param>
internal sealed record ReportedOutcome(
    OutcomeRequest Request, Instance Instance, OutcomeGroup Group, string Parent, string Label, bool IsMoney);
