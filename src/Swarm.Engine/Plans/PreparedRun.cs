using Swarm.Engine.Models;
using Swarm.Engine.Streams;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Plans;

/// <summary>A model made ready to run with a seed and a number of trials: what a thread or a worker needs to compute any leaf.</summary>
internal sealed class PreparedRun
{
    public PreparedRun(Model model, RunSettings settings)
        : this(model, settings, TriangleModels.Components(model, settings.Seed))
    {
    }

    public PreparedRun(Model model, RunSettings settings, IReadOnlyList<Component> components)
    {
        Settings = settings;
        Shape = new RunShape(settings.Trials);
        Outcomes = ReportedOutcomes.Of(model);
        Components = components;
        Compiled = PlanCompiler.Compile(model, settings.Seed, Components, [.. Outcomes.Select(outcome => outcome.Instance)]);
    }

    /// <summary>Seed, trials, width.</summary>
    public RunSettings Settings { get; }

    /// <summary>The run's tree of leaves.</summary>
    public RunShape Shape { get; }

    /// <summary>Where summaries come from and go back to.</summary>
    public SummaryPool Pool { get; } = new();

    /// <summary>What is reported, in order.</summary>
    public IReadOnlyList<ReportedOutcome> Outcomes { get; }

    /// <summary>The model's components.</summary>
    public IReadOnlyList<Component> Components { get; }

    /// <summary>The model as operations on columns.</summary>
    public CompiledModel Compiled { get; }

    /// <summary>Number of leaves, the last perhaps partly filled.</summary>
    public long Leaves => (Settings.Trials + Edition.TrialsPerLeaf - 1) / Edition.TrialsPerLeaf;

    /// <summary>Number of trials of a leaf.</summary>
    public int TrialsOfLeaf(long leaf) =>
        (int)Math.Min(Edition.TrialsPerLeaf, Settings.Trials - (leaf * Edition.TrialsPerLeaf));
}
