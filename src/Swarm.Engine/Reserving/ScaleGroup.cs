namespace Swarm.Engine.Reserving;

/// <summary>A scale parameter and the residuals behind it.</summary>
/// <param name="First">First development, from 0, that has this scale.</param>
/// <param name="Last">Last development that has it.</param>
/// <param name="Residuals">Number of counted residuals behind it, those that are zero by construction included.</param>
/// <param name="ZerosByConstruction">How many of them are zero by construction.</param>
/// <param name="Scale">The scale parameter.</param>
public sealed record ScaleGroup(int First, int Last, int Residuals, int ZerosByConstruction, double Scale);
