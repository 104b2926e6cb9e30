namespace Swarm.Engine.Reserving;

/// <summary>A cell that is still to come.</summary>
/// <param name="Origin">Origin, from 0.</param>
/// <param name="Development">Development, from 0; those beyond the triangle are the tail's.</param>
/// <param name="Period">Calendar period after the latest diagonal, from 0.</param>
/// <param name="Mean">Its chain-ladder mean.</param>
public readonly record struct FutureCell(int Origin, int Development, int Period, double Mean);
