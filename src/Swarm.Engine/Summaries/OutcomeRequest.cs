namespace Swarm.Engine.Summaries;

/// <summary>What is asked of one outcome.</summary>
/// <param name="Name">Name as it is shown: <c>motor.unpaid</c>, <c>fund[30]</c>.</param>
/// <param name="Adverse">Which end hurts.</param>
/// <param name="Levels">Probability levels of VaR and TVaR.</param>
/// <param name="Thresholds">Thresholds whose exceedances are counted.</param>
public sealed record OutcomeRequest(string Name, Adverse Adverse, IReadOnlyList<double> Levels, IReadOnlyList<double> Thresholds);
