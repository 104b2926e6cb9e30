namespace Swarm.Engine.Plans;

/// <summary>A plan in two forms with equal bits.</summary>
/// <param name="Running">Columns are used again and again: for speed.</param>
/// <param name="Traceable">Every register keeps a column of its own: to look into one trial.</param>
internal sealed record CompiledModel(Plan Running, Plan Traceable);
