namespace Swarm.Engine.Reserving;

/// <summary>A reserve's standard error, in its parts.</summary>
/// <param name="Process">Root of the process variance: future amounts scatter about their means.</param>
/// <param name="Parameter">Root of the parameter variance: the factors are estimates.</param>
/// <param name="StandardError">Root of the sum of both variances (the root of the mean squared error of prediction).</param>
public readonly record struct PredictionError(double Process, double Parameter, double StandardError)
{
    internal static PredictionError OfVariances(double process, double parameter) =>
        new(Math.Sqrt(process), Math.Sqrt(parameter), Math.Sqrt(process + parameter));
}
