namespace Swarm.Engine.Distributions;

/// <summary>Ranges of parameters, with the words that say so.</summary>
internal static class ParameterRules
{
    /// <summary>A parameter that must be above 0.</summary>
    public static IEnumerable<ParameterProblem> Positive(this BoundArguments arguments, string parameter) =>
        arguments.Number(parameter) > 0
            ? []
            : [new ParameterProblem(parameter, $"{parameter} must be above 0, not {arguments.Number(parameter):R}", null)];

    /// <summary>A parameter that must be 0 or more.</summary>
    public static IEnumerable<ParameterProblem> NotNegative(this BoundArguments arguments, string parameter) =>
        arguments.Number(parameter) >= 0
            ? []
            : [new ParameterProblem(parameter, $"{parameter} must be 0 or more, not {arguments.Number(parameter):R}", null)];
}
