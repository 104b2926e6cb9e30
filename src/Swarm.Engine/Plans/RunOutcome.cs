using Swarm.Engine.Summaries;

namespace Swarm.Engine.Plans;

/// <summary>What a run ended with: results, or the fault that stopped it.</summary>
public sealed record RunOutcome
{
    /// <summary>Results, one a reported outcome, or empty after a fault.</summary>
    public IReadOnlyList<ReportedResult> Results { get; init; } = [];

    /// <summary>How often components had to draw again.</summary>
    public IReadOnlyList<RedrawCount> Redraws { get; init; } = [];

    /// <summary>Why the run stopped, or null.</summary>
    public Fault? Fault { get; init; }

    internal static RunOutcome Failed(Fault fault) => new() { Fault = fault };

    internal static RunOutcome Of(PreparedRun run, IReadOnlyList<OutcomeResult> results, IReadOnlyList<long> redrawn) => new()
    {
        Results = [.. results.Zip(run.Outcomes, (result, reported) => new ReportedResult(
            result, reported.Group, reported.Parent, reported.Label, reported.IsMoney))],
        Redraws = [.. redrawn.Zip(run.Components, (count, component) => new RedrawCount(component.Name, count))],
    };
}

/// <summary>The result of one reported outcome, and its place among the others.</summary>
/// <param name="Result">Summary and batches.</param>
/// <param name="Group">What kind of part it is.</param>
/// <param name="Parent">The outcome as the model names it.</param>
/// <param name="Label">What tells it from its siblings; empty for the outcome itself.</param>
/// <param name="IsMoney">True if it is in the model's unit of money.</param>
public sealed record ReportedResult(OutcomeResult Result, OutcomeGroup Group, string Parent, string Label, bool IsMoney);

/// <summary>How many trials of a component had to be drawn again.</summary>
/// <param name="Component">Name of the component.</param>
/// <param name="Trials">Number of trials.</param>
public sealed record RedrawCount(string Component, long Trials);

/// <summary>What a reported outcome is in relation to the outcome that the model names.</summary>
public enum OutcomeGroup
{
    /// <summary>The outcome itself.</summary>
    Whole,

    /// <summary>One step of it.</summary>
    Step,

    /// <summary>One origin period of a triangle.</summary>
    Origin,

    /// <summary>What is paid in one future calendar period of a triangle.</summary>
    Calendar,

    /// <summary>The conditional mean of a triangle's unpaid claims: parameter error alone.</summary>
    Expected,
}
