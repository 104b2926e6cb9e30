namespace Swarm.Engine.Reserving.Simulation;

/// <summary>What turns the conditional means of future cells into amounts.</summary>
/// <param name="Scales">Scale parameter of each development period; the last is that of the tail.</param>
/// <param name="Process">Distribution of an amount: the conditional mean, and scale times it as variance.</param>
/// <param name="TailShares">Share of the tail that is paid in each period after the triangle; empty without tail.</param>
/// <param name="Tail">Distribution of the tail factor, or null without tail.</param>
internal sealed record ProcessInput(double[] Scales, ProcessError Process, double[] TailShares, TailFactorInput? Tail);

/// <summary>A tail factor: 1 plus a lognormal excess, or a constant.</summary>
/// <param name="Excess">Mean of the factor, less 1.</param>
/// <param name="LogMean">Mean of the excess's logarithm.</param>
/// <param name="LogSd">Its standard deviation; 0 for a constant factor.</param>
internal sealed record TailFactorInput(double Excess, double LogMean, double LogSd);
