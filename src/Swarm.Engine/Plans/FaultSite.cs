namespace Swarm.Engine.Plans;

/// <summary>Where a fault can be noticed: a quantity at a step, and the quantities that went into it.</summary>
/// <param name="Quantity">Name of the quantity.</param>
/// <param name="Step">Its step, or null.</param>
/// <param name="Inputs">Names and registers of what its formula refers to.</param>
internal sealed record FaultSite(string Quantity, int? Step, IReadOnlyList<(string Name, int Register)> Inputs);
